using CoreDesign.Magnetics.Circuits;

namespace CoreDesign.Magnetics.Transients;

/// <summary>Voltage that a supply puts across a winding, as peak·sin(wt + angle), and the linkage that goes with it; a star winding's is to the supply's neutral.</summary>
internal static class WindingVoltage
{
    public static double Peak_V(Supply supply, WindingPhase phase) => phase == WindingPhase.Closed
        ? 0
        : supply.Voltage_V * Math.Sqrt(supply.Connection is SupplyConnection.StarWithNeutral or SupplyConnection.StarIsolated ? 2.0 / 3 : 2);

    /// <summary>Lag of a winding's voltage behind that of winding A, or of a single one behind itself.</summary>
    public static double Lag_rad(WindingPhase phase) => phase switch { WindingPhase.B => 2, WindingPhase.C => 4, _ => 0 } * Math.PI / 3;
}
