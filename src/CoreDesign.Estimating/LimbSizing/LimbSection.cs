using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Steels;
using CoreDesign.Magnetics.Geometry;

namespace CoreDesign.Estimating.LimbSizing;

/// <summary>The limb section of a design that is still being typed: what can be known of it before everything else is there.</summary>
internal sealed record LimbSection(StepSet Steps, double StackingFactor)
{
    public double NetArea_m2 => Steps.GrossArea_m2 * StackingFactor;

    /// <summary>The section, or null where the design does not say enough or says something impossible; the estimate names the reason.</summary>
    public static LimbSection? Of(DesignInput design, SteelCatalog steels)
    {
        if (StackingFactorOf(design, steels) is not { } factor)
        {
            return null;
        }

        try
        {
            return StepsOf(design.Core) is { } steps ? new(steps, factor) : null;
        }
        catch (GeometryException)
        {
            return null;
        }
    }

    /// <summary>The typed stacking factor, else the least that the grade guarantees.</summary>
    public static double? StackingFactorOf(DesignInput design, SteelCatalog steels) =>
        design.Core?.StackingFactor ?? (steels.TryFind(design.Steel?.Grade, out var grade) ? grade.MinimumStackingFactor?.Value : null);

    private static StepSet? StepsOf(CoreInput? core)
    {
        if (core?.LimbSteps is { Count: > 0 } typed)
        {
            return typed.All(s => s is { Width_mm: not null, Stack_mm: not null })
                ? StepSet.FromSteps([.. typed.Select(s => new LimbStep(s.Width_mm!.Value / 1000, s.Stack_mm!.Value / 1000))])
                : null;
        }

        return core?.Limb switch
        {
            { Diameter_mm: { } d, StockWidths_mm: { Count: > 0 } stock } limb =>
                StepOptimizer.BestFromStock(d / 1000, StepOptimizer.Within(d / 1000, [.. stock.Select(w => w / 1000)]), limb.Steps),
            { Diameter_mm: { } d, Steps: { } n } => StepOptimizer.Best(d / 1000, n),
            _ => null,
        };
    }
}
