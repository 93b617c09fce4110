using CoreDesign.Magnetics.Circuits;

namespace CoreDesign.Magnetics.Cores;

/// <summary>
/// A closed delta beside excited windings without resistance. Beside an isolated star the equations are whole: the lines carry what sums to zero, the delta
/// the mean of the phases' ampere-turns. With an earthed neutral or an excited delta the supply already holds the sum of the phase fluxes at zero, which is all that
/// the closed delta asks for: two paths without impedance lie in parallel for the mean, and the equations do not part it. By choice the closed delta then
/// carries it all beside YN (the fluxes are those of the isolated star with it), nothing beside D.
/// </summary>
internal static class TertiaryShare
{
    /// <summary>The excitation whose equations have one answer.</summary>
    public static CoreExcitation Settled(CoreExcitation excitation)
    {
        if (excitation.Tertiary is not { } delta || excitation.Resistance_ohm > 0 || excitation.Supply.Connection == SupplyConnection.StarIsolated)
        {
            return excitation;
        }

        // A closed delta with resistance is driven by no voltage here, since the fluxes sum to zero; it is as good as open.
        return delta.Resistance_ohm > 0 || excitation.Supply.Connection == SupplyConnection.Delta
            ? excitation with { Tertiary = null }
            : excitation with { Supply = excitation.Supply with { Connection = SupplyConnection.StarIsolated } };
    }
}
