using System.Globalization;
using CoreDesign.Estimating.Steels;

namespace CoreDesign.Web.Features.Steels;

/// <summary>Which steels the list shows, as it stands in the address.</summary>
public sealed record SteelFilter(string Search, string Class, string Thickness)
{
    public static SteelFilter From(string? search, string? @class, string? thickness) => new(search ?? "", @class ?? "", thickness ?? "");

    public string Uri
    {
        get
        {
            var parts = new[] { ("search", Search.Trim()), ("class", Class), ("thickness", Thickness) }
                .Where(p => p.Item2.Length > 0)
                .Select(p => $"{p.Item1}={System.Uri.EscapeDataString(p.Item2)}")
                .ToList();
            return parts.Count == 0 ? "steels" : "steels?" + string.Join('&', parts);
        }
    }

    public IReadOnlyList<SteelGrade> Of(IEnumerable<SteelGrade> steels) =>
    [
        .. steels.Where(s => (Class.Length == 0 || s.Class == Class)
            && (Thickness.Length == 0 || ThicknessText(s) == Thickness)
            && s.Name.Contains(Search.Trim(), StringComparison.OrdinalIgnoreCase)),
    ];

    public static IReadOnlyList<string> Thicknesses(IEnumerable<SteelGrade> steels) =>
        [.. steels.Select(s => s.Thickness_mm.Value).Distinct().Order().Select(Text).Distinct(StringComparer.Ordinal)];

    public static string ThicknessText(SteelGrade steel) => Text(steel.Thickness_mm.Value);

    // Inch gauges of the AISI set have a fourth digit; the metric ones keep their two.
    private static string Text(double thickness_mm) => thickness_mm.ToString("0.00##", CultureInfo.InvariantCulture);
}
