using CoreDesign.Magnetics.Geometry;
using CoreDesign.Magnetics.Joints;

namespace CoreDesign.Magnetics.Tests.Geometry;

public sealed class CoreBuilderTests
{
    private static readonly CoreStep[] TwoSteps = [new(0.2, 0.24, 0.1), new(0.15, 0.18, 0.06)];

    [Fact]
    public void Parts_of_a_two_step_core_match_the_sum_by_hand()
    {
        // By hand: axis distances 0.5 + 0.24 = 0.74 m and 0.3 + 0.2 = 0.5 m; per step stack × width × length, times 0.96.
        var core = CoreBuilder.Build(CoreForm.ThreeLimb, TwoSteps, 0.96, 0.5, 0.3, JointKind.StepLap);

        Assert.Equal(0.96 * 0.029, core.NetLimbArea_m2, 1e-15);
        Assert.Equal(0.96 * 0.0348, core.NetYokeArea_m2, 1e-15);
        Assert.Equal(0.96 * ((0.1 * 0.2 * 0.5) + (0.06 * 0.15 * 0.56)), Part(core, "limbB").Volume_m3, 1e-15);
        Assert.Equal(0.96 * ((0.1 * 0.24 * 0.3) + (0.06 * 0.18 * 0.35)), Part(core, "yokeBCBottom").Volume_m3, 1e-15);
        Assert.Equal(0.96 * ((0.1 * 0.2 * 0.24) + (0.06 * 0.15 * 0.18)), Part(core, "cornerCTop").Volume_m3, 1e-15);
        Assert.Equal(Part(core, "cornerCTop").Volume_m3, Part(core, "tZoneBottom").Volume_m3, 1e-15);
        Assert.Equal(0.96 * 0.0319, Part(core, "tZoneTop").NetArea_m2, 1e-15);
        Assert.Equal(1.2, core.OverallWidth_m, 1e-15);
        Assert.Equal(0.98, core.OverallHeight_m, 1e-15);
        Assert.Equal(0.5, core.LimbPitch_m, 1e-15);
        Assert.Equal(0.16, core.StackHeight_m, 1e-15);
        Assert.Equal(Math.Sqrt(0.05), core.CircleDiameter_m, 1e-15);
    }

    [Fact]
    public void Part_names_are_stable()
    {
        string[] three =
        [
            "limbA", "limbB", "limbC", "yokeABTop", "yokeBCTop", "yokeABBottom", "yokeBCBottom",
            "cornerATop", "cornerABottom", "cornerCTop", "cornerCBottom", "tZoneTop", "tZoneBottom",
        ];
        string[] two = ["limbA", "limbB", "yokeABTop", "yokeABBottom", "cornerATop", "cornerABottom", "cornerBTop", "cornerBBottom"];

        Assert.Equal(three, Names(CoreForm.ThreeLimb));
        Assert.Equal(two, Names(CoreForm.SinglePhaseTwoLimb));
    }

    [Fact]
    public void Core_with_equal_yokes_has_one_area_throughout()
    {
        var steps = StepOptimizer.Best(0.22, 7).WithYokes(1);
        var core = CoreBuilder.Build(CoreForm.ThreeLimb, steps, 0.965, 0.52, 0.19, JointKind.StepLap);
        Assert.All(core.Parts, p => Assert.Equal(core.NetLimbArea_m2, p.NetArea_m2));
    }

    [Fact]
    public void Single_step_core_with_equal_yokes_has_the_plain_mean_path()
    {
        // A rectangular frame of one width: mean path 2 (height + width of the window) + 4 plate widths, corners at half each way.
        var core = CoreBuilder.Build(CoreForm.SinglePhaseTwoLimb, [new(0.1, 0.1, 0.1)], 1, 0.4, 0.2, JointKind.MitredOverlap);
        Assert.Equal((2 * 0.6) + 0.4, core.Parts.Sum(p => p.Length_m), 1e-12);
    }

    [Fact]
    public void Pitch_and_window_width_are_inverse()
    {
        Assert.Equal(0.4, CoreBuilder.LimbPitch(0.19, 0.21), 1e-15);
        Assert.Equal(0.19, CoreBuilder.WindowWidth(CoreBuilder.LimbPitch(0.19, 0.21), 0.21), 1e-15);
        Assert.Equal("limbPitch_m", Assert.Throws<GeometryException>(() => CoreBuilder.WindowWidth(0.21, 0.21)).PropertyName);
    }

    [Fact]
    public void Five_limb_core_has_return_windows_of_half_width_unless_told()
    {
        var layout = CoreLayout.Of(CoreForm.FiveLimb);
        var core = CoreBuilder.Build(layout, [new(0.2, 0.11, 0.1), new(0.15, 0.085, 0.06)], 0.96, 0.5, 0.3, JointKind.StepLap);
        var butt = CoreBuilder.Build(layout, [new(0.2, 0.11, 0.1), new(0.15, 0.085, 0.06)], 0.96, 0.5, 0.3, JointKind.ButtLap);

        Assert.Equal((3 * 0.2) + (2 * 0.1) + (2 * 0.3) + (2 * 0.15), core.OverallWidth_m, 1e-12);
        Assert.Equal((0.15, 0.5), (core.ReturnWindowWidth_m, core.LimbPitch_m));
        Assert.Equal(["R", "A", "B", "C", "S"], core.Limbs.Select(l => l.Letter));
        Assert.Contains(core.Parts, p => p.Name == "tZoneBTop");
        Assert.Equal(core.Parts.Sum(p => p.Volume_m3), core.Plates.Sum(p => p.NetVolume_m3), 1e-14);
        Assert.Equal(core.Parts.Sum(p => p.Volume_m3), butt.Plates.Sum(p => p.NetVolume_m3), 1e-14);
    }

