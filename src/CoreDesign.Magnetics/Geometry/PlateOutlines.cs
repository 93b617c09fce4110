namespace CoreDesign.Magnetics.Geometry;

/// <summary>
/// Outlines of plates lying along X, the rolling direction, counter-clockwise from the lower left of the box around them. The long side
/// (the outer edge in the core) is below.
/// </summary>
internal static class PlateOutlines
{
    public static (double X_m, double Y_m)[] Rectangle(double length, double width) => [(0, 0), (length, 0), (length, width), (0, width)];

    /// <summary>
    /// A plate with 45° cuts from both ends of its short side, <paramref name="cut"/> deep; where the cut is not as deep as the plate is
    /// wide, straight ends remain below it. <paramref name="notches"/>: 90° notches in the short side, (middle, mouth) with
    /// the middle measured from the left end of the short side.
    /// </summary>
    public static (double X_m, double Y_m)[] Mitred(double shortSide, double width, double cut, params IReadOnlyList<(double Middle, double Mouth)> notches)
    {
        var longSide = shortSide + (2 * cut);
        var straight = width - cut;
        var p = new List<(double, double)> { (0, 0), (longSide, 0) };
        if (straight > 0)
        {
            p.Add((longSide, straight));
        }

        p.Add((longSide - cut, width));
        foreach (var (middle, mouth) in notches.Reverse())
        {
            p.Add((cut + middle + (mouth / 2), width));
            p.Add((cut + middle, width - (mouth / 2)));
            p.Add((cut + middle - (mouth / 2), width));
        }

        p.Add((cut, width));
        if (straight > 0)
        {
            p.Add((0, straight));
        }

        return [.. p];
    }

    /// <summary>A plate with a 90° point at each end; the shoulders are its short side.</summary>
    public static (double X_m, double Y_m)[] Pointed(double shortSide, double width)
    {
        var tip = width / 2;
        return [(tip, 0), (tip + shortSide, 0), ((2 * tip) + shortSide, tip), (tip + shortSide, width), (tip, width), (0, tip)];
    }

    /// <summary>Enclosed area by the shoelace rule, positive for a counter-clockwise outline.</summary>
    public static double Area(IReadOnlyList<(double X_m, double Y_m)> outline)
    {
        double twice = 0;
        for (var i = 0; i < outline.Count; i++)
        {
            var (x0, y0) = outline[i];
            var (x1, y1) = outline[(i + 1) % outline.Count];
            twice += (x0 * y1) - (x1 * y0);
        }

        return twice / 2;
    }
}
