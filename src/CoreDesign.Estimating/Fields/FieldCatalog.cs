namespace CoreDesign.Estimating.Fields;

/// <summary>Every input field by its JSON path; list items are written <c>[]</c>.</summary>
public static class FieldCatalog
{
    public static IReadOnlyList<Field> All { get; } =
    [
        new("order.phases", "Phases", "m", "", 1, 3, "one or three", "1 or 3") { Whole = true },
        new("order.ratedPower_kVA", "Rated power", "S", "kVA", 1, 1_500_000, "from small distribution to the largest power units", "Power of the whole unit"),
        new("order.frequency_Hz", "Frequency", "f", "Hz", 10, 400, "loss curves are given at power frequencies", "Rated frequency"),
        new("order.ratedVoltages_kV[]", "Rated voltage", "U", "kV", 0.01, 1200, "rated line voltages", "Rated line voltages, highest first; for the title"),
        new("order.highestVoltage_percent", "Highest voltage", "U", "%", 100, 130, "continuous over-excitation at no load", "Highest continuous voltage in per cent of rated"),
        new("order.lowestFrequency_Hz", "Lowest frequency", "f", "Hz", 10, 400, "loss curves are given at power frequencies", "Lowest frequency at which the highest voltage can last; at most the rated one"),
        new("order.askedNoLoadLoss_W", "Asked-for loss", "P", "W", 0.1, 5_000_000, "a limit for the whole core", "Limit for the no-load loss"),
        new("order.askedNoLoadCurrent_percent", "Asked-for current", "I", "%", 0.001, 100, "per cent of rated current", "Limit for the no-load current"),
        new("excitedWinding.lineVoltage_V", "Line voltage", "U", "V", 10, 1_200_000, "rms, line to line for three phases", "Rated line voltage of the excited winding"),
        new("excitedWinding.turns", "Turns", "N", "", 1, 20_000, "turns in series of one phase", "Turns of one phase of the excited winding"),
        new("excitedWinding.tap_percent", "Tap", "t", "%", -30, 30, "turns in circuit against the turns given", "Tap position in per cent of the turns"),
        new("otherWinding.lineVoltage_V", "Other winding's voltage", "U", "V", 10, 1_200_000, "rms, line to line for three phases", "Rated line voltage of a winding that the test could energise instead"),
        new("otherWinding.turns", "Other winding's turns", "N", "", 1, 20_000, "turns in series of one phase", "Turns of one phase of the other winding"),
        new("otherWinding.tap_percent", "Other winding's tap", "t", "%", -30, 30, "turns in circuit against the turns given", "Tap position in per cent of the turns"),
        new("tertiary.turns", "Tertiary turns", "N", "", 1, 20_000, "turns of one phase of the closed delta", "Turns of one phase of the closed delta"),
        new("tertiary.resistance_ohm", "Tertiary resistance", "R", "ohm", 0, 1000, "resistance of one phase", "Resistance of one phase of the closed delta; 0 to neglect it"),
        new("capacitance.phase_nF", "Capacitance", "C", "nF", 0.01, 1000, "of one phase of the high-voltage winding to earth", "Capacitance of one phase of the high-voltage winding to earth"),
        new("capacitance.lineVoltage_kV", "Capacitance's voltage", "U", "kV", 0.1, 1200, "rated line voltage of the winding that has the capacitance", "Rated line voltage of the winding that has the capacitance"),
        new("excitedWinding.resistance_ohm", "Winding resistance", "R", "ohm", 0, 1000, "resistance of one phase", "Resistance of one phase; 0 to neglect it"),
        new("core.limb.diameter_mm", "Diameter", "D", "mm", 30, 2000, "circle around the limb", "Circle around the limb section"),
        new("core.limb.steps", "Steps", "n", "", 1, 25, "plate widths in the limb", "Number of plate widths") { Whole = true },
        new("core.limb.stockWidths_mm[]", "Stock width", "w", "mm", 5, 2000, "slit widths", "Slitting list to choose from"),
        new("core.limbSteps[].width_mm", "Step width", "w", "mm", 5, 2000, "plate width", "Plate width, widest first"),
        new("core.limbSteps[].stack_mm", "Step stack", "b", "mm", 0.2, 2000, "both sides of the axis together", "Thickness of the plates of that width alone, both sides together"),
        new("core.yoke.areaFactor", "Yoke area factor", "k", "", 0.3, 2, "yoke plates wider than the limb's by this factor", "Yoke area over limb area"),
        new("core.units", "Units", "n", "", 1, 3, "one core, or three single-phase cores as a bank", "1, or 3 for a bank of single-phase units") { Whole = true },
        new("core.woundLimbs", "Wound limbs", "n", "", 1, 2, "limbs of a two-limb core that carry the winding", "1, or 2 with half of the turns on each") { Whole = true },
        new("core.returnLimb.areaFactor", "Return limb area factor", "k", "", 0.2, 1.5, "return limb's plates against the wound limb's", "Return limb area over wound limb area"),
        new("core.returnWindowWidth_mm", "Return window width", "W", "mm", 10, 4000, "clear, at the widest step", "Clear width between a wound and a return limb at the widest step"),
        new("core.yoke.stepWidths_mm[]", "Yoke step width", "h", "mm", 5, 2500, "one for each limb step", "Yoke plate width of each step"),
        new("core.windowHeight_mm", "Window height", "H", "mm", 20, 6000, "clear, at the widest step", "Clear window height at the widest step"),
        new("core.windowWidth_mm", "Window width", "W", "mm", 10, 4000, "clear, at the widest step", "Clear window width at the widest step"),
        new("core.limbPitch_mm", "Limb pitch", "M", "mm", 20, 6000, "distance of limb axes", "Distance of neighbouring limb axes; instead of the window width"),
        new("core.stackingFactor", "Stacking factor", "k", "", 0.8, 1, "net steel over stack", "Net steel over gross stack"),
        new("joint.positions", "Joint positions", "M", "", 2, 12, "distinct positions in a book", "Distinct joint positions in a book; 2 for a single overlap") { Whole = true },
        new("joint.sheetsPerPosition", "Sheets per position", "p", "", 1, 4, "sheets laid per position", "Sheets laid at each position") { Whole = true },
        new("joint.gap_mm", "Gap", "g", "mm", 0, 5, "normal to the joint line", "Gap normal to the joint line"),
        new("joint.overlap_mm", "Overlap", "s", "mm", 0.5, 30, "shift between neighbouring positions, normal to the line", "Shift between neighbouring positions, normal to the joint line"),
        new("joint.interface_um", "Interface", "t", "µm", 1, 60, "two coatings and roughness", "Non-magnetic thickness between two sheets"),
        new("joint.effectiveGap_mm", "Effective gap", "g", "mm", 0, 5, "a works' own value", "Replaces the joint model by a plain gap at each joint"),
        new("model.buildingFactor", "Building factor", "k", "", 1, 2, "core loss over sheet loss", "Core W/kg over sheet W/kg at the same flux density"),
        new("model.zeroSequenceReactance_pu", "Zero-sequence reactance", "x", "p.u.", 0.05, 10, "through air and tank, over rated impedance", "Zero-sequence magnetizing reactance through air and tank over rated impedance"),
        new("model.temperature_C", "Core temperature", "θ", "°C", -20, 140, "steel temperature at which the figures hold", "Core temperature"),
        new("margins.currentMultiple", "Current multiple", "n", "", 1.1, 100, "more than the current at rated voltage, less than saturation could ever draw", "The over-voltage is sought at which the no-load current is this many times that at rated voltage"),
        new("margins.dcBias_A", "Direct current", "I", "A", 0, 1000, "stray direct current in a network is below it", "Direct current in each phase of the excited winding; 0 for none"),
        new("margins.inrush.residual_percent", "Residual flux", "B", "%", 0, 100, "no core keeps more than its peak", "Flux left in the core, in per cent of its peak at rated voltage"),
        new("margins.inrush.switchingAngle_deg", "Switching angle", "α", "°", 0, 360, "one period of the voltage", "Angle of the first phase's voltage when the switch closes; 0, at its zero, is the worst"),
        new("margins.inrush.sourceInductance_mH", "Source inductance", "L", "mH", 0, 10_000, "from a stiff supply to a weak high-voltage line", "Inductance of the supply in each line, seen from the excited winding; 0 for a stiff supply"),
        new("margins.inrush.airCoreInductance_mH", "Air-core inductance", "L", "mH", 0.0001, 1_000_000, "from one turn to the largest high-voltage winding", "Inductance of one phase of the excited winding with its limb saturated through"),
        new("margins.inrush.resistance_ohm", "Inrush resistance", "R", "ohm", 0, 1000, "winding and supply of one phase", "Winding and supply together, one phase; it wears the inrush off"),
    ];

    private static readonly Dictionary<string, Field> ByPath = All.ToDictionary(f => f.Path, StringComparer.Ordinal);

    /// <summary>The field of a path; indices are taken out, <c>core.limbSteps[3].width_mm</c> finds <c>core.limbSteps[].width_mm</c>.</summary>
    /// <exception cref="KeyNotFoundException">No such field.</exception>
    public static Field Find(string path) =>
        TryFind(path) ?? throw new KeyNotFoundException($"There is no input field '{path}'.");

    /// <summary>The field of a path, or null.</summary>
    public static Field? TryFind(string path) =>
        ByPath.GetValueOrDefault(System.Text.RegularExpressions.Regex.Replace(path, @"\[\d+\]", "[]", System.Text.RegularExpressions.RegexOptions.None, TimeSpan.FromSeconds(1)));
}
