using CoreDesign.Sheets.Scenes;

namespace CoreDesign.Sheets.Drawings;

/// <summary>A dimension in the manner of ISO 129-1: what it says, the span in millimetres along its axis, and the field it is typed in.</summary>
internal sealed record DimensionText(string Text, double From_mm, double To_mm, string? FieldKey, bool Typed, string Label)
{
    /// <summary>A derived dimension stands in brackets (auxiliary dimension).</summary>
    public static DimensionText Of(string name, double value_mm, double from_mm, double to_mm, string? fieldKey, bool typed, string sign = "")
    {
        var figure = sign + Figures.Plain(value_mm, 2);
        return new(typed ? figure : $"({figure})", from_mm, to_mm, fieldKey, typed, typed ? $"{name} {figure} mm" : $"{name} {figure} mm, derived");
    }
}

/// <summary>
/// Draws dimensions. The text stands above its line and reads from below or from the right; where the span is too short for it,
/// the arrows look inward from outside and the line runs on under the text.
/// </summary>
internal sealed class DimensionPen(DrawingOptions options)
{
    /// <summary>From the line to the foot of its text, and how far extension lines go past the line or stay off the object.</summary>
    public const double Gap = 4.5;
    private const double Past = 4;
    private const double Off = 3;
    private const double Head = 8;
    public const double Tail = 13;

    public double Size => options.DimensionSize;

    /// <summary>Distance between neighbouring parallel dimension lines.</summary>
    public double Pitch => Size + Gap + 7.5;

    public double Width(DimensionText d) => TextExtent.Width(d.Text, Size, IsBold(d));

    public bool Fits(DimensionText d, double span) => span >= Math.Max(Width(d) + 8, (2 * Head) + 6);

    /// <param name="from">Ordinate of the object, where extension lines begin; null without them.</param>
    /// <param name="outside">Where the text starts (or ends, to the left) when it doesn't fit; null where it must fit.</param>
    /// <param name="middle">Middle of a text that fits but has to stand off the middle of its span.</param>
    public GroupMark Horizontal(DimensionText d, double x1, double x2, double y, double? from, double? outside = null, double? middle = null)
    {
        var marks = new List<Mark>();
        AddExtensions(marks, from, y, e => (new XY(x1, e.A), new XY(x1, e.B)), e => (new XY(x2, e.A), new XY(x2, e.B)));
        double lineFrom = x1, lineTo = x2, textAt = middle ?? ((x1 + x2) / 2);
        var anchor = Anchor.Middle;
        var fits = outside is null;
        if (outside is { } at)
        {
            var left = at < x1;
            anchor = left ? Anchor.End : Anchor.Start;
            textAt = at;
            lineFrom = left ? at - Width(d) : x1 - Tail;
            lineTo = left ? x2 + Tail : at + Width(d);
        }

        marks.Add(Lines.Line(new(lineFrom, y), new(lineTo, y), Ink.Ink2) with { Part = "dl" });
        marks.Add(Lines.Arrow(new(x1, y), fits ? -1 : 1, 0, Ink.Ink2));
        marks.Add(Lines.Arrow(new(x2, y), fits ? 1 : -1, 0, Ink.Ink2));
        marks.Add(Text(d, new(textAt, y - Gap), anchor, 0));
        return Group(d, marks, [new(Math.Min(x1, lineFrom), y - 6), new(Math.Max(x2, lineTo), y - 6)]);
    }

    /// <param name="outside">Where the text begins, above the span, when it doesn't fit.</param>
    public GroupMark Vertical(DimensionText d, double y1, double y2, double x, double? from, double? outside = null)
    {
        var marks = new List<Mark>();
        AddExtensions(marks, from, x, e => (new XY(e.A, y1), new XY(e.B, y1)), e => (new XY(e.A, y2), new XY(e.B, y2)));
        var fits = outside is null;
        var lineFrom = fits ? y1 : outside!.Value - Width(d);
        var lineTo = fits ? y2 : y2 + Tail;
        marks.Add(Lines.Line(new(x, lineFrom), new(x, lineTo), Ink.Ink2) with { Part = "dl" });
        marks.Add(Lines.Arrow(new(x, y1), 0, fits ? -1 : 1, Ink.Ink2));
        marks.Add(Lines.Arrow(new(x, y2), 0, fits ? 1 : -1, Ink.Ink2));
        marks.Add(Text(d, new(x - Gap, outside ?? (y1 + y2) / 2), fits ? Anchor.Middle : Anchor.Start, 90));
        return Group(d, marks, [new(x - 6, lineFrom), new(x - 6, lineTo)]);
    }

    private static void AddExtensions(List<Mark> marks, double? from, double line, Func<(double A, double B), (XY, XY)> first, Func<(double A, double B), (XY, XY)> second)
    {
        if (from is not { } start)
        {
            return;
        }

        var way = Math.Sign(line - start);
        var ends = (start + (way * Off), line + (way * Past));
        foreach (var (a, b) in new[] { first(ends), second(ends) })
        {
            marks.Add(Lines.Line(a, b, Ink.Ink3) with { Part = "ex" });
        }
    }

    private bool IsBold(DimensionText d) => d.Typed && options.Pressable;

    private TextMark Text(DimensionText d, XY at, Anchor anchor, double angle)
    {
        Ink ink = options.Pressable && d.FieldKey is not null ? Ink.Accent : d.Typed ? Ink.Ink : Ink.Ink2;
        return new(at, d.Text, Size, anchor, ink, Bold: IsBold(d), Angle: angle) { Part = "dt" };
    }

    private static GroupMark Group(DimensionText d, List<Mark> marks, IReadOnlyList<XY> hit) =>
        new(marks) { FieldKey = d.FieldKey, Label = d.Label, Part = d.Typed ? "dim" : "dim aux", Hit = hit };
}
