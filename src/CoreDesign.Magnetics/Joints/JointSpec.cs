namespace CoreDesign.Magnetics.Joints;

public enum JointKind
{
    /// <summary>Square cut, alternate layers lapped.</summary>
    ButtLap,

    /// <summary>45° cut, two alternating positions.</summary>
    MitredOverlap,

    /// <summary>45° cut, several positions per book.</summary>
    StepLap,
}

/// <summary>
/// A laminated joint. <see cref="Positions"/> is the number of distinct joint positions in a book (M), 2 for the two lapped kinds;
/// gap and shift are normal to the joint line.
/// </summary>
public sealed record JointSpec
{
    public required JointKind Kind { get; init; }
    public required int Positions { get; init; }
    public required int SheetsPerPosition { get; init; }
    public required double Gap_m { get; init; }
    public required double Shift_m { get; init; }

    /// <summary>Non-magnetic thickness of one sheet interface (two coatings and roughness).</summary>
    public required double Interface_m { get; init; }
}

/// <summary>
/// MMF drop of one joint zone, in excess of the plain steel path, against the mean flux density of the limb's steel.
/// Peak values; both columns rise (a gap of zero has no drop at all).
/// <paramref name="BridgingFluxDensity_T"/>: highest in a bridging sheet, component normal to the joint line.
/// </summary>
public sealed record JointTable(
    IReadOnlyList<double> FluxDensity_T,
    IReadOnlyList<double> Mmf_A,
    IReadOnlyList<double> BridgingFluxDensity_T);
