using CoreDesign.Estimating.Contracts;
using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Cores;
using CoreDesign.Magnetics.Excitation;

namespace CoreDesign.Estimating.Estimate;

/// <summary>Figures of the windings: each side as if it were fed, the closed delta, an isolated star point.</summary>
internal static class SideShape
{
    private const int HighestHarmonic = 13;

    public static IReadOnlyList<SideResult> Of(CoreAtWork core, CoreSolution atRated, CancellationToken cancel)
    {
        var excited = Side(core.Design, "excited", core.Design.Excited, atRated);
        return core.Design.Other is { } other ? [excited, Side(core.Design, "other", other, core.Solve(other, 100, cancel))] : [excited];
    }

    public static IReadOnlyList<HarmonicResult> Harmonics(double[] current) =>
        [.. Waveform.Harmonics(current, HighestHarmonic).Select(h => new HarmonicResult(h.Order, h.Amplitude / Math.Sqrt(2), h.Phase_deg))];

    public static TertiaryResult? Tertiary(ResolvedDesign design, CircuitSolution s)
    {
        if (design.Tertiary is not { } delta)
        {
            return null;
        }

        // A closed delta that the solve left open carries nothing.
        var at = s.Circuit.Windings.ToList().FindIndex(w => w.Phase == WindingPhase.Closed);
        var current = at < 0 ? new double[s.Points] : s.WindingCurrent_A[at];
        return new TertiaryResult { Turns = delta.Turns, Rms_A = Waveform.Rms(current), Peak_A = Waveform.Peak(current), Harmonics = Harmonics(current) };
    }

    public static NeutralResult? Neutral(ResolvedDesign design, CircuitSolution s)
    {
        if (design.Supply.Connection != SupplyConnection.StarIsolated)
        {
            return null;
        }

        var u = NeutralVoltage.Of(s);
        double rms = Waveform.Rms(u), third = Waveform.Harmonics(u, 3)[2].Amplitude / Math.Sqrt(2), phase = design.Excited.PhaseVoltage_V;
        return new NeutralResult { Rms_V = rms, Rms_percent = 100 * rms / phase, ThirdHarmonic_V = third, ThirdHarmonic_percent = 100 * third / phase };
    }

    public static CapacitiveResult? Capacitive(ResolvedDesign design) => design.Capacitance is null ? null : new CapacitiveResult
    {
        Current_A = CoreLines.Capacitive_A(design, design.Excited, design.Supply.Voltage_V),
        Power_var = CoreLines.Power_var(design),
    };

    private static SideResult Side(ResolvedDesign design, string name, FedWinding winding, CoreSolution solved)
    {
        var lines = CoreLines.Of(design, solved, winding);
        var rated = design.RatedPower_VA * Connections.CurrentPerVoltAmpere(winding.Supply.Connection) / winding.Supply.Voltage_V;
        var current = lines.Average(l => Waveform.Rms(l.Current_A));
        return new SideResult
        {
            Winding = name,
            Connection = Connections.NameOf(winding.Supply.Connection),
            LineVoltage_V = winding.Supply.Voltage_V,
            Turns = winding.Turns,
            RatedCurrent_A = rated,
            NoLoadCurrent_A = current,
            NoLoadCurrent_percent = 100 * current / rated,
            Lines = [.. lines.Select(l => new SideLineResult { Phase = l.Name, Rms_A = Waveform.Rms(l.Current_A), Peak_A = Waveform.Peak(l.Current_A), Harmonics = Harmonics(l.Current_A) })],
        };
    }
}
