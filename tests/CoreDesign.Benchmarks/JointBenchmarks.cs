using BenchmarkDotNet.Attributes;
using CoreDesign.Estimating.Steels;
using CoreDesign.Magnetics.Joints;

namespace CoreDesign.Benchmarks;

/// <summary>The table of a joint that nobody has asked for yet.</summary>
[MemoryDiagnoser]
public class JointBenchmarks
{
    private JointSteel steel = default!;

    [Params(2, 5, 8)]
    public int Positions { get; set; }

    [Params(1, 2)]
    public int SheetsPerPosition { get; set; }

    [GlobalSetup]
    public void TakeSteel()
    {
        if (!SteelLibrary.TryFind("M105-30P", out var grade)) throw new InvalidOperationException("M105-30P is not in the library.");
        steel = JointSteel.From(grade.ToSteelData());
    }

    [Benchmark]
    public JointTable Table() => JointSolver.Solve(
        new JointSpec
        {
            Kind = Positions == 2 ? JointKind.MitredOverlap : JointKind.StepLap,
            Positions = Positions,
            SheetsPerPosition = SheetsPerPosition,
            Gap_m = 0.3e-3,
            Shift_m = 4e-3,
            Interface_m = 8e-6,
        },
        steel);
}
