using CoreDesign.Sheets.Scenes;

namespace CoreDesign.Sheets.Tests.Scenes;

public class TextExtentTests
{
    // Figures of the face are all 0.6 of the size wide (read from the font file).
    [Fact]
    public void Width_figures_areTabular() => Assert.Equal(4 * 0.6 * 12, TextExtent.Width("1024", 12), 1e-9);

    [Fact]
    public void Of_anchors_shiftTheBox()
    {
        TextMark Text(Anchor anchor, double angle = 0) => new(new(100, 50), "1234", 10, anchor, Ink.Ink, Angle: angle);
        Assert.Equal(100, TextExtent.Of(Text(Anchor.Start)).X, 1e-9);
        Assert.Equal(100, TextExtent.Of(Text(Anchor.End)).Right, 1e-9);
        Assert.Equal(100, TextExtent.Of(Text(Anchor.Middle)).Centre.X, 1e-9);
        Assert.Equal(50, TextExtent.Of(Text(Anchor.Start, 90)).Bottom, 1e-9);
        Assert.Equal(50, TextExtent.Of(Text(Anchor.End, 90)).Y, 1e-9);
        Assert.Equal(24, TextExtent.Of(Text(Anchor.Middle, 90)).Height, 1e-9);
    }

    [Fact]
    public void Clip_line_keepsThePartInside()
    {
        var box = new Box(0, 0, 10, 10);
        Assert.Equal((new XY(0, 5), new XY(10, 5)), box.Clip(new(-5, 5), new(15, 5)));
        Assert.Null(box.Clip(new(-5, 11), new(15, 11)));
        Assert.False(box.Meets(new(-5, 0), new(0, -5)));
    }
}
