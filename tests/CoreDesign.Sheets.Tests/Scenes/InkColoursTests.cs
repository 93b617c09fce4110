using CoreDesign.Sheets.Scenes;

namespace CoreDesign.Sheets.Tests.Scenes;

public class InkColoursTests
{
    // WCAG 2.2, success criteria 1.4.3 (text, 4.5 to 1) and 1.4.11 (parts of a control, 3 to 1).
    private static readonly Ink[] Grounds = [Ink.Paper, Ink.Surface, Ink.Sunk];

    [Theory]
    [InlineData(Theme.Light)]
    [InlineData(Theme.Dark)]
    [InlineData(Theme.Paper)]
    public void TextRole_everyGround_contrastsEnough(Theme theme)
    {
        foreach (var text in new[] { Ink.Ink, Ink.Ink2, Ink.Ink3, Ink.Accent, Ink.Bad })
        {
            foreach (var ground in Grounds)
            {
                Assert.True(Ratio(text, ground, theme) >= 4.5, $"{text} on {ground}, {theme}: {Ratio(text, ground, theme):F2}");
            }
        }
    }

    [Theory]
    [InlineData(Theme.Light)]
    [InlineData(Theme.Dark)]
    [InlineData(Theme.Paper)]
    public void Edge_everyGround_contrastsEnough(Theme theme)
    {
        foreach (var ground in new[] { Ink.Paper, Ink.Surface })
        {
            Assert.True(Ratio(Ink.Edge, ground, theme) >= 3, $"edge on {ground}, {theme}: {Ratio(Ink.Edge, ground, theme):F2}");
        }
    }

    [Fact]
    public void Of_everyRole_hasAColourInEveryTheme()
    {
        foreach (var role in Enum.GetValues<Ink>().Where(r => r != Ink.None))
        {
            foreach (var theme in Enum.GetValues<Theme>())
            {
                Assert.NotNull(InkColours.Of(role, theme));
            }
        }

        Assert.Null(InkColours.Of(Paint.None, Theme.Light));
    }

    [Fact]
    public void Contrast_blackOnWhite_isTwentyOne() => Assert.Equal(21, new Rgb(0, 0, 0).Contrast(new Rgb(255, 255, 255)), 1e-9);

    private static double Ratio(Ink a, Ink b, Theme theme) => InkColours.Of(a, theme)!.Value.Contrast(InkColours.Of(b, theme)!.Value);
}
