using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Materials;
using CoreDesign.Magnetics.Transients;
using static CoreDesign.Magnetics.Tests.Transients.TransientCircuits;

namespace CoreDesign.Magnetics.Tests.Transients;

/// <summary>Expected values: closed forms of the circuits, worked out here from the integral of the voltage or the analytic transient.</summary>
public sealed class EnergizingTests
{
    private const double Omega = 2 * Math.PI * 50;
    private static CancellationToken Cancel => TestContext.Current.CancellationToken;

    [Theory]
    [InlineData(0, 0)]
    [InlineData(0.8, 0)]
    [InlineData(0.8, 60)]
    [InlineData(0.5, 90)]
    [InlineData(0.8, 330)]
    public void First_peak_of_an_ideal_core_without_resistance_is_that_of_the_integral(double residual, double angle_deg)
    {
        // The flux goes to B_r + B_m (1 + cos a); beyond saturation the current is the excess linkage over the inductance that is left.
        const double b = 1.7, air = 0.004;
        var most = b * (residual + 1 + Math.Cos(angle_deg * Math.PI / 180));
        var expected = Turns * Area_m2 * (most - Saturation_T) / (SaturatedInductance_H + air);
        var found = Inrush.Solve(Close(WithAir(Ring(Ideal, b), air), residual, angle_deg), Cancel);
        Assert.Equal(expected, found.Peak_A, 1e-3 * expected);
        Assert.InRange(found.HalvingChange, 0, 1e-3);

        var formula = InrushFormulas.Lossless_A(new IdealInrush(Voltage_V(b), 50, b, residual * b, Saturation_T, angle_deg * Math.PI / 180, SaturatedInductance_H + air, 0));
        Assert.Equal(expected, formula, 1e-9 * expected);
        Assert.Equal(expected, InrushFormulas.WithResistance_A(new IdealInrush(Voltage_V(b), 50, b, residual * b, Saturation_T, angle_deg * Math.PI / 180, SaturatedInductance_H + air, 1e-9)), 1e-6 * expected);
    }

    [Fact]
    public void Switching_at_the_peak_of_the_voltage_without_residual_flux_gives_no_inrush()
    {
        var found = Inrush.Solve(Close(Ring(Ideal, 1.7), angle_deg: 90), Cancel);
        Assert.InRange(found.Peak_A, 0, 1e-3);
        Assert.Equal(0, InrushFormulas.Lossless_A(new IdealInrush(Voltage_V(1.7), 50, 1.7, 0, Saturation_T, Math.PI / 2, 0.01, 0)));
    }

    [Theory]
    [InlineData(0)]
    [InlineData(35)]
    [InlineData(200)]
    public void Linear_inductor_follows_the_analytic_transient(double angle_deg)
    {
        const double r = 3, source = 0.01;
        var ring = Ring(SheetLaw.Linear(40), 1);
        var l = (40 * SaturatedInductance_H) + source;
        double a = angle_deg * Math.PI / 180, z = Math.Sqrt((r * r) + (Omega * l * Omega * l)), p = Math.Atan2(Omega * l, r), peak = Math.Sqrt(2) * ring.Supply.Voltage_V / z;
        var s = EnergizingSolver.Solve(Close(ring, angle_deg: angle_deg, source_H: source, resistance: r) with { StepsPerPeriod = 2880 }, Cancel);
        for (var n = 0; n < s.Time_s.Length; n++)
        {
            var expected = peak * (Math.Sin((Omega * s.Time_s[n]) + a - p) - (Math.Sin(a - p) * Math.Exp(-r * s.Time_s[n] / l)));
            Assert.Equal(expected, s.WindingCurrent_A[0][n], 1e-4 * peak);
        }
    }

    [Fact]
    public void Lines_feeding_a_delta_carry_their_inductance_three_times_for_a_winding()
    {
        // Equal linear phases: the currents add to zero, so each winding sees (L + 3 Ls) di/dt = e.
        const double source = 0.02;
        var circuit = ThreePhase(SheetLaw.Linear(40), SupplyConnection.Delta, 1, bank: true);
        var l = (40 * SaturatedInductance_H) + (3 * source);
        var s = EnergizingSolver.Solve(Close(circuit, angle_deg: 20, source_H: source) with { StepsPerPeriod = 2880 }, Cancel);
        for (var k = 0; k < 3; k++)
        {
            var a = (20 - (120 * k)) * Math.PI / 180;
            var peak = Math.Sqrt(2) * circuit.Supply.Voltage_V / (Omega * l);
            for (var n = 0; n < s.Time_s.Length; n++)
            {
                Assert.Equal(peak * (Math.Cos(a) - Math.Cos((Omega * s.Time_s[n]) + a)), s.WindingCurrent_A[k][n], 2e-4 * peak);
            }
        }
    }

