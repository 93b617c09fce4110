namespace CoreDesign.Magnetics.Geometry;

/// <summary>
/// Plates of a core with square lapped joints: rectangles in two layers that alternate, one with yokes over the whole width and
/// limbs between them, one with limbs over the whole height and yokes between them. Each layer fills half the stack.
/// </summary>
internal static class ButtPlates
{
    public static IReadOnlyList<CorePlate> Of(CoreFrame frame)
    {
        var plates = new List<CorePlate>();
        for (var k = 0; k < frame.Steps.Count; k++)
        {
            var step = frame.Steps[k];
            var clear = frame.ClearHeight(step);
            Limbs(plates, frame, k, clear);
            Limbs(plates, frame, k, clear + (2 * step.YokeWidth_m));

            var last = frame.Axes.Length - 1;
            var whole = frame.Axes[last] + ((frame.LimbWidth(0, step) + frame.LimbWidth(last, step)) / 2);
            plates.Add(Plate(frame, k, PlateShape.Yoke, 2, step.YokeWidth_m, whole));

            // Spans over windows of one width between limbs of the same two widths are one kind of plate.
            foreach (var kind in Enumerable.Range(0, last).GroupBy(i => (frame.Layout.IsReturnWindow(i), frame.Layout.Limbs[i].WidthShare + frame.Layout.Limbs[i + 1].WidthShare)))
            {
                plates.Add(Plate(frame, k, PlateShape.Yoke, 2 * kind.Count(), step.YokeWidth_m, frame.ClearWidth(kind.First(), step)));
            }
        }

        return plates;
    }

    private static void Limbs(List<CorePlate> plates, CoreFrame frame, int k, double length)
    {
        foreach (var kind in Enumerable.Range(0, frame.Layout.Limbs.Count).GroupBy(i => (Outer: frame.Layout.IsOuter(i), frame.Layout.Limbs[i].WidthShare)))
        {
            var shape = kind.Key.Outer ? PlateShape.OuterLimb : PlateShape.MiddleLimb;
            plates.Add(Plate(frame, k, shape, kind.Count(), frame.LimbWidth(kind.First(), frame.Steps[k]), length));
        }
    }

    private static CorePlate Plate(CoreFrame frame, int k, PlateShape shape, int pieces, double width, double length)
    {
        var outline = PlateOutlines.Rectangle(length, width);
        var area = PlateOutlines.Area(outline);
        return new(k + 1, shape, pieces, width, length, length, outline, area, area * pieces * frame.NetStack(frame.Steps[k]) / 2);
    }
}
