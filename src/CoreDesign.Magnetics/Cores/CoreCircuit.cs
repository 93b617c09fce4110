using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Geometry;
using CoreDesign.Magnetics.Materials;

namespace CoreDesign.Magnetics.Cores;

/// <summary>A joint as the circuit takes it: an MMF curve against limb flux density, or a plain gap across the limb section.</summary>
public readonly record struct JointBranch(MonotoneCurve? Mmf, double EffectiveGap_m);

/// <summary>A winding closed on itself round all three phases: turns and resistance of one phase.</summary>
public sealed record ClosedDelta(double Turns, double Resistance_ohm = 0);

/// <summary>How the core is excited: the supply, turns and resistance of one phase, and an optional closed delta.</summary>
public sealed record CoreExcitation(Supply Supply, double Turns, double Resistance_ohm = 0, ClosedDelta? Tertiary = null)
{
    /// <summary>Limbs of a two-limb core that carry the winding, 1 or 2; other forms have it on every limb that does not return flux.</summary>
    public int WoundLimbs { get; init; } = 1;
}

/// <summary>
/// The magnetic circuit of a stacked core. Each limb is in series with one joint at either end; an outer limb's flux turns through a
/// corner, an inner limb's enters a T zone, which is three branches (to the limb with its area, to either yoke with the yoke's), each a third
/// of the zone's steel, so that the steel is counted once and a core of one area stays uniform. An air branch between the yokes' middles
/// closes zero-sequence flux of three phases on one core.
/// </summary>
public sealed class CoreCircuit
{
    private static readonly string[] UnitLetters = ["A", "B", "C"];
    private readonly CoreCircuit? _unit;

    private CoreCircuit(CoreGeometry geometry, IReadOnlyList<CircuitBranch> branches, IReadOnlyList<(string Part, int[] Branches)> parts, CoreCircuit? unit)
    {
        Geometry = geometry;
        Branches = branches;
        Parts = parts;
        _unit = unit;
    }

    /// <summary>Geometry of the core, of one unit where there are three.</summary>
    public CoreGeometry Geometry { get; }

    public IReadOnlyList<CircuitBranch> Branches { get; }

    /// <summary>Branch indices of every part of the core, joints (jointATop, …) after the steel; a part of a bank has those of all three units, unit A's first.</summary>
    public IReadOnlyList<(string Part, int[] Branches)> Parts { get; }

    /// <summary>Letters of the limbs, from the left.</summary>
    public IReadOnlyList<string> Limbs => [.. Geometry.Limbs.Select(l => l.Letter)];

    /// <summary>1, or 3 for a bank.</summary>
    public int Units => _unit is null ? 1 : UnitLetters.Length;

    /// <summary>One unit of a bank; a single core is its own.</summary>
    public CoreCircuit Unit => _unit ?? this;

    public static CoreCircuit Build(CoreGeometry geometry, SheetLaw steel, JointBranch joint, double zeroSequenceReluctance_A_per_Wb)
    {
        ArgumentNullException.ThrowIfNull(geometry);
        var branches = new List<CircuitBranch>();
        var parts = new List<(string, int[])>();
        foreach (var part in geometry.Parts)
        {
            var first = branches.Count;
            branches.AddRange(CoreBranches.Of(geometry, part, steel));
            parts.Add((part.Name, [.. Enumerable.Range(first, branches.Count - first)]));
        }

        foreach (var limb in geometry.Limbs)
        {
            foreach (var side in new[] { "Top", "Bottom" })
            {
                parts.Add(($"joint{limb.Letter}{side}", [branches.Count]));
                branches.Add(CoreBranches.Joint(limb, side, joint));
            }
        }

        if (geometry.Form is CoreForm.ThreeLimb or CoreForm.FiveLimb)
        {
            var middle = geometry.Limbs[geometry.Limbs.Count / 2].Letter;
            branches.Add(new CircuitBranch
            {
                Name = "zeroSequence",
                From = $"hub{middle}Top",
                To = $"hub{middle}Bottom",
                Area_m2 = 1,
                Reluctance_A_per_Wb = zeroSequenceReluctance_A_per_Wb,
            });
        }

        return new CoreCircuit(geometry, branches, parts, null);
    }

    /// <summary>Three of this single-phase core, one for each phase, in a circuit of their own; names of branches and nodes begin with the unit's letter, as in B.limbA.</summary>
    public CoreCircuit AsBank()
    {
        if (Units != 1 || Geometry.Form is CoreForm.ThreeLimb or CoreForm.FiveLimb)
        {
            throw new InvalidOperationException("Only a single-phase core makes a bank.");
        }

        return new CoreCircuit(
            Geometry,
            [.. UnitLetters.SelectMany(u => Branches.Select(b => b with { Name = $"{u}.{b.Name}", From = $"{u}.{b.From}", To = $"{u}.{b.To}" }))],
            [.. Parts.Select(p => (p.Part, Enumerable.Range(0, UnitLetters.Length).SelectMany(u => p.Branches.Select(b => b + (u * Branches.Count))).ToArray()))],
            this);
    }

    /// <summary>The circuit with its windings: each phase on its limb or unit, or the one winding of a single phase; a closed delta last.</summary>
    public MagneticCircuit With(CoreExcitation excitation)
    {
        ArgumentNullException.ThrowIfNull(excitation);
        var phases = excitation.Supply.Connection == SupplyConnection.Single
            ? [("S", WindingPhase.Single, UnitCoils("", excitation.WoundLimbs))]
            : UnitLetters.Select((u, i) => (u, WindingPhase.A + i, Units == 1 ? [new Coil("limb" + u, 1)] : UnitCoils(u + ".", excitation.WoundLimbs))).ToArray();
        var windings = phases.Select(p => new Winding(p.Item1, p.Item2, Wound(p.Item3, excitation.Turns), excitation.Resistance_ohm)).ToList();
        if (excitation.Tertiary is { } delta)
        {
            windings.Add(new Winding("T", WindingPhase.Closed, Wound([.. phases.SelectMany(p => p.Item3)], delta.Turns), phases.Length * delta.Resistance_ohm));
        }

        return new MagneticCircuit(excitation.Supply, Branches, windings);
    }

    private static Coil[] Wound(Coil[] shares, double turns) => [.. shares.Select(c => c with { Turns = c.Turns * turns })];

    /// <summary>Where the winding of a single-phase core lies, with its share of the turns: on two limbs half each, against each other, so that flux adds round the loop.</summary>
    private Coil[] UnitCoils(string prefix, int woundLimbs)
    {
        var wound = Geometry.Limbs.Where(l => !l.IsReturn).Select(l => $"{prefix}limb{l.Letter}").ToList();
        return wound.Count == 1 || (Geometry.Form == CoreForm.SinglePhaseTwoLimb && woundLimbs == 1)
            ? [new Coil(wound[0], 1)]
            : [new Coil(wound[0], 0.5), new Coil(wound[1], -0.5)];
    }
}
