using CoreDesign.Sheets.Scenes;
using PdfSharp.Drawing;
using PdfSharp.Pdf;
using PdfSharp.UniversalAccessibility;

namespace CoreDesign.Sheets.Pdf;

/// <summary>
/// A whole sheet: title fields and blocks to the bytes of a tagged PDF. The same document gives the same bytes, whenever and
/// wherever it is rendered.
/// </summary>
internal sealed record SheetDocument(TitleFields Title, PaperSize Paper, IReadOnlyList<Block> Blocks)
{
    private const double Inset = 11;

    // The PDF library keeps its fonts in process-wide caches that number glyphs as they come; one sheet at a time keeps bytes the same.
    private static readonly Lock OneAtATime = new();

    /// <summary>Width that blocks get on this paper, in points.</summary>
    public static double ContentWidth(PaperSize size) => Pdf.Paper.Of(size).FrameWidth - (2 * Inset);

    /// <summary>Height for blocks on the first page, in points.</summary>
    public static double FirstPageHeight(PaperSize size) => Room(Pdf.Paper.Of(size), 0);

    public byte[] Render()
    {
        lock (OneAtATime)
        {
            return Finish();
        }
    }

    private static double Room(Paper paper, int page) => paper.FrameHeight - TitleBlock.Height(page == 0) - (2 * Inset);

    private byte[] Finish()
    {
        var paper = Pdf.Paper.Of(Paper);
        var pages = SheetFlow.Pages(Blocks, ContentWidth(Paper), page => Room(paper, page));

        using var document = new PdfDocument();
        document.Options.NoCompression = true;
        document.Options.CompressContentStreams = false;
        var metadata = Metadata();
        document.Info.Title = metadata.Title;
        document.Info.Author = metadata.Author;
        document.Info.Subject = metadata.Subject;
        document.Info.Creator = metadata.Creator;
        document.Info.CreationDate = Title.IssuedAt.UtcDateTime;
        document.Info.ModificationDate = Title.IssuedAt.UtcDateTime;
        document.ViewerPreferences.DisplayDocTitle = true;
        var accessibility = UAManager.ForDocument(document);
        accessibility.SetDocumentLanguage(Title.Language);
        var titleBlock = new TitleBlock(Title, paper);
        for (var p = 0; p < pages.Count; p++)
        {
            var page = document.AddPage();
            page.Width = XUnit.FromPoint(paper.Width);
            page.Height = XUnit.FromPoint(paper.Height);
            using var graphics = XGraphics.FromPdfPage(page);
            var canvas = new SheetCanvas(graphics, accessibility.StructureBuilder);
            Frame(canvas, paper);
            titleBlock.Paint(canvas, p + 1, pages.Count);
            SheetFlow.Paint(canvas, pages[p], Pdf.Paper.Left + Inset, Pdf.Paper.Top + Inset);
            foreach (var placed in pages[p].Where(s => s.Strip.Bookmark is not null))
            {
                var outline = document.Outlines.Add(placed.Strip.Bookmark!, page, true);
                outline.PageDestinationType = PdfPageDestinationType.Xyz;
                outline.Left = 0;
                outline.Top = paper.Height - Pdf.Paper.Top - Inset - placed.Y;
            }
        }

        using var raw = new MemoryStream();
        document.Save(raw, false);
        return PdfFinish.Run(raw.ToArray(), metadata);
    }

    private Xmp Metadata()
    {
        var face = SheetFonts.Face(Cut.Regular);
        return new Xmp(
            face.Printable($"{Title.IdentificationNumber}, {Title.DocumentType}: {Title.Title}"),
            face.Printable(Title.CreatedBy),
            face.Printable($"{Title.DocumentType}, revision {Title.RevisionIndex}, {Title.DocumentStatus}"),
            face.Printable(Title.FiguresBy),
            Title.IssuedAt);
    }

    private static void Frame(SheetCanvas canvas, Paper paper) => canvas.Artifact(() =>
    {
        double left = Pdf.Paper.Left, top = Pdf.Paper.Top, right = left + paper.FrameWidth, bottom = top + paper.FrameHeight;
        const double outside = 5 * Pdf.Paper.Mm;
        canvas.Rectangle(left, top, paper.FrameWidth, paper.FrameHeight, 0.8, Ink.Ink);

        // Centring marks of ISO 5457: 0.7 mm thick, at the middle of each side of the paper.
        const double thick = 0.7 * Pdf.Paper.Mm;
        canvas.Line(paper.Width / 2, top - outside, paper.Width / 2, top, thick, Ink.Ink);
        canvas.Line(paper.Width / 2, bottom, paper.Width / 2, bottom + outside, thick, Ink.Ink);
        canvas.Line(left - outside, paper.Height / 2, left, paper.Height / 2, thick, Ink.Ink);
        canvas.Line(right, paper.Height / 2, right + outside, paper.Height / 2, thick, Ink.Ink);
    });
}
