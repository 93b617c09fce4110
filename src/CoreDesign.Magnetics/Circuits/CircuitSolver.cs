using MathNet.Numerics.LinearAlgebra;

namespace CoreDesign.Magnetics.Circuits;

/// <summary>Settings of a solve.</summary>
/// <param name="PointsPerPeriod">Even, 24 to 4096. A multiple of 12 puts thirds and halves of a period on points, so that equal phases come out equal.</param>
public sealed record SolverOptions(int PointsPerPeriod = 288)
{
    /// <summary>Largest allowed change of flux from one half period to the next, over the largest flux.</summary>
    public double Tolerance { get; init; } = 1e-9;
}

/// <summary>
/// Periodic steady state of a nonlinear magnetic circuit under sinusoidal line voltages. Sources and materials are odd, so the
/// state repeats with the opposite sign after half a period; that symmetry is used throughout.
/// </summary>
public static class CircuitSolver
{
    /// <exception cref="CircuitException">Not a circuit, or its currents are not determined.</exception>
    /// <exception cref="NotConvergedException">No steady state within the iteration limit; carries the residual.</exception>
    /// <exception cref="OperationCanceledException">Cancelled.</exception>
    public static CircuitSolution Solve(MagneticCircuit circuit, SolverOptions? options = null, CancellationToken cancel = default)
    {
        ArgumentNullException.ThrowIfNull(circuit);
        options ??= new SolverOptions();
        if (options.PointsPerPeriod is < 24 or > 4096 || options.PointsPerPeriod % 2 != 0)
        {
            throw new CircuitException($"{options.PointsPerPeriod} points per period is not an even number from 24 to 4096.");
        }

        CheckSupply(circuit);
        var topology = CircuitTopology.Of(circuit);
        CheckDetermined(circuit, topology);

        var imposed = circuit.Supply.Connection != SupplyConnection.StarIsolated
            && circuit.Windings.All(w => w.Resistance_ohm == 0)
            && circuit.Windings.Count == topology.LoopCount;
        return imposed
            ? ImposedFluxSolver.Solve(circuit, topology, options)
            : PeriodicSolver.Solve(circuit, topology, options, cancel);
    }

    private static void CheckSupply(MagneticCircuit circuit)
    {
        var phases = circuit.Windings.Select(w => w.Phase).Where(p => p != WindingPhase.Closed).ToList();
        WindingPhase[] wanted = circuit.Supply.Connection == SupplyConnection.Single ? [WindingPhase.Single] : [WindingPhase.A, WindingPhase.B, WindingPhase.C];
        foreach (var phase in wanted)
        {
            if (phases.Count(p => p == phase) != 1)
            {
                throw new CircuitException($"A {circuit.Supply.Connection} supply needs exactly one winding of phase {phase}; there are {phases.Count(p => p == phase)}.");
            }
        }

        if (phases.FirstOrDefault(p => !wanted.Contains(p)) is var odd && !wanted.Contains(odd) && phases.Count > wanted.Length)
        {
            throw new CircuitException($"A winding of phase {odd} does not fit a {circuit.Supply.Connection} supply.");
        }
    }

    /// <summary>Fluxes, currents and neutral must follow from the equations alone, whatever the steel; checked with unit branch slopes.</summary>
    private static void CheckDetermined(MagneticCircuit circuit, CircuitTopology topology)
    {
        int m = topology.LoopCount, k = circuit.Windings.Count, star = circuit.Supply.Connection == SupplyConnection.StarIsolated ? 1 : 0;
        if (m == 0)
        {
            throw new CircuitException("The branches form no closed loop, so no flux can flow. Close the circuit.");
        }

        var c = Matrix<double>.Build.DenseOfArray(topology.Loops);
        var l = Matrix<double>.Build.DenseOfArray(topology.Linkages);
        for (var w = 0; w < k; w++)
        {
            // Rounding of the sum counts as nothing.
            var all = circuit.Windings[w].Coils.Sum(x => Math.Abs(x.Turns));
            if (Enumerable.Range(0, m).All(j => Math.Abs(topology.Linkages[w, j]) <= 1e-12 * all))
            {
                throw new CircuitException($"Winding '{circuit.Windings[w].Name}' links no flux: its coils cancel, or lie on branches outside any loop. Change its coils.");
            }
        }

        var turns = Math.Max(l.Enumerate().Select(Math.Abs).DefaultIfEmpty(0).Max(), double.Epsilon);
        var a = Matrix<double>.Build.Dense(m + k + star, m + k + star);
        a.SetSubMatrix(0, 0, c.TransposeThisAndMultiply(c));
        if (k > 0)
        {
            a.SetSubMatrix(0, m, -l.Transpose() / turns);
            a.SetSubMatrix(m, 0, l / turns);
        }

        for (var w = 0; w < k; w++)
        {
            a[m + w, m + w] = circuit.Windings[w].Resistance_ohm > 0 ? 1 : 0;
            if (star == 1 && circuit.Windings[w].Phase != WindingPhase.Closed)
            {
                a[m + w, m + k] = -1;
                a[m + k, m + w] = 1;
            }
        }

        var s = a.Svd(computeVectors: false).S;
        if (s[s.Count - 1] < 1e-10 * s[0])
        {
            throw new CircuitException("The winding currents are not determined: the imposed linkages leave no path for a zero-sequence flux, or windings are linked rigidly. Add a zero-sequence path (an air branch between the yokes) or a winding resistance.");
        }
    }
}
