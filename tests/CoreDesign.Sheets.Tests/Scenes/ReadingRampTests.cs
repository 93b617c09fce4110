using CoreDesign.Sheets.Scenes;

namespace CoreDesign.Sheets.Tests.Scenes;

public class ReadingRampTests
{
    [Fact]
    public void FigureOn_everyPlace_contrastsEnough()
    {
        for (var i = 0; i <= 1000; i++)
        {
            var place = i / 1000.0;
            var figure = InkColours.Of(ReadingRamp.FigureOn(place), Theme.Light)!.Value;
            Assert.True(figure.Contrast(ReadingRamp.At(place)) >= 4.5, $"at {place}: {figure.Contrast(ReadingRamp.At(place)):F2}");
        }
    }

    [Fact]
    public void At_risingPlace_getsDarker()
    {
        for (var i = 1; i <= 100; i++)
        {
            Assert.True(ReadingRamp.At(i / 100.0).Luminance < ReadingRamp.At((i - 1) / 100.0).Luminance);
        }
    }

    // The two ends and the middle of the design's colour table.
    [Theory]
    [InlineData(0, "#ffecb2")]
    [InlineData(0.5, "#e27e3d")]
    [InlineData(1, "#892d42")]
    public void At_knownPlace_isTheDesignsColour(double place, string hex)
    {
        Rgb expected = Rgb.Parse(hex), got = ReadingRamp.At(place);
        Assert.True(Math.Abs(expected.R - got.R) <= 4 && Math.Abs(expected.G - got.G) <= 4 && Math.Abs(expected.B - got.B) <= 4, $"{got.Hex} for {hex}");
    }
}
