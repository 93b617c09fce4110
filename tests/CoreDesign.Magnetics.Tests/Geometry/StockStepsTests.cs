using CoreDesign.Magnetics.Geometry;
using CsCheck;

namespace CoreDesign.Magnetics.Tests.Geometry;

public sealed class StockStepsTests
{
    private static readonly Gen<double[]> Lists = Gen.Double[0.02, 0.249].Array[1, 11];

    [Fact]
    public void BestFromStock_agrees_with_trying_every_subset()
    {
        Gen.Select(Lists, Gen.Int[1, 8]).Sample((widths, n) =>
        {
            var best = StepOptimizer.BestFromStock(0.25, widths, n);
            var tried = EverySubset(0.25, widths, n);

            Assert.True(best.Steps.Count <= n);
            Assert.All(best.Steps, s => Assert.Contains(s.Width_m, widths));
            Assert.Equal(tried, best.GrossArea_m2, 1e-14);
            Assert.Equal(best.GrossArea_m2, best.Steps.Sum(s => s.Width_m * s.Stack_m), 1e-15);
        });
    }

    [Fact]
    public void BestFromStock_without_a_limit_takes_every_width_once()
    {
        var best = StepOptimizer.BestFromStock(0.25, [0.1, 0.2, 0.24, 0.2, 0.06], null);
        Assert.Equal([0.24, 0.2, 0.1, 0.06], best.Steps.Select(s => s.Width_m));
        Assert.Equal(EverySubset(0.25, [0.1, 0.2, 0.24, 0.06], 4), best.GrossArea_m2, 1e-14);
    }

    [Fact]
    public void BestFromStock_never_beats_the_free_optimum_and_a_fine_list_comes_near_it()
    {
        var list = Enumerable.Range(10, 210).Select(mm => mm / 1000.0).ToArray();
        for (var n = 1; n <= 16; n++)
        {
            var free = StepOptimizer.Best(0.22, n).FillRatio;
            var stock = StepOptimizer.BestFromStock(0.22, list, n).FillRatio;
            Assert.InRange(stock, free - 1e-3, free);
        }
    }

    [Theory]
    [InlineData(0.88571, 0.93, 0.78, 0.60, 0.36)]
    [InlineData(0.78687, 0.85, 0.53)]
    public void Section_of_handbook_widths_has_their_computed_ratio(double ratio, params double[] widths)
    {
        // Widths: Sawhney, core table (from memory). Ratios: computed apart from this code from those widths; the printed 0.87 is conservative.
        Assert.Equal(ratio, StepOptimizer.BestFromStock(1, widths, null).FillRatio, 5e-6);
    }

    [Theory]
    [InlineData(0.25)]
    [InlineData(0.3)]
    [InlineData(0.0)]
    [InlineData(-0.1)]
    [InlineData(double.NaN)]
    public void BestFromStock_width_that_cannot_lie_in_the_circle_is_refused_by_name(double width)
    {
        var e = Assert.Throws<GeometryException>(() => StepOptimizer.BestFromStock(0.25, [0.2, width], 2));
        Assert.Equal("stockWidths_m[1]", e.PropertyName);
    }

    [Fact]
    public void BestFromStock_empty_or_endless_list_is_refused()
    {
        Assert.Equal("stockWidths_m", Assert.Throws<GeometryException>(() => StepOptimizer.BestFromStock(0.25, [], 2)).PropertyName);
        var endless = Enumerable.Repeat(0.1, 501).ToArray();
        Assert.Equal("stockWidths_m", Assert.Throws<GeometryException>(() => StepOptimizer.BestFromStock(0.25, endless, 2)).PropertyName);
        Assert.Equal("steps", Assert.Throws<GeometryException>(() => StepOptimizer.BestFromStock(0.25, [0.1], 0)).PropertyName);
    }

    [Fact]
    public void Within_keeps_what_fits_widest_first() =>
        Assert.Equal([0.24, 0.1], StepOptimizer.Within(0.25, [0.1, 0.25, 0.24, 0.1, 0.4]));

    private static double EverySubset(double d, double[] widths, int most)
    {
        var best = 0.0;
        for (var mask = 1; mask < 1 << widths.Length; mask++)
        {
            var chosen = widths.Where((_, i) => (mask & (1 << i)) != 0).OrderDescending().ToArray();
            if (chosen.Length > most)
            {
                continue;
            }

            double area = 0, before = 0;
            foreach (var w in chosen)
            {
                var stack = Math.Sqrt((d * d) - (w * w));
                area += w * (stack - before);
                before = stack;
            }

            best = Math.Max(best, area);
        }

        return best;
    }
}
