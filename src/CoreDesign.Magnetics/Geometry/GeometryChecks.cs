namespace CoreDesign.Magnetics.Geometry;

/// <summary>
/// Border checks. The limits are far outside any core that is built; they only keep products of lengths away from overflow and underflow.
/// </summary>
internal static class GeometryChecks
{
    public const double LeastLength_m = 1e-5;
    public const double GreatestLength_m = 100;

    /// <summary>Most steps in one section; beyond about 17 the gain is below a tenth of a per cent of the circle each.</summary>
    public const int MostSteps = 60;
    public const int MostStockWidths = 500;

    public static void Length(string name, double value_m, string mend) =>
        Range(name, value_m, LeastLength_m, GreatestLength_m, "m", mend);

    public static void StackingFactor(double value)
    {
        if (!(value > 0 && value <= 1))
        {
            throw Refuse("stackingFactor", value, "above 0 and at most 1", "Give the share of steel in the stack; stacked electrical steel has 0.93 to 0.98.");
        }
    }

    public static void Range(string name, double value, double least, double greatest, string unit, string mend)
    {
        if (!(value >= least && value <= greatest))
        {
            throw Refuse(name, value, FormattableString.Invariant($"{least} to {greatest} {unit}"), mend);
        }
    }

    public static GeometryException Refuse(string name, double value, string range, string mend) =>
        new(name, FormattableString.Invariant($"{name} is {value:G9}; allowed: {range}. {mend}"));

    /// <summary>Steps from the widest outward: widths falling, stacks above zero.</summary>
    public static void LimbSteps(IReadOnlyList<LimbStep> steps, string widthName)
    {
        if (steps.Count is < 1 or > MostSteps)
        {
            throw Refuse("steps", steps.Count, FormattableString.Invariant($"1 to {MostSteps} steps"), "Give one line for each plate width.");
        }

        for (var k = 0; k < steps.Count; k++)
        {
            Length($"steps[{k}].{widthName}", steps[k].Width_m, "Give the plate width of this step.");
            Length($"steps[{k}].stack_m", steps[k].Stack_m, "Give the thickness of the plates of this width alone, both sides together.");
            if (k > 0 && steps[k].Width_m >= steps[k - 1].Width_m)
            {
                throw Refuse(
                    $"steps[{k}].{widthName}",
                    steps[k].Width_m,
                    FormattableString.Invariant($"below {steps[k - 1].Width_m:G9} m, the width of the step before"),
                    "List the steps from the widest outward and join steps of equal width into one.");
            }
        }
    }
}
