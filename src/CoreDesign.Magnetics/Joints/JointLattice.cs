namespace CoreDesign.Magnetics.Joints;

/// <summary>
/// Total drop over the lattice's length and its excess over plain steel of that length, highest flux density in steel across
/// the line, and the largest imbalance left.
/// </summary>
internal readonly record struct LatticeResult(double Total_A, double Excess_A, double Highest_T, double Residual_T);

/// <summary>
/// Balance of flux in the sheets of one book near a joint: magnetic potentials at columns across the line and layers through the
/// stack, periodic in the stack. In the plane a cell is steel or gap; between the sheets flux passes two coatings and two half
/// sheets, te = ti + d/mu_z. Per unit width along the line and divided by d, so that every flux is a flux density.
/// </summary>
/// <remarks>
/// Turning the joint half round about its centre (x to -x, layer l to nl - 1 - l) puts every gap of a saw-tooth book on a gap
/// and keeps neighbours neighbours, and reverses the applied potential. The solution is unique, because every branch's flux
/// rises strictly with its potential difference; so, measured from its middle value, the potential obeys
/// u(-x, nl - 1 - l) = -u(x, l). One half is solved; at x = 0 only the first half of the layers is unknown.
/// The limb's end gets the same flux in every layer, so the mean flux density is given and the drop is the result.
/// </remarks>
internal sealed class JointLattice
{
    private const double Mu0 = MagneticConstants.Mu0_H_per_m;
    private const int MostSteps = 80;
    private const int MostCuts = 30;

    /// <summary>Largest imbalance of flux left at a node, T.</summary>
    private const double Tolerance_T = 1e-8;

    private readonly LawAcrossLine _law;
    private readonly JointMesh _mesh;
    private readonly int _cells;
    private readonly int _layers;
    private readonly double[] _transfer;
    private readonly double[] _flux;
    private readonly double[] _stiffness;
    private readonly double[] _imbalance;
    private readonly double[] _step;
    private readonly double[] _trial;
    private readonly LatticeMatrix _matrix;
    private readonly double[] _potential;

    public JointLattice(JointMesh mesh, LawAcrossLine law, double sheet_m, double exchange_m)
    {
        (_mesh, _law, _cells, _layers) = (mesh, law, mesh.Widths.Length, mesh.Layers);
        _transfer = new double[_cells + 1];
        for (var i = 0; i <= _cells; i++)
        {
            // A node owns half of each neighbouring cell; the one at the centre has its mirror image's half as well.
            var owned = 0.5 * ((i == 0 ? 0 : mesh.Widths[i - 1]) + (i == _cells ? mesh.Widths[i - 1] : mesh.Widths[i]));
            _transfer[i] = Mu0 * owned / (exchange_m * sheet_m);
        }

        var unknowns = (_cells * _layers) + (_layers / 2);
        _flux = new double[_cells * _layers];
        _stiffness = new double[_cells * _layers];
        _imbalance = new double[unknowns];
        _step = new double[unknowns];
        // Potentials are kept for whole columns, the centre's second half being the mirror image of its first.
        _potential = new double[(_cells + 1) * _layers];
        _trial = new double[_potential.Length];
        _matrix = new LatticeMatrix(_cells, _layers, _transfer);
    }

    /// <summary>Solves for a mean flux density across the line, starting from the levels solved before.</summary>
    /// <exception cref="JointSolveException">No balance was reached.</exception>
    public LatticeResult Solve(double across_T, double mean_T)
    {
        var field = _law.Field(across_T);
        if (_potential[0] == 0)
        {
            StartPlain(field);
        }

        var residual = Balance(across_T, mean_T);
        var end = 0.0;
        for (var l = 0; l < _layers; l++)
        {
            end += _potential[l];
        }

        var highest = 0.0;
        for (var e = 0; e < _flux.Length; e++)
        {
            if (!_mesh.IsGap(e / _layers, e % _layers))
            {
                highest = Math.Max(highest, _flux[e]);
            }
        }

        end /= _layers;
        return new LatticeResult(2 * end, 2 * (end - (field * _mesh.Length)), highest, residual);
    }

