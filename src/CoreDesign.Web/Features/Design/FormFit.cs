using CoreDesign.Estimating.Estimate;
using CoreDesign.Magnetics.Geometry;

namespace CoreDesign.Web.Features.Design;

/// <summary>Which fields go with the core form and the windings that are chosen; the others are not shown.</summary>
public static class FormFit
{
    /// <summary>One phase; three units make a bank of three.</summary>
    public static bool IsSinglePhase(DesignText texts) => HasSinglePhaseCore(texts) && !IsBank(texts);

    /// <summary>Phases of the design, or null while no core is chosen.</summary>
    public static double? Phases(DesignText texts) => texts[FormPaths.Form].Length == 0 ? null : IsSinglePhase(texts) ? 1 : 3;

    /// <summary>Whether a field is shown: it goes with the design, or something stands in it.</summary>
    public static bool Shows(DesignText texts, string path) => texts.Has(path) || Fits(texts, path);

    /// <summary>Whether a section that is closed at first stands open.</summary>
    public static bool IsOpen(DesignText texts, FormSection section) => section.Fields.Any(f => texts.Has(f.Path));

    /// <summary>The texts without those that the form of core has no place for.</summary>
    public static DesignText Keep(DesignText texts) =>
        texts.All.Select(t => t.Key).Where(path => DependsOnCore(path) && !Fits(texts, path)).ToList().Aggregate(texts, (t, path) => t.Without(path));

    public static bool Fits(DesignText texts, string path)
    {
        var form = CoreForms.TryFind(texts[FormPaths.Form]);
        return path switch
        {
            FormPaths.Units => HasSinglePhaseCore(texts),
            FormPaths.WoundLimbs => form == CoreForm.SinglePhaseTwoLimb,
            FormPaths.ReturnLimbFactor => form is { } f && CoreForms.HasReturnLimbs(f),
            FormPaths.ReturnWindowWidth => form is { } f && CoreForms.HasReturnWindows(f),
            FormPaths.ZeroSequence => form is { } f && CoreForms.HasAirPath(f) && (texts[FormPaths.Connection] == "Y" || f == CoreForm.FiveLimb || texts.Has(path)),
            FormPaths.Tertiary => !IsSinglePhase(texts),
            "tertiary.turns" or "tertiary.resistance_ohm" => !IsSinglePhase(texts) && texts.Has(FormPaths.Tertiary),
            "otherWinding.lineVoltage_V" or "otherWinding.turns" or "otherWinding.tap_percent" => texts.Has(FormPaths.OtherConnection),
            "capacitance.lineVoltage_kV" => texts.Has("capacitance.phase_nF"),
            _ => true,
        };
    }

    private static bool DependsOnCore(string path) =>
        path is FormPaths.Units or FormPaths.WoundLimbs or FormPaths.ReturnLimbFactor or FormPaths.ReturnWindowWidth or FormPaths.ZeroSequence
        || path.StartsWith("tertiary.", StringComparison.Ordinal);

    private static bool HasSinglePhaseCore(DesignText texts) => CoreForms.TryFind(texts[FormPaths.Form]) is { } f && CoreForms.IsSinglePhase(f);

    private static bool IsBank(DesignText texts) => NumberText.TryRead(texts[FormPaths.Units], out var units, out _) && units == 3;
}
