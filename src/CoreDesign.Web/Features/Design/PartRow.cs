using System.Text.RegularExpressions;
using CoreDesign.Estimating.Contracts;

namespace CoreDesign.Web.Features.Design;

/// <summary>A row of the parts table: one limb, or all parts of a kind that carry the same. Figures are of all of them together.</summary>
public sealed partial record PartRow(string Name, int Count, PartResult Part, double Mass_kg, double Loss_W, double ExcitingPower_VA)
{
    public static IReadOnlyList<PartRow> Of(IReadOnlyList<PartResult> parts)
    {
        var groups = parts.GroupBy(p => p.Kind == "limb" ? p.Name : $"{p.Kind} {Same(p.Area_mm2)} {Same(p.Mass_kg)} {Same(p.PeakFluxDensity_T)} {Same(p.Loss_W)} {Same(p.ExcitingPower_VA)}", StringComparer.Ordinal)
            .Select(g => g.ToList()).ToList();
        var kinds = groups.GroupBy(g => g[0].Kind, StringComparer.Ordinal).ToDictionary(g => g.Key, g => g.Count(), StringComparer.Ordinal);
        return
        [
            .. groups.Select(g => new PartRow(
                g[0].Kind == "limb" ? Words(g[0].Name) : kinds[g[0].Kind] == 1 ? Plural(g[0].Kind) : $"{Plural(g[0].Kind)} {string.Join(", ", g.Select(p => Limbs(p.Name)).Distinct(StringComparer.Ordinal))}".TrimEnd(),
                g.Sum(p => p.Count), g[0], g.Sum(p => p.Mass_kg * p.Count), g.Sum(p => p.Loss_W), g.Sum(p => p.ExcitingPower_VA))),
        ];
    }

    /// <summary>To three digits: what the table would print alike stands in one row.</summary>
    private static string Same(double value) => value.ToString("E2", System.Globalization.CultureInfo.InvariantCulture);

    private static string Plural(string kind) => kind switch { "yoke" => "Yokes", "corner" => "Corners", "tZone" => "T zones", "joint" => "Joints", _ => kind };

    // limbA as Limb A.
    private static string Words(string name) => char.ToUpperInvariant(name[0]) + Capital().Replace(name[1..], " ${letter}", 1);

    // The limbs in a part's name: yokeABTop lies between A and B.
    private static string Limbs(string name) => LimbLetters().Match(name).Groups["limbs"].Value;

    [GeneratedRegex("(?<letter>[A-Z])", RegexOptions.ExplicitCapture, 1000)]
    private static partial Regex Capital();

    [GeneratedRegex("^[a-z]+(?<limbs>[A-Z]{1,2})(?=Top|Bottom|$)", RegexOptions.ExplicitCapture, 1000)]
    private static partial Regex LimbLetters();
}
