using System.Numerics;
using System.Runtime.InteropServices;

namespace CoreDesign.Magnetics.Joints;

/// <summary>
/// Symmetric positive definite band matrix, factored in place (Cholesky, row by row). With unknowns ordered column by column
/// the band is one column wide, so this is block elimination along x without blocks. Rows lie one after the other; the
/// diagonal is each row's last entry.
/// </summary>
internal sealed class BandCholesky(int size, int bandwidth)
{
    private readonly int _stride = bandwidth + 1;
    private readonly double[] _rows = new double[size * (bandwidth + 1)];

    public void Clear() => Array.Clear(_rows);

    /// <summary>Adds to an entry on or below the diagonal.</summary>
    public void Add(int row, int column, double value) => _rows[(row * _stride) + column - row + bandwidth] += value;

    /// <summary>Factors the matrix and solves for one right-hand side, which the solution replaces.</summary>
    /// <returns>False where a pivot is not positive: the matrix is not positive definite in this arithmetic.</returns>
    public bool Solve(double[] x)
    {
        for (var i = 0; i < size; i++)
        {
            var first = Math.Max(0, i - bandwidth);
            var row = Row(i, first);
            for (var j = first; j < i; j++)
            {
                // Row j reaches back further than row i; both are read from row i's first column.
                var other = Row(j, first);
                var count = j - first;
                row[count] = (row[count] - Dot(row[..count], other)) / other[count];
            }

            var pivot = row[^1] - Dot(row[..^1], row);
            if (!(pivot > 0))
            {
                return false;
            }

            row[^1] = Math.Sqrt(pivot);
            x[i] = (x[i] - Dot(row[..^1], x.AsSpan(first))) / row[^1];
        }

        for (var i = size - 1; i >= 0; i--)
        {
            var first = Math.Max(0, i - bandwidth);
            var row = Row(i, first);
            x[i] /= row[^1];
            for (var k = 0; k < row.Length - 1; k++)
            {
                x[first + k] -= row[k] * x[i];
            }
        }

        return true;
    }

    private Span<double> Row(int i, int from) => _rows.AsSpan((i * _stride) + from - i + bandwidth, i - from + 1);

    private static double Dot(ReadOnlySpan<double> a, ReadOnlySpan<double> b)
    {
        var sum = 0.0;
        var k = 0;
        if (a.Length >= Vector<double>.Count)
        {
            var va = MemoryMarshal.Cast<double, Vector<double>>(a);
            var vb = MemoryMarshal.Cast<double, Vector<double>>(b[..a.Length]);
            var total = Vector<double>.Zero;
            for (var v = 0; v < va.Length; v++)
            {
                total += va[v] * vb[v];
            }

            sum = Vector.Sum(total);
            k = va.Length * Vector<double>.Count;
        }

        for (; k < a.Length; k++)
        {
            sum += a[k] * b[k];
        }

        return sum;
    }
}
