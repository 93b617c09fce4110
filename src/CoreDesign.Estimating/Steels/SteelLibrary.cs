namespace CoreDesign.Estimating.Steels;

/// <summary>
/// The built-in grades: EN 10107 / IEC 60404-8-7, current and older, and the AISI set. Their curves are representative
/// (<see cref="RepresentativeCurves"/>). Built once, on first use.
/// </summary>
public static class SteelLibrary
{
    internal static IReadOnlyList<SteelGrade> BuiltIn { get; } = [.. LibraryRows.All()];

    /// <summary>The built-in grades alone, as a catalog.</summary>
    public static SteelCatalog Catalog { get; } = new(BuiltIn, []);

    public static IReadOnlyList<SteelGrade> All => Catalog.All;

    public static string Revision => Catalog.Revision;

    public static bool TryFind(string? name, [System.Diagnostics.CodeAnalysis.NotNullWhen(true)] out SteelGrade? grade) =>
        Catalog.TryFind(name, out grade);

    public static IReadOnlyList<string> Nearest(string name, int count) => Catalog.Nearest(name, count);

    public static SteelGrade? NextBetter(SteelGrade grade) => Catalog.NextBetter(grade);
}
