using CoreDesign.Magnetics.Materials;

namespace CoreDesign.Estimating.Steels;

/// <summary>
/// The knee of grain-oriented sheet: what the peak field strength at 50 Hz is more than the mean half-width W/(4B) of the loop,
/// W being the loss of one cycle in J/m³. Taken from a reference steel of 0.23 mm with 1.00 W/kg at 1.7 T: below 0.7 T from a
/// published peak curve (file <c>peak_curve_published_0p23mm_50Hz.csv</c>), above from a list from memory. In the published points
/// the excess is 0.5 to 1.5 A/m only: at low induction the peak field is the loss field, which is why it is split off.
/// </summary>
public static class PeakCurveTemplate
{
    /// <summary>Loss of the reference steel at 1.5 T and 1.7 T, 50 Hz, in W/kg (from memory: their ratio is about 0.72).</summary>
    internal const double ReferenceLoss15_W_per_kg = 0.72;
    internal const double ReferenceLoss17_W_per_kg = 1.00;

    private const double PublishedUsedBelow_T = 0.7;
    private const double ReferenceDensity_kg_per_m3 = 7650;

    /// <summary>Peak curve of the reference steel above the published points used, from memory, no source.</summary>
    private static readonly MagnetizationPoint[] UpperList =
    [
        new(1.0, 14), new(1.3, 20), new(1.5, 30), new(1.6, 42), new(1.7, 75), new(1.8, 190), new(1.85, 400), new(1.9, 900),
    ];

    /// <summary>Peak curve of the reference steel, lowest first.</summary>
    public static IReadOnlyList<MagnetizationPoint> Reference { get; } =
        [.. DataTable.Read("peak_curve_published_0p23mm_50Hz.csv")
            .Select(r => new MagnetizationPoint(r.Number("B_peak_T"), r.Number("H_peak_A_per_m")))
            .Where(p => p.B_T < PublishedUsedBelow_T),
        .. UpperList];

    /// <summary>Excess field strength in A/m against flux density, rising; known from the first to the last point of <see cref="Reference"/>.</summary>
    internal static LogCurve Knee { get; } = BuildKnee();

    internal static double Lowest_T => Reference[0].B_T;

    internal static double Highest_T => Reference[^1].B_T;

    /// <summary>Mean half-width of the loop in A/m: loss of one cycle per volume over four times the peak flux density.</summary>
    internal static double LoopHalfWidth_A_per_m(double loss_W_per_kg, double density_kg_per_m3, double frequency_Hz, double b_T) =>
        loss_W_per_kg * density_kg_per_m3 / frequency_Hz / (4 * b_T);

    private static LogCurve BuildKnee()
    {
        var loss = LossShape.Law(ReferenceLoss15_W_per_kg, ReferenceLoss17_W_per_kg);
        var excess = new List<double>();
        foreach (var p in Reference)
        {
            // The published field strengths are whole A/m; a running maximum keeps their rounding from bending the knee back.
            var e = p.H_A_per_m - LoopHalfWidth_A_per_m(loss.At(p.B_T), ReferenceDensity_kg_per_m3, 50, p.B_T);
            excess.Add(Math.Max(e, excess.Count == 0 ? 0 : excess[^1]));
        }

        return LogCurve.SemiLog([.. Reference.Select(p => p.B_T)], [.. excess]);
    }
}
