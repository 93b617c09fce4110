using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Cores;
using CoreDesign.Magnetics.Geometry;
using CoreDesign.Magnetics.Joints;
using CoreDesign.Magnetics.Losses;
using CoreDesign.Magnetics.Materials;
using CoreDesign.Magnetics.Tests.Circuits.Laws;

namespace CoreDesign.Magnetics.Tests.Cores;

/// <summary>Cores of a form drawn at random, in a sheet fitted to catalogue-like curves, with a solved joint; the seeds are those of the random circuits.</summary>
internal static class RandomCores
{
    private static readonly SteelData Data = new()
    {
        Name = "drawn",
        SheetThickness_m = 0.27e-3,
        Density_kg_m3 = 7650,
        Resistivity_ohm_m = 0.48e-6,
        SaturationPolarization_T = 2.03,
        Magnetization = [new(0.5, 9), new(1.0, 15), new(1.3, 21), new(1.5, 32), new(1.6, 48), new(1.7, 90), new(1.8, 260), new(1.9, 1200), new(2.0, 9000)],
        Loss = [new LossCurve(50, [new(0.5, 0.09), new(1.0, 0.35), new(1.3, 0.6), new(1.5, 0.82), new(1.7, 1.2), new(1.9, 2)])],
    };

    private static readonly SheetLaw Sheet = SheetLawCalibration.Fit(Data, 50).Law;
    private static readonly Dictionary<int, JointBranch> Joints = new[] { 2, 5 }.ToDictionary(m => m, JointOf);

    public static IEnumerable<(CoreCircuit Core, CoreExcitation Excitation, string Where)> Draw(CoreForm form, SupplyConnection connection, bool bank, int count)
    {
        for (var i = 0; i < count; i++)
        {
            var seed = RandomCircuit.FirstSeed + i;
            var random = new Random(seed);
            double In(double low, double high) => low + ((high - low) * random.NextDouble());
            var width = In(0.1, 0.8);
            var yoke = form switch { CoreForm.SinglePhaseTwoLimb or CoreForm.ThreeLimb => In(0.95, 1.3), CoreForm.FiveLimb => In(0.5, 0.7), _ => In(0.5, 0.62) };
            List<CoreStep> steps = [new(width, width * yoke, width * 0.5), new(0.8 * width, 0.8 * width * yoke, width * In(0.1, 0.3))];
            var geometry = CoreBuilder.Build(CoreLayout.Of(form, In(0.45, 0.6)), steps, 0.96, width * In(1.2, 4), width * In(0.5, 1.4), JointKind.StepLap, width * In(0.2, 0.7));
            var core = CoreCircuit.Build(geometry, Sheet, Joints[random.Next(2) == 0 ? 2 : 5], In(2e3, 2e4) / geometry.NetLimbArea_m2);
            var phase = Math.Sqrt(2) * Math.PI * 50 * 100 * geometry.NetLimbArea_m2 * In(1.2, 1.75);
            var line = connection is SupplyConnection.StarWithNeutral or SupplyConnection.StarIsolated ? Math.Sqrt(3) * phase : phase;
            var tertiary = connection != SupplyConnection.Single && random.Next(3) == 0 ? new ClosedDelta(In(20, 100)) : null;
            var resistance = random.Next(3) == 0 ? phase * In(1e-4, 1e-3) : 0;
            yield return (bank ? core.AsBank() : core, new CoreExcitation(new Supply(connection, line, 50), 100, resistance, tertiary), $"{form} {connection} bank {bank}, COREDESIGN_SEED={seed}");
        }
    }

    private static JointBranch JointOf(int positions)
    {
        var spec = new JointSpec { Kind = JointKind.StepLap, Positions = positions, SheetsPerPosition = 1, Gap_m = 0.3e-3, Shift_m = 4e-3, Interface_m = 8e-6 };
        return new(new JointCurve(JointSolver.Solve(spec, JointSteel.From(Data))).Drop, 0);
    }
}
