using CoreDesign.Web;
using CoreDesign.Web.Platform;

var builder = WebApplication.CreateBuilder(args);
builder.ListenOnLoopbackByDefault();
builder.AddProblems();
builder.AddPages();

var app = builder.Build();
app.UseProblems();
app.UsePages();
app.MapPages();
app.Run();

/// <summary>Named so that tests can start the whole service.</summary>
public partial class Program;
