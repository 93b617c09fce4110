using CoreDesign.Estimating.Contracts;
using CoreDesign.Sheets.Drawings;
using CoreDesign.Sheets.Scenes;

namespace CoreDesign.Sheets.Tests.Drawings;

public class FrontTests
{
    private static readonly DrawingOptions Size = new() { Width = 640, Height = 490 };

    [Fact]
    public void Front_threeLimbs_drawsEveryPartToScale()
    {
        var r = StudyFixture.ThreeLimb().Estimate;
        var parts = Parts(CoreDrawing.Front(r, Reading.FluxDensity, Size));

        // 3 limbs, 4 yokes, 4 corners, 2 T zones.
        Assert.Equal(13, parts.Count);
        var scale = (parts.Max(p => p.Points.Max(q => q.X)) - parts.Min(p => p.Points.Min(q => q.X))) / r.Geometry.OverallWidth_mm;
        var height = parts.Max(p => p.Points.Max(q => q.Y)) - parts.Min(p => p.Points.Min(q => q.Y));
        Assert.Equal(r.Geometry.OverallHeight_mm * scale, height, 1e-6);
        var area = parts.Sum(p => (p.Points[2].X - p.Points[0].X) * (p.Points[2].Y - p.Points[0].Y));
        var g = r.Geometry;
        var steel = (g.OverallWidth_mm * g.OverallHeight_mm) - (2 * g.WindowWidth_mm * g.WindowHeight_mm);
        Assert.Equal(steel * scale * scale, area, 1e-6 * area);
    }

    [Fact]
    public void Front_twoLimbs_hasNoTZone()
    {
        var parts = Parts(CoreDrawing.Front(StudyFixture.SinglePhase().Estimate, Reading.LossDensity, Size));
        Assert.Equal(8, parts.Count);
        Assert.DoesNotContain(parts, p => p.Label!.StartsWith("T zone", StringComparison.Ordinal));
    }

    [Fact]
    public void Front_reading_standsInEachPart()
    {
        var texts = TextExtent.Texts(CoreDrawing.Front(StudyFixture.ThreeLimb().Estimate, Reading.FluxDensity, Size).Marks).Where(t => t.Part == "fg").Select(t => t.Text).ToList();
        Assert.Equal(3, texts.Count(t => t == "1.69\u00A0T"));
        Assert.Equal(4, texts.Count(t => t == "1.61\u00A0T"));
        Assert.Equal(4, texts.Count(t => t == "1.58"));
        Assert.Equal(2, texts.Count(t => t == "1.52"));
    }

    [Fact]
    public void Front_typedDimension_isPlainAndDerivedInBrackets()
    {
        var r = StudyFixture.ThreeLimb().Estimate;
        Assert.Equal("520", Dimension(r, "core.windowHeight_mm"));
        Assert.Equal("190", Dimension(r, "core.windowWidth_mm"));
        Assert.Equal("(406)", Dimension(r, "core.limbPitch_mm"));
        var pitchTyped = r with { Derived = ["core.windowWidth_mm"] };
        Assert.Equal("406", Dimension(pitchTyped, "core.limbPitch_mm"));
        Assert.Equal("(190)", Dimension(pitchTyped, "core.windowWidth_mm"));
    }

    [Fact]
    public void Front_parentPathDerived_derivesItsFields()
    {
        var r = StudyFixture.ThreeLimb().Estimate with { Derived = ["core"] };
        Assert.Equal("(520)", Dimension(r, "core.windowHeight_mm"));
    }

    [Fact]
    public void Front_mitredJoint_drawsEachPosition()
    {
        var r = StudyFixture.SinglePhase().Estimate;
        var lines = CoreDrawing.Front(r, Reading.FluxDensity, Size).Marks.OfType<PathMark>().ToList();
        Assert.Equal(4 * r.Joint.Positions, lines.Count(l => l.Part == "jp"));
        Assert.All(lines.Where(l => l.Part is "jp" or "jc"), l => Assert.Equal(Math.Abs(l.Points[0].X - l.Points[1].X), Math.Abs(l.Points[0].Y - l.Points[1].Y), 1e-6));
    }

    [Fact]
    public void Front_positions_standApartByTheOverlap()
    {
        var r = StudyFixture.SinglePhase().Estimate;
        var scene = CoreDrawing.Front(r, Reading.FluxDensity, Size);
        var parts = Parts(scene);
        var scale = (parts.Max(p => p.Points.Max(q => q.X)) - parts.Min(p => p.Points.Min(q => q.X))) / r.Geometry.OverallWidth_mm;

        // Lines of the upper left corner fall to the right: x - y tells them apart, and is root two times their distance.
        var offsets = scene.Marks.OfType<PathMark>().Where(l => l.Part == "jp").Take(r.Joint.Positions).Select(l => (l.Points[0].X - l.Points[0].Y) / Math.Sqrt(2)).ToList();
        for (var i = 1; i < offsets.Count; i++)
        {
            Assert.Equal(r.Inputs.Joint!.Overlap_mm!.Value * scale, offsets[i] - offsets[i - 1], 1e-6);
        }
    }

