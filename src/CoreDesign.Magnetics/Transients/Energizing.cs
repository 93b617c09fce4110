using CoreDesign.Magnetics.Circuits;

namespace CoreDesign.Magnetics.Transients;

/// <summary>
/// A circuit put on its supply at t = 0. Voltages e_k = peak·sin(wt + Angle - k·120°): at angle 0 winding A is closed at the zero of its voltage, where
/// the flux swings furthest. Arrays run over the windings in the circuit's order.
/// </summary>
public sealed record Energizing
{
    public required MagneticCircuit Circuit { get; init; }
    public double Angle_rad { get; init; }

    /// <summary>Linkage of each winding when the switch closes.</summary>
    public required IReadOnlyList<double> ResidualLinkage_Wb { get; init; }

    /// <summary>In each line; a delta's windings see it through two lines.</summary>
    public double SourceInductance_H { get; init; }

    /// <summary>In series with each winding, source and winding together; instead of the circuit's own.</summary>
    public required IReadOnlyList<double> Resistance_ohm { get; init; }
    public int StepsPerPeriod { get; init; } = 720;
    public double Periods { get; init; } = 3;
}

/// <summary>What happened; arrays run over the instants, the first is that of closing.</summary>
public sealed record EnergizingSolution
{
    public required double[] Time_s { get; init; }
    public required double[][] WindingCurrent_A { get; init; }

    public required double[][] Linkage_Wb { get; init; }

    /// <summary>Voltage of the supply across each winding; an isolated star's is to the supply's neutral.</summary>
    public required double[][] Voltage_V { get; init; }

    /// <summary>Work done on the branches since closing: stored and turned to heat.</summary>
    public required double[] BranchWork_J { get; init; }
}
