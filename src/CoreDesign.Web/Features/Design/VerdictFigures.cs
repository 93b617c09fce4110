using CoreDesign.Estimating.Contracts;
using CoreDesign.Sheets;

namespace CoreDesign.Web.Features.Design;

/// <summary>One line of the verdict in words and figures. Fill and mark are places 0..1 on its bar.</summary>
public sealed record VerdictLine(string Name, string Figure, string Unit, string? Change, double Fill, double? Mark, string Asked, string Standing, bool Bad);

/// <summary>What the verdict says of an estimate, against what was asked for and against the last saved revision.</summary>
public sealed record VerdictFigures(VerdictLine Loss, VerdictLine Current, VerdictLine AtRated, VerdictLine AtHighest, VerdictLine Mass)
{
    /// <summary>Place of the asked-for mark on its bar, unless the value itself needs the room.</summary>
    private const double MarkPlace = 0.77;

    /// <summary>Full length of a margin bar in per cent.</summary>
    private const double WidestMargin = 30;

    public static VerdictFigures Of(EstimateResult now, EstimateResult? saved)
    {
        var order = now.Inputs.Order;
        var highest = order?.HighestVoltage_percent ?? 100;
        var decimals = now.NoLoadCurrent_percent < 0.1 ? 3 : 2;
        return new(
            Limited("No-load loss", now.NoLoadLoss_W, saved?.NoLoadLoss_W, order?.AskedNoLoadLoss_W, "W", now.NoLoadLoss_W < 100 ? 1 : 0, "W"),
            Limited("No-load current", now.NoLoadCurrent_percent, saved?.NoLoadCurrent_percent, order?.AskedNoLoadCurrent_percent, "%", decimals, "points"),
            Margin("at 100 %", now.Margin.AtRated_percent, saved?.Margin.AtRated_percent, now.Margin.PeakAtRated_T),
            Margin($"at {Figures.Plain(highest, 1)} %{AtLowest(now)}", now.Margin.AtHighest_percent, saved?.Margin.AtHighest_percent, now.Margin.PeakAtHighest_T),
            new("Core mass", Figures.Fixed(now.Mass_kg.Total, now.Mass_kg.Total < 100 ? 1 : 0), "kg", Change(now.Mass_kg.Total, saved?.Mass_kg.Total, now.Mass_kg.Total < 100 ? 1 : 0, "kg"), 0, null, "", "", false));
    }

    /// <summary>The verdict in one sentence, for who listens.</summary>
    public string Spoken =>
        $"No-load loss {Loss.Figure} {Loss.Unit}, {Loss.Standing}. No-load current {Current.Figure} per cent, {Current.Standing}. "
        + $"Margin to saturation {AtRated.Figure} per cent {AtRated.Name}, {AtHighest.Figure} per cent {AtHighest.Name}. Core mass {Mass.Figure} kilograms.";

    private static string AtLowest(EstimateResult now) =>
        now.Margin.LowestFrequency_Hz is { } low && now.Inputs.Order?.Frequency_Hz is { } rated && low < rated ? $", {Figures.Plain(low, 2)} Hz" : "";

    private static VerdictLine Limited(string name, double value, double? saved, double? asked, string unit, int decimals, string changeUnit)
    {
        var figure = Figures.Fixed(value, decimals);
        var change = Change(value, saved, decimals, changeUnit);
        if (asked is not { } limit)
        {
            return new(name, figure, unit, change, 0, null, "no limit asked", "", false);
        }

        var scale = Math.Max(limit / MarkPlace, value * 1.02);
        var spare = limit - value;
        var over = spare < 0;
        var distance = Figures.Fixed(Math.Abs(spare), decimals);
        return new(name, figure, unit, change, value / scale, limit / scale, $"asked for {Figures.Plain(limit, 4)}", $"{distance} {changeUnit} {(over ? "over" : "to spare")}", over);
    }

    private static VerdictLine Margin(string name, double value, double? saved, double peak) =>
        new(name, Figures.Fixed(value, 1), "%", Change(value, saved, 1, "points"), Math.Clamp(value / WidestMargin, 0, 1), null,
            $"{name["at ".Length..]}: {Figures.Fixed(peak, 2)} T", value <= 0 ? "saturated" : "", value <= 0);

    private static string? Change(double value, double? saved, int decimals, string unit) =>
        saved is { } before ? $"{Figures.Change(value - before, decimals)} {unit}" : null;
}
