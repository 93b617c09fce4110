using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Geometry;
using CoreDesign.Magnetics.Materials;

namespace CoreDesign.Magnetics.Cores;

/// <summary>Branches of one part. Nodes are named after where they lie: limbATop, turnATop beyond the joint, hubATop in a T zone, yokeALeftTop where a yoke ends.</summary>
internal static class CoreBranches
{
    public static IEnumerable<CircuitBranch> Of(CoreGeometry geometry, CorePart part, SheetLaw steel)
    {
        CircuitBranch Branch(string name, string from, string to, double area, double volume) => new()
        {
            Name = name,
            From = from,
            To = to,
            Area_m2 = area,
            Length_m = volume / area,
            Steel = steel,
        };

        var side = part.Name.EndsWith("Top", StringComparison.Ordinal) ? "Top" : "Bottom";
        switch (part.Kind)
        {
            case CorePartKind.Limb:
                var limb = part.Name["limb".Length..];
                yield return Branch(part.Name, $"limb{limb}Bottom", $"limb{limb}Top", part.NetArea_m2, part.Volume_m3);
                break;
            case CorePartKind.Yoke:
                var span = part.Name["yoke".Length..^side.Length];
                yield return Branch(part.Name, $"yoke{span[0]}Right{side}", $"yoke{span[1]}Left{side}", part.NetArea_m2, part.Volume_m3);
                break;
            case CorePartKind.Corner:
                var corner = part.Name["corner".Length..^side.Length];
                var yoke = corner == geometry.Limbs[0].Letter ? $"yoke{corner}Right{side}" : $"yoke{corner}Left{side}";
                yield return Branch(part.Name, $"turn{corner}{side}", yoke, part.NetArea_m2, part.Volume_m3);
                break;
            default:
                var tee = part.Name["tZone".Length..^side.Length];
                var inner = tee.Length > 0 ? tee : geometry.Limbs[1].Letter;
                var limbArea = geometry.Limbs.First(l => l.Letter == inner).NetArea_m2;
                var third = part.Volume_m3 / 3;
                yield return Branch(part.Name + "Limb", $"turn{inner}{side}", $"hub{inner}{side}", limbArea, third);
                yield return Branch(part.Name + "Left", $"hub{inner}{side}", $"yoke{inner}Left{side}", geometry.NetYokeArea_m2, third);
                yield return Branch(part.Name + "Right", $"hub{inner}{side}", $"yoke{inner}Right{side}", geometry.NetYokeArea_m2, third);
                break;
        }
    }

    public static CircuitBranch Joint(CoreLimb limb, string side, JointBranch joint) => new()
    {
        Name = $"joint{limb.Letter}{side}",
        From = side == "Top" ? $"limb{limb.Letter}Top" : $"turn{limb.Letter}Bottom",
        To = side == "Top" ? $"turn{limb.Letter}Top" : $"limb{limb.Letter}Bottom",
        Area_m2 = limb.NetArea_m2,
        Mmf = joint.Mmf,
        Reluctance_A_per_Wb = joint.EffectiveGap_m / (MagneticConstants.Mu0_H_per_m * limb.NetArea_m2),
    };
}