    [Fact]
    public void Front_givenScale_isKept()
    {
        var r = StudyFixture.SinglePhase().Estimate;
        var parts = Parts(CoreDrawing.Front(r, Reading.FluxDensity, Size with { Scale = 0.5 }));
        Assert.Equal(0.5 * r.Geometry.OverallHeight_mm, parts.Max(p => p.Points.Max(q => q.Y)) - parts.Min(p => p.Points.Min(q => q.Y)), 1e-6);
        Assert.Contains("smaller scale", Assert.Throws<ArgumentException>(() => CoreDrawing.Front(r, Reading.FluxDensity, Size with { Scale = 5 })).Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Front_description_saysTheFigures()
    {
        var text = CoreDrawing.Front(StudyFixture.ThreeLimb().Estimate, Reading.FluxDensity, Size).Description;
        Assert.Contains("limbs 1.69\u00A0T", text, StringComparison.Ordinal);
        Assert.Contains("T zones 1.52\u00A0T", text, StringComparison.Ordinal);
        Assert.Contains("window 520\u00A0mm high", text, StringComparison.Ordinal);
    }

    [Fact]
    public void Front_partsListedOneByOne_eachFindsItsOwn()
    {
        var r = StudyFixture.ThreeLimb().Estimate;
        PartResult limb = r.Parts.First(p => p.Kind == "limb"), yoke = r.Parts.First(p => p.Kind == "yoke");
        r = r with
        {
            Parts =
            [
                limb with { Name = "limbC", PeakFluxDensity_T = 1.63 }, limb with { Name = "limbA", PeakFluxDensity_T = 1.61 }, limb with { Name = "limbB", PeakFluxDensity_T = 1.62 },
                yoke with { Name = "yokeBCBottom", PeakFluxDensity_T = 1.44, Count = 1 }, yoke with { Name = "yokeABTop", PeakFluxDensity_T = 1.41, Count = 1 },
                yoke with { Name = "yokeABBottom", PeakFluxDensity_T = 1.42, Count = 1 }, yoke with { Name = "yokeBCTop", PeakFluxDensity_T = 1.43, Count = 1 },
            ],
        };
        var texts = TextExtent.Texts(CoreDrawing.Front(r, Reading.FluxDensity, Size).Marks).Where(t => t.Part == "fg").ToList();
        Assert.Equal(["1.61\u00A0T", "1.62\u00A0T", "1.63\u00A0T"], texts.Where(t => t.Text.StartsWith("1.6", StringComparison.Ordinal)).OrderBy(t => t.At.X).Select(t => t.Text));
        Assert.Equal(["1.41\u00A0T", "1.42\u00A0T", "1.43\u00A0T", "1.44\u00A0T"], texts.Where(t => t.Text.StartsWith("1.4", StringComparison.Ordinal)).OrderBy(t => t.At.X).ThenBy(t => t.At.Y).Select(t => t.Text));
    }

    [Fact]
    public void Front_margin_isDarkWhereItIsSmall()
    {
        var span = Readings.Span(StudyFixture.ThreeLimb().Estimate, Reading.Margin);
        Assert.True(span.Place(5) > span.Place(20));
        Assert.Equal(100 * (2.03 - 1.69) / 2.03, Readings.Value(StudyFixture.ThreeLimb().Estimate, StudyFixture.ThreeLimb().Estimate.Parts[0], Reading.Margin)!.Value, 1e-9);
    }

    [Theory]
    [InlineData(79, 400)]
    [InlineData(400, double.NaN)]
    [InlineData(1e308, 400)]
    public void Front_impossibleSize_isRefused(double width, double height) =>
        Assert.Throws<ArgumentOutOfRangeException>(() => CoreDrawing.Front(StudyFixture.ThreeLimb().Estimate, Reading.FluxDensity, new DrawingOptions { Width = width, Height = height }));

    private static List<PathMark> Parts(Scene scene) => [.. scene.Marks.OfType<PathMark>().Where(p => p.Part == "pt")];

    private static string Dimension(EstimateResult r, string field) =>
        TextExtent.Texts(Layout.Groups(CoreDrawing.Front(r, Reading.FluxDensity, Size)).Single(g => g.FieldKey == field).Marks).Single().Text;
}
