using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Excitation;

namespace CoreDesign.Magnetics.Tests.Circuits.Laws;

/// <summary>What a connection does to the currents of random circuits, and what turning its phases round does.</summary>
public class ConnectionLawTests
{
    private static readonly Ingredients[] Mixes = [Ingredients.None, Ingredients.AllLosses | Ingredients.Joints, Ingredients.AllLosses | Ingredients.Resistance | Ingredients.ClosedDelta];

    private static readonly int[] Triplens = [3, 9];

    public static TheoryData<Frame, SupplyConnection> ThreePhase() => [.. CircuitLaws.Every().Where(f => f.Connection != SupplyConnection.Single)];

    [Theory]
    [MemberData(nameof(ThreePhase))]
    public void Line_currents_without_a_neutral_add_to_zero_at_every_instant(Frame frame, SupplyConnection connection)
    {
        foreach (var (circuit, where) in Drawn(frame, connection, Mixes))
        {
            var lines = LineCurrents.Of(CircuitLaws.Solve(circuit)).Select(l => l.Current_A).ToList();
            var peak = lines.Max(Waveform.Peak);
            var sum = Enumerable.Range(0, lines[0].Length).Max(t => Math.Abs(lines.Sum(l => l[t])));
            if (connection == SupplyConnection.StarWithNeutral)
            {
                // The neutral carries what is in phase in all three: triplens, whatever the form.
                Assert.True(circuit.Windings.Count > 3 || sum > 1e-3 * peak, $"{where}: nothing flows in the neutral");
            }
            else
            {
                Assert.True(sum < 1e-9 * peak, $"{where}: the lines add to {sum} A of {peak} A");
            }
        }
    }

    [Theory]
    [MemberData(nameof(ThreePhase))]
    public void Turning_the_phases_round_shifts_every_wave_by_a_third_of_a_period(Frame frame, SupplyConnection connection)
    {
        foreach (var (circuit, where) in Drawn(frame, connection, Mixes))
        {
            CircuitSolution s = CircuitLaws.Solve(circuit), later = CircuitLaws.Solve(CircuitLaws.WithPhases(circuit, p => p switch { WindingPhase.A => WindingPhase.B, WindingPhase.B => WindingPhase.C, _ => WindingPhase.A }));
            Assert.True(CircuitLaws.Apart(s.WindingCurrent_A, (w, t) => later.WindingCurrent_A[w][(t + (s.Points / 3)) % s.Points]) < 1e-6, $"{where}: currents");
            Assert.True(CircuitLaws.Apart(s.Flux_Wb, (b, t) => later.Flux_Wb[b][(t + (s.Points / 3)) % s.Points]) < 1e-6, $"{where}: fluxes");
        }
    }

    /// <summary>Without loss nothing tells forward from backward: the other phase sequence gives the same waves, read backwards.</summary>
    [Theory]
    [MemberData(nameof(ThreePhase))]
    public void Without_loss_the_other_phase_sequence_runs_the_waves_backwards(Frame frame, SupplyConnection connection)
    {
        foreach (var (circuit, where) in Drawn(frame, connection, [Ingredients.None, Ingredients.Joints, Ingredients.ClosedDelta]))
        {
            // e(-t) of star phases is e(t) with B and C changed; of delta phases, -e(t) with A and C changed.
            var delta = connection == SupplyConnection.Delta;
            var swapped = CircuitLaws.WithPhases(circuit, p => delta
                ? p switch { WindingPhase.A => WindingPhase.C, WindingPhase.C => WindingPhase.A, _ => p }
                : p switch { WindingPhase.B => WindingPhase.C, WindingPhase.C => WindingPhase.B, _ => p });
            CircuitSolution s = CircuitLaws.Solve(circuit), back = CircuitLaws.Solve(swapped);
            var sign = delta ? 1 : -1;
            Assert.True(CircuitLaws.Apart(s.WindingCurrent_A, (w, t) => sign * back.WindingCurrent_A[w][(s.Points - t) % s.Points]) < 1e-6, $"{where}: currents");
            Assert.True(CircuitLaws.Apart(s.Flux_Wb, (b, t) => sign * back.Flux_Wb[b][(s.Points - t) % s.Points]) < 1e-6, $"{where}: fluxes");
        }
    }

    [Fact]
    public void A_bank_in_delta_keeps_every_triplen_out_of_its_lines_and_in_its_windings()
    {
        foreach (var (circuit, where) in Drawn(Frame.Bank, SupplyConnection.Delta, Mixes))
        {
            var s = CircuitLaws.Solve(circuit);
            foreach (var (name, line) in LineCurrents.Of(s))
            {
                var h = Waveform.Harmonics(line, 9);
                Assert.All(Triplens, n => Assert.True(h[n - 1].Amplitude < 1e-6 * h[0].Amplitude, $"{where}: harmonic {n} of line {name}"));
            }

            // With a closed delta beside it the third harmonic may flow there instead.
            var inside = circuit.Windings.Where(w => w.Phase != WindingPhase.Closed).Select((_, w) => s.WindingCurrent_A[w]).Concat(s.WindingCurrent_A.Skip(3));
            Assert.Contains(inside, i => Waveform.Harmonics(i, 3) is var h && h[2].Amplitude > 0.02 * h[0].Amplitude);
        }
    }

    [Fact]
    public void A_bank_on_an_isolated_star_has_third_harmonic_flux_and_no_third_harmonic_current_and_a_closed_delta_takes_the_flux_away()
    {
        foreach (var (circuit, where) in Drawn(Frame.Bank, SupplyConnection.StarIsolated, [Ingredients.AllLosses]))
        {
            var s = CircuitLaws.Solve(circuit);
            Assert.All(s.WindingCurrent_A, i => Assert.True(Third(i) < 1e-6, $"{where}: third harmonic current {Third(i)}"));
            Assert.True(Third(CircuitLaws.Flux(s, "limbA")) > 0.02, $"{where}: third harmonic flux {Third(CircuitLaws.Flux(s, "limbA"))}");
        }

        foreach (var (circuit, where) in Drawn(Frame.Bank, SupplyConnection.StarIsolated, [Ingredients.AllLosses | Ingredients.ClosedDelta]))
        {
            var s = CircuitLaws.Solve(circuit);
            Assert.True(Third(CircuitLaws.Flux(s, "limbA")) < 1e-6, $"{where}: third harmonic flux {Third(CircuitLaws.Flux(s, "limbA"))}");
            Assert.True(Third(CircuitLaws.Current(s, "tertiary")) > 1, $"{where}: the closed delta carries more than its third harmonic");
        }
    }

    private static double Third(double[] wave) => Waveform.Harmonics(wave, 3) is var h ? h[2].Amplitude / Math.Max(h[0].Amplitude, double.Epsilon) : 0;

    private static IEnumerable<(MagneticCircuit Circuit, string Where)> Drawn(Frame frame, SupplyConnection connection, Ingredients[] mixes) =>
        from with in mixes
        where CircuitLaws.Possible(connection, with)
        from i in Enumerable.Range(0, CircuitLaws.Draws)
        let seed = RandomCircuit.FirstSeed + i
        select (RandomCircuit.Draw(frame, connection, with, seed), $"{frame} {connection} with {with}, COREDESIGN_SEED={seed}");
}
