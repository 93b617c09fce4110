using CoreDesign.Estimating.Contracts;
using CoreDesign.Sheets.Drawings;
using CoreDesign.Sheets.Svg;

namespace CoreDesign.Web.Features.Design;

/// <summary>
/// The drawing as markup for one width of the page; painted again only when answer, reading or size changed. Text keeps its size, because the scene is
/// made for the very width that it is shown at.
/// </summary>
public sealed class DrawingScenes
{
    private (EstimateResult, Reading, int, int) painted;

    /// <summary>Until the browser says how wide the column is.</summary>
    public (int Width, int Height) Size { get; private set; } = (652, 640);

    public string Front { get; private set; } = "";
    public string Section { get; private set; } = "";
    public string Joint { get; private set; } = "";
    public string Scale { get; private set; } = "";

    /// <summary>The small front view that stays in sight beside the evidence.</summary>
    public string Small { get; private set; } = "";

    /// <summary>Takes the space of the drawing's column; true where the drawing has to be painted again.</summary>
    public bool Fit(int width, int height)
    {
        var size = (Math.Clamp(width, 280, 1600), Math.Clamp(height, 420, 1200));
        if (size == Size)
        {
            return false;
        }

        Size = size;
        return true;
    }

    public void Paint(EstimateResult estimate, Reading reading)
    {
        var wanted = (estimate, reading, Size.Width, Size.Height);
        if (ReferenceEquals(painted.Item1, estimate) && painted == wanted)
        {
            return;
        }

        painted = wanted;
        var narrow = Size.Width < 480;
        var foot = 148;
        var front = new DrawingOptions { Width = Size.Width, Height = Math.Max(280, Size.Height - foot) };
        var half = narrow ? Size.Width : Math.Round(Size.Width * 0.46);
        var part = new DrawingOptions { Width = half, Height = foot };
        Front = Write(CoreDrawing.Front(estimate, reading, front), "core-front");
        Section = Write(CoreDrawing.Section(estimate, reading, part), "core-section");
        Joint = Write(CoreDrawing.JointDetail(estimate, part with { Width = narrow ? Size.Width : Size.Width - half - 16 }), "core-joint");
        Scale = Write(CoreDrawing.ReadingScale(estimate, reading), "core-scale");
        Small = SvgWriter.Write(CoreDrawing.Front(estimate, reading, new DrawingOptions { Width = 168, Height = 96, Pressable = false }), new SvgOptions { Id = "core-small", Decorative = true });
    }

    private static string Write(CoreDesign.Sheets.Scenes.Scene scene, string id) => SvgWriter.Write(scene, new SvgOptions { Id = id, Class = "core" });
}
