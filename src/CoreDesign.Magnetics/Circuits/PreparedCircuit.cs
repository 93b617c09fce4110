using MathNet.Numerics.LinearAlgebra;

namespace CoreDesign.Magnetics.Circuits;

/// <summary>
/// A circuit made ready: checked, its loops found, its branches joined into paths of equal flux. Solving it at another voltage, or with another
/// extra loss, starts from here. Holds nothing that a solve changes, so several threads may use one.
/// </summary>
public sealed class PreparedCircuit
{
    /// <exception cref="CircuitException">Not a circuit, or its currents are not determined.</exception>
    public PreparedCircuit(MagneticCircuit circuit)
    {
        ArgumentNullException.ThrowIfNull(circuit);
        Circuit = circuit;
        CheckSupply(circuit);
        var topology = CircuitTopology.Of(circuit);
        CheckLinked(circuit, topology);
        Reduction = CircuitReduction.Of(circuit, topology);
        CheckDriven(circuit, Reduction);
        (Paths, Places) = FluxPath.Of(circuit, Reduction);
        Free = new FreePieces(Paths, Reduction.FreeCount);
    }

    public MagneticCircuit Circuit { get; }

    /// <summary>True where the windings' linkages settle every flux.</summary>
    public bool FluxesImposed => Reduction is { FreeCount: 0, Driven.Length: 0 };

    internal CircuitReduction Reduction { get; }

    internal FluxPath[] Paths { get; }

    internal PathPlace[] Places { get; }

    internal FreePieces Free { get; }

    /// <summary>Steady state at the circuit's own voltage and extra losses.</summary>
    /// <inheritdoc cref="Solve(double, double[], SolverOptions, CancellationToken)"/>
    public CircuitSolution Solve(SolverOptions? options = null, CancellationToken cancel = default) =>
        Solve(Circuit.Supply.Voltage_V, null, options, cancel);

    /// <summary>Steady state at another voltage, and with these extra-loss coefficients of the branches, A s/Wb (null: the circuit's own).</summary>
    /// <exception cref="CircuitException">A number of points out of range.</exception>
    /// <exception cref="NotConvergedException">No steady state within the iteration limit; carries the residual.</exception>
    /// <exception cref="OperationCanceledException">Cancelled.</exception>
    public CircuitSolution Solve(double voltage_V, double[]? extraLoss_A_s_per_Wb = null, SolverOptions? options = null, CancellationToken cancel = default)
    {
        options ??= new SolverOptions();
        if (options.PointsPerPeriod is < 24 or > 4096 || options.PointsPerPeriod % 2 != 0)
        {
            throw new CircuitException($"{options.PointsPerPeriod} points per period is not an even number from 24 to 4096.");
        }

        var run = new SolverRun(this, Circuit.Supply with { Voltage_V = voltage_V }, extraLoss_A_s_per_Wb, options);
        return FluxesImposed ? ImposedFluxSolver.Solve(run) : PeriodicSolver.Solve(run, cancel);
    }

    private static void CheckSupply(MagneticCircuit circuit)
    {
        WindingPhase[] wanted = circuit.Supply.Connection == SupplyConnection.Single ? [WindingPhase.Single] : [WindingPhase.A, WindingPhase.B, WindingPhase.C];
        foreach (var phase in wanted)
        {
            if (circuit.Windings.Count(w => w.Phase == phase) is var found && found != 1)
            {
                throw new CircuitException($"A {circuit.Supply.Connection} supply needs exactly one winding of phase {phase}; there are {found}.");
            }
        }

        foreach (var winding in circuit.Windings)
        {
            if (winding.Phase != WindingPhase.Closed && !wanted.Contains(winding.Phase))
            {
                throw new CircuitException($"A winding of phase {winding.Phase} does not fit a {circuit.Supply.Connection} supply.");
            }
        }
    }

    /// <summary>There is a loop, every winding links flux, and only windings without resistance keep an offset.</summary>
    private static void CheckLinked(MagneticCircuit circuit, CircuitTopology topology)
    {
        if (topology.LoopCount == 0)
        {
            throw new CircuitException("The branches form no closed loop, so no flux can flow. Close the circuit.");
        }

        for (var w = 0; w < circuit.Windings.Count; w++)
        {
            // Rounding of the sum counts as nothing.
            var winding = circuit.Windings[w];
            var nothing = 1e-12 * winding.Coils.Sum(x => Math.Abs(x.Turns));
            var links = false;
            for (var j = 0; j < topology.LoopCount; j++)
            {
                links |= Math.Abs(topology.Linkages[w, j]) > nothing;
            }

            if (!links)
            {
                throw new CircuitException($"Winding '{winding.Name}' links no flux: its coils cancel, or lie on branches outside any loop. Change its coils.");
            }

            if (winding.LinkageOffset_Wb != 0 && (winding.Resistance_ohm > 0 || circuit.Supply.Connection == SupplyConnection.StarIsolated))
            {
                throw new CircuitException($"Winding '{winding.Name}' can't keep a linkage offset: it has resistance, or its star point is isolated. Take the offset away.");
            }
        }
    }

    /// <summary>Driven currents and the neutral must follow from the equations alone, whatever the steel; checked with unit slopes.</summary>
    private static void CheckDriven(MagneticCircuit circuit, CircuitReduction r)
    {
        int f = r.FreeCount, d = r.Driven.Length, star = r.NeutralVoltage ? 1 : 0;
        if (d == 0)
        {
            return;
        }

        var a = Matrix<double>.Build.Dense(f + d + star, f + d + star);
        if (f > 0)
        {
            var q = Matrix<double>.Build.DenseOfArray(r.PerFree);
            var l = Matrix<double>.Build.DenseOfArray(r.DrivenPerFree);
            l /= Math.Max(l.Enumerate().Max(Math.Abs), double.Epsilon);
            a.SetSubMatrix(0, 0, q.TransposeThisAndMultiply(q));
            a.SetSubMatrix(0, f, -l.Transpose());
            a.SetSubMatrix(f, 0, l);
        }

        for (var w = 0; w < d; w++)
        {
            var winding = circuit.Windings[r.Driven[w]];
            a[f + w, f + w] = winding.Resistance_ohm > 0 ? 1 : 0;
            if (star == 1 && winding.Phase != WindingPhase.Closed)
            {
                a[f + w, f + d] = -1;
                a[f + d, f + w] = 1;
            }
        }

        var s = a.Svd(computeVectors: false).S;
        if (s[s.Count - 1] < 1e-10 * s[0])
        {
            throw new CircuitException(CircuitReduction.NotDetermined);
        }
    }
}
