using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Geometry;
using CoreDesign.Magnetics.Transients;

namespace CoreDesign.Estimating.Margins;

/// <summary>
/// Inductance of the excited winding with its limbs saturated through, from the core's own sizes; the winding's are not known to a design. A single-phase winding is
/// taken to lie on every wound limb in equal parts.
/// </summary>
internal static class AirCoreOfDesign
{
    public const string Source =
        "µ0·N²·A/(h + 0.45·D) for each coil, with D the limb's circle and half of the window's width, h 0.8 of the window's height: rule for short coils from memory, sizes common practice, no source";

    public static double Inductance_H(CoreGeometry geometry, double turns)
    {
        var limbs = Coils(geometry);
        return limbs * AirCore.Inductance_H([AirCore.Coil(geometry, turns / limbs)]);
    }

    /// <summary>Of the air-core reluctance, what lies outside the coils.</summary>
    public static double EndShare(CoreGeometry geometry) => AirCore.EndShare(AirCore.Coil(geometry, 1));

    /// <summary>The circuit with a single-phase winding on all of its wound limbs, where it stands on one of them only for the sake of its turns.</summary>
    public static MagneticCircuit Spread(MagneticCircuit circuit, CoreGeometry geometry)
    {
        if (geometry.Form != CoreForm.SinglePhaseTwoLimb || circuit.Windings is not [{ Coils: [var whole] } winding])
        {
            return circuit;
        }

        // The flux goes up in one limb and down in the other.
        var other = geometry.Limbs.Single(l => "limb" + l.Letter != whole.Branch);
        return circuit with { Windings = [winding with { Coils = [whole with { Turns = whole.Turns / 2 }, new Coil("limb" + other.Letter, -whole.Turns / 2)] }] };
    }

    private static int Coils(CoreGeometry geometry) =>
        geometry.Form is CoreForm.ThreeLimb or CoreForm.FiveLimb ? 1 : geometry.Limbs.Count(l => !l.IsReturn);
}
