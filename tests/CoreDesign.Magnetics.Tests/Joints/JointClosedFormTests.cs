using CoreDesign.Magnetics.Joints;

namespace CoreDesign.Magnetics.Tests.Joints;

/// <summary>Held against the independent lattice's rows, to which its constants were fitted: see the CSV's head.</summary>
public sealed class JointClosedFormTests
{
    [Theory]
    [InlineData(2, 0.08)]
    [InlineData(3, 0.11)]
    [InlineData(4, 0.11)]
    [InlineData(5, 0.11)]
    [InlineData(6, 0.11)]
    [InlineData(8, 0.13)]
    public void Mitres_scatter_about_the_lattice_by_no_more_than_the_fit_did(int positions, double rms)
    {
        var errors = JointCases.Read("joint_mmf_domain.csv")
            .Where(r => r.Mitred && r.Spec.Positions == positions && r.Mmf_A > 0.3)
            .Select(r => Math.Log(JointClosedForm.Mmf(r.Spec, JointCases.Steel, r.FluxDensity_T) / r.Mmf_A))
            .ToList();

        Assert.True(errors.Count > 80);
        Assert.InRange(Math.Sqrt(errors.Average(e => e * e)), 0, rms);
    }

    [Fact]
    public void Square_laps_lie_within_five_per_cent_of_the_lattice() =>
        Assert.All(
            JointCases.Read("joint_mmf_domain.csv").Where(r => !r.Mitred && r.Spec.Positions == 2),
            r => Assert.InRange(JointClosedForm.Mmf(r.Spec with { Kind = JointKind.ButtLap }, JointCases.Steel, r.FluxDensity_T) / r.Mmf_A, 0.95, 1.05));

    [Fact]
    public void Positions_beyond_the_fit_and_flux_densities_out_of_range_are_refused()
    {
        Assert.ThrowsAny<ArgumentException>(() => JointClosedForm.Mmf(JointCases.StepLap(9), JointCases.Steel, 1.5));
        Assert.ThrowsAny<ArgumentException>(() => JointClosedForm.Mmf(JointCases.StepLap(5), JointCases.Steel, 0));
        Assert.ThrowsAny<ArgumentException>(() => JointClosedForm.Mmf(JointCases.StepLap(5), JointCases.Steel, 2.1));
        Assert.Equal(0, JointClosedForm.Mmf(JointCases.StepLap(5, 0), JointCases.Steel, 1.5));
    }
}
