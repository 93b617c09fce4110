using System.Globalization;
using CoreDesign.Estimating.Contracts;
using CoreDesign.Magnetics.Geometry;

namespace CoreDesign.Estimating.Estimate;

/// <summary>Reads the limb section of a design: steps as typed, or the best ones in a circle.</summary>
internal sealed class SectionReader(DesignResolver resolver)
{
    public StepSet? Read(CoreInput core)
    {
        try
        {
            if (core.LimbSteps is { Count: > 0 } typed)
            {
                if (core.Limb is not null)
                {
                    resolver.Say("core.limb", "Give limbSteps or limb, not both.");
                    return null;
                }

                return Typed(typed);
            }

            if (core.Limb is not { } limb)
            {
                resolver.Say("core.limb", "The limb section is missing. Give limb with diameter_mm and steps or stockWidths_mm, or limbSteps.");
                return null;
            }

            return FromCircle(limb);
        }
        catch (GeometryException e)
        {
            resolver.Say(KernelPaths.Of(e.PropertyName, core), KernelPaths.Words(e));
            return null;
        }
    }

    private StepSet? Typed(IReadOnlyList<StepInput> typed)
    {
        if (typed.Count > StepSet.MostSteps)
        {
            resolver.Say("core.limbSteps", $"{typed.Count} steps are given; at most {StepSet.MostSteps}. Give one line for each plate width.");
            return null;
        }

        var steps = new List<LimbStep>();
        for (var i = 0; i < typed.Count; i++)
        {
            var path = string.Create(CultureInfo.InvariantCulture, $"core.limbSteps[{i}]");
            steps.Add(new LimbStep(
                resolver.Needed(path + ".width_mm", typed[i].Width_mm) / 1000,
                resolver.Needed(path + ".stack_mm", typed[i].Stack_mm) / 1000));
        }

        var before = resolver.Errors.Count;
        for (var i = 1; i < typed.Count; i++)
        {
            if (typed[i].Width_mm >= typed[i - 1].Width_mm)
            {
                resolver.Say(
                    string.Create(CultureInfo.InvariantCulture, $"core.limbSteps[{i}].width_mm"),
                    string.Create(CultureInfo.InvariantCulture, $"Step width {typed[i].Width_mm} mm is not below {typed[i - 1].Width_mm} mm, the step before. Order the steps from the widest outward; join steps of one width."));
            }
        }

        return resolver.Errors.Count > before || steps.Exists(s => double.IsNaN(s.Width_m + s.Stack_m)) ? null : StepSet.FromSteps(steps);
    }

    private StepSet? FromCircle(LimbInput limb)
    {
        var diameter = resolver.Needed("core.limb.diameter_mm", limb.Diameter_mm);
        if (limb.StockWidths_mm?.Count > StepOptimizer.MostStockWidths)
        {
            resolver.Say("core.limb.stockWidths_mm", $"{limb.StockWidths_mm.Count} widths are given; at most {StepOptimizer.MostStockWidths}. Give the widths that the works slits.");
            return null;
        }

        if (limb.StockWidths_mm is { Count: > 0 } stock)
        {
            var before = resolver.Errors.Count;
            for (var i = 0; i < stock.Count; i++)
            {
                resolver.Needed(string.Create(CultureInfo.InvariantCulture, $"core.limb.stockWidths_mm[{i}]"), stock[i]);
            }

            if (limb.Steps is { } most)
            {
                resolver.Needed("core.limb.steps", most);
            }

            if (resolver.Errors.Count > before || double.IsNaN(diameter))
            {
                return null;
            }

            var fitting = StepOptimizer.Within(diameter / 1000, [.. stock.Select(w => w / 1000)]);
            if (fitting.Count == 0)
            {
                resolver.Say("core.limb.stockWidths_mm", string.Create(CultureInfo.InvariantCulture, $"No stock width is narrower than the circle of {diameter} mm. Add narrower widths, or take a larger circle."));
                return null;
            }

            return StepOptimizer.BestFromStock(diameter / 1000, fitting, limb.Steps);
        }

        var steps = resolver.Needed("core.limb.steps", limb.Steps);
        return double.IsNaN(diameter + steps) ? null : StepOptimizer.Best(diameter / 1000, (int)steps);
    }
}
