using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Tests.Circuits.Laws;

namespace CoreDesign.Magnetics.Tests.Circuits;

public class PreparedCircuitTests
{
    public static TheoryData<Frame, SupplyConnection> Cases => new()
    {
        { Frame.Shell, SupplyConnection.Single },
        { Frame.ThreeLimb, SupplyConnection.StarWithNeutral },
        { Frame.ThreeLimb, SupplyConnection.StarIsolated },
        { Frame.FiveLimb, SupplyConnection.Delta },
    };

    [Theory]
    [MemberData(nameof(Cases))]
    public void Another_voltage_gives_what_a_circuit_of_that_voltage_gives(Frame frame, SupplyConnection connection)
    {
        var circuit = RandomCircuit.Draw(frame, connection, Ingredients.AllLosses, RandomCircuit.FirstSeed);
        var volts = 1.07 * circuit.Supply.Voltage_V;
        var again = new PreparedCircuit(circuit);
        again.Solve(cancel: TestContext.Current.CancellationToken);
        var expected = CircuitSolver.Solve(circuit with { Supply = circuit.Supply with { Voltage_V = volts } }, cancel: TestContext.Current.CancellationToken);
        Same(expected, again.Solve(volts, cancel: TestContext.Current.CancellationToken));
    }

    [Theory]
    [MemberData(nameof(Cases))]
    public void An_extra_loss_laid_on_afterwards_gives_what_the_circuit_with_it_gives(Frame frame, SupplyConnection connection)
    {
        var circuit = RandomCircuit.Draw(frame, connection, Ingredients.AllLosses, RandomCircuit.FirstSeed + 1);
        double[] extra = [.. circuit.Branches.Select((b, i) => b.Steel is null ? 0 : 0.1 * (1 + i) * b.Length_m / b.Area_m2)];
        var laden = circuit with { Branches = [.. circuit.Branches.Select((b, i) => b with { ExtraLoss_A_s_per_Wb = extra[i] })] };
        var expected = CircuitSolver.Solve(laden, cancel: TestContext.Current.CancellationToken);
        var solved = CircuitSolver.Solve(circuit, cancel: TestContext.Current.CancellationToken).WithExtraLoss(extra, TestContext.Current.CancellationToken);
        Same(expected, solved);
        Assert.Equal(expected.ExtraLoss_W.Sum(), solved.ExtraLoss_W.Sum(), 1e-9 * expected.CoreLoss_W);
        Assert.True(solved.ExtraLoss_W.Sum() > 0.001 * solved.CoreLoss_W);
        Assert.Equal(solved.CoreLoss_W, solved.TerminalPower_W, 1e-3 * solved.CoreLoss_W);
    }

    [Fact]
    public void A_time_point_allocates_nothing()
    {
        var prepared = new PreparedCircuit(RandomCircuit.Draw(Frame.FiveLimb, SupplyConnection.StarIsolated, Ingredients.AllLosses | Ingredients.Joints, RandomCircuit.FirstSeed));
        var run = new SolverRun(prepared, prepared.Circuit.Supply, null, new SolverOptions(96));
        var instant = new InstantSolver(run);
        var (z, past) = (new double[instant.Size], new double[prepared.Reduction.FreeCount]);
        March();
        var before = GC.GetAllocatedBytesForCurrentThread();
        March();
        Assert.Equal(before, GC.GetAllocatedBytesForCurrentThread());

        void March()
        {
            for (var t = 0; t < run.Span; t++)
            {
                instant.Solve(z, t, 0, null);
                instant.Accept(z, t);
            }

            instant.Turn();
        }
    }

    [Fact]
    public void A_linkage_offset_shifts_the_flux_and_brings_even_harmonics()
    {
        var circuit = RandomCircuit.Draw(Frame.TwoLimb, SupplyConnection.Single, Ingredients.None, RandomCircuit.FirstSeed);
        var offset = 0.05 * circuit.Supply.Voltage_V / circuit.Supply.Frequency_Hz;
        var s = CircuitSolver.Solve(circuit with { Windings = [circuit.Windings[0] with { LinkageOffset_Wb = offset }] }, cancel: TestContext.Current.CancellationToken);
        var linkage = circuit.Windings[0].Coils.Sum(c => c.Turns * s.Flux_Wb[circuit.Branches.Select((b, i) => (b.Name, i)).First(x => x.Name == c.Branch).i].Average());
        Assert.Equal(offset, linkage, 1e-9 * offset);
        Assert.True(Excitation.Waveform.Harmonics(s.WindingCurrent_A[0], 2)[1].Amplitude > 0.01 * Excitation.Waveform.Peak(s.WindingCurrent_A[0]));
        Assert.True(Excitation.Waveform.Mean(s.WindingCurrent_A[0]) > 0);
    }

    [Fact]
    public void A_winding_with_resistance_keeps_no_offset()
    {
        var circuit = RandomCircuit.Draw(Frame.TwoLimb, SupplyConnection.Single, Ingredients.Resistance, RandomCircuit.FirstSeed);
        var e = Assert.Throws<CircuitException>(() => CircuitSolver.Solve(circuit with { Windings = [circuit.Windings[0] with { LinkageOffset_Wb = 1 }] }));
        Assert.Contains("offset", e.Message, StringComparison.Ordinal);
    }

    private static void Same(CircuitSolution expected, CircuitSolution solved)
    {
        for (var w = 0; w < expected.WindingCurrent_A.Length; w++)
        {
            var scale = Excitation.Waveform.Peak(expected.WindingCurrent_A[w]);
            for (var t = 0; t < expected.Points; t++)
            {
                Assert.Equal(expected.WindingCurrent_A[w][t], solved.WindingCurrent_A[w][t], 1e-7 * scale);
            }
        }

        Assert.Equal(expected.CoreLoss_W, solved.CoreLoss_W, 1e-7 * expected.CoreLoss_W);
    }
}
