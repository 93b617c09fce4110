using CoreDesign.Estimating.Contracts;
using CoreDesign.Web.Features.Design;

namespace CoreDesign.Web.Tests.Design;

public sealed class DesignPageStateTests
{
    [Fact]
    public void Keystrokes_in_one_field_are_one_step_of_undo()
    {
        var state = new DesignPageState();
        state.Type(FormPaths.WindowHeight, "5");
        state.Type(FormPaths.WindowHeight, "52");
        state.Type(FormPaths.WindowHeight, "520");
        state.Leave(FormPaths.WindowHeight);
        state.Type(FormPaths.WindowHeight, "530");

        state.Undo();
        Assert.Equal("520", state.Typed[FormPaths.WindowHeight]);
        state.Undo();
        Assert.True(state.Typed.IsEmpty);
        Assert.False(state.CanUndo);

        state.Redo();
        state.Redo();
        Assert.Equal("530", state.Typed[FormPaths.WindowHeight]);
        Assert.False(state.CanRedo);
    }

    [Fact]
    public void Edit_after_undo_drops_the_redo()
    {
        var state = new DesignPageState();
        state.Type(FormPaths.WindowHeight, "520");
        state.Undo();
        state.Type(FormPaths.WindowHeight, "400");

        Assert.False(state.CanRedo);
    }

    [Fact]
    public void Late_answer_is_dropped()
    {
        var state = Solved();
        var old = state.Begin();
        state.Type("joint.gap_mm", "0.4");

        Assert.False(state.Accept(old, Samples.Input, Samples.Ok(Samples.Estimate with { NoLoadLoss_W = 1 })));
        Assert.NotEqual(1, state.Estimate!.NoLoadLoss_W);
    }

    [Fact]
    public void Bad_value_leaves_the_answer_and_says_what_it_stands_for()
    {
        var state = Solved();
        state.Type("joint.gap_mm", "14,0");

        Assert.Equal(Samples.Input.Joint!.Gap_mm, state.Request.Design.Joint!.Gap_mm);
        Assert.NotNull(state.Estimate);
        Assert.True(state.FiguresAreOld);
        Assert.EndsWith("The figures still stand for 0.3 mm.", state.Messages["joint.gap_mm"], StringComparison.Ordinal);
        Assert.False(state.IsComplete);
    }

    [Fact]
    public void Other_fields_go_on_answering_while_one_is_wrong()
    {
        var state = Solved();
        state.Type("joint.gap_mm", "x");
        state.Type(FormPaths.WindowHeight, "600");

        Assert.Equal(600, state.Request.Design.Core!.WindowHeight_mm);
        Assert.Equal(0.3, state.Request.Design.Joint!.Gap_mm);
        Assert.NotNull(state.Messages["joint.gap_mm"]);
    }

    [Fact]
    public void Refusal_of_the_estimate_stands_at_its_field()
    {
        var state = Solved();
        state.Type(FormPaths.WindowHeight, "3000");
        state.Accept(state.Begin(), Samples.Input, new Outcome<EstimateResult> { Errors = [new(FormPaths.WindowHeight, "Too tall."), new("core.limb", "No steps fit.")] });

        Assert.Equal("Too tall. The figures still stand for 520 mm.", state.Messages[FormPaths.WindowHeight]);
        Assert.StartsWith("No steps fit.", state.Messages[FormPaths.Diameter], StringComparison.Ordinal);
    }

    [Fact]
    public void Empty_form_lists_what_is_needed_and_calls_nothing_wrong()
    {
        var state = new DesignPageState();
        state.Accept(state.Begin(), Samples.Input, new Outcome<EstimateResult> { Errors = [new(FormPaths.LineVoltage, "Missing."), new(FormPaths.Grade, "Missing.")] });

        Assert.Empty(state.Messages.Paths);
        Assert.Equal(["Grade", "Line voltage"], state.Messages.Needed.Select(f => f.Label));

        state.Leave(FormPaths.LineVoltage);
        Assert.Equal("Missing.", state.Messages[FormPaths.LineVoltage]);
    }

    [Fact]
    public void Typed_window_width_releases_the_limb_pitch_and_back()
    {
        var state = Solved();
        state.Type(FormPaths.LimbPitch, "410");
        Assert.Equal("", state.Typed[FormPaths.WindowWidth]);

        state.Type(FormPaths.WindowWidth, "190");
        Assert.Equal("", state.Typed[FormPaths.LimbPitch]);
    }

    [Fact]
    public void Typing_a_step_pins_the_whole_set_and_release_gives_the_circle_back()
    {
        var state = Solved();
        state.Type(FormPaths.StepStack(1), "50");

        Assert.Equal("", state.Typed[FormPaths.Diameter]);
        Assert.Equal(["210", "190"], [state.Typed[FormPaths.StepWidth(0)], state.Typed[FormPaths.StepWidth(1)]]);
        Assert.Equal(50, state.Request.Design.Core!.LimbSteps![1].Stack_mm);
        Assert.Null(state.Request.Design.Core.Limb);

        state.Release(FormPaths.LimbSteps);
        Assert.Equal("220", state.Typed[FormPaths.Diameter]);
        Assert.False(state.Typed.HasItems(FormPaths.LimbSteps));

        state.Undo();
        Assert.Equal("50", state.Typed[FormPaths.StepStack(1)]);
    }

    [Fact]
    public void Removed_step_closes_the_row()
    {
        var state = Solved();
        state.RemoveStep(0);

        Assert.Equal("190", state.Typed[FormPaths.StepWidth(0)]);
        Assert.Equal(1, FormRules.StepRows(state.Typed));
    }

