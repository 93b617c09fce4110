namespace CoreDesign.Magnetics.Geometry;

/// <summary>
/// Divides the core into the parts of the magnetic circuit. Limbs end where the yoke of the same step begins, yokes where the limb begins;
/// what both share is a corner or a T zone, per step the rectangle limb width × yoke width. Together they fill the core once, without gap.
/// </summary>
internal static class CoreParts
{
    public static IReadOnlyList<CorePart> Of(CoreFrame frame)
    {
        var limbs = frame.Layout.Limbs;
        var parts = new List<CorePart>();
        for (var i = 0; i < limbs.Count; i++)
        {
            var limb = i;
            parts.Add(Part("limb" + limbs[i].Letter, CorePartKind.Limb, frame.NetLimbArea(i), frame.Volume(s => frame.LimbWidth(limb, s) * frame.ClearHeight(s))));
        }

        foreach (var side in (string[])["Top", "Bottom"])
        {
            for (var i = 0; i + 1 < limbs.Count; i++)
            {
                var limb = i;
                parts.Add(Part($"yoke{limbs[i].Letter}{limbs[i + 1].Letter}{side}", CorePartKind.Yoke, frame.NetYokeArea, frame.Volume(s => s.YokeWidth_m * frame.ClearWidth(limb, s))));
            }
        }

        parts.AddRange(Shared(frame, outer: true));
        parts.AddRange(Shared(frame, outer: false));
        return parts;
    }

    /// <summary>
    /// Corners or T zones. The flux enters through the limb's section and leaves through the yoke's, so the mean of both is taken:
    /// with a yoke equal to the limb the whole core then has one section, and a uniform core stays exactly uniform.
    /// The mean is a choice of this model, common practice, no source.
    /// </summary>
    private static IEnumerable<CorePart> Shared(CoreFrame frame, bool outer)
    {
        var limbs = frame.Layout.Limbs;
        for (var i = 0; i < limbs.Count; i++)
        {
            if (frame.Layout.IsOuter(i) != outer)
            {
                continue;
            }

            var limb = i;
            var area = (frame.NetLimbArea(i) + frame.NetYokeArea) / 2;
            var volume = frame.Volume(s => frame.LimbWidth(limb, s) * s.YokeWidth_m);
            var name = outer ? "corner" + limbs[i].Letter : frame.Layout.TZoneName(i);
            foreach (var side in (string[])["Top", "Bottom"])
            {
                yield return Part(name + side, outer ? CorePartKind.Corner : CorePartKind.TZone, area, volume);
            }
        }
    }

    private static CorePart Part(string name, CorePartKind kind, double area, double volume) => new(name, kind, area, volume / area, volume);
}
