using CoreDesign.Estimating.Circuits;
using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Demo;
using CoreDesign.Web.Features.Circuits;

namespace CoreDesign.Web.Tests.CircuitPages;

public sealed class CircuitViewTests
{
    [Fact]
    public void Single_phase_shows_its_winding_and_line_and_no_second_chart_of_the_same_current()
    {
        var view = View(JsonCase.Circuit);

        Assert.Equal([("Windings", "W"), ("Lines", "L")], view.Columns.Select(c => (c.Group, c.Name)));
        Assert.Equal(["windings"], view.CurrentCharts.Select(c => c.Key));
        Assert.Equal("single, 230\u00A0V, 50\u00A0Hz", view.Summary[0].Value);
    }

    [Fact]
    public void Delta_shows_lines_beside_windings_and_what_goes_round_the_loop()
    {
        var view = View(ExampleCircuit.Json);

        Assert.Equal(["W-A", "W-B", "W-C", "A", "B", "C", "mean of A, B, C"], view.Columns.Select(c => c.Name));
        Assert.Equal(["windings", "lines"], view.CurrentCharts.Select(c => c.Key));
        Assert.Equal(["rms", "peak", "mean", .. Enumerable.Range(1, 13).Select(i => $"{i}")], view.Rows.Select(r => r.Head));
        Assert.All(view.Rows, r => Assert.Equal(7, r.Cells.Count));
    }

    [Fact]
    public void Star_with_neutral_shows_the_neutral()
    {
        var view = View(ExampleCircuit.Json.Replace("\"connection\": \"D\"", "\"connection\": \"YN\"", StringComparison.Ordinal));

        Assert.Equal(("Neutral", "A + B + C"), view.Columns.Select(c => (c.Group, c.Name)).Last());
    }

    [Fact]
    public void Harmonics_of_a_sine_are_its_first_and_no_noise()
    {
        // The ring is linear: its current is a sine that lags the voltage cos(wt) by 90 degrees.
        var view = View(JsonCase.Circuit);

        var first = view.Rows.Single(r => r.Head == "1").Cells[0];
        Assert.Equal(view.Rows.Single(r => r.Head == "peak").Cells[0].Value, first.Value);
        Assert.Equal("\u221290.0\u00B0", first.Phase);
        Assert.All(view.Rows.Where(r => r.Head is not ("rms" or "peak" or "1")), r => Assert.Equal(("\u2013", null), r.Cells[0]));
    }

    [Fact]
    public void Losses_of_the_branches_are_shares_of_the_whole()
    {
        var view = View(ExampleCircuit.Json);

        Assert.Equal(8, view.Branches.Count);
        Assert.Equal(100, view.Branches.Sum(b => double.Parse(b.Share, System.Globalization.CultureInfo.InvariantCulture)), 0.5);
        Assert.Equal(("0", "\u2013"), (view.Branches.Single(b => b.Name == "air and tank").Loss, view.Branches.Single(b => b.Name == "air and tank").PeakFluxDensity));
        Assert.Equal(view.Branches.Single(b => b.Name == "limb A").Loss, view.Branches.Single(b => b.Name == "limb C").Loss);
    }

    [Fact]
    public void Branch_without_loss_anywhere_has_no_share()
    {
        Assert.All(View(JsonCase.Circuit).Branches, b => Assert.Equal("\u2013", b.Share));
    }

    [Fact]
    public void Chart_of_the_branches_takes_four_and_gives_one_up_for_another()
    {
        var view = View(ExampleCircuit.Json);
        Assert.Equal(4, view.FluxChart.Hover.Series.Count);
        var (shown, hidden) = (view.Branches.First(b => view.IsChosen(b.Name)).Name, view.Branches.First(b => !view.IsChosen(b.Name)).Name);
        Assert.False(view.CanChoose(hidden));

        view.Choose(hidden, true);
        Assert.False(view.IsChosen(hidden));
        view.Choose(shown, false);
        Assert.True(view.CanChoose(hidden));
        view.Choose(hidden, true);

        Assert.Equal(4, view.FluxChart.Hover.Series.Count);
        Assert.Contains(view.FluxChart.Hover.Series, s => s.Name == hidden);
        Assert.DoesNotContain(view.FluxChart.Hover.Series, s => s.Name == shown);
    }

    [Fact]
    public void Chart_without_a_branch_is_an_empty_one()
    {
        var view = View(JsonCase.Circuit);

        foreach (var b in view.Branches) view.Choose(b.Name, false);

        Assert.Empty(view.FluxChart.Hover.Series);
        Assert.Equal("No branch is chosen.", view.FluxChart.Scene.Description);
    }

    private static CircuitView View(string json)
    {
        var @case = DesignJson.Read<CircuitCase>(json).Value!;
        var outcome = SolveCircuit.Run(@case);
        Assert.True(outcome.Ok, $"{outcome.Unsolvable?.Reason} {string.Join(' ', outcome.Errors.Select(e => e.Message))}");
        return new CircuitView(new SolvedCircuit(json, SolveCircuit.DefaultPoints, @case, outcome.Value!));
    }
}
