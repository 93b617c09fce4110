namespace CoreDesign.Magnetics.Circuits;

/// <summary>Settings of a solve.</summary>
/// <param name="PointsPerPeriod">Even, 24 to 4096. A multiple of 12 puts thirds and halves of a period on points, so that equal phases come out equal.</param>
public sealed record SolverOptions(int PointsPerPeriod = 288)
{
    /// <summary>Largest allowed change of flux from one half period to the next, over the largest flux; an instant is solved to a tenth of it.</summary>
    public double Tolerance { get; init; } = 1e-9;

    /// <summary>Half periods that repeat with the opposite sign and phases that are shifted copies are solved once. False solves all of them, to see that nothing changes.</summary>
    public bool UseSymmetry { get; init; } = true;
}

/// <summary>
/// Periodic steady state of a nonlinear magnetic circuit under sinusoidal line voltages. Sources and materials are odd, so the
/// state repeats with the opposite sign after half a period; that symmetry is used unless a linkage offset breaks it.
/// </summary>
public static class CircuitSolver
{
    /// <exception cref="CircuitException">Not a circuit, or its currents are not determined.</exception>
    /// <exception cref="NotConvergedException">No steady state within the iteration limit; carries the residual.</exception>
    /// <exception cref="OperationCanceledException">Cancelled.</exception>
    public static CircuitSolution Solve(MagneticCircuit circuit, SolverOptions? options = null, CancellationToken cancel = default) =>
        new PreparedCircuit(circuit).Solve(options, cancel);
}
