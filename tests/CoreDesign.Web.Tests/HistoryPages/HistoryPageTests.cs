using Bunit;
using Bunit.TestDoubles;
using CoreDesign.Web.Features.History;
using Microsoft.Extensions.DependencyInjection;

namespace CoreDesign.Web.Tests.HistoryPages;

/// <summary>The history page on a file with thirty designs.</summary>
public sealed class HistoryPageTests : BunitContext
{
    private readonly KeptDesigns kept = new();

    public HistoryPageTests() => Services.AddSingleton(kept.Designs).AddSingleton(kept.List).AddSingleton(kept.Settings);

    [Fact]
    public void Empty_history_offers_a_first_design_and_the_demo_orders()
    {
        var page = Render<HistoryPage>();

        page.WaitForAssertion(() => Assert.Equal("No design is saved yet", page.Find(".empty h2").TextContent));
        Assert.Contains("design?demo=village-100", page.FindAll(".empty a").Select(a => a.GetAttribute("href")));
        Assert.Empty(page.FindAll("table"));
    }

    [Fact]
    public async Task Long_history_comes_page_by_page_newest_first()
    {
        await FillAsync();

        var page = At("history");
        Assert.Equal(HistoryAddress.PageSize, page.FindAll("tbody tr").Count);
        Assert.Equal("Station 30", page.Find("td.name a").TextContent);
        Assert.Equal("30 designs", page.Find(".count").TextContent);
        Assert.Equal("history?page=2", page.Find("a[rel=next]").GetAttribute("href"));
        Assert.Equal(30 - HistoryAddress.PageSize, At("history?page=2").FindAll("tbody tr").Count);
    }

    [Fact]
    public async Task Search_in_the_address_is_taken_and_says_how_many_it_found()
    {
        await FillAsync();

        var page = At("history?search=quarry");

        Assert.Equal("Quarry", Assert.Single(page.FindAll("td.name a")).TextContent);
        Assert.Equal("1 of 30 designs", page.Find(".count").TextContent);
    }

    [Fact]
    public async Task Search_that_finds_nothing_leads_back_to_all()
    {
        await FillAsync();

        var page = At("history?search=nowhere");

        Assert.Equal("No design matches", page.Find(".empty h2").TextContent);
        Assert.Equal("history", page.Find(".empty a").GetAttribute("href"));
    }

    [Fact]
    public async Task Address_that_cannot_be_read_is_answered_by_what_is_wrong()
    {
        await FillAsync();

        Assert.Contains("'colour' is not a column to sort by", At("history?sort=colour").Find(".msg").TextContent, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Copy_makes_a_design_of_its_own_and_opens_it()
    {
        await FillAsync();
        var page = At("history?search=quarry");

        page.Find("td.acts button").Click();

        page.WaitForAssertion(() => Assert.EndsWith("design/31/1", Services.GetRequiredService<BunitNavigationManager>().Uri, StringComparison.Ordinal));
        Assert.Equal("Quarry", (await kept.Designs.FindAsync(31, Xunit.TestContext.Current.CancellationToken))!.Current.Title);
    }

    protected override void Dispose(bool disposing)
    {
        base.Dispose(disposing);
        if (disposing) kept.Dispose();
    }

    private async Task FillAsync()
    {
        for (var i = 1; i <= 30; i++)
        {
            await kept.SaveAsync(i == 12 ? "Quarry" : $"Station {i}");
        }
    }

    private IRenderedComponent<HistoryPage> At(string address)
    {
        Services.GetRequiredService<BunitNavigationManager>().NavigateTo(address);
        var page = Render<HistoryPage>();
        page.WaitForElement(".count");
        return page;
    }
}
