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
}

/// <summary>Cuts the front view into limbs, yokes, corners and T zones, for any row of equal limbs, and finds the result that belongs to each.</summary>
internal static class CoreZones
{
    public static int Limbs(GeometryResult g) => Math.Max(2, (int)Math.Round((g.OverallWidth_mm - g.LimbWidth_mm) / g.LimbPitch_mm) + 1);

    public static IReadOnlyList<Zone> Of(EstimateResult r)
    {
        var g = r.Geometry;
        double w = g.LimbWidth_mm, h = g.YokeHeight_mm, wh = g.WindowHeight_mm, pitch = g.LimbPitch_mm;
        var limbs = Limbs(g);
        var zones = new List<Zone>();
        for (var i = 0; i < limbs; i++)
        {
            var x = i * pitch;
            zones.Add(new(ZoneKind.Limb, new(x, h, w, wh), i, false, Find(r, "limb", [$"limb{Letter(i)}", $"limb{i + 1}"], i, limbs)));
            foreach (var top in new[] { true, false })
            {
                var y = top ? 0 : h + wh;
                var side = top ? "Top" : "Bottom";
                if (i == 0 || i == limbs - 1)
                {
                    zones.Add(new(ZoneKind.Corner, new(x, y, w, h), i, top, Find(r, "corner", [$"corner{Letter(i)}{side}", $"corner{Letter(i)}", "corner", "corners"], i, limbs)));
                }
                else
                {
                    zones.Add(new(ZoneKind.TZone, new(x, y, w, h), i, top, Find(r, "tZone", [$"tZone{Letter(i)}{side}", $"tZone{side}", $"tZone{Letter(i)}", "tZone", "tZones"], 0, 1)));
                }

                if (i < limbs - 1)
                {
                    var pair = $"{Letter(i)}{Letter(i + 1)}";
                    zones.Add(new(ZoneKind.Yoke, new(x + w, y, pitch - w, h), i, top, Find(r, "yoke", [$"yoke{pair}{side}", $"yoke{pair}", $"yoke{side}", "yoke", "yokes"], i, limbs - 1)));
                }
            }
        }

        return zones;
    }

    public static string Letter(int limb) => ((char)('A' + limb)).ToString();

    /// <summary>The letter that the limb has in the names of the parts.</summary>
    public static string Mark(EstimateResult r, int limb) => r.Limbs.Count == Limbs(r.Geometry) ? r.Limbs[limb].Name["limb".Length..] : Letter(limb);

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
