using CoreDesign.Estimating.Contracts;
using CoreDesign.Sheets.Charts;
using CoreDesign.Sheets.Drawings;
using CoreDesign.Sheets.Scenes;

namespace CoreDesign.Sheets.Tests.Drawings;

/// <summary>Every form of core with every kind of joint, drawn as it was solved.</summary>
public class FormTests
{
    private static readonly DrawingOptions Size = new() { Width = 640, Height = 490 };

    public static TheoryData<string, string, int> Every => Forms.Every();

    [Theory]
    [MemberData(nameof(Every))]
    public void Drawings_everyForm_keepTextsApartAndFindEveryPart(string form, string joint, int units)
    {
        var r = Forms.Of(form, joint, units);
        foreach (var (w, h) in new[] { (640.0, 490.0), (766, 660), (486, 700), (1040, 620), (360, 280), (240, 180) })
        {
            foreach (var reading in Enum.GetValues<Reading>())
            {
                var scene = CoreDrawing.Front(r, reading, new DrawingOptions { Width = w, Height = h });
                Layout.HoldsApart(scene, $"{form}, {joint}, {units}, {reading}, {w} x {h}");

                // A part without a result would be filled with the plain ground.
                Assert.DoesNotContain(Parts(scene), p => p.Fill.Ramp is null);
            }
        }

        Layout.HoldsApart(CoreDrawing.Section(r, Reading.FluxDensity, new DrawingOptions { Width = 290, Height = 130 }), form);
        Layout.HoldsApart(CoreDrawing.JointDetail(r, new DrawingOptions { Width = 316, Height = 130 }), form);
    }

    [Theory]
    [MemberData(nameof(Every))]
    public void Front_everyForm_isWholeAndToScale(string form, string joint, int units)
    {
        var r = Forms.Of(form, joint, units);
        var g = r.Geometry;
        var parts = Parts(CoreDrawing.Front(r, Reading.FluxDensity, Size));

        // Each limb with its two ends, and two yokes over each window.
        Assert.Equal((3 * g.Limbs.Count) + (2 * (g.Limbs.Count - 1)), parts.Count);
        double left = parts.Min(p => p.Points.Min(q => q.X)), right = parts.Max(p => p.Points.Max(q => q.X));
        var scale = (right - left) / g.OverallWidth_mm;
        Assert.Equal(g.OverallHeight_mm * scale, parts.Max(p => p.Points.Max(q => q.Y)) - parts.Min(p => p.Points.Min(q => q.Y)), 1e-6);

        // Front faces: the box less the windows, whose widths the geometry gives by their kind.
        var beside = g.ReturnWindowWidth_mm is null ? 0 : 2;
        var windows = (((g.Limbs.Count - 1 - beside) * g.WindowWidth_mm) + (beside * (g.ReturnWindowWidth_mm ?? 0))) * g.WindowHeight_mm;
        Assert.Equal(((g.OverallWidth_mm * g.OverallHeight_mm) - windows) * scale * scale, parts.Sum(Area), 1e-6 * parts.Sum(Area));

        var limbs = parts.Where(p => p.Label!.Contains("imb ", StringComparison.Ordinal)).OrderBy(p => p.Points[0].X).ToList();
        Assert.Equal(g.Limbs.Select(l => Math.Round(l.Width_mm * scale, 6)), limbs.Select(p => Math.Round(p.Points[2].X - p.Points[0].X, 6)));
        Assert.Equal(g.Limbs.Select(l => l.IsReturn), limbs.Select(p => p.Label!.StartsWith("Return limb", StringComparison.Ordinal)));
    }

    [Theory]
    [InlineData("fiveLimb", "RABCS")]
    [InlineData("singlePhaseFourLimb", "RABS")]
    [InlineData("singlePhaseThreeLimb", "RAS")]
    [InlineData("threeLimb", "ABC")]
    [InlineData("singlePhaseTwoLimb", "AB")]
    public void Front_letters_areThoseOfTheParts(string form, string letters) =>
        Assert.Equal(letters, string.Concat(TextExtent.Texts(CoreDrawing.Front(Forms.Of(form), Reading.FluxDensity, Size).Marks).Where(t => t.Part == "ph").OrderBy(t => t.At.X).Select(t => t.Text)));

