using Microsoft.Playwright;

namespace CoreDesign.Browser.Tests.Host;

/// <summary>A test with a window of its own. It also fails when anything went wrong in the window that the test did not expect.</summary>
public abstract class BrowserTest(Site site) : IAsyncLifetime
{
    private readonly List<Visitor> visitors = [];

    protected Site Site { get; } = site;

    public ValueTask InitializeAsync() => ValueTask.CompletedTask;

    protected async Task<Visitor> ComeAsync(int width = 1280, int height = 800, ColorScheme scheme = ColorScheme.Light, WebServer? server = null)
    {
        var visitor = await Visitor.ComeAsync(Site.Browser, server ?? Site.Server, width, height, scheme);
        visitors.Add(visitor);
        return visitor;
    }

    public async ValueTask DisposeAsync()
    {
        var faults = visitors.SelectMany(v => v.Faults).ToList();
        var failed = faults.Count > 0 || TestContext.Current.TestState?.Result == TestResult.Failed;
        foreach (var (visitor, i) in visitors.Select((v, i) => (v, i)))
        {
            if (failed) await KeepAsync(visitor, i);
            await visitor.DisposeAsync();
        }

        if (failed) TestContext.Current.SendDiagnosticMessage(Site.Server.Log);
        GC.SuppressFinalize(this);
        Assert.Empty(faults);
    }

    private static async Task KeepAsync(Visitor visitor, int number)
    {
        try
        {
            await visitor.ShotAsync(Path.Combine("failed", $"{TestContext.Current.TestMethod?.MethodName}-{number}"));
        }
        catch (PlaywrightException)
        {
            // The window may be gone; the test has failed for another reason already.
        }
    }
}
