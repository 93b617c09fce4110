using System.Globalization;
using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Estimate;
using CoreDesign.Estimating.Steels;
using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Cores;

namespace CoreDesign.Estimating.Margins;

/// <summary>Use case: a design in, its margins to saturation out. They take longer than an estimate and come after it.</summary>
public static class StudyMargins
{
    public const string Caution =
        "Inrush, over-voltage and direct-current figures are for planning. Settings of protection defer to the local codes and to licensed practice.";

    public static Outcome<MarginsResult> Run(DesignInput design, SteelCatalog steels, CancellationToken cancel = default) =>
        EstimateDesign.Prepare(design, steels, core => Of(core, cancel));

    internal static MarginsResult Of(CoreAtWork core, CancellationToken cancel)
    {
        var atRated = core.SolveAt(100, cancel);
        var curve = FluxSweep.Of(core, cancel);
        return new MarginsResult
        {
            FluxCurve = curve,
            FluxCurveDefinition = FluxSweep.Definition,
            OverVoltage = OverVoltage.Of(core, atRated, cancel),
            Inrush = InrushMargin.Of(core, atRated, cancel),
            DcBias = DcBiasMargin.Of(core, atRated, cancel),
            Notes = [.. Notes(core.Design, curve)],
        };
    }

    /// <summary>
    /// The circuit of the design as it stands, with the extra losses that the zones of the solved core were found to have. (The solved one may have its closed
    /// delta settled for the steady state.)
    /// </summary>
    internal static MagneticCircuit Laden(ResolvedDesign design, CoreSolution solved, bool tertiary)
    {
        var excitation = new CoreExcitation(design.Supply, design.Turns, design.Excited.Resistance_ohm, tertiary ? design.Tertiary : null) { WoundLimbs = design.WoundLimbs };
        var circuit = solved.Core.With(excitation);
        return circuit with { Branches = [.. circuit.Branches.Select((b, i) => b with { ExtraLoss_A_s_per_Wb = solved.Solution.ExtraLossCoefficient(i) })] };
    }

    /// <summary>Runs a solve of which a design as such is not refused; where it has no solution, the reason is told instead.</summary>
    internal static T Or<T>(Func<T> solve, Func<string, T> because)
    {
        try
        {
            return solve();
        }
        catch (Exception e) when (e is NotConvergedException or CircuitException)
        {
            return because(e.Message);
        }
    }

    private static IEnumerable<NoteResult> Notes(ResolvedDesign design, IReadOnlyList<FluxPointResult> curve)
    {
        var voltages = VoltageSweep.Held(design);
        if (voltages < VoltageSweep.Levels.Count || curve.Count < FluxSweep.Levels.Count)
        {
            yield return new NoteResult("curveEnd", string.Create(
                CultureInfo.InvariantCulture,
                $"The curves end at {VoltageSweep.Levels[Math.Max(0, voltages - 1)]} % voltage and {FluxSweep.Levels[Math.Max(0, curve.Count - 1)]} % volts per hertz: beyond, the limbs would have to carry more than {EstimateDesign.Highest_T} T, where no law holds."));
        }

        yield return new NoteResult("protection", Caution);
    }
}
