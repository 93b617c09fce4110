namespace CoreDesign.Magnetics.Geometry;

/// <summary>
/// Plates of a core with 45° joints, at the middle joint position. At a corner the cut runs from the inner corner outwards until it meets
/// the limb's outer edge (yoke as high as the limb is wide or higher; the yoke keeps a straight end) or the yoke's outer edge (lower
/// yoke; the limb keeps a straight end). An inner limb has a 90° point, half its width deep, in a notch of the yoke.
/// </summary>
internal static class MitredPlates
{
    public static IReadOnlyList<CorePlate> Of(CoreFrame frame)
    {
        var plates = new List<CorePlate>();
        for (var k = 0; k < frame.Steps.Count; k++)
        {
            CheckNotches(frame, k);
            foreach (var kind in Enumerable.Range(0, frame.Layout.Limbs.Count).GroupBy(i => (Outer: frame.Layout.IsOuter(i), frame.Layout.Limbs[i].WidthShare)))
            {
                plates.Add(Limb(frame, k, kind.First(), kind.Count()));
            }

            plates.Add(Yoke(frame, k));
        }

        return plates;
    }

    private static CorePlate Limb(CoreFrame frame, int k, int limb, int pieces)
    {
        var step = frame.Steps[k];
        var (width, clear) = (frame.LimbWidth(limb, step), frame.ClearHeight(step));
        var volumeStack = pieces * frame.NetStack(step);
        if (!frame.Layout.IsOuter(limb))
        {
            return Plate(k, PlateShape.MiddleLimb, pieces, width, clear + width, clear, PlateOutlines.Pointed(clear, width), volumeStack);
        }

        var cut = Math.Min(width, step.YokeWidth_m);
        return Plate(k, PlateShape.OuterLimb, pieces, width, clear + (2 * cut), clear, PlateOutlines.Mitred(clear, width, cut), volumeStack);
    }

    private static CorePlate Yoke(CoreFrame frame, int k)
    {
        var step = frame.Steps[k];
        var last = frame.Axes.Length - 1;
        var height = step.YokeWidth_m;
        var inner = frame.LimbWidth(0, step) / 2;
        var span = frame.Axes[last] - inner - (frame.LimbWidth(last, step) / 2);
        var cut = Math.Min(frame.LimbWidth(0, step), height);
        var notches = Enumerable.Range(1, last - 1).Select(i => (frame.Axes[i] - inner, frame.LimbWidth(i, step))).ToArray();
        return Plate(k, PlateShape.Yoke, 2, height, span + (2 * cut), span, PlateOutlines.Mitred(span, height, cut, notches), 2 * frame.NetStack(step));
    }

    private static void CheckNotches(CoreFrame frame, int k)
    {
        var step = frame.Steps[k];
        for (var i = 1; i < frame.Axes.Length - 1; i++)
        {
            var depth = frame.LimbWidth(i, step) / 2;
            if (step.YokeWidth_m <= depth)
            {
                throw GeometryChecks.Refuse(
                    $"steps[{k}].yokeWidth_m",
                    step.YokeWidth_m,
                    FormattableString.Invariant($"above {depth:G9} m, half the limb width of this step"),
                    "The point of the middle limb would cut the yoke plate in two; take a higher yoke, a narrower limb or a butt-lap joint.");
            }
        }
    }

    private static CorePlate Plate(int k, PlateShape shape, int pieces, double width, double longSide, double shortSide, (double, double)[] outline, double netStack)
    {
        var area = PlateOutlines.Area(outline);
        return new(k + 1, shape, pieces, width, longSide, shortSide, outline, area, area * netStack);
    }
}
