namespace CoreDesign.Web.Tests;
