using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Geometry;

namespace CoreDesign.Estimating.Estimate;

/// <summary>Connections by their names in the contract.</summary>
internal static class Connections
{
    public static SupplyConnection? Parse(string? name) => name switch
    {
        "single" => SupplyConnection.Single,
        "YN" => SupplyConnection.StarWithNeutral,
        "Y" => SupplyConnection.StarIsolated,
        "D" => SupplyConnection.Delta,
        _ => null,
    };

    public static string NameOf(SupplyConnection connection) => connection switch
    {
        SupplyConnection.Single => "single",
        SupplyConnection.StarWithNeutral => "YN",
        SupplyConnection.StarIsolated => "Y",
        _ => "D",
    };

    /// <summary>Line voltage over the voltage across the winding.</summary>
    public static double LineOverPhase(SupplyConnection connection) =>
        connection is SupplyConnection.StarWithNeutral or SupplyConnection.StarIsolated ? Math.Sqrt(3) : 1;

    /// <summary>Line current over rated power and line voltage.</summary>
    public static double CurrentPerVoltAmpere(SupplyConnection connection) => connection == SupplyConnection.Single ? 1 : 1 / Math.Sqrt(3);
}
