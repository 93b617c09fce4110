using System.Globalization;
using CoreDesign.Browser.Tests.Host;
using Microsoft.Playwright;

namespace CoreDesign.Browser.Tests.Walks;

/// <summary>The margins come after the verdict, follow what is typed, and are kept with the revision.</summary>
public sealed class MarginsTests(Site site) : BrowserTest(site)
{
    [Fact]
    public async Task Margins_follow_what_is_typed_and_are_kept()
    {
        var visitor = await ComeAsync();
        var page = visitor.Page;
        await visitor.OpenDemoAsync();
        var worst = await InrushAsync(page);
        await page.EnterAsync("margins.inrush.residual_percent", "30");
        var less = await InrushAsync(page);
        Assert.True(less < 0.9 * worst, $"{less} A with 30 % residual flux, {worst} A with 80 %");

        await Assertions.Expect(page.Locator("[data-chart=dc-bias]")).ToHaveCountAsync(0);
        await page.EnterAsync("margins.dcBias_A", "2");
        await Assertions.Expect(page.Locator("[data-chart=dc-bias]")).ToBeVisibleAsync();
        await Assertions.Expect(Row(page, "With 2 A direct")).ToContainTextAsync("T in Limb A");

        await page.EnterAsync("order.lowestFrequency_Hz", "60");
        await Assertions.Expect(page.Locator(".fields .msg")).ToHaveTextAsync("Lowest frequency 60 Hz is above the rated frequency of 50 Hz. Enter at most the rated one, or leave it open. The figures still stand for 50 Hz.");
        await page.EnterAsync("order.lowestFrequency_Hz", "47.5");
        await Assertions.Expect(Row(page, "At 110 % voltage and 47.5 Hz")).ToContainTextAsync("T at core temperature");
        Assert.Equal(less, await InrushAsync(page));

        var id = await page.SaveAsync("With direct current");
        await visitor.GoAsync($"/design/{id}");
        Assert.Equal(less, await InrushAsync(page));
        await Assertions.Expect(page.Locator("[data-chart=dc-bias]")).ToBeVisibleAsync();
    }

    private static async Task<double> InrushAsync(IPage page)
    {
        await Assertions.Expect(page.Locator("[data-margins=solved]")).ToBeVisibleAsync();
        var text = await Row(page, "First inrush peak, solved").Locator(".fig").InnerTextAsync();
        return double.Parse(text.Replace("A", "", StringComparison.Ordinal).Replace("\u2009", "", StringComparison.Ordinal), CultureInfo.InvariantCulture);
    }

    private static ILocator Row(IPage page, string name) =>
        page.Locator("[data-margins] tr").Filter(new() { Has = page.GetByRole(AriaRole.Rowheader, new() { Name = name, Exact = true }) });
}
