using CoreDesign.Browser.Tests.Host;
using Microsoft.Playwright;

namespace CoreDesign.Browser.Tests.Looks;

/// <summary>
/// Every place, light and dark, in the sizes that must be readable (1280 x 800, 1024 x 768) and usable (800 wide). One visit for all, because
/// getting into a state costs more than looking; so a failure lists everything that is wrong there.
/// </summary>
public abstract class PlaceTests(Site site, Records records) : BrowserTest(site)
{
    private static readonly (int Width, int Height)[] Sizes = [(1280, 800), (1024, 768), (800, 1000)];

    protected async Task HoldsAsync(string name)
    {
        var place = Places.Find(name);
        var visitor = await ComeAsync(server: await records.ServerAsync(place));
        if (place.Expected is { } expected) visitor.Expect(expected);
        await visitor.GoAsync(place.Address);
        await place.Enter(visitor);
        var found = new List<string>();
        foreach (var (width, height) in Sizes)
        {
            await visitor.Page.ResizeAsync(width, height);
            found.AddRange((await visitor.Page.MisfitsAsync()).Select(m => $"{width} x {height}: {m}"));
        }

        await visitor.Page.ResizeAsync(1280, 800);
        await visitor.ShotAsync($"{place}-light", wholePage: true);
        found.AddRange((await visitor.Page.BarriersAsync()).Select(b => $"light: {b}"));
        await visitor.Page.EmulateMediaAsync(new() { ColorScheme = ColorScheme.Dark });
        await visitor.ShotAsync($"{place}-dark", wholePage: true);
        found.AddRange((await visitor.Page.ColourBarriersAsync()).Select(b => $"dark: {b}"));
        Assert.True(found.Count == 0, $"{place.Address}\n{string.Join('\n', found)}");
    }
}

/// <summary>The states of the design page.</summary>
public sealed class DesignPlaceTests(Site site, Records records) : PlaceTests(site, records)
{
    public static TheoryData<string> Names => [.. Places.Design.Select(p => p.Name)];

    [Theory]
    [MemberData(nameof(Names))]
    public Task Place_has_no_barrier_and_nothing_is_cut_off(string name) => HoldsAsync(name);
}

/// <summary>The states of the page for circuits of one's own.</summary>
public sealed class TrialPlaceTests(Site site, Records records) : PlaceTests(site, records)
{
    public static TheoryData<string> Names => [.. Places.Trials.Select(p => p.Name)];

    [Theory]
    [MemberData(nameof(Names))]
    public Task Place_has_no_barrier_and_nothing_is_cut_off(string name) => HoldsAsync(name);
}

/// <summary>All other pages.</summary>
public sealed class OtherPlaceTests(Site site, Records records) : PlaceTests(site, records)
{
    public static TheoryData<string> Names => [.. Places.Others.Select(p => p.Name)];

    [Theory]
    [MemberData(nameof(Names))]
    public Task Place_has_no_barrier_and_nothing_is_cut_off(string name) => HoldsAsync(name);
}
