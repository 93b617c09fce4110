using CoreDesign.Magnetics.Materials;

namespace CoreDesign.Estimating.Steels;

/// <summary>A grade of grain-oriented sheet: what is guaranteed of it, and the curves a design is computed with.</summary>
public sealed record SteelGrade
{
    public required string Name { get; init; }

    /// <summary><c>conventional</c>, <c>high permeability</c>, <c>domain refined</c>, or <c>works</c> for a works' own data.</summary>
    public required string Class { get; init; }

    /// <summary><c>current</c>, <c>older</c>, <c>AISI</c>, <c>works</c>.</summary>
    public required string Generation { get; init; }
    public string Note { get; init; } = "";

    public required SourcedFigure Thickness_mm { get; init; }
    public required SourcedFigure Density_kg_per_m3 { get; init; }
    public required SourcedFigure Resistivity_ohm_m { get; init; }
    public required SourcedFigure SaturationPolarization_T { get; init; }
    public SourcedFigure? MinimumStackingFactor { get; init; }

    /// <summary>Least peak polarization at 800 A/m peak; null where nothing is guaranteed (a works' own data).</summary>
    public SourcedFigure? Polarization800_T { get; init; }

    /// <summary>Points that the loss curves pass exactly: the guaranteed ones, and those derived where a guarantee is missing.</summary>
    public IReadOnlyList<LossAnchor> LossAnchors { get; init; } = [];

    /// <summary>Along the rolling direction.</summary>
    public required SteelCurves Rolling { get; init; }

    /// <summary>Across the rolling direction.</summary>
    public required SteelCurves Transverse { get; init; }

    /// <summary>One of <see cref="SteelStanding"/>.</summary>
    public required string Standing { get; init; }

    /// <summary>Sentence to print wherever a figure rests on this steel; empty for a certificate.</summary>
    public required string StandingText { get; init; }

    /// <summary>Guaranteed loss in W/kg at this point, null where the tables guarantee none.</summary>
    public SourcedFigure? GuaranteedLoss(double fluxDensity_T, double frequency_Hz) =>
        LossAnchors.FirstOrDefault(a => a.Guaranteed && a.B_T == fluxDensity_T && a.Frequency_Hz == frequency_Hz)?.Loss_W_per_kg;

    /// <summary>The kernel's record of the rolling direction.</summary>
    public SteelData ToSteelData() => ToSteelData(Rolling, Name);

    /// <summary>The kernel's record of the direction across rolling.</summary>
    public SteelData ToTransverseSteelData() => ToSteelData(Transverse, Name + ", across rolling");

    private SteelData ToSteelData(SteelCurves curves, string name) => new()
    {
        Name = name,
        SheetThickness_m = Thickness_mm.Value / 1000,
        Density_kg_m3 = Density_kg_per_m3.Value,
        Resistivity_ohm_m = Resistivity_ohm_m.Value,
        SaturationPolarization_T = SaturationPolarization_T.Value,
        Magnetization = curves.Magnetization,
        Loss = curves.Loss,
    };
}

/// <summary>A point of a loss curve known beforehand. Peak flux density, sine.</summary>
public sealed record LossAnchor(double B_T, double Frequency_Hz, SourcedFigure Loss_W_per_kg, bool Guaranteed);

/// <summary>The curves of one direction, all of peak flux density.</summary>
public sealed record SteelCurves
{
    /// <summary>Peak field strength against peak flux density, rising in both.</summary>
    public required IReadOnlyList<MagnetizationPoint> Magnetization { get; init; }

    /// <summary>One curve for each frequency, lowest first.</summary>
    public required IReadOnlyList<LossCurve> Loss { get; init; }

    /// <summary>Specific exciting power, where it was measured; compared with what the other curves give, never computed with.</summary>
    public IReadOnlyList<ExcitingPowerCurve> ExcitingPower { get; init; } = [];
    public required string Source { get; init; }
    public required string Standing { get; init; }
}

/// <summary>Specific exciting power (rms volts times rms amperes per kilogram) against peak flux density at one frequency.</summary>
public sealed record ExcitingPowerCurve(double Frequency_Hz, IReadOnlyList<ExcitingPowerPoint> Points);

/// <summary>A point of an exciting power curve.</summary>
public readonly record struct ExcitingPowerPoint(double B_T, double Power_VA_per_kg);
