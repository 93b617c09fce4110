namespace CoreDesign.Magnetics.Circuits;

/// <summary>
/// Circuits with fluxes that the linkages leave free, winding resistance or an isolated star point. Without memory and rates each instant stands alone.
/// Otherwise marches spans (half periods, or whole ones where direct current breaks the symmetry) with implicit third-order backward differences (BDF3)
/// of the free fluxes and a Newton solve at each instant until a span repeats; imposed fluxes and their rates are exact throughout.
/// </summary>
internal sealed class PeriodicSolver
{
    private const int MaxSweeps = 400;
    private const double StalledAbove = 0.5;
    private readonly SolverRun _run;
    private readonly int _span;
    private readonly int _f;
    private readonly bool _halfWave;
    private readonly double[][] _z;
    private readonly double[][] _before;
    private readonly double[][] _history = new double[3][];
    private readonly double[] _past;
    private readonly InstantSolver _instant;
    private readonly double _step_s;

    private PeriodicSolver(SolverRun run)
    {
        _run = run;
        _span = run.Span;
        _halfWave = run.Span < run.Points;
        _f = run.Reduction.FreeCount;
        _step_s = 1 / (run.Supply.Frequency_Hz * run.Points);
        _instant = new InstantSolver(run);
        _z = Table(_span, _instant.Size);
        _before = Table(_span, _f);
        _history = Table(3, _f);
        _past = new double[_f];
    }

    public static CircuitSolution Solve(SolverRun run, CancellationToken cancel)
    {
        var solver = new PeriodicSolver(run);
        solver.Start(cancel);
        if (run.Reduction.Driven.Length > 0 || run.Prepared.Free.HasMemory || run.Prepared.Free.HasRate || Array.Exists(run.PathExtra, x => x > 0))
        {
            solver.Magnetise();
            solver.Settle(cancel);
        }

        return solver.Finish();
    }

    /// <summary>First guess: every instant on the virgin curve, without rates. Each starts from the two before it, carried on straight.</summary>
    private void Start(CancellationToken cancel)
    {
        for (var t = 0; t < _span; t++)
        {
            cancel.ThrowIfCancellationRequested();
            for (var i = 0; i < _instant.Size && t > 0; i++)
            {
                _z[t][i] = t > 1 ? (2 * _z[t - 1][i]) - _z[t - 2][i] : _z[0][i];
            }

            _instant.Solve(_z[t], t, 0, null);
        }
    }

    /// <summary>Brings the memories from the demagnetised state to where the waveform in hand leaves them.</summary>
    private void Magnetise()
    {
        _instant.Demagnetise();
        for (var pass = 0; pass < 2; pass++)
        {
            for (var t = 0; t < _span; t++)
            {
                _instant.Accept(_z[t], t);
            }

            Turn();
        }
    }

    private void Settle(CancellationToken cancel)
    {
        var hasResistance = _run.Reduction.Driven.Length > 0;
        var perFlux = 11.0 / (6 * _step_s);
        double change = double.PositiveInfinity, before = change;
        for (var sweep = 0; sweep < MaxSweeps; sweep++)
        {
            // An offset of flux that resistance only slowly wears off, or that hysteresis holds for ever, turns its sign from one half period to the
            // next: the mean of both takes it out at once. What then repeats is the state of a core that was demagnetised.
            if (!_run.HasOffset && sweep > 1 && sweep % 3 != 2 && (hasResistance || change > StalledAbove * before))
            {
                TakeMean();
            }

            before = change;
            SetHistory();
            change = 0;
            double scale = 0, offset = 0;
            for (var t = 0; t < _span; t++)
            {
                cancel.ThrowIfCancellationRequested();
                var z = _z[t];
                Array.Copy(z, _before[t], _f);
                SetPast();
                _instant.Solve(z, t, perFlux, _past);
                _instant.Accept(z, t);
                Remember(z);
                for (var i = 0; i < _f; i++)
                {
                    change = Math.Max(change, Math.Abs(z[i] - _before[t][i]));
                    scale = Math.Max(scale, Math.Abs(z[i]));
                }
            }

            Turn();
            for (var i = 0; i < _f; i++)
            {
                offset = Math.Max(offset, Math.Abs(_z[_span - 1][i] - _before[_span - 1][i]));
            }

            change /= Math.Max(scale, double.Epsilon);
            if (change < _run.Options.Tolerance && offset <= _run.Options.Tolerance * scale)
            {
                return;
            }
        }

        throw new NotConvergedException($"No steady state after {MaxSweeps} half periods: the flux still changes by {change:G3} of its peak.", change);
    }

