using System.Globalization;
using System.Text;

namespace CoreDesign.Estimating.Contracts;

/// <summary>Which characters a text that people type may hold.</summary>
public static class PlainText
{
    /// <summary>False where a text holds what can't be seen or printed: control characters, marks of writing direction, characters without width, halves of pairs.</summary>
    /// <param name="severalLines">Line ends and tabs are taken as well.</param>
    public static bool Is(string text, bool severalLines = false)
    {
        ArgumentNullException.ThrowIfNull(text);
        return !text.EnumerateRunes().Any(r => Forbidden(r) && !(severalLines && r.Value is ('\n' or '\r' or '\t')));
    }

    private static bool Forbidden(Rune rune) => rune == Rune.ReplacementChar || Rune.GetUnicodeCategory(rune) is
        UnicodeCategory.Control or UnicodeCategory.Format or UnicodeCategory.LineSeparator or UnicodeCategory.ParagraphSeparator
        or UnicodeCategory.PrivateUse or UnicodeCategory.OtherNotAssigned;
}
