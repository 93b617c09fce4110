namespace CoreDesign.Sheets.Pdf;

/// <summary>Paper of a sheet, portrait.</summary>
public enum PaperSize
{
    A4,
    Letter,
}

/// <summary>Page and drawing frame in points. Margins as in ISO 5457: 20 mm at the filing side, 10 mm elsewhere.</summary>
internal sealed record Paper(double Width, double Height, bool FirstAngle)
{
    /// <summary>Points in a millimetre.</summary>
    public const double Mm = 72 / 25.4;

    public const double Left = 20 * Mm;

    public const double Top = 10 * Mm;

    public double FrameWidth => Width - (30 * Mm);

    public double FrameHeight => Height - (20 * Mm);

    public static Paper Of(PaperSize size) => size switch
    {
        PaperSize.A4 => new Paper(210 * Mm, 297 * Mm, true),
        PaperSize.Letter => new Paper(8.5 * 72, 11 * 72, false),
        _ => throw new ArgumentOutOfRangeException(nameof(size), size, "Paper must be A4 or Letter."),
    };
}
