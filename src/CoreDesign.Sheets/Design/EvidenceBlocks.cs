using CoreDesign.Estimating.Contracts;
using CoreDesign.Sheets.Charts;
using CoreDesign.Sheets.Pdf;

namespace CoreDesign.Sheets.Design;

/// <summary>The page's charts on paper, two to a row, from the same definitions.</summary>
internal static class EvidenceBlocks
{
    internal static readonly ChartOptions Half = new() { Width = 240, Height = 150, TextSize = 7.5 };

    public static IEnumerable<Block> All(Study study)
    {
        var e = study.Estimate;
        var wound = EvidenceCharts.FirstWoundLimb(e);
        yield return new Columns(
            [new Heading("Flux density over one period"), Figure(EvidenceCharts.FluxOverPeriod(e, Half))],
            [new Heading("Line current over one period"), Figure(EvidenceCharts.CurrentOverPeriod(e, Half))]);
        yield return new Columns(
            [new Heading("Loop of limb " + e.Limbs[wound].Name["limb".Length..]), Figure(EvidenceCharts.Loop(e, wound, Half))],
            [new Heading("Harmonics of the line current"), Figure(HarmonicsChart.Of(e, Half))]);
        if (study.VoltageCurve.Count > 1)
        {
            yield return new Columns(
                [new Heading("Loss and current against voltage"), Figure(VoltageChart.Of(study, Half))],
                [new Heading("Values against voltage"), ResultTables.Voltage(study)]);
        }
    }

    internal static FigureBlock Figure(Chart chart) => new(chart.Scene);
}
