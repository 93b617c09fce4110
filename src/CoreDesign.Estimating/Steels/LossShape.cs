using CoreDesign.Magnetics.Materials;

namespace CoreDesign.Estimating.Steels;

/// <summary>
/// Representative loss curves of a grade from its loss at 1.5 T and 1.7 T. Between the two the curve is what the guarantee
/// says; below and above a template of exponents n in P ∝ Bⁿ carries it on (from memory of catalogue curves of grain-oriented
/// sheet, no source): 1.80 from 0.1 to 0.5 T, 1.88 to 1.0 T, 1.95 to 1.3 T, 2.10 to 1.5 T, and above 1.7 T half a unit more than
/// between the guaranteed points, 4 at most, because hysteresis loss levels off near saturation. Valid from 0.1 to 1.9 T.
/// </summary>
public static class LossShape
{
    public const double Lowest_T = 0.1;
    public const double Highest_T = 1.9;

    private const double LargestUpperExponent = 4.0;
    private static readonly (double Low, double High, double Exponent)[] LowerTemplate =
        [(0.1, 0.5, 1.80), (0.5, 1.0, 1.88), (1.0, 1.3, 1.95), (1.3, 1.5, 2.10)];

    /// <summary>Flux densities of the table: 0.1 T apart, 0.05 T above 1.3 T. 1.5 T and 1.7 T are among them.</summary>
    public static IReadOnlyList<double> Grid_T { get; } =
        [.. Enumerable.Range(1, 13).Select(i => i / 10.0), .. Enumerable.Range(27, 12).Select(i => i / 20.0)];

    /// <summary>Curve through both anchors, which the table holds to the last bit.</summary>
    /// <param name="frequency_Hz">Frequency of both anchors.</param>
    /// <param name="loss15_W_per_kg">Loss at 1.5 T, above zero.</param>
    /// <param name="loss17_W_per_kg">Loss at 1.7 T, above the one at 1.5 T.</param>
    /// <exception cref="ArgumentOutOfRangeException">The loss does not rise between the two.</exception>
    public static LossCurve Curve(double frequency_Hz, double loss15_W_per_kg, double loss17_W_per_kg)
    {
        var law = Law(loss15_W_per_kg, loss17_W_per_kg);
        return new LossCurve(frequency_Hz, [.. Grid_T.Select(b => new LossPoint(b, b switch
        {
            1.5 => loss15_W_per_kg,
            1.7 => loss17_W_per_kg,
            _ => law.At(b),
        }))]);
    }

    internal static LogCurve Law(double loss15_W_per_kg, double loss17_W_per_kg)
    {
        if (!(loss15_W_per_kg > 0 && loss17_W_per_kg > loss15_W_per_kg))
        {
            throw new ArgumentOutOfRangeException(
                nameof(loss17_W_per_kg),
                loss17_W_per_kg,
                $"The loss at 1.7 T must be above the one at 1.5 T ({loss15_W_per_kg} W/kg), and that above zero.");
        }

        var points = new List<(double B, double P)> { (1.5, loss15_W_per_kg), (1.7, loss17_W_per_kg) };
        foreach (var (low, high, n) in LowerTemplate.Reverse())
        {
            points.Insert(0, (low, points[0].P * Math.Pow(low / high, n)));
        }

        var guaranteed = Math.Log(loss17_W_per_kg / loss15_W_per_kg) / Math.Log(1.7 / 1.5);
        var upper = Math.Max(guaranteed, Math.Min(guaranteed + 0.5, LargestUpperExponent));
        foreach (var b in new[] { 1.8, Highest_T })
        {
            points.Add((b, loss17_W_per_kg * Math.Pow(b / 1.7, upper)));
        }

        return LogCurve.LogLog([.. points.Select(p => p.B)], [.. points.Select(p => p.P)]);
    }
}
