using CoreDesign.Magnetics.Materials;

namespace CoreDesign.Magnetics.Circuits;

public enum SupplyConnection
{
    Single,
    StarWithNeutral,
    StarIsolated,
    Delta,
}

/// <summary>
/// Sinusoidal supply. Voltage rms, line to line for three phases, across the winding for <see cref="SupplyConnection.Single"/>.
/// Phase voltages e_k = sqrt(2/3) V cos(wt - k 120°); a delta winding A lies between lines A and B.
/// </summary>
public sealed record Supply(SupplyConnection Connection, double Voltage_V, double Frequency_Hz);

/// <summary>
/// One branch. Positive flux runs from <see cref="From"/> to <see cref="To"/>; the MMF drop is the sum of what is present:
/// Length·H(steel), flux·Reluctance, MMF curve of a joint, ExtraLoss·d(flux)/dt, less the windings' ampere-turns.
/// </summary>
public sealed record CircuitBranch
{
    public required string Name { get; init; }
    public required string From { get; init; }
    public required string To { get; init; }

    /// <summary>Net area; flux density is flux over this area.</summary>
    public required double Area_m2 { get; init; }

    /// <summary>Length of the steel; 0 without steel.</summary>
    public double Length_m { get; init; }
    public SheetLaw? Steel { get; init; }
    public double Reluctance_A_per_Wb { get; init; }

    /// <summary>MMF drop against flux density, A over T; lossless.</summary>
    public MonotoneCurve? Mmf { get; init; }

    /// <summary>Linear rate term in A s/Wb: loss beyond the sheet's own, as a building factor charges to a zone.</summary>
    public double ExtraLoss_A_s_per_Wb { get; init; }
}

/// <summary>A coil on a branch; negative turns reverse its direction.</summary>
public readonly record struct Coil(string Branch, double Turns);

public enum WindingPhase
{
    Single,
    A,
    B,
    C,

    /// <summary>Short-circuited on itself.</summary>
    Closed,
}

/// <summary>A winding: coils in series and a resistance.</summary>
public sealed record Winding(string Name, WindingPhase Phase, IReadOnlyList<Coil> Coils, double Resistance_ohm = 0)
{
    /// <summary>Constant part of the linkage, as direct current leaves it; only without resistance, where it could not stay.</summary>
    public double LinkageOffset_Wb { get; init; }
}

/// <summary>A nonlinear magnetic circuit with its windings and supply.</summary>
public sealed record MagneticCircuit(Supply Supply, IReadOnlyList<CircuitBranch> Branches, IReadOnlyList<Winding> Windings);
