namespace CoreDesign.Sheets.Charts;

/// <summary>Ends and steps of an axis: the step is 1, 2, 2.5 or 5 times a power of ten, the ends are whole steps around the data.</summary>
public sealed record NiceTicks(double Low, double High, double Step, int Decimals)
{
    public IReadOnlyList<double> Values => [.. Enumerable.Range(0, Count + 1).Select(i => Clean(Low + (i * Step)))];

    public int Count => (int)Math.Round((High - Low) / Step);

    public string Label(double value) => value == 0 ? "0" : Figures.Fixed(value, Decimals);

    /// <param name="low">Smallest value to show; finite.</param>
    /// <param name="high">Largest value to show; where it isn't above <paramref name="low"/> the axis opens around it.</param>
    /// <param name="steps">How many steps are wanted, about.</param>
    public static NiceTicks Around(double low, double high, int steps)
    {
        if (!double.IsFinite(low) || !double.IsFinite(high))
        {
            throw new ArgumentException($"An axis from {low} to {high} can't be drawn; both ends must be finite.");
        }

        ArgumentOutOfRangeException.ThrowIfLessThan(steps, 1);
        if (high < low)
        {
            (low, high) = (high, low);
        }

        if (high - low <= 1e-9 * Math.Max(Math.Abs(low), Math.Abs(high)))
        {
            var room = low == 0 ? 1 : Math.Abs(low) * 0.1;
            (low, high) = (low - room, high + room);
        }

        var step = NiceStep((high - low) / steps);
        var first = Math.Floor((low / step) + 1e-9) * step;
        var last = Math.Ceiling((high / step) - 1e-9) * step;
        return new NiceTicks(Tidy(first, step), Tidy(last, step), step, DecimalsOf(step));
    }

    /// <summary>The smallest nice step that isn't below the wanted one.</summary>
    public static double NiceStep(double wanted)
    {
        var power = Math.Pow(10, Math.Floor(Math.Log10(wanted)));
        foreach (var factor in new[] { 1, 2, 2.5, 5 })
        {
            if (factor * power >= wanted * (1 - 1e-9))
            {
                return factor * power;
            }
        }

        return 10 * power;
    }

    private double Clean(double value) => Tidy(value, Step);

    private static double Tidy(double value, double step) => Math.Abs(value) < step * 1e-6 ? 0 : value;

    private static int DecimalsOf(double step)
    {
        for (var decimals = 0; decimals < 12; decimals++)
        {
            var scaled = step * Math.Pow(10, decimals);
            if (Math.Abs(scaled - Math.Round(scaled)) < 1e-6 * scaled)
            {
                return decimals;
            }
        }

        return 12;
    }
}
