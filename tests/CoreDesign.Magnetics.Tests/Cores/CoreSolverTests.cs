using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Cores;
using CoreDesign.Magnetics.Excitation;
using CoreDesign.Magnetics.Geometry;

namespace CoreDesign.Magnetics.Tests.Cores;

/// <summary>Laws of a solved core, on every form and connection.</summary>
public sealed class CoreSolverTests
{
    private static readonly SolverOptions Grid = new();
    private static CancellationToken Cancel => TestContext.Current.CancellationToken;

    [Theory]
    [MemberData(nameof(Cores.Every), MemberType = typeof(Cores))]
    public void Flux_adds_to_zero_at_every_node_and_energy_balances(CoreForm form, SupplyConnection connection, bool bank)
    {
        var s = Solve(Core(form, bank), connection, 1.2).Solution;
        var peak = s.Flux_Wb.Max(f => Waveform.Peak(f));
        foreach (var node in s.Circuit.Branches.SelectMany(b => new[] { b.From, b.To }).Distinct())
        {
            for (var t = 0; t < s.Points; t += 7)
            {
                Assert.Equal(0, s.Circuit.Branches.Select((b, i) => (b.From == node ? -1 : b.To == node ? 1 : 0) * s.Flux_Wb[i][t]).Sum(), 1e-12 * peak);
            }
        }

        Assert.Equal(s.CoreLoss_W, s.TerminalPower_W, 1e-3 * s.CoreLoss_W);
    }

    [Theory]
    [MemberData(nameof(Cores.Every), MemberType = typeof(Cores))]
    public void Refining_the_time_grid_leaves_rms_currents(CoreForm form, SupplyConnection connection, bool bank)
    {
        var core = Core(form, bank);
        var coarse = CoreSolver.Solve(core, Cores.Excited(core, connection), 1, new SolverOptions(256), Cancel).Solution;
        var fine = CoreSolver.Solve(core, Cores.Excited(core, connection), 1, new SolverOptions(1024), Cancel).Solution;
        foreach (var (x, y) in coarse.WindingCurrent_A.Zip(fine.WindingCurrent_A))
        {
            Assert.Equal(Waveform.Rms(y), Waveform.Rms(x), 1e-3 * Waveform.Rms(y));
        }
    }

    [Theory]
    [InlineData(CoreForm.ThreeLimb, SupplyConnection.StarWithNeutral)]
    [InlineData(CoreForm.ThreeLimb, SupplyConnection.StarIsolated)]
    [InlineData(CoreForm.FiveLimb, SupplyConnection.StarWithNeutral)]
    [InlineData(CoreForm.FiveLimb, SupplyConnection.StarIsolated)]
    [InlineData(CoreForm.FiveLimb, SupplyConnection.Delta)]
    public void Reversed_phase_order_swaps_the_outer_phases(CoreForm form, SupplyConnection connection)
    {
        // The other order of phases on the limbs is the mirrored core: what limb A drew, limb C draws.
        var core = Cores.Circuit(form);
        var circuit = core.With(Cores.Excited(core, connection));
        var mirrored = circuit with
        {
            Windings = [.. circuit.Windings.Select(w => w with { Coils = [.. w.Coils.Select(c => c with { Branch = c.Branch switch { "limbA" => "limbC", "limbC" => "limbA", var b => b } })] })],
        };
        CircuitSolution one = CircuitSolver.Solve(circuit, Grid, Cancel), other = CircuitSolver.Solve(mirrored, Grid, Cancel);
        for (var w = 0; w < 3; w++)
        {
            var rms = Waveform.Rms(one.WindingCurrent_A[w]);
            Assert.Equal(rms, Waveform.Rms(other.WindingCurrent_A[w]), 1e-6 * rms);
        }

        // Of a core with losses the outer phases differ where fluxes are free, since the loss shifts them one way round.
        var limbs = one.Circuit.Branches.Select((b, i) => (b.Name, i)).ToDictionary(x => x.Name, x => x.i);
        Assert.Equal(Waveform.Rms(one.Mmf_A[limbs["limbA"]]), Waveform.Rms(other.Mmf_A[limbs["limbC"]]), 1e-6 * Waveform.Rms(one.Mmf_A[limbs["limbA"]]));
    }

