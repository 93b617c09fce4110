namespace CoreDesign.Magnetics.Geometry;

public enum CoreForm
{
    SinglePhaseTwoLimb,

    /// <summary>Wound centre limb between two return limbs.</summary>
    SinglePhaseThreeLimb,

    /// <summary>Two wound limbs between two return limbs.</summary>
    SinglePhaseFourLimb,
    ThreeLimb,

    /// <summary>Three wound limbs between two return limbs.</summary>
    FiveLimb,
}

/// <summary>One step: plate width of limb and yoke, and the thickness of the plates of that width alone, both sides of the axis together (gross, coatings included).</summary>
public readonly record struct CoreStep(double LimbWidth_m, double YokeWidth_m, double Stack_m);

public enum CorePartKind
{
    Limb,
    Yoke,

    /// <summary>Common part of limb and yoke packets at an outer limb.</summary>
    Corner,

    /// <summary>Common part of limb and yoke packets at an inner limb.</summary>
    TZone,
}

/// <summary>
/// A part of the core as the magnetic circuit sees it. Name: limbA, limbR (a return limb), yokeABTop, cornerATop, tZoneTop, … Net area is steel;
/// Volume is net steel, and Length is volume over area, so that the circuit and the scales agree on the mass.
/// </summary>
public sealed record CorePart(string Name, CorePartKind Kind, double NetArea_m2, double Length_m, double Volume_m3);

public enum PlateShape
{
    /// <summary>A limb at an end of the row, wound or return.</summary>
    OuterLimb,

    /// <summary>A limb between two others.</summary>
    MiddleLimb,

    /// <summary>A yoke, or one of the plates that it is made of where limbs part it.</summary>
    Yoke,
}

/// <summary>
/// A kind of plate that would be cut: outline of the middle joint position in metres, counter-clockwise, X along the rolling direction, origin at
/// the lower left of the box around it; area by the shoelace rule. <c>Step</c> counts from 1, the widest; <c>Pieces</c> is how many lie in one layer;
/// long and short side run along the plate; the net volume is steel, over all pieces and the share of the stack that they fill.
/// </summary>
public sealed record CorePlate(int Step, PlateShape Shape, int Pieces, double Width_m, double LongSide_m, double ShortSide_m, IReadOnlyList<(double X_m, double Y_m)> Outline, double Area_m2, double NetVolume_m3);

/// <summary>
/// A limb as it stands in the row: letter, distance of its axis from the first limb's, plate width over the wound limb's of the same step, net area, and
/// whether it only returns the flux.
/// </summary>
public sealed record CoreLimb(string Letter, double Axis_m, double WidthShare, double NetArea_m2, bool IsReturn);

/// <summary>A stacked core, derived whole from its steps and window; lengths in metres.</summary>
public sealed record CoreGeometry
{
    public required CoreForm Form { get; init; }
    public required IReadOnlyList<CoreStep> Steps { get; init; }
    public required double StackingFactor { get; init; }
    public required double WindowHeight_m { get; init; }
    public required double WindowWidth_m { get; init; }

    /// <summary>Clear width at the widest step between a wound and a return limb; the window width where all windows are alike.</summary>
    public required double ReturnWindowWidth_m { get; init; }
    public required double LimbPitch_m { get; init; }
    public required double CircleDiameter_m { get; init; }
    public required double GrossLimbArea_m2 { get; init; }
    public required double NetLimbArea_m2 { get; init; }
    public required double NetYokeArea_m2 { get; init; }

    /// <summary>From the left.</summary>
    public required IReadOnlyList<CoreLimb> Limbs { get; init; }
    public required double StackHeight_m { get; init; }
    public required double OverallWidth_m { get; init; }
    public required double OverallHeight_m { get; init; }
    public required IReadOnlyList<CorePart> Parts { get; init; }
    public required IReadOnlyList<CorePlate> Plates { get; init; }
}
