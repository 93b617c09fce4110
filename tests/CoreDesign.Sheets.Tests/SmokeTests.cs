namespace CoreDesign.Sheets.Tests;
