using System.Globalization;
using CoreDesign.Estimating.Contracts;

namespace CoreDesign.Estimating.Circuits;

/// <summary>Checks of single values of a circuit case, and what they found.</summary>
internal sealed class CircuitFindings
{
    private const int LongestName = 100;
    private readonly List<FieldError> _errors = [];

    public IReadOnlyList<FieldError> Errors => _errors;

    public void Say(string path, string message) => _errors.Add(new FieldError(path, message));

    /// <summary>A name that must be there, of characters that can be seen: it is shown in tables and charts.</summary>
    public string Text(string path, string? value)
    {
        if (string.IsNullOrWhiteSpace(value) || value.Length > LongestName)
        {
            Say(path, string.IsNullOrWhiteSpace(value) ? "The name is missing. Give one." : $"The name has {value.Length} characters; at most {LongestName}. Shorten it.");
            return value ?? "";
        }

        Plain(path, value);
        return value;
    }

    public void Plain(string path, string name)
    {
        if (!PlainText.Is(name))
        {
            Say(path, "The name holds control or invisible characters. Type it again as plain text.");
        }
    }

    /// <summary>A value that must be there and within the limits, which count as within.</summary>
    public double Within(string path, double? value, double min, double max)
    {
        if (value is not { } v)
        {
            Say(path, string.Create(CultureInfo.InvariantCulture, $"The value is missing. Give a number from {min} to {max}."));
            return min;
        }

        if (!double.IsFinite(v) || v < min || v > max)
        {
            Say(path, string.Create(CultureInfo.InvariantCulture, $"{v} is outside {min} to {max}. Give a value within the range."));
        }

        return v;
    }

    /// <summary>A text of the sender's as a message shows it.</summary>
    public static string Shown(string? text) => text is null or { Length: <= 40 } ? $"'{text}'" : $"'{text[..40]}…'";
}
