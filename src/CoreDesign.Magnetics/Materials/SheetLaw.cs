namespace CoreDesign.Magnetics.Materials;

/// <summary>
/// Elastic-plastic hysteresis element: its output follows the change of flux density and stops at the threshold
/// (stop operator of Prandtl and Ishlinskii). Weight in A/m per T. Loop energy at amplitude B above the threshold r:
/// 4 w r (B - r) J/m3; none below.
/// </summary>
public readonly record struct HysteresisStop(double Threshold_T, double Weight_A_per_m_T);

/// <summary>
/// Field of a sheet in the time domain, driven by its flux density:
/// H = H_spine(B) + sum of stops + (sigma d²/12) dB/dt + k s (s² + s0²)^(-1/4) with s = dB/dt.
/// Classical eddy term: thin sheet, uniform flux density. Excess term: statistical loss theory (Bertotti, IEEE Trans. Magn.
/// 24, 1988), made linear at low rates, which keeps it smooth at s = 0. SI units.
/// </summary>
public sealed class SheetLaw
{
    public SheetLaw(MonotoneCurve spine, double eddy_A_s_per_m_T, double excess, double excessFloor_T_per_s, IReadOnlyList<HysteresisStop> stops)
    {
        ArgumentNullException.ThrowIfNull(spine);
        ArgumentNullException.ThrowIfNull(stops);
        Spine = spine;
        Eddy_A_s_per_m_T = eddy_A_s_per_m_T;
        Excess = excess;
        ExcessFloor_T_per_s = excessFloor_T_per_s;
        Stops = [.. stops];
        Together = new StopCurve(Stops);
    }

    /// <summary>Single-valued part H(B).</summary>
    public MonotoneCurve Spine { get; }

    /// <summary>sigma d²/12.</summary>
    public double Eddy_A_s_per_m_T { get; }

    /// <summary>Coefficient k of the excess term, A/m per (T/s)^0.5.</summary>
    public double Excess { get; }

    /// <summary>Rate s0 under which the excess term is linear.</summary>
    public double ExcessFloor_T_per_s { get; }

    public HysteresisStop[] Stops { get; }

    /// <summary>The stops as one curve.</summary>
    public StopCurve Together { get; }

    /// <summary>True where the field depends on the rate of change.</summary>
    public bool HasRate => Eddy_A_s_per_m_T > 0 || Excess > 0;

    /// <summary>A single-valued law without loss.</summary>
    public static SheetLaw Lossless(MonotoneCurve spine) => new(spine, 0, 0, 1, []);

    /// <summary>A linear law of constant relative permeability.</summary>
    public static SheetLaw Linear(double relativePermeability)
    {
        var slope = 1 / (relativePermeability * MagneticConstants.Mu0_H_per_m);
        return Lossless(new MonotoneCurve([1], [slope], slope));
    }

    /// <summary>Classical and excess field at rate <paramref name="s"/>, and its slope against the rate.</summary>
    public double RateField(double s, out double slope)
    {
        var h = Eddy_A_s_per_m_T * s;
        slope = Eddy_A_s_per_m_T;
        if (Excess > 0)
        {
            var q = (s * s) + (ExcessFloor_T_per_s * ExcessFloor_T_per_s);
            var root = 1 / Math.Sqrt(Math.Sqrt(q));
            h += Excess * s * root;
            slope += Excess * root * (1 - (0.5 * s * s / q));
        }

        return h;
    }

    /// <summary>Excess field alone at rate <paramref name="s"/>.</summary>
    public double ExcessField(double s) =>
        Excess > 0 ? Excess * s / Math.Sqrt(Math.Sqrt((s * s) + (ExcessFloor_T_per_s * ExcessFloor_T_per_s))) : 0;
}
