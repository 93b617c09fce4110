using System.Text.Json.Serialization;

namespace CoreDesign.Estimating.Contracts;

/// <summary>Everything an estimate finds; stored whole with a revision, so that a sheet can always be printed again as it was.</summary>
public sealed record EstimateResult
{
    public required double NoLoadLoss_W { get; init; }

    /// <summary>Mean rms line current in per cent of the rated line current of the excited winding.</summary>
    public required double NoLoadCurrent_percent { get; init; }

    /// <summary>Mean of the rms line currents.</summary>
    public required double NoLoadCurrent_A { get; init; }
    public required double RatedCurrent_A { get; init; }
    public required double ExcitingPower_VA { get; init; }
    public required double PowerFactor { get; init; }
    public required IReadOnlyList<LineResult> Lines { get; init; }

    /// <summary>The excited winding and, where it was given, the other one.</summary>
    public IReadOnlyList<SideResult> Sides { get; init; } = [];

    /// <summary>Null without a closed delta.</summary>
    public TertiaryResult? Tertiary { get; init; }

    /// <summary>Null unless the star point is isolated.</summary>
    public NeutralResult? Neutral { get; init; }

    /// <summary>Null where no capacitance was given; its current is in the lines.</summary>
    public CapacitiveResult? Capacitive { get; init; }
    public required IReadOnlyList<LimbResult> Limbs { get; init; }
    public required IReadOnlyList<PartResult> Parts { get; init; }
    public required IReadOnlyList<ShareResult> Shares { get; init; }
    public required MassResult Mass_kg { get; init; }
    public required MarginResult Margin { get; init; }
    public required EnergyBalanceResult EnergyBalance { get; init; }
    public required GeometryResult Geometry { get; init; }
    public required JointResult Joint { get; init; }
    public required SteelResult Steel { get; init; }
    public required ModelResult Model { get; init; }

    /// <summary>The design with every value that was used, defaults included.</summary>
    public required DesignInput Inputs { get; init; }

    /// <summary>JSON paths of <see cref="Inputs"/> that were left open and derived or taken by default.</summary>
    public required IReadOnlyList<string> Derived { get; init; }
    public required IReadOnlyList<NoteResult> Warnings { get; init; }
    public required IReadOnlyList<SourceResult> Sources { get; init; }
    public required string KernelVersion { get; init; }
    public required string SteelDataRevision { get; init; }
}

/// <summary>Current of one line (or of the winding, single phase). Waveform: equal spacing over one period from t = 0.</summary>
public sealed record LineResult
{
    public required string Phase { get; init; }
    public required double Rms_A { get; init; }
    public required double Peak_A { get; init; }
    public required IReadOnlyList<HarmonicResult> Harmonics { get; init; }
    [JsonPropertyName("waveform_A")]
    public required IReadOnlyList<double> Waveform_A { get; init; }
}

public sealed record HarmonicResult(
    int Order,
    double Rms_A,
    [property: JsonPropertyName("phase_deg")] double Phase_deg);

/// <summary>Flux density and field strength in one limb over one period; of a bank, the limbs of the unit in phase A.</summary>
public sealed record LimbResult
{
    public required string Name { get; init; }

    /// <summary>L for a single phase; empty for a return limb of three phases.</summary>
    public required string Phase { get; init; }
    public required IReadOnlyList<double> FluxDensity_T { get; init; }
    [JsonPropertyName("fieldStrength_A_m")]
    public required IReadOnlyList<double> FieldStrength_A_m { get; init; }
}

/// <summary>
/// A part of the core, or several equal ones (those of a bank's units). Area, length and mass are of one; loss, exciting power of all <see cref="Count"/>.
/// </summary>
public sealed record PartResult
{
    public required string Name { get; init; }

    /// <summary><c>limb</c>, <c>yoke</c>, <c>corner</c>, <c>tZone</c> or <c>joint</c>.</summary>
    public required string Kind { get; init; }
    public required int Count { get; init; }
    [JsonPropertyName("area_mm2")]
    public required double Area_mm2 { get; init; }
    [JsonPropertyName("length_mm")]
    public required double Length_mm { get; init; }
    [JsonPropertyName("mass_kg")]
    public required double Mass_kg { get; init; }
    public required double PeakFluxDensity_T { get; init; }
    public required double Loss_W { get; init; }
    public required double ExcitingPower_VA { get; init; }
}

