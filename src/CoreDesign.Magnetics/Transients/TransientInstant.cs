using CoreDesign.Magnetics.Circuits;

namespace CoreDesign.Magnetics.Transients;

/// <summary>
/// Newton's method for one instant of a transient. Unknowns: loop fluxes, winding currents, and an isolated star's neutral. Each winding either has its linkage
/// imposed or its voltage: d(linkage + inductances·currents)/dt + resistance·current = voltage. A rate is weight·value + history.
/// </summary>
internal sealed class TransientInstant
{
    private const int MaxIterations = 200;
    private const double FluxDensityStep_T = 0.3;
    private const double Tolerance = 1e-11;
    private readonly MagneticCircuit _circuit;
    private readonly CircuitTopology _topology;
    private readonly BranchState[] _states;
    private readonly double[,] _inductance;
    private readonly IReadOnlyList<double> _resistance;
    private readonly int _m;
    private readonly int _k;
    private readonly bool _star;
    private readonly double[] _jacobian;
    private readonly double[] _residual;
    private readonly double[] _work;
    private readonly double[] _mmf;

    public TransientInstant(MagneticCircuit circuit, CircuitTopology topology, double[,] inductance_H, IReadOnlyList<double> resistance_ohm)
    {
        (_circuit, _topology, _inductance, _resistance) = (circuit, topology, inductance_H, resistance_ohm);
        _states = [.. circuit.Branches.Select(b => new BranchState(b))];
        (_m, _k, _star) = (topology.LoopCount, circuit.Windings.Count, circuit.Supply.Connection == SupplyConnection.StarIsolated);
        Size = _m + _k + (_star ? 1 : 0);
        (_jacobian, _residual, _work, _mmf) = (new double[Size * Size], new double[Size], new double[Size], new double[_states.Length]);
    }

    public int Size { get; }

    /// <summary>Place of the first winding's current among the unknowns.</summary>
    public int FirstCurrent => _m;

    /// <summary>MMF drop of each branch at the instant solved last.</summary>
    public IReadOnlyList<double> Mmf_A => _mmf;

    public double BranchFlux(int branch, double[] z)
    {
        double f = 0;
        for (var j = 0; j < _m; j++)
        {
            f += _topology.Loops[branch, j] * z[j];
        }

        return f;
    }

    public double Linkage(int winding, double[] z)
    {
        double f = 0;
        for (var j = 0; j < _m; j++)
        {
            f += _topology.Linkages[winding, j] * z[j];
        }

        return f;
    }

    /// <summary>Moves the hysteresis memory to the fluxes of <paramref name="z"/>.</summary>
    public void Accept(double[] z)
    {
        for (var b = 0; b < _states.Length; b++)
        {
            _states[b].Accept(BranchFlux(b, z));
        }
    }

    /// <param name="z">Guess in, answer out.</param>
    /// <param name="weight">Of the value in its rate, 1/s; 0 leaves all rates out.</param>
    /// <param name="history">What the instants before add to the rate of each unknown.</param>
    /// <param name="drive">Imposed linkage or voltage of each winding.</param>
    /// <param name="imposed">True where <paramref name="drive"/> holds linkages.</param>
    /// <exception cref="NotConvergedException">With the residual.</exception>
    public void Solve(double[] z, double weight, double[] history, double[] drive, bool imposed)
    {
        var worst = double.PositiveInfinity;
        for (var iteration = 0; iteration < MaxIterations; iteration++)
        {
            Assemble(z, weight, history, drive, imposed);
            if (!SmallLu.Solve(_jacobian, _residual, _work))
            {
                throw new NotConvergedException("The equations of one instant of the transient are singular; two parts of the circuit are linked rigidly.", 1);
            }

            double largest = 0, change = 0;
            for (var b = 0; b < _states.Length; b++)
            {
                var area = _circuit.Branches[b].Area_m2;
                change = Math.Max(change, Math.Abs(BranchFlux(b, _residual)) / area);
                largest = Math.Max(largest, Math.Abs(BranchFlux(b, z)) / area);
            }

            // Late iterations are halved: where a kink of the law makes Newton's method jump to and fro, that ends it.
            var damping = Math.Min(1, FluxDensityStep_T / Math.Max(change, double.Epsilon)) * (iteration < 40 ? 1 : 0.5);
            for (var i = 0; i < Size; i++)
            {
                z[i] -= damping * _residual[i];
            }

            worst = change / Math.Max(largest, 1e-3);
            if (worst < Tolerance)
            {
                return;
            }
        }

        throw new NotConvergedException($"Newton's method did not settle in the transient: flux still moves by {worst:G3} of its value.", worst);
    }

    private void Assemble(double[] z, double weight, double[] history, double[] drive, bool imposed)
    {
        Array.Clear(_jacobian);
        Array.Clear(_residual);
        for (var b = 0; b < _states.Length; b++)
        {
            var flux = BranchFlux(b, z);
            _mmf[b] = _states[b].StaticMmf(flux, out var slope);
            if (weight > 0)
            {
                _mmf[b] += _states[b].RateMmf((weight * flux) + BranchFlux(b, history), out var dRate);
                slope += dRate * weight;
            }

            for (var i = 0; i < _m; i++)
            {
                var c = _topology.Loops[b, i];
                _residual[i] += c * _mmf[b];
                for (var j = 0; c != 0 && j < _m; j++)
                {
                    _jacobian[(i * Size) + j] += c * slope * _topology.Loops[b, j];
                }
            }
        }

        for (var k = 0; k < _k; k++)
        {
            AssembleWinding(k, z, weight, history, drive[k], imposed);
        }
    }

    private void AssembleWinding(int k, double[] z, double weight, double[] history, double drive, bool imposed)
    {
        var row = _m + k;

        // A closed winding has no linkage of its own to impose; without rates it carries no current.
        imposed &= _circuit.Windings[k].Phase != WindingPhase.Closed;
        _residual[row] = -drive;
        for (var i = 0; i < _m; i++)
        {
            var turns = _topology.Linkages[k, i];
            _residual[i] -= turns * z[row];
            _jacobian[(i * Size) + row] = -turns;
            _residual[row] += turns * (imposed ? z[i] : (weight * z[i]) + history[i]);
            _jacobian[(row * Size) + i] = imposed ? turns : turns * weight;
        }

        for (var j = 0; !imposed && j < _k; j++)
        {
            var r = j != k ? 0 : weight > 0 ? _resistance[k] : 1;
            _residual[row] += (_inductance[k, j] * ((weight * z[_m + j]) + history[_m + j])) + (r * z[_m + j]);
            _jacobian[(row * Size) + _m + j] += (_inductance[k, j] * weight) + r;
        }

        if (_star && _circuit.Windings[k].Phase != WindingPhase.Closed)
        {
            _residual[row] -= z[_m + _k];
            _jacobian[(row * Size) + _m + _k] = -1;
            _residual[_m + _k] += z[row];
            _jacobian[((_m + _k) * Size) + row] = 1;
        }
    }
}
