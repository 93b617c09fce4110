using CoreDesign.Web;
using CoreDesign.Web.Features.Designs;
using CoreDesign.Web.Features.Estimates;
using CoreDesign.Web.Features.Sheets;
using CoreDesign.Web.Features.Steels;
using CoreDesign.Web.Platform;

var builder = WebApplication.CreateBuilder(args);
builder.ListenOnLoopbackByDefault();
builder.AddProblems();
builder.AddPages();
builder.AddHistory();
builder.AddSteels();
builder.AddEstimates();

var app = builder.Build();
app.UseProblems();
app.UsePages();
app.MapPages();
app.MapDesignsApi();
app.MapSteelsApi();
app.MapEstimatesApi();
app.MapSheetsApi();
if (!app.StartHistory()) return 1;
app.Run();
return 0;

/// <summary>Named so that tests can start the whole service.</summary>
public partial class Program;
