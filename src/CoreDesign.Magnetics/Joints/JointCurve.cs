using CoreDesign.Magnetics.Materials;

namespace CoreDesign.Magnetics.Joints;

/// <summary>
/// A joint's drop as a function for circuit solvers: through the table's points, odd, rising. Beyond the last level it goes on
/// straight with the slope of the table's last segment. Immutable.
/// </summary>
public sealed class JointCurve
{
    private readonly MonotoneCurve _drop;
    private readonly JointTable _table;

    /// <exception cref="ArgumentException">The table's columns differ in length, are too short, or do not rise.</exception>
    public JointCurve(JointTable table)
    {
        ArgumentNullException.ThrowIfNull(table);
        var n = table.FluxDensity_T.Count;
        if (n < 2 || table.Mmf_A.Count != n || table.BridgingFluxDensity_T.Count != n)
        {
            throw new ArgumentException(
                $"Joint table: {n} flux densities, {table.Mmf_A.Count} drops and {table.BridgingFluxDensity_T.Count} bridging flux densities; all must be as many, and at least 2.",
                nameof(table));
        }

        _table = table;
        _drop = new MonotoneCurve(
            table.FluxDensity_T, table.Mmf_A, (table.Mmf_A[^1] - table.Mmf_A[^2]) / (table.FluxDensity_T[^1] - table.FluxDensity_T[^2]));
    }

    /// <summary>Last level of the table, T; beyond it the curve is an extension.</summary>
    public double LastFluxDensity_T => _drop.LastX;

    /// <summary>The drop against flux density, as a branch of a circuit takes it.</summary>
    public MonotoneCurve Drop => _drop;

    /// <summary>MMF drop in excess of the plain steel path, A, at a mean flux density of the limb's steel, T.</summary>
    public double Mmf_A(double fluxDensity_T) => _drop.Value(fluxDensity_T);

    /// <summary>The same with its slope in A/T.</summary>
    public double Mmf_A(double fluxDensity_T, out double slope_A_per_T) => _drop.Value(fluxDensity_T, out slope_A_per_T);

    /// <summary>
    /// Highest flux density in a bridging sheet, component across the line, T; straight between the table's points and on
    /// from the last two.
    /// </summary>
    public double BridgingFluxDensity_T(double fluxDensity_T)
    {
        var b = Math.Abs(fluxDensity_T);
        var k = 0;
        while (k < _table.FluxDensity_T.Count - 1 && _table.FluxDensity_T[k] < b)
        {
            k++;
        }

        double b0 = 0, y0 = 0;
        if (k > 0)
        {
            (b0, y0) = (_table.FluxDensity_T[k - 1], _table.BridgingFluxDensity_T[k - 1]);
        }

        return y0 + ((_table.BridgingFluxDensity_T[k] - y0) * (b - b0) / (_table.FluxDensity_T[k] - b0));
    }
}
