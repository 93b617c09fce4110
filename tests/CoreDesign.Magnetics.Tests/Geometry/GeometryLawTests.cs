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
            var windows = core.Form == CoreForm.ThreeLimb ? 2 : 1;
            var volume = d.Steps.Sum(s =>
            {
                var clearWidth = core.LimbPitch_m - s.LimbWidth_m;
                var clearHeight = d.WindowHeight_m + d.Steps[0].YokeWidth_m - s.YokeWidth_m;
                var around = ((windows * core.LimbPitch_m) + s.LimbWidth_m) * (clearHeight + (2 * s.YokeWidth_m));
                return d.StackingFactor * s.Stack_m * (around - (windows * clearWidth * clearHeight));
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
            Assert.Equal((0, 0), (p.Outline.Min(q => q.X_m), p.Outline.Min(q => q.Y_m)));
            Assert.Equal(p.LongSide_m, p.Outline.Max(q => q.X_m), 1e-12);
            Assert.Equal(p.Width_m, p.Outline.Max(q => q.Y_m), 1e-12);
            Assert.Equal(p.Outline.Count, p.Outline.Distinct().Count());
        }));

    [Fact]
    public void Joint_kind_changes_the_plates_but_never_the_parts() =>
        Designs.Any.Sample(d => Assert.Equal((d with { Joint = JointKind.ButtLap }).Build().Parts, (d with { Joint = JointKind.StepLap }).Build().Parts));

    [Fact]
    public void Wider_window_adds_to_the_yokes_only() =>
        Designs.Any.Sample(d =>
        {
            var (one, wide) = (d.Build(), (d with { WindowWidth_m = d.WindowWidth_m + 0.1 }).Build());
            foreach (var (p, q) in one.Parts.Zip(wide.Parts))
            {
                Assert.Equal(p.Kind == CorePartKind.Yoke ? p.Length_m + 0.1 : p.Length_m, q.Length_m, 1e-12);
            }
        });
}
