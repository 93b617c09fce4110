namespace CoreDesign.Magnetics.Geometry;

/// <summary>Step sets of a limb that fill a circle best. A step of width w reaches a total stack of sqrt(d² − w²), both sides together.</summary>
public static class StepOptimizer
{
    /// <summary>Most widths that a slitting list can have.</summary>
    public const int MostStockWidths = GeometryChecks.MostStockWidths;

    /// <summary>Most steps that <see cref="Best"/> is checked for.</summary>
    public const int MostOptimumSteps = 25;

    /// <summary>
    /// The exact optimum of <paramref name="steps"/> (1 to 25) free widths in a circle of <paramref name="diameter_m"/>.
    /// With widths u_i and total stacks v_i in diameters (u² + v² = 1) the area is Σ u_i (v_i − v_(i−1)); setting its derivative to
    /// zero gives the chain u_(i+1) = u_i − v_i (v_i − v_(i−1)) / u_i, which must end in u_(n+1) = 0 (own derivation). A wider first step ends
    /// the chain higher, so the first width is bracketed and halved down to the last bit.
    /// </summary>
    /// <exception cref="GeometryException">Diameter or number of steps out of range.</exception>
    public static StepSet Best(double diameter_m, int steps)
    {
        GeometryChecks.Length("diameter_m", diameter_m, "Give the diameter of the limb circle.");
        GeometryChecks.Range("steps", steps, 1, MostOptimumSteps, "steps", "More steps gain nothing worth a slitting width.");
        var u = new double[steps];
        double low = 0.5, high = 1;
        for (var mid = 0.75; low < mid && mid < high; mid = 0.5 * (low + high))
        {
            if (ChainEnd(mid, u) > 0)
            {
                high = mid;
            }
            else
            {
                low = mid;
            }
        }

        // The upper bracket is the side on which the chain is known to reach its last step.
        ChainEnd(high, u);
        return Section(diameter_m, [.. u.Select(w => w * diameter_m)]);
    }

    /// <summary>
    /// The best set of at most <paramref name="steps"/> of the <paramref name="stockWidths_m"/> in a circle of <paramref name="diameter_m"/>; null takes
    /// every width, because each one more adds area. Exact, by dynamic programming over the narrowest width chosen so far:
    /// F_k(j) = max over wider i of F_(k−1)(i) + w_j (h_j − h_i). A width listed twice counts once.
    /// </summary>
    /// <exception cref="GeometryException">
    /// Diameter, number of steps or a width out of range; a width not below the diameter is refused by name (see <see cref="Within"/>).
    /// </exception>
    public static StepSet BestFromStock(double diameter_m, IReadOnlyList<double> stockWidths_m, int? steps)
    {
        CheckStock(stockWidths_m, steps);
        GeometryChecks.Length("diameter_m", diameter_m, "Give the diameter of the limb circle.");
        for (var i = 0; i < stockWidths_m.Count; i++)
        {
            if (stockWidths_m[i] >= diameter_m)
            {
                throw GeometryChecks.Refuse(
                    $"stockWidths_m[{i}]",
                    stockWidths_m[i],
                    FormattableString.Invariant($"below the circle's diameter of {diameter_m:G9} m"),
                    "Leave this width out or take a larger diameter.");
            }
        }

        return FromStock(diameter_m, stockWidths_m, steps);
    }

    /// <summary>The widths of a slitting list that fit into a circle, widest first, each once.</summary>
    public static IReadOnlyList<double> Within(double diameter_m, IReadOnlyList<double> stockWidths_m)
    {
        ArgumentNullException.ThrowIfNull(stockWidths_m);
        return [.. stockWidths_m.Where(w => w < diameter_m).Distinct().OrderDescending()];
    }

