using CoreDesign.Sheets.Drawings;
using CoreDesign.Sheets.Scenes;

namespace CoreDesign.Sheets.Tests.Drawings;

public class DetailTests
{
    [Fact]
    public void Section_anySteps_keepsTextsApart()
    {
        foreach (var steps in Enumerable.Range(1, 16))
        {
            foreach (var diameter in new[] { 40.0, 220, 1234.5 })
            {
                foreach (var (w, h) in new[] { (290.0, 130.0), (200, 100), (460, 240), (120, 90), (900, 300) })
                {
                    var scene = CoreDrawing.Section(StudyFixture.ThreeLimb(steps, diameter).Estimate, Reading.LossDensity, new DrawingOptions { Width = w, Height = h });
                    Layout.HoldsApart(scene, $"{steps} steps, diameter {diameter}, {w} x {h}");
                }
            }
        }
    }

    [Fact]
    public void Section_steps_lieInTheCircleOneOutsideTheOther()
    {
        var r = StudyFixture.ThreeLimb().Estimate;
        var scene = CoreDrawing.Section(r, Reading.FluxDensity, new DrawingOptions { Width = 500, Height = 300 });
        var circle = scene.Marks.OfType<CircleMark>().Single(c => c.Part == "cc");
        var scale = 2 * circle.Radius / r.Geometry.CircleDiameter_mm;
        var plates = scene.Marks.OfType<PathMark>().Where(p => p.Part == "pt2").ToList();
        Assert.Equal(1 + (2 * (r.Geometry.LimbSteps.Count - 1)), plates.Count);
        Assert.All(plates.SelectMany(p => p.Points), p => Assert.True(Math.Sqrt(Math.Pow(p.X - circle.Centre.X, 2) + Math.Pow(p.Y - circle.Centre.Y, 2)) <= circle.Radius * 1.01));
        var area = plates.Sum(p => (p.Points[2].X - p.Points[0].X) * (p.Points[2].Y - p.Points[0].Y));
        Assert.Equal(r.Geometry.GrossArea_mm2 * scale * scale, area, 1e-6 * area);
    }

    [Fact]
    public void Section_shortTable_saysHowManyAreMissing()
    {
        var texts = TextExtent.Texts(CoreDrawing.Section(StudyFixture.ThreeLimb(16, 900).Estimate, Reading.FluxDensity, new DrawingOptions { Width = 290, Height = 130 }).Marks).Select(t => t.Text).ToList();
        var rows = texts.Count(t => int.TryParse(t, out var n) && n is >= 1 and <= 16);
        Assert.Contains($"and {16 - rows} more", texts);
    }

    [Fact]
    public void JointDetail_anyBook_keepsTextsApart()
    {
        foreach (var type in new[] { "stepLap", "mitredOverlap", "buttLap" })
        {
            foreach (var positions in new[] { 1, 2, 3, 5, 7, 20 })
            {
                foreach (var (sheets, overlap, gap) in new[] { (1, 4.0, 0.3), (3, 0.5, 2.0), (2, 25, 0.01), (1, 0, 0.5), (1, 3, 0) })
                {
                    foreach (var (w, h) in new[] { (316.0, 130.0), (200, 100), (120, 90), (700, 300) })
                    {
                        var r = StudyFixture.ThreeLimb().Estimate;
                        r = r with
                        {
                            Joint = r.Joint with { Type = type, Positions = positions, SheetsPerPosition = sheets },
                            Inputs = r.Inputs with { Joint = r.Inputs.Joint! with { Type = type, Gap_mm = gap, Overlap_mm = overlap } },
                        };
                        Layout.HoldsApart(CoreDrawing.JointDetail(r, new DrawingOptions { Width = w, Height = h }), $"{type} {positions} x {sheets}, overlap {overlap}, gap {gap}, {w} x {h}");
                    }
                }
            }
        }
    }

    [Fact]
    public void JointDetail_book_hasItsPositionsTwice()
    {
        var scene = CoreDrawing.JointDetail(StudyFixture.ThreeLimb().Estimate, new DrawingOptions { Width = 316, Height = 130 });
        var ends = scene.Marks.OfType<PathMark>().Where(p => p.Part == "sa").Select(p => Math.Round(p.Points[1].X, 6)).ToList();
        Assert.Equal(10, ends.Count);
        Assert.Equal(5, ends.Distinct().Count());
        Assert.Equal(ends.Take(5), ends.Skip(5));
        Assert.Equal(["joint.gap_mm", "joint.overlap_mm"], Layout.Groups(scene).Select(g => g.FieldKey).Order());
    }

    [Theory]
    [InlineData(Reading.FluxDensity)]
    [InlineData(Reading.LossDensity)]
    [InlineData(Reading.ExcitingPower)]
    [InlineData(Reading.Margin)]
    public void ReadingScale_anyWidth_keepsTextsApart(Reading reading)
    {
        foreach (var factor in new[] { 1e-3, 1.0, 1e4 })
        {
            var r = StudyFixture.ThreeLimb().Estimate;
            r = r with { Parts = [.. r.Parts.Select(p => p with { Loss_W = p.Loss_W * factor, ExcitingPower_VA = p.ExcitingPower_VA * factor, PeakFluxDensity_T = Math.Min(p.PeakFluxDensity_T * factor, 2.6) })] };
            foreach (var width in new[] { 120, 160, 232, 600 })
            {
                Layout.HoldsApart(CoreDrawing.ReadingScale(r, reading, width), $"{reading} x {factor}, {width}");
            }
        }
    }
}
