using System.Globalization;
using CoreDesign.Estimating.Circuits;
using CoreDesign.Estimating.Demo;
using CoreDesign.Estimating.Estimate;
using CoreDesign.Estimating.Steels;
using CoreDesign.Estimating.Tests.CrossCheck;
using CoreDesign.Magnetics.Circuits;
using CoreDesign.Sheets.Charts;
using CoreDesign.Sheets.Svg;

namespace CoreDesign.Benchmarks.Race;

/// <summary>How the cost grows with time points, with branches and free fluxes, and with the number of designs; a table of each and its plot.</summary>
internal static class GrowthProgram
{
    private const int Seed = 20261201;
    private static readonly int[] Points = [48, 96, 192, 384, 768, 1536, 3072];
    private static readonly int[] Windows = [2, 4, 8, 16, 32];
    private static readonly int[] Designs = [1, 10, 100, 1000];

    public static void Run(string folder)
    {
        Directory.CreateDirectory(folder);
        (string Name, MagneticCircuit Circuit)[] circuits =
        [
            ("three-limb YN", Drawn("threeLimb", "YN", true)),
            ("five-limb D, lossless", Drawn("fiveLimb", "D", false)),
            ("five-limb D", Drawn("fiveLimb", "D", true)),
        ];
        var byPoints = circuits.Select(c => (c.Name, Points.Select(p => Time_us(c.Circuit, p)).ToArray())).ToList();
        Write(folder, "points", "time points in a period", "Time of a solve against points", [.. Points.Select(p => (double)p)], byPoints, "µs");

        double[] branches = [.. Windows.Select(w => (double)Ladder(w, false).Branches.Count)];
        Write(folder, "branches", "branches (a limb and half as many return paths)", "Time of a solve against branches", branches,
            [
                ("single-valued", [.. Windows.Select(w => Time_us(Ladder(w, false), 96))]),
                ("all losses", [.. Windows.Select(w => Time_us(Ladder(w, true), 96))]),
            ],
            "µs");

        var design = DemoOrders.All[1].Design;
        void Estimate() => EstimateDesign.Run(design, SteelLibrary.Catalog);
        Write(folder, "designs", "estimates of a three-limb core", "Time of many estimates", [.. Designs.Select(n => (double)n)],
            [
                ("one core", [.. Designs.Select(n => Clock.Best_us(() => { for (var i = 0; i < n; i++) { Estimate(); } }) / 1000)]),
                ("two cores", [.. Designs.Select(n => Clock.Best_us(() => Parallel.For(0, n, new ParallelOptions { MaxDegreeOfParallelism = 2 }, _ => Estimate())) / 1000)]),
            ],
            "ms");
    }

    private static double Time_us(MagneticCircuit circuit, int points)
    {
        var prepared = new PreparedCircuit(circuit);
        var options = new SolverOptions(points) { Tolerance = 1e-5 };
        return Clock.Best_us(() => prepared.Solve(options));
    }

    private static MagneticCircuit Drawn(string form, string connection, bool losses) =>
        new CircuitCaseReader(RandomCircuit.Draw(form, connection, losses, losses, new Random(Seed)).Case).Read()!;

    /// <summary>A wound limb with many unequal return paths: as many free fluxes, less one.</summary>
    private static MagneticCircuit Ladder(int windows, bool losses)
    {
        var shell = Drawn("shell", "single", losses);
        var (limb, back) = (shell.Branches[0], shell.Branches[1]);
        return shell with
        {
            Branches =
            [
                limb,
                .. Enumerable.Range(0, windows).SelectMany(i => new[]
                {
                    back with { Name = $"out{i}", From = "top", To = $"end{i}", Area_m2 = limb.Area_m2 * (1 + (0.1 * i / windows)) / windows, Reluctance_A_per_Wb = 0 },
                    back with { Name = $"back{i}", From = $"end{i}", To = "bottom", Area_m2 = 1.1 * limb.Area_m2 * (1 + (0.1 * i / windows)) / windows },
                }),
            ],
        };
    }

    private static void Write(string folder, string key, string xName, string title, double[] x, List<(string Name, double[] Y)> series, string unit)
    {
        Console.WriteLine($"| {xName} | {string.Join(" | ", series.Select(s => $"{s.Name}, {unit}"))} |");
        Console.WriteLine($"|{string.Concat(Enumerable.Repeat("---|", series.Count + 1))}");
        for (var i = 0; i < x.Length; i++)
        {
            Console.WriteLine(string.Create(CultureInfo.InvariantCulture, $"| {x[i]} | {string.Join(" | ", series.Select(s => s.Y[i].ToString("G3", CultureInfo.InvariantCulture)))} |"));
        }

        Console.WriteLine();
        var all = series.SelectMany(s => s.Y).ToArray();
        var chart = new ChartBuilder(new ChartOptions { Width = 560, Height = 260 }, Axis.Decades(x[0], x[^1]), Axis.Decades(all.Min(), all.Max()), null, unit, xName);
        foreach (var (s, i) in series.Select((s, i) => (s, i)))
        {
            chart.Line(new(s.Name, unit, x, s.Y, LineLook.Of(i)) { Label = s.Name, Dots = [.. x.Select((v, k) => new Sheets.Scenes.XY(v, s.Y[k]))] });
        }

        var built = chart.Build(key, title, $"{title}; the table beside says the figures.", xName, "", new ChartTable(key + ".csv", [new(xName, x), .. series.Select(s => new ChartColumn(s.Name, s.Y))]));
        File.WriteAllText(Path.Combine(folder, key + ".svg"), SvgWriter.Write(built.Scene, new SvgOptions { Id = key, Standalone = true }));
    }
}
