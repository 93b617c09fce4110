using CoreDesign.Estimating.Contracts;
using CoreDesign.History.Designs;

namespace CoreDesign.History.Tests.Designs;

public sealed class DesignListTests : IDisposable
{
    private readonly HistoryFile _history = new();

    private static CancellationToken Cancel => TestContext.Current.CancellationToken;

    public void Dispose() => _history.Dispose();

    [Theory]
    [InlineData("loss", "low,middle,high")]
    [InlineData("-loss", "high,middle,low")]
    [InlineData("changed", "middle,high,low")]
    [InlineData("-changed", "low,high,middle")]
    [InlineData("askedLoss", "low,high,middle")]
    [InlineData("-askedLoss", "high,low,middle")]
    [InlineData("title", "high,low,middle")]
    public async Task Sort_orders_by_the_column_and_puts_what_is_missing_last(string sort, string expected)
    {
        await Create("middle", loss: 500, asked: null);
        await Create("high", loss: 900, asked: 800);
        await Create("low", loss: 100, asked: 300);

        var page = await Find(new DesignQuery { Sort = sort });

        Assert.Equal(expected, string.Join(',', page.Items.Select(i => i.Title)));
    }

    [Fact]
    public async Task Every_sort_key_works_in_both_directions()
    {
        await Create("one");
        await Create("two");

        foreach (var key in DesignSort.Keys)
        {
            Assert.Equal(2, (await Find(new DesignQuery { Sort = key })).Items.Count);
            Assert.Equal(2, (await Find(new DesignQuery { Sort = "-" + key })).Items.Count);
        }
    }

    [Theory]
    [InlineData("halden", 1)]
    [InlineData("HALDEN", 1)]
    [InlineData("ÄRGER", 1)]
    [InlineData("halden ridge", 1)]
    [InlineData("ridge halden", 1)]
    [InlineData("halden nowhere", 0)]
    [InlineData("100%", 1)]
    [InlineData("%", 1)]
    [InlineData("_", 1)]
    [InlineData("\\", 1)]
    [InlineData("a_b", 1)]
    [InlineData("'; DROP TABLE Designs; --", 0)]
    [InlineData("tested later", 1)]
    public async Task Search_finds_words_in_title_note_and_remarks_and_takes_signs_as_they_are(string search, int count)
    {
        await Create("Halden Ridge station", note: "Ärger mit dem Spalt");
        await Create("Filled to 100%", note: "signs a_b and c\\d");
        var third = await Create("Plain");
        await _history.Designs.AddRemarkAsync(third.Id, 1, "Tested later", "desk 3", Cancel);

        var query = DesignQuery.Read(search, null, null, null, null, null, null).Value!;

        Assert.Equal(count, (await Find(query)).Total);
    }

    [Fact]
    public async Task List_shows_the_newest_revision_of_each_design_or_every_revision()
    {
        var design = await Create("One");
        await _history.Designs.SaveAsync(design.Id, 1, HistoryFile.Revision("One, mended"), Cancel);
        await Create("Two");

        Assert.Equal(["Two", "One, mended"], (await Find(new DesignQuery())).Items.Select(i => i.Title));
        Assert.Equal(3, (await Find(new DesignQuery { EveryRevision = true })).Total);
    }

    [Fact]
    public async Task Filters_by_state_steel_and_joint_narrow_the_list_and_the_choices_name_them()
    {
        await Create("One");
        await _history.Designs.CreateAsync(HistoryFile.Revision("Other", change: e => e with
        {
            Steel = e.Steel with { Grade = "M150-30S" },
            Joint = e.Joint with { Type = "buttLap" },
        }), Cancel);

        Assert.Equal("Other", Assert.Single((await Find(new DesignQuery { Steel = "M150-30S" })).Items).Title);
        Assert.Equal("Other", Assert.Single((await Find(new DesignQuery { Joint = "buttLap" })).Items).Title);
        Assert.Equal(2, (await Find(DesignQuery.Read(null, "draft", null, null, null, null, null).Value!)).Total);
        Assert.Equal(0, (await Find(DesignQuery.Read(null, "offered", null, null, null, null, null).Value!)).Total);
        var choices = await _history.Get<DesignList>().ChoicesAsync(Cancel);
        Assert.Contains("M150-30S", choices.Steels);
        Assert.Contains("buttLap", choices.Joints);
        Assert.Equal(2, choices.States["draft"]);
        Assert.Equal(2, choices.Total);
    }

    [Fact]
    public async Task Pages_share_no_row_and_miss_none_where_all_rows_sort_alike()
    {
        for (var i = 0; i < 7; i++) await Create($"Design {i}", loss: 100);

        var pages = new List<DesignPage>();
        for (var page = 1; page <= 4; page++) pages.Add(await Find(new DesignQuery { Sort = "loss", Page = page, PageSize = 2 }));

        Assert.Equal([2, 2, 2, 1], pages.Select(p => p.Items.Count));
        Assert.All(pages, p => Assert.Equal(7, p.Total));
        Assert.Equal(7, pages.SelectMany(p => p.Items).Select(i => i.Id).Distinct().Count());
    }

    [Theory]
    [InlineData("sort", "colour", "changed, id")]
    [InlineData("sort", "--loss", "changed, id")]
    [InlineData("state", "Draft", "draft, checked, offered, built, tested, withdrawn")]
    [InlineData("page", "0", "from 1 to 1000000")]
    [InlineData("page", "1e3", "from 1 to 1000000")]
    [InlineData("pageSize", "201", "from 1 to 200")]
    [InlineData("pageSize", "99999999999999999999", "from 1 to 200")]
    [InlineData("pageSize", "-1", "from 1 to 200")]
    [InlineData("revisions", "some", "'newest' or 'all'")]
    public void Query_with_a_wrong_part_names_it_its_value_and_what_is_known(string part, string value, string known)
    {
        string? Of(string name) => name == part ? value : null;

        var read = DesignQuery.Read(Of("search"), Of("state"), Of("steel"), Of("joint"), Of("sort"), Of("page"), Of("pageSize"), Of("revisions"));

        var error = Assert.Single(read.Errors);
        Assert.Equal(part, error.Path);
        Assert.Contains(value, error.Message, StringComparison.Ordinal);
        Assert.Contains(known, error.Message, StringComparison.Ordinal);
    }

    private Task<DesignPage> Find(DesignQuery query) => _history.Get<DesignList>().FindAsync(query, Cancel);

    private Task<RevisionInfo> Create(string title, double loss = 600, double? asked = 693, string note = "") =>
        _history.Designs.CreateAsync(
            HistoryFile.Revision(title, note, e => e with
            {
                NoLoadLoss_W = loss,
                Inputs = e.Inputs with { Order = (e.Inputs.Order ?? new OrderInput()) with { AskedNoLoadLoss_W = asked } },
            }),
            Cancel);
}
