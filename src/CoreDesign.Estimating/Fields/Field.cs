using System.Globalization;

namespace CoreDesign.Estimating.Fields;

/// <summary>
/// What is known of one input field. The form, the messages, the API description and the rows of a sheet all read it,
/// so that they can't disagree. Limits are inclusive, in the field's own unit.
/// </summary>
public sealed record Field(string Path, string Label, string Symbol, string Unit, double Min, double Max, string Why, string Help)
{
    /// <summary>True for a whole number.</summary>
    public bool Whole { get; init; }

    /// <summary>Allowed range in words, with the unit.</summary>
    public string Range => string.Create(CultureInfo.InvariantCulture, $"{Min} to {Max}{(Unit.Length == 0 ? "" : " " + Unit)}");

    /// <summary>Message for a value, or null where it is fine.</summary>
    public string? Check(double value)
    {
        if (!double.IsFinite(value))
        {
            return $"{Label} is not a finite number. Enter {Range}.";
        }

        if (value < Min || value > Max)
        {
            return string.Create(CultureInfo.InvariantCulture, $"{Label} {value}{(Unit.Length == 0 ? "" : " " + Unit)} is outside {Range} ({Why}). Enter a value within the range.");
        }

        if (Whole && Math.Floor(value) != value)
        {
            return string.Create(CultureInfo.InvariantCulture, $"{Label} {value} is not a whole number. Enter a whole number, {Range}.");
        }

        return null;
    }

    /// <summary>Message for a field that is missing.</summary>
    public string Missing() => $"{Label} is missing. Enter {Range}.";
}
