namespace CoreDesign.History.Tests;
