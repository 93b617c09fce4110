using CoreDesign.Magnetics.Joints;

namespace CoreDesign.Magnetics.Tests.Joints;

public sealed class JointCurveTests
{
    private static readonly JointTable Table = JointSolver.Solve(JointCases.StepLap(5), JointCases.Steel);
    private static readonly JointCurve Curve = new(Table);

    [Fact]
    public void Curve_passes_the_tables_points_and_is_odd()
    {
        for (var k = 0; k < Table.Mmf_A.Count; k++)
        {
            Assert.Equal(Table.Mmf_A[k], Curve.Mmf_A(Table.FluxDensity_T[k]), 1e-9);
            Assert.Equal(-Table.Mmf_A[k], Curve.Mmf_A(-Table.FluxDensity_T[k]), 1e-9);
            Assert.Equal(Table.BridgingFluxDensity_T[k], Curve.BridgingFluxDensity_T(Table.FluxDensity_T[k]), 1e-12);
        }
    }

    [Fact]
    public void Slope_is_the_derivative_and_never_negative()
    {
        for (var b = -2.0; b < 2; b += 0.0137)
        {
            Curve.Mmf_A(b, out var slope);

            Assert.True(slope >= 0);
            Assert.Equal((Curve.Mmf_A(b + 1e-6) - Curve.Mmf_A(b - 1e-6)) / 2e-6, slope, 1e-3 * (1 + slope));
        }
    }

    [Fact]
    public void Past_the_last_level_it_goes_on_with_the_last_segments_slope()
    {
        var segment = (Table.Mmf_A[^1] - Table.Mmf_A[^2]) / (Table.FluxDensity_T[^1] - Table.FluxDensity_T[^2]);

        var beyond = Curve.Mmf_A(Curve.LastFluxDensity_T + 0.5, out var slope);

        Assert.Equal(segment, slope, 1e-9);
        Assert.Equal(Table.Mmf_A[^1] + (0.5 * segment), beyond, 1e-6);
    }

    [Fact]
    public void Columns_of_different_length_are_refused() =>
        Assert.StartsWith("Joint table:", Assert.Throws<ArgumentException>(() => new JointCurve(new JointTable([1, 2], [1, 2], [1]))).Message, StringComparison.Ordinal);
}
