using Bunit;
using CoreDesign.Estimating.Contracts;
using CoreDesign.Web.Features.Design;

namespace CoreDesign.Web.Tests.Design;

public sealed class MarginsPanelTests : BunitContext
{
    private IRenderedComponent<MarginsPanel> Show(MarginsResult? margins, EstimateResult? estimate = null, bool busy = false) =>
        Render<MarginsPanel>(p => p.Add(x => x.View, new EvidenceView()).Add(x => x.Estimate, estimate ?? Samples.Estimate).Add(x => x.Margins, margins).Add(x => x.Busy, busy));

    private static Dictionary<string, string> Rows(IRenderedComponent<MarginsPanel> panel) =>
        panel.FindAll("tbody tr").Where(r => r.QuerySelector("th") is not null).ToDictionary(r => r.QuerySelector("th")!.TextContent, r => string.Join(" | ", r.QuerySelectorAll("td").Select(c => c.TextContent)), StringComparer.Ordinal);

    [Fact]
    public void Solved_peak_stands_beside_the_closed_formula_with_what_each_means()
    {
        var panel = Show(Samples.Margins);
        var rows = Rows(panel);
        Assert.Equal("111.2 % | of rated voltage, 1.875 T", rows["Current 5 times that at rated"]);
        Assert.Equal("28\u2009700 A | 14.0 times the rated peak, line A after 10.0 ms", rows["First inrush peak, solved"]);
        Assert.Equal("29\u2009200 A | first phase alone", rows["by closed formula"]);
        var words = panel.Find("dl").TextContent;
        foreach (var definition in new[] { "Voltage for a multiple.", "Highest current. First phase first.", "Closed form.", "Rated voltage, other frequencies." })
        {
            Assert.Contains(definition, words, StringComparison.Ordinal);
        }

        Assert.Contains("For planning.", panel.Find(".note").TextContent, StringComparison.Ordinal);
    }

    [Fact]
    public void Figure_that_could_not_be_found_gives_its_reason()
    {
        var rows = Rows(Show(Samples.Margins with
        {
            OverVoltage = new() { CurrentMultiple = 50, Definition = "", Reason = "Not reached up to 150 % of rated voltage." },
            Inrush = new() { Definition = "", Assumptions = "", FormulaText = "", Reason = "Air-core inductance 0.01 mH is below 0.02 mH." },
            DcBias = new() { Bias_A = 5, Definition = "", Reason = "No path for direct current." },
        }));
        Assert.Equal("– | Not reached up to 150 % of rated voltage.", rows["Current 50 times that at rated"]);
        Assert.Equal("– | Air-core inductance 0.01 mH is below 0.02 mH.", rows["First inrush peak, solved"]);
        Assert.Equal("– | No path for direct current.", rows["With 5 A direct"]);
    }

    [Fact]
    public void Direct_current_shows_margin_loss_and_even_harmonics()
    {
        HarmonicResult[] harmonics = [.. Enumerable.Range(1, 13).Select(n => new HarmonicResult(n, 14.0 - n, 0))];
        var rows = Rows(Show(Samples.Margins with
        {
            DcBias = new() { Bias_A = 2.5, NoLoadLoss_W = 700, NoLoadCurrent_A = 9, NoLoadCurrent_percent = 0.62, PeakFluxDensity_T = 1.95, Margin_percent = 3.9, Offset_T = 0.26, WorstPart = "limbA", Lines = [new() { Phase = "A", Rms_A = 9, Peak_A = 40, Harmonics = harmonics, Waveform_A = [1, 2] }], Definition = "" },
        }));
        Assert.Equal("3.9 % | 1.950 T in Limb A, mean 0.260 T", rows["With 2.5 A direct"]);
        Assert.Equal("700 W | +26 W; 0.620 % rms; 2nd harmonic 12 A, 4th 10 A", rows["loss and current then"]);
    }

    [Fact]
    public void Lowest_frequency_is_named_where_it_is_below_the_rated_one()
    {
        var low = Samples.Estimate with { Margin = Samples.Estimate.Margin with { LowestFrequency_Hz = 47.5 } };
        Assert.Contains("At 110 % voltage and 47.5 Hz", Rows(Show(null, low)).Keys);
        Assert.Contains("At 110 % voltage", Rows(Show(null)).Keys);
        Assert.Equal("at 110 %, 47.5 Hz", VerdictFigures.Of(low, null).AtHighest.Name);
    }

    [Fact]
    public void Last_margins_stay_greyed_while_new_ones_are_solved_and_go_where_none_come()
    {
        var panel = Show(Samples.Margins);
        Assert.Empty(panel.FindAll("tr.faint"));
        panel.Render(p => p.Add(x => x.Margins, null).Add(x => x.Busy, true));
        Assert.Equal(3, panel.FindAll("tr.faint").Count);
        Assert.Contains("First inrush peak, solved", Rows(panel).Keys);
        panel.Render(p => p.Add(x => x.Margins, null).Add(x => x.Busy, false));
        Assert.DoesNotContain("First inrush peak, solved", Rows(panel).Keys);
    }

    [Theory]
    [InlineData(true, "Solving over-voltage and inrush…")]
    [InlineData(false, "a revision from before there were such margins has none")]
    public void Missing_margins_say_why(bool busy, string words) =>
        Assert.Contains(words, Show(null, busy: busy).Find("tbody").TextContent, StringComparison.Ordinal);
}
