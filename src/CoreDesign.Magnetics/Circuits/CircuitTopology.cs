namespace CoreDesign.Magnetics.Circuits;

/// <summary>
/// Independent loops of a circuit by a spanning forest, so that flux adds to zero at every node by construction:
/// branch flux = Loops · loop flux. Linkage rows: winding linkage = Linkages · loop flux.
/// </summary>
internal sealed class CircuitTopology
{
    private CircuitTopology(double[,] loops, double[,] linkages)
    {
        Loops = loops;
        Linkages = linkages;
    }

    /// <summary>Branches by loops; -1, 0 or 1.</summary>
    public double[,] Loops { get; }

    /// <summary>Windings by loops; turns.</summary>
    public double[,] Linkages { get; }

    public int LoopCount => Loops.GetLength(1);

    public static CircuitTopology Of(MagneticCircuit circuit)
    {
        var branches = circuit.Branches;
        var nodes = new Dictionary<string, int>(StringComparer.Ordinal);
        var index = new Dictionary<string, int>(StringComparer.Ordinal);
        var from = new int[branches.Count];
        var to = new int[branches.Count];
        for (var b = 0; b < branches.Count; b++)
        {
            if (!index.TryAdd(branches[b].Name, b))
            {
                throw new CircuitException($"Branch name '{branches[b].Name}' is used twice. Give each branch a name of its own.");
            }

            from[b] = NodeOf(branches[b].From);
            to[b] = NodeOf(branches[b].To);
        }

        var loops = LoopsOf(from, to, nodes.Count);
        var linkages = new double[circuit.Windings.Count, loops.GetLength(1)];
        for (var w = 0; w < circuit.Windings.Count; w++)
        {
            foreach (var coil in circuit.Windings[w].Coils)
            {
                if (!index.TryGetValue(coil.Branch, out var b))
                {
                    throw new CircuitException($"Winding '{circuit.Windings[w].Name}' has a coil on branch '{coil.Branch}', which does not exist.");
                }

                for (var j = 0; j < loops.GetLength(1); j++)
                {
                    linkages[w, j] += coil.Turns * loops[b, j];
                }
            }
        }

        return new CircuitTopology(loops, linkages);

        int NodeOf(string name)
        {
            if (!nodes.TryGetValue(name, out var n))
            {
                n = nodes.Count;
                nodes.Add(name, n);
            }

            return n;
        }
    }

    private static double[,] LoopsOf(int[] from, int[] to, int nodeCount)
    {
        // A breadth-first forest; each branch outside it closes one loop with the tree path between its ends.
        var b = from.Length;
        var parentBranch = new int[nodeCount];
        var depth = new int[nodeCount];
        Array.Fill(depth, -1);
        var inTree = new bool[b];
        for (var root = 0; root < nodeCount; root++)
        {
            if (depth[root] >= 0)
            {
                continue;
            }

            depth[root] = 0;
            parentBranch[root] = -1;
            var queue = new Queue<int>([root]);
            while (queue.TryDequeue(out var n))
            {
                for (var k = 0; k < b; k++)
                {
                    var other = from[k] == n ? to[k] : to[k] == n ? from[k] : -1;
                    if (other >= 0 && depth[other] < 0)
                    {
                        depth[other] = depth[n] + 1;
                        parentBranch[other] = k;
                        inTree[k] = true;
                        queue.Enqueue(other);
                    }
                }
            }
        }

        var chords = Enumerable.Range(0, b).Where(k => !inTree[k]).ToArray();
        var loops = new double[b, chords.Length];
        for (var j = 0; j < chords.Length; j++)
        {
            loops[chords[j], j] = 1;

            // Flux leaves the chord at its 'to' node and comes back to its 'from' node along the tree.
            int p = to[chords[j]], q = from[chords[j]];
            while (p != q)
            {
                if (depth[p] >= depth[q])
                {
                    var k = parentBranch[p];
                    var along = from[k] == p;
                    loops[k, j] += along ? 1 : -1;
                    p = along ? to[k] : from[k];
                }
                else
                {
                    var k = parentBranch[q];
                    var along = to[k] == q;
                    loops[k, j] += along ? 1 : -1;
                    q = along ? from[k] : to[k];
                }
            }
        }

        return loops;
    }
}
