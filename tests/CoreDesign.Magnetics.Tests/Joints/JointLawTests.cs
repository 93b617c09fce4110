using CoreDesign.Magnetics.Joints;

namespace CoreDesign.Magnetics.Tests.Joints;

public sealed class JointLawTests
{
    private const double Mu0 = MagneticConstants.Mu0_H_per_m;
    private static readonly double[] Gaps_mm = [0, 0.1, 0.25, 0.5, 1, 2, 3];

    [Theory]
    [InlineData(1, 0.25)]
    [InlineData(1, 1)]
    [InlineData(2, 0.5)]
    public void More_positions_never_raise_the_drop_at_1_7_tesla(int sheets, double gap)
    {
        var before = double.PositiveInfinity;
        for (var m = 2; m <= 9; m++)
        {
            var drop = new JointCurve(JointSolver.Solve(JointCases.StepLap(m, gap, sheets: sheets), JointCases.Steel)).Mmf_A(1.7);

            Assert.True(drop <= before, $"M={m}: {drop} A after {before} A");
            before = drop;
        }
    }

    [Theory]
    [InlineData(JointKind.ButtLap, 2, 1)]
    [InlineData(JointKind.MitredOverlap, 2, 2)]
    [InlineData(JointKind.StepLap, 3, 1)]
    [InlineData(JointKind.StepLap, 6, 1)]
    public void A_wider_gap_never_lowers_the_drop(JointKind kind, int positions, int sheets)
    {
        var curves = Gaps_mm
            .Select(g => new JointCurve(JointSolver.Solve(JointCases.StepLap(positions, g, 6, sheets) with { Kind = kind }, JointCases.Steel)))
            .ToArray();
        for (var k = 1; k < curves.Length; k++)
        {
            for (var b = 0.1; b < 1.95; b += 0.05)
            {
                Assert.True(curves[k].Mmf_A(b) >= curves[k - 1].Mmf_A(b), $"gap {Gaps_mm[k]} mm at {b:g3} T: {curves[k].Mmf_A(b)} A after {curves[k - 1].Mmf_A(b)} A");
            }
        }
    }

    [Theory]
    [InlineData(JointKind.ButtLap, 2, 1, 0.02, 0.3)]
    [InlineData(JointKind.MitredOverlap, 2, 4, 5, 2)]
    [InlineData(JointKind.StepLap, 2, 1, 0.5, 4)]
    [InlineData(JointKind.StepLap, 7, 2, 5, 3)]
    [InlineData(JointKind.StepLap, 12, 1, 0.05, 30)]
    public void Table_rises_strictly_and_covers_the_working_range(JointKind kind, int positions, int sheets, double gap, double shift)
    {
        var table = JointSolver.Solve(JointCases.StepLap(positions, gap, shift, sheets) with { Kind = kind }, JointCases.Steel);

        Assert.Equal(0.05, table.FluxDensity_T[0]);
        Assert.True(table.FluxDensity_T[^1] >= 1.9, $"ends at {table.FluxDensity_T[^1]} T");
        for (var k = 0; k < table.Mmf_A.Count; k++)
        {
            Assert.True(table.Mmf_A[k] > (k == 0 ? 0 : table.Mmf_A[k - 1]), $"level {k}");
            Assert.True(table.BridgingFluxDensity_T[k] > (k == 0 ? 0 : table.BridgingFluxDensity_T[k - 1]), $"level {k}");
        }
    }

    // Derived: a gap's cross-section holds M - 1 saturated sheets and one gap, so all further flux adds mu0·dH = M·dB to the field
    // there. M such cross-sections of length g lie in series, but the M sheets share one flux: dF = M·g·dB/mu0, here with M = 2.
    // A mitre sees B/sqrt(2).
    [Theory]
    [InlineData(JointKind.ButtLap, 1.4, 1.8, 1.0)]
    [InlineData(JointKind.MitredOverlap, 1.7, 1.85, 0.70710678)]
    public void Past_saturation_of_the_bridge_the_drop_grows_by_two_gaps_of_air(JointKind kind, double low, double high, double across)
    {
        var curve = new JointCurve(JointSolver.Solve(JointCases.Lap(kind, 3, 20), JointCases.Steel));

        var slope = (curve.Mmf_A(high) - curve.Mmf_A(low)) / (high - low);

        Assert.InRange(slope / (2 * 3e-3 / Mu0 * across), 0.99, 1.03);
    }

    // Derived: when limb and bridge are both at Js, a gap's cross-section lacks only the cut sheet's Js, so the excess is g·Js/mu0.
    [Fact]
    public void With_all_steel_saturated_the_excess_tends_to_the_polarization_lost_in_the_gap()
    {
        var table = JointSolver.Solve(JointCases.Lap(JointKind.ButtLap, 3, 20), JointCases.Steel);

        Assert.InRange(table.Mmf_A[^1] / (3e-3 * 2.03 / Mu0), 0.995, 1.01);
    }

    [Fact]
    public void A_gap_of_zero_has_no_drop()
    {
        var table = JointSolver.Solve(JointCases.StepLap(5, 0), JointCases.Steel);

        Assert.All(table.Mmf_A, f => Assert.Equal(0, f));
        Assert.Equal(0, new JointCurve(table).Mmf_A(2.3));
    }

    // From memory: a two-dimensional field analysis published in 2000 in a journal on power delivery, as a textbook on
    // transformers quotes it: at 1.7 T a single lap bridges with about 2.7 T and its gap carries about 0.7 T; six positions bridge with about 2.04 T.
    [Fact]
    public void Bridging_flux_densities_agree_with_a_published_field_analysis()
    {
        var single = new JointCurve(JointSolver.Solve(JointCases.Lap(JointKind.ButtLap, 0.5, 10), JointCases.Steel));
        var six = new JointCurve(JointSolver.SolveCut(JointCases.StepLap(6), JointCases.Steel, mitred: false, new JointGrid()));

        var bridging = single.BridgingFluxDensity_T(1.7);

        Assert.InRange(bridging, 2.6, 2.8);
        Assert.InRange((2 * 1.7) - bridging, 0.6, 0.8);
        Assert.InRange(six.BridgingFluxDensity_T(1.7), 2.0, 2.08);
    }

    [Fact]
    public void A_step_lap_of_two_positions_is_a_single_overlap()
    {
        var overlap = JointSolver.Solve(JointCases.Lap(JointKind.MitredOverlap), JointCases.Steel);
        var steps = JointSolver.Solve(JointCases.Lap(JointKind.StepLap), JointCases.Steel);

        Assert.Equal(overlap.Mmf_A, steps.Mmf_A);
    }

    // Reference figures of the project's physics notes for a rotation stiffness of 12 kJ/m3, at 1.5, 1.6, 1.7 and 1.8 T.
    [Theory]
    [InlineData(2, 7, new[] { 44.0, 98, 154, 210 })]
    [InlineData(3, 4, new[] { 11.0, 16, 21, 28 })]
    [InlineData(5, 4, new[] { 4.1, 8.5, 15, 21 })]
    [InlineData(6, 4, new[] { 3.2, 6.8, 13, 20 })]
    public void A_third_of_the_rotation_stiffness_lowers_the_drop_as_computed_independently(int positions, double shift, double[] expected)
    {
        var soft = JointCases.SteelOf(0.27e-3, 12e3);
        var curve = new JointCurve(JointSolver.Solve(JointCases.StepLap(positions, shift_mm: shift), soft));
        for (var k = 0; k < 4; k++)
        {
            Assert.InRange(curve.Mmf_A(1.5 + (0.1 * k)) / expected[k], 0.9, 1.1);
        }
    }
}
