using CoreDesign.Estimating.Contracts;
using CoreDesign.Web.Features.Design;

namespace CoreDesign.Web.Tests.Design;

public sealed class FormReaderTests
{
    [Fact]
    public void Design_with_every_field_comes_back_from_its_texts()
    {
        var design = Samples.Input with
        {
            Core = Samples.Input.Core! with
            {
                Limb = new LimbInput { Diameter_mm = 220, Steps = 7, StockWidths_mm = [210, 190.5, 170] },
                Yoke = new YokeInput { StepWidths_mm = [220, 200] },
                LimbSteps = [new StepInput { Width_mm = 210, Stack_mm = 62 }, new StepInput { Width_mm = 190, Stack_mm = 45.5 }],
            },
        };

        var back = FormReader.Design(FormReader.Texts(design));

        Assert.Equivalent(design, back, strict: true);
    }

    [Fact]
    public void Field_left_open_stays_out_of_the_design()
    {
        var texts = DesignText.Empty.With(FormPaths.WindowHeight, "520").With(FormPaths.StackingFactor, "  ");

        var design = FormReader.Design(texts);

        Assert.Equal(520, design.Core!.WindowHeight_mm);
        Assert.Null(design.Core.StackingFactor);
        Assert.Null(design.Joint);
    }

    [Fact]
    public void Core_form_says_the_number_of_phases()
    {
        Assert.Equal(3, FormReader.Design(DesignText.Empty.With(FormPaths.Form, "threeLimb")).Order!.Phases);
        Assert.Equal(1, FormReader.Design(DesignText.Empty.With(FormPaths.Form, "singlePhaseTwoLimb")).Order!.Phases);
        Assert.Equal(3, FormReader.Design(DesignText.Empty.With(FormPaths.Form, "fiveLimb")).Order!.Phases);
        Assert.Equal(3, FormReader.Design(DesignText.Empty.With(FormPaths.Form, "singlePhaseThreeLimb").With(FormPaths.Units, "3")).Order!.Phases);
    }

    [Fact]
    public void Closed_delta_without_a_word_stays_a_closed_delta()
    {
        var texts = FormReader.Texts(new DesignInput { Tertiary = new TertiaryInput() });
        Assert.Equal("D", texts[FormPaths.Tertiary]);
        Assert.NotNull(FormReader.Design(texts).Tertiary);
    }

    [Fact]
    public void Rated_voltages_take_slashes_and_decimal_commas()
    {
        var design = FormReader.Design(DesignText.Empty.With(FormPaths.Voltages, "20 / 0,4"));

        Assert.Equal([20, 0.4], design.Order!.RatedVoltages_kV!);
    }

    [Theory]
    [InlineData("core.limb.diameter_mm", "wide", "Diameter “wide” is not a number. Write digits with one decimal comma or point, as in 12.5. The range is 30 to 2000 mm.")]
    [InlineData("order.ratedVoltages_kV", "20 / 1.0.0", "Rated voltage “1.0.0” has 2 commas or points. Write one decimal sign and no thousands separators, as in 1250.5. The range is 0.01 to 1200 kV.")]
    public void Text_that_is_no_number_is_named_with_its_field_the_mend_and_the_range(string path, string text, string message)
    {
        var reading = FormReader.Read(DesignText.Empty.With(path, text), DesignText.Empty);

        Assert.Equal(message, reading.Errors[path]);
    }

    [Fact]
    public void Value_out_of_range_names_value_and_range_and_keeps_what_stood()
    {
        var before = DesignText.Empty.With("joint.overlap_mm", "4.0");

        var reading = FormReader.Read(before.With("joint.overlap_mm", "140"), before);

        Assert.Contains("140 mm is outside 0.5 to 30 mm", reading.Errors["joint.overlap_mm"], StringComparison.Ordinal);
        Assert.Equal(4.0, reading.Design.Joint!.Overlap_mm);
    }

    [Fact]
    public void Unreadable_list_item_is_named()
    {
        var reading = FormReader.Read(DesignText.Empty.With(FormPaths.StockWidths, "210 / x9"), DesignText.Empty);

        Assert.Contains("x9", reading.Errors[FormPaths.StockWidths], StringComparison.Ordinal);
        Assert.Null(reading.Design.Core);
    }

    [Theory]
    [InlineData("not json")]
    [InlineData("[1,2]")]
    [InlineData("{\"a\":{}}")]
    public void Draft_that_is_unreadable_is_no_draft(string json) => Assert.Null(DesignText.FromJson(json));

    [Fact]
    public void Draft_keeps_half_typed_texts()
    {
        var texts = DesignText.Empty.With(FormPaths.Diameter, "22,").With("order.reference", "<b>HR</b>");

        Assert.Equal(texts, DesignText.FromJson(texts.ToJson()));
    }
}
