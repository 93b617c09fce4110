using System.Diagnostics;

namespace CoreDesign.Benchmarks.Race;

/// <summary>Shortest time of many runs: on a shared machine the one that nothing disturbed.</summary>
internal static class Clock
{
    private const int LeastRuns = 5;
    private const double LeastBundle_us = 50;
    private static readonly TimeSpan Window = TimeSpan.FromSeconds(1.5);

    /// <summary>Time of one run; runs are bundled until a bundle is long against the clock's own step.</summary>
    public static double Best_us(Action run)
    {
        var best = double.PositiveInfinity;
        var (all, bundle) = (Stopwatch.StartNew(), 1);
        for (var n = 0; n < LeastRuns || all.Elapsed < Window; n++)
        {
            var start = Stopwatch.GetTimestamp();
            for (var i = 0; i < bundle; i++)
            {
                run();
            }

            var time = Stopwatch.GetElapsedTime(start).TotalMicroseconds;
            best = Math.Min(best, time / bundle);
            bundle = time < LeastBundle_us ? 2 * bundle : bundle;
        }

        return best;
    }
}
