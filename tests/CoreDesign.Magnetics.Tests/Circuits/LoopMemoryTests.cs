using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Materials;
using CsCheck;

namespace CoreDesign.Magnetics.Tests.Circuits;

public class LoopMemoryTests
{
    private static readonly Gen<HysteresisStop[]> Stops = Gen.Select(Gen.Double[0.02, 1.9], Gen.Double[-5, 40], (r, w) => new HysteresisStop(r, w)).Array[1, 30];

    private static readonly Gen<double[]> Way = Gen.Double[-2.1, 2.1].Array[1, 120];

    [Fact]
    public void Points_of_return_give_the_field_and_heat_of_the_stops_one_by_one() =>
        Gen.Select(Stops, Way).Sample((stops, way) =>
        {
            var memory = new LoopMemory(new StopCurve(stops));
            var single = stops.Select(s => new OneStop(s)).ToArray();
            double heat = 0, expectedHeat = 0;
            foreach (var b in way)
            {
                var ahead = memory.Field(b, out _);
                heat += memory.Accept(b);
                expectedHeat += single.Sum(s => s.Move(b));
                var expected = single.Sum(s => s.Field);
                Assert.Equal(expected, ahead, 1e-9);
                Assert.Equal(expected, memory.Last_A_per_m, 1e-9);
            }

            Assert.Equal(expectedHeat, heat, 1e-8);
        });

    [Fact]
    public void Slope_is_that_of_the_field() =>
        Gen.Select(Stops, Way).Sample((stops, way) =>
        {
            var memory = new LoopMemory(new StopCurve(stops));
            foreach (var b in way[..^1])
            {
                memory.Accept(b);
            }

            // Away from kinks: both sides must lie on one straight piece.
            const double h = 1e-7;
            var last = way[^1];
            var (left, right) = (memory.Field(last - h, out var slopeLeft), memory.Field(last + h, out var slopeRight));
            if (slopeLeft == slopeRight)
            {
                Assert.Equal((right - left) / (2 * h), slopeLeft, 1e-4);
            }
        });

    [Fact]
    public void Turning_over_mirrors_what_comes_after() =>
        Gen.Select(Stops, Way, Way).Sample((stops, before, after) =>
        {
            var (a, b) = (new LoopMemory(new StopCurve(stops)), new LoopMemory(new StopCurve(stops)));
            foreach (var x in before)
            {
                a.Accept(x);
                b.Accept(x);
            }

            b.Turn();
            foreach (var x in after)
            {
                Assert.Equal(a.Accept(x), b.Accept(-x), 1e-9);
                Assert.Equal(a.Last_A_per_m, -b.Last_A_per_m, 1e-9);
            }
        });

    /// <summary>The stop operator as its definition has it.</summary>
    private sealed class OneStop(HysteresisStop stop)
    {
        private double _x;
        private double _last;

        public double Field => stop.Weight_A_per_m_T * _x;

        public double Move(double b)
        {
            var free = _x + b - _last;
            _last = b;
            _x = Math.Clamp(free, -stop.Threshold_T, stop.Threshold_T);
            return stop.Weight_A_per_m_T * stop.Threshold_T * Math.Abs(free - _x);
        }
    }
}
