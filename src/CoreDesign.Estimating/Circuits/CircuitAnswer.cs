using System.Text.Json.Serialization;

namespace CoreDesign.Estimating.Circuits;

/// <summary>Steady state of a circuit case, with the members of the format's <c>expected</c> block. SI units; harmonics as [peak amplitude, phase in degrees].</summary>
public sealed record CircuitAnswer
{
    public required IReadOnlyDictionary<string, CurrentAnswer> Windings { get; init; }
    public required IReadOnlyDictionary<string, CurrentAnswer> Lines { get; init; }
    public CurrentAnswer? Neutral { get; init; }

    [JsonPropertyName("delta_circulating")]
    public CurrentAnswer? DeltaCirculating { get; init; }

    [JsonPropertyName("mean_line_rms")]
    public required double MeanLineRms { get; init; }

    [JsonPropertyName("apparent_VA")]
    public required double Apparent_VA { get; init; }

    [JsonPropertyName("I0_percent")]
    public double? I0_percent { get; init; }

    [JsonPropertyName("terminal_power_W")]
    public required double TerminalPower_W { get; init; }

    [JsonPropertyName("core_loss_W")]
    public required double CoreLoss_W { get; init; }

    [JsonPropertyName("copper_loss_W")]
    public required double CopperLoss_W { get; init; }

    [JsonPropertyName("branch_loss_W")]
    public required IReadOnlyDictionary<string, double> BranchLoss_W { get; init; }

    [JsonPropertyName("energy_balance_residual_over_VA")]
    public required double EnergyBalanceResidualOverVA { get; init; }

    [JsonPropertyName("B_peak")]
    public required IReadOnlyDictionary<string, double> BPeak { get; init; }

    [JsonPropertyName("B_harmonics")]
    public required IReadOnlyDictionary<string, IReadOnlyDictionary<string, double[]>> BHarmonics { get; init; }
    public required CaseWaveforms Waveforms { get; init; }
    public required string KernelVersion { get; init; }
}

public sealed record CurrentAnswer
{
    public required double Rms { get; init; }
    public required double Peak { get; init; }
    public required double Mean { get; init; }
    public required IReadOnlyDictionary<string, double[]> Harmonics { get; init; }
}

/// <summary>96 points over one period, t = n T/96.</summary>
public sealed record CaseWaveforms
{
    public required int Points { get; init; }

    [JsonPropertyName("i")]
    public required IReadOnlyDictionary<string, double[]> I { get; init; }

    /// <summary>Currents of the supply lines; in a delta they are not those of the windings.</summary>
    public required IReadOnlyDictionary<string, double[]> Lines { get; init; }

    [JsonPropertyName("B")]
    public required IReadOnlyDictionary<string, double[]> B { get; init; }
}
