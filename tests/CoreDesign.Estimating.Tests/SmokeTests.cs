namespace CoreDesign.Estimating.Tests;
