namespace CoreDesign.Magnetics.Circuits;

/// <summary>
/// What the windings leave free. Windings without resistance impose their linkages; the others, and a star with resistance anywhere, are driven by voltage.
/// Branch flux = PerLinkage · imposed linkages + PerFree · free fluxes, for every value of both. The current of an imposed winding is the sum over
/// branches of PerLinkage times MMF (the transposed matrix, by virtual work), less what driven windings share. In an isolated star without resistance
/// the linkage of the neutral is one of the free unknowns, and "no current out of the star point" its equation.
/// </summary>
internal sealed class CircuitReduction
{
    public const string NotDetermined = "The winding currents are not determined: the imposed linkages leave no path for a zero-sequence flux, or windings are linked rigidly. Add a zero-sequence path (an air branch between the yokes) or a winding resistance.";
    private const double Nothing = 1e-11;

    /// <summary>Windings whose linkage is imposed, then those driven by voltage; indices of the circuit.</summary>
    public required int[] Imposed { get; init; }

    public required int[] Driven { get; init; }

    public required int FreeCount { get; init; }

    /// <summary>Branches by imposed windings, Wb per Wb of linkage.</summary>
    public required double[,] PerLinkage { get; init; }

    /// <summary>Branches by free unknowns.</summary>
    public required double[,] PerFree { get; init; }

    /// <summary>Linkage of each driven winding: by imposed windings, and by free unknowns.</summary>
    public required double[,] DrivenPerLinkage { get; init; }

    public required double[,] DrivenPerFree { get; init; }

    /// <summary>True where an isolated star is driven by voltage and the voltage of its neutral is an unknown.</summary>
    public required bool NeutralVoltage { get; init; }

    /// <exception cref="CircuitException">The imposed linkages contradict each other or leave currents open.</exception>
    public static CircuitReduction Of(MagneticCircuit circuit, CircuitTopology topology)
    {
        var star = circuit.Supply.Connection == SupplyConnection.StarIsolated;
        bool InStar(int w) => star && circuit.Windings[w].Phase != WindingPhase.Closed;
        var all = Enumerable.Range(0, circuit.Windings.Count).ToList();
        var starDriven = all.Exists(w => InStar(w) && circuit.Windings[w].Resistance_ohm > 0);
        int[] imposed = [.. all.Where(w => circuit.Windings[w].Resistance_ohm == 0 && !(starDriven && InStar(w)))];
        int[] driven = [.. all.Except(imposed)];
        var m = topology.LoopCount;
        var neutral = star && !starDriven;

        // Unknowns: loop fluxes, and the neutral's linkage in units of the first star winding's turns so that all columns have like size.
        var n = m + (neutral ? 1 : 0);
        var rows = imposed.Length;
        var scale = Array.ConvertAll(imposed, w => Enumerable.Range(0, m).Max(j => Math.Abs(topology.Linkages[w, j])));
        var starTurns = neutral ? scale[Array.FindIndex(imposed, InStar)] : 1;
        var a = new double[rows, n + rows];
        for (var r = 0; r < rows; r++)
        {
            for (var j = 0; j < m; j++)
            {
                a[r, j] = topology.Linkages[imposed[r], j] / scale[r];
            }

            if (neutral && InStar(imposed[r]))
            {
                a[r, m] = -starTurns / scale[r];
            }

            a[r, n + r] = 1 / scale[r];
        }

        var basic = Eliminate(a, rows, n);
        int[] free = [.. Enumerable.Range(0, n).Except(basic)];
        var x = new double[n, rows + free.Length];
        for (var r = 0; r < rows; r++)
        {
            for (var k = 0; k < rows; k++)
            {
                x[basic[r], k] = a[r, n + k];
            }

            for (var k = 0; k < free.Length; k++)
            {
                x[basic[r], rows + k] = -a[r, free[k]];
            }
        }

        for (var k = 0; k < free.Length; k++)
        {
            x[free[k], rows + k] = 1;
        }

        return new CircuitReduction
        {
            Imposed = imposed,
            Driven = driven,
            FreeCount = free.Length,
            NeutralVoltage = starDriven,
            PerLinkage = Times(topology.Loops, m, x, 0, rows),
            PerFree = Times(topology.Loops, m, x, rows, free.Length),
            DrivenPerLinkage = Times(Rows(topology.Linkages, driven), m, x, 0, rows),
            DrivenPerFree = Times(Rows(topology.Linkages, driven), m, x, rows, free.Length),
        };
    }

    /// <summary>Gauss and Jordan with full pivoting; loops go before the neutral where they are as large. Returns the basic column of each row.</summary>
    private static int[] Eliminate(double[,] a, int rows, int columns)
    {
        var basic = new int[rows];
        var done = new bool[rows];
        var width = a.GetLength(1);
        for (var step = 0; step < rows; step++)
        {
            int row = -1, column = -1;
            var largest = 1e-9;
            for (var r = 0; r < rows; r++)
            {
                for (var c = 0; c < columns && !done[r]; c++)
                {
                    if (Math.Abs(a[r, c]) > largest)
                    {
                        (largest, row, column) = (Math.Abs(a[r, c]) * (1 + 1e-9), r, c);
                    }
                }
            }

            if (row < 0)
            {
                throw new CircuitException(NotDetermined);
            }

            done[row] = true;
            basic[row] = column;
            var pivot = a[row, column];
            for (var c = 0; c < width; c++)
            {
                a[row, c] /= pivot;
            }

            for (var r = 0; r < rows; r++)
            {
                var f = a[r, column];
                for (var c = 0; r != row && f != 0 && c < width; c++)
                {
                    a[r, c] -= f * a[row, c];
                }

                if (r != row)
                {
                    a[r, column] = 0;
                }
            }
        }

        return basic;
    }

    private static double[,] Rows(double[,] a, int[] rows)
    {
        var result = new double[rows.Length, a.GetLength(1)];
        for (var r = 0; r < rows.Length; r++)
        {
            for (var c = 0; c < a.GetLength(1); c++)
            {
                result[r, c] = a[rows[r], c];
            }
        }

        return result;
    }

    /// <summary>a (any rows by <paramref name="inner"/>) times the columns of x from <paramref name="first"/> on; rounding remainders become zero.</summary>
    private static double[,] Times(double[,] a, int inner, double[,] x, int first, int count)
    {
        var result = new double[a.GetLength(0), count];
        for (var r = 0; r < a.GetLength(0); r++)
        {
            for (var c = 0; c < count; c++)
            {
                double sum = 0, size = 0;
                for (var k = 0; k < inner; k++)
                {
                    var term = a[r, k] * x[k, first + c];
                    sum += term;
                    size += Math.Abs(term);
                }

                result[r, c] = Math.Abs(sum) <= Nothing * size ? 0 : sum;
            }
        }

        return result;
    }
}
