using System.Globalization;
using System.Numerics;
using CoreDesign.Estimating.Circuits;

namespace CoreDesign.Estimating.Tests.CrossCheck;

/// <summary>
/// Source: ngspice, a general-purpose circuit simulator (Debian package), solving the same circuits by its own methods at the time of the test.
/// Bounds: rms within 0.2 %, harmonics up to the 7th within 1 % of the fundamental.
/// </summary>
public sealed class SimulatorCrossCheckTests(ITestOutputHelper output)
{
    private const int StepsPerPeriod = 512;
    private const string SeedVariable = "COREDESIGN_SEED";
    private const int UsualSeed = 20261201;
    private const int Draws = 6;

    [Theory]
    [InlineData("shell", "single", false, false)]
    [InlineData("shell", "single", true, true)]
    [InlineData("threeLimb", "YN", true, false)]
    [InlineData("threeLimb", "Y", false, true)]
    [InlineData("threeLimb", "D", true, false)]
    [InlineData("fiveLimb", "YN", false, false)]
    [InlineData("fiveLimb", "D", true, true)]
    public async Task Random_circuit_agrees_with_a_circuit_simulator(string form, string connection, bool eddy, bool stops)
    {
        var seed = int.TryParse(Environment.GetEnvironmentVariable(SeedVariable), NumberStyles.None, CultureInfo.InvariantCulture, out var given) ? given : UsualSeed;
        RandomCircuit circuit;
        double[][]? theirs;
        var drawn = 0;
        do
        {
            output.WriteLine($"{form} {connection}: {SeedVariable}={seed}");
            circuit = RandomCircuit.Draw(form, connection, eddy, stops, new Random(seed));
            theirs = await Simulator.RunAsync(Netlist.Write(circuit, StepsPerPeriod), StepsPerPeriod, TestContext.Current.CancellationToken);
            if (theirs is null) output.WriteLine($"The simulator found no time step for seed {seed++}; another circuit is drawn.");
        }
        while (theirs is null && ++drawn < Draws);

        Assert.NotNull(theirs);
        var outcome = SolveCircuit.Run(circuit.Case, 1024, TestContext.Current.CancellationToken);
        Assert.True(outcome.Ok, $"{SeedVariable}={seed}: {outcome.Unsolvable?.Reason}{string.Join("; ", outcome.Errors.Select(e => $"{e.Path}: {e.Message}"))}");
        foreach (var (winding, current) in circuit.Case.Windings!.Zip(theirs))
        {
            var mine = outcome.Value!.Windings[winding.Name!];
            var rms = Math.Sqrt(current.Average(i => i * i));
            var worst = Enumerable.Range(1, 7).Max(h => (Harmonic(current, h) - Peak(mine, h)).Magnitude) / mine.Harmonics["1"][0];
            output.WriteLine(string.Create(CultureInfo.InvariantCulture, $"{winding.Name}: {mine.Rms:G6} A, simulator {rms:G6} A ({100 * ((mine.Rms / rms) - 1):+0.000;-0.000;0.000} %), worst harmonic {100 * worst:0.000} % of the fundamental"));
            Assert.True(Math.Abs((mine.Rms / rms) - 1) < 0.002, $"{SeedVariable}={seed}: winding {winding.Name} draws {mine.Rms} A rms, in the simulator {rms} A");
            Assert.True(worst < 0.01, $"{SeedVariable}={seed}: a harmonic of winding {winding.Name} is off by {100 * worst} % of the fundamental");
        }
    }

    // Cosine convention of the format: a_h·cos(hωt + φ_h).
    private static Complex Harmonic(double[] samples, int order) =>
        2.0 / samples.Length * samples.Select((x, i) => x * Complex.FromPolarCoordinates(1, -2 * Math.PI * order * i / samples.Length)).Aggregate(Complex.Add);

    private static Complex Peak(CurrentAnswer current, int order)
    {
        var harmonic = current.Harmonics[order.ToString(CultureInfo.InvariantCulture)];
        return Complex.FromPolarCoordinates(harmonic[0], harmonic[1] * Math.PI / 180);
    }
}
