using CoreDesign.Estimating.Contracts;
using CoreDesign.Sheets;

namespace CoreDesign.Web.Features.Design;

/// <summary>One line of the margins: what it is, its figure, what stands beside it, its definition; a line without a figure says why.</summary>
public sealed record MarginLine(string Name, string Figure, string Beside, string Definition)
{
    /// <summary>True for what is solved after the estimate.</summary>
    public bool Later { get; init; }
}

/// <summary>The margins to saturation in words and figures, the estimate's two first.</summary>
public static class MarginFigures
{
    public static IReadOnlyList<MarginLine> Of(EstimateResult e, MarginsResult? m)
    {
        ArgumentNullException.ThrowIfNull(e);
        List<MarginLine> lines =
        [
            new("At rated voltage", $"{Figures.Fixed(e.Margin.AtRated_percent, 1)} %", $"{Figures.Fixed(e.Margin.PeakAtRated_T, 3)} T in {PartGroups.NameOf(e.Margin.WorstPart)}", e.Margin.Definition),
            new(AtExtreme(e), $"{Figures.Fixed(e.Margin.AtHighest_percent, 1)} %", $"{Figures.Fixed(e.Margin.PeakAtHighest_T, 3)} T of {Figures.Fixed(e.Margin.SaturationPolarization_T, 3)} T at core temperature", e.Margin.Definition),
        ];
        if (m is null)
        {
            return lines;
        }

        IEnumerable<MarginLine> later = [OverVoltage(m.OverVoltage), .. Inrush(m.Inrush), .. m.DcBias is { } bias ? DcBias(e, bias) : []];
        return [.. lines, .. later.Select(l => l with { Later = true })];
    }

    private static string AtExtreme(EstimateResult e)
    {
        var order = e.Inputs.Order;
        var low = e.Margin.LowestFrequency_Hz is { } f && order?.Frequency_Hz is { } rated && f < rated ? $" and {Figures.Plain(f, 2)} Hz" : "";
        return $"At {Figures.Plain(order?.HighestVoltage_percent ?? 100, 1)} % voltage{low}";
    }

    private static MarginLine OverVoltage(OverVoltageResult r) => new(
        $"Current {Figures.Plain(r.CurrentMultiple, 2)} times that at rated",
        r.Voltage_percent is { } v ? $"{Figures.Fixed(v, 1)} %" : Figures.Nothing,
        r.Voltage_percent is null ? r.Reason ?? "" : $"of rated voltage, {Figures.Fixed(r.PeakFluxDensity_T ?? double.NaN, 3)} T",
        r.Definition);

    private static IEnumerable<MarginLine> Inrush(InrushResult r)
    {
        yield return new(
            "First inrush peak, solved",
            r.Peak_A is { } peak ? $"{Figures.Significant(peak, 3)} A" : Figures.Nothing,
            r.Peak_A is null ? r.Reason ?? "" : $"{Figures.Fixed(r.PeakOverRated ?? double.NaN, 1)} times the rated peak, line {r.PeakLine} after {Figures.Fixed(r.PeakTime_ms ?? double.NaN, 1)} ms",
            $"{r.Definition} {r.Assumptions}");
        if (r.FormulaLossless_A is { } plain)
        {
            yield return new(
                "by closed formula",
                $"{Figures.Significant(plain, 3)} A",
                r.FormulaWithResistance_A is { } damped && Math.Abs(damped - plain) > 0.002 * plain ? $"{Figures.Significant(damped, 3)} A with the resistance" : "first phase alone",
                r.FormulaText);
        }
    }

    private static IEnumerable<MarginLine> DcBias(EstimateResult e, DcBiasResult d)
    {
        yield return new(
            $"With {Figures.Plain(d.Bias_A)} A direct",
            d.Margin_percent is { } margin ? $"{Figures.Fixed(margin, 1)} %" : Figures.Nothing,
            d.Margin_percent is null ? d.Reason ?? "" : $"{Figures.Fixed(d.PeakFluxDensity_T ?? double.NaN, 3)} T in {PartGroups.NameOf(d.WorstPart!)}, mean {Figures.Fixed(d.Offset_T ?? double.NaN, 3)} T",
            d.Definition);
        if (d is { NoLoadLoss_W: { } loss, NoLoadCurrent_percent: { } current, Lines: [var line, ..] })
        {
            yield return new(
                "loss and current then",
                $"{Figures.Significant(loss, 3)} W",
                $"{Figures.Change(loss - e.NoLoadLoss_W, e.NoLoadLoss_W < 100 ? 1 : 0)} W; {Figures.Significant(current, 3)} % rms; 2nd harmonic {Figures.Significant(line.Harmonics[1].Rms_A, 2)} A, 4th {Figures.Significant(line.Harmonics[3].Rms_A, 2)} A",
                d.Definition);
        }
    }
}
