using CoreDesign.Web;

var builder = WebApplication.CreateBuilder(args);
builder.ListenOnLoopbackByDefault();
builder.AddProblems();

var app = builder.Build();
app.UseProblems();
app.Run();
