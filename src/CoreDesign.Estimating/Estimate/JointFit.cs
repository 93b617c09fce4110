using System.Globalization;
using CoreDesign.Magnetics.Geometry;
using CoreDesign.Magnetics.Joints;

namespace CoreDesign.Estimating.Estimate;

/// <summary>Whether the joint lines of a book all cross the corner that limb and yoke share; beyond it no plates would meet.</summary>
internal static class JointFit
{
    /// <summary>
    /// The message for a book that spreads beyond the corner of the widest step, or null. A square joint moves along the yoke's height; a mitre moves normal
    /// to its line, in which direction a square corner measures sqrt(2) times its side (geometry). Narrower steps are not held against it.
    /// </summary>
    public static string? Check(JointSpec joint, CoreGeometry core)
    {
        var spread = 1000 * (joint.Positions - 1) * joint.Shift_m;
        var widest = core.Steps[0];
        var side = 1000 * Math.Min(widest.LimbWidth_m * core.Limbs.Min(l => l.WidthShare), widest.YokeWidth_m);
        var room = joint.Kind == JointKind.ButtLap ? side : Math.Sqrt(2) * side;
        return spread < room ? null : string.Create(
            CultureInfo.InvariantCulture,
            $"{joint.Positions} positions with an overlap of {1000 * joint.Shift_m:0.###} mm spread the joint over {spread:0.###} mm, and the corner of the widest step has room for {room:0.#} mm. Take a smaller overlap, fewer positions or wider plates.");
    }
}
