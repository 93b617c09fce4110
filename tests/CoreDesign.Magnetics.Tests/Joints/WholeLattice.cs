using CoreDesign.Magnetics.Joints;
using MathNet.Numerics.LinearAlgebra;

namespace CoreDesign.Magnetics.Tests.Joints;

/// <summary>The whole joint, both halves, by a dense Newton method that knows nothing of symmetry.</summary>
internal sealed class WholeLattice
{
    private const double Mu0 = MagneticConstants.Mu0_H_per_m;
    private readonly JointMesh _half;
    private readonly LawAcrossLine _law;
    private readonly double[] _widths;
    private readonly double _transfer;
    private readonly int _layers;

    public WholeLattice(JointMesh half, LawAcrossLine law, double sheet_m, double exchange_m)
    {
        (_half, _law, _layers) = (half, law, half.Layers);
        _widths = [.. half.Widths, .. half.Widths.Reverse()];
        _transfer = Mu0 / (exchange_m * sheet_m);
        Potential = Vector<double>.Build.Dense((_widths.Length + 1) * _layers);
    }

    public Vector<double> Potential { get; private set; }

    /// <summary>Excess drop, A; the first and later calls must rise in small steps.</summary>
    public double Solve(double across)
    {
        for (var step = 0; step < 60; step++)
        {
            var (imbalance, matrix) = Equations(Potential, across);
            var norm = imbalance.L2Norm();
            if (norm < 1e-9)
            {
                var last = _widths.Length * _layers;
                var drop = Enumerable.Range(0, _layers).Average(l => Potential[l] - Potential[last + l]);
                return drop - (2 * _half.Length * _law.Field(across));
            }

            var direction = matrix.Solve(imbalance);
            var length = 1.0;
            while (Equations(Potential + (length * direction), across).Imbalance.L2Norm() >= norm && length > 1e-6)
            {
                length /= 2;
            }

            Potential += length * direction;
        }

        throw new InvalidOperationException("The dense lattice found no balance.");
    }

    private (Vector<double> Imbalance, Matrix<double> Matrix) Equations(Vector<double> u, double across)
    {
        var r = Vector<double>.Build.Dense(u.Count);
        var a = Matrix<double>.Build.Dense(u.Count, u.Count);
        void Branch(int from, int to, double flux, double stiffness)
        {
            r[from] -= flux;
            r[to] += flux;
            a[from, from] += stiffness;
            a[to, to] += stiffness;
            a[from, to] -= stiffness;
            a[to, from] -= stiffness;
        }

        var cells = _widths.Length;
        for (var l = 0; l < _layers; l++)
        {
            r[l] += across;
            r[(cells * _layers) + l] -= across;
            for (var i = 0; i <= cells; i++)
            {
                var n = (i * _layers) + l;
                if (i < cells)
                {
                    // A cell of the right half is the turned image of one of the left half.
                    var gap = i < cells / 2 ? _half.IsGap(i, l) : _half.IsGap(cells - 1 - i, _layers - 1 - l);
                    var field = (u[n] - u[n + _layers]) / _widths[i];
                    var flux = _law.FluxDensity(field, out var slope);
                    Branch(n, n + _layers, gap ? Mu0 * field : flux, (gap ? Mu0 : slope) / _widths[i]);
                }

                var owned = 0.5 * ((i > 0 ? _widths[i - 1] : 0) + (i < cells ? _widths[i] : 0));
                var next = (i * _layers) + ((l + 1) % _layers);
                Branch(n, next, _transfer * owned * (u[n] - u[next]), _transfer * owned);
            }
        }

        // One potential is free to choose.
        r[0] = -u[0];
        a.ClearRow(0);
        a[0, 0] = 1;
        return (r, a);
    }
}
