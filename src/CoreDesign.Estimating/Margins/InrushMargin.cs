using System.Globalization;
using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Estimate;
using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Cores;
using CoreDesign.Magnetics.Transients;

namespace CoreDesign.Estimating.Margins;

/// <summary>First inrush peak at rated voltage: the whole core solved in time, beside closed formulas for its first phase alone.</summary>
internal static class InrushMargin
{
    private const int MostPoints = 540;

    public const string Definition =
        "Highest absolute value of any line current in three periods after the excited winding is put on rated voltage, all phases at one instant, other windings open but for a closed delta: solved in time with the steel's own law, at a step of which half and whole are compared.";

    public const string FormulaText =
        "√2·U/(ω·L)·(Br + Bn·(1 + cos α) − Js)/Bn for the first phase alone, L air-core and source inductance, no current below saturation (form of Specht 1951, from memory); with resistance the transient of an R-L circuit from the instant of saturation (form of Holcomb 1961, from memory).";

    public const string Assumptions =
        "The first phase closes at the switching angle; its residual flux lies in the direction in which its flux sets out, the two other phases hold half of it against that, so that the limbs add to zero. The hysteresis starts as from the demagnetised state. Saturated steel goes on with the slope of vacuum; air inside each winding and round its limb's ends lies beside the steel, so sized that a limb saturated through has the air-core inductance. A closed delta is taken without leakage to the excited winding. Capacitive current is not in it.";

    public static InrushResult Of(CoreAtWork core, CoreSolution atRated, CancellationToken cancel)
    {
        var input = core.Design.Inputs.Margins!.Inrush!;
        var empty = new InrushResult { Definition = Definition, FormulaText = FormulaText, Assumptions = $"{Assumptions} Air-core inductance where it is not given: {AirCoreOfDesign.Source}." };
        var circuit = StudyMargins.Laden(core.Design, atRated, DeltaCounts(core.Design, input));
        var ends = AirCoreOfDesign.EndShare(core.Design.Geometry);
        var least_mH = 1000 * AirPaths.Least_H(circuit, circuit.Windings.First(w => w.Phase != WindingPhase.Closed), ends);
        if (input.AirCoreInductance_mH < least_mH)
        {
            return empty with
            {
                Reason = string.Create(CultureInfo.InvariantCulture, $"Air-core inductance {input.AirCoreInductance_mH} mH is below {least_mH:G4} mH, which the saturated steel of the limb has by itself. Enter at least that, or leave it open."),
            };
        }

        empty = WithFormulas(empty, core, input);
        return StudyMargins.Or(() => Solved(empty, core, circuit, input, ends, cancel), reason => empty with { Reason = reason });
    }

    private static InrushResult Solved(InrushResult empty, CoreAtWork core, MagneticCircuit circuit, InrushInput input, double endShare, CancellationToken cancel)
    {
        bool Closed(Winding w) => w.Phase == WindingPhase.Closed;
        var found = Inrush.Solve(
            new Energizing
            {
                Circuit = AirPaths.Add(circuit, [.. circuit.Windings.Select(w => Closed(w) ? 0 : input.AirCoreInductance_mH!.Value / 1000)], endShare),
                Angle_rad = input.SwitchingAngle_deg!.Value * Math.PI / 180,
                ResidualLinkage_Wb = Inrush.ResidualLinkage_Wb(circuit, input.Residual_percent!.Value / 100),
                SourceInductance_H = input.SourceInductance_mH!.Value / 1000,
                Resistance_ohm = [.. circuit.Windings.Select(w => Closed(w) ? w.Resistance_ohm : input.Resistance_ohm!.Value)],
            },
            cancel);
        var every = (found.Time_s.Length + MostPoints - 1) / MostPoints;
        IReadOnlyList<double> Thin(double[] x) => [.. Enumerable.Range(0, ((x.Length - 1) / every) + 1).Select(i => Digits(x[i * every]))];
        return empty with
        {
            Peak_A = found.Peak_A,
            PeakOverRated = found.Peak_A / (Math.Sqrt(2) * core.Design.RatedCurrent_A),
            PeakLine = found.PeakLine,
            PeakTime_ms = 1000 * found.PeakTime_s,
            PeakOfPeriod_A = found.PeakOfPeriod_A,
            StepHalving_percent = 100 * found.HalvingChange,
            Time_ms = Thin([.. found.Time_s.Select(t => 1000 * t)]),
            Lines = [.. found.Lines.Select(l => new InrushLineResult(l.Name, Thin(l.Current_A)))],
        };
    }

    /// <summary>
    /// A closed delta without resistance beside windings whose voltages add to zero without any drop asks for what holds already; how the two share what flows
    /// there is not determined, and nothing is induced: it is left out.
    /// </summary>
    private static bool DeltaCounts(ResolvedDesign design, InrushInput input) =>
        design.Tertiary is { } delta
        && (delta.Resistance_ohm > 0 || input.Resistance_ohm > 0 || (input.SourceInductance_mH > 0 && design.Supply.Connection != SupplyConnection.Delta) || design.Supply.Connection == SupplyConnection.StarIsolated);

    /// <summary>The formulas count one direction; the flux may set out in either.</summary>
    private static InrushResult WithFormulas(InrushResult empty, CoreAtWork core, InrushInput input)
    {
        var design = core.Design;
        var supply = design.Supply;
        var b = design.LimbFluxDensity_T(100, supply.Frequency_Hz);

        // Two lines feed a delta's winding.
        var source = input.SourceInductance_mH!.Value / 1000 * (supply.Connection == SupplyConnection.Delta ? 2 : 1);
        var there = new IdealInrush(
            Inrush.PeakLinkage_Wb(supply) * Math.Sqrt(2) * Math.PI * supply.Frequency_Hz,
            supply.Frequency_Hz,
            b,
            b * input.Residual_percent!.Value / 100,
            core.Sheet.SaturationPolarization_T,
            input.SwitchingAngle_deg!.Value * Math.PI / 180,
            (input.AirCoreInductance_mH!.Value / 1000) + source,
            input.Resistance_ohm!.Value);
        var back = there with { Residual_T = -there.Residual_T, Angle_rad = there.Angle_rad + Math.PI };
        return empty with
        {
            FormulaLossless_A = Math.Max(InrushFormulas.Lossless_A(there), InrushFormulas.Lossless_A(back)),
            FormulaWithResistance_A = Math.Max(InrushFormulas.WithResistance_A(there), InrushFormulas.WithResistance_A(back)),
        };
    }

    // Five digits are more than a curve shows; a revision keeps them for ever.
    private static double Digits(double x) => x == 0 ? 0 : double.Parse(x.ToString("G5", CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);
}
