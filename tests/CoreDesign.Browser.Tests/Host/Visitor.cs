using System.Text.RegularExpressions;
using Microsoft.Playwright;

namespace CoreDesign.Browser.Tests.Host;

/// <summary>One person's browser window, with a list of everything that went wrong in it.</summary>
public sealed class Visitor : IAsyncDisposable
{
    private readonly List<string> faults = [];
    private readonly List<Regex> expected = [];
    private readonly IBrowserContext context;

    private Visitor(IBrowserContext context, IPage page, string address)
    {
        this.context = context;
        Page = page;
        Address = address;
        Watch(page);
    }

    public IPage Page { get; }

    public string Address { get; }

    /// <summary>What went wrong and was not expected: errors in the console, failed requests, refused answers.</summary>
    public IReadOnlyList<string> Faults
    {
        get { lock (faults) return [.. faults.Where(fault => !expected.Exists(e => e.IsMatch(fault)))]; }
    }

    public static async Task<Visitor> ComeAsync(IBrowser browser, WebServer server, int width = 1280, int height = 800, ColorScheme scheme = ColorScheme.Light)
    {
        var fresh = await browser.NewContextAsync(new()
        {
            BaseURL = server.Address,
            ViewportSize = new() { Width = width, Height = height },
            ColorScheme = scheme,
            ReducedMotion = ReducedMotion.Reduce,
            Locale = "en-GB",
        });
        fresh.SetDefaultTimeout(30_000);
        return new Visitor(fresh, await fresh.NewPageAsync(), server.Address);
    }

    /// <summary>A second tab of the same person.</summary>
    public async Task<IPage> NewTabAsync()
    {
        var page = await context.NewPageAsync();
        Watch(page);
        return page;
    }

    /// <summary>A fault that this test provokes on purpose.</summary>
    public void Expect(string pattern) => expected.Add(new Regex(pattern, RegexOptions.None, TimeSpan.FromSeconds(1)));

    /// <summary>Opens an address and waits until the page answers to presses and keys.</summary>
    public async Task<IResponse?> GoAsync(string path)
    {
        var response = await Page.GotoAsync(path);
        await Page.SettledAsync();
        return response;
    }

    /// <summary>Keeps what the window shows under artifacts/screens.</summary>
    public Task ShotAsync(string name, bool wholePage = false) =>
        Page.ScreenshotAsync(new() { Path = Paths.Artifact("screens", name + ".png"), FullPage = wholePage });

    public ValueTask DisposeAsync() => new(context.CloseAsync());

    private void Watch(IPage page)
    {
        page.Console += (_, message) =>
        {
            if (message.Type == "error") Add($"console: {message.Text} ({message.Location})");
        };
        page.PageError += (_, error) => Add($"script: {error}");
        page.RequestFailed += (_, request) => Add($"request: {request.Method} {request.Url}: {request.Failure}");
        page.Response += (_, response) =>
        {
            if (response.Status >= 400) Add($"answer {response.Status}: {response.Request.Method} {response.Url}");
        };
    }

    private void Add(string fault)
    {
        lock (faults) faults.Add(fault);
    }
}
