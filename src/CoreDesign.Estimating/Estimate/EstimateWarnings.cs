using System.Globalization;
using CoreDesign.Estimating.Contracts;
using CoreDesign.Magnetics.Cores;

namespace CoreDesign.Estimating.Estimate;

/// <summary>What a reader of the figures must know: where a law was used beyond its data, and limits that are passed.</summary>
internal static class EstimateWarnings
{
    private const double LowLimb_T = 1.0;

    public static IEnumerable<NoteResult> Of(CoreAtWork core, CoreSolution atRated, CoreSolution atHighest)
    {
        var sheet = core.Sheet.Sheet;
        var (part, rated) = PartShape.Worst(atRated);
        var (_, highest) = PartShape.Worst(atHighest);
        if (core.Design.Steel.StandingText.Length > 0)
        {
            yield return new NoteResult("steelStanding", core.Design.Steel.StandingText);
        }

        if (sheet.FrequencyExtrapolated)
        {
            yield return new NoteResult("frequency", Text($"Loss data of {core.Design.Steel.Name} do not reach {core.Design.Supply.Frequency_Hz} Hz; the law fitted at {sheet.Frequency_Hz} Hz is carried there by its own eddy and excess terms."));
        }

        if (rated > sheet.HighestFluxDensity_T)
        {
            yield return new NoteResult("lossRange", Text($"Peak flux density {rated:0.000} T in {part} lies beyond the loss data, which end at {sheet.HighestFluxDensity_T:0.00} T; loss is extrapolated."));
        }

        if (highest >= core.Sheet.SaturationPolarization_T)
        {
            yield return new NoteResult("saturation", Text($"At {core.Design.HighestVoltage_percent} % voltage{AtLowest(core.Design)} the core would be saturated: {highest:0.000} T against a saturation polarization of {core.Sheet.SaturationPolarization_T:0.000} T."));
        }

        if (rated < LowLimb_T)
        {
            yield return new NoteResult("lowFlux", Text($"Peak flux density is only {rated:0.000} T; the core is larger than its flux needs. Check turns and section."));
        }

        if (core.Joint?.Curve is { } joint && highest > joint.LastFluxDensity_T)
        {
            yield return new NoteResult("jointRange", Text($"Beyond {joint.LastFluxDensity_T:0.00} T the joint curve goes on straight."));
        }

        foreach (var note in ConnectionNotes.Of(core.Design, atRated))
        {
            yield return note;
        }

        if (core.Joint is null)
        {
            yield return new NoteResult("effectiveGap", Text($"The works' effective gap of {1000 * core.Design.EffectiveGap_m} mm replaces the joint model."));
        }
    }

    private static string AtLowest(ResolvedDesign design) =>
        design.LowestFrequency_Hz < design.Supply.Frequency_Hz ? Text($" and {design.LowestFrequency_Hz} Hz") : "";

    private static string Text(FormattableString text) => text.ToString(CultureInfo.InvariantCulture);
}
