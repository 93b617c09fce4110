using System.Text.Json.Serialization;

namespace CoreDesign.Estimating.Contracts;

/// <summary>
/// A core design as it is asked for: the body of <c>POST /api/estimates</c>, the state of the design page and the
/// input of a stored revision are all this one record. Workshop units; what is null was left open, and the
/// estimate says which value it took for it.
/// </summary>
public sealed record DesignInput
{
    public OrderInput? Order { get; init; }
    public ExcitedWindingInput? ExcitedWinding { get; init; }
    public OtherWindingInput? OtherWinding { get; init; }
    public TertiaryInput? Tertiary { get; init; }
    public CapacitanceInput? Capacitance { get; init; }
    public SteelInput? Steel { get; init; }
    public CoreInput? Core { get; init; }
    public JointInput? Joint { get; init; }
    public ModelInput? Model { get; init; }
    public MarginsInput? Margins { get; init; }
}

/// <summary>What the customer asks for.</summary>
public sealed record OrderInput
{
    public string? Reference { get; init; }
    public int? Phases { get; init; }
    public double? RatedPower_kVA { get; init; }
    public double? Frequency_Hz { get; init; }

    /// <summary>Rated line voltages of the windings in kV, highest first; for the title only. The excited winding counts.</summary>
    public IReadOnlyList<double>? RatedVoltages_kV { get; init; }
    public double? HighestVoltage_percent { get; init; }

    /// <summary>Lowest frequency at which the highest voltage can last; the rated one where it is left open.</summary>
    public double? LowestFrequency_Hz { get; init; }
    public double? AskedNoLoadLoss_W { get; init; }
    public double? AskedNoLoadCurrent_percent { get; init; }
}

/// <summary>The winding that the no-load test energises. Line voltage is rms, line to line for three phases.</summary>
public sealed record ExcitedWindingInput
{
    /// <summary><c>single</c>, <c>YN</c>, <c>Y</c> or <c>D</c>.</summary>
    public string? Connection { get; init; }
    public double? LineVoltage_V { get; init; }
    public double? Turns { get; init; }

    /// <summary>Turns in circuit are <see cref="Turns"/> times 1 plus this.</summary>
    [JsonPropertyName("tap_percent")]
    public double? Tap_percent { get; init; }
    [JsonPropertyName("resistance_ohm")]
    public double? Resistance_ohm { get; init; }
}

/// <summary>
/// A winding from which the test could be energised instead; the answer then has the currents of either side at equal volts per turn.
/// </summary>
public sealed record OtherWindingInput
{
    /// <summary><c>single</c>, <c>YN</c>, <c>Y</c> or <c>D</c>.</summary>
    public string? Connection { get; init; }
    public double? LineVoltage_V { get; init; }

    /// <summary>Left open, they follow from the voltages and connections.</summary>
    public double? Turns { get; init; }
    [JsonPropertyName("tap_percent")]
    public double? Tap_percent { get; init; }
}

/// <summary>A delta closed on itself round the three phases; present, even empty, it is there.</summary>
public sealed record TertiaryInput
{
    /// <summary><c>D</c>, the only one there is.</summary>
    public string? Connection { get; init; }

    /// <summary>Of one phase; left open, those of the excited winding.</summary>
    public double? Turns { get; init; }
    [JsonPropertyName("resistance_ohm")]
    public double? Resistance_ohm { get; init; }
}

/// <summary>Capacitance of a high-voltage winding with earthed neutral whose voltage rises evenly from the neutral to the line.</summary>
public sealed record CapacitanceInput
{
    /// <summary>Of one phase to earth.</summary>
    [JsonPropertyName("phase_nF")]
    public double? Phase_nF { get; init; }

    /// <summary>Rated line voltage of that winding.</summary>
    [JsonPropertyName("lineVoltage_kV")]
    public double? LineVoltage_kV { get; init; }
}

/// <summary>A grade of the library, or data of one's own.</summary>
public sealed record SteelInput
{
    public string? Grade { get; init; }
    public SteelDataInput? Data { get; init; }
}

/// <summary>Steel data given with the request.</summary>
public sealed record SteelDataInput
{
    public string? Name { get; init; }
    public double? Thickness_mm { get; init; }
    [JsonPropertyName("density_kg_m3")]
    public double? Density_kg_m3 { get; init; }
    [JsonPropertyName("resistivity_ohm_m")]
    public double? Resistivity_ohm_m { get; init; }
    [JsonPropertyName("saturationPolarization_T")]
    public double? SaturationPolarization_T { get; init; }
    public IReadOnlyList<MagnetizationPointInput>? Magnetization { get; init; }
    public IReadOnlyList<LossCurveInput>? Loss { get; init; }
}

