using System.Text.Json.Serialization;

namespace CoreDesign.Estimating.Contracts;

/// <summary>The margins to saturation beyond those of the estimate; each carries its definition. A figure that could not be found is null and its reason says why.</summary>
public sealed record MarginsResult
{
    /// <summary>Rated voltage at other frequencies, by volts per hertz in per cent of the rated quotient.</summary>
    public required IReadOnlyList<FluxPointResult> FluxCurve { get; init; }

    /// <summary>What is varied in <see cref="FluxCurve"/>.</summary>
    public required string FluxCurveDefinition { get; init; }
    public required OverVoltageResult OverVoltage { get; init; }
    public required InrushResult Inrush { get; init; }

    /// <summary>Null where no direct current is asked for.</summary>
    public DcBiasResult? DcBias { get; init; }

    /// <summary>What a reader must know of these figures: points left out, the caution on protection.</summary>
    public required IReadOnlyList<NoteResult> Notes { get; init; }
}

/// <summary>One solved point at rated voltage and another frequency.</summary>
public sealed record FluxPointResult
{
    /// <summary>Voltage over frequency in per cent of rated voltage over rated frequency.</summary>
    [JsonPropertyName("voltsPerHertz_percent")]
    public required double VoltsPerHertz_percent { get; init; }
    public required double Frequency_Hz { get; init; }
    public required double NoLoadLoss_W { get; init; }
    public required double NoLoadCurrent_percent { get; init; }
    public required double PeakFluxDensity_T { get; init; }
}

/// <summary>The over-voltage at which the no-load current reaches a multiple of itself.</summary>
public sealed record OverVoltageResult
{
    public required double CurrentMultiple { get; init; }

    /// <summary>In per cent of rated voltage; null where the multiple is not reached.</summary>
    public double? Voltage_percent { get; init; }
    public double? NoLoadCurrent_percent { get; init; }
    public double? PeakFluxDensity_T { get; init; }

    /// <summary>Highest voltage that was tried, and the multiple there.</summary>
    public double? HighestTried_percent { get; init; }
    public double? MultipleAtHighest { get; init; }
    public required string Definition { get; init; }
    public string? Reason { get; init; }
}

/// <summary>The first current peak after the switch closes, solved in time, beside closed formulas.</summary>
public sealed record InrushResult
{
    /// <summary>Highest absolute value of any line current.</summary>
    public double? Peak_A { get; init; }

    /// <summary>That peak over the peak of the rated line current.</summary>
    public double? PeakOverRated { get; init; }
    public string? PeakLine { get; init; }

    [JsonPropertyName("peakTime_ms")]
    public double? PeakTime_ms { get; init; }

    /// <summary>Highest peak in each period after closing.</summary>
    public IReadOnlyList<double> PeakOfPeriod_A { get; init; } = [];

    /// <summary>Change of the peak when the time step was halved.</summary>
    public double? StepHalving_percent { get; init; }

    /// <summary>Closed formula without resistance, for the first phase by itself.</summary>
    public double? FormulaLossless_A { get; init; }

    /// <summary>Closed formula with resistance.</summary>
    public double? FormulaWithResistance_A { get; init; }
    public required string FormulaText { get; init; }
    public required string Definition { get; init; }
    public required string Assumptions { get; init; }

    /// <summary>Instants of <see cref="Lines"/>.</summary>
    [JsonPropertyName("time_ms")]
    public IReadOnlyList<double> Time_ms { get; init; } = [];
    public IReadOnlyList<InrushLineResult> Lines { get; init; } = [];
    public string? Reason { get; init; }
}

public sealed record InrushLineResult(string Phase, IReadOnlyList<double> Current_A);

/// <summary>Steady state at rated voltage with direct current in each phase of the excited winding.</summary>
public sealed record DcBiasResult
{
    [JsonPropertyName("bias_A")]
    public required double Bias_A { get; init; }
    public double? NoLoadLoss_W { get; init; }

    /// <summary>Mean of the rms line currents, direct current included.</summary>
    public double? NoLoadCurrent_A { get; init; }
    public double? NoLoadCurrent_percent { get; init; }
    public double? PeakFluxDensity_T { get; init; }
    public string? WorstPart { get; init; }

    /// <summary>Saturation polarization less that peak, over saturation polarization; below 0 in saturation.</summary>
    [JsonPropertyName("margin_percent")]
    public double? Margin_percent { get; init; }

    /// <summary>Largest mean flux density of a wound limb.</summary>
    public double? Offset_T { get; init; }
    public IReadOnlyList<DcBiasLineResult> Lines { get; init; } = [];
    public required string Definition { get; init; }
    public string? Reason { get; init; }
}

public sealed record DcBiasLineResult
{
    public required string Phase { get; init; }
    public required double Rms_A { get; init; }
    public required double Peak_A { get; init; }

    /// <summary>Without the mean; even orders are the bias's own.</summary>
    public required IReadOnlyList<HarmonicResult> Harmonics { get; init; }

    [JsonPropertyName("waveform_A")]
    public required IReadOnlyList<double> Waveform_A { get; init; }
}
