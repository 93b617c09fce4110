namespace CoreDesign.Magnetics.Excitation;

/// <summary>One harmonic, x(t) = Amplitude·cos(order·wt + Phase); amplitude is peak, phase in degrees.</summary>
public readonly record struct Harmonic(int Order, double Amplitude, double Phase_deg);

/// <summary>Figures of a periodic waveform sampled at equal spacing over one period from t = 0.</summary>
public static class Waveform
{
    public static double Rms(double[] x)
    {
        ArgumentNullException.ThrowIfNull(x);
        var s = 0.0;
        foreach (var v in x)
        {
            s += v * v;
        }

        return Math.Sqrt(s / x.Length);
    }

    public static double Mean(double[] x)
    {
        ArgumentNullException.ThrowIfNull(x);
        var s = 0.0;
        foreach (var v in x)
        {
            s += v;
        }

        return s / x.Length;
    }

    public static double Peak(double[] x)
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
    public static Harmonic[] Harmonics(double[] x, int highest)
    {
        ArgumentNullException.ThrowIfNull(x);
        var n = x.Length;
        ArgumentOutOfRangeException.ThrowIfGreaterThanOrEqual(highest, n / 2);
        var table = PeriodTable.Of(n);
        var result = new Harmonic[highest];

        // What repeats with the opposite sign after half a period has odd orders only, and half the sum says all.
        var halfWave = n % 2 == 0 && RepeatsTurned(x);
        var span = halfWave ? n / 2 : n;
        for (var h = 1; h <= highest; h++)
        {
            if (halfWave && h % 2 == 0)
            {
                result[h - 1] = new Harmonic(h, 0, 0);
                continue;
            }

            double re = 0, im = 0;
            for (int t = 0, k = 0; t < span; t++)
            {
                re += x[t] * table.Cos[k];
                im -= x[t] * table.Sin[k];
                k += h;
                k -= k >= n ? n : 0;
            }

            re *= 2.0 / span;
            im *= 2.0 / span;
            result[h - 1] = new Harmonic(h, Math.Sqrt((re * re) + (im * im)), Math.Atan2(im, re) * 180 / Math.PI);
        }

        return result;
    }

    private static bool RepeatsTurned(double[] x)
    {
        var half = x.Length / 2;
        for (var t = 0; t < half; t++)
        {
            if (x[t] != -x[t + half])
            {
                return false;
            }
        }

        return true;
    }
}
