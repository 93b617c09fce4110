namespace CoreDesign.Magnetics.Circuits;

/// <summary>
/// Circuits with fluxes that the linkages leave free, winding resistance or an isolated star point. Marches half periods with implicit
/// third-order backward differences (BDF3) and a Newton solve at each instant until a half period repeats with the opposite sign.
/// Unknowns at an instant: loop fluxes, winding currents, and the star point's linkage or voltage.
/// </summary>
internal sealed class PeriodicSolver
{
    private const int MaxSweeps = 400;
    private const double StalledAbove = 0.5;
    private readonly MagneticCircuit _circuit;
    private readonly SolverOptions _options;
    private readonly int _half;
    private readonly int _m;
    private readonly double[][] _loopFlux;
    private readonly double[][] _solution;
    private readonly InstantSolver _instant;
    private readonly double _step_s;

    private PeriodicSolver(MagneticCircuit circuit, CircuitTopology topology, SolverOptions options)
    {
        _circuit = circuit;
        _options = options;
        _half = options.PointsPerPeriod / 2;
        _m = topology.LoopCount;
        _step_s = 1 / (circuit.Supply.Frequency_Hz * options.PointsPerPeriod);
        _instant = new InstantSolver(circuit, topology, options.PointsPerPeriod);

        // Three points of history stand before the half period.
        _loopFlux = [.. Enumerable.Range(0, _half + 3).Select(_ => new double[_m])];
        _solution = [.. Enumerable.Range(0, _half).Select(_ => new double[_instant.Size])];
    }

    public static CircuitSolution Solve(MagneticCircuit circuit, CircuitTopology topology, SolverOptions options, CancellationToken cancel)
    {
        var solver = new PeriodicSolver(circuit, topology, options);
        solver.Start(cancel);
        solver.Settle(cancel);
        return solver.Finish(topology);
    }

    /// <summary>First guess: every instant on the virgin curve, without rates.</summary>
    private void Start(CancellationToken cancel)
    {
        var z = new double[_instant.Size];
        for (var t = 0; t < _half; t++)
        {
            cancel.ThrowIfCancellationRequested();
            _instant.Solve(z, t, rateWeights: null, history: null);
            z.CopyTo(_solution[t], 0);
            Array.Copy(z, _loopFlux[t + 3], _m);
        }

        for (var pass = 0; pass < 2; pass++)
        {
            for (var t = 0; t < _half; t++)
            {
                _instant.Accept(_solution[t]);
            }

            _instant.Turn();
        }
    }

    private void Settle(CancellationToken cancel)
    {
        var hasResistance = _circuit.Windings.Any(w => w.Resistance_ohm > 0);
        double[] weights = [11.0 / (6 * _step_s), -18.0 / (6 * _step_s), 9.0 / (6 * _step_s), -2.0 / (6 * _step_s)];
        var z = new double[_instant.Size];
        var history = new double[3][];
        double change = double.PositiveInfinity, before = change;
        for (var sweep = 0; sweep < MaxSweeps; sweep++)
        {
            // An offset of flux that resistance only slowly wears off, or that hysteresis holds for ever, turns its sign from one half period to the
            // next: the mean of both takes it out at once. What then repeats is the state of a core that was demagnetised.
            var mean = sweep > 0 && sweep % 3 != 2 && (hasResistance || change > StalledAbove * before);
            before = change;
            if (sweep > 0)
            {
                _instant.Turn(mean);
            }

            for (var j = 0; j < 3; j++)
            {
                for (var i = 0; i < _m; i++)
                {
                    var turned = -_loopFlux[_half + j][i];
                    _loopFlux[j][i] = mean ? 0.5 * (turned + _loopFlux[j][i]) : turned;
                }
            }

            change = 0;
            double scale = 0;
            for (var t = 0; t < _half; t++)
            {
                cancel.ThrowIfCancellationRequested();
                history[0] = _loopFlux[t + 2];
                history[1] = _loopFlux[t + 1];
                history[2] = _loopFlux[t];
                _solution[t].CopyTo(z, 0);
                _instant.Solve(z, t, weights, history);
                _instant.Accept(z);
                z.CopyTo(_solution[t], 0);
                for (var i = 0; i < _m; i++)
                {
                    change = Math.Max(change, Math.Abs(z[i] - _loopFlux[t + 3][i]));
                    scale = Math.Max(scale, Math.Abs(z[i]));
                    _loopFlux[t + 3][i] = z[i];
                }
            }

            change /= Math.Max(scale, double.Epsilon);
            var offset = 0.0;
            for (var i = 0; i < _m; i++)
            {
                offset = Math.Max(offset, Math.Abs(_loopFlux[2][i] + _loopFlux[_half + 2][i]));
            }

            if (change < _options.Tolerance && offset < _options.Tolerance * scale)
            {
                return;
            }
        }

        throw new NotConvergedException($"No steady state after {MaxSweeps} half periods: the flux still changes by {change:G3} of its peak.", change);
    }

    private CircuitSolution Finish(CircuitTopology topology)
    {
        int n = _options.PointsPerPeriod, b = _circuit.Branches.Count, k = _circuit.Windings.Count;
        var flux = new double[b][];
        var rate = new double[b][];
        var current = new double[k][];
        for (var w = 0; w < k; w++)
        {
            current[w] = [.. Enumerable.Range(0, n).Select(t => t < _half ? _solution[t][_m + w] : -_solution[t - _half][_m + w])];
        }

        for (var i = 0; i < b; i++)
        {
            flux[i] = new double[n];
            for (var t = 0; t < n; t++)
            {
                double f = 0;
                for (var j = 0; j < _m; j++)
                {
                    f += topology.Loops[i, j] * _solution[t % _half][j];
                }

                flux[i][t] = t < _half ? f : -f;
            }

            rate[i] = new double[n];
            for (var t = 0; t < n; t++)
            {
                rate[i][t] = ((11 * flux[i][t]) - (18 * flux[i][(t + n - 1) % n]) + (9 * flux[i][(t + n - 2) % n]) - (2 * flux[i][(t + n - 3) % n])) / (6 * _step_s);
            }
        }

        var evaluation = new BranchEvaluation(_circuit, n);
        for (var i = 0; i < b; i++)
        {
            evaluation.Run(i, flux[i], rate[i]);
        }

        var voltage = _circuit.Windings.Select(w => SupplyWaveform.Voltage(_circuit.Supply, w.Phase, n)).ToArray();
        return evaluation.Solution(flux, rate, current, voltage);
    }
}
