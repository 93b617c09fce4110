using System.Collections.Concurrent;

namespace CoreDesign.Magnetics.Excitation;

/// <summary>Cosine and sine of one period at equal spacing, kept for the numbers of points in use.</summary>
internal sealed class PeriodTable
{
    private const int MostKept = 64;
    private static readonly ConcurrentDictionary<int, PeriodTable> Kept = new();

    private PeriodTable(int points)
    {
        Cos = new double[points];
        Sin = new double[points];
        for (var t = 0; t < points; t++)
        {
            (Sin[t], Cos[t]) = Math.SinCos(2 * Math.PI * t / points);
        }
    }

    public double[] Cos { get; }

    public double[] Sin { get; }

    public static PeriodTable Of(int points)
    {
        if (Kept.TryGetValue(points, out var table))
        {
            return table;
        }

        if (Kept.Count >= MostKept)
        {
            Kept.Clear();
        }

        return Kept.GetOrAdd(points, n => new PeriodTable(n));
    }
}