/// <summary>A share of loss and current by part and cause; the shares of each add to 100 %.</summary>
public sealed record ShareResult
{
    /// <summary><c>limbSteel</c>, <c>yokeSteel</c>, <c>cornerSteel</c>, <c>joints</c>, <c>zoneExtra</c>, <c>airPath</c>.</summary>
    public required string Cause { get; init; }
    public required string Label { get; init; }
    public required double Loss_W { get; init; }
    public required double Loss_percent { get; init; }
    public required double Current_percent { get; init; }
}

/// <summary>Of the whole core, of all units for a bank.</summary>
public sealed record MassResult(double Limbs, double Yokes, double Corners, double Total);

public sealed record MarginResult
{
    public required double AtRated_percent { get; init; }
    public required double AtHighest_percent { get; init; }

    /// <summary>Frequency of the figures at highest voltage; null in results kept from before it was asked for, which stand for the rated one.</summary>
    public double? LowestFrequency_Hz { get; init; }

    /// <summary>The part with the highest peak flux density, and that value at rated and at highest voltage.</summary>
    public required string WorstPart { get; init; }
    public required double PeakAtRated_T { get; init; }
    public required double PeakAtHighest_T { get; init; }
    public required double SaturationPolarization_T { get; init; }
    public required string Definition { get; init; }
}

public sealed record EnergyBalanceResult(double Terminal_W, double Material_W, double RelativeError);

/// <summary>The derived geometry, enough to draw the core to scale. Steps from the widest outward.</summary>
public sealed record GeometryResult
{
    public required string Form { get; init; }

    /// <summary>3 for a bank; all that follows is of one unit.</summary>
    public int Units { get; init; } = 1;

    /// <summary>From the left; empty in results kept from before there were return limbs.</summary>
    public IReadOnlyList<CoreLimbResult> Limbs { get; init; } = [];
    public required IReadOnlyList<StepResult> LimbSteps { get; init; }

    /// <summary>Circle around the limb section.</summary>
    [JsonPropertyName("circleDiameter_mm")]
    public required double CircleDiameter_mm { get; init; }

    /// <summary>Gross stack area over the area of the circle.</summary>
    public required double FillRatio { get; init; }
    [JsonPropertyName("grossArea_mm2")]
    public required double GrossArea_mm2 { get; init; }
    [JsonPropertyName("netLimbArea_mm2")]
    public required double NetLimbArea_mm2 { get; init; }
    [JsonPropertyName("netYokeArea_mm2")]
    public required double NetYokeArea_mm2 { get; init; }
    [JsonPropertyName("stackHeight_mm")]
    public required double StackHeight_mm { get; init; }
    [JsonPropertyName("windowHeight_mm")]
    public required double WindowHeight_mm { get; init; }
    [JsonPropertyName("windowWidth_mm")]
    public required double WindowWidth_mm { get; init; }

    /// <summary>Clear width between a wound and a return limb at the widest step; null where all windows are alike.</summary>
    [JsonPropertyName("returnWindowWidth_mm")]
    public double? ReturnWindowWidth_mm { get; init; }

    /// <summary>Distance of neighbouring limb axes beside a window of <see cref="WindowWidth_mm"/>.</summary>
    [JsonPropertyName("limbPitch_mm")]
    public required double LimbPitch_mm { get; init; }
    [JsonPropertyName("limbWidth_mm")]
    public required double LimbWidth_mm { get; init; }
    [JsonPropertyName("yokeHeight_mm")]
    public required double YokeHeight_mm { get; init; }
    [JsonPropertyName("overallWidth_mm")]
    public required double OverallWidth_mm { get; init; }
    [JsonPropertyName("overallHeight_mm")]
    public required double OverallHeight_mm { get; init; }
    public required IReadOnlyList<PlateResult> Plates { get; init; }
}

