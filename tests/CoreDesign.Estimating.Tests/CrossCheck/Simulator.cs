using System.Diagnostics;
using System.Globalization;

namespace CoreDesign.Estimating.Tests.CrossCheck;

/// <summary>Debian's ngspice, run on one netlist in a folder of its own.</summary>
internal static class Simulator
{
    private const string Program = "/usr/bin/ngspice";

    /// <summary>The currents of the windings in their order, sample by sample over the last period; null where the simulator itself gave up on its time step.</summary>
    public static async Task<double[][]?> RunAsync(string netlist, int stepsPerPeriod, CancellationToken cancel)
    {
        Assert.True(File.Exists(Program), $"{Program} is missing. Run tests/run, which installs it, or: apt-get install ngspice");
        var folder = Directory.CreateTempSubdirectory("coredesign-netlist-");
        try
        {
            await File.WriteAllTextAsync(Path.Combine(folder.FullName, "circuit.cir"), netlist, cancel);
            var start = new ProcessStartInfo(Program, ["-b", "circuit.cir"]) { WorkingDirectory = folder.FullName, UseShellExecute = false, RedirectStandardOutput = true, RedirectStandardError = true };
            using var process = Process.Start(start)!;
            var said = process.StandardOutput.ReadToEndAsync(cancel);
            var errors = process.StandardError.ReadToEndAsync(cancel);
            await process.WaitForExitAsync(cancel);
            var result = Path.Combine(folder.FullName, "currents.txt");
            if (!File.Exists(result) && (await errors).Contains("Timestep too small", StringComparison.Ordinal)) return null;
            Assert.True(File.Exists(result), $"The simulator gave no result.\n{await errors}\n{await said}");
            var rows = (await File.ReadAllLinesAsync(result, cancel)).Select(Numbers).ToArray();
            Assert.InRange(rows.Length, stepsPerPeriod, stepsPerPeriod + 1);
            return [.. Enumerable.Range(1, rows[0].Length - 1).Select(column => rows.Take(stepsPerPeriod).Select(row => row[column]).ToArray())];
        }
        finally
        {
            folder.Delete(recursive: true);
        }
    }

    private static double[] Numbers(string line) =>
        [.. line.Split(' ', StringSplitOptions.RemoveEmptyEntries).Select(text => double.Parse(text, CultureInfo.InvariantCulture))];
}