    [Fact]
    public void Yoke_height_is_no_field_of_the_design_but_is_asked_for()
    {
        var state = Solved();
        state.Type(FormPaths.YokeHeight, "240");

        Assert.Null(state.Request.Design.Core!.Yoke);
        Assert.Equal(240, state.Request.YokeHeight_mm);
    }

    [Fact]
    public void Lever_types_only_what_it_changed()
    {
        var state = Solved();
        state.Try(Samples.Lever(Samples.Input with { Joint = Samples.Input.Joint! with { Gap_mm = 0.2, Positions = null } }));

        Assert.Equal("0.2", state.Typed["joint.gap_mm"]);
        Assert.Equal("", state.Typed["joint.positions"]);
        Assert.Equal("", state.Typed[FormPaths.StackingFactor]);
        state.Undo();
        Assert.Equal("0.3", state.Typed["joint.gap_mm"]);
    }

    [Fact]
    public void Lever_pins_open_turns_only_where_it_would_change_them()
    {
        var state = Solved();
        state.Type(FormPaths.Turns, "");
        var design = Samples.Input with { ExcitedWinding = Samples.Input.ExcitedWinding! with { Turns = 19 } };
        state.Accept(state.Begin(), design, Samples.Ok(Samples.Estimate));

        state.Try(Samples.Lever(design with { Core = design.Core! with { WindowHeight_mm = 530 } }));
        Assert.Equal("", state.Typed[FormPaths.Turns]);

        state.Undo();
        state.Try(Samples.Lever(design with { Core = design.Core! with { Limb = design.Core.Limb! with { Diameter_mm = 225 } } }));
        Assert.Equal("19", state.Typed[FormPaths.Turns]);
    }

    [Fact]
    public void Single_phase_core_takes_a_single_phase_winding()
    {
        var state = Solved();
        state.Type(FormPaths.Form, "singlePhaseTwoLimb");

        Assert.Equal("single", state.Request.Design.ExcitedWinding!.Connection);
        Assert.Equal(1, state.Request.Design.Order!.Phases);
    }

    [Theory]
    [InlineData("core.yoke.stepWidths_mm[0]", "wide")]
    [InlineData("core.yoke.stepWidths_mm[1]", "2")]
    [InlineData("core.limbSteps[0].width_mm", "wide")]
    [InlineData("core.limbSteps[1].stack_mm", "0")]
    public void First_keystroke_in_a_derived_set_that_is_no_value_leaves_the_set_as_derived(string path, string text)
    {
        var state = Solved();
        state.Type(path, text);

        var core = state.Request.Design.Core!;
        Assert.True(state.Messages[path] is { Length: > 0 });
        Assert.Equal(path.StartsWith("core.yoke", StringComparison.Ordinal) ? [210, 190] : null, core.Yoke?.StepWidths_mm);
        Assert.Equal(path.StartsWith("core.limbSteps", StringComparison.Ordinal) ? [(210, 65.5), (190, 45.5)] : null, core.LimbSteps?.Select(s => (s.Width_mm!.Value, s.Stack_mm!.Value)));
    }

    [Fact]
    public void Half_typed_value_displaces_the_other_field_only_once_it_is_a_value()
    {
        var state = Solved();
        state.Type(FormPaths.LimbPitch, "4");
        Assert.Equal("190", state.Typed[FormPaths.WindowWidth]);
        Assert.Equal([FormPaths.LimbPitch], state.Messages.Paths);

        state.Type(FormPaths.LimbPitch, "40");
        Assert.Equal("", state.Typed[FormPaths.WindowWidth]);
        Assert.Equal(40, state.Request.Design.Core!.LimbPitch_mm);
    }

    [Fact]
    public void Emptied_cell_of_a_pinned_yoke_is_missing_and_the_value_before_stands()
    {
        var state = Solved();
        state.Type("core.yoke.stepWidths_mm[0]", "220");
        state.Type("core.yoke.stepWidths_mm[0]", "");

        Assert.StartsWith("Yoke step width is missing.", state.Messages["core.yoke.stepWidths_mm[0]"], StringComparison.Ordinal);
        Assert.Equal([220, 190], state.Request.Design.Core!.Yoke!.StepWidths_mm!);
    }

    [Fact]
    public void Emptied_row_of_pinned_steps_is_an_empty_row()
    {
        var state = Solved();
        state.PinSteps();
        state.Type("core.limbSteps[0].width_mm", "");
        state.Type("core.limbSteps[0].stack_mm", "");

        Assert.Equal(2, state.Request.Design.Core!.LimbSteps!.Count);
        Assert.Null(state.Request.Design.Core.LimbSteps[0].Width_mm);
    }

    [Theory]
    [InlineData(FormPaths.Turns, FormPaths.WantedFluxDensity, "1.6")]
    [InlineData(FormPaths.WindowWidth, FormPaths.LimbPitch, "400")]
    public void Needed_value_is_not_offered_for_release_before_another_field_gives_it(string path, string other, string text)
    {
        Assert.False(FormRules.CanRelease(DesignText.Empty.With(path, "20"), path));
        Assert.True(FormRules.CanRelease(DesignText.Empty.With(path, "20").With(other, text), path));
        Assert.True(FormRules.CanRelease(DesignText.Empty, FormPaths.StackingFactor));
    }

    private static DesignPageState Solved()
    {
        var state = new DesignPageState();
        state.Load(FormReader.Texts(Samples.Input));
        Assert.True(state.Accept(state.Begin(), Samples.Input, Samples.Ok(Samples.Estimate)));
        return state;
    }
}
