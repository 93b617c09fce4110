using CoreDesign.Magnetics.Materials;

namespace CoreDesign.Magnetics.Losses;

/// <summary>How a sheet's time-domain law was fitted.</summary>
public sealed record CalibratedSheet
{
    public required SteelData Data { get; init; }
    public required SheetLaw Law { get; init; }
    public required LossSurface Loss { get; init; }

    /// <summary>Frequency on which the law was fitted: the working one, or the nearest tabulated.</summary>
    public required double Frequency_Hz { get; init; }

    /// <summary>Shares of the loss at 1.5 T and that frequency; they add to 1.</summary>
    public required double HysteresisShare { get; init; }
    public required double ClassicalShare { get; init; }
    public required double ExcessShare { get; init; }

    /// <summary>True where the loss table does not cover the working frequency, so that the law's own terms carry the figures to it.</summary>
    public required bool FrequencyExtrapolated { get; init; }

    /// <summary>Flux density up to which the fit holds; loss beyond is extrapolated.</summary>
    public double HighestFluxDensity_T => Loss.HighestFluxDensity_T;
}

/// <summary>
/// Fits the time-domain law of a sheet to its peak curve and loss curves so that a sine flux at the working frequency gives back
/// both: the loss exactly at every knot of flux density, and the field at the tips of the loop.
/// <para>
/// The classical term follows from thickness and resistivity. The excess coefficient is set by <see cref="HysteresisShareAt15T"/>
/// (a prior from memory: hysteresis takes 35 to 45 % of the loss of grain-oriented sheet at 50 Hz); two curves as close as 50 and 60 Hz
/// cannot tell it, their rounding alone moves it by more than its size. What is left of the loss at each flux density goes to hysteresis stops:
/// W(B) = sum of 4 w r (B - r) over thresholds r below B, a piecewise linear function whose kinks are the weights. The spine is the
/// peak curve less the stops at the tip, so loop tips lie on the peak curve. At low flux density the spine may fall for a stretch; the whole
/// law still rises with the rate terms in it, which is what a solve needs.
/// </para>
/// </summary>
public static class SheetLawCalibration
{
    public const double HysteresisShareAt15T = 0.40;
    private const double ExcessFloor_T_per_s = 150;
    private const double ReferenceFluxDensity_T = 1.5;

    // The stops of lowest threshold would put a notch into every loop where it crosses B = 0. A straight spine there takes it out; tips of
    // loops smaller than this, which no power core sees, are off the peak curve by up to 2 A/m.
    private const double StraightBelow_T = 0.3;

    // Loss is met exactly at the knots; the first carries none, which leaves the field below 0.05 T reversible.
    private static readonly double[] Knots =
        [0.05, 0.1, 0.2, 0.3, 0.4, 0.5, 0.6, 0.7, 0.8, 0.9, 1.0, 1.1, 1.2, 1.3, 1.4, 1.5, 1.55, 1.6, 1.65, 1.7, 1.75, 1.8, 1.85, 1.9, 1.95, 2.0];

    /// <exception cref="ArgumentException">Loss so low that the classical eddy part alone exceeds it, or curves that no loop fits.</exception>
    public static CalibratedSheet Fit(SteelData data, double frequency_Hz)
    {
        ArgumentNullException.ThrowIfNull(data);
        var loss = new LossSurface(data.Loss);
        var f = loss.NearestCovered(frequency_Hz);
        var tip = PeakCurve(data);
        var eddy = data.SheetThickness_m * data.SheetThickness_m / (12 * data.Resistivity_ohm_m);

        var total = Array.ConvertAll(Knots, b => loss.Loss_W_per_kg(b, f) * data.Density_kg_m3 / f);
        var classical = Array.ConvertAll(Knots, b => ClassicalEnergy(eddy, b, f));
        var excessUnit = Array.ConvertAll(Knots, b => ExcessEnergy(b, f));
        var at15 = Array.IndexOf(Knots, ReferenceFluxDensity_T);
        if (classical[at15] >= total[at15])
        {
            throw new ArgumentException($"{data.Name}: the loss at 1.5 T ({total[at15] * f / data.Density_kg_m3:G4} W/kg) is below the classical eddy part alone ({classical[at15] * f / data.Density_kg_m3:G4} W/kg). Check thickness, resistivity and units.", nameof(data));
        }

        // Less hysteresis narrows the loop; taken back until it has the shape of one.
        for (var share = Math.Min(HysteresisShareAt15T, 0.9 * (1 - (classical[at15] / total[at15]))); share > 0.02; share -= 0.02)
        {
            var excess = Math.Max(0, ((1 - share) * total[at15]) - classical[at15]) / excessUnit[at15];
            var stops = Stops(Subtract(total, classical, excessUnit, excess));
            var spine = Spine(tip, stops);
            if (IsLoop(spine, stops, tip.LastX))
            {
                return new CalibratedSheet
                {
                    Data = data,
                    Law = new SheetLaw(spine, eddy, excess, ExcessFloor_T_per_s, stops),
                    Loss = loss,
                    Frequency_Hz = f,
                    ClassicalShare = classical[at15] / total[at15],
                    ExcessShare = excess * excessUnit[at15] / total[at15],
                    HysteresisShare = 1 - (classical[at15] / total[at15]) - (excess * excessUnit[at15] / total[at15]),
                    FrequencyExtrapolated = !loss.Covers(frequency_Hz),
                };
            }
        }

        throw new ArgumentException($"{data.Name}: no loop under the peak curve has the area of the loss curve. The peak field strengths are too small for these losses; check the unit of H (A/m, peak).", nameof(data));
    }

