namespace CoreDesign.Magnetics.Tests;
