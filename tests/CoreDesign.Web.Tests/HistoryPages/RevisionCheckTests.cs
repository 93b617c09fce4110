using CoreDesign.Estimating.Steels;
using CoreDesign.History.Designs;
using CoreDesign.Sheets;
using CoreDesign.Web.Features.Designs;

namespace CoreDesign.Web.Tests.HistoryPages;

/// <summary>Stored figures against today's kernel, where the stored ones were altered in the database file.</summary>
public sealed class RevisionCheckTests : IDisposable
{
    private readonly KeptDesigns kept = new();

    [Fact]
    public async Task Untouched_revision_agrees()
    {
        var check = await CheckAsync(await kept.SaveAsync("Station"));

        Assert.True(check.Same);
        Assert.Equal("Today's kernel gives the same figures.", check.Text);
    }

    [Fact]
    public async Task Altered_study_is_told_with_both_figures()
    {
        var saved = await kept.SaveAsync("Station");
        kept.AlterStudy(saved, estimate => estimate["noLoadLoss_W"] = 1113.4);

        var check = await CheckAsync(saved);

        Assert.False(check.Same);
        var (loss, current) = (Figures.Significant(KeptDesigns.Estimate.NoLoadLoss_W, 4), Figures.Significant(KeptDesigns.Estimate.NoLoadCurrent_percent, 3));
        Assert.StartsWith($"Today's kernel gives {loss}\u00A0W, {current}\u00A0% (saved: 1\u2009113\u00A0W, {current}\u00A0%). ", check.Text, StringComparison.Ordinal);
        Assert.Contains("the stored figures themselves are in doubt", check.Text, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Altered_column_of_the_lists_is_found_although_the_study_agrees()
    {
        var saved = await kept.SaveAsync("Station");
        kept.AlterColumn(saved, "NoLoadLoss_W", 98.7);

        var check = await CheckAsync(saved);

        Assert.False(check.Same);
        Assert.Contains("(saved: 98.70\u00A0W,", check.Text, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("marginAtRated", "% margin")]
    [InlineData("mass", "kg")]
    public async Task Mass_and_margin_are_told_where_they_differ(string figure, string unit)
    {
        var saved = await kept.SaveAsync("Station");
        kept.AlterStudy(saved, estimate =>
        {
            if (figure == "mass") estimate["mass_kg"]!["total"] = KeptDesigns.Estimate.Mass_kg.Total * 1.01;
            else estimate["margin"]!["atRated_percent"] = KeptDesigns.Estimate.Margin.AtRated_percent + 0.1;
        });

        var check = await CheckAsync(saved);

        Assert.False(check.Same);
        Assert.Equal(2, check.Text.Split("\u00A0" + unit).Length - 1);
    }

    [Fact]
    public async Task Small_difference_is_shown_with_as_many_digits_as_tell_it_apart()
    {
        var saved = await kept.SaveAsync("Station");
        var (now, then) = (KeptDesigns.Estimate.NoLoadCurrent_percent, KeptDesigns.Estimate.NoLoadCurrent_percent * 1.0001);
        kept.AlterStudy(saved, estimate => estimate["noLoadCurrent_percent"] = then);

        var text = (await CheckAsync(saved)).Text;

        var shown = text.Split('%').Select(part => part.Split(' ')[^1].Trim('\u00A0')).Take(2).ToArray();
        Assert.NotEqual(shown[0], shown[1]);

        // Four digits are the fewest that can tell a ten-thousandth apart, where it goes past the middle between two of them.
        Assert.Equal(now, double.Parse(shown[0], System.Globalization.CultureInfo.InvariantCulture), now * 5e-4);
    }

    [Fact]
    public async Task Newer_kernel_is_named_as_the_cause()
    {
        var saved = await kept.SaveAsync("Station", KeptDesigns.Estimate with { KernelVersion = "0.9.0", NoLoadLoss_W = 100 });

        var text = (await CheckAsync(saved)).Text;

        Assert.EndsWith($"Changed since: the kernel from 0.9.0 to {KeptDesigns.Estimate.KernelVersion}.", text, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Steel_that_is_gone_is_said_in_words()
    {
        var order = KeptDesigns.Order with { Steel = KeptDesigns.Order.Steel! with { Grade = "Coil 4711" } };
        var check = await CheckAsync(await kept.SaveAsync("Station", input: order));

        Assert.False(check.Same);
        Assert.StartsWith("Today's kernel ", check.Text, StringComparison.Ordinal);
        Assert.Contains("can't solve this design:", check.Text, StringComparison.Ordinal);
        Assert.Contains("Coil 4711", check.Text, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Session_checks_what_it_opens_even_with_an_edit_on_top()
    {
        var saved = await kept.SaveAsync("Station");
        kept.AlterStudy(saved, estimate => estimate["noLoadLoss_W"] = 1113.4);
        await using var session = kept.Session();
        await session.OpenAsync(saved.Id, 1, null, null);
        Assert.Null(session.Today);
        session.State.Type("joint.gap_mm", "0.7");

        await session.StartAsync();

        Assert.False(session.Today!.Same);
        Assert.Contains("1\u2009113\u00A0W", session.Today.Text, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Answer_for_a_revision_that_was_left_is_dropped()
    {
        var first = await kept.FindAsync(await kept.SaveAsync("First"));
        var saved = await kept.SaveAsync("Second");
        kept.AlterStudy(saved, estimate => estimate["noLoadLoss_W"] = 1113.4);
        using var check = new TodayCheck(() => SteelLibrary.Catalog);

        await Task.WhenAll(check.AskAsync(first), check.AskAsync(await kept.FindAsync(saved)));

        Assert.Equal(1113.4, check.Today!.Saved.NoLoadLoss_W);
    }

    public void Dispose() => kept.Dispose();

    private async Task<RevisionCheck> CheckAsync(RevisionInfo saved) => RevisionCheck.Run(await kept.FindAsync(saved), SteelLibrary.Catalog);
}
