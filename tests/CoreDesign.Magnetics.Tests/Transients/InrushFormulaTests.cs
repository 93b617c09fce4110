using CoreDesign.Magnetics.Transients;

namespace CoreDesign.Magnetics.Tests.Transients;

public sealed class InrushFormulaTests
{
    [Fact]
    public void Air_core_reactance_of_a_long_winding_is_the_textbook_one()
    {
        // 920 turns, mean diameter 980 mm, 1250 mm high, 50 Hz: mu0 N² A/h gives 201.6 ohm. Inputs of a textbook example, from memory; worked out again by hand.
        // A winding ten thousand times as high and as much denser has the same, since the ends then count for nothing.
        var coil = new AirCoil(920 * 100, 0.98, 1250 * 10);
        Assert.Equal(201.6, 2 * Math.PI * 50 * AirCore.Inductance_H([coil]), 0.2);
    }

    [Theory]
    [InlineData(0.5, 0.8182)]
    [InlineData(1, 0.6884)]
    [InlineData(2, 0.5255)]
    public void Ends_of_a_short_winding_count_as_in_the_tables(double diameterOverHeight, double coefficient)
    {
        // Nagaoka's coefficient, J. Coll. Sci. Tokyo 27 (1909), from memory: inductance over that of an endless winding's stretch.
        var coil = new AirCoil(100, diameterOverHeight, 1);
        var endless = 4e-7 * Math.PI * 1e4 * Math.PI / 4 * diameterOverHeight * diameterOverHeight;
        Assert.Equal(coefficient, AirCore.Inductance_H([coil]) / endless, 0.005);
    }

    [Fact]
    public void First_peak_of_the_textbook_example()
    {
        // 132/33 kV, 31.5 MVA: B_n 1.7 T, B_r 0.8 B_n, B_s 2.03 T, X_s 201.6 ohm, phase voltage 132/sqrt3 kV. By hand: sqrt2·76210/201.6·(3.4 + 1.36 - 2.03)/1.7 = 858.5 A.
        var x = new IdealInrush(132e3 / Math.Sqrt(3), 50, 1.7, 0.8 * 1.7, 2.03, 0, 201.6 / (100 * Math.PI), 0);
        Assert.Equal(858.5, InrushFormulas.Lossless_A(x), 0.5);
    }

    [Fact]
    public void Resistance_lowers_the_peak_and_none_leaves_it()
    {
        var x = new IdealInrush(1000, 50, 1.7, 1.2, 2, 0, 0.01, 1e-9);
        Assert.Equal(InrushFormulas.Lossless_A(x), InrushFormulas.WithResistance_A(x), 1e-6 * InrushFormulas.Lossless_A(x));
        Assert.True(InrushFormulas.WithResistance_A(x with { Resistance_ohm = 1 }) < 0.9 * InrushFormulas.Lossless_A(x));
        Assert.Equal(0, InrushFormulas.WithResistance_A(x with { Residual_T = -1.6, PeakFluxDensity_T = 1.7 }));
    }
}
