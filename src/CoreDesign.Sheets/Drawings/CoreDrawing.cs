using System.Globalization;
using CoreDesign.Estimating.Contracts;
using CoreDesign.Sheets.Scenes;

namespace CoreDesign.Sheets.Drawings;

/// <summary>The drawings of a core, each made once as a scene, for the page and for the sheets.</summary>
public static class CoreDrawing
{
    /// <summary>Front view to scale, parts coloured and figured by the reading, dimensioned; typed dimensions carry the path of their field.</summary>
    public static Scene Front(EstimateResult r, Reading reading, DrawingOptions o)
    {
        ArgumentNullException.ThrowIfNull(r);
        ArgumentNullException.ThrowIfNull(o);
        var marks = new FrontView(r, reading, o.Checked()).Draw();
        return new Scene(o.Width, o.Height, $"{FormName(r)} core, front view", Describe(r, reading), marks);
    }

    internal static string FormName(EstimateResult r) => CoreZones.Limbs(r.Geometry) switch
    {
        2 => "Two-limb",
        3 => "Three-limb",
        4 => "Four-limb",
        5 => "Five-limb",
        var n => n.ToString(CultureInfo.InvariantCulture) + "-limb",
    };

    private static string Describe(EstimateResult r, Reading reading)
    {
        var g = r.Geometry;
        var readings = CoreZones.Of(r).GroupBy(z => z.Kind)
            .Select(k => (Name: FrontView.KindName(k.Key), Values: k.Select(z => z.Part is null ? null : Readings.Value(r, z.Part, reading)).OfType<double>().ToArray()))
            .Where(k => k.Values.Length > 0)
            .Select(k => Plural(k.Name) + " " + Span(k.Values, reading));
        return $"{Readings.Name(reading)}: {string.Join(", ", readings)}. "
            + $"Limb width {Mm(g.LimbWidth_mm)}, window {Mm(g.WindowHeight_mm)} high and {Mm(g.WindowWidth_mm)} wide, yoke height {Mm(g.YokeHeight_mm)}, "
            + $"limb pitch {Mm(g.LimbPitch_mm)}, overall {Mm(g.OverallWidth_mm)} wide and {Mm(g.OverallHeight_mm)} high.";
    }

    private static string Plural(string kind) => kind.ToLowerInvariant().Replace("t zone", "T zone", StringComparison.Ordinal) + "s";

    private static string Span(double[] values, Reading reading)
    {
        string low = Readings.Figure(values.Min(), reading), high = Readings.Figure(values.Max(), reading);
        return Figures.With(low == high ? low : $"{low} to {high}", Readings.Unit(reading));
    }

    private static string Mm(double length) => Figures.With(Figures.Plain(length, 2), "mm");
}