/// <summary>A limb in the row: where its axis lies from the first limb's, its widest plate, and whether it carries a winding or only returns flux.</summary>
public sealed record CoreLimbResult
{
    public required string Name { get; init; }
    [JsonPropertyName("axis_mm")]
    public required double Axis_mm { get; init; }
    [JsonPropertyName("width_mm")]
    public required double Width_mm { get; init; }

    /// <summary>Plate width of each step over the wound limb's.</summary>
    public required double WidthShare { get; init; }
    [JsonPropertyName("netArea_mm2")]
    public required double NetArea_mm2 { get; init; }
    public required bool Wound { get; init; }
    public required bool IsReturn { get; init; }
}

/// <summary>One step of the limb and of the yoke; sheets counted over both sides of the axis.</summary>
public sealed record StepResult
{
    [JsonPropertyName("width_mm")]
    public required double Width_mm { get; init; }
    [JsonPropertyName("stack_mm")]
    public required double Stack_mm { get; init; }
    [JsonPropertyName("yokeWidth_mm")]
    public required double YokeWidth_mm { get; init; }
    public required int Sheets { get; init; }
}

/// <summary>One kind of plate that would be cut, with its mean outline (middle joint position).</summary>
public sealed record PlateResult
{
    public required int Step { get; init; }

    /// <summary><c>outerLimb</c>, <c>middleLimb</c>, <c>yoke</c>.</summary>
    public required string Shape { get; init; }
    public required int Pieces { get; init; }
    [JsonPropertyName("width_mm")]
    public required double Width_mm { get; init; }
    [JsonPropertyName("longSide_mm")]
    public required double LongSide_mm { get; init; }
    [JsonPropertyName("shortSide_mm")]
    public required double ShortSide_mm { get; init; }

    /// <summary>Net mass of all <see cref="Pieces"/> of this plate, from net stack (stacking factor counted).</summary>
    [JsonPropertyName("mass_kg")]
    public required double Mass_kg { get; init; }
    public required IReadOnlyList<PointResult> Outline { get; init; }
}

public sealed record PointResult(
    [property: JsonPropertyName("x_mm")] double X_mm,
    [property: JsonPropertyName("y_mm")] double Y_mm);

public sealed record JointResult
{
    public required string Type { get; init; }
    public required int Positions { get; init; }
    public required int SheetsPerPosition { get; init; }

    /// <summary>True where a works' effective gap replaced the joint model.</summary>
    public required bool EffectiveGapUsed { get; init; }

    /// <summary>Peak MMF drop across one limb's joint at rated voltage.</summary>
    public required double PeakMmf_A { get; init; }

    /// <summary>Peak flux density component normal to the joint line in the sheets that bridge it, at rated voltage; 0 with an effective gap.</summary>
    public required double BridgingFluxDensity_T { get; init; }
    public required IReadOnlyList<JointPointResult> Mmf { get; init; }
}

public sealed record JointPointResult([property: JsonPropertyName("B_T")] double B_T, double Mmf_A);

public sealed record SteelResult
{
    public required string Grade { get; init; }
    public required double Thickness_mm { get; init; }
    [JsonPropertyName("density_kg_m3")]
    public required double Density_kg_m3 { get; init; }
    public required double SaturationPolarization_T { get; init; }

    /// <summary>Catalogue loss of the sheet at the limb's peak flux density and the working frequency.</summary>
    [JsonPropertyName("sheetLoss_W_kg")]
    public required double SheetLoss_W_kg { get; init; }

    /// <summary><c>certificate</c>, <c>representative</c> or <c>given</c> (with the request).</summary>
    public required string Standing { get; init; }

    /// <summary>A sentence to print wherever a figure rests on this steel; empty for a certificate.</summary>
    public required string StandingText { get; init; }
}

public sealed record ModelResult
{
    public required double BuildingFactor { get; init; }
    public required string BuildingFactorSource { get; init; }
    [JsonPropertyName("temperature_C")]
    public required double Temperature_C { get; init; }
    public required int PointsPerPeriod { get; init; }
}

public sealed record NoteResult(string Key, string Text);

/// <summary><paramref name="Standing"/>: <c>read</c>, <c>from memory</c>, <c>derived</c>, <c>works</c>.</summary>
public sealed record SourceResult(string Key, string Text, string Standing);
