using System.Text.Json.Serialization;

namespace CoreDesign.Estimating.Contracts;

/// <summary>What the margins to saturation are asked for; everything has a default.</summary>
public sealed record MarginsInput
{
    /// <summary>The over-voltage is sought at which the no-load current is this many times that at rated voltage.</summary>
    public double? CurrentMultiple { get; init; }

    /// <summary>Direct current in each phase of the excited winding; 0 for none.</summary>
    [JsonPropertyName("dcBias_A")]
    public double? DcBias_A { get; init; }
    public InrushInput? Inrush { get; init; }
}

/// <summary>The instant of closing, and what limits the inrush; all seen from the excited winding.</summary>
public sealed record InrushInput
{
    /// <summary>Flux left in the core, in per cent of its peak at rated voltage, in the direction in which the flux sets out.</summary>
    [JsonPropertyName("residual_percent")]
    public double? Residual_percent { get; init; }

    /// <summary>Angle of the first phase's voltage when the switch closes; 0 at its zero, which is the worst.</summary>
    [JsonPropertyName("switchingAngle_deg")]
    public double? SwitchingAngle_deg { get; init; }

    /// <summary>Of the supply, in each line.</summary>
    [JsonPropertyName("sourceInductance_mH")]
    public double? SourceInductance_mH { get; init; }

    /// <summary>Of one phase of the excited winding with its limb saturated through.</summary>
    [JsonPropertyName("airCoreInductance_mH")]
    public double? AirCoreInductance_mH { get; init; }

    /// <summary>Winding and supply together, one phase.</summary>
    [JsonPropertyName("resistance_ohm")]
    public double? Resistance_ohm { get; init; }
}
