using System.Text.Json;
using System.Text.Json.Serialization;

namespace CoreDesign.Estimating.Circuits;

/// <summary>
/// A magnetic circuit in the exchange format <c>magnet-network-case/1</c>: SI units throughout, the body of
/// <c>POST /api/circuits</c>. What the format says of signs, time and laws is in the handbook, chapter "Circuits of your own".
/// </summary>
public sealed record CircuitCase
{
    public string? Format { get; init; }
    public string? Name { get; init; }
    public string? Title { get; init; }
    public string? Note { get; init; }
    public double? Frequency { get; init; }
    public CaseSupply? Supply { get; init; }

    [JsonPropertyName("rated_kVA")]
    public double? Rated_kVA { get; init; }
    public IReadOnlyDictionary<string, CaseMaterial>? Materials { get; init; }
    public IReadOnlyList<CaseBranch>? Branches { get; init; }
    public IReadOnlyList<CaseWinding>? Windings { get; init; }

    /// <summary>Members that a kept case carries beside its circuit; read and left alone.</summary>
    public JsonElement? Tolerance { get; init; }
    public JsonElement? Agreement { get; init; }
    public JsonElement? Methods { get; init; }
}

public sealed record CaseSupply
{
    public string? Connection { get; init; }

    [JsonPropertyName("V")]
    public double? V { get; init; }
}

public sealed record CaseMaterial
{
    [JsonPropertyName("mu_r")]
    public double? MuR { get; init; }

    [JsonPropertyName("B")]
    public IReadOnlyList<double>? B { get; init; }

    [JsonPropertyName("H")]
    public IReadOnlyList<double>? H { get; init; }
    public double? Sigma { get; init; }
    public double? D { get; init; }

    [JsonPropertyName("k_exc")]
    public double? KExc { get; init; }
    public double? S0 { get; init; }
    public IReadOnlyList<CaseStop>? Stops { get; init; }
}

public sealed record CaseStop
{
    public double? R { get; init; }
    public double? W { get; init; }
}

public sealed record CaseBranch
{
    public string? Name { get; init; }
    public string? Kind { get; init; }
    public string? From { get; init; }
    public string? To { get; init; }
    public double? Area { get; init; }
    public double? Length { get; init; }
    public string? Material { get; init; }
    public double? Gap { get; init; }

    [JsonPropertyName("gap_area")]
    public double? GapArea { get; init; }
    public double? Reluctance { get; init; }
}

public sealed record CaseWinding
{
    public string? Name { get; init; }
    public string? Phase { get; init; }
    public IReadOnlyList<CaseCoil>? Coils { get; init; }

    [JsonPropertyName("R")]
    public double? R { get; init; }
}

public sealed record CaseCoil
{
    public string? Branch { get; init; }
    public double? Turns { get; init; }
}
