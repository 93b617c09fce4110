using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Steels;

namespace CoreDesign.Web.Features.Design;

/// <summary>The use cases that the page calls, as one set of functions, so that a test can stand in for a slow or failing solve.</summary>
public sealed record DesignEngine
{
    public required Func<DesignInput, CancellationToken, Outcome<EstimateResult>> Estimate { get; init; }

    public required Func<DesignInput, EstimateResult, CancellationToken, IReadOnlyList<LeverResult>> Levers { get; init; }

    public required Func<DesignInput, EstimateResult, CancellationToken, IReadOnlyList<VoltagePointResult>> VoltageCurve { get; init; }

    /// <summary>The margins to saturation beyond the estimate's, which take longest; null where they can't be solved.</summary>
    public required Func<DesignInput, CancellationToken, MarginsResult?> Margins { get; init; }

    /// <summary>The grades to choose from; works' own steels may come and go while the page is open.</summary>
    public required Func<SteelCatalog> Steels { get; init; }
}
