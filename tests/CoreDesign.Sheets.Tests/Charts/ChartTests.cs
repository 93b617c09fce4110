using CoreDesign.Estimating.Contracts;
using CoreDesign.Magnetics.Materials;
using CoreDesign.Sheets.Charts;
using CoreDesign.Sheets.Scenes;
using CoreDesign.Sheets.Svg;

namespace CoreDesign.Sheets.Tests.Charts;

public class ChartTests
{
    public static TheoryData<double, double> Sizes => new() { { 304, 188 }, { 160, 100 }, { 700, 400 } };

    [Theory]
    [MemberData(nameof(Sizes))]
    public void Charts_anySize_keepTextsApartAndInside(double width, double height)
    {
        foreach (var chart in All(new ChartOptions { Width = width, Height = height }))
        {
            var boxes = TextExtent.Texts(chart.Scene.Marks).Select(t => (t.Text, Box: TextExtent.Of(t).Grown(-0.4))).ToArray();
            for (var i = 0; i < boxes.Length; i++)
            {
                if (width >= 300)
                {
                    Assert.True(boxes[i].Box.X >= -0.5 && boxes[i].Box.Right <= width + 0.5 && boxes[i].Box.Bottom <= chart.Scene.Height + 0.5, $"{chart.Key}: {boxes[i]} leaves {width}");
                }

                for (var k = 0; k < i; k++)
                {
                    Assert.False(boxes[i].Box.Overlaps(boxes[k].Box), $"{chart.Key} {width}: {boxes[i]} {boxes[k]}");
                }
            }

            Assert.NotEmpty(chart.Scene.Title);
            Assert.NotEmpty(chart.Scene.Description);
            Assert.StartsWith("<svg", SvgWriter.Write(chart.Scene, new SvgOptions()), StringComparison.Ordinal);
        }
    }

    [Fact]
    public void Lines_everyPoint_staysInThePlot()
    {
        foreach (var chart in All(new ChartOptions()))
        {
            var plot = chart.Hover.Plot.Grown(1);
            foreach (var line in chart.Scene.Marks.OfType<PathMark>().Where(m => m.Part == "ln"))
            {
                Assert.All(line.Points, p => Assert.True(plot.Holds(new Box(p.X, p.Y, 0, 0)), $"{chart.Key}: {p}"));
            }
        }
    }

    [Fact]
    public void Hover_mapping_findsTheDrawnPoint()
    {
        var chart = EvidenceCharts.FluxOverPeriod(StudyFixture.ThreeLimb().Estimate, new ChartOptions());
        var series = chart.Hover.Series.Single(s => s.Name == "A");
        var top = Enumerable.Range(0, series.Y.Count).MaxBy(i => series.Y[i]);
        Assert.Equal(1.69, series.Y[top], 1e-3);
        Assert.Equal(5, series.X[top], 0.1);
        var plot = chart.Hover.Plot;
        var y = plot.Bottom - ((series.Y[top] - series.Axis.Low) / (series.Axis.High - series.Axis.Low) * plot.Height);
        var highest = chart.Scene.Marks.OfType<PathMark>().Where(m => m.Part == "ln").SelectMany(m => m.Points).Min(p => p.Y);
        Assert.Equal(highest, y, 0.1);
    }

    [Fact]
    public void Flux_period_closesOnItself()
    {
        var series = EvidenceCharts.FluxOverPeriod(StudyFixture.ThreeLimb().Estimate, new ChartOptions()).Hover.Series[0];
        Assert.Equal(series.Y[0], series.Y[^1]);
        Assert.Equal(20, series.X[^1]);
    }

    [Fact]
    public void Lines_phases_differByMoreThanInk()
    {
        var lines = EvidenceCharts.CurrentOverPeriod(StudyFixture.ThreeLimb().Estimate, new ChartOptions()).Scene.Marks.OfType<PathMark>().Where(m => m.Part == "ln").ToList();
        Assert.Equal(3, lines.Select(l => (l.StrokeWidth, Dash: l.Dash?.Count ?? 0)).Distinct().Count());
    }

    [Fact]
    public void Harmonics_bars_areSharesOfTheFundamental()
    {
        var r = StudyFixture.ThreeLimb().Estimate;
        var chart = HarmonicsChart.Of(r, new ChartOptions());
        Assert.Equal(21, chart.Scene.Marks.OfType<PathMark>().Count(m => m.Part == "ba"));
        var line = r.Lines[0];
        Assert.Equal(100 * line.Harmonics.Single(h => h.Order == 3).Rms_A / line.Harmonics.Single(h => h.Order == 1).Rms_A, chart.Table.Columns[1].Values[1], 1e-9);
        var bars = chart.Scene.Marks.OfType<PathMark>().Where(m => m.Part == "ba").Select(m => m.Points[2].Y - m.Points[0].Y).ToList();
        Assert.Equal(chart.Table.Columns[1].Values[1] / 100, bars[3] / bars[0], 1e-6);
    }

