using CoreDesign.Magnetics.Geometry;

namespace CoreDesign.Magnetics.Transients;

/// <summary>One coil on a limb as the air sees it: a cylinder of mean diameter and height.</summary>
public readonly record struct AirCoil(double Turns, double MeanDiameter_m, double Height_m);

/// <summary>Inductance of a winding whose core is saturated through.</summary>
public static class AirCore
{
    /// <summary>Of the window's height, what a winding takes; the rest is distance to the yokes. Common practice, no source.</summary>
    public const double HeightShare = 0.8;

    /// <summary>
    /// Inductance of single-layer cylinders, mu0 N² A/(h + 0.45 D): the rule of Wheeler (Proc. IRE 16, 1928), from memory; within 1 % where h is above 0.4 D.
    /// Coils on different limbs are taken in series without mutual inductance.
    /// </summary>
    public static double Inductance_H(IEnumerable<AirCoil> coils)
    {
        ArgumentNullException.ThrowIfNull(coils);
        return coils.Sum(c => MagneticConstants.Mu0_H_per_m * c.Turns * c.Turns * Math.PI / 4 * c.MeanDiameter_m * c.MeanDiameter_m / (c.Height_m + (0.45 * c.MeanDiameter_m)));
    }

    /// <summary>
    /// A coil on a limb of this core, where its own size is not known: as high as <see cref="HeightShare"/> of the window, and as thick as the half of the window that
    /// is its own, so that the mean diameter is the circle's and half the window's width.
    /// </summary>
    public static AirCoil Coil(CoreGeometry geometry, double turns)
    {
        ArgumentNullException.ThrowIfNull(geometry);
        return new AirCoil(turns, geometry.CircleDiameter_m + (geometry.WindowWidth_m / 2), HeightShare * geometry.WindowHeight_m);
    }

    /// <summary>Of an endless winding's reluctance and that of its ends, the ends' share: 0.45 D/(h + 0.45 D).</summary>
    public static double EndShare(AirCoil coil) => 0.45 * coil.MeanDiameter_m / (coil.Height_m + (0.45 * coil.MeanDiameter_m));
}
