namespace CoreDesign.Magnetics.Circuits;

/// <summary>
/// Newton's method for one instant: MMF around every loop, linkage or voltage of every winding, and no current out of an
/// isolated star point. Steps are limited to 0.3 T in any branch. No allocation in a solve.
/// </summary>
internal sealed class InstantSolver
{
    private const int MaxIterations = 160;
    private const double FluxDensityStep_T = 0.3;
    private readonly MagneticCircuit _circuit;
    private readonly CircuitTopology _topology;
    private readonly BranchState[] _states;
    private readonly double[][] _linkage;
    private readonly double[][] _voltage;
    private readonly int _m;
    private readonly int _k;
    private readonly bool _star;
    private readonly bool _byVoltage;
    private readonly double[] _slope;
    private readonly double[] _mmf;
    private readonly double[] _residual;
    private readonly double[,] _jacobian;
    private readonly double[] _turnsScale;

    public InstantSolver(MagneticCircuit circuit, CircuitTopology topology, int points)
    {
        _circuit = circuit;
        _topology = topology;
        _states = [.. circuit.Branches.Select(x => new BranchState(x))];
        _linkage = [.. circuit.Windings.Select(w => SupplyWaveform.Linkage(circuit.Supply, w.Phase, points))];
        _voltage = [.. circuit.Windings.Select(w => SupplyWaveform.Voltage(circuit.Supply, w.Phase, points))];
        _m = topology.LoopCount;
        _k = circuit.Windings.Count;
        _star = circuit.Supply.Connection == SupplyConnection.StarIsolated;

        // With resistance anywhere in the star, its neutral is found as a voltage for all three.
        _byVoltage = _star && circuit.Windings.Any(w => w.Phase != WindingPhase.Closed && w.Resistance_ohm > 0);
        Size = _m + _k + (_star ? 1 : 0);
        _slope = new double[_states.Length];
        _mmf = new double[_states.Length];
        _residual = new double[Size];
        _jacobian = new double[Size, Size];
        _turnsScale = new double[Size];
    }

    /// <summary>Number of unknowns.</summary>
    public int Size { get; }

    /// <summary>Moves the hysteresis memory to the fluxes of <paramref name="z"/>.</summary>
    public void Accept(double[] z)
    {
        for (var b = 0; b < _states.Length; b++)
        {
            _states[b].Accept(BranchFlux(b, z));
        }
    }

    public void Turn(bool mean = false)
    {
        foreach (var s in _states)
        {
            s.Turn(mean);
        }
    }

    /// <summary>
    /// Solves instant <paramref name="t"/>; <paramref name="z"/> holds the guess and gets the answer. Rate = weights[0]·flux + sum of
    /// weights[i]·history[i-1]; null weights leave rates and resistance out (first guess, from the demagnetised state).
    /// </summary>
    public void Solve(double[] z, int t, double[]? rateWeights, double[][]? history)
    {
        var worst = double.PositiveInfinity;
        for (var iteration = 0; iteration < MaxIterations; iteration++)
        {
            Assemble(z, t, rateWeights, history);
            if (!SmallLu.Solve(_jacobian, _residual, _turnsScale))
            {
                throw new NotConvergedException("The equations of one instant are singular; two parts of the circuit are linked rigidly.", 1);
            }

            var limit = Damping();
            var damping = limit * (iteration < 30 ? 1 : 0.5);
            var relative = 0.0;
            double scale = 0;
            for (var b = 0; b < _states.Length; b++)
            {
                var area = _circuit.Branches[b].Area_m2;
                relative = Math.Max(relative, Math.Abs(BranchFlux(b, _residual)) / area);
                scale = Math.Max(scale, Math.Abs(BranchFlux(b, z)) / area);
            }

            for (var i = 0; i < Size; i++)
            {
                z[i] -= damping * _residual[i];
            }

            worst = relative / Math.Max(scale, 1e-3);
            if (worst < 1e-10 && limit == 1)
            {
                return;
            }
        }

        throw new NotConvergedException($"Newton's method did not settle at point {t}: flux still moves by {worst:G3} of its value.", worst);
    }

