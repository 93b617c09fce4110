using System.Globalization;
using System.Xml.Linq;
using CoreDesign.Sheets.Drawings;
using CoreDesign.Sheets.Scenes;
using CoreDesign.Sheets.Svg;

namespace CoreDesign.Sheets.Tests.Svg;

public class SvgWriterTests
{
    private static readonly XNamespace Ns = "http://www.w3.org/2000/svg";
    private const string Hostile = "</text><script>alert(1)</script> \" ' & \u0001 \uD800 é 漢";

    [Fact]
    public void Write_hostileText_staysText()
    {
        var scene = new Scene(100, 100, Hostile, Hostile,
        [
            new TextMark(new(1, 1), Hostile, 10, Anchor.Start, Ink.Ink) { Part = Hostile },
            new GroupMark([new CircleMark(new(1, 1), 2, Ink.Ink, Paint.None) { Label = Hostile }]) { FieldKey = Hostile, Label = Hostile, Hit = [new(0, 0), new(1, 1)] },
        ]);
        var root = XDocument.Parse(SvgWriter.Write(scene, new SvgOptions { Id = "a" })).Root!;
        Assert.Empty(root.Descendants(Ns + "script"));
        var seen = Hostile.Replace('\u0001', '\uFFFD').Replace('\uD800', '\uFFFD');
        Assert.Equal(seen, root.Element(Ns + "text")!.Value);
        Assert.Equal(seen, root.Element(Ns + "title")!.Value);
        Assert.Equal(seen, root.Element(Ns + "g")!.Attribute("data-field")!.Value);
    }

    [Fact]
    public void Write_inline_namesItselfAndUsesVariables()
    {
        var svg = SvgWriter.Write(Front(), new SvgOptions { Id = "core-1" });
        var root = XDocument.Parse(svg).Root!;
        Assert.Equal("img", root.Attribute("role")!.Value);
        Assert.Equal("core-1-t core-1-d", root.Attribute("aria-labelledby")!.Value);
        Assert.Equal("core-1-t", root.Element(Ns + "title")!.Attribute("id")!.Value);
        Assert.Equal("core-1-d", root.Element(Ns + "desc")!.Attribute("id")!.Value);
        Assert.Contains("var(--accent)", svg, StringComparison.Ordinal);
        Assert.DoesNotContain("style=", svg, StringComparison.Ordinal);
        Assert.Contains(root.Descendants(Ns + "text"), t => t.Attribute("class")!.Value == "dt ink-accent");
    }

    [Fact]
    public void Write_fieldGroups_havePressLines()
    {
        var groups = XDocument.Parse(SvgWriter.Write(Front(), new SvgOptions())).Root!.Descendants(Ns + "g").Where(g => g.Attribute("data-field") is not null).ToList();
        var keys = groups.Select(g => g.Attribute("data-field")!.Value).ToList();
        Assert.Contains("core.windowHeight_mm", keys);
        Assert.Contains("core.windowWidth_mm", keys);
        Assert.Contains("core.yoke.areaFactor", keys);
        Assert.All(groups, g =>
        {
            Assert.StartsWith("dim", g.Attribute("class")!.Value, StringComparison.Ordinal);
            var hit = Assert.Single(g.Elements(Ns + "path"), p => p.Attribute("class")!.Value == "hit");
            Assert.Equal("24", hit.Attribute("stroke-width")!.Value);
            Assert.Equal("transparent", hit.Attribute("stroke")!.Value);
        });
    }

    [Theory]
    [InlineData(Theme.Light)]
    [InlineData(Theme.Dark)]
    public void Write_standalone_needsNoStyleSheet(Theme theme)
    {
        var svg = SvgWriter.Write(Front(), new SvgOptions { Standalone = true, Theme = theme });
        Assert.DoesNotContain("var(", svg, StringComparison.Ordinal);
        Assert.DoesNotContain("class=\"hit\"", svg, StringComparison.Ordinal);
        Assert.Contains("IBM Plex Sans", svg, StringComparison.Ordinal);
        Assert.Contains(InkColours.Of(Ink.Accent, theme)!.Value.Hex, svg, StringComparison.Ordinal);
        XDocument.Parse(svg);
    }

    [Fact]
    public void Write_commaCulture_writesPoints()
    {
        var before = SvgWriter.Write(Front(), new SvgOptions());
        var culture = (CultureInfo)CultureInfo.InvariantCulture.Clone();
        culture.NumberFormat.NumberDecimalSeparator = ",";
        culture.NumberFormat.NegativeSign = "~";
        var old = CultureInfo.CurrentCulture;
        try
        {
            CultureInfo.CurrentCulture = culture;
            Assert.Equal(before, SvgWriter.Write(Front(), new SvgOptions()));
        }
        finally
        {
            CultureInfo.CurrentCulture = old;
        }
    }

    [Fact]
    public void Write_notFiniteCoordinate_isRefused()
    {
        var scene = new Scene(10, 10, "t", "d", [new CircleMark(new(double.NaN, 0), 1, Ink.Ink, Paint.None)]);
        Assert.Contains("NaN", Assert.Throws<ArgumentException>(() => SvgWriter.Write(scene, new SvgOptions())).Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Write_idWithMarkup_isRefused() => Assert.Throws<ArgumentException>(() => SvgWriter.Write(Front(), new SvgOptions { Id = "a\" onload=\"x" }));

    [Fact]
    public void Write_decorative_isHiddenFromReaders()
    {
        var root = XDocument.Parse(SvgWriter.Write(Front(), new SvgOptions { Decorative = true })).Root!;
        Assert.Equal("true", root.Attribute("aria-hidden")!.Value);
        Assert.Null(root.Attribute("role"));
    }

    private static Scene Front() => CoreDrawing.Front(StudyFixture.ThreeLimb().Estimate, Reading.FluxDensity, new DrawingOptions());
}
