using CoreDesign.Magnetics.Joints;
using CoreDesign.Magnetics.Materials;

namespace CoreDesign.Magnetics.Tests.Joints;

public sealed class JointInputTests
{
    public static TheoryData<string, JointSpec> Refused => new()
    {
        { "Positions: 3", JointCases.Lap(JointKind.ButtLap) with { Positions = 3 } },
        { "Positions: 1", JointCases.StepLap(1) },
        { "Positions: 13", JointCases.StepLap(13) },
        { "Sheets per position: 0", JointCases.StepLap(5, sheets: 0) },
        { "Sheets per position: 5", JointCases.StepLap(5, sheets: 5) },
        { "Gap: -0.1 mm", JointCases.StepLap(5, -0.1) },
        { "Gap: 5.1 mm", JointCases.StepLap(5, 5.1) },
        { "Gap: NaN", JointCases.StepLap(5, double.NaN) },
        { "Shift: 0 mm", JointCases.StepLap(5, shift_mm: 0) },
        { "Shift: 31 mm", JointCases.StepLap(5, shift_mm: 31) },
        { "Shift: NaN", JointCases.StepLap(5, shift_mm: double.NaN) },
        { "Interface: 0.5 µm", JointCases.StepLap(5) with { Interface_m = 0.5e-6 } },
        { "Interface: 61 µm", JointCases.StepLap(5) with { Interface_m = 61e-6 } },
        { "Kind: 7", JointCases.StepLap(5) with { Kind = (JointKind)7 } },
    };

    [Theory]
    [MemberData(nameof(Refused))]
    public void A_figure_outside_its_range_is_refused_by_name(string start, JointSpec spec)
    {
        Assert.StartsWith(start, Assert.ThrowsAny<ArgumentException>(() => JointSolver.Solve(spec, JointCases.Steel)).Message, StringComparison.Ordinal);
        Assert.StartsWith(start, Assert.ThrowsAny<ArgumentException>(() => JointClosedForm.Mmf(spec, JointCases.Steel, 1.5)).Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Limits_themselves_are_accepted()
    {
        var spec = JointCases.StepLap(2, 5.0, 30) with { Interface_m = 60e-6 };

        Assert.True(JointSolver.Solve(spec, JointCases.Steel).Mmf_A[^1] > 0);
        Assert.True(JointSolver.Solve(spec with { Interface_m = 1e-6 }, JointCases.Steel).Mmf_A[^1] > 0);
    }

    [Theory]
    [InlineData("Sheet thickness", 0.27, 2.03, 36e3)]
    [InlineData("Saturation polarization", 0.27e-3, 0.9, 36e3)]
    [InlineData("Rotation stiffness", 0.27e-3, 2.03, 0)]
    [InlineData("Rotation stiffness", 0.27e-3, 2.03, double.NaN)]
    public void A_steel_outside_its_range_is_refused_by_name(string start, double thickness, double saturation, double stiffness) =>
        Assert.StartsWith(start, Assert.ThrowsAny<ArgumentException>(() => new JointSteel(JointCases.Curve, thickness, saturation, stiffness)).Message, StringComparison.Ordinal);

    [Fact]
    public void A_curve_above_its_saturation_is_refused() =>
        Assert.StartsWith("Magnetization curve: at its last point", Assert.ThrowsAny<ArgumentException>(() => new JointSteel(JointCases.Curve, 0.27e-3, 1.95)).Message, StringComparison.Ordinal);

    [Fact]
    public void A_curve_whose_polarization_falls_is_refused()
    {
        var curve = new MonotoneCurve([1, 1.9, 1.95, 1.99], [20, 1000, 60_000, 61_000], 1e6);

        Assert.StartsWith("Magnetization curve: the polarization", Assert.ThrowsAny<ArgumentException>(() => new JointSteel(curve, 0.27e-3, 2.03)).Message, StringComparison.Ordinal);
    }

    [Fact]
    public void A_curve_with_few_points_in_saturation_is_accepted()
    {
        var curve = new MonotoneCurve([1.0, 1.7, 1.9, 2.0, 2.0471, 2.1552], [14, 75, 900, 6000, 20_000, 100_000], 8e5);

        Assert.Equal(2.1552, new JointSteel(curve, 0.27e-3, 2.03).FluxDensityAcross(100_000, mitred: false), 0.02);
    }

    [Fact]
    public void Square_cut_gives_the_curve_back()
    {
        foreach (var b in (double[])[0.1, 0.5, 1.2, 1.55, 1.7, 1.85, 1.95, 1.99])
        {
            Assert.Equal(b, JointCases.Steel.FluxDensityAcross(JointCases.Curve.Value(b), mitred: false), 2e-4);
            Assert.Equal(-b, JointCases.Steel.FluxDensityAcross(-JointCases.Curve.Value(b), mitred: false), 2e-4);
        }
    }

    [Fact]
    public void Both_cuts_saturate_at_the_saturation_polarization()
    {
        foreach (var mitred in (bool[])[false, true])
        {
            var j = JointCases.Steel.FluxDensityAcross(1e7, mitred) - (MagneticConstants.Mu0_H_per_m * 1e7);

            Assert.InRange(j, 2.02, 2.03);
        }
    }

    // Derived: 1 + 2.03²/(2·mu0·36 kJ/m3).
    [Fact]
    public void Permeability_through_the_sheet_follows_from_rotation() =>
        Assert.Equal(46.55, JointCases.Steel.NormalPermeability, 0.01);

    [Fact]
    public void Fingerprint_tells_steels_apart_and_stays_for_equal_ones()
    {
        Assert.Equal(JointCases.Steel.Fingerprint, JointCases.SteelOf(0.27e-3).Fingerprint);
        Assert.NotEqual(JointCases.Steel.Fingerprint, JointCases.SteelOf(0.23e-3).Fingerprint);
        Assert.NotEqual(JointCases.Steel.Fingerprint, JointCases.SteelOf(0.27e-3, 30e3).Fingerprint);
        Assert.NotEqual(
            JointCases.Steel.Fingerprint,
            new JointSteel(new MonotoneCurve([1.0, 1.7, 2.0], [14, 75.001, 6000], 8e5), 0.27e-3, 2.03).Fingerprint);
    }
}
