using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Excitation;
using CoreDesign.Magnetics.Materials;

namespace CoreDesign.Magnetics.Tests.Circuits;

public class CircuitSolverTests
{
    private static readonly SheetLaw Steel = new(
        new MonotoneCurve([0.5, 1.0, 1.3, 1.5, 1.6, 1.7, 1.8, 1.9], [8, 14, 20, 30, 42, 75, 190, 900], 1 / MagneticConstants.Mu0_H_per_m),
        eddy_A_s_per_m_T: 2.1e6 * 0.00023 * 0.00023 / 12,
        excess: 0.4,
        excessFloor_T_per_s: 1,
        [new HysteresisStop(0.06, 33), new HysteresisStop(0.35, 2.3)]);

    [Fact]
    public void Three_limbs_on_YN_without_zero_sequence_path_are_refused_by_name()
    {
        var e = Assert.Throws<CircuitException>(() => CircuitSolver.Solve(ThreeLimb(SupplyConnection.StarWithNeutral, air: false)));
        Assert.Contains("zero-sequence path", e.Message, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(SupplyConnection.StarWithNeutral)]
    [InlineData(SupplyConnection.StarIsolated)]
    [InlineData(SupplyConnection.Delta)]
    public void Refining_the_time_grid_leaves_rms_currents(SupplyConnection connection)
    {
        var coarse = CircuitSolver.Solve(ThreeLimb(connection), new SolverOptions(256), TestContext.Current.CancellationToken);
        var fine = CircuitSolver.Solve(ThreeLimb(connection), new SolverOptions(1024), TestContext.Current.CancellationToken);
        for (var w = 0; w < 3; w++)
        {
            Assert.Equal(Waveform.Rms(fine.WindingCurrent_A[w]), Waveform.Rms(coarse.WindingCurrent_A[w]), 1e-3 * Waveform.Rms(fine.WindingCurrent_A[w]));
        }
    }

    [Theory]
    [InlineData(SupplyConnection.StarWithNeutral)]
    [InlineData(SupplyConnection.StarIsolated)]
    [InlineData(SupplyConnection.Delta)]
    public void Flux_adds_to_zero_at_every_node_and_energy_balances(SupplyConnection connection)
    {
        var s = CircuitSolver.Solve(ThreeLimb(connection), cancel: TestContext.Current.CancellationToken);
        foreach (var node in s.Circuit.Branches.SelectMany(b => new[] { b.From, b.To }).Distinct())
        {
            for (var t = 0; t < s.Points; t += 7)
            {
                var sum = s.Circuit.Branches.Select((b, i) => (b.From == node ? -1 : b.To == node ? 1 : 0) * s.Flux_Wb[i][t]).Sum();
                Assert.Equal(0, sum, 1e-12);
            }
        }

        Assert.Equal(s.CoreLoss_W, s.TerminalPower_W, 1e-3 * s.CoreLoss_W);
    }

    [Fact]
    public void Imposed_and_marched_solutions_agree()
    {
        // A winding resistance too small to matter sends the same circuit through the general solver.
        var direct = CircuitSolver.Solve(ThreeLimb(SupplyConnection.StarWithNeutral), cancel: TestContext.Current.CancellationToken);
        var marched = CircuitSolver.Solve(ThreeLimb(SupplyConnection.StarWithNeutral, resistance: 1e-7), cancel: TestContext.Current.CancellationToken);
        Assert.Null(marched.FluxPerLinkage);
        for (var w = 0; w < 3; w++)
        {
            Assert.Equal(Waveform.Rms(direct.WindingCurrent_A[w]), Waveform.Rms(marched.WindingCurrent_A[w]), 5e-4 * Waveform.Rms(direct.WindingCurrent_A[w]));
        }
    }

    [Fact]
    public void Permuting_outer_phases_permutes_their_currents()
    {
        var s = CircuitSolver.Solve(ThreeLimb(SupplyConnection.StarWithNeutral), cancel: TestContext.Current.CancellationToken);
        Assert.Equal(Waveform.Rms(s.WindingCurrent_A[0]), Waveform.Rms(s.WindingCurrent_A[2]), 1e-9);
        Assert.True(Waveform.Rms(s.WindingCurrent_A[1]) < Waveform.Rms(s.WindingCurrent_A[0]));
    }

    [Theory]
    [InlineData(22)]
    [InlineData(101)]
    [InlineData(5000)]
    public void Points_per_period_out_of_range_are_refused(int points) =>
        Assert.Throws<CircuitException>(() => CircuitSolver.Solve(ThreeLimb(SupplyConnection.Delta), new SolverOptions(points)));

    [Fact]
    public void Missing_phase_winding_is_refused_by_name()
    {
        var circuit = ThreeLimb(SupplyConnection.Delta);
        var e = Assert.Throws<CircuitException>(() => CircuitSolver.Solve(circuit with { Windings = [.. circuit.Windings.Take(2)] }));
        Assert.Contains("phase C", e.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Short_circuit_of_every_flux_path_ends_in_a_named_error()
    {
        // A closed winding without resistance on the only branch forbids the flux that the supply demands.
        var circuit = new MagneticCircuit(
            new Supply(SupplyConnection.Single, 230, 50),
            [
                new CircuitBranch { Name = "core", From = "p", To = "q", Area_m2 = 0.01, Length_m = 1, Steel = Steel },
                new CircuitBranch { Name = "gap", From = "q", To = "p", Area_m2 = 0.01, Reluctance_A_per_Wb = 1e4 },
            ],
            [new Winding("W", WindingPhase.Single, [new Coil("core", 100)]), new Winding("X", WindingPhase.Closed, [new Coil("core", 10)])]);
        Assert.Throws<CircuitException>(() => CircuitSolver.Solve(circuit));
    }

    private static MagneticCircuit ThreeLimb(SupplyConnection connection, bool air = true, double resistance = 0)
    {
        CircuitBranch Iron(string name, string from, string to, double length) =>
            new() { Name = name, From = from, To = to, Area_m2 = 0.03, Length_m = length, Steel = Steel };
        var branches = new List<CircuitBranch>
        {
            Iron("LA", "Ab", "At", 0.5), Iron("LB", "Bb", "Bt", 0.5), Iron("LC", "Cb", "Ct", 0.5),
            Iron("YABt", "At", "Bt", 0.4), Iron("YBCt", "Bt", "Ct", 0.4), Iron("YABb", "Ab", "Bb", 0.4), Iron("YBCb", "Bb", "Cb", 0.4),
        };
        if (air)
        {
            branches.Add(new CircuitBranch { Name = "Z0", From = "Bt", To = "Bb", Area_m2 = 1, Reluctance_A_per_Wb = 2e5 });
        }

        var volts = connection == SupplyConnection.Delta ? 233 : 404.0;
        return new MagneticCircuit(
            new Supply(connection, volts, 50),
            branches,
            [
                new Winding("A", WindingPhase.A, [new Coil("LA", 22)], resistance),
                new Winding("B", WindingPhase.B, [new Coil("LB", 22)], resistance),
                new Winding("C", WindingPhase.C, [new Coil("LC", 22)], resistance),
            ]);
    }
}
