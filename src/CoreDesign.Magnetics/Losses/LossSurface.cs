using CoreDesign.Magnetics.Materials;
using MathNet.Numerics.Interpolation;

namespace CoreDesign.Magnetics.Losses;

/// <summary>
/// Specific total loss of a sheet, W/kg, against peak flux density and frequency, sine flux. Along flux density: shape-preserving
/// cubics in log-log scale through every point, going on as a power law beyond the first and last. Between two frequencies: a power law.
/// Outside the tabulated frequencies nothing is made up: <see cref="Covers"/> says so and the nearest curve is the one to calibrate on.
/// </summary>
public sealed class LossSurface
{
    private readonly double[] _frequency;
    private readonly CubicSpline[] _logLoss;
    private readonly (double First, double Last)[] _logRange;

    /// <exception cref="ArgumentException">No curve, or one with fewer than two points.</exception>
    public LossSurface(IReadOnlyList<LossCurve> curves)
    {
        ArgumentNullException.ThrowIfNull(curves);
        if (curves.Count == 0 || curves.Any(c => c.Points.Count < 2))
        {
            throw new ArgumentException("A loss surface needs at least one curve of two points.", nameof(curves));
        }

        var sorted = curves.OrderBy(c => c.Frequency_Hz).ToList();
        _frequency = [.. sorted.Select(c => c.Frequency_Hz)];
        _logLoss = [.. sorted.Select(Spline)];
        _logRange = [.. sorted.Select(c => (Math.Log(c.Points[0].B_T), Math.Log(c.Points[^1].B_T)))];
        LowestFluxDensity_T = sorted.Max(c => c.Points[0].B_T);
        HighestFluxDensity_T = sorted.Min(c => c.Points[^1].B_T);
    }

    /// <summary>Range of flux density that every curve covers.</summary>
    public double LowestFluxDensity_T { get; }

    public double HighestFluxDensity_T { get; }

    public double LowestFrequency_Hz => _frequency[0];

    public double HighestFrequency_Hz => _frequency[^1];

    public bool Covers(double frequency_Hz) => frequency_Hz >= _frequency[0] - 1e-9 && frequency_Hz <= _frequency[^1] + 1e-9;

    /// <summary>Tabulated frequency nearest to <paramref name="frequency_Hz"/> where that is outside the table, else the frequency itself.</summary>
    public double NearestCovered(double frequency_Hz) => Math.Clamp(frequency_Hz, _frequency[0], _frequency[^1]);

    /// <summary>Loss in W/kg; the frequency must be covered.</summary>
    /// <exception cref="ArgumentOutOfRangeException">Frequency outside the table, or flux density not above zero.</exception>
    public double Loss_W_per_kg(double fluxDensity_T, double frequency_Hz)
    {
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(fluxDensity_T);
        if (!Covers(frequency_Hz))
        {
            throw new ArgumentOutOfRangeException(nameof(frequency_Hz), frequency_Hz, $"Loss is tabulated from {_frequency[0]} to {_frequency[^1]} Hz.");
        }

        var i = Array.FindLastIndex(_frequency, f => f <= frequency_Hz + 1e-9);
        var low = LogLoss(i, fluxDensity_T);
        if (i == _frequency.Length - 1 || Math.Abs(frequency_Hz - _frequency[i]) < 1e-9)
        {
            return Math.Exp(low);
        }

        var share = Math.Log(frequency_Hz / _frequency[i]) / Math.Log(_frequency[i + 1] / _frequency[i]);
        return Math.Exp(low + (share * (LogLoss(i + 1, fluxDensity_T) - low)));
    }

    private double LogLoss(int curve, double fluxDensity_T)
    {
        var x = Math.Log(fluxDensity_T);
        var (first, last) = _logRange[curve];
        var at = Math.Clamp(x, first, last);
        var y = _logLoss[curve].Interpolate(at);
        return at == x ? y : y + (_logLoss[curve].Differentiate(at) * (x - at));
    }

    private static CubicSpline Spline(LossCurve curve)
    {
        double[] x = [.. curve.Points.Select(p => Math.Log(p.B_T))], y = [.. curve.Points.Select(p => Math.Log(p.Loss_W_per_kg))];

        // MathNet's monotone cubics need three points.
        return x.Length == 2
            ? CubicSpline.InterpolateHermiteSorted(x, y, [(y[1] - y[0]) / (x[1] - x[0]), (y[1] - y[0]) / (x[1] - x[0])])
            : CubicSpline.InterpolatePchipSorted(x, y);
    }
}
