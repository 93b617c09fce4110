namespace CoreDesign.Estimating.Contracts;

/// <summary>Finds the known names that a mistyped one most likely stood for.</summary>
public static class NearestName
{
    private const int LongestCompared = 100;

    /// <summary>
    /// The nearest known names, best first, at most <paramref name="count"/>: those within a third of the name's length in
    /// single-letter changes (at least two), letter case not counted.
    /// </summary>
    public static IReadOnlyList<string> Of(string name, IEnumerable<string> known, int count = 3)
    {
        ArgumentNullException.ThrowIfNull(name);
        ArgumentNullException.ThrowIfNull(known);
        if (name.Length > LongestCompared) return [];
        var reach = Math.Max(2, name.Length / 3);
        return [.. known
            .Select(k => (Name: k, Distance: Distance(name.ToLowerInvariant(), k.ToLowerInvariant())))
            .Where(k => k.Distance <= reach)
            .OrderBy(k => k.Distance).ThenBy(k => k.Name, StringComparer.Ordinal)
            .Take(count)
            .Select(k => k.Name)];
    }

    // Edit distance by the usual two-row table: insert, delete and replace cost one each.
    private static int Distance(string a, string b)
    {
        var above = Enumerable.Range(0, b.Length + 1).ToArray();
        for (var i = 1; i <= a.Length; i++)
        {
            var row = new int[b.Length + 1];
            row[0] = i;
            for (var j = 1; j <= b.Length; j++)
                row[j] = Math.Min(Math.Min(row[j - 1], above[j]) + 1, above[j - 1] + (a[i - 1] == b[j - 1] ? 0 : 1));
            above = row;
        }

        return above[b.Length];
    }
}
