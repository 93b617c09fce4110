using Bunit;
using CoreDesign.Web.Components;

namespace CoreDesign.Web.Tests.Fields;

public sealed class NumberFieldTests : BunitContext
{
    [Fact]
    public void Label_names_the_field_and_the_unit_stands_beside_it()
    {
        var field = Show(p => p.Add(x => x.Unit, "mm"));

        Assert.Equal("gap", field.Find("label").GetAttribute("for"));
        Assert.Equal(("Gap", "mm"), (field.Find("label").TextContent, field.Find(".u").TextContent));
    }

    [Fact]
    public void Half_typed_number_is_handed_on_letter_by_letter()
    {
        var typed = new List<string?>();
        var field = Show(p => p.Add(x => x.TextChanged, typed.Add));

        field.Find("input").Input("0,");
        field.Find("input").Input("0,3");

        Assert.Equal(["0,", "0,3"], typed);
    }

    [Fact]
    public void Message_hint_and_derived_value_all_describe_the_field()
    {
        var field = Show(p => p.Add(x => x.Message, "Gap 99 mm is outside 0 to 5 mm.").Add(x => x.Hint, "0 to 5 mm").Add(x => x.Derived, "0.3"));

        var input = field.Find("input");
        Assert.Equal("true", input.GetAttribute("aria-invalid"));
        var told = input.GetAttribute("aria-describedby")!.Split(' ').Select(id => field.Find($"[id='{id}']").TextContent.Trim()).ToArray();
        Assert.Equal(["Gap 99 mm is outside 0 to 5 mm.", "0 to 5 mm"], told[..2]);
        Assert.StartsWith("Derived: 0.3", told[2], StringComparison.Ordinal);
        Assert.Equal("alert", field.Find(".msg").GetAttribute("role"));
    }

    [Fact]
    public void Field_without_message_is_not_called_wrong()
    {
        var input = Show().Find("input");

        Assert.Null(input.GetAttribute("aria-invalid"));
        Assert.Null(input.GetAttribute("aria-describedby"));
    }

    [Fact]
    public void Derived_value_shows_in_the_empty_field_and_is_marked_as_such()
    {
        var field = Show(p => p.Add(x => x.Derived, "0.3").Add(x => x.Derivable, true));

        Assert.Equal("0.3", field.Find("input").GetAttribute("placeholder"));
        Assert.Equal("=", field.Find(".st").TextContent);
        Assert.Empty(field.FindAll("button"));
    }

    [Fact]
    public void Pinned_value_is_released_by_its_button_which_says_to_what()
    {
        string? typed = null;
        var field = Show(p => p.Add(x => x.Text, "0.5").Add(x => x.Derived, "0.3").Add(x => x.Unit, "mm").Add(x => x.Derivable, true).Add(x => x.TextChanged, t => typed = t));

        Assert.Equal("Gap: Pinned. Release to the derived 0.3 mm", field.Find("button").GetAttribute("aria-label"));
        field.Find("button").Click();
        Assert.Equal("", typed);
    }

    [Theory]
    [InlineData("0.5", false, false)]
    [InlineData("", true, false)]
    [InlineData("0.5", true, true)]
    public void Nothing_to_release_where_nothing_is_derived_typed_or_writable(string text, bool derivable, bool readOnly) =>
        Assert.Empty(Show(p => p.Add(x => x.Text, text).Add(x => x.Derivable, derivable).Add(x => x.ReadOnly, readOnly)).FindAll("button"));

    [Fact]
    public void Step_of_the_arrow_keys_goes_to_the_browser() =>
        Assert.Equal("0.05", Show(p => p.Add(x => x.Step, 0.05)).Find("input").GetAttribute("data-step"));

    [Fact]
    public void Text_with_markup_is_shown_as_text()
    {
        var field = Show(p => p.Add(x => x.Message, "\"<b>9</b>\" is not a number."));

        Assert.Equal("\"<b>9</b>\" is not a number.", field.Find(".msg").TextContent);
        Assert.Empty(field.FindAll(".msg b"));
    }

    private IRenderedComponent<NumberField> Show(Action<ComponentParameterCollectionBuilder<NumberField>>? more = null) => Render<NumberField>(p =>
    {
        p.Add(x => x.Id, "gap").Add(x => x.Label, "Gap");
        more?.Invoke(p);
    });
}
