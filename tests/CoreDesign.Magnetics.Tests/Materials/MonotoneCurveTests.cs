using CoreDesign.Magnetics.Materials;
using CsCheck;
using MathNet.Numerics.Interpolation;

namespace CoreDesign.Magnetics.Tests.Materials;

public class MonotoneCurveTests
{
    private static readonly double[] B = [0.5, 1.0, 1.3, 1.5, 1.6, 1.7, 1.8, 1.85, 1.9, 1.95, 2.0];
    private static readonly double[] H = [8, 14, 20, 30, 42, 75, 190, 400, 900, 2300, 6000];

    [Fact]
    public void Curve_agrees_with_a_general_numerics_library()
    {
        // Reference: MathNet.Numerics 5.0, PCHIP of the odd-extended table. Its end slopes differ, so the first and last intervals are left out.
        double[] x = [.. B.Reverse().Select(b => -b), 0, .. B], y = [.. H.Reverse().Select(h => -h), 0, .. H];
        var reference = CubicSpline.InterpolatePchipSorted(x, y);
        var curve = new MonotoneCurve(B, H, 1 / MagneticConstants.Mu0_H_per_m);
        for (var b = -1.94; b <= 1.94; b += 0.01)
        {
            Assert.Equal(reference.Interpolate(b), curve.Value(b, out var slope), 1e-9 * 2300);
            Assert.Equal(reference.Differentiate(b), slope, 1e-6 * 1e5);
        }
    }

    [Fact]
    public void Random_rising_tables_give_rising_odd_curves_through_their_points() =>
        Gen.Double[0.01, 1].Array[2, 12].SelectMany(dx => Gen.Double[0, 1000].Array[dx.Length].Select(dy => (dx, dy))).Sample(t =>
        {
            var x = Sums(t.dx);
            var y = Sums(t.dy);
            var curve = new MonotoneCurve(x, y, 1);
            for (var i = 0; i < x.Length; i++)
            {
                Assert.Equal(y[i], curve.Value(x[i]), 1e-9 * (1 + y[i]));
            }

            var last = 0.0;
            for (var s = 0.0; s <= 1.2 * x[^1]; s += x[^1] / 200)
            {
                var v = curve.Value(s);
                Assert.True(v >= last - 1e-9, $"falls at {s}");
                Assert.Equal(-v, curve.Value(-s), 1e-12 * (1 + v));
                last = v;
            }
        });

    [Fact]
    public void Falling_point_is_refused_with_its_number()
    {
        var e = Assert.Throws<ArgumentException>(() => new MonotoneCurve([0.5, 1, 0.9], [1, 2, 3], 1));
        Assert.Contains("Point 3", e.Message, StringComparison.Ordinal);
    }

    private static double[] Sums(double[] steps)
    {
        var total = 0.0;
        return Array.ConvertAll(steps, s => total += s);
    }
}
