using System.Globalization;

namespace CoreDesign.Sheets;

/// <summary>
/// Numbers as text, the same on page, drawing and sheet: decimal point, true minus (U+2212), thin space (U+2009) between
/// groups of three digits from 1 000, the unit apart. Not finite numbers become an en dash.
/// </summary>
public static class Figures
{
    public const string Nothing = "\u2013";
    private const string Minus = "\u2212";
    private const string ThinSpace = "\u2009";

    /// <summary>With a fixed number of decimals, 0 to 12.</summary>
    public static string Fixed(double value, int decimals)
    {
        ArgumentOutOfRangeException.ThrowIfNegative(decimals);
        ArgumentOutOfRangeException.ThrowIfGreaterThan(decimals, 12);
        if (!double.IsFinite(value))
        {
            return Nothing;
        }

        return Math.Abs(value) >= 1e12 ? Power(value, 3) : Group(value.ToString("F" + decimals, CultureInfo.InvariantCulture));
    }

    /// <summary>With a number of significant digits, 1 to 12; trailing zeros stay, because they say how sure the figure is.</summary>
    public static string Significant(double value, int digits)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(digits, 1);
        ArgumentOutOfRangeException.ThrowIfGreaterThan(digits, 12);
        if (!double.IsFinite(value))
        {
            return Nothing;
        }

        if (value == 0)
        {
            return "0";
        }

        // The exponent after rounding, so that 9.996 to three digits is 10.0 and not 10.00.
        var scientific = value.ToString("E" + (digits - 1), CultureInfo.InvariantCulture);
        var exponent = int.Parse(scientific.AsSpan(scientific.IndexOf('E', StringComparison.Ordinal) + 1), NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture);
        if (exponent is < -6 or >= 12)
        {
            return Power(value, digits);
        }

        var decimals = digits - 1 - exponent;
        if (decimals >= 0)
        {
            return Group(value.ToString("F" + decimals, CultureInfo.InvariantCulture));
        }

        var rounded = double.Parse(scientific, NumberStyles.Float, CultureInfo.InvariantCulture);
        return Group(rounded.ToString("F0", CultureInfo.InvariantCulture));
    }

    /// <summary>At most this many decimals, trailing zeros dropped: lengths as a person types them, 220, 0.3, 62.5.</summary>
    public static string Plain(double value, int maxDecimals = 3)
    {
        var text = Fixed(value, maxDecimals);
        if (!text.Contains('.', StringComparison.Ordinal) || text.Contains('e', StringComparison.Ordinal))
        {
            return text;
        }

        text = text.TrimEnd('0').TrimEnd('.');
        return text == Minus + "0" ? "0" : text;
    }

    /// <summary>A change, with its sign; what rounds to nothing is a plain 0.</summary>
    public static string Change(double value, int decimals)
    {
        if (!double.IsFinite(value))
        {
            return Nothing;
        }

        var text = Fixed(value, decimals);
        return text.AsSpan().IndexOfAnyInRange('1', '9') < 0 ? "0" : value > 0 ? "+" + text : text;
    }

    /// <summary>Figure and unit, kept on one line.</summary>
    public static string With(string figure, string unit) => unit.Length == 0 ? figure : figure + "\u00A0" + unit;

    private static string Power(double value, int digits)
    {
        var text = value.ToString("E" + (digits - 1), CultureInfo.InvariantCulture);
        var at = text.IndexOf('E', StringComparison.Ordinal);
        var exponent = int.Parse(text.AsSpan(at + 1), NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture);
        return (text[..at] + "e" + exponent.ToString(CultureInfo.InvariantCulture)).Replace("-", Minus, StringComparison.Ordinal);
    }

    private static string Group(string text)
    {
        var negative = text[0] == '-';
        var start = negative ? 1 : 0;
        var point = text.IndexOf('.', StringComparison.Ordinal);
        var whole = point < 0 ? text[start..] : text[start..point];
        for (var i = whole.Length - 3; i > 0; i -= 3)
        {
            whole = whole.Insert(i, ThinSpace);
        }

        var body = whole + (point < 0 ? "" : text[point..]);
        return negative && body.AsSpan().IndexOfAnyInRange('1', '9') >= 0 ? Minus + body : body;
    }
}
