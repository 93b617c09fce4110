namespace CoreDesign.Magnetics.Circuits;

/// <summary>The solution of a circuit that is several copies of another side by side, each later than the one before by a fixed part of the period.</summary>
internal static class ShiftedCopies
{
    /// <param name="copies">Branches copy after copy in the order of the one; one winding each.</param>
    /// <param name="one">The solution of one.</param>
    /// <param name="shifts">Points by which each copy is read later than the one.</param>
    /// <param name="supply">Of the copies together, at the voltage at which the one was solved.</param>
    public static CircuitSolution Of(PreparedCircuit copies, CircuitSolution one, int[] shifts, Supply supply)
    {
        int n = one.Points, branches = one.Circuit.Branches.Count, count = one.Paths.Length;
        if (copies.Paths.Length != shifts.Length * count || copies.Circuit.Branches.Count != shifts.Length * branches)
        {
            throw new InvalidOperationException($"A circuit of {copies.Paths.Length} paths is not {shifts.Length} copies of one of {count}.");
        }

        double[] extra = [.. shifts.SelectMany(_ => Enumerable.Range(0, branches).Select(one.ExtraLossCoefficient))];
        var run = new SolverRun(copies, supply, extra, one.Run.Options);
        var paths = new PathWaves[copies.Paths.Length];
        var driven = new double[copies.Reduction.Driven.Length][];
        for (var k = 0; k < shifts.Length; k++)
        {
            var shift = ((shifts[k] % n) + n) % n;
            for (var p = 0; p < count; p++)
            {
                paths[(k * count) + p] = one.Paths[p].Shifted(copies.Paths[(k * count) + p], shift, n, run.PathExtra[(k * count) + p]);
            }

            if (driven.Length > 0)
            {
                var whole = new double[n];
                new SharedWave(one.WindingCurrent_A[0], shift, n).AddTo(whole, 1);
                driven[k] = whole[..run.Span];
            }
        }

        return new CircuitSolution(run, paths, run.Currents(paths, driven));
    }
}
