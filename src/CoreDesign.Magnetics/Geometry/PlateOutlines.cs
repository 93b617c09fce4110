namespace CoreDesign.Magnetics.Geometry;

/// <summary>
/// Outlines of plates lying along X, the rolling direction, counter-clockwise from the lower left of the box around them. The long side
/// (the outer edge in the core) is below.
/// </summary>
internal static class PlateOutlines
{
    public static (double X_m, double Y_m)[] Rectangle(double length, double width) => [(0, 0), (length, 0), (length, width), (0, width)];

    /// <summary>
    /// A plate with 45° cuts from both ends of its short side, <paramref name="left"/> and <paramref name="right"/> deep; where a cut is not as
    /// deep as the plate is wide, a straight end remains below it. <paramref name="notches"/>: 90° notches in the short side, (middle, mouth) with
    /// the middle measured from the left end of the short side.
    /// </summary>
    public static (double X_m, double Y_m)[] Mitred(double shortSide, double width, double left, double right, params IReadOnlyList<(double Middle, double Mouth)> notches)
    {
        var longSide = shortSide + left + right;
        var p = new List<(double, double)> { (0, 0), (longSide, 0) };
        if (right < width)
        {
            p.Add((longSide, width - right));
        }

        p.Add((longSide - right, width));
        foreach (var (middle, mouth) in notches.Reverse())
        {
            p.Add((left + middle + (mouth / 2), width));
            p.Add((left + middle, width - (mouth / 2)));
            p.Add((left + middle - (mouth / 2), width));
        }

        p.Add((left, width));
        if (left < width)
        {
            p.Add((0, width - left));
        }

        return [.. p];
    }

    /// <summary>A plate with a 90° point at each end, <paramref name="tip"/> deep; below half the width the point is cut flat. The shoulders are its short side.</summary>
    public static (double X_m, double Y_m)[] Pointed(double shortSide, double width, double tip)
    {
        var longSide = shortSide + (2 * tip);
        return tip < width / 2
            ? [(tip, 0), (tip + shortSide, 0), (longSide, tip), (longSide, width - tip), (tip + shortSide, width), (tip, width), (0, width - tip), (0, tip)]
            : [(tip, 0), (tip + shortSide, 0), (longSide, tip), (tip + shortSide, width), (tip, width), (0, tip)];
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
