using CoreDesign.Magnetics.Materials;

namespace CoreDesign.Magnetics.Circuits;

/// <summary>
/// Newton's method for one instant: MMF along every free flux, voltage of every driven winding, and no current out of an isolated star point.
/// Unknowns: free fluxes, driven currents, neutral. Steps are limited to 0.3 T in any piece. No allocation in a solve.
/// </summary>
internal sealed class InstantSolver
{
    private const int MaxIterations = 160;
    private const double FluxDensityStep_T = 0.3;
    private readonly FreePieces _pieces;
    private readonly ImposedPart _imposed;
    private readonly CircuitReduction _reduction;
    private readonly DrivenWinding[] _driven;
    private readonly LoopMemory?[] _memory;
    private readonly double[] _extra;
    private readonly double _w;
    private readonly int _f;
    private readonly double[] _step;
    private readonly double[] _jacobian;
    private readonly double[] _work;
    private readonly double _tolerance;
    private double _scale_T;

    public InstantSolver(SolverRun run)
    {
        _pieces = run.Prepared.Free;
        _imposed = new ImposedPart(run);
        _reduction = run.Reduction;
        _memory = new LoopMemory?[_pieces.Count];
        for (var i = 0; i < _memory.Length; i++)
        {
            _memory[i] = _pieces.Stops[i] is { } stops ? new LoopMemory(stops) : null;
        }

        _extra = run.FreeExtra();
        _w = 2 * Math.PI * run.Supply.Frequency_Hz;
        _f = _reduction.FreeCount;
        _driven = new DrivenWinding[_reduction.Driven.Length];
        for (var d = 0; d < _driven.Length; d++)
        {
            _driven[d] = new DrivenWinding(run, d);
        }

        Size = _f + _driven.Length + (_reduction.NeutralVoltage ? 1 : 0);
        _step = new double[Size];
        _jacobian = new double[Size * Size];
        _work = new double[Size];
        _scale_T = _imposed.Largest_T;

        // Newton's error after a step is about the square of the step, where the curves are smooth; stops have kinks, and there the step itself counts.
        _tolerance = _pieces.HasMemory ? 0.1 * run.Options.Tolerance : 0.1 * Math.Sqrt(run.Options.Tolerance * 0.1);
    }

    /// <summary>Number of unknowns.</summary>
    public int Size { get; }

    /// <summary>
    /// Solves instant <paramref name="t"/>; <paramref name="z"/> holds the guess and gets the answer. Rate of a free flux =
    /// <paramref name="perFlux"/> times itself + <paramref name="past"/>; null leaves rates and resistance out (first guess, from the demagnetised state).
    /// </summary>
    public void Solve(double[] z, int t, double perFlux, double[]? past)
    {
        var worst = double.PositiveInfinity;
        for (var iteration = 0; iteration < MaxIterations; iteration++)
        {
            if (Size == 1 && _f == 1)
            {
                OneStep(z[0], t, perFlux, past);
            }
            else
            {
                Assemble(z, t, perFlux, past);
                if (!SmallLu.Solve(_jacobian, _step, _work))
                {
                    throw Singular();
                }
            }

            var largest = LargestStep();
            if (double.IsNaN(largest))
            {
                throw Singular();
            }

            var limit = largest > FluxDensityStep_T ? FluxDensityStep_T / largest : 1;
            var damping = limit * (iteration < 30 ? 1 : 0.5);
            for (var i = 0; i < z.Length; i++)
            {
                z[i] -= damping * _step[i];
            }

            worst = largest / _scale_T;
            if (worst < _tolerance && limit == 1)
            {
                return;
            }
        }

        throw new NotConvergedException($"Newton's method did not settle at point {t}: flux still moves by {worst:G3} of its value.", worst);
    }

    /// <summary>Accepts the fluxes of this instant: moves the hysteresis memories.</summary>
    public void Accept(double[] z, int t)
    {
        for (var i = 0; i < _memory.Length; i++)
        {
            var b = FluxDensity(i, z, t);
            _memory[i]?.Accept(b);
            _scale_T = Math.Max(_scale_T, Math.Abs(b));
        }
    }

    /// <summary>Into the next half period, whose signs are turned.</summary>
    public void Turn()
    {
        foreach (var m in _memory)
        {
            m?.Turn();
        }
    }

    public void Demagnetise()
    {
        foreach (var m in _memory)
        {
            m?.Demagnetise();
        }
    }

    private double FluxDensity(int i, double[] z, int t)
    {
        var b = _imposed.FluxDensity_T[(t * _pieces.Count) + i];
        for (var j = 0; j < _f; j++)
        {
            b += _pieces.PerArea[(i * _f) + j] * z[j];
        }

        return b;
    }

