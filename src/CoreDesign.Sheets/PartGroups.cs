using System.Globalization;
using CoreDesign.Estimating.Contracts;
using CoreDesign.Sheets.Design;

namespace CoreDesign.Sheets;

/// <summary>Equal parts as one line of a table. Area, length, mass and flux density are of one part; loss and exciting power of all.</summary>
public sealed record PartGroup(string Name, string Kind, int Count, double Area_mm2, double Length_mm, double Mass_kg, double PeakFluxDensity_T, double Loss_W, double ExcitingPower_VA);

/// <summary>Gathers the parts of an estimate for reading: limbs one by one, equal yokes, corners, T zones and joints together.</summary>
public static class PartGroups
{
    public static IReadOnlyList<PartGroup> Of(EstimateResult estimate)
    {
        ArgumentNullException.ThrowIfNull(estimate);
        return Of(estimate.Parts);
    }

    public static IReadOnlyList<PartGroup> Of(IReadOnlyList<PartResult> parts)
    {
        var groups = parts.GroupBy(Likeness, StringComparer.Ordinal).Select(g => g.ToList()).ToList();
        return [.. groups.Select(g => Group(g, groups.Count(other => other[0].Kind == g[0].Kind)))];
    }

    /// <summary>"limbA" as "Limb A", "yokeABTop" as "Yoke AB top".</summary>
    public static string NameOf(string part) => Words.Part(part);

    // Equal parts come out of the solver equal to many digits but not to the last; a part's share of loss and power goes by its count.
    private static string Likeness(PartResult p) => p.Kind == "limb"
        ? p.Name
        : string.Join(' ', [p.Kind, .. new[] { p.Area_mm2, p.Mass_kg, p.PeakFluxDensity_T, p.Loss_W / p.Count, p.ExcitingPower_VA / p.Count }.Select(v => v.ToString("E3", CultureInfo.InvariantCulture))]);

    private static PartGroup Group(List<PartResult> parts, int groupsOfKind)
    {
        var first = parts[0];
        var count = parts.Sum(p => p.Count);
        return new PartGroup(Name(parts, count, groupsOfKind), first.Kind, count, first.Area_mm2, first.Length_mm, first.Mass_kg, first.PeakFluxDensity_T, parts.Sum(p => p.Loss_W), parts.Sum(p => p.ExcitingPower_VA));
    }

    private static string Name(List<PartResult> parts, int count, int groupsOfKind)
    {
        if (count == 1 || Plural(parts[0].Kind) is not { } plural)
        {
            return NameOf(parts[0].Name);
        }

        var limbs = groupsOfKind == 1 ? [] : parts.Select(p => Limbs(p.Name)).Where(l => l.Length > 0).Distinct(StringComparer.Ordinal).ToList();
        return limbs.Count == 0 ? plural : $"{plural} {string.Join(", ", limbs)}";
    }

    private static string? Plural(string kind) => kind switch { "yoke" => "Yokes", "corner" => "Corners", "tZone" => "T zones", "joint" => "Joints", _ => null };

    // The limbs that a part belongs to: yokeABTop lies between A and B. A name without them says nothing more than its kind.
    private static string Limbs(string name) => NameOf(name).Split(' ').LastOrDefault(w => w.Length is 1 or 2 && w.All(char.IsUpper) && w != "T") ?? "";
}
