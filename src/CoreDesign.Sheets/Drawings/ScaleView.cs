using CoreDesign.Estimating.Contracts;
using CoreDesign.Sheets.Scenes;

namespace CoreDesign.Sheets.Drawings;

/// <summary>The legend of a reading: the ramp with its ticks, and a triangle at the value of each part.</summary>
internal static class ScaleView
{
    private const int Slices = 48;

    public static IReadOnlyList<Mark> Draw(EstimateResult r, Reading reading, DrawingOptions o)
    {
        var span = Readings.Span(r, reading);
        var ticks = span.Ticks;
        var unit = Readings.Unit(reading);
        var half = Math.Max(TextExtent.Width(ticks.Label(ticks.Low), o.TextSize), TextExtent.Width(ticks.Label(ticks.High), o.TextSize)) / 2;
        double left = Math.Max(half, 4) + 1, right = o.Width - half - 6 - TextExtent.Width(unit, o.TextSize) - 1, width = right - left;
        const double top = 12, thick = 8;
        var marks = new List<Mark>();
        double At(double value) => left + ((value - ticks.Low) / (ticks.High - ticks.Low) * width);

        // Each slice runs on to the end, so that no seam shows between neighbours.
        for (var i = 0; i < Slices; i++)
        {
            var share = (i + 0.5) / Slices;
            var x = left + (width * i / Slices);
            marks.Add(Lines.Rectangle(new(x, top, right - x, thick), Paint.OnRamp(span.LowIsDark ? 1 - share : share), Paint.None));
        }

        var last = double.NegativeInfinity;
        foreach (var value in ticks.Values)
        {
            var x = At(value);
            marks.Add(Lines.Line(new(x, top + thick), new(x, top + thick + 3), Ink.Edge, 1));
            var label = new TextMark(new(x, top + thick + 4 + o.TextSize), ticks.Label(value), o.TextSize, Anchor.Middle, Ink.Ink2);
            var box = TextExtent.Of(label);
            if (box.X > last + 4)
            {
                marks.Add(label);
                last = box.Right;
            }
        }

        marks.Add(new TextMark(new(Math.Max(right + half + 6, last + 6), top + thick + 4 + o.TextSize), unit, o.TextSize, Anchor.Start, Ink.Ink2));
        foreach (var group in r.Parts.Where(p => p.Kind != "joint").Select(p => Readings.Value(r, p, reading)).OfType<double>().GroupBy(v => Readings.Figure(v, reading)))
        {
            var x = At(Math.Clamp(group.First(), ticks.Low, ticks.High));
            marks.Add(new PathMark([new(x, top - 1), new(x - 3.5, top - 7), new(x + 3.5, top - 7)], true, Ink.Ink, Paint.None) { Label = Figures.With(group.Key, unit) });
        }

        return marks;
    }
}
