using CoreDesign.Magnetics.Materials;

namespace CoreDesign.Magnetics.Circuits;

/// <summary>Field and heat of one sheet law under one flux density waveform; periodic state, memory started demagnetised.</summary>
internal sealed class SteelWave
{
    private readonly SheetLaw _law;
    private readonly double[] _b;

    public SteelWave(SheetLaw law, double[] b, double[] rate, double frequency_Hz)
    {
        _law = law;
        _b = b;
        var n = b.Length;
        Field_A_per_m = new double[n];
        AddStops(frequency_Hz);
        double classical = 0, excess = 0;
        for (var t = 0; t < n; t++)
        {
            var s = rate[t];
            var h = law.ExcessField(s);
            Field_A_per_m[t] += law.Spine.Value(b[t]) + (law.Eddy_A_s_per_m_T * s) + h;
            classical += law.Eddy_A_s_per_m_T * s * s;
            excess += h * s;
        }

        Classical_W_per_m3 = classical / n;
        Excess_W_per_m3 = excess / n;
    }

    public double[] Field_A_per_m { get; }

    public double Hysteresis_W_per_m3 { get; private set; }

    public double Classical_W_per_m3 { get; }

    public double Excess_W_per_m3 { get; }

    /// <summary>1 where the waveform is this one, -1 where it is this one turned over, else 0.</summary>
    public int SignFor(SheetLaw law, double[] b)
    {
        if (!ReferenceEquals(law, _law))
        {
            return 0;
        }

        var scale = 0.0;
        double same = 0, turned = 0;
        for (var t = 0; t < b.Length; t++)
        {
            scale = Math.Max(scale, Math.Abs(_b[t]));
            same = Math.Max(same, Math.Abs(b[t] - _b[t]));
            turned = Math.Max(turned, Math.Abs(b[t] + _b[t]));
        }

        return same <= 1e-12 * scale ? 1 : turned <= 1e-12 * scale ? -1 : 0;
    }

    /// <summary>From zero, one period passes both extremes; what the stops do in the next one repeats.</summary>
    private void AddStops(double frequency_Hz)
    {
        var heat = 0.0;
        foreach (var stop in _law.Stops)
        {
            double x = 0, last = 0, r = stop.Threshold_T, w = stop.Weight_A_per_m_T, slid = 0;
            for (var pass = 0; pass < 2; pass++)
            {
                for (var t = 0; t < _b.Length; t++)
                {
                    x += _b[t] - last;
                    last = _b[t];
                    if (x > r)
                    {
                        slid += pass == 1 ? x - r : 0;
                        x = r;
                    }
                    else if (x < -r)
                    {
                        slid += pass == 1 ? -r - x : 0;
                        x = -r;
                    }

                    if (pass == 1)
                    {
                        Field_A_per_m[t] += w * x;
                    }
                }
            }

            heat += w * r * slid;
        }

        Hysteresis_W_per_m3 = heat * frequency_Hz;
    }
}
