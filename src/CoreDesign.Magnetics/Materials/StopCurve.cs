namespace CoreDesign.Magnetics.Materials;

/// <summary>
/// The stops of a sheet law taken together. Stops moved from the demagnetised state give V(x) = sum of w min(x, r); from a point of return
/// the field changes by 2 V(d/2) over a distance d (Masing's rule, which holds exactly for stops), so that any number of stops costs one look-up.
/// </summary>
public sealed class StopCurve
{
    private const int Bins = 128;
    private readonly double[] _threshold;
    private readonly double[] _slidWeight;
    private readonly double[] _slidEnergy;
    private readonly double[] _heldWeight;
    private readonly byte[] _bins = new byte[Bins + 1];
    private readonly double _binsPerT;

    /// <param name="stops">At most 250.</param>
    public StopCurve(IReadOnlyList<HysteresisStop> stops)
    {
        ArgumentNullException.ThrowIfNull(stops);
        ArgumentOutOfRangeException.ThrowIfGreaterThan(stops.Count, 250);
        HysteresisStop[] sorted = [.. stops.OrderBy(s => s.Threshold_T)];
        var n = sorted.Length;
        _threshold = [.. sorted.Select(s => s.Threshold_T), double.PositiveInfinity];
        _slidWeight = new double[n + 1];
        _slidEnergy = new double[n + 1];
        _heldWeight = new double[n + 1];
        for (var i = 0; i < n; i++)
        {
            var (r, w) = (sorted[i].Threshold_T, sorted[i].Weight_A_per_m_T);
            _slidWeight[i + 1] = _slidWeight[i] + (w * r);
            _slidEnergy[i + 1] = _slidEnergy[i] + (w * r * r);
        }

        for (var i = n - 1; i >= 0; i--)
        {
            _heldWeight[i] = _heldWeight[i + 1] + sorted[i].Weight_A_per_m_T;
        }

        _binsPerT = n == 0 ? 0 : Bins / sorted[^1].Threshold_T;
        for (int k = 0, i = 0; k <= Bins && n > 0; k++)
        {
            while (k / _binsPerT > _threshold[i])
            {
                i++;
            }

            _bins[k] = (byte)Math.Max(0, i - 1);
        }
    }

    public bool IsEmpty => _threshold.Length == 1;

    /// <summary>V(x) in A/m for x of zero and above (T), and its slope.</summary>
    public double Field(double x, out double slope)
    {
        var i = Index(x);
        slope = _heldWeight[i];
        return _slidWeight[i] + (x * slope);
    }

    /// <summary>Heat of a way from zero to x along V, J/m3: sum of w r (x - r) over thresholds below x. A closed loop of amplitude a costs four times as much.</summary>
    public double Heat(double x)
    {
        var i = Index(x);
        return (x * _slidWeight[i]) - _slidEnergy[i];
    }

    /// <summary>Number of thresholds below x.</summary>
    private int Index(double x)
    {
        int i = _bins[(int)Math.Min(Bins, x * _binsPerT)];
        while (x > _threshold[i])
        {
            i++;
        }

        return i;
    }
}
