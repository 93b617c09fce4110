using System.Text;

namespace CoreDesign.Sheets.Pdf;

/// <summary>Breaks and fits text into a width; what comes back is printable with the type's face.</summary>
internal static class TextWrap
{
    /// <summary>
    /// Lines no wider than <paramref name="width"/>; a word that is wider itself is broken, and what goes beyond
    /// <paramref name="most"/> lines is cut with an ellipsis.
    /// </summary>
    public static IReadOnlyList<string> Lines(string text, Type type, double width, int most = int.MaxValue)
    {
        var lines = new List<string>();
        foreach (var paragraph in text.Split('\n'))
        {
            Break(SheetFonts.Face(type.Cut).Printable(paragraph), type, width, lines);
        }

        if (lines.Count > most)
        {
            lines.RemoveRange(most, lines.Count - most);
            lines[^1] = Cut(lines[^1] + " …", type, width);
        }

        return lines;
    }

    /// <summary>One line, set smaller down to <paramref name="smallest"/> and then cut with an ellipsis where it is still too wide.</summary>
    public static (string Text, Type Type) Fit(string text, Type type, double width, double smallest)
    {
        var printable = SheetFonts.Face(type.Cut).Printable(text);
        var natural = type.Width(printable);
        if (natural <= width)
        {
            return (printable, type);
        }

        // Rounded so that few sizes, and no stray digits, reach the file.
        var fitted = type with { Size = Math.Max(smallest, Math.Floor(type.Size * width / natural * 4) / 4) };
        if (fitted.Width(printable) <= width)
        {
            return (printable, fitted);
        }

        return (Cut(printable, fitted, width), fitted);
    }

    private static string Cut(string text, Type type, double width)
    {
        if (type.Width(text) <= width)
        {
            return text;
        }

        var length = SheetFonts.Face(type.Cut).Fitting(text, 0, type.Size, width - type.Width("…"));
        return text[..length].TrimEnd() + "…";
    }

    private static void Break(string text, Type type, double width, List<string> lines)
    {
        var line = new StringBuilder();
        double used = 0, blank = type.Width(" ");
        foreach (var word in Words(text, type, width))
        {
            var own = type.Width(word);
            if (line.Length > 0 && used + blank + own > width)
            {
                lines.Add(line.ToString());
                line.Clear();
                used = 0;
            }

            used += (line.Length > 0 ? blank : 0) + own;
            line.Append(line.Length > 0 ? " " : "").Append(word);
        }

        lines.Add(line.ToString());
    }

    private static IEnumerable<string> Words(string text, Type type, double width)
    {
        var face = SheetFonts.Face(type.Cut);
        foreach (var word in text.Split(' ', StringSplitOptions.RemoveEmptyEntries))
        {
            for (var start = 0; start < word.Length;)
            {
                var length = face.Fitting(word, start, type.Size, width);
                yield return word.Substring(start, length);
                start += length;
            }
        }
    }
}
