using CoreDesign.Magnetics.Circuits;

namespace CoreDesign.Magnetics.Excitation;

/// <summary>Voltage of an isolated star point against the supply's neutral.</summary>
public static class NeutralVoltage
{
    /// <summary>
    /// A phase voltage is e = u_n + R i + d(linkage)/dt; over the three phases e and i sum to zero, so u_n is the negative mean of the linkages' rates.
    /// </summary>
    public static double[] Of(CircuitSolution solution)
    {
        ArgumentNullException.ThrowIfNull(solution);
        var u = new double[solution.Points];
        var phases = solution.Circuit.Windings.Where(w => w.Phase is WindingPhase.A or WindingPhase.B or WindingPhase.C).ToList();
        var index = solution.Circuit.Branches.Select((b, i) => (b.Name, i)).ToDictionary(b => b.Name, b => b.i, StringComparer.Ordinal);
        foreach (var coil in phases.SelectMany(w => w.Coils))
        {
            var rate = solution.FluxRate_Wb_per_s[index[coil.Branch]];
            for (var t = 0; t < u.Length; t++)
            {
                u[t] -= coil.Turns * rate[t] / phases.Count;
            }
        }

        return u;
    }
}
