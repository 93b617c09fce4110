using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Losses;
using CoreDesign.Magnetics.Materials;

namespace CoreDesign.Magnetics.Tests.Losses;

/// <summary>Loss follows the local wave of flux, not its peak alone; expected values are closed forms of the sheet law.</summary>
public class LocalWaveformLossTests
{
    private const int Points = 4800;
    private const double Frequency_Hz = 50;
    private static readonly MonotoneCurve Spine = new([1.0, 1.7], [15, 80], 1e5);

    /// <summary>
    /// A five-limb core forces a flattened flux on its yokes: same peak, steeper flanks. Sine 1 + third harmonic of share c has the mean square rate
    /// (wB)²/2·(1 + 9c²), so that share alone raises the classical loss by 9c² at the same fundamental.
    /// </summary>
    [Theory]
    [InlineData(0.1)]
    [InlineData(0.2)]
    public void Flattened_flux_of_the_same_peak_costs_more_eddy_and_excess_loss_and_the_same_hysteresis(double third)
    {
        var law = new SheetLaw(Spine, 1.3e-2, 0.3, 1e-6, [new(0.1, 40), new(0.6, 10)]);
        const double peak = 1.5;
        var sine = Wave(t => peak * Math.Sin(t));
        var flat = Flattened(third, peak);

        var (s, f) = (Loss(law, sine), Loss(law, flat));

        var fundamental = flat.Amplitude;
        Assert.True(fundamental > peak, "a flattened wave of the same peak has the larger fundamental");
        Assert.Equal(Math.Pow(fundamental / peak, 2) * (1 + (9 * third * third)), f.Classical_W_per_m3 / s.Classical_W_per_m3, 1e-4);
        Assert.InRange(f.Excess_W_per_m3 / s.Excess_W_per_m3, 1.02, f.Classical_W_per_m3 / s.Classical_W_per_m3);
        Assert.Equal(s.Hysteresis_W_per_m3, f.Hysteresis_W_per_m3, 1e-3 * s.Hysteresis_W_per_m3);
    }

    /// <summary>Excess loss of a sine: 8.76·k·(f·B)^1.5 (mean of |cos|^1.5 over a period, times (2π)^1.5).</summary>
    [Fact]
    public void Sine_gives_the_closed_forms_of_classical_excess_and_hysteresis_loss()
    {
        var law = new SheetLaw(Spine, 1.3e-2, 0.3, 1e-9, [new(0.1, 40), new(0.6, 10)]);
        const double b = 1.5;

        var loss = Loss(law, Wave(t => b * Math.Sin(t)));

        Assert.Equal(1.3e-2 * 2 * Math.Pow(Math.PI * Frequency_Hz * b, 2), loss.Classical_W_per_m3, 1e-6 * loss.Classical_W_per_m3);
        Assert.Equal(8.763 * 0.3 * Math.Pow(Frequency_Hz * b, 1.5), loss.Excess_W_per_m3, 1e-3 * loss.Excess_W_per_m3);
        Assert.Equal(Frequency_Hz * (Area(40, 0.1, b) + Area(10, 0.6, b)), loss.Hysteresis_W_per_m3, 1e-6 * loss.Hysteresis_W_per_m3);
    }

    /// <summary>
    /// A wave that dips by 2a on either flank runs a minor loop of amplitude a there: each adds 4·w·r·(a − r) for every stop with r below a, and
    /// nothing else changes (stops forget the dip once it is closed).
    /// </summary>
    [Theory]
    [InlineData(0.2)]
    [InlineData(0.5)]
    [InlineData(0.05)]
    public void A_dip_in_the_flux_adds_the_minor_loops_it_runs(double a)
    {
        const double b = 1.5;
        HysteresisStop[] stops = [new(0.1, 40), new(0.3, 20)];

        // Up to 0.5 T, down by 2a, up to the peak; the other half period mirrors it.
        double[] corners = [-b, 0.5, 0.5 - (2 * a), b, -0.5, -0.5 + (2 * a), -b];
        var loss = Loss(new SheetLaw(Spine, 0, 0, 1, stops), new Shape(Polygon(corners), b));

        var expected = Frequency_Hz * stops.Sum(s => Area(s.Weight_A_per_m_T, s.Threshold_T, b) + (2 * Area(s.Weight_A_per_m_T, s.Threshold_T, a)));
        Assert.Equal(expected, loss.Hysteresis_W_per_m3, 1e-9 * expected);
    }

