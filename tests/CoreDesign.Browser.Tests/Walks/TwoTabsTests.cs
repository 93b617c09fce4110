using CoreDesign.Browser.Tests.Host;
using Microsoft.Playwright;

namespace CoreDesign.Browser.Tests.Walks;

/// <summary>Two tabs edit the same design: the second to save is told, and both keep what they have.</summary>
public sealed class TwoTabsTests(Site site) : BrowserTest(site)
{
    private const string Diameter = "core.limb.diameter_mm";

    [Fact]
    public async Task The_second_save_meets_the_first_and_going_on_editing_changes_nothing()
    {
        var (first, second, id) = await ConflictAsync("Tabs one");
        var dialog = second.Locator("#conflict-dialog");
        await Assertions.Expect(dialog).ToContainTextAsync("Revision 2 was saved meanwhile");
        await Assertions.Expect(dialog).ToContainTextAsync("F. Irst");
        await Assertions.Expect(dialog).ToContainTextAsync("with the note “two millimetres more”");
        var row = dialog.Locator("tbody tr").Filter(new() { HasText = "Diameter" });
        await Assertions.Expect(row.Locator("td").Nth(1)).ToContainTextAsync("98");
        await Assertions.Expect(row.Locator("td").Nth(2)).ToContainTextAsync("94");

        await dialog.GetByRole(AriaRole.Button, new() { Name = "Go on editing" }).ClickAsync();
        await Assertions.Expect(second.Locator("dialog[open]")).ToHaveCountAsync(0);
        await Assertions.Expect(second.Field(Diameter)).ToHaveValueAsync("94");
        Assert.Equal(["96", "98"], await DiametersAsync(first, id));

        await second.SaveButton().ClickAsync();
        await Assertions.Expect(second.Locator("#save-dialog").GetByLabel("Note")).ToHaveValueAsync("two millimetres less");
        await second.Locator("#save-dialog").GetByRole(AriaRole.Button, new() { Name = "Save revision" }).ClickAsync();
        await Assertions.Expect(dialog).ToContainTextAsync("Revision 2 was saved meanwhile");
        Assert.Equal(["96", "98"], await DiametersAsync(first, id));
    }

    [Fact]
    public async Task The_second_can_save_on_top_as_a_further_revision()
    {
        var (first, second, id) = await ConflictAsync("Tabs two");
        await second.Locator("#conflict-dialog").GetByRole(AriaRole.Button, new() { Name = "Save yours as revision 3" }).ClickAsync();
        Assert.Equal(id, await second.SavedAsync());
        await Assertions.Expect(second.Locator(".who")).ToContainTextAsync("revision 3");
        await Assertions.Expect(second.Field(Diameter)).ToHaveValueAsync("94");
        Assert.Equal(["96", "98", "94"], await DiametersAsync(first, id));
    }

    [Fact]
    public async Task The_second_can_open_the_other_revision_and_finds_its_own_texts_again()
    {
        var (first, second, id) = await ConflictAsync("Tabs three");
        await second.Locator("#conflict-dialog").GetByRole(AriaRole.Button, new() { Name = "Open revision 2" }).ClickAsync();
        Assert.Equal(id, await second.SavedAsync());
        await Assertions.Expect(second.Locator(".who")).ToContainTextAsync("revision 2");
        await Assertions.Expect(second.Field(Diameter)).ToHaveValueAsync("98");
        await second.GetByRole(AriaRole.Link, new() { Name = "Go on with it" }).ClickAsync();
        await Assertions.Expect(second.Field(Diameter)).ToHaveValueAsync("94");
        Assert.Equal(["96", "98"], await DiametersAsync(first, id));
    }

    /// <summary>A design that one tab has saved as revision 2 while the other started from revision 1 and has just pressed save.</summary>
    private async Task<(IPage First, IPage Second, long Id)> ConflictAsync(string title)
    {
        var visitor = await ComeAsync();
        var first = visitor.Page;
        await visitor.OpenDemoAsync();
        var id = await first.SaveAsync(title);
        var second = await visitor.NewTabAsync();
        await second.GotoAsync($"/design/{id}");
        await second.SettledAsync();
        await first.EnterAsync(Diameter, "98");
        await first.SaveAsync(title, "two millimetres more", "F. Irst");
        await second.EnterAsync(Diameter, "94");
        await second.SayAndSaveAsync(title, "two millimetres less", "S. Econd");
        await Assertions.Expect(second.Locator("#conflict-dialog")).ToBeVisibleAsync();
        return (first, second, id);
    }

    /// <summary>The diameter of every stored revision, in order.</summary>
    private static async Task<IReadOnlyList<string>> DiametersAsync(IPage page, long id)
    {
        List<string> diameters = [];
        var design = await (await page.APIRequest.GetAsync($"/api/designs/{id}")).JsonAsync();
        for (var i = 1; i <= design!.Value.GetProperty("revisions").GetArrayLength(); i++)
        {
            var revision = await (await page.APIRequest.GetAsync($"/api/designs/{id}/revisions/{i}")).JsonAsync();
            diameters.Add(revision!.Value.GetProperty("design").GetProperty("core").GetProperty("limb").GetProperty("diameter_mm").GetRawText());
        }

        return diameters;
    }
}
