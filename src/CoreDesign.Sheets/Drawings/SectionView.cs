using System.Globalization;
using CoreDesign.Estimating.Contracts;
using CoreDesign.Sheets.Scenes;

namespace CoreDesign.Sheets.Drawings;

/// <summary>Limb cross-section to scale with its circle and diameter, and beside it the table of steps.</summary>
internal sealed class SectionView(EstimateResult r, Reading reading, DrawingOptions o)
{
    private readonly List<Mark> _marks = [];
    private readonly DimensionPen _pen = new(o);

    public IReadOnlyList<Mark> Draw()
    {
        var core = r.Inputs.Core;
        var typed = FieldState.Typed(r, "core.limb.diameter_mm", core?.Limb?.Diameter_mm is not null);
        var d = DimensionText.Of("Circle diameter", r.Geometry.CircleDiameter_mm, 0, r.Geometry.CircleDiameter_mm, "core.limb.diameter_mm", typed, "\u00D8");
        var left = o.Dimensions ? _pen.Size + DimensionPen.Gap + 22 : 2;
        var table = TableWidth();
        var diameter = o.Scale is { } scale ? r.Geometry.CircleDiameter_mm * scale : Math.Min(o.Height - 12, Math.Max(o.Width - left - table - 20, 0.3 * o.Width));
        if (left + diameter + 2 > o.Width || diameter + 2 > o.Height)
        {
            throw new ArgumentException($"The section is {diameter:F0} across and doesn't fit {o.Width:F0} by {o.Height:F0}; take a smaller scale.");
        }

        var centre = new XY(left + (diameter / 2), 6 + (Math.Min(o.Height - 12, Math.Max(diameter, Math.Min(o.Height - 12, TableHeight()))) / 2));
        Circle(centre, diameter);
        if (o.Dimensions)
        {
            var fits = _pen.Fits(d, diameter);
            if (fits)
            {
                _marks.Add(_pen.Vertical(d, centre.Y - (diameter / 2), centre.Y + (diameter / 2), left - 16, centre.X));
            }
        }

        var x = left + diameter + 20;
        if (x + table <= o.Width + 0.5)
        {
            Table(x, o.Width - x);
        }

        return _marks;
    }

    private void Circle(XY centre, double diameter)
    {
        var scale = diameter / r.Geometry.CircleDiameter_mm;
        var row = CoreRow.Of(r);
        var limbs = r.Parts.Where(p => p.Kind == "limb").ToArray();
        var limb = Array.Find(limbs, p => p.Name == "limb" + row.Limbs[row.FirstWound].Letter) ?? limbs.FirstOrDefault();
        var value = limb is null ? null : Readings.Value(r, limb, reading);
        double? place = value is { } v ? Readings.Span(r, reading).Place(v) : null;
        Paint fill = place is { } t ? Paint.OnRamp(t) : Ink.Sunk;
        _marks.Add(new CircleMark(centre, diameter / 2, Paint.None, Ink.Ink3, 0.7, [10, 3, 2, 3]) { Part = "cc" });

        // Widest first; each further step lies outside the ones before it, half on either side.
        double inner = 0;
        foreach (var step in r.Geometry.LimbSteps)
        {
            var outer = inner + (step.Stack_mm / 2 * scale);
            double w = step.Width_mm * scale, x = centre.X - (w / 2);
            if (inner == 0)
            {
                _marks.Add(Plate(new Box(x, centre.Y - outer, w, 2 * outer), fill));
            }
            else
            {
                _marks.Add(Plate(new Box(x, centre.Y - outer, w, outer - inner), fill));
                _marks.Add(Plate(new Box(x, centre.Y + inner, w, outer - inner), fill));
            }

            inner = outer;
        }

        Figure(centre, scale, value, place);
    }

