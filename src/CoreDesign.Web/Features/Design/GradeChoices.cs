using CoreDesign.Estimating.Steels;
using CoreDesign.Web.Components;

namespace CoreDesign.Web.Features.Design;

/// <summary>The steels as a list to choose from, the works' own first, each group with the best steel first.</summary>
public static class GradeChoices
{
    public static IEnumerable<IGrouping<string, Choice>> Of(SteelCatalog steels) =>
        steels.All
            .OrderBy(g => Rank(g.Generation)).ThenBy(g => g.Class, StringComparer.Ordinal)
            .GroupBy(g => g.Generation == "works" ? "own certificates" : $"{g.Class}, {g.Generation}", g => new Choice(g.Name, g.Name), StringComparer.Ordinal);

    private static int Rank(string generation) => generation switch { "works" => 0, "current" => 1, "AISI" => 2, _ => 3 };
}
