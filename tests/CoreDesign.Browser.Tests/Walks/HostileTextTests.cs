using System.Text.Json;
using CoreDesign.Browser.Tests.Host;
using CoreDesign.Estimating.Demo;
using Microsoft.Playwright;

namespace CoreDesign.Browser.Tests.Walks;

/// <summary>Text from people is shown as text, whatever it holds. The window's list of faults would name a script that ran or was refused.</summary>
public sealed class HostileTextTests(Site site) : BrowserTest(site)
{
    private const string Script = "<img src=x onerror=\"window.ran=1\"><script>window.ran=1</script>";
    private const string RightToLeft = "נגד abc 123";

    [Theory]
    [InlineData("h1 " + Script)]
    [InlineData("h2 {{7*7}} ${7*7} @(7*7) %00 ' OR 1=1 --")]
    [InlineData("h3 " + RightToLeft)]
    public async Task A_name_is_shown_letter_by_letter_and_never_runs(string name)
    {
        var visitor = await ComeAsync();
        var page = visitor.Page;
        await visitor.OpenDemoAsync();
        await page.EnterAsync("order.reference", name[..Math.Min(name.Length, 60)]);
        await Assertions.Expect(page.Locator(".who b")).ToHaveTextAsync(name[..Math.Min(name.Length, 60)]);
        var id = await page.SaveAsync(name, note: name, author: name);
        await visitor.GoAsync($"/designs/{id}");
        await Assertions.Expect(page.Locator("h1")).ToHaveTextAsync(name);
        await Assertions.Expect(page.Locator(".card .notes li p")).ToHaveTextAsync(name);
        await visitor.GoAsync($"/history?search={Uri.EscapeDataString(name[..2])}");
        await Assertions.Expect(page.GetByRole(AriaRole.Link, new() { Name = name, Exact = true })).ToBeVisibleAsync();
        Assert.False(await page.EvaluateAsync<bool>("() => 'ran' in window"), "A script in a name ran.");
        Assert.Equal(0, await page.Locator("main img, main script").CountAsync());
    }

    [Fact]
    public async Task A_reference_with_invisible_characters_is_refused_at_its_field()
    {
        var visitor = await ComeAsync();
        await visitor.OpenDemoAsync();
        await visitor.Page.EnterAsync("order.reference", "a\u202Eb");
        await Assertions.Expect(visitor.Page.Locator(".fields .msg")).ToContainTextAsync("control or invisible characters");
        await Assertions.Expect(visitor.Page.OldFigures()).ToHaveCountAsync(1);
    }

    [Fact]
    public async Task A_very_long_name_leaves_the_history_as_wide_as_the_window()
    {
        var name = "h4 " + new string('W', 117);
        var visitor = await ComeAsync();
        var page = visitor.Page;
        await visitor.OpenDemoAsync();
        var id = await page.SaveAsync(name, name, new string('M', 80));
        foreach (var address in (string[])["/history?search=h4", $"/designs/{id}", $"/design/{id}"])
        {
            await visitor.GoAsync(address);
            var over = await page.EvaluateAsync<int>("() => document.documentElement.scrollWidth - innerWidth");
            Assert.True(over <= 0, $"{address} is {over} px wider than the window.");
        }
    }

    [Fact]
    public async Task Control_characters_and_overlong_names_are_refused_with_the_field_and_the_mend()
    {
        var visitor = await ComeAsync();
        await visitor.GoAsync("/history");
        var design = DemoOrders.All[0].Design;
        (string Title, string Says)[] cases =
        [
            ("a\0b", "holds control or invisible characters. Type it again as plain text, at most 200 characters."),
            (new string('t', 201), "has 201 characters; at most 200 are kept. Shorten it."),
            (" ", "is empty"),
        ];
        foreach (var (title, says) in cases)
        {
            var answer = await visitor.Page.APIRequest.PostAsync("/api/designs", new()
            {
                Headers = new Dictionary<string, string> { ["content-type"] = "application/json" },
                DataString = JsonSerializer.Serialize(new { title, design = JsonSerializer.Deserialize<JsonElement>(CoreDesign.Estimating.Contracts.DesignJson.Write(design)) }),
            });
            Assert.Equal(400, answer.Status);
            Assert.Contains(says, System.Text.RegularExpressions.Regex.Unescape(await answer.TextAsync()), StringComparison.Ordinal);
        }
    }
}
