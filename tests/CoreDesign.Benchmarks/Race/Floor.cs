using CoreDesign.Magnetics.Circuits;

namespace CoreDesign.Benchmarks.Race;

/// <summary>What no solver of these equations can do without, in the same language: the bare curves, and Newton's loop with nothing around it.</summary>
internal static class Floor
{
    /// <summary>H(B) and its slope for every iron branch at the points of half a period.</summary>
    public static Action Curves(Ours ours)
    {
        var circuit = ours.Prepared.Circuit;
        var solution = ours.Prepared.Solve(ours.Options);
        int[] iron = [.. Enumerable.Range(0, circuit.Branches.Count).Where(b => circuit.Branches[b].Steel is not null)];
        double[][] flux = [.. iron.Select(b => solution.Flux_Wb[b].Take(solution.Points / 2).Select(f => f / circuit.Branches[b].Area_m2).ToArray())];
        double[][] h = [.. flux.Select(f => new double[f.Length])], slope = [.. flux.Select(f => new double[f.Length])];
        return () =>
        {
            for (var k = 0; k < iron.Length; k++)
            {
                var curve = circuit.Branches[iron[k]].Steel!.Spine;
                for (var t = 0; t < flux[k].Length; t++)
                {
                    h[k][t] = curve.Value(flux[k][t], out slope[k][t]);
                }
            }
        };
    }

    /// <summary>Newton's method for the one free flux of a single-valued circuit over half a period, each point from the one before, and the currents' rms. Null where that is not the circuit.</summary>
    public static Action? Loop(Ours ours)
    {
        var pieces = ours.Prepared.Free;
        if (pieces.FreeCount != 1 || pieces.HasMemory || pieces.HasRate)
        {
            return null;
        }

        var run = new SolverRun(ours.Prepared, ours.Prepared.Circuit.Supply, null, ours.Options);
        var (n, span) = (pieces.Count, run.Span);
        var imposed = new ImposedPart(run);
        var (q, w) = (pieces.PerArea, pieces.Weight);
        var paths = ours.Prepared.Paths;
        var flux = paths.Select((p, i) => { var f = new double[span]; run.Impose(i, f, new double[span]); return f; }).ToArray();
        var windings = ours.Prepared.Reduction.Imposed.Length;
        var squares = new double[windings];
        return () =>
        {
            Array.Clear(squares);
            var z = 0.0;
            for (var t = 0; t < span; t++)
            {
                for (var iteration = 0; iteration < 40; iteration++)
                {
                    double residual = imposed.Mmf_A[t] + (pieces.Reluctance[0] * z), slope = pieces.Reluctance[0];
                    for (var i = 0; i < n; i++)
                    {
                        residual += w[i] * pieces.Curve[i].Value(imposed.FluxDensity_T[(t * n) + i] + (q[i] * z), out var dh);
                        slope += w[i] * dh * q[i];
                    }

                    var step = Math.Clamp(residual / slope, -0.3 / Math.Abs(q[0]), 0.3 / Math.Abs(q[0]));
                    z -= step;
                    if (Math.Abs(step * q[0]) < 1e-7)
                    {
                        break;
                    }
                }

                for (var k = 0; k < windings; k++)
                {
                    var current = 0.0;
                    for (var i = 0; i < paths.Length; i++)
                    {
                        current += paths[i].PerLinkage[k] == 0 ? 0 : paths[i].PerLinkage[k] * Mmf(paths[i], flux[i][t] + (paths[i].PerFree[0] * z));
                    }

                    squares[k] += current * current;
                }
            }
        };
    }

    private static double Mmf(FluxPath path, double flux)
    {
        var mmf = path.Reluctance_A_per_Wb * flux;
        foreach (var s in path.Steel)
        {
            mmf += s.Length_m * s.Law.Spine.Value(flux / s.Area_m2);
        }

        return mmf;
    }
}