    // The first level starts as if there were no gaps. Each later one starts from the level before: its first Newton step is
    // then along the tangent, and sheets near saturation are approached from below, where their law is concave and safe.
    private void StartPlain(double field)
    {
        var x = -_mesh.Length;
        for (var i = 0; i < _cells; i++)
        {
            for (var l = 0; l < _layers; l++)
            {
                _potential[(i * _layers) + l] = -field * x;
            }

            x += _mesh.Widths[i];
        }
    }

    private double Balance(double across, double mean)
    {
        var residual = Evaluate(_potential, across);
        for (var step = 0; step < MostSteps; step++)
        {
            if (residual < Tolerance_T)
            {
                return residual;
            }

            _matrix.Fill(_stiffness);
            Array.Copy(_imbalance, _step, _step.Length);
            var drive = 0.0;
            if (!_matrix.Solve(_step) || !double.IsFinite(drive = Along()) || drive <= 0)
            {
                throw Failure("the linear equations have no sound solution", mean, residual);
            }

            residual = Advance(across, drive);
        }

        throw Failure($"no balance after {MostSteps} Newton steps", mean, residual);
    }

    // Balance is the minimum of a convex co-energy, whose slope along the step is minus the imbalance along it. A step is
    // cut until that slope has fallen well below its start; overshooting is what a saturating law does.
    private double Advance(double across, double drive)
    {
        var length = 1.0;
        for (var cut = 0; ; cut++)
        {
            for (var n = 0; n < _step.Length; n++)
            {
                _trial[n] = _potential[n] + (length * _step[n]);
            }

            Mirror(_trial);
            var residual = Evaluate(_trial, across);
            var along = Along();
            if (Math.Abs(along) <= 0.9 * drive || residual < Tolerance_T || cut == MostCuts)
            {
                Array.Copy(_trial, _potential, _potential.Length);
                return residual;
            }

            length *= along < 0 ? Math.Max(0.1, drive / (drive - along)) : 0.5;
        }
    }

    private double Along()
    {
        var sum = 0.0;
        for (var n = 0; n < _step.Length; n++)
        {
            sum += _step[n] * _imbalance[n];
        }

        return sum;
    }

    private void Mirror(double[] potential)
    {
        var centre = _cells * _layers;
        for (var l = _layers / 2; l < _layers; l++)
        {
            potential[centre + l] = l == _layers - 1 - l ? 0 : -potential[centre + _layers - 1 - l];
        }
    }

    private double Evaluate(double[] u, double across)
    {
        Array.Clear(_imbalance);
        for (var l = 0; l < _layers; l++)
        {
            _imbalance[l] = across;
        }

        for (var i = 0; i < _cells; i++)
        {
            var width = _mesh.Widths[i];
            for (var l = 0; l < _layers; l++)
            {
                var e = (i * _layers) + l;
                var field = (u[e] - u[e + _layers]) / width;
                double flux, slope;
                if (_mesh.IsGap(i, l))
                {
                    (flux, slope) = (Mu0 * field, Mu0);
                }
                else
                {
                    flux = _law.FluxDensity(field, out slope);
                }

                (_flux[e], _stiffness[e]) = (flux, slope / width);
                _imbalance[e] -= flux;
                if (i < _cells - 1 || l < _layers / 2)
                {
                    _imbalance[e + _layers] += flux;
                }
                else if (l != _layers - 1 - l)
                {
                    _imbalance[(_cells * _layers) + _layers - 1 - l] -= flux;
                }
            }
        }

        var worst = 0.0;
        for (var i = 0; i <= _cells; i++)
        {
            var first = i * _layers;
            var below = u[first + _layers - 1];
            for (var l = 0; l < (i < _cells ? _layers : _layers / 2); l++)
            {
                var own = u[first + l];
                var above = l + 1 < _layers ? u[first + l + 1] : u[first];
                _imbalance[first + l] += _transfer[i] * (above + below - (2 * own));
                worst = Math.Max(worst, Math.Abs(_imbalance[first + l]));
                below = own;
            }
        }

        return double.IsFinite(worst) ? worst : double.PositiveInfinity;
    }

    private static JointSolveException Failure(string what, double mean, double residual) =>
        new(FormattableString.Invariant($"Joint lattice at {mean:g4} T: {what}; the largest imbalance of flux is {residual:g3} T, allowed is 1e-8 T."), mean, residual);
}
