namespace CoreDesign.Magnetics.Joints;

/// <summary>
/// Flux density of one sheet against the field, both across the joint line: B(H) = J(H) + mu0·H, odd. J is a shape-preserving cubic
/// over equal steps of ln(1 + H/H1), so that a look-up needs no search and the slope that Newton's method takes is the
/// exact slope of the value. The slope never falls below mu0.
/// </summary>
internal sealed class LawAcrossLine
{
    private const double Mu0 = MagneticConstants.Mu0_H_per_m;

    /// <summary>Field below which the steps become linear in H, A/m: well below the first point of any steel's curve.</summary>
    private const double LinearField = 1;
    private const int Steps = 2400;
    private const double LargestField = 2e7;

    private static readonly double Span = Math.Log(1 + (LargestField / LinearField));
    private static readonly double StepsPerSpan = Steps / Span;
    private readonly double[] _polarization;
    private readonly double[] _slope;

    private LawAcrossLine(double[] polarization)
    {
        _polarization = polarization;
        _slope = Slopes(polarization);
        for (var k = 0; k < Steps; k++)
        {
            var rise = (polarization[k + 1] - polarization[k]) / (FieldAt(k + 1) - FieldAt(k));
            LargestSlope = Math.Max(LargestSlope, rise + Mu0);
        }
    }

    /// <summary>Largest dB/dH, H/m.</summary>
    public double LargestSlope { get; }

    public IReadOnlyList<double> Polarization => _polarization;

    /// <summary>Tabulates a polarization that never falls, called for rising fields in A/m.</summary>
    public static LawAcrossLine Tabulate(Func<double, double> polarizationAt)
    {
        var table = new double[Steps + 1];
        for (var k = 1; k <= Steps; k++)
        {
            table[k] = polarizationAt(FieldAt(k));
        }

        return new LawAcrossLine(table);
    }

    public double FluxDensity(double field, out double slope)
    {
        var a = Math.Abs(field);
        double j;
        if (a >= LargestField)
        {
            j = _polarization[Steps];
            slope = Mu0;
        }
        else
        {
            var t = Math.Log(1 + (a / LinearField)) * StepsPerSpan;
            var k = Math.Min((int)t, Steps - 1);
            var s = t - k;
            double y0 = _polarization[k], m0 = _slope[k], m1 = _slope[k + 1];
            var rise = _polarization[k + 1] - y0;
            var c2 = (3 * rise) - (2 * m0) - m1;
            var c3 = m0 + m1 - (2 * rise);
            j = y0 + (s * (m0 + (s * (c2 + (s * c3)))));
            slope = Mu0 + ((m0 + (s * ((2 * c2) + (3 * s * c3)))) * StepsPerSpan / (LinearField + a));
        }

        var b = j + (Mu0 * a);
        return field < 0 ? -b : b;
    }

    public double FluxDensity(double field) => FluxDensity(field, out _);

    /// <summary>Field that gives a flux density of zero or more.</summary>
    public double Field(double fluxDensity) =>
        RisingRoot.Find(h => (FluxDensity(h, out var slope) - fluxDensity, slope), 0, fluxDensity / Mu0);

    private static double FieldAt(int k) => LinearField * (Math.Exp(k / StepsPerSpan) - 1);

    // Harmonic mean of the neighbouring rises: the Fritsch-Butland slope for equal steps.
    private static double[] Slopes(double[] y)
    {
        var slope = new double[y.Length];
        slope[0] = y[1] - y[0];
        for (var k = 1; k < y.Length - 1; k++)
        {
            double before = y[k] - y[k - 1], after = y[k + 1] - y[k];
            slope[k] = before * after > 0 ? 2 * before * after / (before + after) : 0;
        }

        return slope;
    }
}
