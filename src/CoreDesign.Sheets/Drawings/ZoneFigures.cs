using CoreDesign.Sheets.Scenes;

namespace CoreDesign.Sheets.Drawings;

/// <summary>Finds room for the figure of a part: inside it, clear of its joint lines, as large as fits; else not at all.</summary>
internal static class ZoneFigures
{
    private const double Air = 4;

    /// <param name="place">The part in drawing units.</param>
    /// <param name="band">Half width of the band of joint lines, measured along an axis.</param>
    public static TextMark? Fit(Zone zone, Box place, string figure, string unit, bool mitred, double band, double ramp, DrawingOptions o)
    {
        var whole = Figures.With(figure, unit);
        var fill = ReadingRamp.FigureOn(ramp);
        string[] texts = zone.Kind is ZoneKind.Limb or ZoneKind.Yoke ? [whole, figure] : [figure];
        foreach (var size in new[] { o.FigureSize, o.TextSize })
        {
            foreach (var text in texts)
            {
                double w = TextExtent.Width(text, size, true), h = size;
                XY? centre = zone.Kind switch
                {
                    ZoneKind.Corner when mitred => InCorner(zone, place, w, h, band),
                    ZoneKind.TZone when mitred => InT(zone, place, w, h, band),
                    _ => place.Width >= w + (2 * Air) && place.Height >= h + (2 * Air) ? place.Centre : null,
                };
                if (centre is { } c)
                {
                    return Mark(text, c, size, fill, 0);
                }
            }
        }

        if (zone.Kind is ZoneKind.Limb or ZoneKind.Yoke)
        {
            foreach (var text in texts)
            {
                var w = TextExtent.Width(text, o.TextSize, true);
                if (place.Height >= w + (2 * Air) && place.Width >= o.TextSize + (Air / 2))
                {
                    return Mark(text, place.Centre, o.TextSize, fill, 90);
                }
            }
        }

        return null;
    }

    private static TextMark Mark(string text, XY centre, double size, Ink fill, double angle)
    {
        // Capitals and figures are about 0.7 of the size high; half of that under the middle puts them in the middle.
        var drop = size * 0.35;
        return angle == 0
            ? new(new XY(centre.X, centre.Y + drop), text, size, Anchor.Middle, fill, Bold: true) { Part = "fg" }
            : new(new XY(centre.X + drop, centre.Y), text, size, Anchor.Middle, fill, Bold: true, Angle: 90) { Part = "fg" };
    }

    // The triangle of the yoke plate: between the joint line, which starts at the inner corner at 45 degrees, the outer edge and the inner boundary.
    private static XY? InCorner(Zone zone, Box p, double w, double h, double band)
    {
        var slack = p.Height - (2 * Air) - w - h - band;
        if (p.Width < w + (2 * Air) || slack < 0)
        {
            return InLimbTriangle(zone, p, w, h, band);
        }

        var shift = Math.Min(slack / 3, 0.2 * p.Height);
        var fromInner = Math.Min(Air + shift + (w / 2), p.Width - Air - (w / 2));
        var fromOuter = Air + shift + (h / 2);
        return new XY(zone.InnerRight ? p.Right - fromInner : p.X + fromInner, zone.Top ? p.Y + fromOuter : p.Bottom - fromOuter);
    }

    // A yoke lower than the limb is wide leaves more room under the joint line.
    private static XY? InLimbTriangle(Zone zone, Box p, double w, double h, double band)
    {
        var slack = p.Width - (2 * Air) - w - h - band;
        if (p.Height < h + (2 * Air) || slack < 0)
        {
            return null;
        }

        var fromOuter = Air + (slack / 3) + (w / 2);
        var fromInner = Math.Min(Air + (slack / 3) + (h / 2), p.Height - Air - (h / 2));
        return new XY(zone.InnerRight ? p.X + fromOuter : p.Right - fromOuter, zone.Top ? p.Bottom - fromInner : p.Y + fromInner);
    }

    // Above the notch of the yoke, or in the point of the limb under it.
    private static XY? InT(Zone zone, Box p, double w, double h, double band)
    {
        var notch = p.Width / 2;
        var free = p.Height - notch - band;
        if (free >= h + (2 * Air) && p.Width >= w + (2 * Air))
        {
            var fromOuter = free / 2;
            return new XY(p.Centre.X, zone.Top ? p.Y + fromOuter : p.Bottom - fromOuter);
        }

        var below = notch - band - (w / 2) - h - Air;
        if (below < Air || p.Height < h + (2 * Air))
        {
            return null;
        }

        var fromWindow = Air + (h / 2);
        return new XY(p.Centre.X, zone.Top ? p.Bottom - fromWindow : p.Y + fromWindow);
    }
}
