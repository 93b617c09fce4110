using System.Text.Json.Serialization;

namespace CoreDesign.Estimating.Contracts;

/// <summary>An estimate with the curves and levers that the page and the sheet show beside it; what a revision stores.</summary>
public sealed record Study
{
    public required EstimateResult Estimate { get; init; }
    public required IReadOnlyList<VoltagePointResult> VoltageCurve { get; init; }
    public required IReadOnlyList<LeverResult> Levers { get; init; }

    /// <summary>Null in studies kept from before there were margins.</summary>
    public MarginsResult? Margins { get; init; }
}

/// <summary>One solved point of loss and current against voltage.</summary>
public sealed record VoltagePointResult
{
    public required double Voltage_percent { get; init; }
    public required double NoLoadLoss_W { get; init; }
    public required double NoLoadCurrent_percent { get; init; }
    public required double PeakFluxDensity_T { get; init; }
}

/// <summary>A solved change: what one step of this lever would bring. <see cref="Design"/> is the changed design.</summary>
public sealed record LeverResult
{
    /// <summary><c>betterSteel</c>, <c>largerDiameter</c>, <c>morePositions</c>, <c>tighterGap</c>, <c>largerYoke</c>.</summary>
    public required string Key { get; init; }
    public required string Label { get; init; }
    public required DesignInput Design { get; init; }
    public required double LossChange_W { get; init; }
    public required double CurrentChange_points { get; init; }
    public required double MassChange_kg { get; init; }
    public required double MarginChange_points { get; init; }
}

/// <summary>The outcome of a use case: a value, or what is wrong with the input, or why it can't be solved.</summary>
public sealed record Outcome<T>
    where T : class
{
    public T? Value { get; init; }
    public IReadOnlyList<FieldError> Errors { get; init; } = [];
    public Unsolvable? Unsolvable { get; init; }

    [JsonIgnore]
    public bool Ok => Value is not null;
}

/// <summary>One message about one field. Path is the JSON path, <c>core.windowHeight_mm</c>; the message names value, range and mend.</summary>
public sealed record FieldError(string Path, string Message);

/// <summary>Readable input that has no solution: the reason in the user's words, and the residual where a solve was tried.</summary>
public sealed record Unsolvable(string Reason, double? Residual);