public sealed record MagnetizationPointInput
{
    [JsonPropertyName("B_T")]
    public double? B_T { get; init; }
    [JsonPropertyName("H_A_m")]
    public double? H_A_m { get; init; }
}

public sealed record LossCurveInput
{
    public double? Frequency_Hz { get; init; }
    public IReadOnlyList<LossPointInput>? Points { get; init; }
}

public sealed record LossPointInput
{
    [JsonPropertyName("B_T")]
    public double? B_T { get; init; }
    [JsonPropertyName("W_kg")]
    public double? W_kg { get; init; }
}

/// <summary>The stacked core: form, limb section, yoke, window.</summary>
public sealed record CoreInput
{
    /// <summary><c>singlePhaseTwoLimb</c>, <c>singlePhaseThreeLimb</c>, <c>singlePhaseFourLimb</c>, <c>threeLimb</c> or <c>fiveLimb</c>.</summary>
    public string? Form { get; init; }

    /// <summary>1, or 3 single-phase cores as a three-phase bank.</summary>
    public int? Units { get; init; }

    /// <summary>Limbs of a two-limb core that carry the winding: 1, or 2 with half of the turns on each.</summary>
    public int? WoundLimbs { get; init; }

    /// <summary>The step set from the widest outward; or leave it out and give <see cref="Limb"/>.</summary>
    public IReadOnlyList<StepInput>? LimbSteps { get; init; }
    public LimbInput? Limb { get; init; }
    public YokeInput? Yoke { get; init; }
    public ReturnLimbInput? ReturnLimb { get; init; }

    [JsonPropertyName("windowHeight_mm")]
    public double? WindowHeight_mm { get; init; }

    /// <summary>Clear window width at the widest step; or give <see cref="LimbPitch_mm"/>.</summary>
    [JsonPropertyName("windowWidth_mm")]
    public double? WindowWidth_mm { get; init; }
    public double? LimbPitch_mm { get; init; }

    /// <summary>Clear width at the widest step between a wound and a return limb of a core that also has windows between wound limbs.</summary>
    [JsonPropertyName("returnWindowWidth_mm")]
    public double? ReturnWindowWidth_mm { get; init; }
    public double? StackingFactor { get; init; }
}

/// <summary>One step: plate width, and the thickness of the plates of that width alone, both sides of the axis together.</summary>
public sealed record StepInput
{
    [JsonPropertyName("width_mm")]
    public double? Width_mm { get; init; }
    [JsonPropertyName("stack_mm")]
    public double? Stack_mm { get; init; }
}

/// <summary>The limb circle from which the best step set follows.</summary>
public sealed record LimbInput
{
    [JsonPropertyName("diameter_mm")]
    public double? Diameter_mm { get; init; }
    public int? Steps { get; init; }

    [JsonPropertyName("stockWidths_mm")]
    public IReadOnlyList<double>? StockWidths_mm { get; init; }
}

public sealed record YokeInput
{
    /// <summary>Yoke plates are wider by this factor than the limb's of the same step; the stacks are the same.</summary>
    public double? AreaFactor { get; init; }

    /// <summary>Widths of the yoke plates, one for each limb step; instead of the factor.</summary>
    [JsonPropertyName("stepWidths_mm")]
    public IReadOnlyList<double>? StepWidths_mm { get; init; }
}

public sealed record ReturnLimbInput
{
    /// <summary>Plates of a return limb are narrower by this factor than the wound limb's of the same step; the stacks are the same.</summary>
    public double? AreaFactor { get; init; }
}

public sealed record JointInput
{
    /// <summary><c>buttLap</c>, <c>mitredOverlap</c> or <c>stepLap</c>.</summary>
    public string? Type { get; init; }

    /// <summary>Distinct joint positions in a book.</summary>
    public int? Positions { get; init; }
    public int? SheetsPerPosition { get; init; }

    [JsonPropertyName("gap_mm")]
    public double? Gap_mm { get; init; }

    /// <summary>Shift between neighbouring positions, normal to the joint line.</summary>
    [JsonPropertyName("overlap_mm")]
    public double? Overlap_mm { get; init; }
    [JsonPropertyName("interface_um")]
    public double? Interface_um { get; init; }

    /// <summary>Replaces the joint model by a plain gap of this length across the limb section at each joint.</summary>
    [JsonPropertyName("effectiveGap_mm")]
    public double? EffectiveGap_mm { get; init; }
}

public sealed record ModelInput
{
    public double? BuildingFactor { get; init; }

    /// <summary>Zero-sequence magnetizing reactance through air and tank over rated impedance.</summary>
    [JsonPropertyName("zeroSequenceReactance_pu")]
    public double? ZeroSequenceReactance_pu { get; init; }
    [JsonPropertyName("temperature_C")]
    public double? Temperature_C { get; init; }
}
