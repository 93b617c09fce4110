namespace CoreDesign.Sheets.Charts;

/// <summary>Size of a chart in the units of its painter; text keeps its size.</summary>
public sealed record ChartOptions
{
    /// <summary>160 to 10 000.</summary>
    public double Width { get; init; } = 304;

    /// <summary>100 to 10 000.</summary>
    public double Height { get; init; } = 188;

    public double TextSize { get; init; } = 11;

    internal ChartOptions Checked()
    {
        if (!(Width is >= 160 and <= 10_000) || !(Height is >= 100 and <= 10_000) || !(TextSize is >= 4 and <= 30))
        {
            throw new ArgumentOutOfRangeException(nameof(Width), $"A chart of {Width} by {Height} with text of {TextSize} can't be drawn; take 160 to 10000 by 100 to 10000 and text of 4 to 30.");
        }

        return this;
    }
}
