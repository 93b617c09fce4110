using CoreDesign.Estimating.Fields;

namespace CoreDesign.Web.Features.Design;

/// <summary>The fields in the order in which an engineer decides.</summary>
public static class FormLayout
{
    private static readonly Field YokeHeightField = new(FormPaths.YokeHeight, "Yoke height", "h", "mm", 5, 2500,
        "height of the widest yoke plate", "Height of the widest yoke plate; sets the area factor");

    private static readonly Field WantedFluxDensityField = new(FormPaths.WantedFluxDensity, "Wanted flux density", "B", "T", 0.1, 2,
        "below the saturation of grain-oriented steel", "Peak flux density in the limb at rated voltage; turns and diameter are proposed for it");

    public static IReadOnlyList<FormSection> Sections { get; } =
    [
        new("order", "Order",
        [
            new(FormPaths.Reference, FieldKind.Text) { Label = "Reference" },
            new(FormPaths.Form, FieldKind.Choice)
            {
                Label = "Core",
                Choices = [new("threeLimb", "three-phase, 3 limbs"), new("singlePhaseTwoLimb", "single-phase, 2 limbs")],
            },
            new("order.ratedPower_kVA"),
            new(FormPaths.Voltages, FieldKind.NumberList) { Label = "Rated voltages" },
            new("order.highestVoltage_percent") { Derivable = true },
            new("order.frequency_Hz"),
            new("order.askedNoLoadLoss_W"),
            new("order.askedNoLoadCurrent_percent"),
        ]),
        new("steel", "Steel",
        [
            new(FormPaths.Grade, FieldKind.Choice) { Label = "Grade" },
            new(FormPaths.StackingFactor) { Derivable = true },
        ]),
        new("limb", "Limb section",
        [
            new(FormPaths.Diameter) { Derivable = true },
            new(FormPaths.StepCount) { Derivable = true },
            new(FormPaths.StockWidths, FieldKind.NumberList) { Label = "Stock widths" },
        ]),
        new("window", "Window and yokes",
        [
            new(FormPaths.WindowHeight),
            new(FormPaths.WindowWidth) { Derivable = true },
            new(FormPaths.LimbPitch) { Derivable = true },
            new(FormPaths.YokeFactor) { Derivable = true },
            new(FormPaths.YokeHeight) { Derivable = true, Own = YokeHeightField },
        ]),
        new("joints", "Joints",
        [
            new(FormPaths.JointType, FieldKind.Choice)
            {
                Label = "Kind",
                Choices = [new("stepLap", "step-lap"), new("mitredOverlap", "mitred overlap"), new("buttLap", "butt-lap")],
            },
            new("joint.positions") { Derivable = true },
            new("joint.sheetsPerPosition") { Derivable = true },
            new("joint.gap_mm") { Derivable = true },
            new("joint.overlap_mm") { Derivable = true },
            new("joint.interface_um") { Derivable = true },
            new(FormPaths.EffectiveGap) { Label = "Works' effective gap" },
        ]),
        new("winding", "Excited winding",
        [
            new(FormPaths.Connection, FieldKind.Choice)
            {
                Label = "Connection",
                Derivable = true,
                Choices = [new("YN", "YN"), new("Y", "Y"), new("D", "D"), new("single", "single-phase")],
            },
            new(FormPaths.LineVoltage),
            new(FormPaths.Turns) { Derivable = true },
            new(FormPaths.WantedFluxDensity) { Own = WantedFluxDensityField },
            new("excitedWinding.resistance_ohm") { Derivable = true },
        ]),
        new("model", "Model",
        [
            new("model.buildingFactor") { Derivable = true },
            new("model.temperature_C") { Derivable = true },
        ]),
    ];

    private static readonly Dictionary<string, FormField> ByPath =
        Sections.SelectMany(s => s.Fields).ToDictionary(f => f.Path, StringComparer.Ordinal);

    /// <summary>The line of a path, or a plain number line for a cell of the step table.</summary>
    public static FormField Find(string path) => ByPath.GetValueOrDefault(path) ?? new FormField(path);

    /// <summary>Connections that the form of core takes.</summary>
    public static IReadOnlyList<FormChoice> Connections(string form) =>
        [.. Find(FormPaths.Connection).Choices.Where(c => c.Value == "single" == form.StartsWith("singlePhase", StringComparison.Ordinal))];
}
