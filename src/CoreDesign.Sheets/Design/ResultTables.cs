using CoreDesign.Estimating.Contracts;
using CoreDesign.Sheets.Pdf;
using CoreDesign.Sheets.Scenes;
using static CoreDesign.Sheets.Figures;

namespace CoreDesign.Sheets.Design;

/// <summary>Where loss and current come from, currents and their harmonics, the voltage curve, the energy balance.</summary>
internal static class ResultTables
{
    private static readonly Ink[] ShareInks = [Ink.Share1, Ink.Share2, Ink.Share3, Ink.Share4, Ink.Share5];

    public static Table Shares(EstimateResult e) => new(
        [new Column("Part and cause", false, true), new Column("loss\nW"), new Column("of the loss\n%"), new Column("of the current\n%")],
        [
            .. e.Shares.OrderByDescending(s => s.Loss_percent).Select((s, i) => new Row(
                [s.Label, Fixed(s.Loss_W, 1), Fixed(s.Loss_percent, 1), Fixed(s.Current_percent, 1)], Swatch: ShareInks[Math.Min(i, ShareInks.Length - 1)])),
        ]);

    public static Table Currents(EstimateResult e) => new(
        [new Column("Line", false), new Column("rms\nA"), new Column("peak\nA"), new Column("peak to rms"), new Column("distortion, rms of harmonics\n% of fundamental")],
        [
            .. e.Lines.Select(l => new Row(l.Phase, Significant(l.Rms_A, 4), Significant(l.Peak_A, 4), Fixed(l.Peak_A / l.Rms_A, 2), Fixed(Distortion(l), 1))),
        ]);

    public static Table Harmonics(EstimateResult e)
    {
        var orders = Enumerable.Range(1, 13).ToArray();
        var columns = new List<Column> { new("Order", false) };
        foreach (var line in e.Lines)
        {
            columns.Add(new Column($"{line.Phase}, rms\nA"));
            columns.Add(new Column($"{line.Phase}, of fund.\n%"));
        }

        return new Table(columns, [.. orders.Select(n => new Row([Plain(n), .. e.Lines.SelectMany(l => Pair(l, n))]))]);
    }

    public static Table Voltage(Study study) => new(
        [new Column("voltage\n%"), new Column("peak flux density\nT"), new Column("no-load loss\nW"), new Column("no-load current\n%")],
        [
            .. study.VoltageCurve.Select(v => new Row(
                [Plain(v.Voltage_percent, 1), Fixed(v.PeakFluxDensity_T, 3), Fixed(v.NoLoadLoss_W, 1), Significant(v.NoLoadCurrent_percent, 3)],
                v.Voltage_percent == 100)),
        ]);

    public static Table Windings(EstimateResult e) => new(
        [new Column("Winding", false), new Column("with", false), new Column("no load"), new Column("beside it", false)],
        [.. WindingFigures.Of(e).Select(w => new Row(w.Winding, w.With, w.Current, w.Beside))]);

    public static Table Energy(EstimateResult e) => Table.KeyValues(
        ("Power at the terminals", With(Fixed(e.EnergyBalance.Terminal_W, 2), "W"), false, false),
        ("Loss in the material", With(Fixed(e.EnergyBalance.Material_W, 2), "W"), false, false),
        ("Relative difference", With(Significant(100 * e.EnergyBalance.RelativeError, 2), "%"), false, false),
        ("Points in a period", Plain(e.Model.PointsPerPeriod), false, false));

    private static string[] Pair(LineResult line, int order)
    {
        var fundamental = line.Harmonics.FirstOrDefault(h => h.Order == 1)?.Rms_A ?? 0;
        return line.Harmonics.FirstOrDefault(h => h.Order == order) is { } h
            ? [Fixed(h.Rms_A, 4), fundamental > 0 ? Fixed(100 * h.Rms_A / fundamental, 2) : Nothing]
            : [Nothing, Nothing];
    }

    /// <summary>Rms of all harmonics but the fundamental, from the rms of the whole line current.</summary>
    private static double Distortion(LineResult line)
    {
        var fundamental = line.Harmonics.FirstOrDefault(h => h.Order == 1)?.Rms_A ?? double.NaN;
        return 100 * Math.Sqrt(line.Harmonics.Where(h => h.Order > 1).Sum(h => h.Rms_A * h.Rms_A)) / fundamental;
    }
}
