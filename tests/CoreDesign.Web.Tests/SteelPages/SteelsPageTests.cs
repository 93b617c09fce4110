using Bunit;
using Bunit.TestDoubles;
using CoreDesign.Estimating.Steels;
using CoreDesign.Web.Features.Steels;
using CoreDesign.Web.Tests.HistoryPages;
using Microsoft.Extensions.DependencyInjection;

namespace CoreDesign.Web.Tests.SteelPages;

public sealed class SteelsPageTests : BunitContext
{
    private readonly KeptDesigns kept = new();

    public SteelsPageTests()
    {
        Services.AddSingleton(kept.Shelf());
        JSInterop.Mode = JSRuntimeMode.Loose;
    }

    [Fact]
    public void Every_steel_stands_in_the_table_with_the_standing_of_its_curves()
    {
        var page = Render<SteelsPage>();

        Assert.Equal(SteelLibrary.Catalog.All.Count, page.FindAll("tbody tr").Count);
        Assert.Equal($"{SteelLibrary.Catalog.All.Count} steels", page.Find(".count").TextContent);
        Assert.All(page.FindAll("tbody tr"), r => Assert.Equal(SteelStanding.Representative, r.LastElementChild!.TextContent));
    }

    [Fact]
    public void List_says_what_a_representative_curve_is_worth() =>
        Assert.Contains("replace by your certificate before you quote", Render<SteelsPage>().Markup, StringComparison.Ordinal);

    [Fact]
    public void Figure_that_is_not_guaranteed_is_left_blank()
    {
        // The ASTM A876 set guarantees losses at 60 Hz only, as its table says.
        var row = Render<SteelsPage>().FindAll("tbody tr").Single(r => r.FirstElementChild!.TextContent == "M-4");

        Assert.Equal("", row.Children[4].TextContent);
        Assert.Equal("not guaranteed", row.Children[4].GetAttribute("title"));
        Assert.NotEqual("", row.Children[6].TextContent);
    }

    [Fact]
    public void Filters_go_into_the_address()
    {
        var page = Render<SteelsPage>();
        var navigation = Services.GetRequiredService<BunitNavigationManager>();

        page.Find("#search").Input("M105");
        Assert.EndsWith("steels?search=M105", navigation.Uri, StringComparison.Ordinal);
        page.WaitForAssertion(() => Assert.All(page.FindAll("tbody tr td:first-child"), c => Assert.Contains("M105", c.TextContent, StringComparison.Ordinal)));
        page.Find("#thickness").Change("0.30");
        Assert.EndsWith("thickness=0.30", navigation.Uri, StringComparison.Ordinal);
    }

    [Fact]
    public void Nothing_found_says_what_to_do()
    {
        Services.GetRequiredService<BunitNavigationManager>().NavigateTo("steels?search=zzz");

        var page = Render<SteelsPage>();

        Assert.Equal("No steel matches", page.Find(".empty h2").TextContent);
        Assert.Equal(["steels", "steels/import"], page.FindAll(".empty a").Select(a => a.GetAttribute("href")));
    }

    [Fact]
    public void Page_of_a_grade_draws_its_curves_and_names_the_source_of_every_figure()
    {
        var page = Render<SteelPage>(p => p.Add(x => x.Grade, "M105-30P"));

        Assert.Contains(SteelStanding.RepresentativeText, page.Find(".standing").TextContent, StringComparison.Ordinal);
        Assert.Equal(2, page.FindAll("figure svg").Count);
        Assert.All(page.FindAll(".figs .t")[0].QuerySelectorAll("tbody tr"), r => Assert.NotEqual("", r.LastElementChild!.TextContent));
    }

    [Fact]
    public void Unknown_grade_is_met_with_the_nearest_names()
    {
        var page = Render<SteelPage>(p => p.Add(x => x.Grade, "M105-30X"));

        Assert.Contains("M105-30P", page.FindAll("a.near").Select(a => a.TextContent));
    }

    protected override void Dispose(bool disposing)
    {
        base.Dispose(disposing);
        if (disposing) kept.Dispose();
    }
}
