using CoreDesign.Estimating.Steels;
using CoreDesign.Web.Features.Steels;

namespace CoreDesign.Web.Tests.SteelPages;

public sealed class SteelFilterTests
{
    private static readonly IReadOnlyList<SteelGrade> Steels = SteelLibrary.Catalog.All;

    [Fact]
    public void Empty_filter_shows_every_steel_and_has_a_plain_address()
    {
        var filter = SteelFilter.From(null, null, null);

        Assert.Equal(Steels.Count, filter.Of(Steels).Count);
        Assert.Equal("steels", filter.Uri);
    }

    [Fact]
    public void Name_is_found_in_any_case_and_with_blanks_around_it() =>
        Assert.All(Found(new(" m105-30p ", "", "")), s => Assert.Equal("M105-30P", s.Name));

    [Fact]
    public void Class_and_thickness_narrow_together()
    {
        var found = Found(new("", "domain refined", "0.23"));

        Assert.All(found, s => Assert.Equal(("domain refined", 0.23), (s.Class, s.Thickness_mm.Value)));
        Assert.Equal(Steels.Count(s => s.Class == "domain refined" && s.Thickness_mm.Value == 0.23), found.Count);
    }

    [Fact]
    public void Every_offered_thickness_finds_a_steel_and_none_is_offered_twice()
    {
        var offered = SteelFilter.Thicknesses(Steels);

        Assert.Equal(offered.Distinct(), offered);
        Assert.Equal(Steels.Count, offered.Sum(t => new SteelFilter("", "", t).Of(Steels).Count));
    }

    [Fact]
    public void Address_comes_back_from_what_it_writes()
    {
        var filter = new SteelFilter("M1 & #", "high permeability", "0.23");

        var query = System.Web.HttpUtility.ParseQueryString(filter.Uri[("steels?".Length)..]);

        Assert.Equal(filter, SteelFilter.From(query["search"], query["class"], query["thickness"]));
    }

    private static IReadOnlyList<SteelGrade> Found(SteelFilter filter)
    {
        var found = filter.Of(Steels);
        Assert.NotEmpty(found);
        return found;
    }
}
