using Bunit;
using CoreDesign.History.Designs;
using CoreDesign.Web.Features.History;

namespace CoreDesign.Web.Tests.HistoryPages;

public sealed class HistoryFiltersTests : BunitContext
{
    private readonly List<HistoryAddress> asked = [];

    [Fact]
    public async Task Typing_waits_for_a_pause_and_asks_once_for_what_stands_there_then()
    {
        var filters = Show();

        // In one go, so that no rendering for an earlier letter comes between finding the field and typing in it.
        await filters.InvokeAsync(() =>
        {
            foreach (var text in new[] { "t", "to", " town " }) filters.Find("#search").Input(text);
            Assert.Empty(asked);
        });

        filters.WaitForAssertion(() => Assert.Equal("town", Assert.Single(asked).Search), TimeSpan.FromSeconds(10));
    }

    [Fact]
    public void Enter_asks_at_once()
    {
        var filters = Show();
        filters.Find("#search").Input("town");

        filters.Find("form").Submit();

        Assert.Equal("town", asked[0].Search);
    }

    [Fact]
    public void Each_filter_narrows_and_starts_at_the_first_page()
    {
        var filters = Show(new HistoryAddress { Search = "town", Page = 3 });

        filters.Find("#steel").Change("M75-23P");
        filters.Find("#joint").Change("stepLap");
        filters.FindAll("input[name=state]")[1].Change(true);

        Assert.Equal(["M75-23P", "", ""], asked.Select(a => a.Steel));
        Assert.Equal(["", "stepLap", ""], asked.Select(a => a.Joint));
        Assert.Equal("draft", asked[2].State);
        Assert.All(asked, a => Assert.Equal(("town", 1), (a.Search, a.Page)));
    }

    [Fact]
    public void States_without_a_design_are_not_offered_unless_one_is_chosen()
    {
        Assert.Equal(["all30", "draft28", "checked2"], Words(Show()));
        Assert.Equal(["all30", "draft28", "checked2", "withdrawn0"], Words(Show(new HistoryAddress { State = "withdrawn" })));

        static IEnumerable<string> Words(IRenderedComponent<HistoryFilters> filters) => filters.FindAll(".seg span").Select(s => s.TextContent);
    }

    [Theory]
    [InlineData(30, "30 designs")]
    [InlineData(4, "4 of 30 designs")]
    [InlineData(0, "0 of 30 designs")]
    public void Count_says_how_many_of_how_many(int found, string words) =>
        Assert.Equal(words, Show(shown: new DesignPage([], found, 1, 25)).Find(".count").TextContent);

    [Fact]
    public void Address_that_changes_from_outside_is_shown()
    {
        var filters = Show(new HistoryAddress { Search = "town" });

        filters.Render(p => p.Add(x => x.Address, new HistoryAddress { Search = "pump" }));

        Assert.Equal("pump", filters.Find("#search").GetAttribute("value"));
    }

    private IRenderedComponent<HistoryFilters> Show(HistoryAddress? address = null, DesignPage? shown = null) => Render<HistoryFilters>(p => p
        .Add(x => x.Address, address ?? new HistoryAddress())
        .Add(x => x.Choices, new DesignChoices(new Dictionary<string, int> { ["draft"] = 28, ["checked"] = 2, ["withdrawn"] = 0 }, ["M75-23P", "M4"], ["stepLap", "buttLap"], 30))
        .Add(x => x.Shown, shown)
        .Add(x => x.Go, asked.Add));
}
