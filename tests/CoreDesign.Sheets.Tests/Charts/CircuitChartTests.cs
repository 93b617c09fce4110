using CoreDesign.Estimating.Circuits;
using CoreDesign.Sheets.Charts;
using CoreDesign.Sheets.Scenes;
using CoreDesign.Sheets.Svg;

namespace CoreDesign.Sheets.Tests.Charts;

public class CircuitChartTests
{
    private static readonly ChartOptions Size = new() { Width = 580, Height = 260 };

    [Fact]
    public void Currents_twelveWindings_areDrawnFourToAChart()
    {
        var charts = CircuitCharts.WindingCurrents(Answer([.. Enumerable.Range(1, 12).Select(i => ($"w{i}", 0.1 * i))]), 50, Size);

        Assert.Equal(["windings-1", "windings-2", "windings-3"], charts.Select(c => c.Key));
        Assert.Equal("Current of the windings, 2 of 3", charts[1].Scene.Title);
        Assert.Equal(["w5", "w6", "w7", "w8"], charts[1].Hover.Series.Select(s => s.Name).Order());
    }

    [Theory]
    [InlineData(3.2e6, "MA", 3.2)]
    [InlineData(2500, "kA", 2.5)]
    [InlineData(3.2, "A", 3.2)]
    [InlineData(0.0032, "mA", 3.2)]
    [InlineData(3.2e-6, "\u00B5A", 3.2)]
    [InlineData(3.2e-13, "pA", 0.32)]
    [InlineData(0, "A", 0)]
    public void Currents_anySize_haveAUnitThatLeavesFewDigitsAndDataInAmperes(double peak, string unit, double shown)
    {
        var chart = CircuitCharts.LineCurrents(Answer([("L", peak)]), 50, Size).Single();

        var series = chart.Hover.Series.Single();
        Assert.Equal(unit, series.Unit);
        Assert.Equal(shown, series.Y.Max(), Math.Max(1e-12, 1e-4 * shown));
        Assert.Contains(chart.Scene.Marks.OfType<TextMark>(), t => t.Text == $"current, {unit}");
        Assert.Equal("current L (A)", chart.Table.Columns[1].Head);
        Assert.Equal(peak, chart.Table.Columns[1].Values.Max(), 1e-9 * peak);
    }

    [Theory]
    [InlineData(1e300)]
    [InlineData(1e-300)]
    public void Currents_beyondAnyPrefix_areStillDrawn(double peak)
    {
        var chart = CircuitCharts.LineCurrents(Answer([("L", peak)]), 1000, Size).Single();

        Assert.StartsWith("<svg", SvgWriter.Write(chart.Scene, new SvgOptions()), StringComparison.Ordinal);
        Assert.True(chart.Hover.Plot.Width > 100, $"{chart.Hover.Plot}");
    }

    [Fact]
    public void FluxDensity_chosenBranches_areDrawnOverThePeriodAndSaidInWords()
    {
        var chart = CircuitCharts.FluxDensity(Answer([("a", 1.5), ("b", 1.25), ("c", 0.5)]), ["a", "c"], 50, Size);

        Assert.Equal(["a", "c"], chart.Hover.Series.Select(s => s.Name));
        Assert.Equal(20, chart.Hover.Series[0].X[^1]);
        Assert.Equal("Flux density over one period. Peaks: a 1.50\u00A0T, c 0.500\u00A0T.", chart.Scene.Description);
    }

    [Fact]
    public void FluxDensity_moreBranchesThanCanBeToldApart_areRefused()
    {
        var answer = Answer([("a", 1), ("b", 1), ("c", 1), ("d", 1), ("e", 1)]);

        Assert.Throws<ArgumentOutOfRangeException>(() => CircuitCharts.FluxDensity(answer, ["a", "b", "c", "d", "e"], 50, Size));
    }

    [Fact]
    public void Names_longAndHostile_stayInsideThePicture()
    {
        var name = string.Concat(Enumerable.Repeat("<W&\"", 25));

        var chart = CircuitCharts.WindingCurrents(Answer([(name, 1), (name + "2", 0.5)]), 50, Size).Single();

        Assert.All(TextExtent.Texts(chart.Scene.Marks), t => Assert.InRange(TextExtent.Of(t).Right, 0, Size.Width + 0.5));
        Assert.DoesNotContain("<W", SvgWriter.Write(chart.Scene, new SvgOptions()), StringComparison.Ordinal);
    }

    /// <summary>Cosines of the peaks given, as winding, line and branch alike.</summary>
    private static CircuitAnswer Answer((string Name, double Peak)[] waves)
    {
        static double[] Wave(double peak) => [.. Enumerable.Range(0, 96).Select(n => peak * Math.Cos(2 * Math.PI * n / 96))];
        var currents = waves.ToDictionary(w => w.Name, w => new CurrentAnswer { Rms = w.Peak / Math.Sqrt(2), Peak = w.Peak, Mean = 0, Harmonics = new Dictionary<string, double[]>() });
        var shapes = waves.ToDictionary(w => w.Name, w => Wave(w.Peak));
        return new CircuitAnswer
        {
            Windings = currents,
            Lines = currents,
            MeanLineRms = 0,
            Apparent_VA = 0,
            TerminalPower_W = 0,
            CoreLoss_W = 0,
            CopperLoss_W = 0,
            BranchLoss_W = waves.ToDictionary(w => w.Name, _ => 0.0),
            EnergyBalanceResidualOverVA = 0,
            BPeak = waves.ToDictionary(w => w.Name, w => w.Peak),
            BHarmonics = new Dictionary<string, IReadOnlyDictionary<string, double[]>>(),
            Waveforms = new CaseWaveforms { Points = 96, I = shapes, Lines = shapes, B = shapes },
            KernelVersion = "0",
        };
    }
}
