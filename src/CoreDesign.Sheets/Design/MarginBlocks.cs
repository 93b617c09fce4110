using CoreDesign.Estimating.Contracts;
using CoreDesign.Sheets.Charts;
using CoreDesign.Sheets.Pdf;
using static CoreDesign.Sheets.Figures;

namespace CoreDesign.Sheets.Design;

/// <summary>The margins to saturation on paper: figures, curves and definitions; nothing for a study from before there were any.</summary>
internal static class MarginBlocks
{
    public static IEnumerable<Block> All(Study study)
    {
        if (study.Margins is not { } m)
        {
            yield break;
        }

        var e = study.Estimate;
        yield return new Columns(
            [new Heading("Margins to saturation"), Rows(e, m)],
            study.VoltageCurve.Count > 1 ? [new Heading("Peak flux density"), EvidenceBlocks.Figure(MarginCharts.PeakFluxDensity(e, study.VoltageCurve, m, EvidenceBlocks.Half))] : []);
        List<Block> left = m.FluxCurve.Count > 1 ? [new Heading("Loss and current against volts per hertz"), EvidenceBlocks.Figure(VoltageChart.OfVoltsPerHertz(e, m, EvidenceBlocks.Half))] : [];
        List<Block> right = m.Inrush.Peak_A is null ? [] : [new Heading("Inrush"), EvidenceBlocks.Figure(MarginCharts.Inrush(m.Inrush, EvidenceBlocks.Half))];
        if (left.Count + right.Count > 0)
        {
            yield return new Columns([.. left], [.. right]);
        }

        if (m.DcBias is { Lines.Count: > 0 } bias)
        {
            yield return new Columns([new Heading("Current with direct current"), EvidenceBlocks.Figure(MarginCharts.DcBias(e, bias, EvidenceBlocks.Half))], [new Heading("Direct current in each phase"), Bias(e, bias)]);
        }

        yield return new Heading("How the margins are defined");
        yield return new Notes([.. Definitions(m)]);
    }

    private static Table Rows(EstimateResult e, MarginsResult m)
    {
        var order = e.Inputs.Order;
        var inrush = e.Inputs.Margins?.Inrush;
        var lowest = e.Margin.LowestFrequency_Hz is { } f ? ", " + With(Plain(f, 2), "Hz") : "";
        return Table.KeyValues(
            ("At rated voltage", $"{With(Fixed(e.Margin.AtRated_percent, 1), "%")}, {With(Fixed(e.Margin.PeakAtRated_T, 3), "T")}", true, false),
            ($"At {SummaryTables.Value(order?.HighestVoltage_percent, "%")}{lowest}", $"{With(Fixed(e.Margin.AtHighest_percent, 1), "%")}, {With(Fixed(e.Margin.PeakAtHighest_T, 3), "T")}", true, false),
            ("Saturation polarization", With(Fixed(e.Margin.SaturationPolarization_T, 3), "T"), false, false),
            ($"Voltage for {Plain(m.OverVoltage.CurrentMultiple, 2)} times the current", m.OverVoltage.Voltage_percent is { } v ? With(Fixed(v, 1), "%") : "not reached", true, false),
            ("First inrush peak, solved", Amperes(m.Inrush.Peak_A), true, false),
            ("times the peak of rated current", m.Inrush.PeakOverRated is { } n ? Fixed(n, 1) : Nothing, false, false),
            ("closed formula, no resistance", Amperes(m.Inrush.FormulaLossless_A), false, false),
            ("closed formula, with resistance", Amperes(m.Inrush.FormulaWithResistance_A), false, false),
            ("Residual flux; switching angle", $"{SummaryTables.Value(inrush?.Residual_percent, "%")}; {SummaryTables.Value(inrush?.SwitchingAngle_deg, "°")}", false, Derived(e, "residual_percent")),
            ("Air-core inductance", With(Significant(inrush?.AirCoreInductance_mH ?? double.NaN, 3), "mH"), false, Derived(e, "airCoreInductance_mH")),
            ("Source inductance", SummaryTables.Value(inrush?.SourceInductance_mH, "mH"), false, Derived(e, "sourceInductance_mH")),
            ("Resistance, winding and source", SummaryTables.Value(inrush?.Resistance_ohm, "ohm"), false, Derived(e, "resistance_ohm")));
    }

    private static Table Bias(EstimateResult e, DcBiasResult d) => Table.KeyValues(
        ("Direct current", With(Plain(d.Bias_A), "A"), false, false),
        ("Margin", With(Fixed(d.Margin_percent ?? double.NaN, 1), "%"), true, false),
        ("Highest peak flux density", With(Fixed(d.PeakFluxDensity_T ?? double.NaN, 3), "T"), false, false),
        ("Mean flux density of a limb", With(Fixed(d.Offset_T ?? double.NaN, 3), "T"), false, false),
        ("Loss, and its change", $"{With(Significant(d.NoLoadLoss_W ?? double.NaN, 4), "W")}, {With(Change((d.NoLoadLoss_W ?? double.NaN) - e.NoLoadLoss_W, 1), "W")}", false, false),
        ("Current, rms with the direct part", With(Significant(d.NoLoadCurrent_percent ?? double.NaN, 3), "%"), false, false),
        ($"2nd and 4th harmonic, {d.Lines[0].Phase}", $"{With(Significant(d.Lines[0].Harmonics[1].Rms_A, 3), "A")}, {With(Significant(d.Lines[0].Harmonics[3].Rms_A, 3), "A")}", false, false));

    private static IEnumerable<string> Definitions(MarginsResult m)
    {
        yield return $"Over-voltage: {m.OverVoltage.Definition} {m.OverVoltage.Reason}".TrimEnd();
        yield return $"Volts per hertz: {m.FluxCurveDefinition}";
        yield return $"Inrush: {m.Inrush.Definition} {m.Inrush.Assumptions} {m.Inrush.Reason}".TrimEnd();
        yield return $"Closed formula: {m.Inrush.FormulaText}";
        if (m.DcBias is { } bias)
        {
            yield return $"Direct current of {With(Plain(bias.Bias_A), "A")}: {bias.Definition} {bias.Reason}".TrimEnd();
        }

        foreach (var note in m.Notes)
        {
            yield return note.Text;
        }
    }

    private static string Amperes(double? value) => value is { } a ? With(Significant(a, 4), "A") : Nothing;

    private static bool Derived(EstimateResult e, string name) => e.Derived.Contains("margins.inrush." + name);
}
