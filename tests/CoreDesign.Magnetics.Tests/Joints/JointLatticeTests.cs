using CoreDesign.Magnetics.Joints;

namespace CoreDesign.Magnetics.Tests.Joints;

public sealed class JointLatticeTests
{
    private static readonly JointGrid Coarse = new() { FinestCell_m = 150e-6, Growth = 1.9, LargestCellOfShift = 0.25, TailDecayLengths = 2 };

    [Theory]
    [InlineData(2, 1, true)]
    [InlineData(2, 2, false)]
    [InlineData(3, 1, true)]
    [InlineData(4, 1, false)]
    [InlineData(5, 1, true)]
    public void Half_lattice_gives_the_drop_of_the_whole_one_and_the_whole_one_is_symmetric(int positions, int sheets, bool mitred)
    {
        var spec = JointCases.StepLap(positions, sheets: sheets);
        var law = JointCases.Steel.LawOf(mitred);
        var mesh = new JointMesh(spec, Coarse, 20e-3);
        var exchange = JointSolver.Exchange(spec, JointCases.Steel);
        var half = new JointLattice(mesh, law, 0.27e-3, exchange);
        var whole = new WholeLattice(mesh, law, 0.27e-3, exchange);
        foreach (var mean in (double[])[0.4, 0.8, 1.1, 1.3, 1.4, 1.5, 1.6, 1.7, 1.8])
        {
            var across = JointSolver.Across(mean, mitred);

            var excess = whole.Solve(across);

            Assert.Equal(excess, half.Solve(across, mean).Excess_A, 1e-6 * (1 + excess));
            var u = whole.Potential;
            var sum = u[0] + u[^1];
            Assert.All(Enumerable.Range(0, u.Count), n => Assert.Equal(sum, u[n] + u[u.Count - 1 - n], 1e-6 * (1 + excess)));
        }
    }

    [Theory]
    [InlineData(JointKind.ButtLap, 2, 1, 0.5)]
    [InlineData(JointKind.MitredOverlap, 2, 2, 0.25)]
    [InlineData(JointKind.StepLap, 5, 1, 0.5)]
    [InlineData(JointKind.StepLap, 8, 1, 0.25)]
    public void Default_cells_are_within_one_and_a_half_per_cent_of_much_finer_ones(JointKind kind, int positions, int sheets, double gap)
    {
        var spec = JointCases.StepLap(positions, gap, sheets: sheets) with { Kind = kind };
        var fine = new JointGrid { FinestCell_m = 8e-6, Growth = 1.1, LargestCellOfShift = 0.03, TailDecayLengths = 8 };
        var coarse = new JointCurve(JointSolver.Solve(spec, JointCases.Steel));
        var refined = new JointCurve(JointSolver.Solve(spec, JointCases.Steel, fine));
        for (var b = 0.5; b < 1.95; b += 0.05)
        {
            Assert.InRange(coarse.Mmf_A(b) / refined.Mmf_A(b), 0.985, 1.002);
        }
    }

    [Fact]
    public void Band_matrix_solves_what_it_was_built_from()
    {
        const int size = 40, band = 5;
        var matrix = new BandCholesky(size, band);
        var dense = new double[size, size];
        var random = new Random(3);
        for (var i = 0; i < size; i++)
        {
            for (var j = Math.Max(0, i - band); j <= i; j++)
            {
                var value = i == j ? 12 : random.NextDouble() - 0.5;
                matrix.Add(i, j, value);
                dense[i, j] = dense[j, i] = value;
            }
        }

        var x = Enumerable.Range(0, size).Select(i => Math.Sin(i)).ToArray();
        var product = Enumerable.Range(0, size).Select(i => Enumerable.Range(0, size).Sum(j => dense[i, j] * x[j])).ToArray();

        Assert.True(matrix.Solve(product));
        for (var i = 0; i < size; i++)
        {
            Assert.Equal(x[i], product[i], 1e-12);
        }
    }

    [Fact]
    public void Band_matrix_that_is_not_positive_definite_is_reported()
    {
        var matrix = new BandCholesky(2, 1);
        matrix.Add(0, 0, 1);
        matrix.Add(1, 0, 2);
        matrix.Add(1, 1, 1);

        Assert.False(matrix.Solve([1, 1]));
    }
}
