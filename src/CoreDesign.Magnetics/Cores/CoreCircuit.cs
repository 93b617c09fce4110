using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Geometry;
using CoreDesign.Magnetics.Materials;

namespace CoreDesign.Magnetics.Cores;

/// <summary>A joint as the circuit takes it: an MMF curve against limb flux density, or a plain gap across the limb section.</summary>
public readonly record struct JointBranch(MonotoneCurve? Mmf, double EffectiveGap_m);

/// <summary>How the core is excited: the supply, turns and resistance of one phase.</summary>
public sealed record CoreExcitation(Supply Supply, double Turns, double Resistance_ohm, double ZeroSequenceReluctance_A_per_Wb);

/// <summary>
/// The magnetic circuit of a stacked core. Each limb is in series with one joint at either end; an outer limb's flux turns through a
/// corner, an inner limb's enters a T zone, which is three equal branches (to the limb and to either yoke), so that its steel is counted
/// once and carries each of the three fluxes over a third of its path. An air branch between the yokes' middles closes zero-sequence flux.
/// </summary>
public sealed class CoreCircuit
{
    private CoreCircuit(CoreGeometry geometry, IReadOnlyList<CircuitBranch> branches, IReadOnlyList<(string Part, int[] Branches)> parts, IReadOnlyList<string> limbs)
    {
        Geometry = geometry;
        Branches = branches;
        Parts = parts;
        Limbs = limbs;
    }

    public CoreGeometry Geometry { get; }

    public IReadOnlyList<CircuitBranch> Branches { get; }

    /// <summary>Branch indices of every part of the core, joints (jointATop, …) after the steel.</summary>
    public IReadOnlyList<(string Part, int[] Branches)> Parts { get; }

    /// <summary>Letters of the limbs, from the left.</summary>
    public IReadOnlyList<string> Limbs { get; }

    public static CoreCircuit Build(CoreGeometry geometry, SheetLaw steel, JointBranch joint, double zeroSequenceReluctance_A_per_Wb)
    {
        ArgumentNullException.ThrowIfNull(geometry);
        var letters = geometry.Parts.Where(p => p.Kind == CorePartKind.Limb).Select(p => p.Name["limb".Length..]).ToList();
        var branches = new List<CircuitBranch>();
        var parts = new List<(string, int[])>();
        foreach (var part in geometry.Parts)
        {
            var first = branches.Count;
            branches.AddRange(SteelBranches(part, steel, letters));
            parts.Add((part.Name, [.. Enumerable.Range(first, branches.Count - first)]));
        }

        foreach (var letter in letters)
        {
            var area = geometry.Parts.First(p => p.Name == "limb" + letter).NetArea_m2;
            foreach (var side in new[] { "Top", "Bottom" })
            {
                parts.Add(($"joint{letter}{side}", [branches.Count]));
                branches.Add(new CircuitBranch
                {
                    Name = $"joint{letter}{side}",
                    From = side == "Top" ? $"limb{letter}Top" : $"turn{letter}Bottom",
                    To = side == "Top" ? $"turn{letter}Top" : $"limb{letter}Bottom",
                    Area_m2 = area,
                    Mmf = joint.Mmf,
                    Reluctance_A_per_Wb = joint.EffectiveGap_m / (MagneticConstants.Mu0_H_per_m * area),
                });
            }
        }

        if (letters.Count > 2)
        {
            var middle = letters[letters.Count / 2];
            branches.Add(new CircuitBranch
            {
                Name = "zeroSequence",
                From = $"hub{middle}Top",
                To = $"hub{middle}Bottom",
                Area_m2 = 1,
                Reluctance_A_per_Wb = zeroSequenceReluctance_A_per_Wb,
            });
        }

        return new CoreCircuit(geometry, branches, parts, letters);
    }

    /// <summary>The circuit with its windings: each phase on its limb, or the one winding of a single phase on the first limb.</summary>
    public MagneticCircuit With(CoreExcitation excitation)
    {
        ArgumentNullException.ThrowIfNull(excitation);
        IReadOnlyList<Winding> windings = excitation.Supply.Connection == SupplyConnection.Single
            ? [new Winding("S", WindingPhase.Single, [new Coil("limb" + Limbs[0], excitation.Turns)], excitation.Resistance_ohm)]
            : [.. Limbs.Select((letter, i) => new Winding(letter, WindingPhase.A + i, [new Coil("limb" + letter, excitation.Turns)], excitation.Resistance_ohm))];
        return new MagneticCircuit(excitation.Supply, Branches, windings);
    }

    private static IEnumerable<CircuitBranch> SteelBranches(CorePart part, SheetLaw steel, List<string> letters)
    {
        CircuitBranch Branch(string name, string from, string to, double share = 1) => new()
        {
            Name = name,
            From = from,
            To = to,
            Area_m2 = part.NetArea_m2,
            Length_m = part.Length_m * share,
            Steel = steel,
        };

        var side = part.Name.EndsWith("Top", StringComparison.Ordinal) ? "Top" : "Bottom";
        switch (part.Kind)
        {
            case CorePartKind.Limb:
                var limb = part.Name["limb".Length..];
                yield return Branch(part.Name, $"limb{limb}Bottom", $"limb{limb}Top");
                break;
            case CorePartKind.Yoke:
                var span = part.Name["yoke".Length..^side.Length];
                yield return Branch(part.Name, $"yoke{span[0]}Right{side}", $"yoke{span[1]}Left{side}");
                break;
            case CorePartKind.Corner:
                var corner = part.Name["corner".Length..^side.Length];
                var yoke = corner == letters[0] ? $"yoke{corner}Right{side}" : $"yoke{corner}Left{side}";
                yield return Branch(part.Name, $"turn{corner}{side}", yoke);
                break;
            default:
                var tee = part.Name["tZone".Length..^side.Length];
                var inner = tee.Length > 0 ? tee : letters[1];
                yield return Branch(part.Name + "Limb", $"turn{inner}{side}", $"hub{inner}{side}", 1.0 / 3);
                yield return Branch(part.Name + "Left", $"hub{inner}{side}", $"yoke{inner}Left{side}", 1.0 / 3);
                yield return Branch(part.Name + "Right", $"hub{inner}{side}", $"yoke{inner}Right{side}", 1.0 / 3);
                break;
        }
    }
}
