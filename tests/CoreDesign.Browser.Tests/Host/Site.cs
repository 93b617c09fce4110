using CoreDesign.Browser.Tests.Host;
using Microsoft.Playwright;

[assembly: AssemblyFixture(typeof(Site))]

namespace CoreDesign.Browser.Tests.Host;

/// <summary>One browser and one running service for all tests; each test has its own window and its own cookies.</summary>
public sealed class Site : IAsyncLifetime
{
    // Debian's browser, as the test command installs it; none is downloaded.
    private const string Chromium = "/usr/bin/chromium";

    private IPlaywright? playwright;

    public IBrowser Browser { get; private set; } = default!;

    public WebServer Server { get; private set; } = default!;

    public async ValueTask InitializeAsync()
    {
        if (!File.Exists(Chromium)) throw new InvalidOperationException($"{Chromium} is missing. Run tests/run, which installs it, or: apt-get install chromium");
        Assertions.SetDefaultExpectTimeout(30_000);
        playwright = await Playwright.CreateAsync();
        Browser = await playwright.Chromium.LaunchAsync(new()
        {
            ExecutablePath = Chromium,
            Args = ["--no-sandbox", "--disable-gpu", "--disable-quic", "--no-first-run", "--disable-background-networking", "--disable-component-update", "--disable-sync"],
        });
        Server = await WebServer.StartNewAsync();
    }

    public async ValueTask DisposeAsync()
    {
        if (Browser is not null) await Browser.CloseAsync();
        playwright?.Dispose();
        if (Server is not null) await Server.DisposeAsync();
    }
}
