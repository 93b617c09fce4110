namespace CoreDesign.Browser.Tests;
