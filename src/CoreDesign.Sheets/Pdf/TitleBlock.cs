using CoreDesign.Sheets.Scenes;
using PdfSharp.Drawing;
using PdfSharp.UniversalAccessibility;

namespace CoreDesign.Sheets.Pdf;

/// <summary>The title block at the foot of the frame: whole on the first sheet, its identifying fields on the others.</summary>
internal sealed class TitleBlock(TitleFields fields, Paper paper)
{
    private const double Mm = Paper.Mm;
    private static readonly Type LabelType = new(Cut.Regular, 5.5, Ink.Ink2);
    private static readonly Type ValueType = new(Cut.Regular, 8);
    private static readonly Type StrongType = new(Cut.Bold, 8);
    private static readonly Type TitleType = new(Cut.Bold, 11);

    public static double Height(bool first) => (first ? 37 : 16.5) * Mm;

    public void Paint(SheetCanvas canvas, int page, int pages)
    {
        var first = page == 1;
        var left = Paper.Left;
        var top = Paper.Top + paper.FrameHeight - Height(first);
        if (first)
        {
            Whole(canvas, left, top, page, pages);
        }
        else
        {
            Short(canvas, left, top, page, pages);
        }
    }

    private void Whole(SheetCanvas canvas, double x, double y, int page, int pages)
    {
        var w = paper.FrameWidth;
        double[] cut = [0, w * 0.289, w * 0.571, w * 0.853, w];
        double[] row = [0, 13 * Mm, 21 * Mm, 29 * Mm, Height(true)];
        canvas.Artifact(() =>
        {
            Rule(canvas, x, y, x + w, y);
            Rule(canvas, x + cut[1], y + row[1], x + w, y + row[1]);
            Rule(canvas, x, y + row[2], x + w, y + row[2]);
            Rule(canvas, x, y + row[3], x + w, y + row[3]);
            Rule(canvas, x + cut[1], y, x + cut[1], y + row[4]);
            Rule(canvas, x + cut[2], y + row[1], x + cut[2], y + row[4]);
            Rule(canvas, x + cut[3], y, x + cut[3], y + row[4]);
        });

        canvas.Block(PdfBlockLevelElementTag.Heading1, () => Line(canvas, fields.Title, x + cut[1], y, 19.5, cut[3] - cut[1], TitleType, 7.5));
        Label(canvas, "Title, supplementary title", x + cut[1], y);
        Note(canvas, fields.SupplementaryTitle, x + cut[1], y, 31, cut[3] - cut[1]);
        Label(canvas, "Legal owner", x, y);
        canvas.Block(PdfBlockLevelElementTag.Paragraph, () => Line(canvas, fields.LegalOwner, x, y, 19.5, cut[1], TitleType, 7.5));
        if (fields.OwnerNote.Length > 0)
        {
            canvas.Block(PdfBlockLevelElementTag.Paragraph, () => Line(canvas, fields.OwnerNote, x, y, 31, cut[1], StrongType with { Paint = Ink.Bad }, 6));
        }

        Field(canvas, "Identification number", fields.IdentificationNumber, x + cut[3], y, w - cut[3], StrongType);
        Field(canvas, "Document type", fields.DocumentType, x + cut[1], y + row[1], cut[2] - cut[1]);
        Field(canvas, "Document status", fields.DocumentStatus, x + cut[2], y + row[1], cut[3] - cut[2]);
        Field(canvas, "Revision index", fields.RevisionIndex, x + cut[3], y + row[1], w - cut[3], StrongType);
        Field(canvas, "Responsible department", fields.Department, x, y + row[2], cut[1]);
        Field(canvas, "Created by", fields.CreatedBy, x + cut[1], y + row[2], cut[2] - cut[1]);
        Field(canvas, "Approved by", fields.ApprovedBy, x + cut[2], y + row[2], cut[3] - cut[2]);
        Field(canvas, "Date of issue", fields.DateOfIssue, x + cut[3], y + row[2], w - cut[3]);
        Label(canvas, "Projection", x, y + row[3]);
        ProjectionSymbol.Paint(canvas, x + (cut[1] / 2) - (10 * Mm), y + row[3] + (0.3 * Mm), paper.FirstAngle);
        Field(canvas, "Scale", fields.Scale, x + cut[1], y + row[3], cut[2] - cut[1]);
        Field(canvas, "Figures by", fields.FiguresBy, x + cut[2], y + row[3], cut[3] - cut[2]);
        Field(canvas, "Language, sheet", $"{fields.Language}, page {page} of {pages}", x + cut[3], y + row[3], w - cut[3]);
    }

