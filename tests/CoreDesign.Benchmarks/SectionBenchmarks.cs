using BenchmarkDotNet.Attributes;
using CoreDesign.Magnetics.Geometry;

namespace CoreDesign.Benchmarks;

/// <summary>The best step set in a circle, free and from a slitting list.</summary>
public class SectionBenchmarks
{
    private static readonly double[] Stock_m = [.. Enumerable.Range(4, 54).Select(i => i * 0.010)];

    [Params(5, 10, 16)]
    public int Steps { get; set; }

    [Benchmark]
    public StepSet Free() => StepOptimizer.Best(0.580, Steps);

    [Benchmark]
    public StepSet FromStock() => StepOptimizer.BestFromStock(0.580, Stock_m, Steps);
}
