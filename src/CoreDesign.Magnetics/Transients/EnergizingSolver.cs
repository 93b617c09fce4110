using CoreDesign.Magnetics.Circuits;

namespace CoreDesign.Magnetics.Transients;

/// <summary>
/// Marches a circuit from the instant at which it is put on its supply: backward differences of second order (the first step of first order), fluxes and
/// currents together, Newton's method at each instant. The steel's own law holds throughout, with its hysteresis and eddy terms, and beyond saturation with
/// the slope of vacuum. The hysteresis memory starts as if the residual flux had been reached from the demagnetised state.
/// </summary>
public static class EnergizingSolver
{
    /// <exception cref="CircuitException">Not a circuit, or an array that does not fit it.</exception>
    /// <exception cref="NotConvergedException">An instant without a solution.</exception>
    /// <exception cref="OperationCanceledException">Cancelled.</exception>
    public static EnergizingSolution Solve(Energizing e, CancellationToken cancel = default)
    {
        ArgumentNullException.ThrowIfNull(e);
        ArgumentOutOfRangeException.ThrowIfLessThan(e.StepsPerPeriod, 24);
        var windings = e.Circuit.Windings.Count;
        if (e.ResidualLinkage_Wb.Count != windings || e.Resistance_ohm.Count != windings)
        {
            throw new CircuitException($"A transient of {windings} windings needs a residual linkage and a resistance of each.");
        }

        var topology = CircuitTopology.Of(e.Circuit);
        var instant = new TransientInstant(e.Circuit, topology, Inductance(e), e.Resistance_ohm);
        var steps = (int)Math.Ceiling(e.StepsPerPeriod * e.Periods);
        var h = 1 / (e.Circuit.Supply.Frequency_Hz * e.StepsPerPeriod);
        var solution = new EnergizingSolution
        {
            Time_s = [.. Enumerable.Range(0, steps + 1).Select(n => n * h)],
            WindingCurrent_A = Rows(windings, steps),
            Linkage_Wb = Rows(windings, steps),
            Voltage_V = [.. e.Circuit.Windings.Select(w => Voltage(e, w.Phase, steps, h))],
            BranchWork_J = new double[steps + 1],
        };
        double[] z = new double[instant.Size], last = new double[instant.Size], before = new double[instant.Size], history = new double[instant.Size];
        var drive = e.ResidualLinkage_Wb.ToArray();
        instant.Solve(z, 0, history, drive, imposed: true);
        instant.Accept(z);
        var mmf = instant.Mmf_A.ToArray();
        Keep(solution, 0, instant, z);
        for (var n = 1; n <= steps; n++)
        {
            cancel.ThrowIfCancellationRequested();
            var weight = n == 1 ? 1 / h : 1.5 / h;
            for (var i = 0; i < z.Length; i++)
            {
                history[i] = n == 1 ? -z[i] / h : ((-2 * z[i]) + (0.5 * last[i])) / h;
                before[i] = last[i];
                last[i] = z[i];
                z[i] += n == 1 ? 0 : last[i] - before[i];
            }

            for (var k = 0; k < windings; k++)
            {
                drive[k] = solution.Voltage_V[k][n];
            }

            instant.Solve(z, weight, history, drive, imposed: false);
            instant.Accept(z);
            solution.BranchWork_J[n] = solution.BranchWork_J[n - 1];
            for (var b = 0; b < mmf.Length; b++)
            {
                solution.BranchWork_J[n] += 0.5 * (mmf[b] + instant.Mmf_A[b]) * (instant.BranchFlux(b, z) - instant.BranchFlux(b, last));
                mmf[b] = instant.Mmf_A[b];
            }

            Keep(solution, n, instant, z);
        }

        return solution;
    }

    private static void Keep(EnergizingSolution solution, int n, TransientInstant instant, double[] z)
    {
        for (var k = 0; k < solution.WindingCurrent_A.Length; k++)
        {
            solution.WindingCurrent_A[k][n] = z[instant.FirstCurrent + k];
            solution.Linkage_Wb[k][n] = instant.Linkage(k, z);
        }
    }

    /// <summary>The lines' inductance as the windings see it, by the connection's rule.</summary>
    private static double[,] Inductance(Energizing e)
    {
        var k = e.Circuit.Windings.Count;
        var l = new double[k, k];
        for (var i = 0; i < k; i++)
        {
            if (e.Circuit.Windings[i].Phase == WindingPhase.Closed)
            {
                continue;
            }

            // A delta's winding lies between two lines, and each line carries the difference of two windings' currents.
            for (var j = 0; j < k; j++)
            {
                var delta = e.Circuit.Supply.Connection == SupplyConnection.Delta && e.Circuit.Windings[j].Phase != WindingPhase.Closed;
                l[i, j] += e.SourceInductance_H * (i == j ? (delta ? 2 : 1) : delta ? -1 : 0);
            }
        }

        return l;
    }

    private static double[] Voltage(Energizing e, WindingPhase phase, int steps, double h)
    {
        var supply = e.Circuit.Supply;
        double peak = WindingVoltage.Peak_V(supply, phase), angle = e.Angle_rad - WindingVoltage.Lag_rad(phase);
        return [.. Enumerable.Range(0, steps + 1).Select(n => peak * Math.Sin((2 * Math.PI * supply.Frequency_Hz * n * h) + angle))];
    }

    private static double[][] Rows(int windings, int steps) => [.. Enumerable.Range(0, windings).Select(_ => new double[steps + 1])];
}
