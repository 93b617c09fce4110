using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Steels;
using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Cores;
using CoreDesign.Magnetics.Geometry;
using CoreDesign.Magnetics.Joints;

namespace CoreDesign.Estimating.Estimate;

/// <summary>A design that passed every check, in SI units, with every default taken.</summary>
internal sealed record ResolvedDesign
{
    public required DesignInput Inputs { get; init; }
    public required IReadOnlyList<string> Derived { get; init; }
    public required IReadOnlyList<NoteResult> Warnings { get; init; }
    public required SteelGrade Steel { get; init; }
    public required CoreGeometry Geometry { get; init; }
    public required JointSpec Joint { get; init; }
    public required double? EffectiveGap_m { get; init; }
    public required FedWinding Excited { get; init; }

    /// <summary>The winding that the test could energise instead, at the voltage of the same volts per turn.</summary>
    public required FedWinding? Other { get; init; }
    public required ClosedDelta? Tertiary { get; init; }
    public required WindingCapacitance? Capacitance { get; init; }

    /// <summary>3 for a bank; geometry is of one.</summary>
    public required int Units { get; init; }
    public required int WoundLimbs { get; init; }
    public required double ZeroSequenceReactance_pu { get; init; }
    public required double RatedPower_VA { get; init; }
    public required double HighestVoltage_percent { get; init; }
    public required double LowestFrequency_Hz { get; init; }
    public required BuildingFactorValue BuildingFactor { get; init; }
    public required double Temperature_C { get; init; }

    public Supply Supply => Excited.Supply;

    public double Turns => Excited.Turns;

    /// <summary>What a voltage and frequency demand of the limbs, B = U/(sqrt2 pi f N A), without resistance.</summary>
    public double LimbFluxDensity_T(double voltage_percent, double frequency_Hz) =>
        Excited.PhaseVoltage_V * voltage_percent / 100 / (Math.Sqrt(2) * Math.PI * frequency_Hz * Turns * Geometry.NetLimbArea_m2);

    public int Phases => Supply.Connection == SupplyConnection.Single ? 1 : 3;

    public double RatedCurrent_A => RatedPower_VA * Connections.CurrentPerVoltAmpere(Supply.Connection) / Supply.Voltage_V;
}