    [Theory]
    [InlineData(CoreForm.SinglePhaseTwoLimb, SupplyConnection.StarWithNeutral)]
    [InlineData(CoreForm.SinglePhaseTwoLimb, SupplyConnection.Delta)]
    [InlineData(CoreForm.SinglePhaseThreeLimb, SupplyConnection.StarWithNeutral)]
    [InlineData(CoreForm.SinglePhaseFourLimb, SupplyConnection.Delta)]
    public void Bank_solved_as_one_unit_equals_all_three_solved(CoreForm form, SupplyConnection connection)
    {
        // Both stop at a residual; a tighter one leaves no room between them.
        var core = Core(form, bank: true);
        var excitation = Cores.Excited(core, connection);
        var options = Grid with { Tolerance = 1e-12 };
        CircuitSolution one = CoreSolver.Solve(core, excitation, 1.15, options, Cancel).Solution, all = AsItStands(core, excitation, 1.15, options).Solution;
        Assert.Equal(all.Circuit.Branches.Select(b => b.Name), one.Circuit.Branches.Select(b => b.Name));
        Equal(all.WindingCurrent_A, one.WindingCurrent_A, 1e-9);
        Equal(all.Flux_Wb, one.Flux_Wb, 1e-9);
        Equal(all.Mmf_A, one.Mmf_A, 1e-9);
        Assert.Equal(all.CoreLoss_W, one.CoreLoss_W, 1e-9 * all.CoreLoss_W);
        Assert.Equal(all.TerminalPower_W, one.TerminalPower_W, 1e-9 * all.TerminalPower_W);
    }

    [Theory]
    [InlineData(CoreForm.ThreeLimb, false)]
    [InlineData(CoreForm.FiveLimb, false)]
    [InlineData(CoreForm.SinglePhaseTwoLimb, true)]
    public void Closed_delta_takes_the_mean_ampere_turns_of_a_star_and_leaves_the_fluxes(CoreForm form, bool bank)
    {
        var core = Core(form, bank);
        var without = Solve(core, SupplyConnection.StarWithNeutral, 1).Solution;
        foreach (var star in new[] { SupplyConnection.StarWithNeutral, SupplyConnection.StarIsolated })
        {
            var with = CoreSolver.Solve(core, Cores.Excited(core, star, new ClosedDelta(40)), 1, Grid, Cancel).Solution;
            Equal(without.Flux_Wb, with.Flux_Wb, 1e-7);
            var peak = Waveform.Peak(without.WindingCurrent_A[0]);
            for (var t = 0; t < with.Points; t++)
            {
                var mean = without.WindingCurrent_A.Average(i => i[t]);
                Assert.Equal(Cores.Turns / 40 * mean, with.WindingCurrent_A[3][t], 1e-5 * peak);
                Assert.Equal(without.WindingCurrent_A[0][t] - mean, with.WindingCurrent_A[0][t], 1e-5 * peak);
            }
        }
    }

    [Theory]
    [InlineData(SupplyConnection.StarWithNeutral)]
    [InlineData(SupplyConnection.Delta)]
    public void Closed_delta_with_resistance_beside_windings_without_carries_nothing(SupplyConnection connection)
    {
        var core = Core(CoreForm.ThreeLimb, bank: false);
        var excitation = Cores.Excited(core, connection, new ClosedDelta(40, 0.5));
        CircuitSolution parted = CoreSolver.Solve(core, excitation, 1, Grid, Cancel).Solution, whole = AsItStands(core, excitation, 1, Grid).Solution;
        Assert.Equal(3, parted.WindingCurrent_A.Length);
        Assert.Equal(0, Waveform.Peak(whole.WindingCurrent_A[3]), 1e-3 * Waveform.Peak(whole.WindingCurrent_A[0]));
        Assert.Equal(Waveform.Rms(whole.WindingCurrent_A[0]), Waveform.Rms(parted.WindingCurrent_A[0]), 1e-3 * Waveform.Rms(whole.WindingCurrent_A[0]));
    }

