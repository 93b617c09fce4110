namespace CoreDesign.Estimating.Steels.Checks;

/// <summary>One thing found: where, the value as received (null where it is missing), and the rule with its mend.</summary>
internal sealed record Finding(Spot Spot, string? Value, string Rule)
{
    private const int LongestShown = 40;

    /// <summary>The value, cut to a printable length, control characters made visible.</summary>
    public string? ShownValue => Value is null ? null : Shown(Value);

    public static string Shown(string value)
    {
        var cut = value.Length > LongestShown ? string.Concat(value.AsSpan(0, LongestShown), "…") : value;
        return string.Concat(cut.Select(c => char.IsControl(c) ? '·' : c));
    }
}

/// <summary>Collects errors and warnings; keeps the first fifty of each and counts the rest, so that a hostile file stays cheap.</summary>
internal sealed class Findings
{
    public const int Kept = 50;
    private readonly List<Finding> _errors = [];
    private readonly List<Finding> _warnings = [];

    public IReadOnlyList<Finding> Errors => _errors;

    public IReadOnlyList<Finding> Warnings => _warnings;

    public int ErrorCount { get; private set; }

    public int WarningCount { get; private set; }

    public void Error(Entry entry, string rule) => Error(entry.Spot, entry.Text, rule);

    public void Error(Spot spot, string? value, string rule)
    {
        ErrorCount++;
        if (_errors.Count < Kept)
        {
            _errors.Add(new Finding(spot, value, rule));
        }
    }

    public void Warning(Entry entry, string rule) => Warning(entry.Spot, entry.Text, rule);

    public void Warning(Spot spot, string? value, string rule)
    {
        WarningCount++;
        if (_warnings.Count < Kept)
        {
            _warnings.Add(new Finding(spot, value, rule));
        }
    }
}
