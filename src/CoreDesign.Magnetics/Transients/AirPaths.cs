using CoreDesign.Magnetics.Circuits;

namespace CoreDesign.Magnetics.Transients;

/// <summary>
/// Adds to each coil the air that counts once the steel is saturated: inside the coil, beside its limb and linked with it; and from one end of the limb round
/// the outside to the other, beside the yokes. Their sizes follow from the winding's air-core inductance, so that with all steel at the slope of vacuum the coil by itself has just that.
/// </summary>
public static class AirPaths
{
    private const string Inside = "airIn ";

    /// <summary>What the saturated steel inside the coils gives a winding by itself; an air-core inductance can't be less.</summary>
    /// <param name="circuit">Whose branches the coils lie on.</param>
    /// <param name="winding">A winding on branches of steel.</param>
    /// <param name="endShare">Of the air-core reluctance, what lies outside the coil; 0 to below 1.</param>
    public static double Least_H(MagneticCircuit circuit, Winding winding, double endShare)
    {
        ArgumentNullException.ThrowIfNull(circuit);
        ArgumentNullException.ThrowIfNull(winding);
        var all = winding.Coils.Sum(c => c.Turns * c.Turns);
        return winding.Coils.Max(c => (1 - endShare) * all * SteelPermeance_H(circuit, c));
    }

    /// <param name="circuit">With windings on branches of steel.</param>
    /// <param name="inductance_H">Air-core inductance of each winding, shared by its coils as the squares of their turns; 0 for a winding that lies as close as can be to one that has air, and links what that links.</param>
    /// <param name="endShare">Of the air-core reluctance, what lies outside the coil; 0 to below 1.</param>
    /// <exception cref="CircuitException">An inductance below what the steel has by itself.</exception>
    public static MagneticCircuit Add(MagneticCircuit circuit, IReadOnlyList<double> inductance_H, double endShare)
    {
        ArgumentNullException.ThrowIfNull(circuit);
        ArgumentNullException.ThrowIfNull(inductance_H);
        ArgumentOutOfRangeException.ThrowIfNotEqual(inductance_H.Count, circuit.Windings.Count);
        ArgumentOutOfRangeException.ThrowIfNegative(endShare);
        ArgumentOutOfRangeException.ThrowIfGreaterThanOrEqual(endShare, 1);
        var branches = circuit.Branches.ToList();
        var windings = new List<Winding>();
        foreach (var (winding, inductance) in circuit.Windings.Zip(inductance_H))
        {
            if (inductance == 0)
            {
                windings.Add(winding);
                continue;
            }

            // Every coil has the same permeance: inductance over the sum of squared turns.
            var permeance = inductance / winding.Coils.Sum(c => c.Turns * c.Turns);
            var coils = winding.Coils.ToList();
            foreach (var coil in winding.Coils)
            {
                var limb = circuit.Branches.First(b => b.Name == coil.Branch);
                var beside = (permeance / (1 - endShare)) - SteelPermeance_H(circuit, coil);
                if (beside < 0)
                {
                    throw new CircuitException($"An air-core inductance of {inductance:G4} H is below the {Least_H(circuit, winding, endShare):G4} H that the saturated steel of winding '{winding.Name}' has by itself.");
                }

                CircuitBranch Air(string name, double reluctance) => new() { Name = name + limb.Name, From = limb.From, To = limb.To, Area_m2 = 1, Reluctance_A_per_Wb = reluctance };
                if (beside > 0)
                {
                    branches.Add(Air(Inside, 1 / beside));
                    coils.Add(coil with { Branch = Inside + limb.Name });
                }

                if (endShare > 0)
                {
                    branches.Add(Air("airRound ", endShare / permeance));
                }
            }

            windings.Add(winding with { Coils = coils });
        }

        var air = branches.Select(b => b.Name).Where(n => n.StartsWith(Inside, StringComparison.Ordinal)).ToHashSet(StringComparer.Ordinal);
        return circuit with
        {
            Branches = branches,
            Windings = [.. windings.Zip(inductance_H, (w, l) => l > 0 ? w : w with { Coils = [.. w.Coils, .. w.Coils.Where(c => air.Contains(Inside + c.Branch)).Select(c => c with { Branch = Inside + c.Branch })] })],
        };
    }

    private static double SteelPermeance_H(MagneticCircuit circuit, Coil coil)
    {
        var limb = circuit.Branches.First(b => b.Name == coil.Branch);
        return MagneticConstants.Mu0_H_per_m * limb.Area_m2 / limb.Length_m;
    }
}
