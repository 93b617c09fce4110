namespace CoreDesign.Magnetics.Joints;

/// <summary>
/// Half of a joint, from plain limb up to its centre at x = 0, cut into columns across the line and layers through the
/// stack. Layers run through one book: p sheets with their gap at position 1, p at position 2 and so on (saw-tooth order).
/// </summary>
internal sealed class JointMesh
{
    private readonly bool[] _gap;

    public JointMesh(JointSpec spec, JointGrid grid, double tail_m)
    {
        Layers = spec.Positions * spec.SheetsPerPosition;
        var centres = Enumerable.Range(0, spec.Positions)
            .Select(j => (j - ((spec.Positions - 1) / 2.0)) * spec.Shift_m)
            .ToArray();
        Widths = Divide(Edges(centres, spec.Gap_m), spec, grid, tail_m);
        Length = Widths.Sum();
        _gap = new bool[Widths.Length * Layers];
        var x = -Length;
        for (var i = 0; i < Widths.Length; i++)
        {
            var middle = x + (0.5 * Widths[i]);
            for (var l = 0; l < Layers; l++)
            {
                _gap[(i * Layers) + l] = Math.Abs(middle - centres[l / spec.SheetsPerPosition]) < 0.5 * spec.Gap_m;
            }

            x += Widths[i];
        }
    }

    public int Layers { get; }

    /// <summary>Widths of the cells from the limb to the centre, m.</summary>
    public double[] Widths { get; }
    public double Length { get; }

    public bool IsGap(int cell, int layer) => _gap[(cell * Layers) + layer];

    // Edges of gaps left of the centre, rising. Edges closer than 10 nm count once.
    private static List<double> Edges(double[] centres, double gap)
    {
        var edges = new List<double>();
        foreach (var edge in centres.SelectMany(c => (double[])[c - (gap / 2), c + (gap / 2)]).Where(e => e < 0).Order())
        {
            if (edges.Count == 0 || edge - edges[^1] > 1e-8)
            {
                edges.Add(edge);
            }
        }

        return edges;
    }

    private static double[] Divide(List<double> edges, JointSpec spec, JointGrid grid, double tail)
    {
        var largest = grid.LargestCellOfShift * spec.Shift_m;
        var widths = new List<double>(Graded(tail, grid, double.PositiveInfinity));
        widths.Reverse();
        for (var k = 0; k < edges.Count - 1; k++)
        {
            var half = Graded((edges[k + 1] - edges[k]) / 2, grid, largest);
            widths.AddRange(half);
            half.Reverse();
            widths.AddRange(half);
        }

        widths.AddRange(Graded(-edges[^1], grid, largest));
        return [.. widths];
    }

    // Cells growing away from an edge, stretched to fill the length.
    private static List<double> Graded(double length, JointGrid grid, double largest)
    {
        var cells = new List<double>();
        var cell = Math.Min(grid.FinestCell_m, length / 2);
        var sum = 0.0;
        while (sum < length * (1 - 1e-9))
        {
            cells.Add(cell);
            sum += cell;
            cell = Math.Min(cell * grid.Growth, Math.Max(largest, grid.FinestCell_m));
        }

        for (var k = 0; k < cells.Count; k++)
        {
            cells[k] *= length / sum;
        }

        return cells;
    }
}
