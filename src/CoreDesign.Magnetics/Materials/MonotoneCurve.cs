namespace CoreDesign.Magnetics.Materials;

/// <summary>
/// Shape-preserving piecewise cubic Hermite interpolation of an odd function given by its positive half: the table is
/// extended through the origin, slopes are weighted harmonic means (Fritsch and Butland, SIAM J. Sci. Stat. Comput. 5, 1984),
/// end slopes are shape-preserving three-point ones. Beyond the last point the curve goes on straight with
/// <c>endSlope</c>; the caller decides what that slope means.
/// </summary>
public sealed class MonotoneCurve
{
    private readonly double[] _x;
    private readonly double[] _y;
    private readonly double[] _slope;
    private readonly double _endSlope;

    /// <param name="x">Strictly increasing, all above zero.</param>
    /// <param name="y">Increasing or level, none below zero, as many as <paramref name="x"/>.</param>
    /// <param name="endSlope">Slope beyond the last point.</param>
    /// <param name="rising">False allows any finite y; the curve then turns only where the table turns.</param>
    /// <exception cref="ArgumentException">Too few points, not finite, or not increasing.</exception>
    public MonotoneCurve(IReadOnlyList<double> x, IReadOnlyList<double> y, double endSlope, bool rising = true)
    {
        ArgumentNullException.ThrowIfNull(x);
        ArgumentNullException.ThrowIfNull(y);
        if (x.Count != y.Count || x.Count < 1)
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
        _x = new double[n + 1];
        _y = new double[n + 1];
        for (var i = 0; i < n; i++)
        {
            _x[i + 1] = x[i];
            _y[i + 1] = y[i];
        }

        _endSlope = endSlope;
        _slope = Slopes(_x, _y);
    }

    /// <summary>Largest abscissa of the table.</summary>
    public double LastX => _x[^1];

    /// <summary>Ordinate at <see cref="LastX"/>.</summary>
    public double LastY => _y[^1];

    /// <summary>Value at <paramref name="x"/>, odd in it.</summary>
    public double Value(double x) => Value(x, out _);

    /// <summary>Value and slope at <paramref name="x"/>.</summary>
    public double Value(double x, out double slope)
    {
        var a = Math.Abs(x);
        double v;
        if (a >= _x[^1])
        {
            slope = _endSlope;
            v = _y[^1] + ((a - _x[^1]) * _endSlope);
        }
        else
        {
            var i = Interval(a);
            var h = _x[i + 1] - _x[i];
            var s = (a - _x[i]) / h;
            var secant = (_y[i + 1] - _y[i]) / h;
            var c2 = (3 * secant) - (2 * _slope[i]) - _slope[i + 1];
            var c3 = _slope[i] + _slope[i + 1] - (2 * secant);
            v = _y[i] + (h * s * (_slope[i] + (s * (c2 + (s * c3)))));
            slope = _slope[i] + (s * ((2 * c2) + (3 * s * c3)));
        }

        return x < 0 ? -v : v;
    }

    private int Interval(double a)
    {
        var lo = 0;
        var hi = _x.Length - 1;
        while (hi - lo > 1)
        {
            var mid = (lo + hi) >> 1;
            if (_x[mid] <= a)
            {
                lo = mid;
            }
            else
            {
                hi = mid;
            }
        }

        return lo;
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
}
