using Bunit;
using CoreDesign.Web.Components;

namespace CoreDesign.Web.Tests.Fields;

public sealed class ChoiceAndTextFieldTests : BunitContext
{
    private static readonly Choice[] Joints = [new("stepLap", "step-lap"), new("buttLap", "butt-lap")];

    [Fact]
    public void Choices_show_their_words_and_hand_on_their_value()
    {
        string? chosen = null;
        var field = Choice(p => p.Add(x => x.Choices, Joints).Add(x => x.Value, "stepLap").Add(x => x.ValueChanged, v => chosen = v));

        Assert.Equal(["step-lap", "butt-lap"], field.FindAll("option").Select(o => o.TextContent));
        Assert.Equal("stepLap", field.Find("select").GetAttribute("value"));
        field.Find("select").Change("buttLap");
        Assert.Equal("buttLap", chosen);
    }

    [Fact]
    public void Choices_may_stand_under_headings()
    {
        var field = Choice(p => p.Add(x => x.Groups, Joints.GroupBy(j => j.Value == "stepLap" ? "mitred" : "square")));

        Assert.Equal(["mitred", "square"], field.FindAll("optgroup").Select(g => g.GetAttribute("label")));
        Assert.Equal("butt-lap", field.FindAll("optgroup")[1].TextContent.Trim());
    }

    [Fact]
    public void Choice_with_a_message_is_called_wrong_and_points_to_it()
    {
        var field = Choice(p => p.Add(x => x.Choices, Joints).Add(x => x.Message, "The joint type is missing."));

        var select = field.Find("select");
        Assert.Equal("true", select.GetAttribute("aria-invalid"));
        Assert.Equal("The joint type is missing.", field.Find($"[id='{select.GetAttribute("aria-describedby")}']").TextContent);
        Assert.Equal(select.Id, field.Find("label").GetAttribute("for"));
    }

    [Fact]
    public void Choice_that_is_closed_cannot_be_changed()
    {
        Assert.True(Choice(p => p.Add(x => x.Choices, Joints).Add(x => x.Disabled, true)).Find("select").HasAttribute("disabled"));
        Assert.False(Choice(p => p.Add(x => x.Choices, Joints)).Find("select").HasAttribute("disabled"));
    }

    [Fact]
    public void Text_is_handed_on_while_it_is_typed()
    {
        var typed = new List<string?>();
        var field = Render<TextField>(p => p.Add(x => x.Id, "ref").Add(x => x.Label, "Order").Add(x => x.MaxLength, 80).Add(x => x.TextChanged, typed.Add));

        field.Find("input").Input("HR-1");

        Assert.Equal(["HR-1"], typed);
        Assert.Equal("80", field.Find("input").GetAttribute("maxlength"));
        Assert.Equal("ref", field.Find("label").GetAttribute("for"));
    }

    [Fact]
    public void Text_with_a_message_is_called_wrong_and_points_to_it()
    {
        var field = Render<TextField>(p => p.Add(x => x.Id, "ref").Add(x => x.Label, "Order").Add(x => x.Message, "Too long."));

        Assert.Equal(("true", "ref-m"), (field.Find("input").GetAttribute("aria-invalid"), field.Find("input").GetAttribute("aria-describedby")));
        Assert.Equal("Too long.", field.Find("#ref-m").TextContent);
    }

    private IRenderedComponent<ChoiceField> Choice(Action<ComponentParameterCollectionBuilder<ChoiceField>> more) => Render<ChoiceField>(p =>
    {
        p.Add(x => x.Id, "joint").Add(x => x.Label, "Joint kind");
        more(p);
    });
}
