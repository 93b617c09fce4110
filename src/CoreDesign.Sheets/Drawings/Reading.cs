using CoreDesign.Estimating.Contracts;
using CoreDesign.Sheets.Charts;

namespace CoreDesign.Sheets.Drawings;

/// <summary>What the parts of the drawing are coloured by, one at a time.</summary>
public enum Reading
{
    FluxDensity,
    LossDensity,
    ExcitingPower,
    Margin,
}

/// <summary>The span of a reading and where a value lies on the ramp: 1 is dark, nearer the limit.</summary>
public sealed record ReadingSpan(NiceTicks Ticks, bool LowIsDark)
{
    public double Place(double value)
    {
        var place = Math.Clamp((value - Ticks.Low) / (Ticks.High - Ticks.Low), 0, 1);
        return LowIsDark ? 1 - place : place;
    }
}

/// <summary>Names, units, values and spans of the readings.</summary>
public static class Readings
{
    public static string Name(Reading reading) => reading switch
    {
        Reading.FluxDensity => "Peak flux density",
        Reading.LossDensity => "Loss density",
        Reading.ExcitingPower => "Exciting power",
        Reading.Margin => "Margin to saturation",
        _ => throw new ArgumentOutOfRangeException(nameof(reading), reading, "No such reading."),
    };

    public static string Unit(Reading reading) => reading switch
    {
        Reading.FluxDensity => "T",
        Reading.LossDensity => "W/kg",
        Reading.ExcitingPower => "VA/kg",
        Reading.Margin => "%",
        _ => throw new ArgumentOutOfRangeException(nameof(reading), reading, "No such reading."),
    };

    /// <summary>The figure of one part; null where the part has no mass to refer to or the value isn't finite.</summary>
    public static double? Value(EstimateResult result, PartResult part, Reading reading)
    {
        ArgumentNullException.ThrowIfNull(result);
        ArgumentNullException.ThrowIfNull(part);
        var mass = part.Mass_kg * Math.Max(part.Count, 1);
        var saturation = result.Margin.SaturationPolarization_T;
        var value = reading switch
        {
            Reading.FluxDensity => part.PeakFluxDensity_T,
            Reading.LossDensity => part.Loss_W / mass,
            Reading.ExcitingPower => part.ExcitingPower_VA / mass,
            Reading.Margin => 100 * (saturation - part.PeakFluxDensity_T) / saturation,
            _ => throw new ArgumentOutOfRangeException(nameof(reading), reading, "No such reading."),
        };
        return double.IsFinite(value) ? value : null;
    }

    public static string Figure(double value, Reading reading) => reading switch
    {
        Reading.Margin => Figures.Fixed(value, 1),
        _ => Math.Abs(value) < 10 ? Figures.Fixed(value, 2) : Figures.Significant(value, 3),
    };

    /// <summary>
    /// Flux density spans at least 1.3 to 1.8 T and margin at least 0 to 30 %, so that a colour means the same from one design to the
    /// next; the two others open around the values, because no common limit exists for them.
    /// </summary>
    public static ReadingSpan Span(EstimateResult result, Reading reading)
    {
        ArgumentNullException.ThrowIfNull(result);
        var values = result.Parts.Where(p => p.Kind != "joint").Select(p => Value(result, p, reading)).OfType<double>().DefaultIfEmpty(1).ToArray();
        double low = values.Min(), high = values.Max();
        return reading switch
        {
            Reading.FluxDensity => new(NiceTicks.Around(Math.Min(1.3, low), Math.Max(1.8, high), 5), false),
            Reading.Margin => new(NiceTicks.Around(Math.Min(0, low), Math.Max(30, high), 5), true),
            _ => new(NiceTicks.Around(low, Math.Max(high, low * 1.2), 4), false),
        };
    }
}
