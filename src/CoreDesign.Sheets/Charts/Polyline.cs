using CoreDesign.Sheets.Scenes;

namespace CoreDesign.Sheets.Charts;

/// <summary>Curves in picture units: thinned without visible loss, and cut where they leave the plot.</summary>
internal static class Polyline
{
    /// <summary>Drops points that lie nearer than <paramref name="tolerance"/> to the line between their neighbours (Ramer, 1972; Douglas and Peucker, 1973).</summary>
    public static IReadOnlyList<XY> Thin(IReadOnlyList<XY> points, double tolerance = 0.08)
    {
        if (points.Count < 3)
        {
            return points;
        }

        var keep = new bool[points.Count];
        keep[0] = keep[^1] = true;
        var open = new Stack<(int From, int To)>();
        open.Push((0, points.Count - 1));
        while (open.TryPop(out var span))
        {
            var (worst, at) = (tolerance, -1);
            for (var i = span.From + 1; i < span.To; i++)
            {
                var d = Distance(points[i], points[span.From], points[span.To]);
                if (d > worst)
                {
                    (worst, at) = (d, i);
                }
            }

            if (at > 0)
            {
                keep[at] = true;
                open.Push((span.From, at));
                open.Push((at, span.To));
            }
        }

        return [.. points.Where((_, i) => keep[i])];
    }

    /// <summary>The pieces inside a box.</summary>
    public static IEnumerable<IReadOnlyList<XY>> Inside(IReadOnlyList<XY> points, Box box)
    {
        var piece = new List<XY>();
        for (var i = 1; i < points.Count; i++)
        {
            if (box.Clip(points[i - 1], points[i]) is not { } part)
            {
                continue;
            }

            if (piece.Count == 0 || piece[^1] != part.From)
            {
                if (piece.Count > 1)
                {
                    yield return piece;
                }

                piece = [part.From];
            }

            piece.Add(part.To);
        }

        if (piece.Count > 1)
        {
            yield return piece;
        }
    }

    private static double Distance(XY p, XY a, XY b)
    {
        double dx = b.X - a.X, dy = b.Y - a.Y, length = Math.Sqrt((dx * dx) + (dy * dy));
        return length < 1e-12
            ? Math.Sqrt(((p.X - a.X) * (p.X - a.X)) + ((p.Y - a.Y) * (p.Y - a.Y)))
            : Math.Abs((dx * (p.Y - a.Y)) - (dy * (p.X - a.X))) / length;
    }
}
