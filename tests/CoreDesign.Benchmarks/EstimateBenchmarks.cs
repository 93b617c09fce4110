using BenchmarkDotNet.Attributes;
using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Demo;
using CoreDesign.Estimating.Estimate;
using CoreDesign.Estimating.Steels;

namespace CoreDesign.Benchmarks;

/// <summary>What the page waits for after an edit (estimate) and what fills the rest of it (study), joints at hand.</summary>
[MemoryDiagnoser]
public class EstimateBenchmarks
{
    private DesignInput design = default!;

    public static IEnumerable<string> Orders => DemoOrders.All.Select(o => o.Key);

    [ParamsSource(nameof(Orders))]
    public string Order { get; set; } = "";

    [GlobalSetup]
    public void FindOrder() => design = DemoOrders.TryFind(Order)!.Design;

    [Benchmark]
    public EstimateResult? Estimate() => EstimateDesign.Run(design, SteelLibrary.Catalog).Value;

    [Benchmark]
    public Study? Study() => StudyDesign.Run(design, SteelLibrary.Catalog).Value;
}
