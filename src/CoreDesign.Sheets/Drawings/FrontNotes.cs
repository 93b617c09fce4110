using CoreDesign.Sheets.Charts;
using CoreDesign.Sheets.Scenes;

namespace CoreDesign.Sheets.Drawings;

/// <summary>The marks of the front view that carry no result: scale bar and section cut.</summary>
internal static class FrontNotes
{
    /// <summary>A bar of two equal round lengths, as long as the room to the right of x allows; null where none fits.</summary>
    public static GroupMark? ScaleBar(double x, double y, double scale, DrawingOptions o)
    {
        foreach (var wanted in new[] { 34.0, 26, 20, 14 })
        {
            var length = NiceTicks.NiceStep(wanted / scale);
            double half = length * scale;
            var figure = Figures.Plain(2 * length, 6);

            // The figure of the last label stands over the end of the bar, its unit runs on beyond.
            var last = new TextMark(new(x + (2 * half) - (TextExtent.Width(figure, o.TextSize) / 2), y - 5), Figures.With(figure, "mm"), o.TextSize, Anchor.Start, Ink.Ink2);
            if (TextExtent.Of(last).Right <= o.Width && TextExtent.Of(last).X >= x + 10)
            {
                return ScaleBar(x, y, half, Figures.Plain(length, 6), last, o);
            }
        }

        return null;
    }

    private static GroupMark ScaleBar(double x, double y, double half, string middleFigure, TextMark last, DrawingOptions o)
    {
        var first = new TextMark(new(x, y - 5), "0", o.TextSize, Anchor.Start, Ink.Ink2);
        var marks = new List<Mark>
        {
            Lines.Rectangle(new(x, y, half, 4), Ink.Ink2, Ink.Ink2, 0.75),
            Lines.Rectangle(new(x + half, y, half, 4), Paint.None, Ink.Ink2, 0.75),
            first,
            last,
        };
        var middle = new TextMark(new(x + half, y - 5), middleFigure, o.TextSize, Anchor.Middle, Ink.Ink2);
        var box = TextExtent.Of(middle).Grown(4);
        if (!box.Overlaps(TextExtent.Of(last)) && !box.Overlaps(TextExtent.Of(first)))
        {
            marks.Add(middle);
        }

        return new GroupMark(marks) { Part = "sb", Label = $"Scale bar, {last.Text}" };
    }

    /// <summary>Section S–S across a limb: chain line, thick ends, arrows looking down.</summary>
    public static GroupMark Cut(Box limb, double y, double size)
    {
        var marks = new List<Mark> { Lines.Line(new(limb.X, y), new(limb.Right, y), Ink.Black, 0.6, Lines.DashDot) };
        foreach (var (inner, way) in new[] { (limb.X - 4, -1), (limb.Right + 4, 1) })
        {
            var at = inner + (way * 8);
            marks.Add(Lines.Line(new(inner, y), new(inner + (way * 10), y), Ink.Ink, 1.6));
            marks.Add(Lines.Line(new(at, y), new(at, y + 6), Ink.Ink));
            marks.Add(Lines.Arrow(new(at, y + 12), 0, 1, Ink.Ink, 7));
            marks.Add(new TextMark(new(at + (way * 3), y - 5.5), "S", size, way < 0 ? Anchor.End : Anchor.Start, Ink.Ink, Bold: true));
        }

        return new GroupMark(marks) { Part = "cut", Label = "Section S–S" };
    }
}
