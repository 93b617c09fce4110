using System.Runtime.CompilerServices;

namespace CoreDesign.Magnetics.Materials;

/// <summary>
/// Shape-preserving piecewise cubic Hermite interpolation of an odd function given by its positive half: the table is
/// extended through the origin, slopes are weighted harmonic means (Fritsch and Butland, SIAM J. Sci. Stat. Comput. 5, 1984),
/// end slopes are shape-preserving three-point ones. Beyond the last point the curve goes on straight with
/// <c>endSlope</c>; the caller decides what that slope means.
/// </summary>
public sealed class MonotoneCurve
{
    private const int MostBins = 4096;
    private readonly Piece[] _pieces;
    private readonly ushort[] _bins;
    private readonly double _binsPerX;

    /// <param name="x">Strictly increasing, all above zero.</param>
    /// <param name="y">Increasing or level, none below zero, as many as <paramref name="x"/>.</param>
    /// <param name="endSlope">Slope beyond the last point.</param>
    /// <param name="rising">False allows any finite y; the curve then turns only where the table turns.</param>
    /// <exception cref="ArgumentException">Too few points, not finite, or not increasing.</exception>
    public MonotoneCurve(IReadOnlyList<double> x, IReadOnlyList<double> y, double endSlope, bool rising = true)
    {
        ArgumentNullException.ThrowIfNull(x);
        ArgumentNullException.ThrowIfNull(y);
        if (x.Count != y.Count || x.Count < 1 || x.Count > ushort.MaxValue - 2)
        {
            throw new ArgumentException($"A curve needs as many y as x and at least one point; got {x.Count} and {y.Count}.", nameof(y));
        }

        var n = x.Count;
        for (var i = 0; i < n; i++)
        {
            if (!double.IsFinite(x[i]) || x[i] <= (i == 0 ? 0 : x[i - 1]) || !double.IsFinite(y[i]) || (rising && y[i] < (i == 0 ? 0 : y[i - 1])))
            {
                throw new ArgumentException($"Point {i + 1} ({x[i]}, {y[i]}) breaks the rising order.", nameof(x));
            }
        }

        // The slope at the origin needs its neighbour on the negative side; by oddness that secant equals the first one.
        double[] xs = [0, .. x], ys = [0, .. y];
        _pieces = Pieces(xs, ys, Slopes(xs, ys), endSlope);
        (LastX, LastY) = (xs[^1], ys[^1]);

        // Bins of equal width lead to the piece at their left end; a step or two from there finds the right one.
        var bins = Math.Clamp(4 * n, 16, MostBins);
        _binsPerX = bins / LastX;
        _bins = new ushort[bins + 1];
        for (int k = 0, i = 0; k <= bins; k++)
        {
            while (_pieces[i + 1].X <= k / _binsPerX)
            {
                i++;
            }

            // One piece early where rounding could put a point below the bin's edge into the bin.
            _bins[k] = (ushort)Math.Max(0, i - (_pieces[i].X == k / _binsPerX ? 1 : 0));
        }
    }

    /// <summary>Largest abscissa of the table.</summary>
    public double LastX { get; }

    /// <summary>Ordinate at <see cref="LastX"/>.</summary>
    public double LastY { get; }

    /// <summary>Value at <paramref name="x"/>, odd in it.</summary>
    public double Value(double x)
    {
        var a = Math.Abs(x);
        ref readonly var p = ref At(a);
        var t = a - p.X;
        return Math.CopySign(1, x) * (p.C0 + (t * (p.C1 + (t * (p.C2 + (t * p.C3))))));
    }

    /// <summary>Value and slope at <paramref name="x"/>.</summary>
    public double Value(double x, out double slope)
    {
        var a = Math.Abs(x);
        ref readonly var p = ref At(a);
        var t = a - p.X;
        slope = p.C1 + (t * ((2 * p.C2) + (3 * t * p.C3)));
        return Math.CopySign(1, x) * (p.C0 + (t * (p.C1 + (t * (p.C2 + (t * p.C3))))));
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private ref readonly Piece At(double a)
    {
        var pieces = _pieces;
        int i = a < LastX ? _bins[(int)(a * _binsPerX)] : pieces.Length - 2;
        while (a >= pieces[i + 1].X)
        {
            i++;
        }

        return ref pieces[i];
    }

    /// <summary>One cubic for each interval, then the straight end, then a guard that no argument reaches.</summary>
    private static Piece[] Pieces(double[] x, double[] y, double[] slope, double endSlope)
    {
        var n = x.Length;
        var pieces = new Piece[n + 1];
        for (var i = 0; i + 1 < n; i++)
        {
            var h = x[i + 1] - x[i];
            var secant = (y[i + 1] - y[i]) / h;
            pieces[i] = new(x[i], y[i], slope[i], ((3 * secant) - (2 * slope[i]) - slope[i + 1]) / h, (slope[i] + slope[i + 1] - (2 * secant)) / (h * h));
        }

        pieces[n - 1] = new(x[^1], y[^1], endSlope, 0, 0);
        pieces[n] = new(double.PositiveInfinity, 0, 0, 0, 0);
        return pieces;
    }

    private static double[] Slopes(double[] x, double[] y)
    {
        var n = x.Length;
        var d = new double[n];
        d[0] = (y[1] - y[0]) / (x[1] - x[0]);
        for (var i = 1; i < n - 1; i++)
        {
            double h0 = x[i] - x[i - 1], h1 = x[i + 1] - x[i];
            double s0 = (y[i] - y[i - 1]) / h0, s1 = (y[i + 1] - y[i]) / h1;
            if (s0 * s1 > 0)
            {
                double w0 = (2 * h1) + h0, w1 = h1 + (2 * h0);
                d[i] = (w0 + w1) / ((w0 / s0) + (w1 / s1));
            }
        }

        if (n == 2)
        {
            d[1] = d[0];
        }
        else
        {
            double h = x[n - 1] - x[n - 2], hBefore = x[n - 2] - x[n - 3];
            double s = (y[n - 1] - y[n - 2]) / h, sBefore = (y[n - 2] - y[n - 3]) / hBefore;
            var end = ((((2 * h) + hBefore) * s) - (h * sBefore)) / (h + hBefore);
            d[n - 1] = end * s <= 0 ? 0 : s * sBefore <= 0 && Math.Abs(end) > 3 * Math.Abs(s) ? 3 * s : end;
        }

        return d;
    }

    private readonly record struct Piece(double X, double C0, double C1, double C2, double C3);
}
