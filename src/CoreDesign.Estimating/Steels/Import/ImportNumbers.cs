using System.Globalization;
using System.Text.RegularExpressions;
using CoreDesign.Estimating.Steels.Checks;

namespace CoreDesign.Estimating.Steels.Import;

/// <summary>
/// Numbers of one file. Decimal point or comma, but one of them throughout: "1,234" alone could be either a thousand or a bit more
/// than one, so the other numbers of the file decide, and where they don't it is refused.
/// </summary>
internal sealed partial class ImportNumbers
{
    private readonly bool _commaSeen;
    private readonly bool _pointSeen;

    public ImportNumbers(IEnumerable<string> cells)
    {
        foreach (var cell in cells)
        {
            if (cell.Count(c => c is ',' or '.') == 1 && !LooksLikeThousands().IsMatch(cell) && PlainNumber().IsMatch(cell))
            {
                _commaSeen |= cell.Contains(',', StringComparison.Ordinal);
                _pointSeen |= cell.Contains('.', StringComparison.Ordinal);
            }
        }
    }

    public string DecimalMark => (_commaSeen, _pointSeen) switch
    {
        (true, false) => "decimal comma",
        (true, true) => "mixed decimal marks",
        _ => "decimal point",
    };

    /// <summary>The number, or null with an error.</summary>
    public Entry? Read(string cell, Spot spot, Findings findings)
    {
        if (Rule(cell) is { } rule)
        {
            findings.Error(spot, cell, rule);
            return null;
        }

        var value = double.Parse(cell.Replace(',', '.'), NumberStyles.Float, CultureInfo.InvariantCulture);
        if (!double.IsFinite(value))
        {
            findings.Error(spot, cell, "is too large for a number; check the exponent.");
            return null;
        }

        return new Entry(value, cell, spot);
    }

    private string? Rule(string cell)
    {
        if (cell.Length == 0)
        {
            return "is empty; give the number or leave the whole row out.";
        }

        if (NotFinite().IsMatch(cell))
        {
            return "is not a finite number; leave the row out where nothing was measured.";
        }

        var marks = cell.Count(c => c is ',' or '.');
        if (marks > 1 && Grouped().IsMatch(cell))
        {
            return "has more than one point or comma; write it without thousands marks.";
        }

        if (!PlainNumber().IsMatch(cell))
        {
            return "is not a number; write digits with a decimal point or comma, no unit and no thousands marks.";
        }

        var thousands = marks == 1 && LooksLikeThousands().IsMatch(cell);
        if (cell.Contains(',', StringComparison.Ordinal))
        {
            if (_pointSeen)
            {
                return _commaSeen && !thousands
                    ? "has a decimal comma, other numbers of the file a decimal point; use one of them throughout."
                    : "has a comma, the rest of the file decimal points; write it without thousands marks, or with the same decimal mark as the rest.";
            }

            return thousands && !_commaSeen
                ? "can be read as a thousand or as a decimal comma, and no other number of the file tells which; write it with a decimal point, or without thousands marks."
                : null;
        }

        return thousands && _commaSeen && !_pointSeen && cell.Contains('.', StringComparison.Ordinal)
            ? "has a point, the rest of the file decimal commas; write it without thousands marks, or with the same decimal mark as the rest."
            : null;
    }

    [GeneratedRegex(@"^[+-]?(\d+([.,]\d*)?|[.,]\d+)([eE][+-]?\d{1,4})?$", RegexOptions.CultureInvariant | RegexOptions.ExplicitCapture | RegexOptions.NonBacktracking)]
    private static partial Regex PlainNumber();

    [GeneratedRegex(@"^[+-]?[1-9]\d{0,2}[.,]\d{3}$", RegexOptions.CultureInvariant | RegexOptions.ExplicitCapture | RegexOptions.NonBacktracking)]
    private static partial Regex LooksLikeThousands();

    [GeneratedRegex(@"^[+-]?[\d.,]+$", RegexOptions.CultureInvariant | RegexOptions.ExplicitCapture | RegexOptions.NonBacktracking)]
    private static partial Regex Grouped();

    [GeneratedRegex(@"^[+-]?(nan|inf|infinity|∞|#.*|n/?a)$", RegexOptions.CultureInvariant | RegexOptions.ExplicitCapture | RegexOptions.IgnoreCase | RegexOptions.NonBacktracking)]
    private static partial Regex NotFinite();
}