    [Theory]
    [InlineData(SupplyConnection.StarWithNeutral)]
    [InlineData(SupplyConnection.StarIsolated)]
    [InlineData(SupplyConnection.Delta)]
    public void Flux_and_energy_are_accounted_for_at_every_instant(SupplyConnection connection)
    {
        const double r = 0.5, source = 0.002;
        var circuit = AirPaths.Add(ThreePhase(Lossy, connection, 1.7), [0.008, 0.008, 0.008], 0.3);
        var e = Close(circuit, 0.7, 0, source_H: connection == SupplyConnection.Delta ? 0 : source, resistance: r) with { StepsPerPeriod = 2880 };
        var s = EnergizingSolver.Solve(e, Cancel);
        double supplied = 0, lost = 0, linked = 0;
        var h = s.Time_s[1];
        var scale = Inrush.PeakLinkage_Wb(circuit.Supply);
        double Stored(int n) => Enumerable.Range(0, 3).Sum(k => 0.5 * e.SourceInductance_H * s.WindingCurrent_A[k][n] * s.WindingCurrent_A[k][n]);
        for (var n = 1; n < s.Time_s.Length; n++)
        {
            var sum = 0.0;
            for (var k = 0; k < 3; k++)
            {
                double Power(int at) => s.Voltage_V[k][at] * s.WindingCurrent_A[k][at];
                double Heat(int at) => r * s.WindingCurrent_A[k][at] * s.WindingCurrent_A[k][at];
                supplied += 0.5 * h * (Power(n - 1) + Power(n));
                lost += 0.5 * h * (Heat(n - 1) + Heat(n));
                sum += s.WindingCurrent_A[k][n];
            }

            linked += 0.5 * h * (s.Voltage_V[0][n - 1] + s.Voltage_V[0][n] - (r * (s.WindingCurrent_A[0][n - 1] + s.WindingCurrent_A[0][n])));
            if (connection != SupplyConnection.StarIsolated)
            {
                Assert.Equal(linked, s.Linkage_Wb[0][n] - s.Linkage_Wb[0][0] + (e.SourceInductance_H * (s.WindingCurrent_A[0][n] - s.WindingCurrent_A[0][0])), 1e-3 * scale);
            }
            else
            {
                Assert.Equal(0, sum, 1e-6);
            }

            Assert.Equal(supplied, lost + s.BranchWork_J[n] + Stored(n) - Stored(0), 2e-3 * (lost + s.BranchWork_J[^1]));
        }
    }

    [Fact]
    public void Resistance_wears_the_inrush_off()
    {
        var peaks = Inrush.Solve(Close(Ring(Lossy, 1.7), 0.8, resistance: 1.5, source_H: 0.002), Cancel).PeakOfPeriod_A;
        Assert.Equal(3, peaks.Length);
        Assert.True(peaks[1] < 0.9 * peaks[0] && peaks[2] < 0.9 * peaks[1], string.Join(", ", peaks));
    }

    [Theory]
    [InlineData(SupplyConnection.StarWithNeutral)]
    [InlineData(SupplyConnection.Delta)]
    public void Halving_the_step_changes_the_peak_by_less_than_a_thousandth(SupplyConnection connection)
    {
        var found = Inrush.Solve(Close(ThreePhase(Lossy, connection, 1.7), 0.8, source_H: 1e-4, resistance: 0.1), Cancel);
        Assert.InRange(found.HalvingChange, 1e-12, 1e-3);
    }

    [Fact]
    public void Phase_that_closes_at_the_zero_of_its_voltage_is_the_worst_and_the_others_mirror_it()
    {
        var circuit = ThreePhase(Lossy, SupplyConnection.StarWithNeutral, 1.7);
        Assert.Equal("A", Inrush.Solve(Close(circuit, 0.8, source_H: 1e-4), Cancel).PeakLine);

        // Everything turned over: the supply by half a period, the residual flux by its sign.
        var there = Inrush.Solve(Close(circuit, 0.8), Cancel);
        var back = Inrush.Solve(Close(circuit, -0.8, 180), Cancel);
        Assert.Equal(there.Peak_A, back.Peak_A, 1e-6 * there.Peak_A);
    }

    [Fact]
    public void Residual_linkage_of_the_wrong_length_is_refused()
    {
        var close = Close(Ring(Lossy, 1.7)) with { ResidualLinkage_Wb = [] };
        Assert.Contains("needs a residual linkage", Assert.Throws<CircuitException>(() => EnergizingSolver.Solve(close, Cancel)).Message, StringComparison.Ordinal);
    }
}