    private void Short(SheetCanvas canvas, double x, double y, int page, int pages)
    {
        var w = paper.FrameWidth;
        double[] cut = [0, w * 0.289, w * 0.571, w * 0.712, w * 0.853, w];
        var row = Height(false) / 2;
        canvas.Artifact(() =>
        {
            Rule(canvas, x, y, x + w, y);
            Rule(canvas, x, y + row, x + w, y + row);
            foreach (var c in cut[1..^1])
            {
                // The title takes three cells of the upper row.
                Rule(canvas, x + c, c == cut[1] || c == cut[4] ? y : y + row, x + c, y + (2 * row));
            }

            Field(canvas, "Legal owner", fields.LegalOwner, x, y, cut[1], StrongType, tagged: false);
            Field(canvas, "Title", fields.Title, x + cut[1], y, cut[4] - cut[1], StrongType, tagged: false);
            Field(canvas, "Identification number", fields.IdentificationNumber, x + cut[4], y, w - cut[4], StrongType, tagged: false);
            Field(canvas, "Document type, status", $"{fields.DocumentType}, {fields.DocumentStatus}", x, y + row, cut[1], tagged: false);
            Field(canvas, "Created by; approved by", $"{fields.CreatedBy}; {fields.ApprovedBy}", x + cut[1], y + row, cut[2] - cut[1], tagged: false);
            Field(canvas, "Date of issue", fields.DateOfIssue, x + cut[2], y + row, cut[3] - cut[2], tagged: false);
            Field(canvas, "Revision index", fields.RevisionIndex, x + cut[3], y + row, cut[4] - cut[3], StrongType, tagged: false);
            Field(canvas, "Language, sheet", $"{fields.Language}, page {page} of {pages}", x + cut[4], y + row, w - cut[4], tagged: false);
        });
    }

    private static void Rule(SheetCanvas canvas, double x1, double y1, double x2, double y2) => canvas.Line(x1, y1, x2, y2, 0.6, Ink.Ink);

    private static void Field(SheetCanvas canvas, string label, string value, double x, double y, double width, Type? type = null, bool tagged = true)
    {
        Label(canvas, label, x, y, tagged);
        void Value() => Line(canvas, value, x, y, 18, width, type ?? ValueType, 5.5);
        if (tagged)
        {
            canvas.Block(PdfBlockLevelElementTag.Paragraph, Value);
        }
        else
        {
            Value();
        }
    }

    private static void Label(SheetCanvas canvas, string label, double x, double y, bool tagged = true)
    {
        void Draw() => canvas.Text(label, x + 4.5, y + 7.6, LabelType);
        if (tagged)
        {
            canvas.Block(PdfBlockLevelElementTag.Paragraph, Draw);
        }
        else
        {
            Draw();
        }
    }

    private static void Note(SheetCanvas canvas, string text, double x, double y, double baseline, double width)
    {
        if (text.Length > 0)
        {
            canvas.Block(PdfBlockLevelElementTag.Paragraph, () => Line(canvas, text, x, y, baseline, width, ValueType, 6));
        }
    }

    private static void Line(SheetCanvas canvas, string text, double x, double y, double baseline, double width, Type type, double smallest)
    {
        var (fitted, own) = TextWrap.Fit(text, type, width - 9, smallest);
        canvas.Text(fitted, x + 4.5, y + baseline, own);
    }
}
