using CoreDesign.Sheets.Scenes;

namespace CoreDesign.Sheets.Drawings;

/// <summary>A note beside the drawing with a leader to what it is about. First line bold.</summary>
internal sealed record Callout(IReadOnlyList<string> Lines, XY Target, bool Dot)
{
    public double Width(DrawingOptions o) => Lines.Select((l, i) => TextExtent.Width(l, o.TextSize, i == 0)).Max();
}

/// <summary>Stacks notes in one column at the height of their targets, none on another; a leader that would run through a figure drops its note.</summary>
internal static class Callouts
{
    public static IEnumerable<Mark> Place(IEnumerable<Callout> callouts, double x, double top, double bottom, DrawingOptions o, IReadOnlyList<Box> taken)
    {
        var line = o.TextSize + 3;
        var sorted = callouts.OrderBy(c => c.Target.Y).ToList();
        double Height(Callout c) => (c.Lines.Count * line) + 4;

        // Down from the top, each at its target or under the one before; then up again from the foot, so that all find room.
        while (sorted.Sum(Height) > bottom - top && sorted.Count > 0)
        {
            sorted.RemoveAt(sorted.Count - 1);
        }

        var ys = new double[sorted.Count];
        for (var i = 0; i < ys.Length; i++)
        {
            ys[i] = Math.Max(sorted[i].Target.Y - line, i == 0 ? top : ys[i - 1] + Height(sorted[i - 1]));
        }

        for (var i = ys.Length - 1; i >= 0; i--)
        {
            ys[i] = Math.Min(ys[i], (i == ys.Length - 1 ? bottom : ys[i + 1]) - Height(sorted[i]));
        }

        for (var n = 0; n < ys.Length; n++)
        {
            var (callout, y) = (sorted[n], ys[n]);
            var knee = new XY(x - 10, y + (o.TextSize * 0.5));
            if (taken.Any(b => b.Meets(callout.Target, knee)))
            {
                continue;
            }

            var marks = new List<Mark> { new PathMark([callout.Target, knee, new(x - 4, knee.Y)], false, Paint.None, Ink.Ink3, 0.75) };
            if (callout.Dot)
            {
                marks.Add(new CircleMark(callout.Target, 1.75, Ink.Black, Paint.None));
            }

            for (var i = 0; i < callout.Lines.Count; i++)
            {
                marks.Add(new TextMark(new(x, y + (o.TextSize * 0.85) + (i * line)), callout.Lines[i], o.TextSize, Anchor.Start, i == 0 ? Ink.Ink : Ink.Ink2, Bold: i == 0));
            }

            yield return new GroupMark(marks) { Part = "note" };
        }
    }
}
