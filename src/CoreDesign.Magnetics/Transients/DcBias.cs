using CoreDesign.Magnetics.Circuits;
using MathNet.Numerics.LinearAlgebra;

namespace CoreDesign.Magnetics.Transients;

/// <summary>Steady state with direct current in the windings. Arrays run over one period from t = 0; first index is the winding or branch.</summary>
public sealed record DcBiasSolution
{
    public required MagneticCircuit Circuit { get; init; }

    /// <summary>Mean linkage that the direct current holds in each winding.</summary>
    public required double[] Offset_Wb { get; init; }
    public required double[][] WindingCurrent_A { get; init; }
    public required double[][] Flux_Wb { get; init; }

    /// <summary>Mean of voltage times current: what the core turns to heat. The resistance of the windings is not in it.</summary>
    public required double CoreLoss_W { get; init; }

    /// <summary>Largest difference of a winding's mean current from the one asked for, over that winding's rms current.</summary>
    public required double Residual { get; init; }

    public double PeakFluxDensity_T(int branch) => Flux_Wb[branch].Max(Math.Abs) / Circuit.Branches[branch].Area_m2;
}

/// <summary>
/// A circuit whose windings carry a direct current beside the no-load one. Resistance drops are neglected, so that the voltage imposes the alternating part of each
/// linkage; the mean part is what makes the mean current the given one. Newton's method on those means, each trial a march over whole periods
/// (half-wave symmetry does not hold) until one repeats.
/// </summary>
public static class DcBias
{
    private const int MaxIterations = 60;
    private const int MostPeriods = 60;
    private const double Tolerance = 1e-6;
    private const double Periodic = 1e-8;

    /// <param name="circuit">Single phase, or a star with its neutral: the only connections whose lines can carry direct current.</param>
    /// <param name="current_A">In each phase, into the winding's first end.</param>
    /// <param name="points">Of a period.</param>
    /// <param name="cancel">Ends the solve.</param>
    /// <exception cref="CircuitException">A connection without a path for direct current.</exception>
    /// <exception cref="NotConvergedException">No mean linkages found; carries the residual.</exception>
    public static DcBiasSolution Solve(MagneticCircuit circuit, double current_A, int points = 288, CancellationToken cancel = default)
    {
        ArgumentNullException.ThrowIfNull(circuit);
        ArgumentOutOfRangeException.ThrowIfLessThan(points, 48);
        if (circuit.Supply.Connection is not (SupplyConnection.Single or SupplyConnection.StarWithNeutral))
        {
            throw new CircuitException($"A {circuit.Supply.Connection} winding has no path for direct current through its lines. Take a single phase or a star with its neutral.");
        }

        var topology = CircuitTopology.Of(circuit);
        var driven = Enumerable.Range(0, circuit.Windings.Count).Where(k => circuit.Windings[k].Phase != WindingPhase.Closed).ToArray();
        var scale = Inrush.PeakLinkage_Wb(circuit.Supply);
        var offset = new double[driven.Length];
        var (now, miss) = Try(offset);
        for (var iteration = 0; iteration < MaxIterations && now.Residual > Tolerance; iteration++)
        {
            var slope = Matrix<double>.Build.Dense(driven.Length, driven.Length);
            for (var j = 0; j < driven.Length; j++)
            {
                var moved = offset.ToArray();
                moved[j] += 1e-5 * scale;
                slope.SetColumn(j, (Vector<double>.Build.DenseOfArray(Try(moved).Miss) - Vector<double>.Build.DenseOfArray(miss)) / (1e-5 * scale));
            }

            var step = slope.Solve(Vector<double>.Build.DenseOfArray(miss));
            var damping = Math.Min(1, 0.2 * scale / step.AbsoluteMaximum());
            double[] next;
            (DcBiasSolution Solution, double[] Miss) trial;
            do
            {
                next = [.. offset.Select((o, j) => o - (damping * step[j]))];
                trial = Try(next);
                damping /= 2;
            }
            while (Norm(trial.Miss) > Norm(miss) && damping > 1e-4);
            (offset, now, miss) = (next, trial.Solution, trial.Miss);
        }

        return now.Residual <= Tolerance ? now : throw new NotConvergedException($"No steady state with {current_A} A of direct current: the mean current still differs by {now.Residual:G3} of the rms.", now.Residual);

        (DcBiasSolution Solution, double[] Miss) Try(double[] at)
        {
            var all = new double[circuit.Windings.Count];
            for (var j = 0; j < driven.Length; j++)
            {
                all[driven[j]] = at[j];
            }

            var found = March(circuit, topology, all, points, cancel);
            double[] difference = [.. driven.Select(k => found.WindingCurrent_A[k].Average() - current_A)];
            var residual = driven.Select((k, j) => Math.Abs(difference[j]) / Math.Max(Excitation.Waveform.Rms(found.WindingCurrent_A[k]), double.Epsilon)).Max();
            return (found with { Residual = residual }, difference);
        }
    }