    [Theory]
    [InlineData("fiveLimb", true)]
    [InlineData("singlePhaseFourLimb", true)]
    [InlineData("singlePhaseThreeLimb", false)]
    public void Front_returnLimbs_areDimensionedWithTheirWindows(string form, bool window)
    {
        var r = Forms.Of(form);
        var fields = Layout.Groups(CoreDrawing.Front(r, Reading.FluxDensity, Size)).Where(g => g.FieldKey is not null).ToDictionary(g => g.FieldKey!, g => g.Label);

        Assert.Equal($"Return limb width {Figures.Plain(r.Geometry.Limbs[0].Width_mm, 2)} mm, derived", fields["core.returnLimb.areaFactor"]);
        Assert.Equal(window, fields.ContainsKey("core.returnWindowWidth_mm"));
        Assert.Equal("Window width 190 mm", fields["core.windowWidth_mm"]);
        Assert.Contains("core.windowHeight_mm", fields.Keys);
        Assert.Contains("core.limbPitch_mm", fields.Keys);
    }

    [Fact]
    public void Front_yokeNotHigherThanTheLimbsPoint_isPartedThere()
    {
        // Four limbs: a yoke half as high as the limb is wide ends at the limb's point, so the joint lines meet on its outer edge.
        var r = Forms.Of("singlePhaseFourLimb", "mitredOverlap");
        var scene = CoreDrawing.Front(r, Reading.FluxDensity, Size);
        var top = Parts(scene).Min(p => p.Points.Min(q => q.Y));
        var parted = scene.Marks.OfType<PathMark>().Where(p => p.Part == "jc").SelectMany(p => p.Points).Count(p => Math.Abs(p.Y - top) < 0.01);

        Assert.Equal(0.5 * r.Geometry.LimbWidth_mm, r.Geometry.YokeHeight_mm, 1e-6);

        // Two corners, and two lines at each of the two wound limbs.
        Assert.Equal(2 + 4, parted);
    }

    [Theory]
    [InlineData(1, false)]
    [InlineData(3, true)]
    public void Front_bank_saysHowManyUnits(int units, bool said)
    {
        var scene = CoreDrawing.Front(Forms.Of("singlePhaseThreeLimb", units: units), Reading.FluxDensity, Size);

        Assert.Equal(said, TextExtent.Texts(scene.Marks).Any(t => t.Text == "3 units"));
        Assert.Equal(said, scene.Description.EndsWith("One of 3 units alike.", StringComparison.Ordinal));
    }

    [Theory]
    [MemberData(nameof(Every))]
    public void Front_pageAndPaper_markTheSectionAndTheJointThatAreDrawnApart(string form, string joint, int units)
    {
        foreach (var o in new[] { new DrawingOptions { Width = 766, Height = 560 }, new DrawingOptions { Width = 510, Height = 400, TextSize = 7, DimensionSize = 7.5, FigureSize = 8, Pressable = false } })
        {
            var marks = CoreDrawing.Front(Forms.Of(form, joint, units), Reading.FluxDensity, o).Marks;

            Assert.Contains(marks, m => m.Part == "cut");
            Assert.Contains(marks, m => m.Part == "zc");
            Assert.Contains(TextExtent.Texts(marks), t => t.Text == "Z");
        }
    }

    [Theory]
    [InlineData("fiveLimb")]
    [InlineData("singlePhaseThreeLimb")]
    public void Section_returnLimbs_isThatOfAWoundLimb(string form)
    {
        var r = Forms.Of(form);
        var text = Figures.With(Readings.Figure(r.Parts.Single(p => p.Name == "limbA").PeakFluxDensity_T, Reading.FluxDensity), "T");

        Assert.Contains(TextExtent.Texts(CoreDrawing.Section(r, Reading.FluxDensity, new DrawingOptions { Width = 500, Height = 300 }).Marks), t => t.Text == text);
    }

    [Fact]
    public void Charts_fiveLimbs_haveFiveLooksAndTheLoopOfAWoundOne()
    {
        var r = Forms.Of("fiveLimb");
        var lines = EvidenceCharts.FluxOverPeriod(r, new()).Scene.Marks.OfType<PathMark>().Where(m => m.Part == "ln").ToList();

        Assert.Equal(5, lines.Select(l => (l.StrokeWidth, Dash: string.Join(' ', l.Dash ?? []))).Distinct().Count());
        Assert.Equal("Loop of limb A", EvidenceCharts.Loop(r, EvidenceCharts.FirstWoundLimb(r), new()).Scene.Title);
    }

    private static List<PathMark> Parts(Scene scene) => [.. scene.Marks.OfType<PathMark>().Where(p => p.Part == "pt")];

    private static double Area(PathMark p) => (p.Points[2].X - p.Points[0].X) * (p.Points[2].Y - p.Points[0].Y);
}
