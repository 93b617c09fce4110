using CoreDesign.Magnetics.Geometry;
using CoreDesign.Magnetics.Transients;

namespace CoreDesign.Estimating.Margins;

/// <summary>
/// Inductance of one phase of the excited winding with its limbs saturated through, from the core's own sizes; the winding's are not known to a design.
/// </summary>
internal static class AirCoreOfDesign
{
    public const string Source =
        "µ0·N²·A/(h + 0.45·D) for each coil, with D the limb's circle and half of the window's width, h 0.8 of the window's height: rule for short coils from memory, sizes common practice, no source";

    public static double Inductance_H(CoreGeometry geometry, double turns, int woundLimbs)
    {
        var limbs = Coils(geometry, woundLimbs);
        return limbs * AirCore.Inductance_H([AirCore.Coil(geometry, turns / limbs)]);
    }

    /// <summary>Of the air-core reluctance, what lies outside the coils.</summary>
    public static double EndShare(CoreGeometry geometry) => AirCore.EndShare(AirCore.Coil(geometry, 1));

    /// <summary>Coils in which one phase's turns lie: the limb of a phase, or the wound limbs of a single-phase core.</summary>
    private static int Coils(CoreGeometry geometry, int woundLimbs) => geometry.Form switch
    {
        CoreForm.SinglePhaseTwoLimb => woundLimbs,
        CoreForm.SinglePhaseFourLimb => 2,
        _ => 1,
    };
}
