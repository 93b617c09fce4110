using CoreDesign.Magnetics.Geometry;
using CsCheck;

namespace CoreDesign.Magnetics.Tests.Geometry;

public sealed class SizingTests
{
    // 500 turns, 150 kV in star, 0.5 m²: published example data of a harmonic power model (open source, hopf.jl); the flux density
    // was computed from them apart from this code, as for the rows below it.
    [Theory]
    [InlineData(150e3, 500, 0.5, 1.5594)]
    [InlineData(36e3, 300, 0.2, 1.5594)]
    [InlineData(10e3, 240, 0.07, 1.5470)]
    public void FluxDensity_of_star_windings_matches(double lineVoltage, double turns, double area, double expected) =>
        Assert.Equal(expected, Sizing.FluxDensity(lineVoltage / Math.Sqrt(3), turns, 50, area), 5e-5);

    [Fact]
    public void FluxDensity_of_the_textbook_square_core_matches()
    {
        // Source: Fitzgerald, Kingsley, Umans, Electric Machinery, 6th ed., example 1.8 (from memory): 2 × 2 in, fill 0.94, 200 turns, 194 V, 60 Hz, 1.5 T.
        var square = StepSet.FromSteps([new(0.0508, 0.0508)]);
        Assert.Equal(1.5, Sizing.FluxDensity(194, 200, 60, square, 0.94), 5e-4);
    }

    [Fact]
    public void NetArea_of_published_sums_matches_to_their_digits()
    {
        // Source: Sawhney (from memory), 1000 kVA, 30 V per turn, 1.25 T, 50 Hz: 0.108 m².
        Assert.Equal(0.108, Sizing.NetArea(30, 50, 1.25), 5e-4);

        // Source: scribd.com/document/408552580, 200 kVA, 7.44 V per turn, 0.436 T, 50 Hz: 0.0768 m², cruciform circle 0.370 m from the
        // rounded 0.56 d² (exact: 0.9 · 0.618 d² = 0.5562 d², so 0.4 % more).
        Assert.Equal(0.0768, Sizing.NetArea(7.44, 50, 0.436), 5e-5);
        Assert.Equal(0.370, Sizing.Diameter(0.0768, 0.9, 2, 0.001).LeastDiameter_m, 0.002);

        // Source: open worked solutions (1445, chapter 7, example 7.10), 6600 V, 0.05 m², 1.2 T: 495.5 turns with 4.44 for 4.443, hence the tolerance.
        Assert.Equal(495.5, 6600 / (0.05 / Sizing.NetArea(1, 50, 1.2)), 0.5);
    }

    [Fact]
    public void Diameter_and_flux_density_are_inverse() =>
        Gen.Select(Gen.Double[1, 200], Gen.Double[16, 400], Gen.Double[0.5, 1.8], Gen.Double[0.9, 1], Gen.Int[1, 16]).Sample((volts, f, b, stacking, steps) =>
        {
            var area = Sizing.NetArea(volts, f, b);
            var sized = Sizing.Diameter(area, stacking, steps, 0.005);

            var exact = StepOptimizer.Best(sized.LeastDiameter_m, steps);
            Assert.Equal(b, Sizing.FluxDensity(volts * 20, 20, f, exact, stacking), 1e-12);
            Assert.InRange(sized.Section.CircleDiameter_m - sized.LeastDiameter_m, -1e-9, 0.005);
            Assert.True(Sizing.FluxDensity(volts * 20, 20, f, sized.Section, stacking) <= b * (1 + 1e-8));
            Assert.Equal(Math.Round(sized.Section.CircleDiameter_m / 0.005), sized.Section.CircleDiameter_m / 0.005, 1e-9);
        });

    [Fact]
    public void Diameter_that_is_a_multiple_already_stays()
    {
        var area = StepOptimizer.Best(0.22, 7).GrossArea_m2 * 0.965;
        Assert.Equal(0.22, Sizing.Diameter(area, 0.965, 7, 0.005).Section.CircleDiameter_m, 1e-12);
    }

    [Fact]
    public void DiameterFromStock_is_the_smallest_multiple_that_reaches_the_area() =>
        Gen.Select(Gen.Double[0.03, 0.4].Array[1, 12], Gen.Double[0.001, 0.1], Gen.Int[1, 8]).Sample((stock, area, steps) =>
        {
            const double increment = 0.005;
            var sized = Sizing.DiameterFromStock(area, 0.965, stock, steps, increment);
            var d = sized.Section.CircleDiameter_m;

            Assert.True(sized.NetArea_m2 >= area * (1 - 1e-9));
            Assert.InRange(sized.LeastDiameter_m, d - increment, d * (1 + 1e-12));

            // An account of its own: the multiple below falls short.
            var fitting = StepOptimizer.Within(d - increment, stock);
            Assert.True(fitting.Count == 0 || StepOptimizer.BestFromStock(d - increment, fitting, steps).GrossArea_m2 * 0.965 < area);
            Assert.True(StepOptimizer.BestFromStock(d, StepOptimizer.Within(d, stock), steps).GrossArea_m2 * 0.965 >= area * (1 - 1e-9));
        });

    [Fact]
    public void DiameterFromStock_never_undercuts_the_free_optimum()
    {
        var list = Enumerable.Range(4, 60).Select(i => i * 0.01).ToArray();
        var area = Sizing.NetArea(15, 50, 1.7);
        var free = Sizing.Diameter(area, 0.965, 7, 0.001);
        var stock = Sizing.DiameterFromStock(area, 0.965, list, 7, 0.001);
        Assert.InRange(stock.LeastDiameter_m, free.LeastDiameter_m, free.LeastDiameter_m * 1.02);
    }

    [Fact]
    public void Bad_input_is_refused_by_name()
    {
        Refused("voltsPerTurn_V", () => (object)Sizing.NetArea(double.NaN, 50, 1.7));
        Refused("frequency_Hz", () => (object)Sizing.NetArea(15, 0, 1.7));
        Refused("fluxDensity_T", () => (object)Sizing.NetArea(15, 50, -1.7));
        Refused("turns", () => (object)Sizing.FluxDensity(230, 0, 50, 0.03));
        Refused("limbVoltage_V", () => (object)Sizing.FluxDensity(1e308, 18, 50, 0.03));
        Refused("netArea_m2", () => Sizing.Diameter(double.PositiveInfinity, 0.96, 7, 0.005));
        Refused("netArea_m2", () => Sizing.Diameter(9000, 0.96, 7, 0.005));
        Refused("netArea_m2", () => Sizing.DiameterFromStock(50, 0.96, [0.1], 7, 0.005));
        Refused("increment_m", () => Sizing.Diameter(0.03, 0.96, 7, 0));
        Refused("stackingFactor", () => Sizing.Diameter(0.03, 1.2, 7, 0.005));
        Refused("stockWidths_m[0]", () => Sizing.DiameterFromStock(0.03, 0.96, [-1], 7, 0.005));
    }

    private static void Refused(string property, Func<object> call)
    {
        var e = Assert.Throws<GeometryException>(call);
        Assert.Equal(property, e.PropertyName);
    }
}