    private void Figure(XY centre, double scale, double? value, double? place)
    {
        if (value is not { } v || r.Geometry.LimbSteps.Count == 0)
        {
            return;
        }

        var first = r.Geometry.LimbSteps[0];
        var text = Figures.With(Readings.Figure(v, reading), Readings.Unit(reading));
        var ink = ReadingRamp.FigureOn(place ?? 0);
        if (first.Stack_mm * scale >= o.FigureSize + 2 && first.Width_mm * scale >= TextExtent.Width(text, o.FigureSize, true) + 8)
        {
            _marks.Add(new TextMark(new(centre.X, centre.Y + (o.FigureSize * 0.35)), text, o.FigureSize, Anchor.Middle, ink, Bold: true) { Part = "fg" });
        }
    }

    private static PathMark Plate(Box box, Paint fill) => Lines.Rectangle(box, fill, Ink.Ink, 0.5) with { Part = "pt2" };

    private double Row => o.TextSize + 2.2;

    private double NumberWidth => TextExtent.Width("16", o.TextSize) + 4;

    private double WidthColumn => Math.Max(TextExtent.Width("width mm", o.TextSize), r.Geometry.LimbSteps.Select(s => TextExtent.Width(Width(s), o.TextSize)).DefaultIfEmpty(0).Max());

    private double StackColumn => Math.Max(TextExtent.Width("stack mm", o.TextSize), r.Geometry.LimbSteps.Select(s => TextExtent.Width(Stack(s), o.TextSize)).DefaultIfEmpty(0).Max());

    private double TableWidth() => Math.Max(NumberWidth + WidthColumn + 12 + StackColumn, TextExtent.Width(Title, o.DimensionSize, true));

    private double TableHeight() => (2 * Row) + 4 + (r.Geometry.LimbSteps.Count * Row);

    private const string Title = "S\u2013S limb section";

    private void Table(double x, double room)
    {
        var steps = r.Geometry.LimbSteps;
        var typed = FieldState.Typed(r, "core.limbSteps", r.Inputs.Core?.LimbSteps is { Count: > 0 });
        var marks = new List<Mark> { new TextMark(new(x, 6 + (o.DimensionSize * 0.8)), Title, o.DimensionSize, Anchor.Start, Ink.Ink, Bold: true) };
        var head = 6 + (o.DimensionSize * 0.8) + Row + 1;
        var perBlock = Math.Max(1, (int)((o.Height - head - 4) / Row));
        double block = NumberWidth + WidthColumn + 12 + StackColumn, stride = block + 20;
        var blocks = Math.Max(1, (int)((room + 20.5) / stride));
        var shown = Math.Min(steps.Count, perBlock * blocks);

        // The last place says how many are left out, so that a short table never passes for the whole one.
        var cut = shown < steps.Count;
        for (var i = 0; i < shown; i++)
        {
            double left = x + (i / perBlock * stride), y = head + (((i % perBlock) + 1) * Row);
            if (i % perBlock == 0)
            {
                marks.Add(Cell(left + NumberWidth + WidthColumn, head, "width mm", Anchor.End, Ink.Ink3, false));
                marks.Add(Cell(left + block, head, "stack mm", Anchor.End, Ink.Ink3, false));
            }

            if (cut && i == shown - 1)
            {
                marks.Add(Cell(left, y, $"and {steps.Count - i} more", Anchor.Start, Ink.Ink2, false));
                break;
            }

            marks.Add(Cell(left, y, (i + 1).ToString(CultureInfo.InvariantCulture), Anchor.Start, Ink.Ink3, false));
            marks.Add(Cell(left + NumberWidth + WidthColumn, y, Width(steps[i]), Anchor.End, typed ? Ink.Ink : Ink.Ink2, !typed));
            marks.Add(Cell(left + block, y, Stack(steps[i]), Anchor.End, typed ? Ink.Ink : Ink.Ink2, !typed));
        }

        _marks.Add(new GroupMark(marks) { Part = "st" });
    }

    private TextMark Cell(double x, double y, string text, Anchor anchor, Ink ink, bool italic) => new(new(x, y), text, o.TextSize, anchor, ink, Italic: italic);

    private static string Width(StepResult s) => Figures.Plain(s.Width_mm, 1);

    private static string Stack(StepResult s) => Figures.Fixed(s.Stack_mm, 1);
}
