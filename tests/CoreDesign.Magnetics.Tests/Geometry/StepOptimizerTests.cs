using System.Globalization;
using CoreDesign.Magnetics.Geometry;
using CsCheck;

namespace CoreDesign.Magnetics.Tests.Geometry;

public sealed class StepOptimizerTests
{
    // Source: Data/stepped_core_optimum.csv, computed apart from this code by two solvers (stationary chain, coordinate ascent) that agree to 3e-7.
    public static TheoryData<int> TableRows() => [.. Table().Select(r => r.Steps).Distinct()];

    [Theory]
    [MemberData(nameof(TableRows))]
    public void Best_of_tabulated_steps_agrees_with_the_independent_optimum(int steps)
    {
        var best = StepOptimizer.Best(1, steps);
        var rows = Table().Where(r => r.Steps == steps).ToArray();

        Assert.Equal(steps, rows.Length);
        Assert.Equal(steps, best.Steps.Count);
        Assert.Equal(rows[0].Ratio, best.FillRatio, 1e-8);
        double stack = 0;
        for (var i = 0; i < steps; i++)
        {
            stack += best.Steps[i].Stack_m;
            Assert.Equal(rows[i].Width, best.Steps[i].Width_m, 1e-6);
            Assert.Equal(rows[i].HalfStack, stack / 2, 1e-6);
        }
    }

    [Fact]
    public void Table_covers_one_to_sixteen_steps() => Assert.Equal(Enumerable.Range(1, 16), Table().Select(r => r.Steps).Distinct());

    [Fact]
    public void Best_of_one_and_two_steps_matches_the_closed_forms()
    {
        // Closed forms: the inscribed square, 2/π; the cruciform with widths d·cos q and d·sin q, q = arctan(2)/2, area (√5 − 1)/2·d².
        var one = StepOptimizer.Best(0.3, 1);
        var two = StepOptimizer.Best(0.3, 2);
        var q = Math.Atan(2) / 2;

        Assert.Equal(2 / Math.PI, one.FillRatio, 1e-12);
        Assert.Equal(0.3 / Math.Sqrt(2), one.Steps[0].Width_m, 1e-12);
        Assert.Equal((Math.Sqrt(5) - 1) / 2 * 0.09, two.GrossArea_m2, 1e-12);
        Assert.Equal(0.3 * Math.Cos(q), two.Steps[0].Width_m, 1e-9);
        Assert.Equal(0.3 * Math.Sin(q), two.Steps[1].Width_m, 1e-9);
    }

    [Theory]
    [InlineData(3, 0.905, 0.707, 0.424)]
    [InlineData(2, 0.85, 0.53)]
    public void Best_has_the_handbook_widths(int steps, params double[] widths)
    {
        // Source: Sawhney, A Course in Electrical Machine Design, core table (from memory), to the printed digits.
        // Its printed area ratios of 3 and 4 steps are not those of its widths and are left out.
        var best = StepOptimizer.Best(1, steps);
        for (var i = 0; i < steps; i++)
        {
            Assert.Equal(widths[i], best.Steps[i].Width_m, steps == 2 ? 0.005 : 0.001);
        }
    }

    [Fact]
    public void Best_up_to_25_steps_is_symmetric_about_the_diagonal()
    {
        // Swapping width and stack mirrors the section, so a single optimum has w_i² + w_(n+1−i)² = d².
        for (var n = 1; n <= 25; n++)
        {
            var w = StepOptimizer.Best(2, n).Steps.Select(s => s.Width_m).ToArray();
            for (var i = 0; i < n; i++)
            {
                Assert.Equal(4, (w[i] * w[i]) + (w[n - 1 - i] * w[n - 1 - i]), 1e-9);
            }
        }
    }

    [Fact]
    public void Best_is_not_improved_by_moving_any_width()
    {
        for (var n = 1; n <= 25; n++)
        {
            var best = StepOptimizer.Best(1, n);
            var w = best.Steps.Select(s => s.Width_m).ToArray();
            for (var i = 0; i < n; i++)
            {
                foreach (var shift in (double[])[-1e-4, 1e-4])
                {
                    var moved = (double[])w.Clone();
                    moved[i] += shift;
                    Assert.True(StepOptimizer.BestFromStock(1, moved, null).GrossArea_m2 < best.GrossArea_m2);
                }
            }
        }
    }

