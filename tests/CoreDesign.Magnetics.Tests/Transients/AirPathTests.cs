using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Materials;
using CoreDesign.Magnetics.Transients;
using static CoreDesign.Magnetics.Tests.Transients.TransientCircuits;

namespace CoreDesign.Magnetics.Tests.Transients;

public sealed class AirPathTests
{
    private static CancellationToken Cancel => TestContext.Current.CancellationToken;

    [Theory]
    [InlineData(0)]
    [InlineData(0.25)]
    public void Winding_whose_every_part_is_vacuum_has_its_air_core_inductance_if_the_rest_carries_no_flux(double endShare)
    {
        // The way back through the other half is all but closed by a gap, so that only the coil's own air and steel are left. With a share of the ends of 0 there is no way round.
        const double l = 0.02;
        var ring = Ring(SheetLaw.Linear(1), 1);
        ring = ring with { Branches = [ring.Branches[0], ring.Branches[1] with { Reluctance_A_per_Wb = endShare > 0 ? 1e15 : 1e-3, Steel = null }] };
        var air = AirPaths.Add(ring, [l], endShare);
        var s = EnergizingSolver.Solve(Close(air, angle_deg: 90), Cancel);
        var peak = Math.Sqrt(2) * ring.Supply.Voltage_V / (100 * Math.PI * l);
        Assert.Equal(peak, s.WindingCurrent_A[0].Max(Math.Abs), 1e-3 * peak);
    }

    [Fact]
    public void Air_counts_for_nothing_before_saturation()
    {
        var ring = Ring(Lossy, 1.5);
        var plain = CircuitSolver.Solve(ring, cancel: Cancel);
        var air = CircuitSolver.Solve(AirPaths.Add(ring, [0.01], 0.25), cancel: Cancel);
        Assert.Equal(plain.CoreLoss_W, air.CoreLoss_W, 1e-2 * plain.CoreLoss_W);
    }

    [Fact]
    public void Inductance_below_that_of_the_steel_is_refused_with_both_figures()
    {
        var ring = Ring(Lossy, 1.5);
        var least = AirPaths.Least_H(ring, ring.Windings[0], 0.25);
        Assert.Equal(0.75 * 2 * SaturatedInductance_H, least, 1e-12);
        AirPaths.Add(ring, [least * 1.001], 0.25);
        Assert.Contains("by itself", Assert.Throws<CircuitException>(() => AirPaths.Add(ring, [least * 0.99], 0.25)).Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Coils_of_a_winding_share_its_inductance_by_the_squares_of_their_turns()
    {
        // Two equal halves on two limbs: each has a quarter of the turns' square, so each half of the inductance.
        var ring = Ring(SheetLaw.Linear(1), 1);
        ring = ring with { Windings = [ring.Windings[0] with { Coils = [new Coil("one", Turns / 2), new Coil("other", Turns / 2)] }] };
        var air = AirPaths.Add(ring, [0.02], 0.25);
        Assert.Equal(4, air.Windings[0].Coils.Count);
        Assert.Equal(2, air.Branches.Count(b => b.Name.StartsWith("airRound", StringComparison.Ordinal)));
        var s = EnergizingSolver.Solve(Close(air, angle_deg: 90), Cancel);
        var peak = Math.Sqrt(2) * ring.Supply.Voltage_V / (100 * Math.PI * 0.02);

        // All vacuum, and both coils drive one ring: more than the air-core inductance, since neither needs the way round.
        Assert.InRange(s.WindingCurrent_A[0].Max(Math.Abs), 0.7 * peak, peak);
    }
}
