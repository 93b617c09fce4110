using CoreDesign.Sheets.Charts;

namespace CoreDesign.Sheets.Tests.Charts;

public class NiceTicksTests
{
    [Theory]
    [InlineData(0, 1, 4, 0, 1, 0.25)]
    [InlineData(-1.69, 1.69, 4, -2, 2, 1)]
    [InlineData(0, 1170, 4, 0, 1500, 500)]
    [InlineData(1.52, 1.69, 5, 1.5, 1.7, 0.05)]
    [InlineData(5, 5, 4, 4.5, 5.5, 0.25)]
    [InlineData(0, 0, 4, -1, 1, 0.5)]
    public void Around_data_endsOnWholeSteps(double low, double high, int steps, double expectedLow, double expectedHigh, double step)
    {
        var ticks = NiceTicks.Around(low, high, steps);
        Assert.Equal((expectedLow, expectedHigh, step), (Math.Round(ticks.Low, 9), Math.Round(ticks.High, 9), Math.Round(ticks.Step, 9)));
    }

    [Fact]
    public void Around_anyScale_coversTheDataWithFewTicks()
    {
        var random = new Random(5);
        for (var i = 0; i < 2000; i++)
        {
            double a = (random.NextDouble() - 0.3) * Math.Pow(10, random.Next(-8, 9)), b = a + (random.NextDouble() * Math.Pow(10, random.Next(-6, 9)));
            var ticks = NiceTicks.Around(a, b, 4);
            Assert.True(ticks.Low <= a + (1e-6 * ticks.Step) && ticks.High >= b - (1e-6 * ticks.Step), $"{a} {b}: {ticks}");
            Assert.InRange(ticks.Values.Count, 2, 8);
        }
    }

    [Theory]
    [InlineData(double.NaN, 1)]
    [InlineData(0, double.PositiveInfinity)]
    public void Around_notFinite_isRefused(double low, double high) => Assert.Throws<ArgumentException>(() => NiceTicks.Around(low, high, 4));
}
