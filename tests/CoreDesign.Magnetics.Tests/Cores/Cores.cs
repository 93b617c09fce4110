using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Cores;
using CoreDesign.Magnetics.Geometry;
using CoreDesign.Magnetics.Joints;
using CoreDesign.Magnetics.Materials;

namespace CoreDesign.Magnetics.Tests.Cores;

/// <summary>Cores of every form at 1.7 T in one steel, with a joint curve that saturates.</summary>
internal static class Cores
{
    public const double Turns = 100;
    private const double Frequency_Hz = 50;
    private const double FluxDensity_T = 1.7;

    private static readonly SheetLaw Steel = new(
        new MonotoneCurve([0.5, 1.0, 1.3, 1.5, 1.6, 1.7, 1.8, 1.9], [8, 14, 20, 30, 42, 75, 190, 900], 1 / MagneticConstants.Mu0_H_per_m),
        eddy_A_s_per_m_T: 2.1e6 * 0.00023 * 0.00023 / 12,
        excess: 0.4,
        excessFloor_T_per_s: 1,
        [new HysteresisStop(0.06, 33), new HysteresisStop(0.35, 2.3)]);

    private static readonly JointBranch Joint = new(new MonotoneCurve([1.0, 1.4, 1.6, 1.7, 1.8], [10, 18, 30, 60, 200], 2e5), 0);

    public static CoreCircuit Circuit(CoreForm form, double? yokeFactor = null, JointBranch? joint = null)
    {
        var yoke = yokeFactor ?? (form is CoreForm.SinglePhaseTwoLimb or CoreForm.ThreeLimb ? 1 : form == CoreForm.FiveLimb ? 0.58 : 0.5);
        CoreStep[] steps = [new(0.3, 0.3 * yoke, 0.15), new(0.24, 0.24 * yoke, 0.1)];
        return CoreCircuit.Build(CoreBuilder.Build(form, steps, 0.96, 0.8, 0.4, JointKind.StepLap), Steel, joint ?? Joint, 2e5);
    }

    /// <summary>The line voltage that gives 1.7 T in the wound limbs.</summary>
    public static CoreExcitation Excited(CoreCircuit core, SupplyConnection connection, ClosedDelta? tertiary = null, double resistance = 0)
    {
        var phase = Math.Sqrt(2) * Math.PI * Frequency_Hz * Turns * core.Geometry.NetLimbArea_m2 * FluxDensity_T;
        var line = connection is SupplyConnection.StarWithNeutral or SupplyConnection.StarIsolated ? Math.Sqrt(3) * phase : phase;
        return new CoreExcitation(new Supply(connection, line, Frequency_Hz), Turns, resistance, tertiary);
    }

    public static TheoryData<CoreForm, SupplyConnection, bool> Every()
    {
        var all = new TheoryData<CoreForm, SupplyConnection, bool>();
        foreach (var form in Enum.GetValues<CoreForm>())
        {
            var single = form is not (CoreForm.ThreeLimb or CoreForm.FiveLimb);
            if (single)
            {
                all.Add(form, SupplyConnection.Single, false);
            }

            foreach (var connection in new[] { SupplyConnection.StarWithNeutral, SupplyConnection.StarIsolated, SupplyConnection.Delta })
            {
                all.Add(form, connection, single);
            }
        }

        return all;
    }
}
