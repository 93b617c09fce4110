using CoreDesign.Browser.Tests.Host;
using Microsoft.Playwright;

namespace CoreDesign.Browser.Tests.Walks;

/// <summary>How figures are typed, taken back and tried.</summary>
public sealed class EditingTests(Site site) : BrowserTest(site)
{
    private const string Height = "core.windowHeight_mm";
    private const string Diameter = "core.limb.diameter_mm";

    [Fact]
    public async Task A_decimal_comma_counts_and_a_thousands_mark_is_asked_about()
    {
        var visitor = await ComeAsync();
        var page = visitor.Page;
        await visitor.OpenDemoAsync();
        await page.EnterAsync(Height, "190.5");
        var loss = await page.Figure("No-load loss").InnerTextAsync();
        await page.EnterAsync(Height, "190,5");
        await Assertions.Expect(page.Figure("No-load loss")).ToHaveTextAsync(loss);
        await Assertions.Expect(page.Locator(".fields .msg")).ToHaveCountAsync(0);

        await page.EnterAsync("order.ratedPower_kVA", "1,000");
        await Assertions.Expect(page.Locator(".hint-line")).ToHaveTextAsync("Read as 1. For a thousand write 1000.");
        await page.EnterAsync("order.ratedPower_kVA", "1.000,5");
        await Assertions.Expect(page.Locator(".fields .msg")).ToContainTextAsync("has 2 commas or points");
        await page.EnterAsync("order.ratedPower_kVA", "1 000");
        await Assertions.Expect(page.Locator(".who")).ToContainTextAsync("1000 kVA");
        await Assertions.Expect(page.Locator(".fields .msg, .hint-line")).ToHaveCountAsync(0);
    }

    [Fact]
    public async Task Undo_and_redo_go_through_the_edits_with_their_figures()
    {
        var visitor = await ComeAsync();
        var page = visitor.Page;
        await visitor.OpenDemoAsync();
        string[] texts = ["96", "98", "100"];
        List<string> losses = [await page.Figure("No-load loss").InnerTextAsync()];
        foreach (var text in texts[1..])
        {
            await page.EnterAsync(Diameter, text);
            await page.Field(Diameter).BlurAsync();
            losses.Add(await page.Figure("No-load loss").InnerTextAsync());
        }

        Assert.Equal(3, losses.Distinct().Count());
        var undo = page.GetByRole(AriaRole.Button, new() { Name = "Undo" });
        var redo = page.GetByRole(AriaRole.Button, new() { Name = "Redo" });
        foreach (var i in (int[])[1, 0])
        {
            await page.EditAsync(() => undo.ClickAsync());
            await Assertions.Expect(page.Field(Diameter)).ToHaveValueAsync(texts[i]);
            await Assertions.Expect(page.Figure("No-load loss")).ToHaveTextAsync(losses[i]);
        }

        await Assertions.Expect(undo).ToBeDisabledAsync();
        foreach (var i in (int[])[1, 2])
        {
            await page.EditAsync(() => redo.ClickAsync());
            await Assertions.Expect(page.Field(Diameter)).ToHaveValueAsync(texts[i]);
            await Assertions.Expect(page.Figure("No-load loss")).ToHaveTextAsync(losses[i]);
        }

        await Assertions.Expect(redo).ToBeDisabledAsync();
    }

    [Fact]
    public async Task A_lever_brings_what_it_promises_and_undo_takes_it_back()
    {
        var visitor = await ComeAsync();
        var page = visitor.Page;
        await visitor.OpenDemoAsync();
        await page.SaveAsync("Levers one");
        var loss = await page.Figure("No-load loss").InnerTextAsync();
        var row = page.Locator(".lv tbody tr").First;
        var lever = row.GetByRole(AriaRole.Button);
        await Assertions.Expect(lever).ToBeEnabledAsync();
        var promised = await row.Locator("td").Nth(1).InnerTextAsync();
        await page.EditAsync(() => lever.ClickAsync());
        await Assertions.Expect(page.Locator(".verdict .vd").First.Locator(".chg b")).ToHaveTextAsync($"{promised} W");
        await page.EditAsync(() => page.GetByRole(AriaRole.Button, new() { Name = "Undo" }).ClickAsync());
        await Assertions.Expect(page.Figure("No-load loss")).ToHaveTextAsync(loss);
        await Assertions.Expect(page.Locator(".verdict .chg")).ToHaveCountAsync(0);
    }

    [Fact]
    public async Task Turns_are_released_to_those_of_a_wanted_flux_density_and_not_before_there_is_one()
    {
        var visitor = await ComeAsync();
        var page = visitor.Page;
        await visitor.OpenDemoAsync();
        var turns = page.Field("excitedWinding.turns");
        var release = page.GetByRole(AriaRole.Button, new() { Name = "Turns: Pinned" });
        await Assertions.Expect(release).ToHaveCountAsync(0);
        await page.EnterAsync("form.wantedFluxDensity_T", "1.4");
        await page.EditAsync(() => release.ClickAsync());
        await Assertions.Expect(turns).ToHaveValueAsync("");
        await Assertions.Expect(turns).ToHaveAttributeAsync("placeholder", "118");
        await Assertions.Expect(page.OldFigures()).ToHaveCountAsync(0);
    }

    [Fact]
    public async Task The_verdict_stays_in_sight_in_small_while_the_evidence_is_read()
    {
        var visitor = await ComeAsync();
        var page = visitor.Page;
        await visitor.OpenDemoAsync();
        var pinned = page.Locator(".pinned");
        await Assertions.Expect(pinned).ToBeHiddenAsync();
        await page.Locator("[data-evidence]").ScrollIntoViewIfNeededAsync();
        await page.Mouse.WheelAsync(0, 4000);
        await Assertions.Expect(pinned).ToBeVisibleAsync();
        await Assertions.Expect(pinned).ToContainTextAsync(await page.Figure("No-load loss").InnerTextAsync());
        await Assertions.Expect(pinned).ToBeInViewportAsync();
    }
}
