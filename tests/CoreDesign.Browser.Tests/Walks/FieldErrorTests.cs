using System.Globalization;
using CoreDesign.Browser.Tests.Host;
using CoreDesign.Estimating.Fields;
using Microsoft.Playwright;

namespace CoreDesign.Browser.Tests.Walks;

public sealed class FieldErrorTests(Site site) : BrowserTest(site)
{
    /// <summary>The form asks for the number of phases by the kind of core, which is chosen and can't be mistyped.</summary>
    private const string Chosen = "order.phases";

    private const string NoNumber = "twelve";

    /// <summary>Fields of other core forms and connections than the demo order's.</summary>
    private static readonly string[] OfSinglePhase = ["core.units", "core.woundLimbs"];

    private static readonly string[] OfFiveLimbs = ["core.returnLimb.areaFactor", "core.returnWindowWidth_mm", "model.zeroSequenceReactance_pu"];

    [Fact]
    public async Task Every_field_says_what_is_wrong_keeps_the_last_figures_and_takes_the_mend()
    {
        var visitor = await ComeAsync();
        var page = visitor.Page;
        await visitor.OpenDemoAsync("town-400");
        await page.GetByRole(AriaRole.Button, new() { Name = "…" }).ClickAsync();
        await page.EditAsync(() => page.GetByRole(AriaRole.Button, new() { Name = "Type the steps by hand" }).ClickAsync());
        await page.GetByRole(AriaRole.Button, new() { Name = "Taps and other windings" }).ClickAsync();
        await page.EditAsync(() => page.Field("tertiary.connection").SelectOptionAsync("D"));
        await page.EditAsync(() => page.Field("otherWinding.connection").SelectOptionAsync("D"));
        await page.EditAsync(() => page.Field("otherWinding.lineVoltage_V").FillAsync("20000"));
        await page.EditAsync(() => page.Field("capacitance.phase_nF").FillAsync("4"));
        await TryEveryFieldAsync(page, FieldCatalog.All.Where(f => f.Path != Chosen && !OfSinglePhase.Contains(f.Path) && !OfFiveLimbs.Contains(f.Path)));
    }

    [Fact]
    public async Task Fields_of_other_core_forms_say_what_is_wrong_too()
    {
        var visitor = await ComeAsync();
        var page = visitor.Page;
        await visitor.OpenDemoAsync();
        await page.EditAsync(() => page.Field("core.form").SelectOptionAsync("fiveLimb"));
        await TryEveryFieldAsync(page, OfFiveLimbs.Select(FieldCatalog.Find));
        await page.EditAsync(() => page.Field("core.form").SelectOptionAsync("singlePhaseTwoLimb"));
        await TryEveryFieldAsync(page, OfSinglePhase.Select(FieldCatalog.Find));
    }

    private static async Task TryEveryFieldAsync(IPage page, IEnumerable<Field> fields)
    {
        foreach (var field in fields)
        {
            var input = await InputOfAsync(page, field);
            var typed = await input.InputValueAsync();
            var mend = typed.Length > 0 ? typed : await input.GetAttributeAsync("placeholder") ?? "";

            // A derived value is pinned as it is shown, rounded, so only a typed one brings back the very same figure.
            var loss = await page.Figure("No-load loss").InnerTextAsync();
            string[] wrong = [NoNumber, Below(field), Above(field)];
            foreach (var text in wrong)
            {
                await page.EditAsync(() => input.FillAsync(text));
                await AssertRefusedAsync(page, input, field, text);
                await Assertions.Expect(page.OldFigures()).ToHaveCountAsync(1);
                if (typed.Length > 0) await Assertions.Expect(page.Figure("No-load loss")).ToHaveTextAsync(loss);
            }

            await page.EditAsync(() => input.FillAsync(mend));
            await Assertions.Expect(input).Not.ToHaveAttributeAsync("aria-invalid", "true");
            await Assertions.Expect(page.Locator(".fields .msg")).ToHaveCountAsync(0);
            await Assertions.Expect(page.OldFigures()).ToHaveCountAsync(0);
            if (typed.Length > 0) await Assertions.Expect(page.Figure("No-load loss")).ToHaveTextAsync(loss);
        }
    }

    private static async Task AssertRefusedAsync(IPage page, ILocator input, Field field, string text)
    {
        await Assertions.Expect(input).ToHaveAttributeAsync("aria-invalid", "true");
        var described = (await input.GetAttributeAsync("aria-describedby") ?? "").Split(' ');
        var messages = await page.Locator(".fields .msg").AllAsync();
        var message = Assert.Single(messages);
        Assert.Contains(await message.GetAttributeAsync("id"), described);
        var words = await message.InnerTextAsync();
        Assert.Contains(field.Label, words, StringComparison.Ordinal);
        Assert.Contains(text.Replace("\u2212", "-", StringComparison.Ordinal), words, StringComparison.Ordinal);
        Assert.Contains(field.Range, words, StringComparison.Ordinal);
        Assert.Contains(text == NoNumber ? "Write digits" : "Enter a value within the range", words, StringComparison.Ordinal);
    }

    /// <summary>The input of a field of the catalogue; of a list that is a table, its first cell.</summary>
    private static async Task<ILocator> InputOfAsync(IPage page, Field field)
    {
        var cell = page.Field(field.Path.Replace("[]", "[0]", StringComparison.Ordinal));
        if (await cell.CountAsync() == 1) return cell;
        var list = page.Field(field.Path.Replace("[]", "", StringComparison.Ordinal));
        Assert.True(await list.CountAsync() == 1, $"The page has no input for {field.Path}, {field.Label}.");
        return list;
    }

    private static string Below(Field field) => Text(field.Min > 0 ? field.Min / 2 : field.Min - 1);

    private static string Above(Field field) => Text(field.Max + 1);

    private static string Text(double value) => value.ToString("R", CultureInfo.InvariantCulture);
}
