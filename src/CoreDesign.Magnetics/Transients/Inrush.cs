using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Excitation;

namespace CoreDesign.Magnetics.Transients;

/// <summary>The currents of the supply lines after closing, and their highest peak.</summary>
public sealed record InrushSolution
{
    public required double[] Time_s { get; init; }
    public required IReadOnlyList<(string Name, double[] Current_A)> Lines { get; init; }

    /// <summary>Highest absolute value of any line current.</summary>
    public required double Peak_A { get; init; }
    public required string PeakLine { get; init; }
    public required double PeakTime_s { get; init; }

    /// <summary>Highest absolute value of any line current in each period after closing.</summary>
    public required double[] PeakOfPeriod_A { get; init; }

    /// <summary>Change of the peak when the step was halved, relative; the figures are those of the smaller step.</summary>
    public required double HalvingChange { get; init; }
}

/// <summary>Inrush of a circuit: the transient at two step widths, and what its lines show.</summary>
public static class Inrush
{
    /// <summary>
    /// Residual linkages for a share of the steady peak in the winding that closes first in the row, and half of it against that in the two others of a three-phase
    /// supply, so that the limbs' fluxes add to zero. The share and its signs: common practice, no source.
    /// </summary>
    public static double[] ResidualLinkage_Wb(MagneticCircuit circuit, double share)
    {
        ArgumentNullException.ThrowIfNull(circuit);
        return [.. circuit.Windings.Select(w => PeakLinkage_Wb(circuit.Supply) * share * (w.Phase switch
        {
            WindingPhase.Closed => 0,
            WindingPhase.Single or WindingPhase.A => 1,
            _ => -0.5,
        }))];
    }

    /// <summary>Peak linkage of a winding across the supply in steady state, without resistance.</summary>
    public static double PeakLinkage_Wb(Supply supply)
    {
        ArgumentNullException.ThrowIfNull(supply);
        return WindingVoltage.Peak_V(supply, WindingPhase.A) / (2 * Math.PI * supply.Frequency_Hz);
    }

    /// <exception cref="NotConvergedException">An instant without a solution.</exception>
    public static InrushSolution Solve(Energizing e, CancellationToken cancel = default)
    {
        ArgumentNullException.ThrowIfNull(e);
        var coarse = Peak(Lines(e, EnergizingSolver.Solve(e, cancel)));
        var solution = EnergizingSolver.Solve(e with { StepsPerPeriod = 2 * e.StepsPerPeriod }, cancel);
        var lines = Lines(e, solution);
        var (peak, line, at) = Peak(lines);
        var perPeriod = 2 * e.StepsPerPeriod;
        return new InrushSolution
        {
            Time_s = solution.Time_s,
            Lines = lines,
            Peak_A = peak,
            PeakLine = line,
            PeakTime_s = solution.Time_s[at],
            PeakOfPeriod_A = [.. Enumerable.Range(0, (int)e.Periods).Select(p => lines.Max(l => l.Current_A.Skip(p * perPeriod).Take(perPeriod + 1).Max(Math.Abs)))],
            HalvingChange = peak > 0 ? Math.Abs(peak - coarse.Peak_A) / peak : 0,
        };
    }

    private static IReadOnlyList<(string Name, double[] Current_A)> Lines(Energizing e, EnergizingSolution s) => LineCurrents.Of(e.Circuit, s.WindingCurrent_A);

    private static (double Peak_A, string Line, int At) Peak(IReadOnlyList<(string Name, double[] Current_A)> lines)
    {
        var best = (Peak_A: -1.0, Line: "", At: 0);
        foreach (var (name, current) in lines)
        {
            for (var t = 0; t < current.Length; t++)
            {
                best = Math.Abs(current[t]) > best.Peak_A ? (Math.Abs(current[t]), name, t) : best;
            }
        }

        return best;
    }
}