    public static TheoryData<string, CoreStep[], double, double, double> Refused() => new()
    {
        { "steps", [], 0.96, 0.5, 0.3 },
        { "steps[0].limbWidth_m", [new(-0.2, 0.2, 0.1)], 0.96, 0.5, 0.3 },
        { "steps[0].yokeWidth_m", [new(0.2, double.NaN, 0.1)], 0.96, 0.5, 0.3 },
        { "steps[0].stack_m", [new(0.2, 0.2, 0)], 0.96, 0.5, 0.3 },
        { "steps[1].limbWidth_m", [new(0.2, 0.2, 0.1), new(0.21, 0.2, 0.1)], 0.96, 0.5, 0.3 },
        { "steps[1].yokeWidth_m", [new(0.2, 0.2, 0.1), new(0.15, 0.21, 0.1)], 0.96, 0.5, 0.3 },
        { "steps[1].yokeWidth_m", [new(0.2, 0.2, 0.1), new(0.15, 0.075, 0.1)], 0.96, 0.5, 0.3 },
        { "stackingFactor", TwoSteps, 0, 0.5, 0.3 },
        { "stackingFactor", TwoSteps, 1.01, 0.5, 0.3 },
        { "windowHeight_m", TwoSteps, 0.96, double.PositiveInfinity, 0.3 },
        { "windowWidth_m", TwoSteps, 0.96, 0.5, 1e308 },
    };

    [Theory]
    [MemberData(nameof(Refused))]
    public void Bad_input_is_refused_by_name(string property, CoreStep[] steps, double stackingFactor, double height, double width)
    {
        var e = Assert.Throws<GeometryException>(() => CoreBuilder.Build(CoreForm.ThreeLimb, steps, stackingFactor, height, width, JointKind.StepLap));
        Assert.Equal(property, e.PropertyName);
        Assert.StartsWith($"{property} is ", e.Message, StringComparison.Ordinal);
        Assert.Contains("allowed:", e.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Low_yoke_is_refused_only_where_a_point_would_split_it()
    {
        CoreStep[] low = [new(0.2, 0.09, 0.1)];
        Assert.Throws<GeometryException>(() => CoreBuilder.Build(CoreForm.ThreeLimb, low, 0.96, 0.5, 0.3, JointKind.MitredOverlap));
        Assert.NotEmpty(CoreBuilder.Build(CoreForm.ThreeLimb, low, 0.96, 0.5, 0.3, JointKind.ButtLap).Plates);
        foreach (var form in new[] { CoreForm.SinglePhaseTwoLimb, CoreForm.SinglePhaseThreeLimb, CoreForm.SinglePhaseFourLimb, CoreForm.FiveLimb })
        {
            Assert.NotEmpty(CoreBuilder.Build(form, low, 0.96, 0.5, 0.3, JointKind.MitredOverlap).Plates);
        }
    }

    [Fact]
    public void Pitch_of_a_core_with_one_wound_limb_reaches_to_the_return_limb()
    {
        var core = CoreBuilder.Build(CoreForm.SinglePhaseThreeLimb, [new(0.2, 0.1, 0.1)], 0.96, 0.5, 0.3, JointKind.StepLap);
        Assert.Equal(0.3 + 0.1 + 0.05, core.LimbPitch_m, 1e-15);
        Assert.Equal((0.3, 0.2 + (2 * 0.1) + (2 * 0.3)), (core.ReturnWindowWidth_m, Math.Round(core.OverallWidth_m, 12)));
        Assert.Equal(
            ["limbR", "limbA", "limbS", "yokeRATop", "yokeASTop", "yokeRABottom", "yokeASBottom", "cornerRTop", "cornerRBottom", "cornerSTop", "cornerSBottom", "tZoneTop", "tZoneBottom"],
            core.Parts.Select(p => p.Name));
    }

    [Theory]
    [InlineData(0.19)]
    [InlineData(1.6)]
    [InlineData(double.NaN)]
    public void Return_limb_out_of_range_is_refused_by_name(double share) =>
        Assert.Equal("returnShare", Assert.Throws<GeometryException>(() => CoreLayout.Of(CoreForm.FiveLimb, share)).PropertyName);

    [Fact]
    public void Unknown_form_or_joint_is_refused_by_name()
    {
        Assert.Equal("form", Assert.Throws<GeometryException>(() => CoreBuilder.Build((CoreForm)99, TwoSteps, 0.96, 0.5, 0.3, JointKind.StepLap)).PropertyName);
        Assert.Equal("joint", Assert.Throws<GeometryException>(() => CoreBuilder.Build(CoreForm.ThreeLimb, TwoSteps, 0.96, 0.5, 0.3, (JointKind)99)).PropertyName);
    }

    private static CorePart Part(CoreGeometry core, string name) => core.Parts.Single(p => p.Name == name);

    private static IEnumerable<string> Names(CoreForm form) =>
        CoreBuilder.Build(form, TwoSteps, 0.96, 0.5, 0.3, JointKind.StepLap).Parts.Select(p => p.Name);
}