    /// <summary>Diameter of the circle that just encloses a set of steps, from the widest outward: the largest corner distance sqrt(w² + stack so far²).</summary>
    /// <exception cref="GeometryException">Steps out of order or range.</exception>
    public static double CircleAround(IReadOnlyList<LimbStep> steps)
    {
        ArgumentNullException.ThrowIfNull(steps);
        GeometryChecks.LimbSteps(steps, "width_m");
        double stack = 0, square = 0;
        foreach (var s in steps)
        {
            stack += s.Stack_m;
            square = Math.Max(square, (s.Width_m * s.Width_m) + (stack * stack));
        }

        return Math.Sqrt(square);
    }

    internal static void CheckStock(IReadOnlyList<double> stockWidths_m, int? steps)
    {
        ArgumentNullException.ThrowIfNull(stockWidths_m);
        if (stockWidths_m.Count is < 1 or > GeometryChecks.MostStockWidths)
        {
            throw GeometryChecks.Refuse(
                "stockWidths_m",
                stockWidths_m.Count,
                FormattableString.Invariant($"1 to {GeometryChecks.MostStockWidths} widths"),
                "Give the widths that the works slits.");
        }

        for (var i = 0; i < stockWidths_m.Count; i++)
        {
            GeometryChecks.Length($"stockWidths_m[{i}]", stockWidths_m[i], "Give a plate width or leave the entry out.");
        }

        if (steps is { } n)
        {
            GeometryChecks.Range("steps", n, 1, GeometryChecks.MostSteps, "steps", "Leave it open to use every width.");
        }
    }

    /// <summary>As <see cref="BestFromStock"/>, for checked widths; those that don't fit into the circle are passed over.</summary>
    internal static StepSet FromStock(double diameter_m, IReadOnlyList<double> stockWidths_m, int? steps)
    {
        var w = Within(diameter_m, stockWidths_m);
        if (steps is not { } limit || limit >= w.Count)
        {
            return Section(diameter_m, w);
        }

        var h = w.Select(x => StackTo(diameter_m, x)).ToArray();
        var best = w.Select((x, j) => x * h[j]).ToArray();
        var wider = new int[limit, w.Count];
        for (var k = 1; k < limit; k++)
        {
            // From the narrowest up, so that best[i] of a wider i is still that of k steps.
            for (var j = w.Count - 1; j >= k; j--)
            {
                var (top, from) = (double.NegativeInfinity, -1);
                for (var i = k - 1; i < j; i++)
                {
                    var area = best[i] + (w[j] * (h[j] - h[i]));
                    if (area > top)
                    {
                        (top, from) = (area, i);
                    }
                }

                (best[j], wider[k, j]) = (top, from);
            }
        }

        // One more width always adds area, so the best set uses as many as it may.
        var last = limit - 1;
        for (var j = limit; j < w.Count; j++)
        {
            last = best[j] > best[last] ? j : last;
        }

        var chosen = new double[limit];
        for (var k = limit - 1; k >= 0; k--)
        {
            chosen[k] = w[last];
            last = wider[k, last];
        }

        return Section(diameter_m, chosen);
    }

    /// <summary>Fills <paramref name="u"/> with the chain from its first width and returns the width that would follow; −1 where it ends early.</summary>
    private static double ChainEnd(double first, double[] u)
    {
        double width = first, stackBefore = 0;
        for (var i = 0; i < u.Length; i++)
        {
            if (width <= 0)
            {
                return -1;
            }

            u[i] = width;
            var stack = Math.Sqrt((1 - width) * (1 + width));
            width -= stack * (stack - stackBefore) / width;
            stackBefore = stack;
        }

        return width;
    }

    private static StepSet Section(double diameter_m, IReadOnlyList<double> widths_m)
    {
        var steps = new LimbStep[widths_m.Count];
        double before = 0;
        for (var i = 0; i < steps.Length; i++)
        {
            var stack = StackTo(diameter_m, widths_m[i]);
            steps[i] = new(widths_m[i], stack - before);
            before = stack;
        }

        return StepSet.Of(steps, diameter_m);
    }

    private static double StackTo(double diameter_m, double width_m) => Math.Sqrt((diameter_m - width_m) * (diameter_m + width_m));
}
