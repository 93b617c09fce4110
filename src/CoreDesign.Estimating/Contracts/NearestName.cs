using CoreDesign.Estimating.Steels;

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
            .Select(k => (Name: k, Distance: NameDistance.Edits(name, k)))
            .Where(k => k.Distance <= reach)
            .OrderBy(k => k.Distance).ThenBy(k => k.Name, StringComparer.Ordinal)
            .Take(count)
            .Select(k => k.Name)];
    }
}
