using CoreDesign.Estimating.Contracts;
using CoreDesign.Sheets;

namespace CoreDesign.Sheets.Tests;

public sealed class PartGroupsTests
{
    [Fact]
    public void Equal_parts_share_a_line_and_unequal_ones_name_their_limbs()
    {
        var groups = PartGroups.Of([Part("limbA", "limb", 3), Part("limbB", "limb", 3), Part("yokeABTop", "yoke", 2), Part("yokeABBottom", "yoke", 2), Part("jointATop", "joint", 1, 2), Part("jointBTop", "joint", 4, 2)]);

        Assert.Equal(["Limb A", "Limb B", "Yokes", "Joints A", "Joints B"], groups.Select(g => g.Name));
        Assert.Equal((2, 4.0, 5.0), (groups[2].Count, groups[2].Loss_W, groups[2].Mass_kg));
    }

    [Fact]
    public void Parts_that_differ_in_the_solver_s_last_digits_alone_share_a_line() =>
        Assert.Equal("Yokes", Assert.Single(PartGroups.Of([Part("yokeABTop", "yoke", 2), Part("yokeBCTop", "yoke", 2 + 1e-9)])).Name);

    [Theory]
    [InlineData("limbA", "Limb A")]
    [InlineData("yokeABTop", "Yoke AB top")]
    [InlineData("tZoneTop", "T zone top")]
    public void Part_is_named_in_words(string part, string words) => Assert.Equal(words, PartGroups.NameOf(part));

    private static PartResult Part(string name, string kind, double loss, int count = 1) =>
        new() { Name = name, Kind = kind, Count = count, Area_mm2 = 100, Length_mm = 10, Mass_kg = 5, PeakFluxDensity_T = 1.6, Loss_W = loss, ExcitingPower_VA = 2 };
}
