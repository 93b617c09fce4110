using CoreDesign.Magnetics.Geometry;
using CoreDesign.Magnetics.Joints;
using CsCheck;

namespace CoreDesign.Magnetics.Tests.Geometry;

/// <summary>Laws that hold on every core, tried on random designs.</summary>
public sealed class GeometryLawTests
{
    [Fact]
    public void Mass_of_the_parts_is_the_mass_of_the_plates() =>
        Designs.Any.Sample(d =>
        {
            var core = d.Build();
            var parts = core.Parts.Sum(p => p.Volume_m3);
            Assert.Equal(1, core.Plates.Sum(p => p.NetVolume_m3) / parts, 1e-12);
        });

    [Fact]
    public void Parts_fill_the_outline_less_the_windows() =>
        Designs.Any.Sample(d =>
        {
            // An account of its own: per step the rectangle around the core less its clear windows.
            var core = d.Build();
            var (wound, returns) = Limbs(d.Form);
            var volume = d.Steps.Sum(s =>
            {
                var clearHeight = d.WindowHeight_m + d.Steps[0].YokeWidth_m - s.YokeWidth_m;
                var limbs = ((wound * s.LimbWidth_m) + (returns * d.ReturnShare * s.LimbWidth_m)) * clearHeight;
                var windowWidths = wound == 1 ? 2 * d.WindowWidth_m : ((wound - 1) * d.WindowWidth_m) + (returns * d.ReturnWindowWidth_m);
                var widest = d.Steps[0].LimbWidth_m * (wound + (returns * d.ReturnShare));

                // The outermost limbs are narrower here by half the difference to the widest step, on either side.
                var around = windowWidths + widest - ((d.Steps[0].LimbWidth_m - s.LimbWidth_m) * (returns > 0 ? d.ReturnShare : 1));
                return d.StackingFactor * s.Stack_m * (limbs + (2 * around * s.YokeWidth_m));
            });
            Assert.Equal(1, core.Parts.Sum(p => p.Volume_m3) / volume, 1e-12);
        });

    [Fact]
    public void Doubling_all_lengths_scales_area_by_four_and_mass_by_eight() =>
        Designs.Any.Sample(d =>
        {
            var (one, two) = (d.Build(), d.Build(2));
            Assert.Equal(4, two.NetLimbArea_m2 / one.NetLimbArea_m2, 1e-12);
            Assert.Equal(4, two.NetYokeArea_m2 / one.NetYokeArea_m2, 1e-12);
            Assert.Equal(2, two.CircleDiameter_m / one.CircleDiameter_m, 1e-12);
            foreach (var (p, q) in one.Parts.Zip(two.Parts))
            {
                Assert.Equal(p.Name, q.Name);
                Assert.Equal(8, q.Volume_m3 / p.Volume_m3, 1e-11);
                Assert.Equal(2, q.Length_m / p.Length_m, 1e-11);
            }

            Assert.All(one.Plates.Zip(two.Plates), pair => Assert.Equal(4, pair.Second.Area_m2 / pair.First.Area_m2, 1e-11));
        });

    [Fact]
    public void Every_part_is_positive_and_as_long_as_volume_over_area() =>
        Designs.Any.Sample(d => Assert.All(d.Build().Parts, p =>
        {
            Assert.True(p.Volume_m3 > 0 && p.NetArea_m2 > 0);
            Assert.Equal(p.Volume_m3, p.Length_m * p.NetArea_m2, 1e-12);
        }));

    [Fact]
    public void Stacks_add_up_and_the_circle_encloses_every_step() =>
        Designs.Any.Sample(d =>
        {
            var core = d.Build();
            double stack = 0;
            foreach (var s in core.Steps)
            {
                stack += s.Stack_m;
                Assert.True(Math.Sqrt((s.LimbWidth_m * s.LimbWidth_m) + (stack * stack)) <= core.CircleDiameter_m * (1 + 1e-12));
            }

            Assert.Equal(stack, core.StackHeight_m, 1e-12);
        });

