namespace CoreDesign.Magnetics.Circuits;

/// <summary>Gauss elimination for the few equations of one instant, in place; rows are scaled so that fluxes and ampere-turns mix.</summary>
internal static class SmallLu
{
    /// <summary>Solves a·x = b; a (row by row) and b are overwritten, b with x. False where a pivot is zero.</summary>
    public static bool Solve(double[] a, double[] b, double[] work)
    {
        var n = b.Length;
        for (var i = 0; i < n; i++)
        {
            var largest = 0.0;
            for (var j = 0; j < n; j++)
            {
                largest = Math.Max(largest, Math.Abs(a[(i * n) + j]));
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
                if (Math.Abs(a[(i * n) + c]) * work[i] > Math.Abs(a[(pivot * n) + c]) * work[pivot])
                {
                    pivot = i;
                }
            }

            if (a[(pivot * n) + c] == 0)
            {
                return false;
            }

            if (pivot != c)
            {
                for (var j = c; j < n; j++)
                {
                    (a[(c * n) + j], a[(pivot * n) + j]) = (a[(pivot * n) + j], a[(c * n) + j]);
                }

                (b[c], b[pivot]) = (b[pivot], b[c]);
                (work[c], work[pivot]) = (work[pivot], work[c]);
            }

            for (var i = c + 1; i < n; i++)
            {
                var f = a[(i * n) + c] / a[(c * n) + c];
                if (f == 0)
                {
                    continue;
                }

                for (var j = c + 1; j < n; j++)
                {
                    a[(i * n) + j] -= f * a[(c * n) + j];
                }

                b[i] -= f * b[c];
            }
        }

        for (var i = n - 1; i >= 0; i--)
        {
            var s = b[i];
            for (var j = i + 1; j < n; j++)
            {
                s -= a[(i * n) + j] * b[j];
            }

            b[i] = s / a[(i * n) + i];
        }

        return true;
    }
}
