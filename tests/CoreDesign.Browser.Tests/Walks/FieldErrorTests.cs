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

    [Fact]
    public async Task Every_field_says_what_is_wrong_keeps_the_last_figures_and_takes_the_mend()
    {
        var visitor = await ComeAsync();
        var page = visitor.Page;
        await visitor.OpenDemoAsync();
        await page.GetByRole(AriaRole.Button, new() { Name = "…" }).ClickAsync();
        await page.EditAsync(() => page.GetByRole(AriaRole.Button, new() { Name = "Type the steps by hand" }).ClickAsync());
        foreach (var field in FieldCatalog.All.Where(f => f.Path != Chosen))
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
