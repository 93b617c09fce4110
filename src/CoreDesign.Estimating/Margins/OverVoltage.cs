using System.Globalization;
using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Estimate;
using CoreDesign.Magnetics.Cores;

namespace CoreDesign.Estimating.Margins;

/// <summary>The over-voltage at which the no-load current reaches a multiple of its value at rated voltage: bracketed, then solved by false position on the real circuit.</summary>
internal static class OverVoltage
{
    public const double Highest_percent = 150;
    private const double Tolerance = 1e-4;
    private const int MostSolves = 60;

    public const string Definition =
        "Voltage, in per cent of rated, at which the mean of the rms line currents is the chosen multiple of its value at rated voltage; rated frequency.";

    public static OverVoltageResult Of(CoreAtWork core, CoreSolution atRated, CancellationToken cancel)
    {
        var multiple = core.Design.Inputs.Margins!.CurrentMultiple!.Value;
        return StudyMargins.Or(() => Solve(core, atRated, multiple, cancel), reason => new OverVoltageResult { CurrentMultiple = multiple, Definition = Definition, Reason = reason });
    }

    private static OverVoltageResult Solve(CoreAtWork core, CoreSolution atRated, double multiple, CancellationToken cancel)
    {
        var rated = VoltageSweep.Current_percent(core, atRated);
        var lawEnds = 100 * EstimateDesign.Highest_T / core.Design.LimbFluxDensity_T(100, core.Design.Supply.Frequency_Hz);
        var highest = Math.Min(Highest_percent, lawEnds);
        var top = core.SolveAt(highest, cancel);
        var most = VoltageSweep.Current_percent(core, top) / rated;
        var tried = new OverVoltageResult { CurrentMultiple = multiple, HighestTried_percent = highest, MultipleAtHighest = most, Definition = Definition };
        if (most < multiple)
        {
            var why = lawEnds < Highest_percent ? string.Create(CultureInfo.InvariantCulture, $", where the limbs reach {EstimateDesign.Highest_T} T and no law holds beyond") : "";
            return tried with { Reason = string.Create(CultureInfo.InvariantCulture, $"Not reached up to {highest:0.#} % of rated voltage{why}: the current there is {most:0.##} times that at rated voltage.") };
        }

        // In the logarithm of the current the curve is nearly straight piece by piece; halving the kept end's weight (Illinois) keeps both ends moving.
        double low = 100, high = highest, fLow = -Math.Log(multiple), fHigh = Math.Log(most / multiple);
        var side = 0;
        for (var n = 0; n < MostSolves; n++)
        {
            var v = fHigh == 0 ? high : ((low * fHigh) - (high * fLow)) / (fHigh - fLow);
            var s = core.SolveAt(v, cancel);
            var f = Math.Log(VoltageSweep.Current_percent(core, s) / rated / multiple);
            if (Math.Abs(f) < Tolerance)
            {
                return tried with { Voltage_percent = v, NoLoadCurrent_percent = VoltageSweep.Current_percent(core, s), PeakFluxDensity_T = PartShape.Worst(s).Peak_T };
            }

            (low, fLow, high, fHigh) = f < 0 ? (v, f, high, side < 0 ? fHigh / 2 : fHigh) : (low, side > 0 ? fLow / 2 : fLow, v, f);
            side = f < 0 ? -1 : 1;
        }

        return tried with { Reason = string.Create(CultureInfo.InvariantCulture, $"The voltage was not found to the tolerance in {MostSolves} solves between {low:0.###} and {high:0.###} %.") };
    }
}
