namespace CoreDesign.Magnetics.Circuits;

/// <summary>In-place Gaussian elimination with row scaling and partial pivoting, for the small dense systems of one instant; no allocation.</summary>
internal static class SmallLu
{
    /// <summary>Solves a·x = b; the answer is left in <paramref name="b"/>, <paramref name="a"/> is destroyed. False where singular.</summary>
    public static bool Solve(double[,] a, double[] b, double[] work)
    {
        var n = b.Length;
        for (var i = 0; i < n; i++)
        {
            var largest = 0.0;
            for (var j = 0; j < n; j++)
            {
                largest = Math.Max(largest, Math.Abs(a[i, j]));
            }

            if (largest == 0 || !double.IsFinite(largest))
            {
                return false;
            }

            work[i] = 1 / largest;
        }

        for (var c = 0; c < n; c++)
        {
            var pivot = c;
            for (var i = c + 1; i < n; i++)
            {
                if (Math.Abs(a[i, c]) * work[i] > Math.Abs(a[pivot, c]) * work[pivot])
                {
                    pivot = i;
                }
            }

            if (a[pivot, c] == 0)
            {
                return false;
            }

            if (pivot != c)
            {
                for (var j = c; j < n; j++)
                {
                    (a[c, j], a[pivot, j]) = (a[pivot, j], a[c, j]);
                }

                (b[c], b[pivot]) = (b[pivot], b[c]);
                (work[c], work[pivot]) = (work[pivot], work[c]);
            }

            for (var i = c + 1; i < n; i++)
            {
                var f = a[i, c] / a[c, c];
                if (f == 0)
                {
                    continue;
                }

                for (var j = c + 1; j < n; j++)
                {
                    a[i, j] -= f * a[c, j];
                }

                b[i] -= f * b[c];
            }
        }

        for (var i = n - 1; i >= 0; i--)
        {
            var s = b[i];
            for (var j = i + 1; j < n; j++)
            {
                s -= a[i, j] * b[j];
            }

            b[i] = s / a[i, i];
        }

        return true;
    }
}
