namespace CoreDesign.Magnetics.Geometry;

/// <summary>One step of a limb section: plate width, and the thickness of the plates of that width alone, both sides of the axis together (gross).</summary>
public readonly record struct LimbStep(double Width_m, double Stack_m);

/// <summary>A limb section in a circle. Steps from the widest outward; the fill ratio is gross stack area over the area of the circle.</summary>
public sealed record StepSet(IReadOnlyList<LimbStep> Steps, double CircleDiameter_m, double GrossArea_m2, double FillRatio)
{
    /// <summary>Most steps that a limb can have.</summary>
    public const int MostSteps = GeometryChecks.MostSteps;

    /// <summary>The steps with yoke plates wider than the limb's of the same step by <paramref name="yokeFactor"/> (0.3 to 3).</summary>
    /// <exception cref="GeometryException">Factor out of range.</exception>
    public IReadOnlyList<CoreStep> WithYokes(double yokeFactor)
    {
        GeometryChecks.Range("yokeFactor", yokeFactor, 0.3, 3, "times the limb", "1 is a yoke equal to the limb; enlarged yokes have 1.05 to 1.25.");
        return [.. Steps.Select(s => new CoreStep(s.Width_m, s.Width_m * yokeFactor, s.Stack_m))];
    }

    /// <summary>The steps with yoke plates of their own widths, one for each limb step.</summary>
    /// <exception cref="GeometryException">Not as many widths as steps, or a width out of range.</exception>
    public IReadOnlyList<CoreStep> WithYokes(IReadOnlyList<double> yokeWidths_m)
    {
        ArgumentNullException.ThrowIfNull(yokeWidths_m);
        if (yokeWidths_m.Count != Steps.Count)
        {
            throw GeometryChecks.Refuse("yokeWidths_m", yokeWidths_m.Count, $"{Steps.Count} widths", "Give one yoke width for each limb step.");
        }

        return [.. Steps.Select((s, k) =>
        {
            GeometryChecks.Length($"yokeWidths_m[{k}]", yokeWidths_m[k], "Give the width of the yoke plates of this step.");
            return new CoreStep(s.Width_m, yokeWidths_m[k], s.Stack_m);
        })];
    }

    /// <summary>A set typed by hand, in the circle that just encloses it.</summary>
    /// <exception cref="GeometryException">Steps out of order or range.</exception>
    public static StepSet FromSteps(IReadOnlyList<LimbStep> steps)
    {
        var diameter = StepOptimizer.CircleAround(steps);
        return Of(steps, diameter);
    }

    internal static StepSet Of(IReadOnlyList<LimbStep> steps, double diameter_m)
    {
        var area = steps.Sum(s => s.Width_m * s.Stack_m);
        return new(steps, diameter_m, area, area / (Math.PI / 4 * diameter_m * diameter_m));
    }
}
