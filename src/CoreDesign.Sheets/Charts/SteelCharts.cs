using CoreDesign.Magnetics.Materials;
using CoreDesign.Sheets.Scenes;

namespace CoreDesign.Sheets.Charts;

/// <summary>Curves of a steel as they are given, point by point; a second set beside it shows what an import would change.</summary>
public static class SteelCharts
{
    /// <summary>Flux density against field strength, which has a logarithmic axis.</summary>
    public static Chart Magnetization(SteelData steel, SteelData? beside, ChartOptions o)
    {
        ArgumentNullException.ThrowIfNull(steel);
        ArgumentNullException.ThrowIfNull(o);
        SteelData[] sets = beside is null ? [steel] : [steel, beside];
        var points = sets.SelectMany(s => s.Magnetization).Where(p => p.H_A_per_m > 0).ToArray();
        Need(points.Length, "a magnetization curve");
        var chart = new ChartBuilder(o, Axis.Decades(points.Min(p => p.H_A_per_m), points.Max(p => p.H_A_per_m)), Axis.Linear(0, points.Max(p => p.B_T), 4), null, "peak flux density, T", "peak field strength, A/m");
        foreach (var (set, i) in sets.Select((s, i) => (s, i)))
        {
            var own = set.Magnetization.Where(p => p.H_A_per_m > 0).ToArray();
            chart.Line(new(set.Name, "T", [.. own.Select(p => p.H_A_per_m)], [.. own.Select(p => p.B_T)], LineLook.Of(i))
            {
                Dots = [.. own.Select(p => new XY(p.H_A_per_m, p.B_T))],
            });
        }

        if (beside is not null)
        {
            chart.Legend(upperLeft: false);
        }

        var columns = sets.SelectMany(s => new[] { new ChartColumn($"{s.Name} field strength (A/m)", [.. s.Magnetization.Select(p => p.H_A_per_m)]), new ChartColumn($"{s.Name} flux density (T)", [.. s.Magnetization.Select(p => p.B_T)]) });
        var words = sets.Select(s => $"{s.Name}: {s.Magnetization.Count} points" + (s.Magnetization.Count > 0 ? $" up to {Figures.With(Figures.Fixed(s.Magnetization[^1].B_T, 2), "T")} at {Figures.With(Figures.Significant(s.Magnetization[^1].H_A_per_m, 3), "A/m")}" : ""));
        return chart.Build("magnetization", "Magnetization curve", string.Join("; ", words) + ".", "field strength", "A/m", new ChartTable("magnetization.csv", [.. columns]));
    }

    /// <summary>Specific total loss against peak flux density, one line for each frequency.</summary>
    public static Chart Loss(SteelData steel, SteelData? beside, ChartOptions o)
    {
        ArgumentNullException.ThrowIfNull(steel);
        ArgumentNullException.ThrowIfNull(o);
        var curves = Curves(steel, 0).Concat(beside is null ? [] : Curves(beside, 1)).ToArray();
        var points = curves.SelectMany(c => c.Curve.Points).ToArray();
        Need(points.Length, "a loss curve");
        var chart = new ChartBuilder(o, Axis.Linear(0, points.Max(p => p.B_T), 4), Axis.Linear(0, points.Max(p => p.Loss_W_per_kg), 4), null, "specific total loss, W/kg", "peak flux density, T");
        foreach (var (set, place, curve, order) in curves)
        {
            var frequency = Figures.With(Figures.Plain(curve.Frequency_Hz, 1), "Hz");
            var look = LineLook.Of((2 * (order % 2)) + place);
            chart.Line(new($"{set.Name} {frequency}", "W/kg", [.. curve.Points.Select(p => p.B_T)], [.. curve.Points.Select(p => p.Loss_W_per_kg)], look)
            {
                Label = beside is null ? frequency : null,
                Dots = [.. curve.Points.Select(p => new XY(p.B_T, p.Loss_W_per_kg))],
            });
        }

        if (beside is not null)
        {
            chart.Legend(upperLeft: true);
        }

        var columns = curves.SelectMany(c => new[]
        {
            new ChartColumn($"{c.Set.Name} {Figures.Plain(c.Curve.Frequency_Hz, 1)} Hz flux density (T)", [.. c.Curve.Points.Select(p => p.B_T)]),
            new ChartColumn($"{c.Set.Name} {Figures.Plain(c.Curve.Frequency_Hz, 1)} Hz loss (W/kg)", [.. c.Curve.Points.Select(p => p.Loss_W_per_kg)]),
        });
        var words = curves.Select(c => $"{c.Set.Name} at {Figures.Plain(c.Curve.Frequency_Hz, 1)} Hz: " + (c.Curve.Points.Count > 0 ? $"{Figures.With(Figures.Significant(c.Curve.Points[^1].Loss_W_per_kg, 3), "W/kg")} at {Figures.With(Figures.Fixed(c.Curve.Points[^1].B_T, 2), "T")}" : "no points"));
        return chart.Build("loss", "Specific loss", string.Join("; ", words) + ".", "flux density", "T", new ChartTable("loss.csv", [.. columns]));
    }

    private static IEnumerable<(SteelData Set, int Place, LossCurve Curve, int Order)> Curves(SteelData set, int place) =>
        set.Loss.OrderBy(c => c.Frequency_Hz).Select((c, i) => (set, place, c, i));

    private static void Need(int points, string what)
    {
        if (points == 0)
        {
            throw new ArgumentException($"There is no point of {what} to draw.");
        }
    }
}
