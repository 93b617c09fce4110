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
        return new Scene(o.Width, o.Height, $"{FormName(r)} core, front view{(r.Geometry.Units > 1 ? $", one of {Figures.Plain(r.Geometry.Units)} units" : "")}", Describe(r, reading), marks);
    }

    /// <summary>Limb cross-section with circle, diameter and the table of steps beside it. <see cref="DrawingOptions.Scale"/> holds for the circle.</summary>
    public static Scene Section(EstimateResult r, Reading reading, DrawingOptions o)
    {
        ArgumentNullException.ThrowIfNull(r);
        ArgumentNullException.ThrowIfNull(o);
        var g = r.Geometry;
        var steps = string.Join("; ", g.LimbSteps.Select(s => $"{Figures.Plain(s.Width_mm, 1)} by {Figures.Fixed(s.Stack_mm, 1)}"));
        var count = g.LimbSteps.Count == 1 ? "1 step" : g.LimbSteps.Count.ToString(CultureInfo.InvariantCulture) + " steps";
        return new Scene(o.Width, o.Height, "Limb section S–S", $"Circle of {Mm(g.CircleDiameter_mm)}, {count}, width by stack in mm: {steps}.", new SectionView(r, reading, o.Checked()).Draw());
    }

    /// <summary>The book of sheets at a joint, each position drawn, gap and overlap dimensioned; thickness not to scale.</summary>
    public static Scene JointDetail(EstimateResult r, DrawingOptions o)
    {
        ArgumentNullException.ThrowIfNull(r);
        ArgumentNullException.ThrowIfNull(o);
        var joint = r.Inputs.Joint;
        var text = $"{JointView.Name(r.Joint.Type)} joint, {r.Joint.Positions.ToString(CultureInfo.InvariantCulture)} positions in a book, {r.Joint.SheetsPerPosition.ToString(CultureInfo.InvariantCulture)} sheets for each position"
            + (joint?.Gap_mm is { } gap ? $", gap {Mm(gap)}" : "") + (joint?.Overlap_mm is { } overlap ? $", overlap {Mm(overlap)}" : "") + ".";
        return new Scene(o.Width, o.Height, "Joint detail Z", char.ToUpperInvariant(text[0]) + text[1..], new JointView(r, o.Checked()).Draw());
    }

    /// <summary>Legend of the ramp; 232 by 36 does for a page.</summary>
    public static Scene ReadingScale(EstimateResult r, Reading reading, double width = 232, double textSize = 11)
    {
        ArgumentNullException.ThrowIfNull(r);
        ArgumentOutOfRangeException.ThrowIfLessThan(width, 120);
        var o = new DrawingOptions { Width = width, Height = 80, TextSize = textSize }.Checked();
        var ticks = Readings.Span(r, reading).Ticks;
        return new Scene(width, textSize + 27, "Scale of the reading", $"{Readings.Name(reading)} from {ticks.Label(ticks.Low)} to {Figures.With(ticks.Label(ticks.High), Readings.Unit(reading))}; darker is nearer the limit.", ScaleView.Draw(r, reading, o));
    }

    internal static string FormName(EstimateResult r) => CoreRow.Of(r).Limbs.Count switch
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
        var row = CoreRow.Of(r);
        var readings = CoreZones.Of(r).GroupBy(z => z.Name, StringComparer.Ordinal)
            .Select(k => (Name: k.Key, Values: k.Select(z => z.Part is null ? null : Readings.Value(r, z.Part, reading)).OfType<double>().ToArray()))
            .Where(k => k.Values.Length > 0)
            .Select(k => Plural(k.Name) + " " + Span(k.Values, reading));
        return $"{Readings.Name(reading)}: {string.Join(", ", readings)}. "
            + $"Limb width {Mm(g.LimbWidth_mm)}, {(row.Limbs[0].IsReturn ? $"return limb width {Mm(row.Limbs[0].Width_mm)}, " : "")}window {Mm(g.WindowHeight_mm)} high and {Mm(g.WindowWidth_mm)} wide, "
            + $"{(g.ReturnWindowWidth_mm is { } beside ? $"beside a return limb {Mm(beside)} wide, " : "")}yoke height {Mm(g.YokeHeight_mm)}, "
            + $"limb pitch {Mm(g.LimbPitch_mm)}, overall {Mm(g.OverallWidth_mm)} wide and {Mm(g.OverallHeight_mm)} high."
            + (g.Units > 1 ? $" One of {Figures.Plain(g.Units)} units alike." : "");
    }

    private static string Plural(string kind) => kind.ToLowerInvariant().Replace("t zone", "T zone", StringComparison.Ordinal) + "s";

    private static string Span(double[] values, Reading reading)
    {
        string low = Readings.Figure(values.Min(), reading), high = Readings.Figure(values.Max(), reading);
        return Figures.With(low == high ? low : $"{low} to {high}", Readings.Unit(reading));
    }

    private static string Mm(double length) => Figures.With(Figures.Plain(length, 2), "mm");
}
