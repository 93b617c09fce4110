using CoreDesign.Sheets.Scenes;
using PdfSharp.Drawing;

namespace CoreDesign.Sheets.Pdf;

/// <summary>Paints a scene as vectors and text, as one tagged figure with the scene's description as its text alternative.</summary>
internal static class PdfScenePainter
{
    /// <param name="x">Left of the scene on the page in points.</param>
    /// <param name="y">Top of the scene on the page in points.</param>
    /// <param name="scale">Points for one unit of the scene.</param>
    public static void Paint(SheetCanvas canvas, Scene scene, double x, double y, double scale)
    {
        var box = new XRect(x, y, scene.Width * scale, scene.Height * scale);
        var place = new Place(x, y, scale);
        canvas.Figure(SheetFonts.Face(Cut.Regular).Printable($"{scene.Title}. {scene.Description}"), box, () => Paint(canvas, scene.Marks, place));
    }

    private static void Paint(SheetCanvas canvas, IReadOnlyList<Mark> marks, Place place)
    {
        foreach (var mark in marks)
        {
            switch (mark)
            {
                case PathMark path:
                    Paint(canvas, path, place);
                    break;
                case CircleMark circle:
                    var corner = place.Point(new XY(circle.Centre.X - circle.Radius, circle.Centre.Y - circle.Radius));
                    var size = 2 * circle.Radius * place.Scale;
                    canvas.Ellipse(corner.X, corner.Y, size, size, Pen(circle.Stroke, circle.StrokeWidth, circle.Dash, place), Brush(circle.Fill));
                    break;
                case TextMark text:
                    Paint(canvas, text, place);
                    break;
                case GroupMark group:
                    Paint(canvas, group.Marks, place);
                    break;
                default:
                    throw new NotSupportedException($"The paper has no way to draw a {mark.GetType().Name}.");
            }
        }
    }

    private static void Paint(SheetCanvas canvas, PathMark path, Place place)
    {
        var points = path.Points.Select(place.Point).ToArray();
        var pen = Pen(path.Stroke, path.StrokeWidth, path.Dash, place);
        var brush = path.Closed ? Brush(path.Fill) : null;
        if (points.Length > 1 && (pen is not null || brush is not null))
        {
            canvas.Path(points, path.Closed, pen, brush);
        }
    }

    private static void Paint(SheetCanvas canvas, TextMark text, Place place)
    {
        var at = place.Point(text.At);
        var type = new Type(text.Bold ? Cut.Bold : text.Italic ? Cut.Italic : Cut.Regular, text.Size * place.Scale, text.Fill);
        if (text.Angle == 0)
        {
            canvas.Text(text.Text, at.X, at.Y, type, text.Anchor);
        }
        else
        {
            canvas.TurnedText(text.Text, at.X, at.Y, type, text.Anchor, text.Angle);
        }
    }

    private static XSolidBrush? Brush(Paint fill) => PaperColours.Of(fill) is { } colour ? new XSolidBrush(colour) : null;

    private static XPen? Pen(Paint stroke, double width, IReadOnlyList<double>? dash, Place place)
    {
        if (PaperColours.Of(stroke) is not { } colour || width <= 0)
        {
            return null;
        }

        var pen = new XPen(colour, width * place.Scale) { LineJoin = XLineJoin.Round };
        if (dash is { Count: > 0 })
        {
            // The library counts dashes in pen widths, a scene in its own unit.
            pen.DashPattern = [.. dash.Select(d => d / width)];
        }

        return pen;
    }

    private readonly record struct Place(double X, double Y, double Scale)
    {
        public XPoint Point(XY p) => new(X + (p.X * Scale), Y + (p.Y * Scale));
    }
}
