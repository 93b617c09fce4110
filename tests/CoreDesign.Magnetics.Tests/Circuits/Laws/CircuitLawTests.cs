using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Excitation;

namespace CoreDesign.Magnetics.Tests.Circuits.Laws;

/// <summary>Laws of nature and of symmetry on random circuits of every form and connection; what is expected follows from the laws themselves.</summary>
public class CircuitLawTests
{
    private static readonly Ingredients[] Mixes =
    [
        Ingredients.None, Ingredients.Eddy, Ingredients.AllLosses, Ingredients.AllLosses | Ingredients.Joints, Ingredients.AllLosses | Ingredients.ClosedDelta,
        Ingredients.AllLosses | Ingredients.Joints | Ingredients.Resistance, Ingredients.AllLosses | Ingredients.Resistance | Ingredients.ClosedDelta,
    ];

    public static TheoryData<Frame, SupplyConnection> Forms() => [.. CircuitLaws.Every()];

    [Theory]
    [MemberData(nameof(Forms))]
    public void Energy_balances_flux_adds_to_zero_and_half_periods_mirror(Frame frame, SupplyConnection connection) => Run(frame, connection, Mixes, (circuit, where) =>
    {
        var s = CircuitLaws.Solve(circuit);
        var volts = circuit.Supply.Voltage_V * (connection == SupplyConnection.Single ? 1 : Math.Sqrt(3));
        var apparent = volts * LineCurrents.Of(s).Average(l => Waveform.Rms(l.Current_A));
        var heat = s.CoreLoss_W + s.CopperLoss_W;

        // Without any loss the power is nothing beside the voltamperes, with loss it is the loss within a thousandth.
        var allowed = 1e-3 * (heat > 1e-3 * apparent ? heat : apparent);
        Assert.True(Math.Abs(s.TerminalPower_W - heat) < allowed, $"{where}: {s.TerminalPower_W} W in, {heat} W out");

        foreach (var node in circuit.Branches.SelectMany(b => new[] { b.From, b.To }).Distinct(StringComparer.Ordinal))
        {
            var sum = Enumerable.Range(0, s.Points).Max(t => Math.Abs(circuit.Branches.Select((b, i) => (b.From == node ? -1 : b.To == node ? 1 : 0) * s.Flux_Wb[i][t]).Sum()));
            var largest = s.Flux_Wb.Max(f => f.Max(Math.Abs));
            Assert.True(sum < 1e-12 * largest, $"{where}: {sum} Wb left over at {node}");
        }

        foreach (var waves in (double[][][])[s.Flux_Wb, s.WindingCurrent_A, s.Mmf_A])
        {
            Assert.True(CircuitLaws.Apart(waves, (i, t) => -waves[i][(t + (s.Points / 2)) % s.Points]) < 1e-6, $"{where}: half periods differ");
        }
    });

    [Theory]
    [MemberData(nameof(Forms))]
    public void Ampere_turns_of_the_windings_meet_the_drops_round_every_loop(Frame frame, SupplyConnection connection) => Run(frame, connection, Mixes, (circuit, where) =>
    {
        // Potentials are laid from node to node along any tree of branches; every branch left over must then fit.
        var s = CircuitLaws.Solve(circuit);
        for (var t = 0; t < s.Points; t += 7)
        {
            var drop = circuit.Branches.Select((b, i) => s.Mmf_A[i][t]
                - circuit.Windings.Select((w, k) => s.WindingCurrent_A[k][t] * w.Coils.Where(c => c.Branch == b.Name).Sum(c => c.Turns)).Sum()).ToArray();
            var scale = s.Mmf_A.Max(m => m.Max(Math.Abs));
            Assert.True(Misfit(circuit, drop) < 1e-6 * scale, $"{where}: loops miss by {Misfit(circuit, drop)} A at point {t}");
        }
    });

