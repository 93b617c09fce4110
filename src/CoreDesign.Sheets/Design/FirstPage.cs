using CoreDesign.Estimating.Contracts;
using CoreDesign.Sheets.Drawings;
using CoreDesign.Sheets.Pdf;
using CoreDesign.Sheets.Scenes;

namespace CoreDesign.Sheets.Design;

/// <summary>
/// The drawing page: front view truly to scale at the largest standard scale that fits, section, joint detail, and the
/// summary. Where the section would cost the front view a scale it moves to the second page.
/// </summary>
internal sealed class FirstPage
{
    /// <summary>Reduction scales of ISO 5455.</summary>
    private static readonly int[] Scales = [1, 2, 5, 10, 20, 50, 100, 200, 500, 1000];

    private const Reading Shown = Reading.FluxDensity;
    private const double SectionHeight = 150;
    private readonly EstimateResult _e;
    private readonly double _width;
    private readonly double _height;

    public FirstPage(EstimateResult e, PaperSize paper)
    {
        _e = e;
        _width = SheetDocument.ContentWidth(paper);
        _height = SheetDocument.FirstPageHeight(paper);
        Block[] below = [Scale(), SummaryTables.All(e), .. RestBlocks.Standing(e)];
        var details = Details(out var sectionScale);
        SectionScale = sectionScale;
        var alone = Front(_height - Taken(below)) ?? throw new InvalidOperationException("The front view fits at no scale.");
        var together = Front(_height - Taken([details, .. below]));
        FrontScale = alone.Scale;
        Blocks = together is { } t && t.Scale == alone.Scale
            ? [t.Figure, below[0], details, .. below[1..], new PageBreak()]
            : [alone.Figure, .. below, new PageBreak(), details];
    }

    public IReadOnlyList<Block> Blocks { get; }

    /// <summary>n of the scale 1:n.</summary>
    public int FrontScale { get; }

    public int SectionScale { get; }

    private static DrawingOptions Options(double width, double height, int? scale = null) => new()
    {
        Width = width,
        Height = height,
        TextSize = 7,
        DimensionSize = 7.5,
        FigureSize = 8,
        Scale = scale is { } n ? Paper.Mm / n : null,
        Pressable = false,
    };

    private double Taken(IReadOnlyList<Block> blocks) => SheetFlow.Stack([new FigureBlock(Empty), .. blocks], _width).Height;

    private static Scene Empty => new(1, 1e-9, "", "", []);

    private (Block Figure, int Scale)? Front(double height)
    {
        // Without its dimensions the view would be no drawing.
        if (!Options(_width, height).HasRoom)
        {
            return null;
        }

        foreach (var n in Scales)
        {
            // Cheap test first; then the drawing itself knows how much room its dimensions need.
            if (_e.Geometry.OverallWidth_mm * Paper.Mm / n > _width || _e.Geometry.OverallHeight_mm * Paper.Mm / n > height)
            {
                continue;
            }

            try
            {
                return (new FigureBlock(CoreDrawing.Front(_e, Shown, Options(_width, height, n)), 1), n);
            }
            catch (ArgumentException)
            {
                // The dimensions don't fit around the view at this scale: take the next.
            }
        }

        return null;
    }

    private Columns Details(out int scale)
    {
        double room = _width - 16, half = 0.54 * room;
        scale = Scales.First(n => (_e.Geometry.CircleDiameter_mm * Paper.Mm / n) + 14 <= Math.Min(SectionHeight, half * 0.58));
        var section = CoreDrawing.Section(_e, Shown, Options(half, SectionHeight, scale));
        var joint = CoreDrawing.JointDetail(_e, Options(room - half, 110));
        return new Columns([
            (54, [new Heading($"Limb section S–S, 1:{scale}", false), new FigureBlock(section, 1)]),
            (46, [new Heading("Joint detail Z, not to scale", false), new FigureBlock(joint, 1)])])
        { Bookmark = "Section and joint" };
    }

    private Columns Scale()
    {
        var scale = CoreDrawing.ReadingScale(_e, Shown, 230, 7);
        return new Columns([
            (_width - 230 - 16, [new Paragraph("Colour and figures: peak flux density in the parts, T", TypeScale.Label)]),
            (230, [new FigureBlock(scale, 1)])]);
    }
}
