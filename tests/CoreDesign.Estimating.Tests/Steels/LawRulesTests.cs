using CoreDesign.Estimating.Steels.Import;

namespace CoreDesign.Estimating.Tests.Steels;

/// <summary>A steel that is kept must be one the solver can use, and measured exciting power is held against the curves.</summary>
public class LawRulesTests
{
    [Fact]
    public void Template_fits_and_its_exciting_power_agrees()
    {
        var preview = SteelImport.Read(SteelImport.Template, "template.csv");
        Assert.True(preview.Ok, string.Join("; ", preview.Errors.Select(e => e.Message)));
        Assert.DoesNotContain(preview.Warnings, w => w.Message.Contains("VA/kg measured", StringComparison.Ordinal));
    }

    [Fact]
    public void Exciting_power_that_the_curves_do_not_give_is_said_with_both_figures()
    {
        var text = SteelImport.Template.Replace("excitingPower,50,1.7,1.85", "excitingPower,50,1.7,3.7", StringComparison.Ordinal);
        Assert.NotEqual(SteelImport.Template, text);
        var preview = SteelImport.Read(text, "certificate.csv");
        Assert.True(preview.Ok);
        var warning = Assert.Single(preview.Warnings, w => w.Message.Contains("VA/kg measured", StringComparison.Ordinal));
        Assert.Contains("at 1.7 T, 50 Hz 3.7 VA/kg measured", warning.Message, StringComparison.Ordinal);
    }
}
