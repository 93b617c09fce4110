namespace CoreDesign.Sheets.Charts;

/// <summary>An axis: its span, its labelled ticks, even or logarithmic.</summary>
internal sealed record Axis(double Low, double High, bool Log, IReadOnlyList<(double Value, string Label)> Ticks)
{
    public HoverAxis Hover => new(Low, High, Log);

    /// <summary>Place of a value, 0 at the low end and 1 at the high one.</summary>
    public double Place(double value) => Log ? Math.Log(value / Low) / Math.Log(High / Low) : (value - Low) / (High - Low);

    public static Axis Linear(double low, double high, int steps)
    {
        var ticks = NiceTicks.Around(low, high, steps);
        return new(ticks.Low, ticks.High, false, [.. ticks.Values.Select(v => (v, ticks.Label(v)))]);
    }

    /// <summary>Ends just where they are given, ticks at nice values between.</summary>
    public static Axis Exact(double low, double high, int steps)
    {
        var ticks = NiceTicks.Around(low, high, steps);
        var slack = (high - low) * 1e-9;
        return new(low, high, false, [.. ticks.Values.Where(v => v >= low - slack && v <= high + slack).Select(v => (v, ticks.Label(v)))]);
    }

    /// <summary>Whole decades around the data, at least one.</summary>
    public static Axis Decades(double low, double high)
    {
        if (!(low > 0) || !double.IsFinite(high) || high < low)
        {
            throw new ArgumentException($"A logarithmic axis from {low} to {high} can't be drawn; both ends must be above zero.");
        }

        int first = (int)Math.Floor(Math.Log10(low) + 1e-9), last = Math.Max((int)Math.Ceiling(Math.Log10(high) - 1e-9), first + 1);
        var every = Math.Max(1, (last - first + 5) / 6);
        var ticks = Enumerable.Range(first, last - first + 1).Where(e => (e - first) % every == 0).Select(e => (Math.Pow(10, e), Figures.Plain(Math.Pow(10, e), Math.Max(0, -e))));
        return new(Math.Pow(10, first), Math.Pow(10, last), true, [.. ticks]);
    }
}
