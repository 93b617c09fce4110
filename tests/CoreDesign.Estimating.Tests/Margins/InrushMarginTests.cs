using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Margins;
using CoreDesign.Estimating.Steels;
using CoreDesign.Estimating.Tests.Estimate;

namespace CoreDesign.Estimating.Tests.Margins;

public sealed class InrushMarginTests
{
    private static readonly DesignInput Single = Designs.WithFluxDensity(Designs.TwoLimb, 1.6);

    private static InrushResult Solve(DesignInput design, InrushInput inrush) =>
        StudyMargins.Run(design with { Margins = new() { Inrush = inrush } }, SteelLibrary.Catalog, TestContext.Current.CancellationToken).Value!.Inrush;

    [Fact]
    public void Solved_peak_of_a_single_phase_core_lies_near_the_closed_formula()
    {
        // The formula knows no current below saturation and a sharp knee; 10 % for both.
        var found = Solve(Single, new());
        Assert.Equal(found.FormulaLossless_A!.Value, found.Peak_A!.Value, 0.1 * found.Peak_A.Value);
        Assert.Equal("L", found.PeakLine);
        Assert.Equal(10, found.PeakTime_ms!.Value, 0.2);
    }

    [Fact]
    public void Each_limiter_lowers_the_peak()
    {
        var worst = Solve(Single, new()).Peak_A;
        Assert.All(
            new InrushInput[] { new() { Residual_percent = 30 }, new() { SwitchingAngle_deg = 60 }, new() { SourceInductance_mH = 0.5 }, new() { Resistance_ohm = 0.2 } },
            input => Assert.True(Solve(Single, input).Peak_A < 0.95 * worst, $"{input}"));
    }

    [Fact]
    public void Opposite_half_wave_counts_in_the_formula_too()
    {
        // At 180° the flux sets out the other way; without residual flux that is the same peak.
        var there = Solve(Single, new() { Residual_percent = 0 });
        var back = Solve(Single, new() { Residual_percent = 0, SwitchingAngle_deg = 180 });
        Assert.Equal(there.FormulaLossless_A!.Value, back.FormulaLossless_A!.Value, 1e-9 * there.FormulaLossless_A.Value);
        Assert.Equal(there.Peak_A!.Value, back.Peak_A!.Value, 1e-6 * there.Peak_A.Value);
    }

    [Fact]
    public void Air_core_inductance_below_that_of_the_steel_is_refused_with_the_least_that_would_do()
    {
        var found = Solve(Single, new() { AirCoreInductance_mH = 0.01 });
        Assert.Null(found.Peak_A);
        Assert.Matches(@"^Air-core inductance 0\.01 mH is below 0\.\d+ mH, which the saturated steel of the limb has by itself\. Enter at least that, or leave it open\.$", found.Reason);
    }

    [Theory]
    [InlineData("YN")]
    [InlineData("Y")]
    [InlineData("D")]
    public void Three_phases_are_solved_in_every_connection(string connection)
    {
        var design = Designs.WithFluxDensity(Designs.ThreeLimb with { ExcitedWinding = new() { Connection = connection, LineVoltage_V = 400, Turns = 31 } }, 1.65);
        var found = Solve(design, new());
        Assert.Null(found.Reason);
        Assert.Equal(3, found.Lines.Count);
        Assert.InRange(found.Peak_A!.Value / found.FormulaLossless_A!.Value, 0.3, 1.6);
        if (connection != "YN")
        {
            var scale = found.Peak_A.Value;
            Assert.All(Enumerable.Range(0, found.Time_ms.Count), t => Assert.Equal(0, found.Lines.Sum(l => l.Current_A[t]), 1e-3 * scale));
        }
    }

    [Fact]
    public void Stored_curve_keeps_the_peak()
    {
        var found = Solve(Single, new());
        Assert.InRange(found.Time_ms.Count, 300, 600);
        Assert.Equal(60, found.Time_ms[^1], 0.5);
        Assert.Equal(found.Peak_A!.Value, found.Lines.Max(l => l.Current_A.Max(Math.Abs)), 0.005 * found.Peak_A.Value);
    }
}
