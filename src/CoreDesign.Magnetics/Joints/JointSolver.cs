namespace CoreDesign.Magnetics.Joints;

/// <summary>
/// MMF drop of a laminated joint from a balance of flux sheet by sheet: the sheets that bridge a gap carry its flux, turn their
/// polarization towards the line's normal, saturate, and only then does flux cross the gap itself.
/// </summary>
/// <remarks>
/// Peak values, static. Saw-tooth book order only (positions 1 to M, then 1 again); a zig-zag order acts like fewer
/// positions and is not modelled. One dimension across the line: no turning of flux in the plane of the sheets, periodic stack.
/// </remarks>
public static class JointSolver
{
    // A gap shorter than this is none: the sheets touch.
    private const double TouchingGap_m = 1e-7;

    /// <summary>Solves one joint for mean flux densities from 0.05 T to well past saturation (Js + 0.5 T).</summary>
    /// <param name="spec">2 to 12 positions (2 for the lapped kinds), 1 to 4 sheets per position, gap 0 to 5 mm, shift above 0 to 30 mm, interface 1 to 60 µm.</param>
    /// <param name="steel">Steel of the sheets.</param>
    /// <param name="grid">Fineness of the lattice; with the default the drop is up to 1 % below that of a much finer one.</param>
    /// <returns>
    /// The drop in excess of the plain steel path, rising strictly. Past its own knee the plain limb's drop may rise faster than the
    /// joint's, and the excess level off or fall: levels that do not rise above all before them are left out, so a table may
    /// end earlier; <see cref="JointCurve"/> goes on straight. A gap of zero (below 0.1 µm) gives zero throughout: in this model
    /// nothing but the gaps makes a joint differ from a limb.
    /// </returns>
    /// <exception cref="ArgumentException">A figure outside its range.</exception>
    /// <exception cref="JointSolveException">No balance, or a total drop that falls, which the model cannot do.</exception>
    public static JointTable Solve(JointSpec spec, JointSteel steel, JointGrid? grid = null)
    {
        ArgumentNullException.ThrowIfNull(steel);
        JointLimits.Check(spec);
        return SolveCut(spec, steel, IsMitred(spec.Kind), grid ?? new JointGrid());
    }

    /// <summary>The same for either cut, whatever the kind: a square cut in more than two positions is of use for checks only.</summary>
    internal static JointTable SolveCut(JointSpec spec, JointSteel steel, bool mitred, JointGrid grid)
    {
        grid.Check();
        var law = steel.LawOf(mitred);
        var levels = Levels(steel.SaturationPolarization_T);
        if (spec.Gap_m < TouchingGap_m)
        {
            return new JointTable(levels, new double[levels.Count], [.. levels.Select(b => Across(b, mitred))]);
        }

        var lattice = new JointLattice(
            new JointMesh(spec, grid, Tail(spec, steel, law, grid)), law, steel.SheetThickness_m, Exchange(spec, steel));
        var (used, drops, bridging) = (new List<double>(), new List<double>(), new List<double>());
        var totalBefore = 0.0;
        foreach (var level in levels)
        {
            var result = lattice.Solve(Across(level, mitred), level);
            if (result.Total_A <= totalBefore)
            {
                throw new JointSolveException(
                    FormattableString.Invariant($"Joint lattice at {level:g4} T: the total drop falls from {totalBefore:g6} A to {result.Total_A:g6} A; imbalance {result.Residual_T:g3} T."), level, result.Residual_T);
            }

            totalBefore = result.Total_A;
            if (result.Excess_A > (drops.Count == 0 ? 0 : drops[^1]))
            {
                used.Add(level);
                drops.Add(result.Excess_A);
                bridging.Add(result.Highest_T);
            }
        }

        return new JointTable(used, drops, bridging);
    }

    internal static bool IsMitred(JointKind kind) => kind != JointKind.ButtLap;

    /// <summary>Component across the line: a 45° line is longer than the strip is wide.</summary>
    internal static double Across(double mean, bool mitred) => mitred ? mean / Math.Sqrt(2) : mean;

    /// <summary>Length of air that has the reluctance of the way between two neighbouring sheets, m.</summary>
    internal static double Exchange(JointSpec spec, JointSteel steel) =>
        spec.Interface_m + (steel.SheetThickness_m / steel.NormalPermeability);

    // Slowest decay along x of a difference between layers, at the steel's highest permeability.
    private static double Tail(JointSpec spec, JointSteel steel, LawAcrossLine law, JointGrid grid)
    {
        var layers = spec.Positions * spec.SheetsPerPosition;
        var permeability = law.LargestSlope / MagneticConstants.Mu0_H_per_m;
        return grid.TailDecayLengths * Math.Sqrt(permeability * steel.SheetThickness_m * Exchange(spec, steel)) / (2 * Math.Sin(Math.PI / layers));
    }

    // Denser where sheets saturate one after another. Past Js all sheets are saturated and little changes any more.
    private static List<double> Levels(double saturation)
    {
        var levels = new List<double> { 0.05 };
        Fill(levels, 0.1, 1.0, 0.1);
        Fill(levels, 1.05, 1.3, 0.05);
        Fill(levels, 1.325, Math.Max(saturation, 1.35) + 0.05, 0.025);
        foreach (var beyond in (double[])[0.1, 0.2, 0.35, 0.5])
        {
            levels.Add(Math.Max(saturation, 1.35) + beyond);
        }

        return levels;
    }

    private static void Fill(List<double> levels, double from, double to, double step)
    {
        var count = (int)Math.Floor(((to - from) / step) + 1e-6);
        for (var k = 0; k <= count; k++)
        {
            levels.Add(from + (k * step));
        }
    }
}
