using CoreDesign.Magnetics.Geometry;
using CoreDesign.Magnetics.Joints;

namespace CoreDesign.Magnetics.Tests.Geometry;

public sealed class CorePlateTests
{
    [Fact]
    public void High_yoke_keeps_a_straight_end()
    {
        var plates = One(CoreForm.ThreeLimb, limb: 0.2, yoke: 0.24, JointKind.StepLap);
        var (outer, middle, yoke) = (plates[0], plates[1], plates[2]);

        Assert.Equal((PlateShape.OuterLimb, 2, 0.9, 0.5), (outer.Shape, outer.Pieces, Round(outer.LongSide_m), Round(outer.ShortSide_m)));
        Assert.Equal([(0, 0), (0.9, 0), (0.7, 0.2), (0.2, 0.2)], Rounded(outer));
        Assert.Equal((PlateShape.MiddleLimb, 1, 0.7, 0.5), (middle.Shape, middle.Pieces, Round(middle.LongSide_m), Round(middle.ShortSide_m)));
        Assert.Equal([(0.1, 0), (0.6, 0), (0.7, 0.1), (0.6, 0.2), (0.1, 0.2), (0, 0.1)], Rounded(middle));
        Assert.Equal((PlateShape.Yoke, 2, 1.2, 0.8), (yoke.Shape, yoke.Pieces, Round(yoke.LongSide_m), Round(yoke.ShortSide_m)));
        Assert.Equal([(0, 0), (1.2, 0), (1.2, 0.04), (1, 0.24), (0.7, 0.24), (0.6, 0.14), (0.5, 0.24), (0.2, 0.24), (0, 0.04)], Rounded(yoke));
    }

    [Fact]
    public void Low_yoke_leaves_the_limb_a_straight_end()
    {
        var plates = One(CoreForm.SinglePhaseTwoLimb, limb: 0.2, yoke: 0.15, JointKind.MitredOverlap);

        Assert.Equal([(0, 0), (0.8, 0), (0.8, 0.05), (0.65, 0.2), (0.15, 0.2), (0, 0.05)], Rounded(plates[0]));
        Assert.Equal([(0, 0), (0.6, 0), (0.45, 0.15), (0.15, 0.15)], Rounded(plates[1]));
    }

    [Fact]
    public void Half_yoke_is_made_of_two_plates_that_meet_at_the_limbs_point()
    {
        var plates = One(CoreForm.SinglePhaseThreeLimb, limb: 0.2, yoke: 0.1, JointKind.StepLap);
        var (outer, middle, yoke) = (plates[0], plates[1], plates[2]);

        Assert.Equal((PlateShape.OuterLimb, 2, 0.1), (outer.Shape, outer.Pieces, outer.Width_m));
        Assert.Equal([(0.1, 0), (0.6, 0), (0.7, 0.1), (0.6, 0.2), (0.1, 0.2), (0, 0.1)], Rounded(middle));
        Assert.Equal((PlateShape.Yoke, 4, 0.5, 0.3), (yoke.Shape, yoke.Pieces, Round(yoke.LongSide_m), Round(yoke.ShortSide_m)));
        Assert.Equal([(0, 0), (0.5, 0), (0.4, 0.1), (0.1, 0.1)], Rounded(yoke));
        Assert.Equal(3, plates.Count);
    }

    [Fact]
    public void Point_of_a_limb_is_cut_flat_at_the_outer_edge_of_a_lower_yoke()
    {
        var plates = One(CoreForm.FiveLimb, limb: 0.2, yoke: 0.08, JointKind.MitredOverlap);

        Assert.Equal([(0.08, 0), (0.58, 0), (0.66, 0.08), (0.66, 0.12), (0.58, 0.2), (0.08, 0.2), (0, 0.12), (0, 0.08)], Rounded(plates[1]));
        Assert.Equal([(4, 0.15), (4, 0.3)], plates.Skip(2).Select(p => (p.Pieces, Round(p.ShortSide_m))));
        Assert.Equal([(0, 0), (0.46, 0), (0.38, 0.08), (0.08, 0.08)], Rounded(plates[3]));
    }

    [Fact]
    public void Butt_lapped_plates_are_rectangles_of_two_layers()
    {
        var plates = One(CoreForm.ThreeLimb, limb: 0.2, yoke: 0.24, JointKind.ButtLap);
        (PlateShape, int, double)[] expected =
        [
            (PlateShape.OuterLimb, 2, 0.5), (PlateShape.MiddleLimb, 1, 0.5), (PlateShape.OuterLimb, 2, 0.98), (PlateShape.MiddleLimb, 1, 0.98),
            (PlateShape.Yoke, 2, 1.2), (PlateShape.Yoke, 4, 0.3),
        ];
        Assert.Equal(expected, plates.Select(p => (p.Shape, p.Pieces, Round(p.LongSide_m))));
        Assert.All(plates, p => Assert.Equal(p.Width_m * p.LongSide_m, p.Area_m2, 1e-15));
    }

    [Fact]
    public void Plate_area_times_pieces_and_net_stack_is_its_volume()
    {
        Assert.All(One(CoreForm.ThreeLimb, 0.2, 0.24, JointKind.StepLap), p => Assert.Equal(p.Area_m2 * p.Pieces * 0.96 * 0.1, p.NetVolume_m3, 1e-15));
        Assert.All(One(CoreForm.ThreeLimb, 0.2, 0.24, JointKind.ButtLap), p => Assert.Equal(p.Area_m2 * p.Pieces * 0.96 * 0.05, p.NetVolume_m3, 1e-15));
    }

    private static IReadOnlyList<CorePlate> One(CoreForm form, double limb, double yoke, JointKind joint) =>
        CoreBuilder.Build(form, [new(limb, yoke, 0.1)], 0.96, 0.5, 0.3, joint).Plates;

    private static double Round(double x) => Math.Round(x, 12);

    private static IEnumerable<(double, double)> Rounded(CorePlate plate) => plate.Outline.Select(p => (Round(p.X_m), Round(p.Y_m)));
}
