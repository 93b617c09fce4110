using CoreDesign.Estimating.Estimate;
using CoreDesign.Magnetics.Geometry;
using CoreDesign.Web.Features.Design;

namespace CoreDesign.Web.Tests.Design;

public sealed class FormFitTests
{
    private static readonly DesignText Five = DesignText.Empty.With(FormPaths.Form, "fiveLimb");

    [Fact]
    public void Every_core_form_can_be_chosen()
    {
        var forms = FormLayout.Find(FormPaths.Form).Choices.Select(c => CoreForms.TryFind(c.Value)).ToList();
        Assert.Equal(Enum.GetValues<CoreForm>().Cast<CoreForm?>().Order(), forms.Order());
    }

    [Theory]
    [InlineData("threeLimb", "")]
    [InlineData("fiveLimb", "core.returnLimb.areaFactor core.returnWindowWidth_mm model.zeroSequenceReactance_pu")]
    [InlineData("singlePhaseTwoLimb", "core.units core.woundLimbs")]
    [InlineData("singlePhaseThreeLimb", "core.returnLimb.areaFactor core.units")]
    [InlineData("singlePhaseFourLimb", "core.returnLimb.areaFactor core.returnWindowWidth_mm core.units")]
    public void Core_form_shows_the_fields_that_are_its_own(string form, string shown)
    {
        var texts = DesignText.Empty.With(FormPaths.Form, form);
        string[] own = [FormPaths.ReturnLimbFactor, FormPaths.ReturnWindowWidth, FormPaths.Units, FormPaths.WoundLimbs, FormPaths.ZeroSequence];
        Assert.Equal(shown.Split(' ', StringSplitOptions.RemoveEmptyEntries), own.Where(p => FormFit.Shows(texts, p)).Order(StringComparer.Ordinal));
    }

    [Fact]
    public void Another_core_form_takes_out_what_it_has_no_place_for_and_undo_brings_it_back()
    {
        var state = new DesignPageState();
        state.Load(Five.With(FormPaths.ReturnLimbFactor, "0.45").With(FormPaths.ReturnWindowWidth, "300").With(FormPaths.Tertiary, "D").With("tertiary.turns", "80")
            .With(FormPaths.Connection, "D").With(FormPaths.OtherConnection, "YN"));
        state.Type(FormPaths.Form, "singlePhaseThreeLimb");

        Assert.Equal("0.45", state.Typed[FormPaths.ReturnLimbFactor]);
        Assert.False(state.Typed.Has(FormPaths.ReturnWindowWidth) || state.Typed.Has(FormPaths.Tertiary) || state.Typed.Has("tertiary.turns"));
        Assert.Equal(("single", "single"), (state.Typed[FormPaths.Connection], state.Typed[FormPaths.OtherConnection]));

        state.Undo();
        Assert.Equal(("300", "80", "D"), (state.Typed[FormPaths.ReturnWindowWidth], state.Typed["tertiary.turns"], state.Typed[FormPaths.Connection]));
    }

    [Fact]
    public void Three_units_of_a_single_phase_core_take_three_phase_connections()
    {
        var state = new DesignPageState();
        state.Load(DesignText.Empty.With(FormPaths.Form, "singlePhaseTwoLimb").With(FormPaths.Connection, "single"));
        state.Type(FormPaths.Units, "3");
        Assert.Equal("YN", state.Typed[FormPaths.Connection]);
        Assert.Equal(["YN", "Y", "D"], FormLayout.Connections(state.Typed).Select(c => c.Value));
        Assert.True(FormFit.Fits(state.Typed, FormPaths.Tertiary));
    }

    [Fact]
    public void Fields_of_windings_that_are_not_there_stay_away_and_a_typed_value_never_hides()
    {
        Assert.False(FormFit.Shows(Five, "otherWinding.turns") || FormFit.Shows(Five, "tertiary.turns") || FormFit.Shows(Five, "capacitance.lineVoltage_kV"));
        Assert.True(FormFit.Shows(Five.With(FormPaths.OtherConnection, "YN"), "otherWinding.turns"));
        Assert.True(FormFit.Shows(Five.With(FormPaths.Tertiary, "D"), "tertiary.turns"));
        Assert.True(FormFit.Shows(Five.With("otherWinding.turns", "900"), "otherWinding.turns"));
        var section = FormLayout.Sections.Single(s => s.Folded);
        Assert.False(FormFit.IsOpen(Five, section));
        Assert.True(FormFit.IsOpen(Five.With("excitedWinding.tap_percent", "-5"), section));
    }
}