    private double BranchFlux(int b, double[] z)
    {
        double f = 0;
        for (var j = 0; j < _m; j++)
        {
            f += _topology.Loops[b, j] * z[j];
        }

        return f;
    }

    private double Damping()
    {
        var damping = 1.0;
        for (var b = 0; b < _states.Length; b++)
        {
            if (_circuit.Branches[b].Steel is null && _circuit.Branches[b].Mmf is null)
            {
                continue;
            }

            var change = Math.Abs(BranchFlux(b, _residual)) / _circuit.Branches[b].Area_m2;
            if (change > FluxDensityStep_T)
            {
                damping = Math.Min(damping, FluxDensityStep_T / change);
            }
        }

        return damping;
    }

    private void Assemble(double[] z, int t, double[]? w, double[][]? history)
    {
        Array.Clear(_jacobian);
        Array.Clear(_residual);
        for (var b = 0; b < _states.Length; b++)
        {
            var flux = BranchFlux(b, z);
            _mmf[b] = _states[b].StaticMmf(flux, out _slope[b]) + _states[b].StopMmf(flux, out var dStop);
            _slope[b] += dStop;
            if (w is not null && history is not null)
            {
                var rate = (w[0] * flux) + (w[1] * BranchFlux(b, history[0])) + (w[2] * BranchFlux(b, history[1])) + (w[3] * BranchFlux(b, history[2]));
                _mmf[b] += _states[b].RateMmf(rate, out var dRate);
                _slope[b] += dRate * w[0];
            }
        }

        for (var b = 0; b < _states.Length; b++)
        {
            for (var i = 0; i < _m; i++)
            {
                var c = _topology.Loops[b, i];
                if (c == 0)
                {
                    continue;
                }

                _residual[i] += c * _mmf[b];
                for (var j = 0; j < _m; j++)
                {
                    _jacobian[i, j] += c * _slope[b] * _topology.Loops[b, j];
                }
            }
        }

        for (var k = 0; k < _k; k++)
        {
            AssembleWinding(k, z, t, w, history);
        }
    }

    private void AssembleWinding(int k, double[] z, int t, double[]? w, double[][]? history)
    {
        var row = _m + k;
        var winding = _circuit.Windings[k];
        var star = _star && winding.Phase != WindingPhase.Closed;
        var byVoltage = w is not null && (winding.Resistance_ohm > 0 || (star && _byVoltage));
        for (var i = 0; i < _m; i++)
        {
            var turns = _topology.Linkages[k, i];
            _residual[i] -= turns * z[row];
            _jacobian[i, row] = -turns;
            if (byVoltage)
            {
                _jacobian[row, i] = turns * w![0];
                _residual[row] += turns * ((w[0] * z[i]) + (w[1] * history![0][i]) + (w[2] * history[1][i]) + (w[3] * history[2][i]));
            }
            else
            {
                _jacobian[row, i] = turns;
                _residual[row] += turns * z[i];
            }
        }

        _residual[row] -= byVoltage ? _voltage[k][t] : _linkage[k][t];
        if (byVoltage)
        {
            _residual[row] += winding.Resistance_ohm * z[row];
            _jacobian[row, row] = winding.Resistance_ohm;
        }
        else if (w is null && winding.Resistance_ohm > 0)
        {
            // A first guess only, but without the resistance in some form a closed delta beside imposed fluxes has no current of its own: R i held over 1/omega.
            var slow = winding.Resistance_ohm / (2 * Math.PI * _circuit.Supply.Frequency_Hz);
            _residual[row] += slow * z[row];
            _jacobian[row, row] = slow;
        }

        if (star)
        {
            _residual[row] -= z[_m + _k];
            _jacobian[row, _m + _k] = -1;
            _residual[_m + _k] += z[row];
            _jacobian[_m + _k, row] = 1;
        }
    }
}