    [Theory]
    [MemberData(nameof(Forms))]
    public void Turns_and_size_scale_currents_and_losses(Frame frame, SupplyConnection connection) => Run(frame, connection, Mixes, (circuit, where) =>
    {
        var s = CircuitLaws.Solve(circuit);
        var n = CircuitLaws.Solve(CircuitLaws.WithTurns(circuit, 3.7));
        Assert.True(CircuitLaws.Apart(s.WindingCurrent_A, (w, t) => 3.7 * n.WindingCurrent_A[w][t]) < 1e-6, $"{where}: turns, currents");
        Assert.True(CircuitLaws.Apart(s.Flux_Wb, (b, t) => n.Flux_Wb[b][t]) < 1e-6, $"{where}: turns, fluxes");

        if (circuit.Branches.Any(b => b.Mmf is not null))
        {
            return;
        }

        const double k = 2.3;
        var big = CircuitLaws.Solve(CircuitLaws.WithSize(circuit, k));
        Assert.True(CircuitLaws.Apart(s.WindingCurrent_A, (w, t) => big.WindingCurrent_A[w][t] / k) < 1e-6, $"{where}: size, currents");
        Assert.Equal(k * k * k * s.CoreLoss_W, big.CoreLoss_W, 1e-6 * big.CoreLoss_W);
    });

    [Theory]
    [MemberData(nameof(Forms))]
    public void Order_and_direction_of_branches_and_windings_do_not_matter(Frame frame, SupplyConnection connection) => Run(frame, connection, Mixes, (circuit, where) =>
    {
        var s = CircuitLaws.Solve(circuit);
        var other = CircuitLaws.Solve(CircuitLaws.Shuffled(circuit, 7));
        double[][] currents = [.. circuit.Windings.Select(w => CircuitLaws.Current(other, w.Name))];
        Assert.True(CircuitLaws.Apart(s.WindingCurrent_A, (w, t) => currents[w][t]) < 1e-6, where);
        foreach (var name in circuit.Branches.Select(b => b.Name))
        {
            Assert.Equal(CircuitLaws.Loss(s, name), CircuitLaws.Loss(other, name), 1e-6 * s.CoreLoss_W);
        }
    });

    [Theory]
    [MemberData(nameof(Forms))]
    public void A_finer_time_grid_moves_no_rms_current_by_a_thousandth(Frame frame, SupplyConnection connection) => Run(frame, connection, Mixes, (circuit, where) =>
    {
        CircuitSolution coarse = CircuitLaws.Solve(circuit, 256), fine = CircuitLaws.Solve(circuit, 1024);
        foreach (var (name, c, f) in circuit.Windings.Select((w, i) => (w.Name, coarse.WindingCurrent_A[i], fine.WindingCurrent_A[i]))
            .Concat(LineCurrents.Of(coarse).Zip(LineCurrents.Of(fine), (x, y) => ("line " + x.Name, x.Current_A, y.Current_A))))
        {
            var moved = (Waveform.Rms(c) / Waveform.Rms(f)) - 1;
            Assert.True(Math.Abs(moved) < 1e-3, $"{where}: {name} moves by {moved:P3}");
        }
    });

    private static void Run(Frame frame, SupplyConnection connection, Ingredients[] mixes, Action<MagneticCircuit, string> law)
    {
        foreach (var with in mixes.Where(m => CircuitLaws.Possible(connection, m)))
        {
            for (var i = 0; i < CircuitLaws.Draws; i++)
            {
                var seed = RandomCircuit.FirstSeed + i;
                law(RandomCircuit.Draw(frame, connection, with, seed), $"{frame} {connection} with {with}, COREDESIGN_SEED={seed}");
            }
        }
    }

    private static double Misfit(MagneticCircuit circuit, double[] drop)
    {
        var potential = new Dictionary<string, double>(StringComparer.Ordinal);
        var left = Enumerable.Range(0, circuit.Branches.Count).ToList();
        while (left.Count > 0)
        {
            var next = left.FindIndex(b => potential.ContainsKey(circuit.Branches[b].From) || potential.ContainsKey(circuit.Branches[b].To));
            if (next < 0)
            {
                potential[circuit.Branches[left[0]].From] = 0;
                continue;
            }

            var branch = circuit.Branches[left[next]];
            if (potential.TryGetValue(branch.From, out var from) && potential.TryGetValue(branch.To, out var to))
            {
                if (Math.Abs(from - to - drop[left[next]]) is var miss and > 0 && miss > 1e-6 * drop.Max(Math.Abs))
                {
                    return miss;
                }
            }
            else if (potential.TryGetValue(branch.From, out from))
            {
                potential[branch.To] = from - drop[left[next]];
            }
            else
            {
                potential[branch.From] = potential[branch.To] + drop[left[next]];
            }

            left.RemoveAt(next);
        }

        return 0;
    }
}
