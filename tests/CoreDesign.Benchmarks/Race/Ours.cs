using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Excitation;

namespace CoreDesign.Benchmarks.Race;

/// <summary>Our solver at the fewest points that reach an accuracy: steady state, losses, and harmonics 1 to 13 of every winding and line.</summary>
internal sealed class Ours
{
    private const int HighestHarmonic = 13;
    private static readonly int[] Grids = [36, 48, 72, 96, 144, 192, 288];

    public Ours(MagneticCircuit circuit, double accuracy)
    {
        Prepared = new PreparedCircuit(circuit);
        Reference_A = Rms(Prepared.Solve(new SolverOptions(4096)));
        foreach (var points in Grids)
        {
            Options = new SolverOptions(points) { Tolerance = 0.01 * accuracy };
            Error = Deviation(Rms(Prepared.Solve(Options)));
            if (Error <= accuracy)
            {
                return;
            }
        }

        throw new InvalidOperationException($"No grid up to {Grids[^1]} points reaches {accuracy}.");
    }

    public PreparedCircuit Prepared { get; }

    public SolverOptions Options { get; }

    /// <summary>Rms of every winding and line at 4096 points.</summary>
    public double[] Reference_A { get; }

    /// <summary>Largest relative deviation from it at the grid taken.</summary>
    public double Error { get; }

    public double Deviation(double[] rms) => rms.Zip(Reference_A, (a, b) => Math.Abs((a / b) - 1)).Max();

    /// <summary>All that a user of the solver gets, once.</summary>
    public double Solve(bool fresh)
    {
        var s = (fresh ? new PreparedCircuit(Prepared.Circuit) : Prepared).Solve(Options);
        var sum = s.CoreLoss_W;
        foreach (var (_, current) in LineCurrents.Of(s))
        {
            sum += Waveform.Rms(current) + Waveform.Harmonics(current, HighestHarmonic)[0].Amplitude;
        }

        // In a star the lines are the windings.
        for (var w = 0; s.Circuit.Supply.Connection == SupplyConnection.Delta && w < s.WindingCurrent_A.Length; w++)
        {
            sum += Waveform.Rms(s.WindingCurrent_A[w]) + Waveform.Harmonics(s.WindingCurrent_A[w], HighestHarmonic)[0].Amplitude;
        }

        return sum;
    }

    public static double[] Rms(CircuitSolution s) => [.. s.WindingCurrent_A.Select(Waveform.Rms), .. LineCurrents.Of(s).Select(l => Waveform.Rms(l.Current_A))];
}
