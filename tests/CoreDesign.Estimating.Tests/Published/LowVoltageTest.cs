using CoreDesign.Estimating.Estimate;
using CoreDesign.Estimating.Steels;
using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Cores;
using CoreDesign.Magnetics.Excitation;
using CoreDesign.Magnetics.Geometry;
using CoreDesign.Magnetics.Joints;
using CoreDesign.Magnetics.Losses;
using CoreDesign.Magnetics.Materials;

namespace CoreDesign.Estimating.Tests.Published;

/// <summary>The test at low voltage that excites one limb of a three-limb core after the other, the rest open.</summary>
internal static class LowVoltageTest
{
    /// <summary>Current of the middle limb below that of an outer one at the same voltage.</summary>
    public static Spread MiddleBelowOuter() =>
        Spread.Over(At(JointKind.StepLap, 0.3), from kind in new[] { JointKind.StepLap, JointKind.MitredOverlap } from b in new[] { 0.1, 0.3, 1.0 } select At(kind, b));

    /// <summary>The same core of one permeability, without joints: path lengths alone.</summary>
    public static double ByPathLengths() => At(JointKind.StepLap, 0.3, SheetLaw.Linear(20_000));

    private static double At(JointKind kind, double fluxDensity_T, SheetLaw? linear = null)
    {
        Assert.True(SteelLibrary.TryFind("M105-30P", out var grade));
        var data = grade.ToSteelData();
        var steps = StepOptimizer.Best(0.220, 7).WithYokes(1);
        var geometry = CoreBuilder.Build(CoreForm.ThreeLimb, steps, 0.965, 0.520, 0.190, kind);
        var spec = new JointSpec
        {
            Kind = kind,
            Positions = DesignDefaults.Positions(kind),
            SheetsPerPosition = 1,
            Gap_m = DesignDefaults.Gap_mm * 1e-3,
            Shift_m = DesignDefaults.Overlap_mm(kind) * 1e-3,
            Interface_m = DesignDefaults.Interface_um * 1e-6,
        };
        var joint = new JointCurve(JointSolver.Solve(spec, JointSteel.From(data)));
        var core = CoreCircuit.Build(geometry, linear ?? SheetLawCalibration.Fit(data, 50).Law, new JointBranch(linear is null ? joint.Drop : null, 0), zeroSequenceReluctance_A_per_Wb: 1e6);
        const double turns = 100;
        var volts = Math.Sqrt(2) * Math.PI * 50 * turns * core.Branches.Single(b => b.Name == "limbA").Area_m2 * fluxDensity_T;
        double Current(string limb) => Waveform.Rms(CircuitSolver.Solve(new MagneticCircuit(
            new Supply(SupplyConnection.Single, volts, 50),
            core.Branches,
            [new Winding("S", WindingPhase.Single, [new Coil(limb, turns)])])).WindingCurrent_A[0]);
        return 1 - (Current("limbB") / Current("limbA"));
    }
}
