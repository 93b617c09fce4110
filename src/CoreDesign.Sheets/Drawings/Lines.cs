using CoreDesign.Sheets.Scenes;

namespace CoreDesign.Sheets.Drawings;

/// <summary>Short hands for marks.</summary>
internal static class Lines
{
    public static readonly double[] DashDot = [8, 2, 2, 2];

    public static PathMark Line(XY a, XY b, Paint ink, double width = 0.75, IReadOnlyList<double>? dash = null) => new([a, b], false, Paint.None, ink, width, dash);

    public static PathMark Rectangle(Box box, Paint fill, Paint stroke, double width = 1) => new(box.Corners(), true, fill, stroke, width);

    /// <summary>Slender filled arrow head, tip at the point, looking along the direction (unit vector).</summary>
    public static PathMark Arrow(XY tip, double dx, double dy, Paint ink, double length = 8)
    {
        double half = length * 0.275, bx = tip.X - (dx * length), by = tip.Y - (dy * length);
        return new([tip, new(bx - (dy * half), by + (dx * half)), new(bx + (dy * half), by - (dx * half))], true, ink, Paint.None) { Part = "ar" };
    }
}
