using Bunit;
using CoreDesign.Estimating.Circuits;
using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Demo;
using CoreDesign.Web.Features.Circuits;
using Microsoft.AspNetCore.Components.Forms;
using Microsoft.Extensions.DependencyInjection;

namespace CoreDesign.Web.Tests.CircuitPages;

public sealed class CircuitsPageTests : BunitContext
{
    private readonly CancellationTokenSource told = new();
    private Func<CircuitCase, int, CancellationToken, Outcome<CircuitAnswer>> solve = SolveCircuit.Run;

    public CircuitsPageTests()
    {
        Services.AddSingleton(new CircuitEngine((c, points, cancel) => solve(c, points, cancel)));
        JSInterop.Mode = JSRuntimeMode.Loose;
        JSInterop.SetupModule("/js/charts.js").Mode = JSRuntimeMode.Loose;
    }

    [Fact]
    public void Page_says_its_limits_and_offers_the_example()
    {
        var page = Render<CircuitsPage>();

        var intro = page.Find(".intro").TextContent;
        foreach (var limit in new[] { "200 branches", "12 windings", "1024 KiB", "20 s" }) Assert.Contains(limit, intro, StringComparison.Ordinal);
        Assert.Contains("Nothing solved yet", page.Find(".empty").TextContent, StringComparison.Ordinal);
    }

    [Fact]
    public void One_press_shows_the_example_with_text_figures_and_charts()
    {
        var page = Render<CircuitsPage>();

        page.Find(".empty button").Click();

        page.WaitForElement(".branches");
        Assert.Equal(ExampleCircuit.Json, page.Find("#circuit").GetAttribute("value"));
        Assert.Equal(8, page.FindAll(".branches tbody tr").Count);
        Assert.Equal(16, page.FindAll(".currents tbody tr").Count);
        Assert.Equal(3, page.FindAll("figure svg").Count);
        Assert.All(page.FindAll("figure svg"), svg => Assert.NotEmpty(svg.QuerySelector("desc")!.TextContent));
        Assert.StartsWith("Solved.", page.Find("[role=status]").TextContent, StringComparison.Ordinal);
    }

    [Fact]
    public void Errors_stand_with_line_path_and_mend_and_the_last_figures_are_marked_as_old()
    {
        var page = Solve(JsonCase.Circuit);
        page.WaitForElement(".branches");

        page.Find("#circuit").Change(JsonCase.With(JsonCase.Circuit, "branches[1].gap", "-1"));
        Press(page, "Solve");

        page.WaitForElement(".errors");
        var row = page.Find(".errors tbody tr");
        Assert.Equal("branches[1].gap", row.QuerySelector("code")!.TextContent);
        Assert.Contains("-1 is outside 0 to 10", row.TextContent, StringComparison.Ordinal);
        Assert.Equal("true", page.Find("#circuit").GetAttribute("aria-invalid"));
        Assert.NotEmpty(page.FindAll(".figures.old"));
        Assert.Contains("Figures of the text that was solved last", page.Markup, StringComparison.Ordinal);
    }

    [Fact]
    public void Line_of_an_error_leads_to_its_place_in_the_text()
    {
        var page = Solve("{\n\"frequency\": 0 }");
        page.WaitForElement(".errors");

        page.FindAll(".errors button").Single(b => b.TextContent == "2").Click();

        Assert.Equal(["circuit", 2], JSInterop.VerifyInvoke("coreDesign.showLine").Arguments);
    }

    [Fact]
    public void Answer_is_saved_as_the_api_would_give_it()
    {
        var page = Solve(JsonCase.Circuit);
        page.WaitForElement(".branches");

        Press(page, "Save the answer as JSON");

        var saved = JSInterop.VerifyInvoke("coreDesign.saveText").Arguments;
        Assert.Equal("circuit-answer.json", saved[0]);
        Assert.Equal(DesignJson.Write(SolveCircuit.Run(DesignJson.Read<CircuitCase>(JsonCase.Circuit).Value!).Value!), saved[2]);
    }

    [Fact]
    public void Solve_is_stopped_by_its_button()
    {
        solve = Waits;
        var page = Solve(JsonCase.Circuit);

        page.WaitForAssertion(() => Press(page, "Stop"));

        page.WaitForAssertion(() => Assert.True(told.IsCancellationRequested));
        page.WaitForAssertion(() => Assert.Contains("Stopped before it was solved.", page.Find(".said").TextContent, StringComparison.Ordinal));
        Assert.DoesNotContain(page.FindAll("button"), b => b.TextContent == "Stop");
    }

    [Fact]
    public async Task Solve_is_stopped_when_the_page_is_left()
    {
        solve = Waits;
        var page = Solve(JsonCase.Circuit);
        page.WaitForAssertion(() => Assert.Contains("Solving", page.Find(".said").TextContent, StringComparison.Ordinal));

        await DisposeComponentsAsync();

        Assert.True(SpinWait.SpinUntil(() => told.IsCancellationRequested, TimeSpan.FromSeconds(30)));
    }

    [Fact]
    public void File_is_read_and_solved()
    {
        var page = Render<CircuitsPage>();

        page.FindComponent<InputFile>().UploadFiles(InputFileContent.CreateFromText(JsonCase.Circuit, "ring.json"));

        page.WaitForElement(".branches");
        Assert.Equal(JsonCase.Circuit, page.Find("#circuit").GetAttribute("value"));
    }

    [Fact]
    public void File_of_ten_megabytes_is_refused()
    {
        var page = Render<CircuitsPage>();

        page.FindComponent<InputFile>().UploadFiles(InputFileContent.CreateFromBinary(new byte[10 * 1024 * 1024], "large.json"));

        page.WaitForAssertion(() => Assert.Contains("at most 1024 KiB", page.Find(".msg").TextContent, StringComparison.Ordinal));
    }

    [Fact]
    public void Text_that_was_left_comes_back()
    {
        JSInterop.Setup<string?>("coreDesign.remembered", "circuit").SetResult("{ }");

        var page = Render<CircuitsPage>();

        page.WaitForAssertion(() => Assert.Equal("{ }", page.Find("#circuit").GetAttribute("value")));
    }

    [Fact]
    public void Hostile_names_are_shown_as_text()
    {
        var page = Solve(JsonCase.With(JsonCase.Circuit, "branches[1].name", "\"<img src=x onerror=alert(1)>\""));

        page.WaitForElement(".branches");
        Assert.Empty(page.FindAll("img"));
        Assert.Contains(page.FindAll(".branches td"), td => td.TextContent == "<img src=x onerror=alert(1)>");
    }

    protected override void Dispose(bool disposing)
    {
        base.Dispose(disposing);
        if (disposing) told.Dispose();
    }

    private Outcome<CircuitAnswer> Waits(CircuitCase circuit, int points, CancellationToken cancel)
    {
        cancel.WaitHandle.WaitOne(TimeSpan.FromSeconds(30));
        if (cancel.IsCancellationRequested) told.Cancel();
        cancel.ThrowIfCancellationRequested();
        return SolveCircuit.Run(circuit, points, cancel);
    }

    private IRenderedComponent<CircuitsPage> Solve(string text)
    {
        var page = Render<CircuitsPage>();
        page.Find("#circuit").Change(text);
        Press(page, "Solve");
        return page;
    }

    private static void Press(IRenderedComponent<CircuitsPage> page, string name) => page.FindAll("button").Single(b => b.TextContent == name).Click();
}
