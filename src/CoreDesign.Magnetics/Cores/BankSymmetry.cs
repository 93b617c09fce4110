using CoreDesign.Magnetics.Circuits;

namespace CoreDesign.Magnetics.Cores;

/// <summary>
/// A bank whose connection leaves its units independent (YN, D) is one unit three times, a third of a period apart: it is solved once and
/// shifted. Exact where the grid has thirds of a period on its points (and twelfths for a delta, whose phases lead the star's by 30°).
/// </summary>
internal static class BankSymmetry
{
    public static bool Holds(CoreCircuit core, CoreExcitation excitation, int points) =>
        core.Units == 3 && excitation.Tertiary is null && points % 12 == 0
        && excitation.Supply.Connection is SupplyConnection.StarWithNeutral or SupplyConnection.Delta;

    /// <summary>What one unit gets: its phase's voltage, as a single phase.</summary>
    public static CoreExcitation OfUnit(CoreExcitation excitation)
    {
        var line = excitation.Supply.Voltage_V;
        var phase = excitation.Supply.Connection == SupplyConnection.Delta ? line : line / Math.Sqrt(3);
        return excitation with { Supply = excitation.Supply with { Connection = SupplyConnection.Single, Voltage_V = phase } };
    }

    /// <summary>The bank's solution from that of one unit.</summary>
    public static CircuitSolution Spread(CoreCircuit bank, CoreExcitation excitation, CircuitSolution unit)
    {
        var n = unit.Points;
        var lead = excitation.Supply.Connection == SupplyConnection.Delta ? n / 12 : 0;
        return ShiftedCopies.Of(new PreparedCircuit(bank.With(excitation)), unit, [lead, lead - (n / 3), lead - (2 * n / 3)]);
    }
}