    [Fact]
    public void Resistances_part_the_triplens_between_an_earthed_star_and_a_closed_delta()
    {
        // At 3rd harmonic both are short-circuits but for their resistance, so ampere-turns part as N²/R of each: here 10,000/0.5 to 10,000/1.5.
        var core = Core(CoreForm.SinglePhaseTwoLimb, bank: true);
        var s = CoreSolver.Solve(core, Cores.Excited(core, SupplyConnection.StarWithNeutral, new ClosedDelta(100, 1.5), 0.5), 1, Grid, Cancel).Solution;
        double Third(int w) => Waveform.Harmonics(s.WindingCurrent_A[w], 3)[2].Amplitude;
        Assert.Equal(3, Third(0) / Third(3), 0.01);
    }

    [Fact]
    public void Uniform_core_stays_uniform()
    {
        // One section throughout, no joints: at every instant the field strength of a branch is that of its own flux alone, and the T zone's arms have the limb's area.
        var core = Cores.Circuit(CoreForm.ThreeLimb, joint: new JointBranch(null, 0));
        Assert.All(core.Branches.Where(b => b.Steel is not null), b => Assert.Equal(core.Geometry.NetLimbArea_m2, b.Area_m2, 1e-15));
        var s = Solve(core, SupplyConnection.StarWithNeutral, 1).Solution;
        int Index(string name) => core.Branches.Select((b, i) => (b.Name, i)).First(x => x.Name == name).i;
        for (var t = 0; t < s.Points; t += 5)
        {
            Assert.Equal(s.Mmf_A[Index("limbA")][t] / core.Branches[Index("limbA")].Length_m, s.Mmf_A[Index("yokeABTop")][t] / core.Branches[Index("yokeABTop")].Length_m, 1e-9);
            Assert.Equal(s.Mmf_A[Index("limbA")][t] / core.Branches[Index("limbA")].Length_m, -s.Mmf_A[Index("tZoneTopLeft")][t] / core.Branches[Index("tZoneTopLeft")].Length_m, 1e-9);
        }
    }

    [Fact]
    public void Arms_of_a_T_zone_have_the_area_of_what_they_lead_to_and_the_zones_steel()
    {
        var core = Cores.Circuit(CoreForm.FiveLimb);
        foreach (var zone in core.Geometry.Parts.Where(p => p.Kind == CorePartKind.TZone))
        {
            var arms = core.Parts.First(p => p.Part == zone.Name).Branches.Select(b => core.Branches[b]).ToList();
            Assert.Equal([core.Geometry.NetLimbArea_m2, core.Geometry.NetYokeArea_m2, core.Geometry.NetYokeArea_m2], arms.Select(a => a.Area_m2));
            Assert.Equal(zone.Volume_m3, arms.Sum(a => a.Area_m2 * a.Length_m), 1e-12);
        }
    }

    [Fact]
    public void Isolated_star_of_a_bank_lets_its_neutral_oscillate_and_a_closed_delta_holds_it()
    {
        var core = Core(CoreForm.SinglePhaseTwoLimb, bank: true);
        var free = Solve(core, SupplyConnection.StarIsolated, 1).Solution;
        var phase = free.Circuit.Supply.Voltage_V / Math.Sqrt(3);
        Assert.True(Waveform.Rms(NeutralVoltage.Of(free)) > 0.2 * phase);

        var held = AsItStands(core, Cores.Excited(core, SupplyConnection.StarIsolated, new ClosedDelta(40)), 1, Grid).Solution;
        Assert.Equal(0, Waveform.Rms(NeutralVoltage.Of(held)), 1e-3 * phase);
    }

    private static CoreCircuit Core(CoreForm form, bool bank)
    {
        var core = Cores.Circuit(form);
        return bank ? core.AsBank() : core;
    }

    private static CoreSolution Solve(CoreCircuit core, SupplyConnection connection, double buildingFactor) =>
        CoreSolver.Solve(core, Cores.Excited(core, connection), buildingFactor, Grid, Cancel);

    private static CoreSolution AsItStands(CoreCircuit core, CoreExcitation excitation, double buildingFactor, SolverOptions options) =>
        new PreparedCore(core, excitation, asItStands: true).Solve(excitation.Supply.Voltage_V, buildingFactor, options, Cancel);

    private static void Equal(double[][] expected, double[][] actual, double tolerance)
    {
        var peak = expected.Max(x => Waveform.Peak(x));
        foreach (var (x, y) in expected.Zip(actual))
        {
            for (var t = 0; t < x.Length; t++)
            {
                Assert.Equal(x[t], y[t], tolerance * peak);
            }
        }
    }
}
