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
        var free = top;
        foreach (var callout in callouts.OrderBy(c => c.Target.Y))
        {
            var height = (callout.Lines.Count * line) + 4;
            var y = Math.Max(callout.Target.Y - line, free);
            if (y + height > bottom)
            {
                y = bottom - height;
            }

            var knee = new XY(x - 10, y + (o.TextSize * 0.5));
            if (y < free || taken.Any(b => b.Meets(callout.Target, knee)))
            {
                continue;
            }

            free = y + height;
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
