using Bunit;
using CoreDesign.Web.Components;
using CoreDesign.Web.Features.Design;

namespace CoreDesign.Web.Tests.Design;

public sealed class FieldsPanelTests : BunitContext
{
    [Fact]
    public void Every_field_has_a_label_of_its_own()
    {
        var panel = Show(new DesignPageState());

        var fields = panel.FindAll("input, select");
        Assert.True(fields.Count > 25);
        Assert.All(fields, f => Assert.Single(panel.FindAll("label"), l => l.GetAttribute("for") == f.Id));
    }

    [Fact]
    public void Message_is_tied_to_its_field()
    {
        var state = new DesignPageState();
        state.Type("joint.gap_mm", "99");

        var panel = Show(state);

        var field = panel.FindAll("input").Single(i => i.Id == "joint.gap_mm");
        Assert.Equal("true", field.GetAttribute("aria-invalid"));
        var message = panel.FindAll(".msg").Single(m => field.GetAttribute("aria-describedby")!.Split(' ').Contains(m.Id));
        Assert.Contains("99 mm is outside 0 to 5 mm", message.TextContent, StringComparison.Ordinal);
    }

    [Fact]
    public void Typed_text_is_handed_on_as_it_was_typed()
    {
        (string Path, string Text)? typed = null;
        var panel = Show(new DesignPageState(), e => typed = e);

        panel.FindAll("input").Single(i => i.Id == FormPaths.WindowHeight).Input("52,");

        Assert.Equal((FormPaths.WindowHeight, "52,"), typed);
    }

    [Fact]
    public void Derived_value_shows_as_such_and_a_pinned_one_can_be_released()
    {
        var state = new DesignPageState();
        state.Load(FormReader.Texts(Samples.Input));
        state.Accept(state.Begin(), Samples.Input, Samples.Ok(Samples.Estimate));
        (string Path, string Text)? typed = null;
        var panel = Show(state, e => typed = e);

        var pitch = panel.FindAll("input").Single(i => i.Id == FormPaths.LimbPitch);
        Assert.Equal(("400", ""), (pitch.GetAttribute("placeholder"), pitch.GetAttribute("value") ?? ""));

        var releases = panel.FindAll("button.st").ToDictionary(b => b.GetAttribute("aria-label")!.Split(':')[0], StringComparer.Ordinal);
        releases["Highest voltage"].Click();
        Assert.Equal(("order.highestVoltage_percent", ""), typed);

        // Nothing would stand in for the only width of the window.
        Assert.DoesNotContain("Window width", releases.Keys);
    }

    private IRenderedComponent<FieldsPanel> Show(DesignPageState state, Action<(string Path, string Text)>? type = null) =>
        Render<FieldsPanel>(p => p
            .Add(x => x.State, state)
            .Add(x => x.Grades, new[] { new Choice("M105-30P", "M105-30P") }.GroupBy(_ => "high permeability"))
            .Add(x => x.OnType, type ?? (_ => { })));
}
