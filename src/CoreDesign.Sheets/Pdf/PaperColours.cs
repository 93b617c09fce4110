using CoreDesign.Sheets.Scenes;
using PdfSharp.Drawing;

namespace CoreDesign.Sheets.Pdf;

/// <summary>Inks and the reading ramp as the PDF library's colours on white paper.</summary>
internal static class PaperColours
{
    public static XColor Of(Ink ink) => Of((Paint)ink) ?? throw new ArgumentOutOfRangeException(nameof(ink), ink, "This ink paints nothing.");

    /// <summary>Null where nothing is painted.</summary>
    public static XColor? Of(Paint paint) =>
        InkColours.Of(paint, Theme.Paper) is { } c ? XColor.FromArgb(c.R, c.G, c.B) : null;
}
