using CoreDesign.Web.Features.History;

namespace CoreDesign.Web.Tests.HistoryPages;

public sealed class HistoryAddressTests
{
    [Fact]
    public void What_stands_at_its_default_is_left_out() => Assert.Equal("history", HistoryAddress.From(null, null, null, null, null, null).Uri);

    [Fact]
    public void Address_comes_back_from_what_it_writes()
    {
        var address = new HistoryAddress { Search = "50 % & ü#?", State = "draft", Steel = "M75-23P", Joint = "stepLap", Sort = "-loss", Page = 3 };

        var query = System.Web.HttpUtility.ParseQueryString(address.Uri[("history?".Length)..]);

        Assert.Equal(address, HistoryAddress.From(query["search"], query["state"], query["steel"], query["joint"], query["sort"], int.Parse(query["page"]!, System.Globalization.CultureInfo.InvariantCulture)));
    }

    [Fact]
    public void Filter_starts_at_the_first_page_and_keeps_the_others()
    {
        var narrowed = new HistoryAddress { Search = "town", Steel = "M75-23P", Page = 4 }.Narrowed(joint: "buttLap");

        Assert.Equal(new HistoryAddress { Search = "town", Steel = "M75-23P", Joint = "buttLap", Page = 1 }, narrowed);
    }

    [Fact]
    public void Column_sorts_from_its_own_side_first_and_turns_round()
    {
        var loss = new HistoryAddress().SortedBy("loss", largestFirst: true);

        Assert.Equal(("-loss", "descending"), (loss.Sort, loss.SortOf("loss")));
        Assert.Equal(("loss", "ascending"), (loss.SortedBy("loss", true).Sort, loss.SortedBy("loss", true).SortOf("loss")));
        Assert.Equal("title", loss.SortedBy("title", largestFirst: false).Sort);
        Assert.Null(loss.SortOf("title"));
    }

    [Theory]
    [InlineData("state", "gone")]
    [InlineData("sort", "colour")]
    [InlineData("page", "0")]
    public void What_cannot_be_read_is_named(string field, string value)
    {
        var address = HistoryAddress.From(null, field == "state" ? value : null, null, null, field == "sort" ? value : null, field == "page" ? 0 : null);

        var error = Assert.Single(address.Query().Errors);

        Assert.Equal(field, error.Path);
        Assert.Contains($"'{value}'", error.Message, StringComparison.Ordinal);
    }
}
