using System.Globalization;

namespace CoreDesign.Magnetics.Joints;

/// <summary>
/// A joint's drop in closed form, for sensitivities and for checks of size. It takes the gaps' cross-sections as sheets in parallel
/// with a gap, lets saturation spread from them over the length on which neighbouring sheets share flux, and adds the passage of the cut
/// sheet's flux into its neighbours and back.
/// </summary>
/// <remarks>
/// One constant for each number of positions was fitted to an independent lattice for 2 to 8 positions, gap 0.25 to 2 mm, shift 2.5 to
/// 4 mm, interface 8 to 14 µm, 1 or 2 sheets per position and 1.2 to 1.85 T: 6 to 11 % rms for 45° cuts, 1 % for two positions with
/// a square cut. Outside that domain it shows the trend, no more.
/// </remarks>
public static class JointClosedForm
{
    private const double Mu0 = MagneticConstants.Mu0_H_per_m;

    // From 2 to 8 positions, 45° cut. None was fitted for 7; it lies midway between its neighbours.
    private static readonly double[] SpreadOfMitre = [0.5, 1.0, 1.3, 1.6, 1.7, 1.75, 1.8];
    private const double SpreadOfSquareLap = 0.1;

    /// <summary>Drop in excess of the plain steel path, A, peak.</summary>
    /// <param name="spec">As for <see cref="JointSolver"/>, but 2 to 8 positions.</param>
    /// <param name="steel">Steel of the sheets.</param>
    /// <param name="fluxDensity_T">Mean flux density of the limb's steel, above 0 T to 2 T.</param>
    /// <exception cref="ArgumentException">A figure outside its range.</exception>
    public static double Mmf(JointSpec spec, JointSteel steel, double fluxDensity_T)
    {
        ArgumentNullException.ThrowIfNull(steel);
        JointLimits.Check(spec);
        JointLimits.Hold(nameof(spec), "Positions (closed form)", spec.Positions, 2, 8, "");
        if (!(fluxDensity_T > 0))
        {
            throw new ArgumentOutOfRangeException(
                nameof(fluxDensity_T), string.Create(CultureInfo.InvariantCulture, $"Flux density: {fluxDensity_T:g6} T is outside above 0 to 2 T."));
        }

        JointLimits.Hold(nameof(fluxDensity_T), "Flux density", fluxDensity_T, 0, 2, "T");
        if (spec.Gap_m == 0)
        {
            return 0;
        }

        var mitred = JointSolver.IsMitred(spec.Kind);
        var law = steel.LawOf(mitred);
        var across = JointSolver.Across(fluxDensity_T, mitred);
        double positions = spec.Positions, sheets = spec.SheetsPerPosition, thickness = steel.SheetThickness_m;
        var steelPart = (positions - 1) / positions;
        var gapField = RisingRoot.Find(
            h => ((steelPart * law.FluxDensity(h, out var slope)) + (Mu0 * h / positions) - across, (steelPart * slope) + (Mu0 / positions)),
            0,
            across / Mu0);
        var limbField = law.Field(across);

        // A group of sheets passes its flux through its own outer sheets as well.
        var crowding = 1 + ((sheets - 1) / 2);
        var exchange = JointSolver.Exchange(spec, steel);
        law.FluxDensity(gapField, out var gapSlope);
        var spread = Math.Min(Math.Sqrt(gapSlope * thickness * exchange * sheets * crowding / (2 * Mu0)), spec.Shift_m / 2);
        var constant = mitred ? SpreadOfMitre[spec.Positions - 2] : SpreadOfSquareLap;
        var gapDrop = positions * (gapField - limbField) * (spec.Gap_m + (2 * constant * spread));

        var decay = Math.Sqrt(across / limbField * thickness * exchange * sheets * crowding / (2 * Mu0));
        var passage = decay * Math.Tanh(spec.Shift_m / (2 * decay));
        var leaving = (across - (Mu0 * gapField)) * thickness * sheets;
        return gapDrop + (leaving * exchange * crowding / (2 * Mu0 * passage));
    }
}
