using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Steels;
using CoreDesign.Magnetics.Cores;
using CoreDesign.Magnetics.Excitation;

namespace CoreDesign.Estimating.Estimate;

/// <summary>Loss, current and peak flux density against voltage, each point solved.</summary>
public static class VoltageSweep
{
    /// <summary>Per cent of rated voltage at which the curve is solved; where no law holds the points are left out.</summary>
    public static IReadOnlyList<double> Levels { get; } = [70, 75, 80, 85, 90, 95, 100, 102.5, 105, 107.5, 110, 112.5, 115, 117.5, 120, 122.5, 125, 127.5, 130];

    public static Outcome<IReadOnlyList<VoltagePointResult>> Run(DesignInput design, SteelCatalog steels, CancellationToken cancel = default) =>
        EstimateDesign.Prepare<IReadOnlyList<VoltagePointResult>>(design, steels, core => Of(core, cancel));

    internal static IReadOnlyList<VoltagePointResult> Of(CoreAtWork core, CancellationToken cancel) =>
        [.. Levels.Take(Held(core.Design)).Select(v => Point(core, core.SolveAt(v, cancel), v))];

    /// <summary>How many of the levels a law holds for.</summary>
    internal static int Held(ResolvedDesign design) => Levels.Count(v => design.LimbFluxDensity_T(v, design.Supply.Frequency_Hz) <= EstimateDesign.Highest_T);

    /// <summary>Mean rms line current in per cent of the rated one.</summary>
    internal static double Current_percent(CoreAtWork core, CoreSolution s) =>
        100 * CoreLines.Of(core.Design, s, core.Design.Excited).Average(l => Waveform.Rms(l.Current_A)) / core.Design.RatedCurrent_A;

    private static VoltagePointResult Point(CoreAtWork core, CoreSolution s, double voltage_percent) => new()
    {
        Voltage_percent = voltage_percent,
        NoLoadLoss_W = s.Solution.CoreLoss_W,
        NoLoadCurrent_percent = Current_percent(core, s),
        PeakFluxDensity_T = PartShape.Worst(s).Peak_T,
    };
}
