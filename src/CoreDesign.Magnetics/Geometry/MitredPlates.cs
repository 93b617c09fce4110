namespace CoreDesign.Magnetics.Geometry;

/// <summary>
/// Plates of a core with 45° joints, at the middle joint position. At a corner the cut runs from the inner corner outwards until it meets
/// the limb's outer edge (yoke as high as the limb is wide or higher; the yoke keeps a straight end) or the yoke's outer edge (lower
/// yoke; the limb keeps a straight end). An inner limb has a 90° point, half its width deep, in a notch of the yoke; a yoke not higher than the
/// point is made of plates that the limb parts, the point cut flat at the yoke's outer edge.
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

            plates.AddRange(Yokes(frame, k));
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
            var tip = frame.PartsYoke(limb, step) ? Math.Min(width / 2, step.YokeWidth_m) : width / 2;
            return Plate(k, PlateShape.MiddleLimb, pieces, width, clear + (2 * tip), clear, PlateOutlines.Pointed(clear, width, tip), volumeStack);
        }

        var cut = Math.Min(width, step.YokeWidth_m);
        return Plate(k, PlateShape.OuterLimb, pieces, width, clear + (2 * cut), clear, PlateOutlines.Mitred(clear, width, cut, cut), volumeStack);
    }

    /// <summary>The plates of both yokes, from limb to limb where the yoke is parted; a plate and its mirror image are one kind.</summary>
    private static IEnumerable<CorePlate> Yokes(CoreFrame frame, int k)
    {
        var step = frame.Steps[k];
        var last = frame.Axes.Length - 1;
        int[] ends = [0, .. Enumerable.Range(1, last - 1).Where(i => frame.PartsYoke(i, step)), last];
        var spans = ends.Zip(ends.Skip(1)).Select(e => (From: e.First, To: e.Second)).ToList();
        foreach (var (from, to) in spans.Where(s => s.From + s.To <= last))
        {
            // The row of limbs is alike on both sides, so the span that mirrors this one is a turned plate of the same kind.
            var pieces = 2 * (from + to == last ? 1 : 2);
            yield return Yoke(frame, k, from, to, pieces);
        }
    }

    private static CorePlate Yoke(CoreFrame frame, int k, int from, int to, int pieces)
    {
        var step = frame.Steps[k];
        var height = step.YokeWidth_m;
        var start = frame.Axes[from] + (frame.LimbWidth(from, step) / 2);
        var span = frame.Axes[to] - (frame.LimbWidth(to, step) / 2) - start;
        double left = Math.Min(height, Cut(from)), right = Math.Min(height, Cut(to));
        var notches = Enumerable.Range(from + 1, to - from - 1).Select(i => (frame.Axes[i] - start, frame.LimbWidth(i, step))).ToArray();
        return Plate(k, PlateShape.Yoke, pieces, height, span + left + right, span, PlateOutlines.Mitred(span, height, left, right, notches), pieces * frame.NetStack(step));

        // At a corner the cut ends at the limb's outer edge, at a parting limb at the yoke's outer edge or at the limb's axis, where the plates meet.
        double Cut(int limb) => frame.LimbWidth(limb, step) / (frame.Layout.IsOuter(limb) ? 1 : 2);
    }

    private static void CheckNotches(CoreFrame frame, int k)
    {
        if (frame.Layout.Form != CoreForm.ThreeLimb)
        {
            return;
        }

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
