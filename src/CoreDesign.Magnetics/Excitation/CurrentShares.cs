using CoreDesign.Magnetics.Circuits;

namespace CoreDesign.Magnetics.Excitation;

/// <summary>
/// Splits the currents of the supply's windings by cause. Currents follow linearly from the branches' MMFs, i = G(transposed)·F with G the flux per linkage, so the sum of squares
/// of all currents is the sum over branches of F times the flux that linkages equal to the currents would give. Each term is that branch's share;
/// shares add to one, and a share may be negative where a branch lowers the current.
/// </summary>
public static class CurrentShares
{
    /// <summary>Share of each branch's MMF, and of the part of it that <paramref name="part"/> gives (null for the whole).</summary>
    /// <exception cref="InvalidOperationException">The linkages alone do not settle the fluxes of this circuit.</exception>
    public static double[] Of(CircuitSolution solution, Func<int, int, double>? part = null)
    {
        ArgumentNullException.ThrowIfNull(solution);
        var g = solution.FluxPerLinkage ?? throw new InvalidOperationException("Shares need a circuit whose fluxes follow from the linkages.");
        double[][] windings = [.. solution.WindingCurrent_A.Where((_, w) => solution.Circuit.Windings[w].Phase != WindingPhase.Closed)];
        var total = windings.Sum(w => w.Sum(i => i * i));
        var shares = new double[solution.Circuit.Branches.Count];
        for (var b = 0; total > 0 && b < shares.Length; b++)
        {
            for (var t = 0; t < solution.Points; t++)
            {
                var flux = 0.0;
                for (var w = 0; w < windings.Length; w++)
                {
                    flux += g[b, w] * windings[w][t];
                }

                shares[b] += flux * (part is null ? solution.Mmf_A[b][t] : part(b, t));
            }

            shares[b] /= total;
        }

        return shares;
    }
}
