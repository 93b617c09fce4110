using CoreDesign.Magnetics.Circuits;

namespace CoreDesign.Magnetics.Excitation;

/// <summary>A branch's share of the current, and of that the part of its extra loss.</summary>
public readonly record struct CurrentShare(double Whole, double Extra);

/// <summary>Splits the currents of the supply's windings by cause. Shares add to one, and a share may be negative where a branch lowers the current.</summary>
public static class CurrentShares
{
    /// <summary>
    /// Where linkages settle the fluxes, currents follow linearly from the branches' MMFs, i = G(transposed)·F with G the flux per linkage, so the sum of squares of all
    /// currents is the sum over branches of F times the flux that linkages equal to the currents would give: each term is that branch's share. With a free neutral
    /// or winding resistance a branch's share is its part of the reactive and active MMF work, rms F times rms rate.
    /// </summary>
    public static CurrentShare[] Of(CircuitSolution solution)
    {
        ArgumentNullException.ThrowIfNull(solution);
        var shares = new CurrentShare[solution.Circuit.Branches.Count];
        for (var b = 0; b < shares.Length; b++)
        {
            shares[b] = solution.FluxPerLinkage is { } g ? Linear(solution, g, b) : Work(solution, b);
        }

        var total = shares.Sum(s => s.Whole);
        return total > 0 ? Array.ConvertAll(shares, s => new CurrentShare(s.Whole / total, s.Extra / total)) : shares;
    }

    private static CurrentShare Linear(CircuitSolution s, double[,] g, int b)
    {
        double[] mmf = s.Mmf_A[b], rate = s.FluxRate_Wb_per_s[b];
        double whole = 0, extra = 0;
        for (var w = 0; w < s.WindingCurrent_A.Length; w++)
        {
            if (g[b, w] == 0 || s.Circuit.Windings[w].Phase == WindingPhase.Closed)
            {
                continue;
            }

            var current = s.WindingCurrent_A[w];
            double withMmf = 0, withRate = 0;
            for (var t = 0; t < current.Length; t++)
            {
                withMmf += current[t] * mmf[t];
                withRate += current[t] * rate[t];
            }

            whole += g[b, w] * withMmf;
            extra += g[b, w] * withRate * s.ExtraLossCoefficient(b);
        }

        return new(whole, extra);
    }

    private static CurrentShare Work(CircuitSolution s, int b)
    {
        var rate = Math.Sqrt(s.MeanSquareRate(b));
        return new(Waveform.Rms(s.Mmf_A[b]) * rate, s.ExtraLossCoefficient(b) * rate * rate);
    }
}
