namespace CoreDesign.Sheets.Tests;

public class FiguresTests
{
    [Theory]
    [InlineData(674.3, 3, "674")]
    [InlineData(1991.0, 3, "1\u2009990")]
    [InlineData(0.2, 2, "0.20")]
    [InlineData(9.996, 3, "10.0")]
    [InlineData(999.7, 3, "1\u2009000")]
    [InlineData(-0.0456, 2, "\u22120.046")]
    [InlineData(1234567.0, 7, "1\u2009234\u2009567")]
    [InlineData(0.0, 3, "0")]
    [InlineData(1.5e-9, 2, "1.5e\u22129")]
    [InlineData(1e308, 2, "1.0e308")]
    public void Significant_value_hasThatManyDigits(double value, int digits, string expected) =>
        Assert.Equal(expected, Figures.Significant(value, digits));

    [Theory]
    [InlineData(1000, 0, "1\u2009000")]
    [InlineData(999.4, 0, "999")]
    [InlineData(-34166.27, 1, "\u221234\u2009166.3")]
    [InlineData(-0.004, 2, "0.00")]
    public void Fixed_value_hasThatManyDecimals(double value, int decimals, string expected) =>
        Assert.Equal(expected, Figures.Fixed(value, decimals));

    [Theory]
    [InlineData(220, "220")]
    [InlineData(0.30, "0.3")]
    [InlineData(226.8, "226.8")]
    [InlineData(1028, "1\u2009028")]
    [InlineData(100, "100")]
    [InlineData(-0.0001, "0")]
    public void Plain_value_dropsTrailingZeros(double value, string expected) => Assert.Equal(expected, Figures.Plain(value));

    [Theory]
    [InlineData(41.2, 0, "+41")]
    [InlineData(-49, 0, "\u221249")]
    [InlineData(0.004, 2, "0")]
    [InlineData(-0.004, 2, "0")]
    public void Change_value_carriesItsSign(double value, int decimals, string expected) => Assert.Equal(expected, Figures.Change(value, decimals));

    [Theory]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    [InlineData(double.NegativeInfinity)]
    public void AnyFormat_notFinite_isADash(double value)
    {
        Assert.Equal("\u2013", Figures.Significant(value, 3));
        Assert.Equal("\u2013", Figures.Fixed(value, 1));
        Assert.Equal("\u2013", Figures.Plain(value));
        Assert.Equal("\u2013", Figures.Change(value, 1));
    }

    [Fact]
    public void With_unit_keepsBothOnOneLine()
    {
        Assert.Equal("1.69\u00A0T", Figures.With("1.69", "T"));
        Assert.Equal("5", Figures.With("5", ""));
    }
}