    [Fact]
    public void Best_gains_with_every_step()
    {
        var ratios = Enumerable.Range(1, 25).Select(n => StepOptimizer.Best(0.2, n).FillRatio).ToArray();
        Assert.All(ratios.Zip(ratios.Skip(1)), r => Assert.True(r.Second > r.First));
        Assert.InRange(ratios[^1], 0.97, 1);
    }

    [Fact]
    public void Sections_fit_into_their_circle_and_touch_it()
    {
        Gen.Select(Gen.Double[0.05, 1.5], Gen.Int[1, 25]).Sample((d, n) =>
        {
            var best = StepOptimizer.Best(d, n);
            double stack = 0;
            foreach (var s in best.Steps)
            {
                stack += s.Stack_m;
                Assert.Equal(d, Math.Sqrt((s.Width_m * s.Width_m) + (stack * stack)), 1e-12);
            }

            Assert.Equal(d, StepOptimizer.CircleAround(best.Steps), 1e-12);
            Assert.Equal(best.Steps.Sum(s => s.Width_m * s.Stack_m), best.GrossArea_m2, 1e-15);
        });
    }

    [Fact]
    public void Best_scales_with_the_square_of_the_diameter()
    {
        Gen.Select(Gen.Double[0.05, 1.5], Gen.Int[1, 16]).Sample((d, n) =>
            Assert.Equal(4, StepOptimizer.Best(2 * d, n).GrossArea_m2 / StepOptimizer.Best(d, n).GrossArea_m2, 1e-12));
    }

    [Theory]
    [InlineData(0.0, 5, "diameter_m")]
    [InlineData(double.NaN, 5, "diameter_m")]
    [InlineData(1e308, 5, "diameter_m")]
    [InlineData(-0.2, 5, "diameter_m")]
    [InlineData(0.2, 0, "steps")]
    [InlineData(0.2, 26, "steps")]
    public void Best_of_bad_input_is_refused_by_name(double diameter, int steps, string property)
    {
        var e = Assert.Throws<GeometryException>(() => StepOptimizer.Best(diameter, steps));
        Assert.Equal(property, e.PropertyName);
        Assert.Contains("allowed:", e.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void CircleAround_hand_typed_steps_is_set_by_the_farthest_corner()
    {
        // 3-4-5: the second step's corner (0.3 wide, stack 0.3 + 0.1 = 0.4) lies farthest out.
        LimbStep[] steps = [new(0.35, 0.3), new(0.3, 0.1)];
        Assert.Equal(0.5, StepOptimizer.CircleAround(steps), 1e-15);
        Assert.Equal(((0.35 * 0.3) + 0.03) / (Math.PI / 4 * 0.25), StepSet.FromSteps(steps).FillRatio, 1e-12);
    }

    [Fact]
    public void CircleAround_steps_out_of_order_is_refused_by_name()
    {
        var e = Assert.Throws<GeometryException>(() => StepOptimizer.CircleAround([new(0.2, 0.1), new(0.2, 0.05)]));
        Assert.Equal("steps[1].width_m", e.PropertyName);
    }

    private static IEnumerable<(int Steps, double Ratio, double Width, double HalfStack)> Table()
    {
        using var stream = typeof(StepOptimizerTests).Assembly.GetManifestResourceStream("stepped_core_optimum.csv")!;
        using var reader = new StreamReader(stream);
        var lines = reader.ReadToEnd().Split('\n', StringSplitOptions.RemoveEmptyEntries).Where(l => char.IsAsciiDigit(l[0]));
        return [.. lines.Select(l => l.Split(',').Select(f => double.Parse(f, CultureInfo.InvariantCulture)).ToArray()).Select(f => ((int)f[0], f[1], f[4], f[5]))];
    }
}
