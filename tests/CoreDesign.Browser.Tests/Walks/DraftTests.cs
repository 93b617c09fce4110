using System.Text.RegularExpressions;
using CoreDesign.Browser.Tests.Host;
using Microsoft.Playwright;

namespace CoreDesign.Browser.Tests.Walks;

/// <summary>What is typed and not saved is not lost.</summary>
public sealed partial class DraftTests(Site site) : BrowserTest(site)
{
    // The line to the service breaks on purpose, and the browser says so; the service has no draft until it writes the first one.
    private const string Broken = "_blazor|WebSocket|ERR_CONNECTION|Connection (closed|disconnected)|Failed to (complete|start)|/api/drafts/";

    private const string Kept = """
        async ([key, text]) => {
          for (const end = Date.now() + 30000; Date.now() < end;) {
            if ((await (await fetch(`/api/drafts/${key}`)).text()).includes(text)) return true;
          }
          return false;
        }
        """;

    [Fact]
    public async Task What_is_half_typed_is_there_after_a_reload_and_after_the_service_was_cut_off()
    {
        await using var server = await WebServer.StartNewAsync();
        var visitor = await ComeAsync(server: server);
        visitor.Expect(Broken);
        var page = visitor.Page;
        await visitor.OpenDemoAsync();
        await page.EnterAsync("core.limb.diameter_mm", "98");
        await page.EnterAsync("core.windowHeight_mm", "19x");
        await page.EnterAsync("order.reference", "HALF-1");
        await KeptAsync(page, "HALF-1");
        var loss = await page.Figure("No-load loss").InnerTextAsync();

        await page.ReloadAsync();
        await page.SettledAsync();
        await AssertHalfTypedAsync(page);

        await server.KillAsync();
        await Assertions.Expect(page.Locator("#components-reconnect-modal")).ToBeVisibleAsync();
        var address = page.Url;
        await page.CloseAsync();
        await server.StartAsync();
        var later = await visitor.NewTabAsync();
        await later.GotoAsync(address);
        await later.SettledAsync();
        await AssertHalfTypedAsync(later);
        await later.EnterAsync("core.windowHeight_mm", "190");
        await Assertions.Expect(later.OldFigures()).ToHaveCountAsync(0);
        await Assertions.Expect(later.Figure("No-load loss")).ToHaveTextAsync(loss);
    }

    [Fact]
    public async Task The_page_comes_back_by_itself_when_the_service_does()
    {
        await using var server = await WebServer.StartNewAsync();
        var visitor = await ComeAsync(server: server);
        visitor.Expect(Broken);
        var page = visitor.Page;
        await visitor.OpenDemoAsync();
        await page.EnterAsync("order.reference", "BACK-1");
        await KeptAsync(page, "BACK-1");
        await server.KillAsync();
        var banner = page.Locator("#components-reconnect-modal");
        await Assertions.Expect(banner).ToBeVisibleAsync();
        await Assertions.Expect(banner).ToContainTextAsync("What you typed is kept");
        await server.StartAsync();
        // The browser asks again at growing intervals.
        await Assertions.Expect(banner).ToBeHiddenAsync(new() { Timeout = 60_000 });
        await page.SettledAsync();
        await Assertions.Expect(page.Field("order.reference")).ToHaveValueAsync("BACK-1");
        await page.EnterAsync("core.limb.diameter_mm", "99");
    }

    private static async Task AssertHalfTypedAsync(IPage page)
    {
        await Assertions.Expect(page.Field("core.limb.diameter_mm")).ToHaveValueAsync("98");
        await Assertions.Expect(page.Field("order.reference")).ToHaveValueAsync("HALF-1");
        await Assertions.Expect(page.Field("core.windowHeight_mm")).ToHaveValueAsync("19x");
        await Assertions.Expect(page.Field("core.windowHeight_mm")).ToHaveAttributeAsync("aria-invalid", "true");
    }

    /// <summary>Waits until the service holds what was typed; it writes a moment after the last keystroke.</summary>
    private static async Task KeptAsync(IPage page, string reference)
    {
        await page.WaitForURLAsync(DraftAddress());
        var key = DraftAddress().Match(page.Url).Groups["key"].Value;
        Assert.True(await page.EvaluateAsync<bool>(Kept, new[] { key, reference }), $"The service never held a draft with {reference}.");
    }

    [GeneratedRegex("draft=(?<key>[0-9a-f-]{36})", RegexOptions.ExplicitCapture, 1000)]
    private static partial Regex DraftAddress();
}