    [Fact]
    public void Outlines_are_simple_within_their_box_and_counter_clockwise() =>
        Designs.Any.Sample(d => Assert.All(d.Build().Plates, p =>
        {
            Assert.True(p.Area_m2 > 0 && p.Area_m2 <= p.Width_m * p.LongSide_m * (1 + 1e-12));
            Assert.Equal(p.Area_m2, PlateOutlines.Area(p.Outline), 1e-15);
            Assert.Equal((0, 0), (p.Outline.Min(q => q.X_m), p.Outline.Min(q => q.Y_m)));
            Assert.Equal(p.LongSide_m, p.Outline.Max(q => q.X_m), 1e-12);
            Assert.Equal(p.Width_m, p.Outline.Max(q => q.Y_m), 1e-12);
            Assert.Equal(p.Outline.Count, p.Outline.Distinct().Count());
            Assert.False(Crosses(p.Outline));
        }));

    [Fact]
    public void Joint_kind_changes_the_plates_but_never_the_parts() =>
        Designs.Any.Sample(d => Assert.Equal((d with { Joint = JointKind.ButtLap }).Build().Parts, (d with { Joint = JointKind.StepLap }).Build().Parts));

    [Fact]
    public void Wider_window_adds_to_the_yokes_only() =>
        Designs.Any.Sample(d =>
        {
            var (one, wide) = (d.Build(), (d with { WindowWidth_m = d.WindowWidth_m + 0.1, ReturnWindowWidth_m = d.ReturnWindowWidth_m + 0.1 }).Build());
            foreach (var (p, q) in one.Parts.Zip(wide.Parts))
            {
                Assert.Equal(p.Kind == CorePartKind.Yoke ? p.Length_m + 0.1 : p.Length_m, q.Length_m, 1e-12);
            }
        });

    [Fact]
    public void Limbs_stand_at_their_windows_distance_and_carry_their_own_area() =>
        Designs.Any.Sample(d =>
        {
            var core = d.Build();
            Assert.Equal(Limbs(d.Form).Returns, core.Limbs.Count(l => l.IsReturn));
            Assert.All(core.Limbs, l => Assert.Equal(core.Parts.Single(p => p.Name == "limb" + l.Letter).NetArea_m2, l.NetArea_m2));
            Assert.All(core.Limbs, l => Assert.Equal(core.NetLimbArea_m2 * (l.IsReturn ? d.ReturnShare : 1), l.NetArea_m2, 1e-12));
            foreach (var (left, right) in core.Limbs.Zip(core.Limbs.Skip(1)))
            {
                var clear = right.Axis_m - left.Axis_m - (d.Steps[0].LimbWidth_m * (left.WidthShare + right.WidthShare) / 2);
                Assert.Equal(core.Limbs.Count(l => !l.IsReturn) > 1 && (left.IsReturn || right.IsReturn) ? d.ReturnWindowWidth_m : d.WindowWidth_m, clear, 1e-12);
            }
        });

    private static (int Wound, int Returns) Limbs(CoreForm form) => form switch
    {
        CoreForm.SinglePhaseTwoLimb => (2, 0),
        CoreForm.SinglePhaseThreeLimb => (1, 2),
        CoreForm.SinglePhaseFourLimb => (2, 2),
        CoreForm.ThreeLimb => (3, 0),
        _ => (3, 2),
    };

    /// <summary>Whether two sides of an outline that are no neighbours cut through each other.</summary>
    private static bool Crosses(IReadOnlyList<(double X, double Y)> outline)
    {
        double Turn((double X, double Y) a, (double X, double Y) b, (double X, double Y) c) => ((b.X - a.X) * (c.Y - a.Y)) - ((b.Y - a.Y) * (c.X - a.X));
        var n = outline.Count;
        for (var i = 0; i < n; i++)
        {
            for (var j = i + 2; j < n; j++)
            {
                var (a, b, c, e) = (outline[i], outline[(i + 1) % n], outline[j], outline[(j + 1) % n]);
                if ((j + 1) % n != i && Turn(a, b, c) * Turn(a, b, e) < -1e-24 && Turn(c, e, a) * Turn(c, e, b) < -1e-24)
                {
                    return true;
                }
            }
        }

        return false;
    }
}
