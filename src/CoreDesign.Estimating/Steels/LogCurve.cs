using MathNet.Numerics.Interpolation;

namespace CoreDesign.Estimating.Steels;

/// <summary>
/// Shape-preserving cubic interpolation of ln y over ln x (power laws become straight lines) or over x. Inside its table only.
/// </summary>
internal sealed class LogCurve
{
    private readonly CubicSpline _spline;
    private readonly bool _logX;
    private readonly double _first;
    private readonly double _last;

    private LogCurve(double[] x, double[] y, bool logX)
    {
        _logX = logX;
        _first = x[0];
        _last = x[^1];
        _spline = CubicSpline.InterpolatePchipSorted(
            logX ? Array.ConvertAll(x, v => Math.Log(v)) : x,
            Array.ConvertAll(y, v => Math.Log(v)));
    }

    public static LogCurve LogLog(double[] x, double[] y) => new(x, y, logX: true);

    public static LogCurve SemiLog(double[] x, double[] y) => new(x, y, logX: false);

    /// <exception cref="ArgumentOutOfRangeException">Outside the table.</exception>
    public double At(double x)
    {
        // A hair of slack, so that 0.1 counted up in steps is not refused for its last bit.
        var slack = 1e-9 * _last;
        if (!(x >= _first - slack && x <= _last + slack))
        {
            throw new ArgumentOutOfRangeException(nameof(x), x, $"The curve is known from {_first} to {_last}.");
        }

        return Math.Exp(_spline.Interpolate(_logX ? Math.Log(x) : x));
    }
}
