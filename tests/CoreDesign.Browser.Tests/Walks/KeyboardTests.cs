using CoreDesign.Browser.Tests.Host;
using Microsoft.Playwright;

namespace CoreDesign.Browser.Tests.Walks;

/// <summary>The whole of the work without a pointer. Where the focus goes it must be seen.</summary>
public sealed class KeyboardTests(Site site) : BrowserTest(site)
{
    /// <summary>More stops than any page has; a walk that takes longer has lost its way.</summary>
    private const int MostStops = 150;

    // A heading takes the focus after navigation so that a reader says where one is; no key stops there.
    private const string FocusIsSeen = """
        () => {
          const at = document.activeElement;
          if (!at || at === document.body || at.tabIndex < 0) return true;
          const seen = e => { const s = getComputedStyle(e); return s.outlineStyle !== 'none' && parseFloat(s.outlineWidth) >= 1; };
          const box = at.getBoundingClientRect();
          return seen(at) && box.width > 0 && box.height > 0 && box.bottom > 0 && box.top < innerHeight;
        }
        """;

    private const string FocusName = "() => { const at = document.activeElement; return at.id || at.getAttribute('aria-label') || at.textContent.trim(); }";

    // What a person types into an empty design, in the form's order. Invented figures of a common size.
    private static readonly (string Path, string Text)[] Order =
    [
        ("order.reference", "KEYS-1"),
        ("core.form", "3-phase"),
        ("order.ratedPower_kVA", "250"),
        ("order.ratedVoltages_kV", "20 / 0.4"),
        ("order.highestVoltage_percent", "110"),
        ("order.frequency_Hz", "50"),
        ("order.askedNoLoadLoss_W", "420"),
        ("order.askedNoLoadCurrent_percent", "1,2"),
        ("steel.grade", "M110-23S"),
        ("core.stackingFactor", "0.955"),
        ("core.limb.diameter_mm", "158"),
        ("core.limb.steps", "6"),
        ("core.windowHeight_mm", "380"),
        ("core.windowWidth_mm", "130"),
        ("core.yoke.areaFactor", "1.05"),
        ("joint.type", "step"),
        ("joint.positions", "5"),
        ("joint.sheetsPerPosition", "2"),
        ("joint.gap_mm", "0.3"),
        ("joint.overlap_mm", "4"),
        ("joint.interface_um", "4"),
        ("excitedWinding.connection", "YN"),
        ("excitedWinding.lineVoltage_V", "400"),
        ("excitedWinding.turns", "36"),
        ("excitedWinding.resistance_ohm", "0.01"),
        ("model.buildingFactor", "1.15"),
        ("model.temperature_C", "40"),
    ];

    [Fact]
    public async Task An_empty_design_is_typed_field_by_field_until_it_answers_and_is_saved()
    {
        var page = (await ComeAtAsync("/design/new")).Page;
        foreach (var (path, text) in Order)
        {
            await TabToAsync(page, path);
            await page.Keyboard.TypeAsync(text);
        }

        await Assertions.Expect(page.Figure("No-load loss")).ToHaveTextAsync(new System.Text.RegularExpressions.Regex(@"^\d{3}$", System.Text.RegularExpressions.RegexOptions.None, TimeSpan.FromSeconds(1)));
        await page.AnsweredAsync();
        await Assertions.Expect(page.Locator(".fields .msg")).ToHaveCountAsync(0);
        await Assertions.Expect(page.OldFigures()).ToHaveCountAsync(0);
        foreach (var (path, text) in Order.Where(o => char.IsDigit(o.Text[0]) && o.Path != "core.form")) await Assertions.Expect(page.Field(path)).ToHaveValueAsync(text);
    }

    [Fact]
    public async Task From_a_demo_order_to_a_saved_revision_and_back_without_a_pointer()
    {
        var page = (await ComeAtAsync("/design")).Page;
        await TabToAsync(page, "HR-1021", exact: false);
        await page.Keyboard.PressAsync("Enter");
        await Assertions.Expect(page.Figure("No-load loss")).ToBeVisibleAsync();
        await page.AnsweredAsync();

        await TabToAsync(page, "core.limb.diameter_mm");
        await page.EditAsync(() => page.Keyboard.PressAsync("ArrowUp"));
        await Assertions.Expect(page.Field("core.limb.diameter_mm")).ToHaveValueAsync("97");
        await page.Keyboard.PressAsync("Tab");
        await page.EditAsync(() => page.Keyboard.PressAsync("Control+z"));
        await Assertions.Expect(page.Field("core.limb.diameter_mm")).ToHaveValueAsync("96");
        await page.EditAsync(() => page.Keyboard.PressAsync("Control+Shift+Z"));
        await Assertions.Expect(page.Field("core.limb.diameter_mm")).ToHaveValueAsync("97");

        await TabToAsync(page, "Save revision 1", back: true);
        await page.Keyboard.PressAsync("Enter");
        await Assertions.Expect(page.Locator("#save-dialog")).ToBeVisibleAsync();
        await page.Keyboard.PressAsync("Control+a");
        await page.Keyboard.TypeAsync("Keys 2");
        await page.Keyboard.PressAsync("Tab");
        await page.Keyboard.TypeAsync("one millimetre more");
        await page.Keyboard.PressAsync("Tab");
        await page.Keyboard.PressAsync("Control+a");
        await page.Keyboard.TypeAsync("K. Board");
        await page.Keyboard.PressAsync("Enter");
        var id = await page.SavedAsync();

        await TabToAsync(page, "History");
        await page.Keyboard.PressAsync("Enter");
        await Assertions.Expect(page.GetByRole(AriaRole.Heading, new() { Name = "Designs" })).ToBeFocusedAsync();
        await TabToAsync(page, "search");
        await page.Keyboard.TypeAsync("Keys 2");
        await Assertions.Expect(page.Locator(".ht tbody tr")).ToHaveCountAsync(1);
        await TabToAsync(page, "Keys 2");
        await page.Keyboard.PressAsync("Enter");
        await Assertions.Expect(page).ToHaveURLAsync($"/design/{id}/1");
        await Assertions.Expect(page.Field("core.limb.diameter_mm")).ToHaveValueAsync("97");
    }

    private async Task<Visitor> ComeAtAsync(string address)
    {
        var visitor = await ComeAsync();
        await visitor.GoAsync(address);
        return visitor;
    }

    /// <summary>Presses Tab until a part of that id, label or text has the focus; at every stop the focus must be seen.</summary>
    private static async Task TabToAsync(IPage page, string name, bool exact = true, bool back = false)
    {
        List<string> passed = [];
        for (var i = 0; i < MostStops; i++)
        {
            var at = await page.EvaluateAsync<string>(FocusName);
            if (exact ? at == name : at.StartsWith(name, StringComparison.Ordinal)) return;
            await page.Keyboard.PressAsync(back ? "Shift+Tab" : "Tab");
            Assert.True(await page.EvaluateAsync<bool>(FocusIsSeen), $"The focus is not seen at “{await page.EvaluateAsync<string>(FocusName)}”.");
            passed.Add(at);
        }

        Assert.Fail($"Tab never came to “{name}”; it came past: {string.Join(", ", passed)}");
    }
}
