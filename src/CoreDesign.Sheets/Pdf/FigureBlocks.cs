using CoreDesign.Sheets.Scenes;

namespace CoreDesign.Sheets.Pdf;

/// <summary>A drawing or chart at a fixed scale, centred in its width, or with <paramref name="Scale"/> null as wide as there is room.</summary>
internal sealed record FigureBlock(Scene Scene, double? Scale = null) : Block
{
    public override IEnumerable<Strip> Strips(double width)
    {
        var scale = Scale ?? width / Scene.Width;
        yield return new Strip(Scene.Height * scale, (canvas, x, y) =>
            PdfScenePainter.Paint(canvas, Scene, x + Math.Max(0, (width - (Scene.Width * scale)) / 2), y, scale))
        { Gap = 3 };
    }
}

/// <summary>Stacks of blocks side by side that never part; the shares say how the width is divided.</summary>
internal sealed record Columns(IReadOnlyList<(double Share, IReadOnlyList<Block> Blocks)> Stacks) : Block
{
    private const double Gutter = 16;

    /// <summary>Name among the bookmarks; without one, the names of the sections inside, if any.</summary>
    public string? Bookmark { get; init; }

    public Columns(params Block[][] stacks)
        : this([.. stacks.Select(s => (1.0, (IReadOnlyList<Block>)s))])
    {
    }

    public override IEnumerable<Strip> Strips(double width)
    {
        var room = width - ((Stacks.Count - 1) * Gutter);
        var total = Stacks.Sum(s => s.Share);
        var lefts = new List<double>();
        var placed = new List<IReadOnlyList<PlacedStrip>>();
        double left = 0, height = 0;
        foreach (var (share, blocks) in Stacks)
        {
            var own = room * share / total;
            var (strips, bottom) = SheetFlow.Stack(blocks, own);
            lefts.Add(left);
            placed.Add(strips);
            left += own + Gutter;
            height = Math.Max(height, bottom);
        }

        var names = string.Join(", ", placed.SelectMany(p => p).Select(p => p.Strip.Bookmark).Where(b => b is not null));
        yield return new Strip(height, (canvas, x, y) =>
        {
            for (var i = 0; i < placed.Count; i++)
            {
                SheetFlow.Paint(canvas, placed[i], x + lefts[i], y);
            }
        })
        {
            Gap = 9,
            Bookmark = Bookmark ?? (names.Length > 0 ? names : null),
        };
    }
}

/// <summary>What follows begins a page.</summary>
internal sealed record PageBreak : Block
{
    public static readonly Strip Mark = new(0, static (_, _, _) => { });

    public override IEnumerable<Strip> Strips(double width)
    {
        yield return Mark;
    }
}
