namespace CoreDesign.Magnetics.Joints;

/// <summary>
/// Slope of a half lattice's imbalance, turned positive: branches in the plane, exchange between layers that closes on itself
/// through the stack, and the mirror condition at the centre, where only the first half of the layers is unknown.
/// </summary>
internal sealed class LatticeMatrix(int cells, int layers, double[] transfer)
{
    private readonly BandCholesky _matrix = new((cells * layers) + (layers / 2), layers);

    /// <summary>Solves for one right-hand side in place; false where the matrix is not positive definite.</summary>
    public bool Solve(double[] x) => _matrix.Solve(x);

    /// <summary>Builds the matrix from the branches' slopes, dB/dH over the cell's width.</summary>
    public void Fill(double[] stiffness)
    {
        _matrix.Clear();
        var centre = cells * layers;
        for (var i = 0; i < cells; i++)
        {
            for (var l = 0; l < layers; l++)
            {
                var e = (i * layers) + l;
                var k = stiffness[e];
                _matrix.Add(e, e, k);
                if (i < cells - 1 || l < layers / 2)
                {
                    _matrix.Add(e + layers, e + layers, k);
                    _matrix.Add(e + layers, e, -k);
                }
                else if (l != layers - 1 - l)
                {
                    var image = centre + layers - 1 - l;
                    _matrix.Add(image, image, k);
                    _matrix.Add(image, e, k);
                }
            }

            for (var l = 0; l < layers; l++)
            {
                Couple((i * layers) + l, (i * layers) + ((l + 1) % layers), transfer[i]);
            }
        }

        AssembleCentre(centre, transfer[cells]);
    }

    private void Couple(int a, int b, double permeance)
    {
        _matrix.Add(a, a, permeance);
        _matrix.Add(b, b, permeance);
        _matrix.Add(Math.Max(a, b), Math.Min(a, b), -permeance);
    }

    private void AssembleCentre(int centre, double permeance)
    {
        var half = layers / 2;
        for (var l = 0; l < half - 1; l++)
        {
            Couple(centre + l, centre + l + 1, permeance);
        }

        // The first layer's other neighbour is its own mirror image; so is the last one's, or the middle layer at zero.
        _matrix.Add(centre, centre, 2 * permeance);
        var last = centre + half - 1;
        _matrix.Add(last, last, layers % 2 == 0 ? 2 * permeance : permeance);
    }
}