    /// <summary>The step where one free flux is all there is to find.</summary>
    private void OneStep(double z, int t, double perFlux, double[]? past)
    {
        var n = _pieces.Count;
        var flux = _imposed.FluxDensity_T.AsSpan(t * n, n);
        var perArea = _pieces.PerArea.AsSpan(0, n);
        var weight = _pieces.Weight.AsSpan(0, n);
        var curve = _pieces.Curve.AsSpan(0, n);
        var memory = _memory.AsSpan(0, n);
        var residual = _imposed.Mmf_A[t] + (_pieces.Reluctance[0] * z);
        var slope = _pieces.Reluctance[0];
        for (var i = 0; i < flux.Length; i++)
        {
            var b = flux[i] + (perArea[i] * z);
            var h = curve[i].Value(b, out var dh);
            if (memory[i] is { } loop)
            {
                h += loop.Field(b, out var dm);
                dh += dm;
            }

            residual += weight[i] * h;
            slope += weight[i] * dh * perArea[i];
        }

        if (past is not null)
        {
            var rate = (perFlux * z) + past[0];
            residual += _imposed.ExtraMmf_A[t] + (_extra[0] * rate);
            slope += _extra[0] * perFlux;
            for (var i = 0; _pieces.HasRate && i < n; i++)
            {
                if (_pieces.Rate[i] is { } law)
                {
                    residual += weight[i] * law.RateField(_imposed.Rate_T_per_s[(t * n) + i] + (perArea[i] * rate), out var dr);
                    slope += weight[i] * dr * perArea[i] * perFlux;
                }
            }
        }

        _step[0] = residual / slope;
    }

    private void Assemble(double[] z, int t, double perFlux, double[]? past)
    {
        Array.Clear(_jacobian);
        Array.Clear(_step);
        for (var i = 0; i < _f; i++)
        {
            _step[i] = _imposed.Mmf_A[(t * _f) + i] + (past is null ? 0 : _imposed.ExtraMmf_A[(t * _f) + i]);
            for (var j = 0; j < _f; j++)
            {
                var (r, x) = (_pieces.Reluctance[(i * _f) + j], past is null ? 0 : _extra[(i * _f) + j]);
                _step[i] += (r * z[j]) + (past is null ? 0 : x * ((perFlux * z[j]) + past[j]));
                _jacobian[(i * Size) + j] = r + (x * perFlux);
            }
        }

        for (var i = 0; i < _pieces.Count; i++)
        {
            AddPiece(i, z, t, perFlux, past);
        }

        for (var d = 0; d < _driven.Length; d++)
        {
            AddDriven(d, z, t, perFlux, past);
        }
    }

    private void AddPiece(int i, double[] z, int t, double perFlux, double[]? past)
    {
        var perArea = _pieces.PerArea.AsSpan(i * _f, _f);
        var weight = _pieces.Weight.AsSpan(i * _f, _f);
        var b = FluxDensity(i, z, t);
        var h = _pieces.Curve[i].Value(b, out var dh);
        if (_memory[i] is { } loop)
        {
            h += loop.Field(b, out var dm);
            dh += dm;
        }

        if (past is not null && _pieces.Rate[i] is { } law)
        {
            var rate = _imposed.Rate_T_per_s[(t * _pieces.Count) + i];
            for (var j = 0; j < _f; j++)
            {
                rate += perArea[j] * ((perFlux * z[j]) + past[j]);
            }

            h += law.RateField(rate, out var dr);
            dh += dr * perFlux;
        }

        for (var r = 0; r < _f; r++)
        {
            if (weight[r] == 0)
            {
                continue;
            }

            _step[r] += weight[r] * h;
            for (var c = 0; c < _f; c++)
            {
                _jacobian[(r * Size) + c] += weight[r] * dh * perArea[c];
            }
        }
    }

    private void AddDriven(int d, double[] z, int t, double perFlux, double[]? past)
    {
        var row = _f + d;
        var winding = _driven[d];
        for (var j = 0; j < _f; j++)
        {
            var turns = _reduction.DrivenPerFree[d, j];
            _step[j] -= turns * z[row];
            _jacobian[(j * Size) + row] = -turns;
            _jacobian[(row * Size) + j] = turns * (past is null ? 1 : perFlux);
            _step[row] += turns * (past is null ? z[j] : (perFlux * z[j]) + past[j]);
        }

        // Without rates: linkages as if the resistance were none, which it is but for a ten-thousandth; its drop only keeps the equations apart.
        var resistance = past is null ? winding.Resistance_ohm / _w : winding.Resistance_ohm;
        _step[row] += (resistance * z[row]) + (past is null ? winding.LinkageLeft_Wb[t] : winding.VoltageLeft_V[t]);
        _jacobian[(row * Size) + row] = resistance;
        if (winding.InStar)
        {
            var neutral = Size - 1;
            _step[row] -= z[neutral];
            _jacobian[(row * Size) + neutral] = -1;
            _step[neutral] += z[row];
            _jacobian[(neutral * Size) + row] = 1;
        }
    }

    /// <summary>Largest step of flux density in any piece; NaN where the equations are singular.</summary>
    private double LargestStep()
    {
        double largest = 0;
        for (var i = 0; i < _pieces.Count; i++)
        {
            double step = 0;
            for (var j = 0; j < _f; j++)
            {
                step += _pieces.PerArea[(i * _f) + j] * _step[j];
            }

            step = Math.Abs(step);
            largest = step > largest || double.IsNaN(step) ? step : largest;
        }

        return largest;
    }

    private static NotConvergedException Singular() => new("The equations of one instant are singular; two parts of the circuit are linked rigidly.", 1);
}
