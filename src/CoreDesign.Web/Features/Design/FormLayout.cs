using CoreDesign.Estimating.Fields;

namespace CoreDesign.Web.Features.Design;

/// <summary>The fields in the order in which an engineer decides.</summary>
public static class FormLayout
{
    private static readonly Field YokeHeightField = new(FormPaths.YokeHeight, "Yoke height", "h", "mm", 5, 2500,
        "height of the widest yoke plate", "Height of the widest yoke plate; sets the area factor");

    private static readonly Field WantedFluxDensityField = new(FormPaths.WantedFluxDensity, "Flux density goal", "B", "T", 0.1, 2,
        "below the saturation of grain-oriented steel", "Peak flux density in the limb at rated voltage; turns and diameter are proposed for it");

    private static readonly FormChoice[] ConnectionChoices = [new("YN", "YN"), new("Y", "Y"), new("D", "D"), new("single", "single-phase")];

    public static IReadOnlyList<FormSection> Sections { get; } =
    [
        new("order", "Order",
        [
            new(FormPaths.Reference, FieldKind.Text) { Label = "Reference" },
            new(FormPaths.Form, FieldKind.Choice)
            {
                Label = "Core",
                Choices =
                [
                    new("threeLimb", "3-phase, 3 limbs"), new("fiveLimb", "3-phase, 5 limbs"),
                    new("singlePhaseTwoLimb", "1-phase, 2 limbs"), new("singlePhaseThreeLimb", "1-phase, 3 limbs"), new("singlePhaseFourLimb", "1-phase, 4 limbs"),
                ],
            },
            new(FormPaths.Units) { Label = "Units", Derivable = true },
            new("order.ratedPower_kVA"),
            new(FormPaths.Voltages, FieldKind.NumberList) { Label = "Rated voltages" },
            new("order.highestVoltage_percent") { Derivable = true, Step = 1 },
            new("order.frequency_Hz"),
            new("order.lowestFrequency_Hz") { Derivable = true, Step = 0.5 },
            new("order.askedNoLoadLoss_W"),
            new("order.askedNoLoadCurrent_percent"),
        ]),
        new("steel", "Steel",
        [
            new(FormPaths.Grade, FieldKind.Choice) { Label = "Grade" },
            new(FormPaths.StackingFactor) { Derivable = true, Step = 0.005 },
        ]),
        new("limb", "Limb section",
        [
            new(FormPaths.Diameter) { Derivable = true, Step = 1 },
            new(FormPaths.StepCount) { Derivable = true, Step = 1 },
            new(FormPaths.StockWidths, FieldKind.NumberList) { Label = "Stock widths" },
            new(FormPaths.WoundLimbs) { Derivable = true },
            new(FormPaths.ReturnLimbFactor) { Label = "Return limb factor", Derivable = true, Step = 0.01 },
        ]),
        new("window", "Window and yokes",
        [
            new(FormPaths.WindowHeight) { Step = 1 },
            new(FormPaths.WindowWidth) { Derivable = true, Step = 1 },
            new(FormPaths.LimbPitch) { Derivable = true, Step = 1 },
            new(FormPaths.ReturnWindowWidth) { Label = "Return window", Derivable = true, Step = 1 },
            new(FormPaths.YokeFactor) { Derivable = true, Step = 0.01 },
            new(FormPaths.YokeHeight) { Derivable = true, Own = YokeHeightField, Step = 1 },
        ]),
        new("joints", "Joints",
        [
            new(FormPaths.JointType, FieldKind.Choice)
            {
                Label = "Joint kind",
                Choices = [new("stepLap", "step-lap"), new("mitredOverlap", "mitred overlap"), new("buttLap", "butt-lap")],
            },
            new("joint.positions") { Derivable = true, Step = 1 },
            new("joint.sheetsPerPosition") { Derivable = true, Step = 1 },
            new("joint.gap_mm") { Derivable = true, Step = 0.05 },
            new("joint.overlap_mm") { Derivable = true, Step = 0.5 },
            new("joint.interface_um") { Derivable = true, Step = 1 },
            new(FormPaths.EffectiveGap) { Label = "Effective gap", Step = 0.005 },
        ]),
        new("winding", "Excited winding",
        [
            new(FormPaths.Connection, FieldKind.Choice)
            {
                Label = "Connection",
                Derivable = true,
                Choices = ConnectionChoices,
            },
            new(FormPaths.LineVoltage),
            new(FormPaths.Turns) { Derivable = true, Step = 1 },
            new(FormPaths.WantedFluxDensity) { Own = WantedFluxDensityField, Step = 0.01 },
            new("excitedWinding.resistance_ohm") { Derivable = true },
        ]),
        new("windings", "Taps and other windings",
        [
            new("excitedWinding.tap_percent") { Step = 0.5 },
            new(FormPaths.Tertiary, FieldKind.Choice) { Label = "Tertiary", Choices = [new("D", "closed delta")], None = "none" },
            new("tertiary.turns") { Derivable = true, Step = 1 },
            new("tertiary.resistance_ohm") { Derivable = true },
            new(FormPaths.OtherConnection, FieldKind.Choice) { Label = "Other winding", Choices = ConnectionChoices, None = "none" },
            new("otherWinding.lineVoltage_V") { Label = "Other voltage" },
            new("otherWinding.turns") { Label = "Other turns", Derivable = true, Step = 1 },
            new("otherWinding.tap_percent") { Label = "Other tap", Step = 0.5 },
            new("capacitance.phase_nF"),
            new("capacitance.lineVoltage_kV") { Label = "Its line voltage", Derivable = true },
        ]) { Folded = true },
        new("model", "Model",
        [
            new(FormPaths.ZeroSequence) { Label = "Zero sequence", Derivable = true, Step = 0.1 },
            new("model.buildingFactor") { Derivable = true, Step = 0.01 },
            new("model.temperature_C") { Derivable = true, Step = 5 },
        ]),
        new("margins", "Margins",
        [
            new("margins.currentMultiple") { Derivable = true, Step = 1 },
            new("margins.dcBias_A") { Derivable = true },
            new("margins.inrush.residual_percent") { Derivable = true, Step = 5 },
            new("margins.inrush.switchingAngle_deg") { Derivable = true, Step = 5 },
            new("margins.inrush.sourceInductance_mH") { Derivable = true },
            new("margins.inrush.airCoreInductance_mH") { Derivable = true },
            new("margins.inrush.resistance_ohm") { Derivable = true },
        ]),
    ];

    private static readonly Dictionary<string, FormField> ByPath =
        Sections.SelectMany(s => s.Fields).ToDictionary(f => f.Path, StringComparer.Ordinal);

    /// <summary>The line of a path, or a plain number line for a cell of the step table.</summary>
    public static FormField Find(string path) => ByPath.GetValueOrDefault(path) ?? new FormField(path);

    /// <summary>Connections that the core takes.</summary>
    public static IReadOnlyList<FormChoice> Connections(DesignText texts) =>
        [.. ConnectionChoices.Where(c => c.Value == "single" == FormFit.IsSinglePhase(texts))];
}
