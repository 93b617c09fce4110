using System.Globalization;
using CoreDesign.Estimating.Circuits;
using CoreDesign.Estimating.Tests.CrossCheck;

namespace CoreDesign.Benchmarks.Race;

/// <summary>
/// The same drawn circuits through the circuit simulator, our solver and the floor, in one run and at one accuracy: 0.1 % rms in every winding and line.
/// Times are the shortest of many runs on one core; the simulator's process start is taken off.
/// </summary>
internal static class RaceProgram
{
    private const double Accuracy = 1e-3;
    private const int Seed = 20261201;

    private static readonly (string Form, string Connection, bool Eddy, bool Stops, string Name)[] Entries =
    [
        ("threeLimb", "YN", true, true, "three-limb YN, all loss terms"),
        ("threeLimb", "D", true, true, "three-limb D, all loss terms"),
        ("threeLimb", "Y", false, false, "three-limb isolated star, single-valued"),
        ("fiveLimb", "YN", false, false, "five-limb YN, single-valued"),
        ("fiveLimb", "D", false, false, "five-limb D, single-valued"),
        ("threeLimb", "Y", true, true, "three-limb isolated star, all loss terms"),
        ("fiveLimb", "YN", true, true, "five-limb YN, all loss terms"),
        ("fiveLimb", "D", true, true, "five-limb D, all loss terms"),
    ];

    public static void Run()
    {
        Console.WriteLine("| circuit | points, error | prepared, µs | from the circuit, µs | simulator net, µs (steps, tolerance, error) | times faster: prepared; from the circuit | bare curves, µs (ours is) | bare Newton, µs (ours is) |");
        Console.WriteLine("|---|---|---|---|---|---|---|---|");
        foreach (var (form, connection, eddy, stops, name) in Entries)
        {
            var drawn = RandomCircuit.Draw(form, connection, eddy, stops, new Random(Seed));
            var ours = new Ours(new CircuitCaseReader(drawn.Case).Read()!, Accuracy);
            var prepared = Clock.Best_us(() => ours.Solve(fresh: false));
            var fresh = Clock.Best_us(() => ours.Solve(fresh: true));
            var curves = Clock.Best_us(Floor.Curves(ours));
            var loop = Floor.Loop(ours) is { } bare ? Clock.Best_us(bare) : (double?)null;
            var simulator = Simulator.Best(drawn, ours, Accuracy);
            var theirs = simulator is { } s ? Text($"{s.Net_us:0} ({s.Steps}, {s.Tolerance:0e0}, {s.Error:0.0e0})") : "no answer at this accuracy";
            var faster = simulator is { } x ? Text($"{x.Net_us / prepared:0}; {x.Net_us / fresh:0}") : "";
            var floor = loop is { } l ? Text($"{l:0.0} ({prepared / l:0.0} times)") : "";
            Console.WriteLine(Text($"| {name} | {ours.Options.PointsPerPeriod}, {ours.Error:0.0e0} | {prepared:0.0} | {fresh:0.0} | {theirs} | {faster} | {curves:0.00} ({prepared / curves:0.0} times) | {floor} |"));
        }
    }

    private static string Text(FormattableString text) => text.ToString(CultureInfo.InvariantCulture);
}
