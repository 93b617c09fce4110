using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Steels;
using CoreDesign.Magnetics.Circuits;
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
    public required Supply Supply { get; init; }
    public required double Turns { get; init; }
    public required double Resistance_ohm { get; init; }
    public required double RatedPower_VA { get; init; }
    public required double HighestVoltage_percent { get; init; }
    public required BuildingFactorValue BuildingFactor { get; init; }
    public required double Temperature_C { get; init; }

    public int Phases => Supply.Connection == SupplyConnection.Single ? 1 : 3;

    public double RatedCurrent_A => RatedPower_VA / ((Phases == 3 ? Math.Sqrt(3) : 1) * Supply.Voltage_V);
}
