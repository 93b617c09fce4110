using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Estimate;

namespace CoreDesign.Estimating.Margins;

/// <summary>Loss, current and peak flux density against volts per hertz: rated voltage at other frequencies, each point solved.</summary>
public static class FluxSweep
{
    public const string Definition =
        "Volts per hertz in per cent of rated voltage over rated frequency. The voltage stays rated, the frequency is varied; the steel's law is that of the rated frequency, carried to others by its own eddy and excess terms.";

    /// <summary>Per cent of the rated quotient at which the curve is solved; where no law holds the points are left out.</summary>
    public static IReadOnlyList<double> Levels { get; } = [70, 80, 90, 95, 100, 105, 110, 115, 120, 125, 130];

    internal static IReadOnlyList<FluxPointResult> Of(CoreAtWork core, CancellationToken cancel) =>
        [.. Levels.Where(x => core.Design.LimbFluxDensity_T(100, Frequency_Hz(core, x)) <= EstimateDesign.Highest_T).Select(x => Point(core, x, cancel))];

    private static double Frequency_Hz(CoreAtWork core, double level) => core.Design.Supply.Frequency_Hz * 100 / level;

    private static FluxPointResult Point(CoreAtWork core, double level, CancellationToken cancel)
    {
        var f = Frequency_Hz(core, level);
        var s = core.SolveAt(100, f, cancel);
        return new FluxPointResult
        {
            VoltsPerHertz_percent = level,
            Frequency_Hz = f,
            NoLoadLoss_W = s.Solution.CoreLoss_W,
            NoLoadCurrent_percent = VoltageSweep.Current_percent(core, s),
            PeakFluxDensity_T = PartShape.Worst(s).Peak_T,
        };
    }
}