    /// <summary>The same through a whole solve: return limbs of a shell core that saturate early leave each other flattened flux, and energy still balances.</summary>
    [Fact]
    public void A_branch_with_third_harmonic_flux_is_charged_for_its_own_rate()
    {
        var law = new SheetLaw(new MonotoneCurve([0.5, 1.0, 1.3, 1.5, 1.6, 1.7, 1.8, 1.9], [8, 14, 20, 30, 42, 75, 190, 900], 8e5), 1.3e-2, 0.3, 20, [new(0.1, 40)]);
        CircuitBranch Iron(string name, string from, string to, double area, double length) => new() { Name = name, From = from, To = to, Area_m2 = area, Length_m = length, Steel = law };
        var s = CircuitSolver.Solve(
            new MagneticCircuit(
                new Supply(SupplyConnection.Single, Math.Sqrt(2) * Math.PI * 50 * 100 * 0.02 * 1.7, 50),
                [Iron("limb", "b", "t", 0.02, 0.6), Iron("short", "t", "b", 0.01, 1.0), Iron("long", "t", "b", 0.012, 2.6)],
                [new Winding("S", WindingPhase.Single, [new Coil("limb", 100)])]),
            new SolverOptions(1152),
            TestContext.Current.CancellationToken);

        for (var branch = 1; branch < 3; branch++)
        {
            var b = s.Circuit.Branches[branch];
            var peak = s.PeakFluxDensity_T(branch);
            var ofPeak = Loss(law, Wave(t => peak * Math.Sin(t)));
            var local = s.ClassicalLoss_W[branch] / (b.Area_m2 * b.Length_m);
            var ownRate = s.FluxRate_Wb_per_s[branch].Average(r => Math.Pow(r / b.Area_m2, 2)) * law.Eddy_A_s_per_m_T;
            Assert.Equal(ownRate, local, 1e-9 * ownRate);
            Assert.True(Math.Abs((local / ofPeak.Classical_W_per_m3) - 1) > 0.02, $"{b.Name}: no distortion to see, {local} against {ofPeak.Classical_W_per_m3} W/m3");
        }

        Assert.Equal(s.CoreLoss_W, s.TerminalPower_W, 1e-3 * s.CoreLoss_W);
    }

    private static double Area(double weight, double threshold, double amplitude) => 4 * weight * threshold * Math.Max(0, amplitude - threshold);

    private static Shape Flattened(double third, double peak)
    {
        // sin t + c·sin 3t: the third in phase flattens the top.
        var unit = Wave(t => Math.Sin(t) + (third * Math.Sin(3 * t))).B;
        var amplitude = peak / unit.Max();
        return new(Array.ConvertAll(unit, x => amplitude * x), amplitude);
    }

    private static Shape Wave(Func<double, double> b) => new([.. Enumerable.Range(0, Points).Select(n => b(2 * Math.PI * n / Points))], 0);

    private static double[] Polygon(double[] corners)
    {
        var each = Points / (corners.Length - 1);
        return [.. Enumerable.Range(0, each * (corners.Length - 1)).Select(n => corners[n / each] + ((corners[(n / each) + 1] - corners[n / each]) * (n % each) / each))];
    }

    private static SheetHeat Loss(SheetLaw law, Shape wave)
    {
        var n = wave.B.Length;
        double[] rate = [.. Enumerable.Range(0, n).Select(t => (wave.B[(t + 1) % n] - wave.B[(t + n - 1) % n]) * n * Frequency_Hz / 2)];
        return SheetHeat.Of(law, wave.B, rate, Frequency_Hz);
    }

    private sealed record Shape(double[] B, double Amplitude);
}
