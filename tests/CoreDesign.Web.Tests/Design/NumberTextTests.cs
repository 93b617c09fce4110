using CoreDesign.Web.Features.Design;

namespace CoreDesign.Web.Tests.Design;

public sealed class NumberTextTests
{
    [Theory]
    [InlineData("0.3", 0.3)]
    [InlineData("0,3", 0.3)]
    [InlineData(" 12,50 ", 12.5)]
    [InlineData("1 000", 1000)]
    [InlineData("1\u2009250,5", 1250.5)]
    [InlineData("−4", -4)]
    [InlineData("1e3", 1000)]
    [InlineData(".5", 0.5)]
    public void Number_in_any_usual_writing_is_read(string text, double expected)
    {
        Assert.True(NumberText.TryRead(text, out var value, out _));
        Assert.Equal(expected, value);
    }

    [Theory]
    [InlineData("NaN")]
    [InlineData("Infinity")]
    [InlineData("12 mm")]
    [InlineData("1 00")]
    [InlineData("<b>5</b>")]
    [InlineData("٣")]
    public void Text_that_is_no_number_is_refused_with_what_was_typed(string text)
    {
        Assert.False(NumberText.TryRead(text, out _, out var mend));
        Assert.Contains(text, mend, StringComparison.Ordinal);
    }

    [Fact]
    public void Two_decimal_signs_are_refused_and_the_mend_is_said()
    {
        Assert.False(NumberText.TryRead("1,250.5", out _, out var mend));
        Assert.Contains("Write one decimal sign", mend, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(0.1 + 0.2)]
    [InlineData(1e-9)]
    [InlineData(123456.789)]
    public void Exact_text_reads_back_as_the_same_number(double value)
    {
        Assert.True(NumberText.TryRead(NumberText.Exact(value), out var back, out _));
        Assert.Equal(value, back);
    }

    [Theory]
    [InlineData(219.96, "220")]
    [InlineData(0.02345678, "0.02346")]
    [InlineData(34166.4, "34166")]
    [InlineData(-0.5, "−0.5")]
    public void Short_text_keeps_four_digits(double value, string expected) =>
        Assert.Equal(expected, NumberText.Short(value));

    [Fact]
    public void Comma_with_three_noughts_is_flagged_as_perhaps_a_thousand()
    {
        Assert.True(NumberText.LooksLikeThousands("1,000"));
        Assert.False(NumberText.LooksLikeThousands("0,965"));
        Assert.False(NumberText.LooksLikeThousands("1.05"));
    }
}
