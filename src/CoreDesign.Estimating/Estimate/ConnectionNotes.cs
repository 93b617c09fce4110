using System.Globalization;
using CoreDesign.Estimating.Contracts;
using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Cores;
using CoreDesign.Magnetics.Geometry;

namespace CoreDesign.Estimating.Estimate;

/// <summary>What the connection of the windings brings with it.</summary>
internal static class ConnectionNotes
{
    public static IEnumerable<NoteResult> Of(ResolvedDesign design, CoreSolution atRated)
    {
        var star = design.Supply.Connection == SupplyConnection.StarIsolated;
        var form = design.Geometry.Form;
        if (star && design.Tertiary is null && CoreForms.HasAirPath(form))
        {
            var range = form == CoreForm.ThreeLimb ? "0.4 to 1.5 is published for three-limb cores" : "no published range for five-limb cores; most of the zero-sequence flux returns through the return limbs";
            yield return new NoteResult("zeroSequence", Text($"Isolated star: the zero-sequence path through air and tank is taken as {design.ZeroSequenceReactance_pu} of rated impedance ({range})."));
        }

        if (star && design.Tertiary is null && form != CoreForm.ThreeLimb && SideShape.Neutral(design, atRated.Solution) is { } neutral)
        {
            var core = design.Units == 3 ? "a bank of single-phase units" : "a five-limb core";
            yield return new NoteResult("neutral", Text($"Isolated star without a delta on {core}: the star point oscillates against the supply's neutral by {neutral.Rms_percent:0.#} % of phase voltage (third harmonic {neutral.ThirdHarmonic_percent:0.#} %). Give it an earthed neutral or a closed delta."));
        }

        if (design.Tertiary is { } delta)
        {
            var noResistance = design.Excited.Resistance_ohm == 0 && delta.Resistance_ohm == 0;
            if (noResistance && design.Supply.Connection == SupplyConnection.StarWithNeutral)
            {
                yield return new NoteResult("tertiary", "Earthed neutral and closed delta without resistance are two paths without impedance for the equal part of the phases' ampere-turns; the delta is taken to carry it all. Give resistances to let them part it.");
            }

            if (noResistance && design.Supply.Connection == SupplyConnection.Delta)
            {
                yield return new NoteResult("tertiary", "Excited delta and closed delta without resistance are two paths without impedance for the equal part of the phases' ampere-turns; the excited delta is taken to carry it all. Give resistances to let them part it.");
            }
        }

        if (design.Capacitance is not null)
        {
            yield return new NoteResult("capacitance", Text($"The lines carry the leading current of the high-voltage winding's capacitance, {CoreLines.Power_var(design) / 1000:0.###} kvar at rated voltage."));
        }
    }

    private static string Text(FormattableString text) => text.ToString(CultureInfo.InvariantCulture);
}
