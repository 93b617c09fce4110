using CoreDesign.Estimating.Contracts;
using CoreDesign.Web.Features.Design;

namespace CoreDesign.Web.Tests.Design;

public sealed class VerdictFiguresTests
{
    [Fact]
    public void Loss_below_the_limit_is_to_spare_and_its_bar_ends_before_the_mark()
    {
        var line = VerdictFigures.Of(Samples.Estimate, null).Loss;

        Assert.Equal(("674", "19 W to spare", false), (line.Figure, line.Standing, line.Bad));
        Assert.True(line.Fill < line.Mark);
        Assert.Null(line.Change);
    }

    [Fact]
    public void Loss_over_the_limit_is_said_in_words_and_passes_the_mark()
    {
        var line = VerdictFigures.Of(Samples.Estimate with { NoLoadLoss_W = 1500 }, null).Loss;

        Assert.Equal(("807 W over", true), (line.Standing, line.Bad));
        Assert.True(line.Fill > line.Mark);
        Assert.InRange(line.Fill, 0, 1);
    }

    [Fact]
    public void Change_since_the_saved_revision_carries_its_sign()
    {
        var figures = VerdictFigures.Of(Samples.Estimate, Samples.Estimate with { NoLoadLoss_W = 723, Mass_kg = new MassResult(0, 0, 0, 869) });

        Assert.Equal("−49 W", figures.Loss.Change);
        Assert.Equal("+41 kg", figures.Mass.Change);
        Assert.Equal("0 points", figures.Current.Change);
    }

    [Fact]
    public void Limit_that_was_not_asked_for_has_no_mark()
    {
        var inputs = Samples.Estimate.Inputs;
        var line = VerdictFigures.Of(Samples.Estimate with { Inputs = inputs with { Order = inputs.Order! with { AskedNoLoadLoss_W = null } } }, null).Loss;

        Assert.Null(line.Mark);
        Assert.Equal("no limit asked", line.Asked);
    }

    [Fact]
    public void Core_beyond_saturation_is_named()
    {
        var line = VerdictFigures.Of(Samples.Estimate with { Margin = Samples.Estimate.Margin with { AtHighest_percent = -1.2 } }, null).AtHighest;

        Assert.Equal(("−1.2", "saturated", true, 0.0), (line.Figure, line.Standing, line.Bad, line.Fill));
    }

    [Fact]
    public void Two_designs_are_told_apart_field_by_field_in_the_words_of_the_form()
    {
        var theirs = Samples.Input with { Joint = Samples.Input.Joint! with { Gap_mm = 0.5, Type = "buttLap", Overlap_mm = null } };

        var differences = FieldDifferences.Between(Samples.Input, theirs);

        Assert.Equal(
            [new("Joint kind", "step-lap", "butt-lap"), new("Gap", "0.3 mm", "0.5 mm"), new("Overlap", "4 mm", "left open")],
            differences);
        Assert.Empty(FieldDifferences.Between(Samples.Input, Samples.Input));
    }
}
