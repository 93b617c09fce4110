using System.Globalization;
using System.Text.RegularExpressions;

namespace CoreDesign.Web.Features.Design;

/// <summary>
/// Numbers as engineers type them: decimal comma or point, spaces between thousands, a true minus. A comma or point is always
/// the decimal sign, never a thousands separator, so that a value can't be read a thousand times too large.
/// </summary>
public static partial class NumberText
{
    /// <summary>Reads a number; on failure <paramref name="mend"/> says what is wrong with the text and what to write.</summary>
    public static bool TryRead(string text, out double value, out string mend)
    {
        value = double.NaN;
        mend = "";
        var plain = Spaces().Replace(text.Trim(), "").Replace('\u2212', '-');
        var signs = plain.Count(c => c is ',' or '.');
        if (signs > 1)
        {
            mend = $"“{text.Trim()}” has {signs} commas or points. Write one decimal sign and no thousands separators, as in 1250.5.";
            return false;
        }

        if (!Number().IsMatch(plain) || !double.TryParse(plain.Replace(',', '.'), NumberStyles.Float, CultureInfo.InvariantCulture, out value))
        {
            value = double.NaN;
            mend = $"“{text.Trim()}” is not a number. Write digits with one decimal comma or point, as in 12.5.";
            return false;
        }

        return true;
    }

    /// <summary>True for a text such as 1,000 that may be meant as a thousand but is read as one.</summary>
    public static bool LooksLikeThousands(string text) => Thousands().IsMatch(text.Trim());

    /// <summary>The shortest text that reads back as the same number.</summary>
    public static string Exact(double value) => value.ToString("R", CultureInfo.InvariantCulture);

    /// <summary>At most <paramref name="digits"/> significant digits, no exponent, no trailing zeros.</summary>
    public static string Short(double value, int digits = 4)
    {
        if (value == 0 || !double.IsFinite(value))
        {
            return value.ToString(CultureInfo.InvariantCulture);
        }

        var places = Math.Clamp(digits - 1 - (int)Math.Floor(Math.Log10(Math.Abs(value))), 0, 8);
        return Math.Round(value, places).ToString("0.########", CultureInfo.InvariantCulture).Replace('-', '\u2212');
    }

    [GeneratedRegex(@"(?<=\d)[\u0020\u00a0\u2009\u202f'](?=\d{3}(\D|$))", RegexOptions.ExplicitCapture, 1000)]
    private static partial Regex Spaces();

    [GeneratedRegex(@"^[+-]?(\d+([.,]\d*)?|[.,]\d+)([eE][+-]?\d{1,3})?$", RegexOptions.ExplicitCapture, 1000)]
    private static partial Regex Number();

    [GeneratedRegex(@"^[1-9]\d{0,2}[.,]000$", RegexOptions.ExplicitCapture, 1000)]
    private static partial Regex Thousands();
}
