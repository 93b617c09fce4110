using Bunit;
using CoreDesign.History.Designs;
using CoreDesign.History.Model;
using CoreDesign.Web.Features.History;

namespace CoreDesign.Web.Tests.HistoryPages;

public sealed class HistoryTableTests : BunitContext
{
    private static readonly RevisionInfo Row = new()
    {
        Id = 7,
        Revision = 3,
        Title = "Station <1>",
        State = DesignState.Draft,
        CreatedAt = new DateTime(2026, 3, 1, 8, 5, 9, DateTimeKind.Utc),
        Author = "this desk",
        Note = "",
        Reference = "HR-1",
        Rating = "1000 kVA, 20/0.4 kV",
        Phases = 3,
        RatedPower_kVA = 1000,
        Form = "threeLimb",
        Steel = "M75-23P",
        JointType = "stepLap",
        JointPositions = 5,
        LimbPeakFluxDensity_T = 1.6854,
        NoLoadLoss_W = 1098.4,
        AskedNoLoadLoss_W = 1050,
        NoLoadCurrent_percent = 0.2412,
        AskedNoLoadCurrent_percent = 0.3,
        Mass_kg = 910.2,
        MarginAtRated_percent = 16.7,
        MarginAtHighest_percent = 8.4,
        KernelVersion = "1.0.0",
        SteelDataRevision = "0123456789ab",
    };

    [Fact]
    public void Row_opens_its_revision_and_leads_to_its_record()
    {
        var table = Show([Row]);

        Assert.Equal("Station <1>", table.Find("td.name a").TextContent);
        Assert.Equal("design/7/3", table.Find("td.name a").GetAttribute("href"));
        Assert.Equal("designs/7", table.Find("td.acts a").GetAttribute("href"));
        Assert.Equal("2026-03-01T08:05:09Z", table.Find("time").GetAttribute("datetime"));
    }

    [Fact]
    public void Figure_over_its_limit_is_said_in_words_and_one_below_it_is_not()
    {
        var cells = Show([Row]).FindAll("td").Where(c => c.TextContent.Contains("over", StringComparison.Ordinal)).ToList();

        Assert.Equal("over 1\u2009098", Assert.Single(cells).TextContent);
        Assert.Contains("bad", cells[0].ClassList);
    }

    [Fact]
    public void Limit_that_was_not_asked_for_is_blank_and_never_exceeded()
    {
        var table = Show([Row with { AskedNoLoadLoss_W = null }]);

        Assert.DoesNotContain("over", table.Find("tbody").TextContent, StringComparison.Ordinal);
    }

    [Fact]
    public void Sorted_column_says_so_and_every_head_sorts()
    {
        var asked = new List<HistoryAddress>();
        var table = Show([Row], new HistoryAddress { Sort = "-loss", Page = 2 }, asked.Add);

        var sorted = Assert.Single(table.FindAll("th[aria-sort]"));
        Assert.Equal("descending", sorted.GetAttribute("aria-sort"));
        var heads = table.FindAll("th button").Count;
        for (var i = 0; i < heads; i++)
        {
            table.FindAll("th button")[i].Click();
        }

        Assert.Equal(heads, asked.Count);
        Assert.Equal("loss", Assert.Single(asked, a => a.Sort.TrimStart('-') == "loss").Sort);
        Assert.All(asked, a => Assert.Empty(a.Query().Errors));
        Assert.All(asked, a => Assert.Equal(1, a.Page));
    }

    [Fact]
    public void Copy_hands_on_the_row()
    {
        RevisionInfo? copied = null;
        var table = Render<HistoryTable>(p => p.Add(x => x.Rows, [Row]).Add(x => x.Go, _ => { }).Add(x => x.Copy, r => copied = r));

        table.Find("td.acts button").Click();

        Assert.Equal(Row, copied);
        Assert.Equal("Copy Station <1>, revision 3, to a new design", table.Find("td.acts button").GetAttribute("aria-label"));
    }

    private IRenderedComponent<HistoryTable> Show(IReadOnlyList<RevisionInfo> rows, HistoryAddress? address = null, Action<HistoryAddress>? go = null) => Render<HistoryTable>(p => p
        .Add(x => x.Rows, rows)
        .Add(x => x.Address, address ?? new HistoryAddress())
        .Add(x => x.Go, go ?? (_ => { }))
        .Add(x => x.Copy, _ => { }));
}
