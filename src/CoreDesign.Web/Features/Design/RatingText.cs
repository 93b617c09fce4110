using CoreDesign.Estimating.Contracts;
using CoreDesign.Sheets;

namespace CoreDesign.Web.Features.Design;

/// <summary>The rating in one line, as far as it is known: 1000 kVA, 20/0.4 kV, 50 Hz.</summary>
public static class RatingText
{
    public static string Of(DesignInput design)
    {
        var order = design.Order;
        string?[] parts =
        [
            order?.RatedPower_kVA is { } power ? power >= 10_000 ? $"{Figures.Plain(power / 1000)} MVA" : $"{Plain(power)} kVA" : null,
            order?.RatedVoltages_kV is { Count: > 0 } voltages ? $"{string.Join('/', voltages.Select(Plain))} kV" : null,
            order?.Frequency_Hz is { } frequency ? $"{Plain(frequency)} Hz" : null,
        ];
        return string.Join(", ", parts.OfType<string>());
    }

    private static string Plain(double value) => value.ToString("0.###", System.Globalization.CultureInfo.InvariantCulture);
}