    private void TakeMean()
    {
        // Of a whole period its own second half, turned, is the other one.
        var other = _halfWave ? _before : [.. Enumerable.Range(0, _span).Select(t => Array.ConvertAll(_z[(t + (_span / 2)) % _span], z => -z))];
        for (var t = 0; t < _span; t++)
        {
            for (var i = 0; i < _f; i++)
            {
                _z[t][i] = 0.5 * (_z[t][i] + other[t][i]);
            }
        }

        Magnetise();
    }

    /// <summary>The three points before the span, from the end of the span before it.</summary>
    private void SetHistory()
    {
        var sign = _halfWave ? -1 : 1;
        for (var j = 0; j < 3; j++)
        {
            for (var i = 0; i < _f; i++)
            {
                _history[j][i] = sign * _z[_span - 1 - j][i];
            }
        }
    }

    private void SetPast()
    {
        var h6 = 6 * _step_s;
        for (var i = 0; i < _f; i++)
        {
            _past[i] = ((-18 * _history[0][i]) + (9 * _history[1][i]) - (2 * _history[2][i])) / h6;
        }
    }

    private void Remember(double[] z)
    {
        (_history[0], _history[1], _history[2]) = (_history[2], _history[0], _history[1]);
        Array.Copy(z, _history[0], _f);
    }

    /// <summary>Into the next half period.</summary>
    private void Turn()
    {
        if (_halfWave)
        {
            _instant.Turn();
        }
    }

    private CircuitSolution Finish()
    {
        var paths = new PathWaves[_run.Paths.Length];
        var rate = FreeRates();
        for (var p = 0; p < paths.Length; p++)
        {
            var path = paths[p] = new PathWaves(_run.Paths[p], _span);
            _run.Impose(p, path.Flux_Wb, path.Rate_Wb_per_s);
            for (var j = 0; j < _f; j++)
            {
                var q = _run.Paths[p].PerFree[j];
                for (var t = 0; t < _span && q != 0; t++)
                {
                    path.Flux_Wb[t] += q * _z[t][j];
                    path.Rate_Wb_per_s[t] += q * rate[j][t];
                }
            }

            path.FillPieces(_run.Points, _run.Supply.Frequency_Hz);
            path.SumUp(_run.PathExtra[p]);
        }

        var driven = new double[_run.Reduction.Driven.Length][];
        for (var d = 0; d < driven.Length; d++)
        {
            driven[d] = Array.ConvertAll(_z, z => z[_f + d]);
        }

        return new CircuitSolution(_run, paths, _run.Currents(paths, driven));
    }

    /// <summary>Rates of the free fluxes by the differences of the march.</summary>
    private double[][] FreeRates()
    {
        var rates = Table(_f, _span);
        SetHistory();
        for (var t = 0; t < _span; t++)
        {
            SetPast();
            for (var j = 0; j < _f; j++)
            {
                rates[j][t] = (11 * _z[t][j] / (6 * _step_s)) + _past[j];
            }

            Remember(_z[t]);
        }

        return rates;
    }

    private static double[][] Table(int rows, int columns)
    {
        var table = new double[rows][];
        for (var r = 0; r < rows; r++)
        {
            table[r] = new double[columns];
        }

        return table;
    }
}
