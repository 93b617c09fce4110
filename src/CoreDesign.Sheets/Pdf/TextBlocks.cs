using CoreDesign.Sheets.Scenes;
using PdfSharp.UniversalAccessibility;

namespace CoreDesign.Sheets.Pdf;

/// <summary>Sizes and leading of a sheet's type, in points.</summary>
internal static class TypeScale
{
    public const double Leading = 1.28;

    public static readonly Type Body = new(Cut.Regular, 8);
    public static readonly Type Strong = new(Cut.Bold, 8);
    public static readonly Type Derived = new(Cut.Italic, 8);
    public static readonly Type Label = new(Cut.Regular, 8, Ink.Ink2);
    public static readonly Type Small = new(Cut.Regular, 6.5, Ink.Ink3);
    public static readonly Type Alarm = new(Cut.Bold, 8, Ink.Bad);
    public static readonly Type Heading = new(Cut.Bold, 9.5);

    public static double Line(this Type type) => type.Size * Leading;

    /// <summary>Baseline of the first line below its top, so that ascenders and descenders share the leading.</summary>
    public static double Baseline(this Type type) => type.Size * 0.99;
}

/// <summary>A section's or a figure's name.</summary>
internal sealed record Heading(string Text, bool Section = true) : Block
{
    public override IEnumerable<Strip> Strips(double width)
    {
        var type = TypeScale.Heading;
        foreach (var (line, index) in TextWrap.Lines(Text, type, width).Select((l, i) => (l, i)))
        {
            yield return new Strip(type.Line() + 1, (canvas, x, y) =>
                canvas.Block(Section ? PdfBlockLevelElementTag.Heading2 : PdfBlockLevelElementTag.Heading3, () => canvas.Text(line, x, y + type.Baseline(), type)))
            {
                Gap = index == 0 ? 9 : 0,
                KeepWithNext = true,
                Bookmark = index == 0 && Section ? Text : null,
            };
        }
    }
}

/// <summary>Running text of at most <paramref name="Most"/> lines; with <paramref name="Marked"/> a bar at its left says that it must not be overlooked.</summary>
internal sealed record Paragraph(string Text, Type Type, bool Marked = false, int Most = int.MaxValue) : Block
{
    // So that a text longer than a page can go on over the next.
    private const int LinesInStrip = 12;

    public override IEnumerable<Strip> Strips(double width)
    {
        var indent = Marked ? 7 : 0;
        var padding = Marked ? 2.5 : 0;
        var gap = 3;
        foreach (var lines in TextWrap.Lines(Text, Type, width - indent, Most).Chunk(LinesInStrip))
        {
            var height = (lines.Length * Type.Line()) + (2 * padding);
            yield return new Strip(height, (canvas, x, y) =>
            {
                if (Marked)
                {
                    canvas.Artifact(() => canvas.Fill(x, y, 2, height, Ink.Bad));
                }

                canvas.Block(PdfBlockLevelElementTag.Paragraph, () => canvas.Lines(lines, x + indent, y + padding, Type));
            })
            { Gap = gap };
            gap = 0;
        }
    }
}

/// <summary>A list of remarks, one dot each; <paramref name="Together"/> keeps them on one page.</summary>
internal sealed record Notes(IReadOnlyList<string> Items, bool Together = false) : Block
{
    private const double Indent = 9;
    private const int Most = 20;

    public override IEnumerable<Strip> Strips(double width)
    {
        var group = new StripGroup(PdfBlockLevelElementTag.List, null);
        foreach (var (item, index) in Items.Select((item, index) => (item, index)))
        {
            var type = TypeScale.Body;
            var lines = TextWrap.Lines(item, type, width - Indent, Most);
            yield return new Strip(lines.Count * type.Line(), (canvas, x, y) => canvas.Block(PdfBlockLevelElementTag.ListItem, () =>
            {
                canvas.Block(PdfBlockLevelElementTag.Label, () => canvas.Text("•", x + 1, y + type.Baseline(), type));
                canvas.Block(PdfBlockLevelElementTag.ListBody, () => canvas.Lines(lines, x + Indent, y, type));
            }))
            { Group = group, Gap = 1.5, KeepWithNext = Together && index < Items.Count - 1 };
        }
    }
}
