namespace CoreDesign.Magnetics.Excitation;

/// <summary>One harmonic, x(t) = Amplitude·cos(order·wt + Phase); amplitude is peak, phase in degrees.</summary>
public readonly record struct Harmonic(int Order, double Amplitude, double Phase_deg);

/// <summary>Figures of a periodic waveform sampled at equal spacing over one period from t = 0.</summary>
public static class Waveform
{
    public static double Rms(IReadOnlyList<double> x)
    {
        ArgumentNullException.ThrowIfNull(x);
        var s = 0.0;
        foreach (var v in x)
        {
            s += v * v;
        }

        return Math.Sqrt(s / x.Count);
    }

    public static double Mean(IReadOnlyList<double> x)
    {
        ArgumentNullException.ThrowIfNull(x);
        var s = 0.0;
        foreach (var v in x)
        {
            s += v;
        }

        return s / x.Count;
    }

    public static double Peak(IReadOnlyList<double> x)
    {
        ArgumentNullException.ThrowIfNull(x);
        var p = 0.0;
        foreach (var v in x)
        {
            p = Math.Max(p, Math.Abs(v));
        }

        return p;
    }

    /// <summary>Harmonics 1 to <paramref name="highest"/> by the discrete Fourier sum; orders must stay below half the number of points.</summary>
    public static Harmonic[] Harmonics(IReadOnlyList<double> x, int highest)
    {
        ArgumentNullException.ThrowIfNull(x);
        ArgumentOutOfRangeException.ThrowIfGreaterThanOrEqual(highest, x.Count / 2);
        var result = new Harmonic[highest];
        for (var h = 1; h <= highest; h++)
        {
            double re = 0, im = 0;
            for (var n = 0; n < x.Count; n++)
            {
                var (sin, cos) = Math.SinCos(2 * Math.PI * ((long)h * n % x.Count) / x.Count);
                re += x[n] * cos;
                im -= x[n] * sin;
            }

            re *= 2.0 / x.Count;
            im *= 2.0 / x.Count;
            result[h - 1] = new Harmonic(h, Math.Sqrt((re * re) + (im * im)), Math.Atan2(im, re) * 180 / Math.PI);
        }

        return result;
    }
}
