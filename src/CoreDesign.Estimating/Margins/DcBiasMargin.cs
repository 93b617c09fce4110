using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Estimate;
using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Cores;
using CoreDesign.Magnetics.Excitation;
using CoreDesign.Magnetics.Transients;

namespace CoreDesign.Estimating.Margins;

/// <summary>What a direct current in the excited winding does to the steady state at rated voltage.</summary>
internal static class DcBiasMargin
{
    private const int HighestHarmonic = 13;

    public const string Definition =
        "Rated voltage and frequency, the given direct current in each phase of the excited winding, winding resistance neglected: the mean flux is what makes the mean of each current the given one. The loss is the core's; what the direct current turns to heat in the winding is not in it. The steel's law gives a loop the same area wherever its middle lies, while measured sheets lose more under a bias: take the loss for a lower bound. Capacitive current is not in it, and a closed delta, which hinders no steady flux, is left out.";

    /// <summary>Null where no direct current is asked for.</summary>
    public static DcBiasResult? Of(CoreAtWork core, CoreSolution atRated, CancellationToken cancel)
    {
        var bias = core.Design.Inputs.Margins!.DcBias_A!.Value;
        var empty = new DcBiasResult { Bias_A = bias, Definition = Definition };
        if (bias == 0)
        {
            return null;
        }

        if (core.Design.Supply.Connection is SupplyConnection.Delta or SupplyConnection.StarIsolated)
        {
            return empty with { Reason = "A delta and an isolated star have no path for direct current through their lines. Excite a winding of connection YN or a single phase, or enter 0 A." };
        }

        return StudyMargins.Or(() => Solved(empty, core, atRated, cancel), reason => empty with { Reason = reason });
    }

    private static DcBiasResult Solved(DcBiasResult empty, CoreAtWork core, CoreSolution atRated, CancellationToken cancel)
    {
        var s = DcBias.Solve(StudyMargins.Laden(core.Design, atRated, tertiary: false), empty.Bias_A, CoreAtWork.PointsPerPeriod, cancel);
        var js = core.Sheet.SaturationPolarization_T;
        var (part, peak) = atRated.Core.Parts
            .Where(p => atRated.Core.Geometry.Parts.Any(g => g.Name == p.Part))
            .Select(p => (p.Part, Peak: p.Branches.Max(s.PeakFluxDensity_T)))
            .MaxBy(p => p.Peak);
        var lines = LineCurrents.Of(s.Circuit, s.WindingCurrent_A);
        var current = lines.Average(l => Waveform.Rms(l.Current_A));
        return empty with
        {
            NoLoadLoss_W = s.CoreLoss_W,
            NoLoadCurrent_A = current,
            NoLoadCurrent_percent = 100 * current / core.Design.RatedCurrent_A,
            PeakFluxDensity_T = peak,
            WorstPart = part,
            Margin_percent = 100 * (js - peak) / js,
            Offset_T = s.Offset_Wb.Max(Math.Abs) / (core.Design.Turns * core.Design.Geometry.NetLimbArea_m2),
            Lines = [.. lines.Select(l => new DcBiasLineResult
            {
                Phase = l.Name,
                Rms_A = Waveform.Rms(l.Current_A),
                Peak_A = Waveform.Peak(l.Current_A),
                Harmonics = [.. Waveform.Harmonics(l.Current_A, HighestHarmonic).Select(h => new HarmonicResult(h.Order, h.Amplitude / Math.Sqrt(2), h.Phase_deg))],
                Waveform_A = l.Current_A,
            })],
        };
    }
}
