namespace CoreDesign.Sheets.Pdf;

/// <summary>First pass: blocks to strips, strips to pages. Painting is the second, when the number of pages is known.</summary>
internal static class SheetFlow
{
    /// <summary>Pages of placed strips; <paramref name="heightOfPage"/> gives the room on a page (counted from 0).</summary>
    public static IReadOnlyList<IReadOnlyList<PlacedStrip>> Pages(IEnumerable<Block> blocks, double width, Func<int, double> heightOfPage)
    {
        var strips = blocks.SelectMany(b => b.Strips(width)).ToList();
        var pages = new List<List<PlacedStrip>> { new() };
        double y = 0;
        StripGroup? open = null;
        for (var i = 0; i < strips.Count; i++)
        {
            if (ReferenceEquals(strips[i], PageBreak.Mark))
            {
                if (pages[^1].Count > 0)
                {
                    Turn();
                }

                continue;
            }

            if (pages[^1].Count > 0 && y + Needed(strips, i, open) > heightOfPage(pages.Count - 1))
            {
                Turn();
            }

            Place(pages[^1], strips[i], ref y, ref open);
        }

        return pages;

        void Turn()
        {
            pages.Add([]);
            y = 0;
            open = null;
        }
    }

    /// <summary>Blocks below one another without any page; returns the height that they take.</summary>
    public static (IReadOnlyList<PlacedStrip> Strips, double Height) Stack(IEnumerable<Block> blocks, double width)
    {
        var placed = new List<PlacedStrip>();
        double y = 0;
        StripGroup? open = null;
        foreach (var strip in blocks.SelectMany(b => b.Strips(width)))
        {
            Place(placed, strip, ref y, ref open);
        }

        return (placed, y);
    }

    /// <summary>Paints strips relative to a point; strips of one group stand under one tag.</summary>
    public static void Paint(SheetCanvas canvas, IReadOnlyList<PlacedStrip> strips, double x, double y)
    {
        StripGroup? open = null;
        foreach (var placed in strips)
        {
            if (!ReferenceEquals(placed.Strip.Group, open))
            {
                if (open is not null)
                {
                    canvas.End();
                }

                open = placed.Strip.Group;
                if (open is not null)
                {
                    canvas.Begin(open.Tag);
                }
            }

            placed.Strip.Paint(canvas, x + placed.X, y + placed.Y);
        }

        if (open is not null)
        {
            canvas.End();
        }
    }

    private static void Place(List<PlacedStrip> page, Strip strip, ref double y, ref StripGroup? open)
    {
        if (page.Count > 0)
        {
            y += strip.Gap;
        }

        if (strip.Group is not null && !ReferenceEquals(strip.Group, open) && strip.Group.Head is { } head)
        {
            page.Add(new PlacedStrip(head with { Group = strip.Group }, 0, y));
            y += head.Height;
        }

        open = strip.Group;
        page.Add(new PlacedStrip(strip, 0, y));
        y += strip.Height;
    }

    /// <summary>Height of a strip with all that it must not be parted from: its table's head, and what follows a heading.</summary>
    private static double Needed(List<Strip> strips, int index, StripGroup? open)
    {
        double needed = 0;
        for (var i = index; i < strips.Count; i++)
        {
            var strip = strips[i];
            var head = strip.Group is not null && !ReferenceEquals(strip.Group, open) ? strip.Group.Head?.Height ?? 0 : 0;
            needed += strip.Gap + head + strip.Height;
            open = strip.Group;
            if (!strip.KeepWithNext)
            {
                break;
            }
        }

        return needed;
    }
}
