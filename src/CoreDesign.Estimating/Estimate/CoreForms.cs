using CoreDesign.Magnetics.Geometry;

namespace CoreDesign.Estimating.Estimate;

/// <summary>The core forms by their names in the contract, and what each takes where a design leaves it open.</summary>
public static class CoreForms
{
    private static readonly Dictionary<string, CoreForm> ByName = new(StringComparer.Ordinal)
    {
        ["threeLimb"] = CoreForm.ThreeLimb,
        ["fiveLimb"] = CoreForm.FiveLimb,
        ["singlePhaseTwoLimb"] = CoreForm.SinglePhaseTwoLimb,
        ["singlePhaseThreeLimb"] = CoreForm.SinglePhaseThreeLimb,
        ["singlePhaseFourLimb"] = CoreForm.SinglePhaseFourLimb,
    };

    /// <summary>Names for a message.</summary>
    public static string Names { get; } = string.Join(", ", ByName.Keys.SkipLast(1)) + " or " + ByName.Keys.Last();

    public static CoreForm? TryFind(string? name) => name is not null && ByName.TryGetValue(name, out var form) ? form : null;

    /// <summary>One phase on one core; three such cores may form a bank.</summary>
    public static bool IsSinglePhase(CoreForm form) => form is CoreForm.SinglePhaseTwoLimb or CoreForm.SinglePhaseThreeLimb or CoreForm.SinglePhaseFourLimb;

    public static bool HasReturnLimbs(CoreForm form) => form is not (CoreForm.SinglePhaseTwoLimb or CoreForm.ThreeLimb);

    /// <summary>Whether windows beside a return limb have a width of their own.</summary>
    public static bool HasReturnWindows(CoreForm form) => form is CoreForm.SinglePhaseFourLimb or CoreForm.FiveLimb;

    /// <summary>Whether zero-sequence flux of three phases needs a path through air.</summary>
    public static bool HasAirPath(CoreForm form) => !IsSinglePhase(form);

    /// <summary>
    /// Yoke area over limb area: all of the flux, or half of it where it parts to both sides (geometry); 1/sqrt(3), rounded up, for five limbs, whose yokes carry
    /// the differences of the phase fluxes (common practice, no source).
    /// </summary>
    public static double YokeAreaFactor(CoreForm form) => form switch
    {
        CoreForm.SinglePhaseThreeLimb or CoreForm.SinglePhaseFourLimb => 0.5,
        CoreForm.FiveLimb => 0.58,
        _ => DesignDefaults.YokeAreaFactor,
    };
}
