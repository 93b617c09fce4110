using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Margins;
using CoreDesign.Estimating.Steels;
using CoreDesign.Estimating.Tests.Estimate;

namespace CoreDesign.Estimating.Tests.Margins;

public sealed class DcBiasMarginTests
{
    private static readonly DesignInput Single = Designs.WithFluxDensity(Designs.TwoLimb, 1.6);

    private static DcBiasResult? Solve(DesignInput design, double bias_A) =>
        StudyMargins.Run(design with { Margins = new() { DcBias_A = bias_A } }, SteelLibrary.Catalog, TestContext.Current.CancellationToken).Value!.DcBias;

    [Fact]
    public void Small_bias_tends_to_the_estimate()
    {
        var r = Designs.Solve(Single);
        var d = Solve(Single, 1e-6)!;
        Assert.Equal(r.NoLoadLoss_W, d.NoLoadLoss_W!.Value, 2e-3 * r.NoLoadLoss_W);
        Assert.Equal(r.NoLoadCurrent_percent, d.NoLoadCurrent_percent!.Value, 2e-3 * r.NoLoadCurrent_percent);
        Assert.Equal(r.Margin.PeakAtRated_T, d.PeakFluxDensity_T!.Value, 1e-3);
    }

    [Fact]
    public void Bias_adds_flux_current_and_even_harmonics()
    {
        var r = Designs.Solve(Single);
        var d = Solve(Single, 2 * r.NoLoadCurrent_A)!;
        Assert.Null(d.Reason);
        Assert.True(d.PeakFluxDensity_T > r.Margin.PeakAtRated_T + 0.05);
        Assert.Equal(r.Margin.PeakAtRated_T + d.Offset_T!.Value, d.PeakFluxDensity_T!.Value, 5e-3);

        // The law's loops keep their area when their middle moves, and the swing is the same.
        Assert.Equal(r.NoLoadLoss_W, d.NoLoadLoss_W!.Value, 0.01 * r.NoLoadLoss_W);
        Assert.True(d.NoLoadCurrent_A > 2 * r.NoLoadCurrent_A);
        var line = Assert.Single(d.Lines);
        Assert.Equal(2 * r.NoLoadCurrent_A, line.Waveform_A.Average(), 1e-4 * r.NoLoadCurrent_A);
        Assert.True(line.Harmonics[1].Rms_A > 0.3 * line.Harmonics[0].Rms_A);
    }

    [Fact]
    public void Three_limbs_hold_the_bias_off_by_their_path_through_air()
    {
        var design = Designs.WithFluxDensity(Designs.ThreeLimb, 1.65);
        var r = Designs.Solve(design);
        var three = Solve(design, 2 * r.NoLoadCurrent_A)!;
        Assert.Null(three.Reason);
        Assert.InRange(three.Offset_T!.Value, 1e-5, 0.02);
    }

    [Fact]
    public void Connection_without_a_path_says_so_and_what_to_do()
    {
        var d = Solve(Designs.ThreeLimb with { ExcitedWinding = Designs.ThreeLimb.ExcitedWinding! with { Connection = "D", Turns = 31 } }, 5)!;
        Assert.Null(d.NoLoadLoss_W);
        Assert.StartsWith("A delta and an isolated star have no path for direct current", d.Reason, StringComparison.Ordinal);
    }

    [Fact]
    public void None_asked_for_gives_none() => Assert.Null(Solve(Single, 0));
}
