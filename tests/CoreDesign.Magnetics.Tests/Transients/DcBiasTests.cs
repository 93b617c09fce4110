using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Excitation;
using CoreDesign.Magnetics.Materials;
using CoreDesign.Magnetics.Transients;
using static CoreDesign.Magnetics.Tests.Transients.TransientCircuits;

namespace CoreDesign.Magnetics.Tests.Transients;

public sealed class DcBiasTests
{
    private static CancellationToken Cancel => TestContext.Current.CancellationToken;

    [Theory]
    [InlineData(false)]
    [InlineData(true)]
    public void No_direct_current_gives_the_steady_state_without_bias(bool three)
    {
        var circuit = three ? ThreePhase(Lossy, SupplyConnection.StarWithNeutral, 1.7) : Ring(Lossy, 1.7);
        var plain = CircuitSolver.Solve(circuit, new SolverOptions(576), Cancel);
        var biased = DcBias.Solve(circuit, 0, 576, Cancel);
        for (var w = 0; w < circuit.Windings.Count; w++)
        {
            Assert.Equal(Waveform.Rms(plain.WindingCurrent_A[w]), Waveform.Rms(biased.WindingCurrent_A[w]), 1e-3 * Waveform.Rms(plain.WindingCurrent_A[w]));
        }

        Assert.Equal(plain.CoreLoss_W, biased.CoreLoss_W, 1e-3 * plain.CoreLoss_W);
        Assert.All(biased.Offset_Wb, o => Assert.InRange(Math.Abs(o), 0, 1e-3 * Inrush.PeakLinkage_Wb(circuit.Supply)));
    }

    [Theory]
    [InlineData(0.2)]
    [InlineData(3)]
    [InlineData(25)]
    public void Offset_of_a_single_valued_ring_is_the_one_whose_mean_field_fits(double dc_A)
    {
        // Independent: the mean of H(B0 + B cos x) over x, by bisection for B0; mean current = mean H times length over turns.
        const double b = 1.6;
        var law = SheetLaw.Lossless(Lossy.Spine);
        double low = 0, high = 2;
        for (var n = 0; n < 200; n++)
        {
            var middle = (low + high) / 2;
            var mean = Enumerable.Range(0, 4000).Average(i => law.Spine.Value(middle + (b * Math.Cos(2 * Math.PI * (i + 0.5) / 4000)))) * Length_m / Turns;
            (low, high) = mean > dc_A ? (low, middle) : (middle, high);
        }

        var found = DcBias.Solve(Ring(law, b), dc_A, cancel: Cancel);
        Assert.Equal(low, found.Offset_Wb[0] / (Turns * Area_m2), 1e-4);
        Assert.Equal(low + b, found.PeakFluxDensity_T(0), 1e-4);
        Assert.Equal(dc_A, found.WindingCurrent_A[0].Average(), 1e-4 * dc_A);
        Assert.InRange(found.CoreLoss_W, -1e-3 * found.Circuit.Supply.Voltage_V * dc_A, 1e-3 * found.Circuit.Supply.Voltage_V * dc_A);
    }

    [Fact]
    public void Even_harmonics_come_with_the_bias_alone()
    {
        var ring = Ring(Lossy, 1.6);
        Assert.InRange(Even(DcBias.Solve(ring, 0, cancel: Cancel)), 0, 1e-3);
        Assert.InRange(Even(DcBias.Solve(ring, 1, cancel: Cancel)), 0.1, 2);
        static double Even(DcBiasSolution s) => Waveform.Harmonics(s.WindingCurrent_A[0], 4) is var h ? h[1].Amplitude / h[0].Amplitude : 0;
    }

    [Fact]
    public void Three_equal_limbs_take_less_offset_than_three_rings_because_its_flux_must_cross_the_air()
    {
        var limbs = DcBias.Solve(ThreePhase(Lossy, SupplyConnection.StarWithNeutral, 1.6), 5, cancel: Cancel);
        var rings = DcBias.Solve(ThreePhase(Lossy, SupplyConnection.StarWithNeutral, 1.6, bank: true), 5, cancel: Cancel);
        Assert.All(limbs.WindingCurrent_A, i => Assert.Equal(5, i.Average(), 1e-3));
        Assert.True(limbs.Offset_Wb[0] < 0.5 * rings.Offset_Wb[0], $"{limbs.Offset_Wb[0]} {rings.Offset_Wb[0]}");
    }

    [Fact]
    public void Turning_the_current_over_turns_the_offset_over()
    {
        var there = DcBias.Solve(Ring(Lossy, 1.6), 2, cancel: Cancel);
        var back = DcBias.Solve(Ring(Lossy, 1.6), -2, cancel: Cancel);
        Assert.Equal(there.Offset_Wb[0], -back.Offset_Wb[0], 1e-4 * Math.Abs(there.Offset_Wb[0]));
        Assert.Equal(there.CoreLoss_W, back.CoreLoss_W, 1e-4 * there.CoreLoss_W);
    }

    [Theory]
    [InlineData(SupplyConnection.Delta)]
    [InlineData(SupplyConnection.StarIsolated)]
    public void Connection_without_a_path_for_direct_current_is_refused(SupplyConnection connection) =>
        Assert.Contains("no path for direct current", Assert.Throws<CircuitException>(() => DcBias.Solve(ThreePhase(Lossy, connection, 1.6), 1, cancel: Cancel)).Message, StringComparison.Ordinal);
}
