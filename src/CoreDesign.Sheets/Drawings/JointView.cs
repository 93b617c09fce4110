using System.Globalization;
using CoreDesign.Estimating.Contracts;
using CoreDesign.Sheets.Scenes;

namespace CoreDesign.Sheets.Drawings;

/// <summary>
/// Detail Z: the book of sheets cut across the joint. Lengths along the sheets are to scale with one another, thicknesses are not.
/// </summary>
internal sealed class JointView(EstimateResult r, DrawingOptions o)
{
    private readonly List<Mark> _marks = [];
    private readonly DimensionPen _pen = new(o);

    public static string Name(string type) => type switch
    {
        "buttLap" => "butt-lap",
        "mitredOverlap" => "mitred overlap",
        "stepLap" => "step-lap",
        _ => type,
    };

    public IReadOnlyList<Mark> Draw()
    {
        var positions = Math.Clamp(r.Joint.Positions, 1, 40);
        var perPosition = Math.Clamp(r.Joint.SheetsPerPosition, 1, 10);
        double top = o.DimensionSize + 10 + _pen.Pitch - 4, bottom = o.Height - _pen.Pitch - 8;
        var room = Math.Max(bottom - top, 8);
        var books = room / (2 * positions * perPosition) >= 2.5 ? 2 : 1;
        var rows = books * positions * perPosition;
        if (room / rows < 1.5)
        {
            // So many sheets that single ones can't be seen; the sheets of a position are drawn as one.
            (perPosition, rows) = (1, books * positions);
        }

        var pitch = Math.Min(room / rows, 7);
        var joint = r.Inputs.Joint;
        double shift = Math.Max(joint?.Overlap_mm ?? 0, 0), gap = Math.Max(joint?.Gap_mm ?? 0, 0);
        var unit = shift > 0 ? shift : Math.Max(gap, 1);
        var scale = o.Width / ((positions + 2.5) * unit);
        var gapPx = Math.Clamp(gap * scale, 1.2, 0.4 * o.Width);

        // A square joint laps by the width of a plate; its two places are drawn apart without a scale.
        var step = shift > 0 ? shift * scale : 0.3 * o.Width / positions;
        gapPx = shift > 0 ? gapPx : Math.Min(gapPx, 6);
        var first = (o.Width - ((positions - 1) * step) - gapPx) / 2;
        Head(positions, perPosition, books);
        for (var row = 0; row < rows; row++)
        {
            var x = first + (row / perPosition % positions * step);
            var y = top + (row * pitch);
            _marks.Add(Lines.Rectangle(new(0, y, x, pitch * 0.84), Ink.SheetA, Paint.None) with { Part = "sa" });
            _marks.Add(Lines.Rectangle(new(x + gapPx, y, o.Width - x - gapPx, pitch * 0.84), Ink.SheetB, Paint.None) with { Part = "sb" });
        }

        var end = top + (rows * pitch);
        if (o.Dimensions)
        {
            Dimensions(first, gapPx, shift, scale, positions, top, end - (pitch * perPosition), end);
        }

        return _marks;
    }

    private void Head(int positions, int perPosition, int books)
    {
        var full = $"Z {Name(r.Joint.Type)}, {Count(positions, "position")}, {Count(books, "book")}";
        var sheets = perPosition > 1 ? $", {Count(r.Joint.SheetsPerPosition, "sheet")} each" : "";
        var text = TextExtent.Width(full + sheets, o.DimensionSize, true) <= o.Width ? full + sheets : TextExtent.Width(full, o.DimensionSize, true) <= o.Width ? full : "Z " + Name(r.Joint.Type);
        _marks.Add(new TextMark(new(0, 6 + (o.DimensionSize * 0.8)), text, o.DimensionSize, Anchor.Start, Ink.Ink, Bold: true));
    }

    private void Dimensions(double first, double gapPx, double shift, double scale, int positions, double top, double lastTop, double end)
    {
        var joint = r.Inputs.Joint;
        if (joint?.Gap_mm is { } gap && !r.Joint.EffectiveGapUsed)
        {
            var d = DimensionText.Of("Gap, normal to the joint line,", gap, 0, gap, "joint.gap_mm", FieldState.Typed(r, "joint.gap_mm", true));
            double at = first + gapPx + DimensionPen.Tail;
            at = at + _pen.Width(d) <= o.Width ? at : first - DimensionPen.Tail;
            _marks.Add(_pen.Horizontal(d, first, first + gapPx, top - 8, top + 2, _pen.Fits(d, gapPx) ? null : at));
        }

        var taken = new List<Box>();
        if (positions > 1 && shift > 0)
        {
            var d = DimensionText.Of("Overlap, shift between neighbouring positions,", shift, 0, shift, "joint.overlap_mm", FieldState.Typed(r, "joint.overlap_mm", true));
            double x2 = first + ((positions - 1) * shift * scale), x1 = x2 - (shift * scale), after = x2 + DimensionPen.Tail;
            double? outside = _pen.Fits(d, x2 - x1) ? null : after + _pen.Width(d) <= o.Width ? after : x1 - DimensionPen.Tail;
            var dimension = _pen.Horizontal(d, x1, x2, end + _pen.Pitch - 2, lastTop, outside);
            _marks.Add(dimension);
            taken.AddRange(TextExtent.Texts([dimension]).Select(t => TextExtent.Of(t).Grown(4)));
            taken.Add(new Box(x1 - 4, end, x2 - x1 + 8, _pen.Pitch + 4));
        }

        // The names of the two sides yield to the dimension.
        var foot = end + o.TextSize + 1;
        foreach (var side in new[] { new TextMark(new(0, foot), "limb", o.TextSize, Anchor.Start, Ink.Ink2), new TextMark(new(o.Width, foot), "yoke", o.TextSize, Anchor.End, Ink.Ink2) })
        {
            if (!taken.Exists(t => t.Overlaps(TextExtent.Of(side))))
            {
                _marks.Add(side);
                taken.Add(TextExtent.Of(side).Grown(4));
            }
        }
    }

    private static string Count(int n, string what) => n.ToString(CultureInfo.InvariantCulture) + " " + what + (n == 1 ? "" : "s");
}
