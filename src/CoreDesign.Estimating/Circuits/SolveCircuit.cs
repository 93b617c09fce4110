using System.Globalization;
using CoreDesign.Estimating.Contracts;
using CoreDesign.Magnetics;
using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Excitation;

namespace CoreDesign.Estimating.Circuits;

/// <summary>Use case: a circuit case in, its periodic steady state out.</summary>
public static class SolveCircuit
{
    private const int HighestHarmonic = 13;
    private const int WaveformPoints = 96;

    public const int MostBranches = CircuitCaseReader.MaxBranches;
    public const int MostWindings = CircuitCaseReader.MaxWindings;

    /// <summary>Default that is a multiple of 96, so that the waveforms of the answer need no interpolation.</summary>
    public const int DefaultPoints = 384;

    public static Outcome<CircuitAnswer> Run(CircuitCase @case, int pointsPerPeriod = DefaultPoints, CancellationToken cancel = default)
    {
        ArgumentNullException.ThrowIfNull(@case);
        if (pointsPerPeriod is < 256 or > 4096 || pointsPerPeriod % 2 != 0)
        {
            return new() { Errors = [new FieldError("pointsPerPeriod", $"{pointsPerPeriod} is not an even number from 256 to 4096. Leave it out for {DefaultPoints}.")] };
        }

        var reader = new CircuitCaseReader(@case);
        if (reader.Read() is not { } circuit)
        {
            return new() { Errors = reader.Errors };
        }

        try
        {
            return new() { Value = Shape(CircuitSolver.Solve(circuit, new SolverOptions(pointsPerPeriod), cancel), @case) };
        }
        catch (CircuitException e)
        {
            return new() { Unsolvable = new Unsolvable(e.Message, null) };
        }
        catch (NotConvergedException e)
        {
            return new() { Unsolvable = new Unsolvable(e.Message, e.Residual) };
        }
        catch (OperationCanceledException)
        {
            return new() { Unsolvable = new Unsolvable("The solve took longer than the time allowed. Use fewer points per period or a smaller circuit.", null) };
        }
    }

    private static CircuitAnswer Shape(CircuitSolution s, CircuitCase @case)
    {
        var circuit = s.Circuit;
        var windings = circuit.Windings.Select((w, i) => (w.Name, w.Phase, Wave: s.WindingCurrent_A[i])).ToList();
        var lines = LineCurrents.Of(s);
        var mean = lines.Average(l => Waveform.Rms(l.Current_A));
        var apparent = (circuit.Supply.Connection == SupplyConnection.Single ? 1 : Math.Sqrt(3)) * circuit.Supply.Voltage_V * mean;
        var phases = windings.Where(w => w.Phase is WindingPhase.A or WindingPhase.B or WindingPhase.C).Select(w => w.Wave).ToList();
        var density = circuit.Branches.Select((b, i) => (b.Name, Wave: s.Flux_Wb[i].Select(f => f / b.Area_m2).ToArray())).ToList();
        return new CircuitAnswer
        {
            Windings = windings.ToDictionary(w => w.Name, w => Describe(w.Wave), StringComparer.Ordinal),
            Lines = lines.ToDictionary(l => l.Name, l => Describe(l.Current_A), StringComparer.Ordinal),
            Neutral = circuit.Supply.Connection == SupplyConnection.StarWithNeutral ? Describe(Sum(phases, 1)) : null,
            DeltaCirculating = circuit.Supply.Connection == SupplyConnection.Delta ? Describe(Sum(phases, 1.0 / 3)) : null,
            MeanLineRms = mean,
            Apparent_VA = apparent,
            I0_percent = @case.Rated_kVA is { } rated ? 100 * apparent / (1000 * rated) : null,
            TerminalPower_W = s.TerminalPower_W,
            CoreLoss_W = s.CoreLoss_W,
            CopperLoss_W = s.CopperLoss_W,
            BranchLoss_W = circuit.Branches.Select((b, i) => (b.Name, Loss: s.BranchLoss_W(i))).ToDictionary(x => x.Name, x => x.Loss, StringComparer.Ordinal),
            EnergyBalanceResidualOverVA = apparent > 0 ? (s.TerminalPower_W - s.CoreLoss_W - s.CopperLoss_W) / apparent : 0,
            BPeak = density.ToDictionary(d => d.Name, d => Waveform.Peak(d.Wave), StringComparer.Ordinal),
            BHarmonics = density.ToDictionary(d => d.Name, d => (IReadOnlyDictionary<string, double[]>)HarmonicsOf(d.Wave), StringComparer.Ordinal),
            Waveforms = new CaseWaveforms
            {
                Points = WaveformPoints,
                I = windings.ToDictionary(w => w.Name, w => Resample(w.Wave), StringComparer.Ordinal),
                Lines = lines.ToDictionary(l => l.Name, l => Resample(l.Current_A), StringComparer.Ordinal),
                B = density.ToDictionary(d => d.Name, d => Resample(d.Wave), StringComparer.Ordinal),
            },
            KernelVersion = Kernel.Version,
        };
    }

    private static CurrentAnswer Describe(double[] x) =>
        new() { Rms = Waveform.Rms(x), Peak = Waveform.Peak(x), Mean = Waveform.Mean(x), Harmonics = HarmonicsOf(x) };

    private static Dictionary<string, double[]> HarmonicsOf(double[] x) =>
        Waveform.Harmonics(x, HighestHarmonic).ToDictionary(
            h => h.Order.ToString(CultureInfo.InvariantCulture),
            h => new[] { h.Amplitude, h.Phase_deg },
            StringComparer.Ordinal);

    private static double[] Sum(List<double[]> waves, double factor) =>
        [.. Enumerable.Range(0, waves[0].Length).Select(t => factor * waves.Sum(w => w[t]))];

    private static double[] Resample(double[] x)
    {
        // Linear between points; exact where the number of points is a multiple of 96.
        var y = new double[WaveformPoints];
        for (var n = 0; n < WaveformPoints; n++)
        {
            var p = (double)n * x.Length / WaveformPoints;
            var i = (int)p;
            y[n] = x[i] + ((p - i) * (x[(i + 1) % x.Length] - x[i]));
        }

        return y;
    }
}
