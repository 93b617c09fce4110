using CoreDesign.Estimating.Contracts;
using CoreDesign.Sheets.Pdf;
using static CoreDesign.Sheets.Figures;

namespace CoreDesign.Sheets.Design;

/// <summary>What the figures rest on, warnings, sources, and the cautions that go with every design sheet.</summary>
internal static class RestBlocks
{
    private const string Representative = "Representative curve; replace by your certificate before you quote.";

    /// <summary>Stands before any figure where the steel's curves are not the works' own; empty otherwise.</summary>
    public static IEnumerable<Block> Standing(EstimateResult e)
    {
        if (e.Steel.Standing == "representative" || e.Steel.StandingText.Length > 0)
        {
            var text = e.Steel.StandingText.Length > 0 ? e.Steel.StandingText : Representative;
            yield return new Paragraph($"{e.Steel.Grade}: {text}", TypeScale.Alarm, true, 3);
        }
    }

    public static IEnumerable<Block> All(SheetRequest request)
    {
        var e = request.Study.Estimate;
        yield return new Heading("What the figures rest on");
        yield return new Notes([.. Rests(e)]);
        if (request.Note is { Length: > 0 } note)
        {
            yield return new Heading("Note to this revision");
            yield return new Paragraph(note, TypeScale.Body);
        }

        yield return new Heading("Warnings");
        yield return e.Warnings.Count == 0
            ? new Paragraph("None.", TypeScale.Body)
            : new Notes([.. e.Warnings.Select(w => w.Text)]);

        yield return new Heading("Sources");
        yield return new Table(
            [new Column("Key", false), new Column("Source", false, true), new Column("standing", false)],
            [.. e.Sources.Select(s => new Row(s.Key, s.Text, s.Standing))]);

        yield return new Heading("Before use");
        yield return new Notes(
        [
            "The figures are a prediction from the inputs and data named on these sheets, not a guarantee and not a test result.",
            "An open-circuit test energises the windings at dangerous voltages: it is for qualified staff only, under the local safety code.",
            "Masses are net steel, without clamps, insulation, windings or lifting gear; rigging and lifting are planned by a licensed practice.",
            "A licensed engineer checks the design before it is released for manufacture; an independent check of the order's data is part of it.",
        ],
        Together: true);
    }

    private static IEnumerable<string> Rests(EstimateResult e)
    {
        yield return $"Steel: {e.Steel.Grade}, {With(Plain(e.Steel.Thickness_mm), "mm")}, {With(Plain(e.Steel.Density_kg_m3, 0), "kg/m³")}, saturation polarization {With(Fixed(e.Steel.SaturationPolarization_T, 2), "T")}; "
            + $"data {StandingName(e.Steel.Standing)}, steel data revision {e.SteelDataRevision}. {e.Steel.StandingText}".TrimEnd();
        yield return $"Margin to saturation: {e.Margin.Definition}; worst in {Words.Part(e.Margin.WorstPart)}, {With(Fixed(e.Margin.PeakAtRated_T, 3), "T")} at rated and {With(Fixed(e.Margin.PeakAtHighest_T, 3), "T")} at highest voltage.";
        yield return e.Joint.EffectiveGapUsed
            ? $"Joint: an effective gap of {SummaryTables.Value(e.Inputs.Joint?.EffectiveGap_mm, "mm")} at each joint, given by the works, in place of the joint model."
            : $"Joint: {Words.Joint(e.Inputs.Joint)}, {Plain(e.Joint.SheetsPerPosition)} to a position, gap {SummaryTables.Value(e.Inputs.Joint?.Gap_mm, "mm")}, interface {SummaryTables.Value(e.Inputs.Joint?.Interface_um, "µm")}; solved sheet by sheet.";
        yield return e.Model.BuildingFactorSource;
        yield return $"Energy balance of the solution: {With(Significant(100 * e.EnergyBalance.RelativeError, 2), "%")} between terminals and material. Steel at {With(Plain(e.Model.Temperature_C, 1), "°C")}.";
        yield return $"Kernel {e.KernelVersion}, steel data {e.SteelDataRevision}.";
        yield return "Values in italics were left open and derived or taken by default; dimensions in brackets follow from the others and are not to be gauged.";
    }

    private static string StandingName(string standing) => standing switch
    {
        "certificate" => "from a certificate",
        "given" => "given with the design",
        _ => standing,
    };
}
