using CoreDesign.Magnetics;
using CoreDesign.Magnetics.Materials;

namespace CoreDesign.Estimating.Steels;

/// <summary>
/// Curves for a grade of which only guaranteed points are published. They pass those points exactly and are otherwise of
/// the usual shape of grain-oriented sheet; they are no measurement.
/// <para>Peak curve up to 800 A/m: H(B) = W(B)/(4B) + K(B/s), the mean half-width of the grade's own 50 Hz loop and the knee
/// of <see cref="PeakCurveTemplate"/> with its flux density stretched by s, chosen so that J(800 A/m) is the guaranteed polarization.
/// Less orientation means a smaller s and more field strength at the same flux density.</para>
/// <para>Beyond: Js - J = (Js - J800)(800 + h)/(H + h), the 1/H term of the law of approach to saturation shifted by h so that the
/// slope is continuous at 800 A/m; up to 100 kA/m.</para>
/// </summary>
public static class RepresentativeCurves
{
    private const double Tie_A_per_m = 800;
    private const double PeakCurveFrequency_Hz = 50;

    private static readonly double[] TailFields_A_per_m =
        [1000, 1250, 1600, 2000, 2500, 3150, 4000, 5000, 6300, 8000, 10_000, 16_000, 25_000, 40_000, 63_000, 100_000];

    /// <summary>Peak curve along the rolling direction.</summary>
    /// <param name="polarization800_T">Polarization at 800 A/m, 1.65 to 1.95 T and below saturation.</param>
    /// <param name="saturation_T">Saturation polarization.</param>
    /// <param name="density_kg_per_m3">Density.</param>
    /// <param name="loss15_W_per_kg">Loss at 1.5 T, 50 Hz.</param>
    /// <param name="loss17_W_per_kg">Loss at 1.7 T, 50 Hz.</param>
    /// <exception cref="ArgumentOutOfRangeException">Polarization out of range.</exception>
    public static IReadOnlyList<MagnetizationPoint> PeakCurve(
        double polarization800_T, double saturation_T, double density_kg_per_m3, double loss15_W_per_kg, double loss17_W_per_kg)
    {
        var b800 = polarization800_T + (MagneticConstants.Mu0_H_per_m * Tie_A_per_m);
        if (!(polarization800_T >= 1.65 && b800 <= LossShape.Highest_T && polarization800_T < saturation_T))
        {
            throw new ArgumentOutOfRangeException(
                nameof(polarization800_T),
                polarization800_T,
                $"Polarization at 800 A/m must lie between 1.65 and {LossShape.Highest_T} T and below the saturation polarization {saturation_T} T.");
        }

        var loss = LossShape.Law(loss15_W_per_kg, loss17_W_per_kg);
        double LoopField(double b) => PeakCurveTemplate.LoopHalfWidth_A_per_m(loss.At(b), density_kg_per_m3, PeakCurveFrequency_Hz, b);
        var stretch = b800 / KneeAt(Tie_A_per_m - LoopField(b800));
        double Field(double b) => LoopField(b) + PeakCurveTemplate.Knee.At(Math.Max(b / stretch, PeakCurveTemplate.Lowest_T));

        var points = new List<MagnetizationPoint>();
        for (var i = 1; ; i++)
        {
            // 0.1 T apart up to 1.3 T, then 0.02 T, where the knee bends.
            var b = i <= 13 ? i / 10.0 : (65 + i - 13) / 50.0;
            if (b > b800 - 0.005)
            {
                break;
            }

            points.Add(new MagnetizationPoint(b, Field(b)));
        }

        points.Add(new MagnetizationPoint(b800, Tie_A_per_m));
        const double Step = 1e-5;
        var slope = (Field(b800) - Field(b800 - Step)) / Step;
        points.AddRange(Tail(polarization800_T, saturation_T, slope));
        return points;
    }

    /// <summary>
    /// Peak curve across the rolling direction, the same for every grade. From memory, no source: 200 to 500 A/m at 1.3 T and about
    /// 1.4 T at 800 A/m; the rest is drawn smoothly through these.
    /// </summary>
    public static IReadOnlyList<MagnetizationPoint> TransversePeakCurve(double saturation_T)
    {
        const double J800 = 1.4;
        MagnetizationPoint[] lower =
        [
            new(0.1, 20), new(0.2, 32), new(0.4, 52), new(0.6, 72), new(0.8, 96), new(1.0, 135), new(1.1, 170), new(1.2, 230), new(1.3, 360),
            new(J800 + (MagneticConstants.Mu0_H_per_m * Tie_A_per_m), Tie_A_per_m),
        ];
        var slope = (lower[^1].H_A_per_m - lower[^2].H_A_per_m) / (lower[^1].B_T - lower[^2].B_T);
        return [.. lower, .. Tail(J800, saturation_T, slope)];
    }

    /// <summary>
    /// Loss across the rolling direction: three times the loss along it (from memory: 2.5 to 3.5 times from 1.0 to 1.3 T, no source for
    /// other flux densities), given up to 1.5 T.
    /// </summary>
    public static IReadOnlyList<LossCurve> TransverseLoss(IReadOnlyList<LossCurve> rolling)
    {
        ArgumentNullException.ThrowIfNull(rolling);
        return [.. rolling.Select(c => new LossCurve(
            c.Frequency_Hz, [.. c.Points.Where(p => p.B_T <= 1.5).Select(p => new LossPoint(p.B_T, 3 * p.Loss_W_per_kg))]))];
    }

    private static IEnumerable<MagnetizationPoint> Tail(double j800, double saturation, double slopeAt800)
    {
        // dJ/d(ln H) at 800 A/m, both from below and from the tail, whose value there is (Js - J800) * 800 / (800 + h).
        var rise = Tie_A_per_m * ((1 / slopeAt800) - MagneticConstants.Mu0_H_per_m);
        var h = Tie_A_per_m * (((saturation - j800) / rise) - 1);
        return TailFields_A_per_m.Select(H => new MagnetizationPoint(
            saturation - ((saturation - j800) * (Tie_A_per_m + h) / (H + h)) + (MagneticConstants.Mu0_H_per_m * H), H));
    }

    private static double KneeAt(double field_A_per_m)
    {
        double low = PeakCurveTemplate.Lowest_T, high = PeakCurveTemplate.Highest_T;
        for (var i = 0; i < 60; i++)
        {
            var mid = 0.5 * (low + high);
            if (PeakCurveTemplate.Knee.At(mid) < field_A_per_m)
            {
                low = mid;
            }
            else
            {
                high = mid;
            }
        }

        return 0.5 * (low + high);
    }
}
