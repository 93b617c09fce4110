namespace CoreDesign.Magnetics;

/// <summary>Physical constants, each with its year.</summary>
public static class MagneticConstants
{
    /// <summary>Magnetic constant in H/m, CODATA 2018 (measured; 1.256 637 062 12(19)e-6).</summary>
    public const double Mu0_H_per_m = 1.25663706212e-6;
}
