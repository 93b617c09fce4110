namespace CoreDesign.Sheets.Drawings;

/// <summary>
/// Size of the picture in the units of its painter (px on the page, pt on paper); text keeps its size whatever the core's is.
/// Below 30 by 23 texts (360 by 280 on the page) the front view leaves out dimensions and notes, which is the small pinned drawing.
/// </summary>
public sealed record DrawingOptions
{
    /// <summary>80 to 10 000.</summary>
    public double Width { get; init; } = 640;

    /// <summary>80 to 10 000.</summary>
    public double Height { get; init; } = 480;

    public double TextSize { get; init; } = 11;

    public double DimensionSize { get; init; } = 12;

    public double FigureSize { get; init; } = 13;

    /// <summary>Units per millimetre of core, for a sheet at a round scale; null takes the largest that fits. One that doesn't fit is an error.</summary>
    public double? Scale { get; init; }

    public bool Dimensions { get; init; } = true;

    /// <summary>Section cut, detail circle, notes and scale bar.</summary>
    public bool Notes { get; init; } = true;

    /// <summary>Typed dimensions in accent, as things that can be pressed; on paper they are plain.</summary>
    public bool Pressable { get; init; } = true;

    internal bool HasRoom => Width >= 30 * DimensionSize && Height >= 280.0 / 12 * DimensionSize;

    internal DrawingOptions Checked()
    {
        Check(Width, nameof(Width), 80, 10_000);
        Check(Height, nameof(Height), 80, 10_000);
        Check(TextSize, nameof(TextSize), 4, 40);
        Check(DimensionSize, nameof(DimensionSize), 4, 40);
        Check(FigureSize, nameof(FigureSize), 4, 40);
        return this;
    }

    private static void Check(double value, string name, double low, double high)
    {
        if (!(value >= low && value <= high))
        {
            throw new ArgumentOutOfRangeException(name, value, $"DrawingOptions.{name} must lie between {low} and {high}.");
        }
    }
}
