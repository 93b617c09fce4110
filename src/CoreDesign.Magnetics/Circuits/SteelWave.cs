using CoreDesign.Magnetics.Excitation;
using CoreDesign.Magnetics.Materials;

namespace CoreDesign.Magnetics.Circuits;

/// <summary>
/// Field of a law under one flux density waveform, and the heat of each of its terms, W/m3. Arrays hold half a period where the waveform repeats with the
/// opposite sign, else the whole. Hysteresis is in its periodic state, from the demagnetised one; its heat is counted along the way and knows nothing of the terminals.
/// </summary>
internal sealed class SteelWave
{
    private SteelWave(double[] field) => Field_A_per_m = field;

    public double[] Field_A_per_m { get; }

    public double Hysteresis_W_per_m3 { get; private init; }

    public double Classical_W_per_m3 { get; private init; }

    public double Excess_W_per_m3 { get; private init; }

    public double Total_W_per_m3 => Hysteresis_W_per_m3 + Classical_W_per_m3 + Excess_W_per_m3;

    /// <summary>Any waveform of flux and its rate over <paramref name="points"/> a period, or half as many, through one square metre divided by <paramref name="perArea"/>.</summary>
    public static SteelWave Of(SheetLaw law, double[] flux, double[] rate, double perArea, int points, double frequency_Hz)
    {
        var span = flux.Length;
        var halfWave = span < points;
        var h = new double[span];
        var heat = law.Together.IsEmpty ? 0 : AddLoops(law.Together, flux, perArea, halfWave, h);
        double classical = 0, excess = 0;
        for (var t = 0; t < span; t++)
        {
            h[t] += law.Spine.Value(flux[t] * perArea);
        }

        for (var t = 0; law.HasRate && t < span; t++)
        {
            var s = rate[t] * perArea;
            var e = law.ExcessField(s);
            h[t] += (law.Eddy_A_s_per_m_T * s) + e;
            classical += law.Eddy_A_s_per_m_T * s * s;
            excess += e * s;
        }

        return new SteelWave(h)
        {
            Hysteresis_W_per_m3 = heat * frequency_Hz,
            Classical_W_per_m3 = classical / span,
            Excess_W_per_m3 = excess / span,
        };
    }

    /// <summary>Adds the field of the stops and returns the heat of a period. The first period passes both extremes; what comes after repeats.</summary>
    private static double AddLoops(StopCurve stops, double[] flux, double perArea, bool halfWave, double[] h)
    {
        var heat = 0.0;
        var memory = new LoopMemory(stops);
        for (var pass = halfWave ? 2 : 1; pass >= 0; pass--)
        {
            heat = 0;
            for (var t = 0; t < flux.Length; t++)
            {
                heat += memory.Accept(flux[t] * perArea);
                h[t] = memory.Last_A_per_m;
            }

            if (halfWave && pass > 0)
            {
                memory.Turn();
            }
        }

        return halfWave ? 2 * heat : heat;
    }

    /// <summary>
    /// A sine, B = amplitude·cos(wt + phase). From each peak the stops follow Masing's rule over the whole half period, so that no path need be walked,
    /// and a cycle costs four times the heat of the way from zero to the peak.
    /// </summary>
    public static SteelWave OfSine(SheetLaw law, double amplitude_T, double phase, int span, int points, double frequency_Hz)
    {
        var table = PeriodTable.Of(points);
        var (sin, cos) = Math.SinCos(phase);
        var w = 2 * Math.PI * frequency_Hz;
        var stops = law.Together;
        var tip = stops.IsEmpty ? 0 : stops.Field(amplitude_T, out _);
        var h = new double[span];
        var excess = 0.0;
        for (var t = 0; t < span; t++)
        {
            var b = amplitude_T * ((table.Cos[t] * cos) - (table.Sin[t] * sin));
            var s = -w * amplitude_T * ((table.Sin[t] * cos) + (table.Cos[t] * sin));
            var field = law.Spine.Value(b) + (law.Eddy_A_s_per_m_T * s);
            if (!stops.IsEmpty)
            {
                var way = s < 0 ? -1 : 1;
                field += way * ((2 * stops.Field((amplitude_T + (way * b)) / 2, out _)) - tip);
            }

            if (law.Excess > 0)
            {
                var e = law.ExcessField(s);
                field += e;
                excess += e * s;
            }

            h[t] = field;
        }

        return new SteelWave(h)
        {
            Hysteresis_W_per_m3 = stops.IsEmpty ? 0 : 4 * stops.Heat(amplitude_T) * frequency_Hz,
            Classical_W_per_m3 = law.Eddy_A_s_per_m_T * w * w * amplitude_T * amplitude_T / 2,
            Excess_W_per_m3 = excess / span,
        };
    }
}
