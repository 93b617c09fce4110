namespace CoreDesign.Estimating.Steels;

/// <summary>Which known names are nearest to a mistyped one (Levenshtein distance, case ignored).</summary>
internal static class NameDistance
{
    /// <summary>No known name is longer; a pasted page of text costs no more than this.</summary>
    private const int LongestCompared = 100;

    public static IReadOnlyList<string> Nearest(string name, IEnumerable<string> known, int count) =>
        [.. known
            .Select(k => (Name: k, Edits: Edits(name, k)))
            .OrderBy(k => k.Edits)
            .ThenBy(k => k.Name, StringComparer.Ordinal)
            .Take(count)
            .Select(k => k.Name)];

    /// <summary>Single-letter inserts, deletes and replacements that turn one name into the other.</summary>
    public static int Edits(string from, string to)
    {
        var a = from.Trim().ToUpperInvariant();
        a = a.Length > LongestCompared ? a[..LongestCompared] : a;
        var b = to.ToUpperInvariant();
        var row = Enumerable.Range(0, b.Length + 1).ToArray();
        for (var i = 1; i <= a.Length; i++)
        {
            var diagonal = row[0];
            row[0] = i;
            for (var j = 1; j <= b.Length; j++)
            {
                var next = Math.Min(Math.Min(row[j], row[j - 1]) + 1, diagonal + (a[i - 1] == b[j - 1] ? 0 : 1));
                diagonal = row[j];
                row[j] = next;
            }
        }

        return row[b.Length];
    }
}
