using CoreDesign.Magnetics.Circuits;

namespace CoreDesign.Magnetics.Cores;

/// <summary>
/// A bank whose connection leaves its units independent (YN, D) is one unit three times, a third of a period apart: it is solved once and
/// shifted. Exact where the grid has thirds of a period on its points (and twelfths for a delta, whose phases lead the star's by 30°).
/// </summary>
internal static class BankSymmetry
{
    public static bool Holds(CoreCircuit core, CoreExcitation excitation) =>
        core.Units == 3 && excitation.Tertiary is null
        && excitation.Supply.Connection is SupplyConnection.StarWithNeutral or SupplyConnection.Delta;

    public static bool FitsGrid(int points) => points % 12 == 0;

    /// <summary>What one unit gets: its phase's voltage, as a single phase.</summary>
    public static CoreExcitation OfUnit(CoreExcitation excitation) => excitation with
    {
        Supply = excitation.Supply with { Connection = SupplyConnection.Single, Voltage_V = PhaseVoltage_V(excitation.Supply) },
    };

    public static double PhaseVoltage_V(Supply bank) => bank.Connection == SupplyConnection.Delta ? bank.Voltage_V : bank.Voltage_V / Math.Sqrt(3);

    /// <summary>The bank's solution from that of one unit.</summary>
    public static CircuitSolution Spread(PreparedCircuit bank, Supply supply, CircuitSolution unit)
    {
        var n = unit.Points;
        var lead = supply.Connection == SupplyConnection.Delta ? n / 12 : 0;
        return ShiftedCopies.Of(bank, unit, [lead, lead - (n / 3), lead - (2 * n / 3)], supply);
    }
}
