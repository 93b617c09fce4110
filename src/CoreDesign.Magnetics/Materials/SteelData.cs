namespace CoreDesign.Magnetics.Materials;

/// <summary>
/// What is known of a sheet steel along the rolling direction, as tables. Peak values of an alternating sine flux
/// density. The law that the solver needs is fitted to it; nothing here is fitted.
/// </summary>
public sealed record SteelData
{
    public required string Name { get; init; }
    public required double SheetThickness_m { get; init; }
    public required double Density_kg_m3 { get; init; }
    public required double Resistivity_ohm_m { get; init; }
    public required double SaturationPolarization_T { get; init; }

    /// <summary>Peak curve, rising in both columns, the origin left out.</summary>
    public required IReadOnlyList<MagnetizationPoint> Magnetization { get; init; }

    /// <summary>Loss curves, one for each frequency, rising.</summary>
    public required IReadOnlyList<LossCurve> Loss { get; init; }
}

/// <summary>A point of the peak curve.</summary>
public readonly record struct MagnetizationPoint(double B_T, double H_A_per_m);

/// <summary>Specific total loss against peak flux density at one frequency, sine flux.</summary>
public sealed record LossCurve(double Frequency_Hz, IReadOnlyList<LossPoint> Points);

/// <summary>A point of a loss curve.</summary>
public readonly record struct LossPoint(double B_T, double Loss_W_per_kg);
