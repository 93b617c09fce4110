using CoreDesign.Browser.Tests.Host;
using Microsoft.Playwright;

namespace CoreDesign.Browser.Tests.Walks;

public sealed class NewEngineerTests(Site site) : BrowserTest(site)
{
    [Fact]
    public async Task An_invented_order_is_changed_saved_found_in_the_history_opened_and_printed()
    {
        var visitor = await ComeAsync();
        var page = visitor.Page;
        await visitor.GoAsync("/design");
        await Assertions.Expect(page.GetByRole(AriaRole.Heading, new() { Name = "Start with the order" })).ToBeVisibleAsync();
        await page.Locator("[data-demo='town-400']").ClickAsync();
        await Assertions.Expect(page.Figure("No-load loss")).ToBeVisibleAsync();
        await page.AnsweredAsync();
        var before = await page.Figure("No-load loss").InnerTextAsync();
        await page.EnterAsync("core.limb.diameter_mm", "176");
        await Assertions.Expect(page.Figure("No-load loss")).Not.ToHaveTextAsync(before);
        await page.EnterAsync("order.reference", "WALK-1");

        var id = await page.SaveAsync("Walk 1 town station", "176 mm for less flux");
        var loss = await page.Figure("No-load loss").InnerTextAsync();
        var current = await page.Figure("No-load current").InnerTextAsync();
        Assert.NotEqual(before, loss);

        await FindInHistoryAsync(page, loss);
        await Assertions.Expect(page).ToHaveURLAsync(new System.Text.RegularExpressions.Regex($"/design/{id}/1$", System.Text.RegularExpressions.RegexOptions.None, TimeSpan.FromSeconds(1)));
        await page.SettledAsync();
        await Assertions.Expect(page.Figure("No-load loss")).ToHaveTextAsync(loss);

        var text = await Pdf.CheckedTextAsync(await PrintAsync(visitor, "Design sheet, A4"));
        Assert.Contains($"CD-{id:00000}", text, StringComparison.Ordinal);
        Assert.Contains("Walk 1 town station", text, StringComparison.Ordinal);
        Assert.Matches(@"Revision index\s+Core design sheet\s.*\s1\s", text.ReplaceLineEndings("\n"));
        AssertPrinted(loss, "No-load loss", "W", text);
        AssertPrinted(current, "No-load current", "%", text);
    }

    private static async Task FindInHistoryAsync(IPage page, string loss)
    {
        await page.GetByRole(AriaRole.Link, new() { Name = "History", Exact = true }).ClickAsync();
        await page.GetByRole(AriaRole.Searchbox).FillAsync("WALK-1");
        var rows = page.Locator(".ht tbody tr");
        await Assertions.Expect(rows).ToHaveCountAsync(1);
        await Assertions.Expect(rows.First).ToContainTextAsync(loss);
        await page.GetByRole(AriaRole.Link, new() { Name = "Walk 1 town station", Exact = true }).ClickAsync();
    }

    /// <summary>The sheet prints more digits than the page shows; rounded to the page's they must be the same.</summary>
    private static void AssertPrinted(string shown, string name, string unit, string sheet)
    {
        var decimals = shown.Contains('.', StringComparison.Ordinal) ? shown.Length - shown.IndexOf('.', StringComparison.Ordinal) - 1 : 0;
        var printed = System.Text.RegularExpressions.Regex.Matches(sheet, $@"{name}\s+(?<figure>[\d.]+)\s{unit}", System.Text.RegularExpressions.RegexOptions.ExplicitCapture, TimeSpan.FromSeconds(1))
            .Select(m => Math.Round(double.Parse(m.Groups["figure"].Value, System.Globalization.CultureInfo.InvariantCulture), decimals));
        Assert.Contains(double.Parse(shown, System.Globalization.CultureInfo.InvariantCulture), printed);
    }

    /// <summary>Presses the page's own link and takes what the link gives.</summary>
    private static async Task<byte[]> PrintAsync(Visitor visitor, string sheet)
    {
        var page = visitor.Page;
        await page.GetByRole(AriaRole.Button, new() { Name = "Print", Exact = true }).ClickAsync();
        var link = page.GetByRole(AriaRole.Link, new() { Name = sheet });
        var arrived = new TaskCompletionSource<IResponse>(TaskCreationOptions.RunContinuationsAsynchronously);
        page.Context.Response += (_, r) =>
        {
            if (r.Url.Contains("/sheets/", StringComparison.Ordinal)) arrived.TrySetResult(r);
        };
        await link.ClickAsync();
        var response = await arrived.Task.WaitAsync(TimeSpan.FromSeconds(30));
        Assert.Equal(200, response.Status);
        Assert.Equal("application/pdf", await response.HeaderValueAsync("content-type"));
        // The new tab holds the browser's viewer; what it shows is asked for once more.
        return await (await page.APIRequest.GetAsync(response.Url)).BodyAsync();
    }
}