    private static double Norm(double[] x) => Math.Sqrt(x.Sum(v => v * v));

    private static DcBiasSolution March(MagneticCircuit circuit, CircuitTopology topology, double[] offset, int points, CancellationToken cancel)
    {
        int windings = circuit.Windings.Count, branches = circuit.Branches.Count;
        var instant = new TransientInstant(circuit, topology, new double[windings, windings], [.. circuit.Windings.Select(w => w.Resistance_ohm)]);
        double[] z = new double[instant.Size], last = new double[instant.Size], before = new double[instant.Size], history = new double[instant.Size], drive = new double[windings];
        var h = 1 / (circuit.Supply.Frequency_Hz * points);
        var w = 2 * Math.PI * circuit.Supply.Frequency_Hz;
        double Angle(int k, int t) => (2 * Math.PI * t / points) - WindingVoltage.Lag_rad(circuit.Windings[k].Phase);
        double[] peak = [.. circuit.Windings.Select(x => WindingVoltage.Peak_V(circuit.Supply, x.Phase))];
        var flux = circuit.Branches.Select(_ => new double[points]).ToArray();
        var current = circuit.Windings.Select(_ => new double[points]).ToArray();
        Drive(0);
        instant.Solve(z, 0, history, drive, imposed: true);
        instant.Accept(z);
        var first = instant.FirstCurrent;
        var unlike = double.PositiveInfinity;
        for (var period = 0; period < MostPeriods && unlike > Periodic; period++)
        {
            cancel.ThrowIfCancellationRequested();
            double change = 0, largest = 0;
            for (var t = 1; t <= points; t++)
            {
                var start = period == 0 && t == 1;
                for (var i = 0; i < z.Length; i++)
                {
                    history[i] = start ? -z[i] / h : ((-2 * z[i]) + (0.5 * last[i])) / h;
                    before[i] = last[i];
                    last[i] = z[i];
                    z[i] += start ? 0 : last[i] - before[i];
                }

                Drive(t % points);
                instant.Solve(z, (start ? 1 : 1.5) / h, history, drive, imposed: true);
                instant.Accept(z);
                for (var k = 0; k < windings; k++)
                {
                    change = Math.Max(change, Math.Abs(z[first + k] - current[k][t % points]));
                    largest = Math.Max(largest, Math.Abs(z[first + k]));
                    current[k][t % points] = z[first + k];
                }

                for (var b = 0; b < branches; b++)
                {
                    flux[b][t % points] = instant.BranchFlux(b, z);
                }
            }

            unlike = period == 0 ? unlike : change / Math.Max(largest, double.Epsilon);
        }

        if (unlike > Periodic)
        {
            throw new NotConvergedException($"With direct current no period repeated the one before in {MostPeriods}: the current still changes by {unlike:G3} of its peak.", unlike);
        }

        return new DcBiasSolution
        {
            Circuit = circuit,
            Offset_Wb = offset,
            WindingCurrent_A = current,
            Flux_Wb = flux,
            CoreLoss_W = Enumerable.Range(0, windings).Sum(k => Enumerable.Range(0, points).Average(t => peak[k] * Math.Cos(Angle(k, t)) * current[k][t])),
            Residual = double.PositiveInfinity,
        };

        void Drive(int t)
        {
            for (var k = 0; k < windings; k++)
            {
                drive[k] = (peak[k] / w * Math.Sin(Angle(k, t))) + offset[k];
            }
        }
    }
}
