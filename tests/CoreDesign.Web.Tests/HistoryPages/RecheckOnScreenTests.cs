using Bunit;
using CoreDesign.Estimating.Steels;
using CoreDesign.History.Designs;
using CoreDesign.Web.Features.Design;
using CoreDesign.Web.Features.Designs;
using CoreDesign.Web.Features.History;
using Microsoft.AspNetCore.Components;
using Microsoft.Extensions.DependencyInjection;

namespace CoreDesign.Web.Tests.HistoryPages;

/// <summary>What the screens say of a stored revision that today's kernel solves again.</summary>
public sealed class RecheckOnScreenTests : BunitContext
{
    private readonly KeptDesigns kept = new();
    private bool solved;

    public RecheckOnScreenTests()
    {
        Services.AddSingleton(kept.Designs).AddSingleton(kept.Settings).AddSingleton(KeptDesigns.Engine with { Steels = Steels });
        SetRendererInfo(new RendererInfo("Server", isInteractive: true));
    }

    [Fact]
    public async Task Card_says_that_the_figures_still_stand()
    {
        var card = Card(await kept.FindAsync(await kept.SaveAsync("Station")));

        card.WaitForAssertion(() => Assert.Equal("Today's kernel gives the same figures.", card.Find(".today").TextContent));
        Assert.DoesNotContain("differs", card.Find(".today").ClassList);
    }

    [Fact]
    public async Task Card_marks_a_revision_whose_figures_differ()
    {
        var saved = await kept.SaveAsync("Station");
        kept.AlterStudy(saved, estimate => estimate["noLoadLoss_W"] = 1113.4);

        var card = Card(await kept.FindAsync(saved));

        card.WaitForAssertion(() => Assert.Contains("(saved: 1\u2009113\u00A0W", card.Find(".today.differs").TextContent, StringComparison.Ordinal));
        Assert.Equal("status", card.Find(".today").GetAttribute("role"));
    }

    [Fact]
    public async Task Card_solves_nothing_while_the_page_is_only_written_out()
    {
        SetRendererInfo(new RendererInfo("Static", isInteractive: false));

        var card = Card(await kept.FindAsync(await kept.SaveAsync("Station")));

        Assert.Equal("Solving it with today's kernel…", card.Find(".today").TextContent);
        Assert.False(solved);
    }

    [Fact]
    public async Task Banner_is_quiet_for_the_newest_revision_that_agrees()
    {
        var revision = await kept.FindAsync(await kept.SaveAsync("Station"));

        Assert.Equal("", Banner(revision, newest: 1).Markup.Trim());
        Assert.Contains("Today's kernel gives the same figures.", Banner(revision, newest: 2).Markup, StringComparison.Ordinal);
        Assert.Equal($"design/{revision.Info.Id}", Banner(revision, newest: 2).Find("a").GetAttribute("href"));
    }

    [Fact]
    public async Task Banner_speaks_up_for_the_newest_revision_too_when_its_figures_differ()
    {
        var saved = await kept.SaveAsync("Station");
        kept.AlterStudy(saved, estimate => estimate["noLoadLoss_W"] = 1113.4);

        var text = Banner(await kept.FindAsync(saved), newest: 1).Find(".banner").TextContent;

        Assert.Contains("(saved: 1\u2009113\u00A0W", text, StringComparison.Ordinal);
        Assert.Contains("The saved figures are shown until something is changed.", text, StringComparison.Ordinal);
    }

    protected override void Dispose(bool disposing)
    {
        base.Dispose(disposing);
        if (disposing) kept.Dispose();
    }

    private SteelCatalog Steels()
    {
        solved = true;
        return SteelLibrary.Catalog;
    }

    private IRenderedComponent<RevisionCard> Card(RevisionDetail revision) =>
        Render<RevisionCard>(p => p.Add(x => x.Revision, revision).Add(x => x.Refresh, () => { }));

    private IRenderedComponent<RevisionBanner> Banner(RevisionDetail revision, int newest) => Render<RevisionBanner>(p => p
        .Add(x => x.Revision, revision)
        .Add(x => x.Newest, newest)
        .Add(x => x.Today, RevisionCheck.Run(revision, SteelLibrary.Catalog)));
}
