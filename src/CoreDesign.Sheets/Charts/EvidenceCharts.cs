using CoreDesign.Estimating.Contracts;

namespace CoreDesign.Sheets.Charts;

/// <summary>The waveforms of an estimate: flux and current over one period, and the loop of a limb.</summary>
public static class EvidenceCharts
{
    public static Chart FluxOverPeriod(EstimateResult r, ChartOptions o)
    {
        ArgumentNullException.ThrowIfNull(r);
        ArgumentNullException.ThrowIfNull(o);
        var limbs = Limbs(r);
        var peaks = limbs.Select(l => $"{l.Name} {Figures.With(Figures.Fixed(l.Values.Max(Math.Abs), 2), "T")}");
        var words = new PeriodWords("flux", "Flux over one period", $"Flux density of each limb over one period. Peaks: {string.Join(", ", peaks)}.", "flux density", "T") { Caption = "flux density of the limb" };
        return PeriodChart.Of(words, r.Inputs.Order?.Frequency_Hz, limbs, o);
    }

    public static Chart CurrentOverPeriod(EstimateResult r, ChartOptions o)
    {
        ArgumentNullException.ThrowIfNull(r);
        ArgumentNullException.ThrowIfNull(o);
        var lines = r.Lines.Select(l => (Name: l.Phase, Values: l.Waveform_A)).ToArray();
        var peaks = r.Lines.Select(l => $"{l.Phase} {Figures.With(Figures.Significant(l.Rms_A, 3), "A")} rms, {Figures.With(Figures.Significant(l.Peak_A, 3), "A")} peak");
        var what = r.Lines.Count == 1 ? "current" : "line current";
        var words = new PeriodWords("current", "Current over one period", $"No-load {what} over one period: {string.Join("; ", peaks)}.", what, "A") { Caption = what };
        return PeriodChart.Of(words, r.Inputs.Order?.Frequency_Hz, lines, o);
    }

    /// <param name="limb">Place of the limb in the result, 0 the first.</param>
    public static Chart Loop(EstimateResult r, int limb, ChartOptions o)
    {
        ArgumentNullException.ThrowIfNull(r);
        ArgumentNullException.ThrowIfNull(o);
        ArgumentOutOfRangeException.ThrowIfNegative(limb);
        ArgumentOutOfRangeException.ThrowIfGreaterThanOrEqual(limb, r.Limbs.Count);
        var l = r.Limbs[limb];
        double b = l.FluxDensity_T.Max(Math.Abs), h = l.FieldStrength_A_m.Max(Math.Abs);
        var name = Limbs(r)[limb].Name;
        var chart = new ChartBuilder(o, Axis.Linear(-h, h, 4), Axis.Linear(-b, b, 4), null, "flux density, T", "field strength, A/m");
        chart.Line(new(name, "T", Closed(l.FieldStrength_A_m), Closed(l.FluxDensity_T), LineLook.First));
        var table = new ChartTable($"loop-{name}.csv", [new("field strength (A/m)", l.FieldStrength_A_m), new("flux density (T)", l.FluxDensity_T)]);
        return chart.Build("loop", $"Loop of limb {name}", $"Flux density against field strength over one period in limb {name}; peaks {Figures.With(Figures.Fixed(b, 2), "T")} and {Figures.With(Figures.Significant(h, 3), "A/m")}.", "field strength", "A/m", table, byPoint: true);
    }

    /// <summary>Names of the limbs as the drawing writes them.</summary>
    internal static (string Name, IReadOnlyList<double> Values)[] Limbs(EstimateResult r) =>
        [.. r.Limbs.Select(l => (l.Name["limb".Length..], l.FluxDensity_T))];

    /// <summary>The first limb that carries a winding; what a core is judged by.</summary>
    public static int FirstWoundLimb(EstimateResult r)
    {
        ArgumentNullException.ThrowIfNull(r);
        return r.Limbs.Index().FirstOrDefault(l => !r.Geometry.Limbs.Any(g => g.Name == l.Item.Name && g.IsReturn)).Index;
    }

    private static List<double> Closed(IReadOnlyList<double> values) => values.Count == 0 ? [] : [.. values, values[0]];
}
