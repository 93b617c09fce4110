using CoreDesign.Estimating.Contracts;
using CoreDesign.Sheets.Scenes;

namespace CoreDesign.Sheets.Drawings;

internal enum ZoneKind
{
    Limb,
    Yoke,
    Corner,
    TZone,
}

/// <summary>A part as it stands in the front view: millimetres, origin at the upper left of the core.</summary>
internal sealed record Zone(ZoneKind Kind, Box Place_mm, int Limb, bool Top, PartResult? Part)
{
    /// <summary>Whether the inner side of a corner is its right one.</summary>
    public bool InnerRight => Limb == 0;

    public string Name { get; init; } = "";
}

/// <summary>Cuts the front view into limbs, yokes, corners and T zones, for any row of limbs, and finds the result that belongs to each.</summary>
internal static class CoreZones
{
    public static IReadOnlyList<Zone> Of(EstimateResult r)
    {
        var g = r.Geometry;
        double h = g.YokeHeight_mm, wh = g.WindowHeight_mm;
        var row = CoreRow.Of(r);
        var (limbs, last) = (row.Limbs, row.Limbs.Count - 1);
        var zones = new List<Zone>();
        for (var i = 0; i <= last; i++)
        {
            var (letter, x, w, isReturn) = limbs[i];
            zones.Add(new(ZoneKind.Limb, new(x, h, w, wh), i, false, Find(r, "limb", [$"limb{letter}", $"limb{i + 1}"], i, limbs.Count)) { Name = isReturn ? "Return limb" : "Limb" });
            foreach (var top in new[] { true, false })
            {
                var y = top ? 0 : h + wh;
                var side = top ? "Top" : "Bottom";
                zones.Add(i == 0 || i == last
                    ? new(ZoneKind.Corner, new(x, y, w, h), i, top, Find(r, "corner", [$"corner{letter}{side}", $"corner{letter}", "corner", "corners"], i, limbs.Count)) { Name = "Corner" }
                    : new(ZoneKind.TZone, new(x, y, w, h), i, top, Find(r, "tZone", [$"tZone{letter}{side}", $"tZone{side}", $"tZone{letter}", "tZone", "tZones"], 0, 1)) { Name = "T zone" });
                if (i < last)
                {
                    var pair = letter + limbs[i + 1].Letter;
                    var window = row.Windows[i];
                    zones.Add(new(ZoneKind.Yoke, new(window.X_mm, y, window.Width_mm, h), i, top, Find(r, "yoke", [$"yoke{pair}{side}", $"yoke{pair}", $"yoke{side}", "yoke", "yokes"], i, last)) { Name = "Yoke" });
                }
            }
        }

        return zones;
    }

    // A result may list each part or lump equal ones; then the place in the list decides, and the first stands for all.
    private static PartResult? Find(EstimateResult r, string kind, string[] names, int place, int places)
    {
        var parts = r.Parts.Where(p => p.Kind == kind).ToArray();
        foreach (var name in names)
        {
            if (Array.Find(parts, p => string.Equals(p.Name, name, StringComparison.OrdinalIgnoreCase)) is { } part)
            {
                return part;
            }
        }

        return parts.Length == 0 ? null : parts.Length == places ? parts[place] : parts[0];
    }
}
