using System.Text.Json.Serialization;

namespace CoreDesign.Estimating.Contracts;

/// <summary>The no-load currents as a test floor would read them on one winding, energised at the same volts per turn as the other.</summary>
public sealed record SideResult
{
    /// <summary><c>excited</c> or <c>other</c>.</summary>
    public required string Winding { get; init; }
    public required string Connection { get; init; }
    public required double LineVoltage_V { get; init; }

    /// <summary>Turns in circuit, tap counted.</summary>
    public required double Turns { get; init; }
    public required double RatedCurrent_A { get; init; }
    public required double NoLoadCurrent_A { get; init; }
    public required double NoLoadCurrent_percent { get; init; }
    public required IReadOnlyList<SideLineResult> Lines { get; init; }
}

public sealed record SideLineResult
{
    public required string Phase { get; init; }
    public required double Rms_A { get; init; }
    public required double Peak_A { get; init; }
    public required IReadOnlyList<HarmonicResult> Harmonics { get; init; }
}

/// <summary>Current that circulates in the closed delta.</summary>
public sealed record TertiaryResult
{
    public required double Turns { get; init; }
    public required double Rms_A { get; init; }
    public required double Peak_A { get; init; }
    public required IReadOnlyList<HarmonicResult> Harmonics { get; init; }
}

/// <summary>Voltage of an isolated star point against the supply's neutral; per cent of rated phase voltage.</summary>
public sealed record NeutralResult
{
    public required double Rms_V { get; init; }
    [JsonPropertyName("rms_percent")]
    public required double Rms_percent { get; init; }
    public required double ThirdHarmonic_V { get; init; }
    [JsonPropertyName("thirdHarmonic_percent")]
    public required double ThirdHarmonic_percent { get; init; }
}

/// <summary>Leading current of a winding's capacitance, as each line of the excited winding carries it, and its power over all phases.</summary>
public sealed record CapacitiveResult
{
    public required double Current_A { get; init; }
    public required double Power_var { get; init; }
}