    /// <summary>The peak curve as a function H(B), going on with the slope of vacuum once saturated.</summary>
    public static MonotoneCurve PeakCurve(SteelData data)
    {
        ArgumentNullException.ThrowIfNull(data);
        return new MonotoneCurve([.. data.Magnetization.Select(p => p.B_T)], [.. data.Magnetization.Select(p => p.H_A_per_m)], 1 / MagneticConstants.Mu0_H_per_m);
    }

    /// <summary>Classical eddy loss per cycle, J/m3, sine flux: pi² sigma d² B² f / 6.</summary>
    private static double ClassicalEnergy(double eddy, double b, double f) => eddy * 2 * Math.PI * Math.PI * f * b * b;

    /// <summary>Excess loss per cycle for a coefficient of one, J/m3, sine flux.</summary>
    private static double ExcessEnergy(double b, double f)
    {
        const int points = 256;
        double s0 = ExcessFloor_T_per_s, sum = 0;
        for (var n = 0; n < points; n++)
        {
            var s = 2 * Math.PI * f * b * Math.Cos(2 * Math.PI * (n + 0.5) / points);
            sum += s * s / Math.Sqrt(Math.Sqrt((s * s) + (s0 * s0)));
        }

        return sum / points / f;
    }

    private static double[] Subtract(double[] total, double[] classical, double[] excessUnit, double excess) =>
        [.. total.Select((w, i) => i == 0 ? 0 : w - classical[i] - (excess * excessUnit[i]))];

    private static List<HysteresisStop> Stops(double[] hysteresis)
    {
        // The kink of the piecewise linear W(B) at a knot r is 4 w r. A small negative weight is allowed: the loop's area stays exact.
        var stops = new List<HysteresisStop>();
        var slopeBefore = 0.0;
        for (var i = 0; i < Knots.Length - 1; i++)
        {
            var slope = (hysteresis[i + 1] - hysteresis[i]) / (Knots[i + 1] - Knots[i]);
            stops.Add(new HysteresisStop(Knots[i], (slope - slopeBefore) / (4 * Knots[i])));
            slopeBefore = slope;
        }

        return stops;
    }

    private static MonotoneCurve Spine(MonotoneCurve tip, List<HysteresisStop> stops)
    {
        // Dense enough that the cubics follow the peak curve between its own points to a small fraction of a per cent.
        double[] b = [.. Enumerable.Range(1, 600).Select(i => i * 0.005).Where(x => x < tip.LastX).Append(tip.LastX)];
        double[] h = Array.ConvertAll(b, x => x < StraightBelow_T ? At(StraightBelow_T) * x / StraightBelow_T : At(x));
        return new MonotoneCurve(b, h, 1 / MagneticConstants.Mu0_H_per_m, rising: false);

        double At(double x) => tip.Value(x) - stops.Sum(s => s.Weight_A_per_m_T * Math.Min(s.Threshold_T, x));
    }

    /// <summary>True where the rising branch of static loops keeps at least half of its coercive field all the way up: a loop that no sheet would show is turned down.</summary>
    private static bool IsLoop(MonotoneCurve spine, List<HysteresisStop> stops, double highest_T)
    {
        foreach (var amplitude in new[] { 0.5, 1.0, 1.5, 1.7 })
        {
            var coercive = Rising(0, amplitude);
            for (var b = 0.0; b <= Math.Min(amplitude, highest_T); b += 0.02)
            {
                if (coercive <= 0 || Rising(b, amplitude) < 0.5 * coercive)
                {
                    return false;
                }
            }
        }

        return true;

        double Rising(double b, double amplitude) =>
            spine.Value(b) + stops.Sum(s => s.Weight_A_per_m_T * Math.Min(s.Threshold_T, b + amplitude - Math.Min(s.Threshold_T, amplitude)));
    }
}
