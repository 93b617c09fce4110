using System.Diagnostics;
using System.Globalization;
using CoreDesign.Estimating.Tests.CrossCheck;
using CoreDesign.Magnetics.Circuits;

namespace CoreDesign.Benchmarks.Race;

/// <summary>Debian's ngspice on the same circuit, at the coarsest step and loosest tolerance that reach the accuracy, and its start subtracted.</summary>
internal static class Simulator
{
    private const string Program = "/usr/bin/ngspice";
    private const int Runs = 5;
    private static readonly int[] Steps = [24, 48, 96, 192, 384, 768];
    private static readonly double[] Tolerances = [1e-3, 1e-4, 1e-6];

    /// <summary>Shortest wall time less that of a netlist of two elements, the steps per period and tolerance of it, and its error against the reference; null where none reaches it.</summary>
    public static (double Net_us, int Steps, double Tolerance, double Error)? Best(RandomCircuit circuit, Ours ours, double accuracy)
    {
        var start_us = Enumerable.Range(0, 2 * Runs).Min(_ => Run("* start\nV1 a 0 1\nR1 a 0 1\n.op\n.control\nrun\nquit\n.endc\n.end\n", out var _));
        (double, int, double, double)? best = null;
        foreach (var steps in Steps)
        {
            foreach (var tolerance in Tolerances)
            {
                var netlist = Netlist.Write(circuit, steps, tolerance);
                Run(netlist, out var rows);
                if (rows.Length < steps || ours.Deviation(Rms(rows, steps, ours.Prepared.Circuit.Supply.Connection)) is var error && error > accuracy)
                {
                    continue;
                }

                var net = Enumerable.Range(0, Runs).Min(_ => Run(netlist, out var _)) - start_us;
                if (best is null || net < best.Value.Item1)
                {
                    best = (net, steps, tolerance, error);
                }
            }

            // Finer steps only take longer.
            if (best is not null)
            {
                return best;
            }
        }

        return best;
    }

    private static double[] Rms(string[] rows, int steps, SupplyConnection connection)
    {
        double[][] samples = [.. rows.Take(steps).Select(r => r.Split(' ', StringSplitOptions.RemoveEmptyEntries).Skip(1).Select(x => double.Parse(x, CultureInfo.InvariantCulture)).ToArray())];
        var windings = samples[0].Length;
        double Of(Func<double[], double> value) => Math.Sqrt(samples.Average(s => value(s) * value(s)));
        var delta = connection == SupplyConnection.Delta;
        return [.. Enumerable.Range(0, windings).Select(w => Of(s => s[w])), .. Enumerable.Range(0, windings).Select(w => Of(s => delta ? s[w] - s[(w + 2) % 3] : s[w]))];
    }

    private static double Run(string netlist, out string[] rows)
    {
        var folder = Directory.CreateTempSubdirectory("coredesign-race-");
        try
        {
            File.WriteAllText(Path.Combine(folder.FullName, "circuit.cir"), netlist);
            var info = new ProcessStartInfo(Program, ["-b", "circuit.cir"]) { WorkingDirectory = folder.FullName, UseShellExecute = false, RedirectStandardOutput = true, RedirectStandardError = true };
            var clock = Stopwatch.StartNew();
            using var process = Process.Start(info)!;
            process.OutputDataReceived += (_, _) => { };
            process.ErrorDataReceived += (_, _) => { };
            process.BeginOutputReadLine();
            process.BeginErrorReadLine();
            process.WaitForExit();
            var time = clock.Elapsed.TotalMicroseconds;
            var result = Path.Combine(folder.FullName, "currents.txt");
            rows = File.Exists(result) ? File.ReadAllLines(result) : [];
            return time;
        }
        finally
        {
            folder.Delete(recursive: true);
        }
    }
}
