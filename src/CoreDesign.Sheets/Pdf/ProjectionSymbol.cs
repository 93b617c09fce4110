using CoreDesign.Sheets.Scenes;
using PdfSharp.Drawing;

namespace CoreDesign.Sheets.Pdf;

/// <summary>The frustum of a cone in two views (ISO 5456-2): its side view left of the end view for the first angle, right of it for the third.</summary>
internal static class ProjectionSymbol
{
    private const double Mm = Paper.Mm;

    public static void Paint(SheetCanvas canvas, double x, double y, bool firstAngle)
    {
        var name = firstAngle ? "First-angle projection" : "Third-angle projection";
        canvas.Figure(name, new XRect(x, y, 21 * Mm, 8 * Mm), () =>
        {
            var pen = new XPen(PaperColours.Of(Ink.Ink), 0.8);
            var centre = new XPen(PaperColours.Of(Ink.Ink), 0.35) { DashPattern = [10, 3, 2, 3] };
            var middle = y + (4 * Mm);
            var cone = x + (firstAngle ? 1 : 12) * Mm;
            var ring = x + (firstAngle ? 16 : 5) * Mm;

            // The end view is taken from the left, at the small end, so both rings are seen: first angle puts it right, third left.
            const double small = 1.1, large = 2.4;
            canvas.Path(
                [
                    new XPoint(cone, middle - (small * Mm)), new XPoint(cone + (8 * Mm), middle - (large * Mm)),
                    new XPoint(cone + (8 * Mm), middle + (large * Mm)), new XPoint(cone, middle + (small * Mm)),
                ],
                true,
                pen,
                null);
            canvas.Ellipse(ring - (large * Mm), middle - (large * Mm), 2 * large * Mm, 2 * large * Mm, pen, null);
            canvas.Ellipse(ring - (small * Mm), middle - (small * Mm), 2 * small * Mm, 2 * small * Mm, pen, null);
            canvas.Path([new XPoint(cone - Mm, middle), new XPoint(cone + (9 * Mm), middle)], false, centre, null);
            canvas.Path([new XPoint(ring - (3.2 * Mm), middle), new XPoint(ring + (3.2 * Mm), middle)], false, centre, null);
            canvas.Path([new XPoint(ring, middle - (3.2 * Mm)), new XPoint(ring, middle + (3.2 * Mm))], false, centre, null);
        });
    }
}