    [Fact]
    public void Voltage_steepCurrent_isCutAndSaysSo()
    {
        var study = StudyFixture.ThreeLimb();
        var steep = study with { VoltageCurve = [.. study.VoltageCurve.Select(p => p with { NoLoadCurrent_percent = 0.2 * Math.Exp(Math.Max(0, p.Voltage_percent - 95) / 4) })] };
        var captions = TextExtent.Texts(VoltageChart.Of(steep, new ChartOptions()).Scene.Marks).Select(t => t.Text).ToList();
        Assert.Contains(captions, t => t.Contains("off scale above", StringComparison.Ordinal));
        Assert.DoesNotContain(TextExtent.Texts(VoltageChart.Of(study, new ChartOptions()).Scene.Marks), t => t.Text.Contains("off scale", StringComparison.Ordinal));
    }

    [Fact]
    public void Voltage_onePoint_isRefused() =>
        Assert.Contains("two solved points", Assert.Throws<ArgumentException>(() => VoltageChart.Of(StudyFixture.ThreeLimb() with { VoltageCurve = [] }, new ChartOptions())).Message, StringComparison.Ordinal);

    [Fact]
    public void Shares_bars_fillTheWidthInProportion()
    {
        var study = StudyFixture.ThreeLimb().Estimate;
        var chart = SharesChart.Of(study, new ChartOptions());
        var bars = chart.Scene.Marks.OfType<PathMark>().ToList();
        var first = bars[0].Points[1].X - bars[0].Points[0].X + 1;
        Assert.Equal(study.Shares[0].Loss_percent / study.Shares.Sum(s => s.Loss_percent), first / chart.Hover.Plot.Width, 1e-9);
    }

    [Fact]
    public void Csv_chart_isWholeAndPlain()
    {
        var r = StudyFixture.ThreeLimb().Estimate;
        var rows = ChartData.Csv(EvidenceCharts.CurrentOverPeriod(r, new ChartOptions())).Split("\r\n");
        Assert.Equal("time (ms),line current A (A),line current B (A),line current C (A)", rows[0]);
        Assert.Equal(r.Lines[0].Waveform_A.Count + 2, rows.Length);
        Assert.Equal("", rows[^1]);
        Assert.Equal(r.Lines[0].Waveform_A[7], double.Parse(rows[8].Split(',')[1], System.Globalization.CultureInfo.InvariantCulture));
    }

    [Theory]
    [InlineData("=cmd|' /C calc'!A0", "'=cmd|' /C calc'!A0")]
    [InlineData("a,\"b\"", "\"a,\"\"b\"\"\"")]
    [InlineData("@x\ny", "\"'@x\ny\"")]
    public void Csv_hostileHead_isQuotedAndNoFormula(string head, string cell) =>
        Assert.Equal(cell + ",b\r\n1.5,\r\n", ChartData.Csv(new ChartTable("t.csv", [new(head, [1.5]), new("b", [])])));

    [Fact]
    public void Steel_besideAnother_showsBoth()
    {
        var chart = SteelCharts.Loss(Steel("M85-23P", 1), Steel(new string('W', 300) + "<b>", 0.9), new ChartOptions());
        Assert.Equal(4, chart.Hover.Series.Count);
        Assert.All(TextExtent.Texts(chart.Scene.Marks), t => Assert.True(TextExtent.Of(t).Right <= 304));
        Assert.Throws<ArgumentException>(() => SteelCharts.Loss(Steel("x", 1) with { Loss = [] }, null, new ChartOptions()));
    }

    private static List<Chart> All(ChartOptions o)
    {
        var charts = new List<Chart>();
        foreach (var study in new Study[] { StudyFixture.ThreeLimb(), StudyFixture.SinglePhase() })
        {
            charts.AddRange([EvidenceCharts.FluxOverPeriod(study.Estimate, o), EvidenceCharts.CurrentOverPeriod(study.Estimate, o), EvidenceCharts.Loop(study.Estimate, 0, o), HarmonicsChart.Of(study.Estimate, o), VoltageChart.Of(study, o), SharesChart.Of(study.Estimate, o)]);
            var margins = MarginsFixture.Of(study);
            charts.AddRange([VoltageChart.OfVoltsPerHertz(study.Estimate, margins, o), MarginCharts.PeakFluxDensity(study.Estimate, study.VoltageCurve, margins, o), MarginCharts.Inrush(margins.Inrush, o), MarginCharts.DcBias(study.Estimate, margins.DcBias!, o)]);
        }

        charts.AddRange([SteelCharts.Magnetization(Steel("M85-23P", 1), null, o), SteelCharts.Loss(Steel("M85-23P", 1), null, o), SteelCharts.Magnetization(Steel("M85-23P", 1), Steel("new", 0.97), o)]);
        return charts;
    }

    // Points of plausible shape, invented.
    private static SteelData Steel(string name, double factor) => new()
    {
        Name = name,
        SheetThickness_m = 0.23e-3,
        Density_kg_m3 = 7650,
        Resistivity_ohm_m = 4.8e-7,
        SaturationPolarization_T = 2.03,
        Magnetization = [.. new[] { (0.1, 3.0), (0.5, 8.5), (1.0, 13), (1.5, 28), (1.7, 75), (1.8, 220), (1.9, 1400), (2.0, 20000) }.Select(p => new MagnetizationPoint(p.Item1 * factor, p.Item2))],
        Loss = [.. new[] { 50.0, 60 }.Select(f => new LossCurve(f, [.. Enumerable.Range(1, 9).Select(i => new LossPoint(0.2 * i, 0.3 * factor * Math.Pow(0.2 * i, 2) * f / 50))]))],
    };
}
