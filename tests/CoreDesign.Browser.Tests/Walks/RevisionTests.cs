using System.Text.RegularExpressions;
using CoreDesign.Browser.Tests.Host;
using Microsoft.Playwright;

namespace CoreDesign.Browser.Tests.Walks;

/// <summary>What was saved stays as it was, and can be gone on from.</summary>
public sealed partial class RevisionTests(Site site) : BrowserTest(site)
{
    private const string Diameter = "core.limb.diameter_mm";

    [Fact]
    public async Task An_old_revision_opens_with_its_own_figures_and_can_be_copied()
    {
        var visitor = await ComeAsync();
        var page = visitor.Page;
        await visitor.OpenDemoAsync();
        var id = await page.SaveAsync("Record one", "as ordered");
        var loss = await page.Figure("No-load loss").InnerTextAsync();
        await page.EnterAsync(Diameter, "100");
        await Assertions.Expect(page.Strip()).ToContainTextAsync("since rev. 1");
        await page.SaveAsync("Record one", "four millimetres more");
        var later = await page.Figure("No-load loss").InnerTextAsync();
        Assert.NotEqual(loss, later);

        await visitor.GoAsync($"/designs/{id}");
        await Assertions.Expect(page.Locator(".ht tbody tr")).ToHaveCountAsync(2);
        await page.GetByRole(AriaRole.Link, new() { Name = "Open revision 1", Exact = true }).ClickAsync();
        await Assertions.Expect(page).ToHaveURLAsync($"/design/{id}/1");
        await Assertions.Expect(page.Figure("No-load loss")).ToHaveTextAsync(loss);
        await Assertions.Expect(page.Locator(".verdict .banner")).ToContainTextAsync("Revision 1 of 2");
        await Assertions.Expect(page.Locator(".verdict .banner")).ToContainTextAsync("Today's kernel gives the same figures.");

        await visitor.GoAsync($"/designs/{id}?revision=1");
        await page.GetByRole(AriaRole.Button, new() { Name = "Copy to a new design" }).ClickAsync();
        await Assertions.Expect(page).ToHaveURLAsync(new Regex("/design/[0-9]+/1$", RegexOptions.None, TimeSpan.FromSeconds(1)));
        Assert.NotEqual(id.ToString(System.Globalization.CultureInfo.InvariantCulture), FirstRevision().Match(page.Url).Groups["id"].Value);
        await Assertions.Expect(page.Field(Diameter)).ToHaveValueAsync("96");
        await Assertions.Expect(page.Figure("No-load loss")).ToHaveTextAsync(loss);
    }

    [Fact]
    public async Task A_note_is_added_to_a_revision_and_an_empty_one_is_refused()
    {
        var visitor = await ComeAsync();
        var page = visitor.Page;
        await visitor.OpenDemoAsync();
        var id = await page.SaveAsync("Record two");
        await visitor.GoAsync($"/designs/{id}");
        await page.GetByRole(AriaRole.Button, new() { Name = "Add note" }).ClickAsync();
        await Assertions.Expect(page.Locator("#note-m")).ToBeVisibleAsync();
        await Assertions.Expect(page.Locator("#note")).ToHaveAttributeAsync("aria-invalid", "true");
        await page.Locator("#note").FillAsync("Measured in the test field: 44 W.");
        await page.GetByRole(AriaRole.Button, new() { Name = "Add note" }).ClickAsync();
        await Assertions.Expect(page.Locator(".card .notes li")).ToContainTextAsync("Measured in the test field: 44 W.");
        await Assertions.Expect(page.Locator("#note")).ToHaveValueAsync("");
        await page.ReloadAsync();
        await Assertions.Expect(page.Locator(".card .notes li")).ToHaveCountAsync(1);
    }

    [GeneratedRegex(@"/design/(?<id>\d+)/1$", RegexOptions.ExplicitCapture, 1000)]
    private static partial Regex FirstRevision();
}
