using CoreDesign.Sheets.Scenes;
using PdfSharp.Drawing;
using PdfSharp.Pdf;
using PdfSharp.UniversalAccessibility;

namespace CoreDesign.Sheets.Pdf;

/// <summary>How a text is set: cut, size in points, ink.</summary>
internal readonly record struct Type(Cut Cut, double Size, Paint Paint)
{
    public Type(Cut cut, double size, Ink ink = Ink.Ink)
        : this(cut, size, (Paint)ink)
    {
    }

    public double Width(string text) => SheetFonts.Face(Cut).Width(text, Size);
}

/// <summary>One page to draw on, in points from its top left; every text and line goes through here, inside a structure tag or as an artifact.</summary>
internal sealed class SheetCanvas(XGraphics graphics, StructureBuilder tags)
{
    /// <summary>Draws what belongs to no reading order: frames, rules, repeated furniture.</summary>
    public void Artifact(Action draw)
    {
        tags.BeginArtifact();
        draw();
        tags.End();
    }

    public void Group(PdfGroupingElementTag tag, Action draw)
    {
        tags.BeginElement(tag);
        draw();
        tags.End();
    }

    public void Block(PdfBlockLevelElementTag tag, Action draw)
    {
        Begin(tag);
        draw();
        End();
    }

    public void Begin(PdfBlockLevelElementTag tag) => tags.BeginElement(tag);

    public void End() => tags.End();

    /// <summary>A cell of a table; a head cell says whether it stands over a column or before a row.</summary>
    public void Cell(bool head, string scope, Action draw)
    {
        Begin(head ? PdfBlockLevelElementTag.TableHeaderCell : PdfBlockLevelElementTag.TableDataCell);
        if (head)
        {
            var attributes = new PdfDictionary();
            attributes.Elements["/O"] = new PdfName("/Table");
            attributes.Elements["/Scope"] = new PdfName("/" + scope);
            tags.CurrentStructureElement.Elements["/A"] = attributes;
        }

        draw();
        End();
    }

    public void Figure(string description, XRect box, Action draw)
    {
        tags.BeginElement(PdfIllustrationElementTag.Figure, description, box);
        draw();
        tags.End();
    }

    /// <summary>Sets one line of text on its baseline; nothing is drawn for an empty one.</summary>
    public void Text(string text, double x, double baseline, Type type, Anchor anchor = Anchor.Start)
    {
        var printable = SheetFonts.Face(type.Cut).Printable(text);
        if (printable.AsSpan().Trim().Length == 0 || PaperColours.Of(type.Paint) is not { } colour)
        {
            return;
        }

        var shift = anchor switch
        {
            Anchor.Middle => type.Width(printable) / 2,
            Anchor.End => type.Width(printable),
            _ => 0,
        };
        graphics.DrawString(printable, SheetFonts.Font(type.Cut, type.Size), new XSolidBrush(colour), x - shift, baseline, XStringFormats.BaseLineLeft);
    }

    /// <summary>Sets lines below one another from a top left corner.</summary>
    public void Lines(IReadOnlyList<string> lines, double x, double top, Type type)
    {
        for (var i = 0; i < lines.Count; i++)
        {
            Text(lines[i], x, top + (i * type.Line()) + type.Baseline(), type);
        }
    }

    /// <summary>As <see cref="Text"/>, turned counter-clockwise about its anchor.</summary>
    public void TurnedText(string text, double x, double baseline, Type type, Anchor anchor, double degrees)
    {
        var state = graphics.Save();
        graphics.RotateAtTransform(-degrees, new XPoint(x, baseline));
        Text(text, x, baseline, type, anchor);
        graphics.Restore(state);
    }

    public void Line(double x1, double y1, double x2, double y2, double width, Ink ink) =>
        graphics.DrawLine(new XPen(PaperColours.Of(ink), width), x1, y1, x2, y2);

    public void Rectangle(double x, double y, double width, double height, double stroke, Ink ink) =>
        graphics.DrawRectangle(new XPen(PaperColours.Of(ink), stroke), x, y, width, height);

    public void Fill(double x, double y, double width, double height, Ink ink) =>
        graphics.DrawRectangle(new XSolidBrush(PaperColours.Of(ink)), x, y, width, height);

    public void Path(XPoint[] points, bool closed, XPen? pen, XBrush? brush)
    {
        var path = new XGraphicsPath();
        path.AddLines(points);
        if (closed)
        {
            path.CloseFigure();
        }

        graphics.DrawPath(pen, brush, path);
    }

    public void Ellipse(double x, double y, double width, double height, XPen? pen, XBrush? brush) =>
        graphics.DrawEllipse(pen, brush, x, y, width, height);
}
