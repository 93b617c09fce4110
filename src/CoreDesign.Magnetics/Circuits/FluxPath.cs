using CoreDesign.Magnetics.Materials;

namespace CoreDesign.Magnetics.Circuits;

/// <summary>Steel of one law and section along a path: several branches with one flux density.</summary>
internal sealed class SteelPiece(SheetLaw law, double area_m2)
{
    public SheetLaw Law { get; } = law;

    public double Area_m2 { get; } = area_m2;

    public double Length_m { get; set; }
}

/// <summary>Joints of one curve and section along a path.</summary>
internal sealed class JointPiece(MonotoneCurve curve, double area_m2)
{
    public MonotoneCurve Curve { get; } = curve;

    public double Area_m2 { get; } = area_m2;

    public int Count { get; set; }
}

/// <summary>
/// All branches that carry the same flux, up to its sign, whatever the circuit does: a limb with its corners, joints and yokes. They are one element to the
/// solver; that is exact, and most of its speed.
/// </summary>
internal sealed class FluxPath
{
    private FluxPath(double[] perLinkage, double[] perFree)
    {
        PerLinkage = perLinkage;
        PerFree = perFree;
    }

    /// <summary>Flux per imposed linkage and per free unknown.</summary>
    public double[] PerLinkage { get; }

    public double[] PerFree { get; }

    public SteelPiece[] Steel { get; private set; } = [];

    public JointPiece[] Joints { get; private set; } = [];

    public double Reluctance_A_per_Wb { get; private set; }

    /// <summary>True where a free unknown moves the flux.</summary>
    public bool IsFree => Array.Exists(PerFree, q => q != 0);

    /// <summary>The paths of a circuit, and for each branch its path, its sign along it, and its pieces there.</summary>
    public static (FluxPath[] Paths, PathPlace[] Places) Of(MagneticCircuit circuit, CircuitReduction reduction)
    {
        int b = circuit.Branches.Count, k = reduction.Imposed.Length, f = reduction.FreeCount;
        var paths = new List<FluxPath>();
        var places = new PathPlace[b];
        for (var i = 0; i < b; i++)
        {
            double[] perLinkage = [.. Enumerable.Range(0, k).Select(w => reduction.PerLinkage[i, w])];
            double[] perFree = [.. Enumerable.Range(0, f).Select(j => reduction.PerFree[i, j])];
            var (index, sign) = Find(paths, perLinkage, perFree);
            if (index < 0)
            {
                (index, sign) = (paths.Count, 1);
                paths.Add(new FluxPath(perLinkage, perFree));
            }

            var (steel, joint) = paths[index].Add(circuit.Branches[i]);
            places[i] = new PathPlace(index, sign, Array.IndexOf(paths[index].Steel, steel), Array.IndexOf(paths[index].Joints, joint));
        }

        return ([.. paths], places);
    }

    private static (int Index, int Sign) Find(List<FluxPath> paths, double[] perLinkage, double[] perFree)
    {
        for (var p = 0; p < paths.Count; p++)
        {
            var sign = Sign(paths[p].PerLinkage, perLinkage, 0);
            sign = Sign(paths[p].PerFree, perFree, sign);
            if (sign is 1 or -1)
            {
                return (p, sign);
            }
        }

        return (-1, 0);
    }

    /// <summary>1 or -1 where b is that times a and <paramref name="known"/> does not say otherwise, 0 where both are nothing and the sign stays open, 2 where they differ.</summary>
    private static int Sign(double[] a, double[] b, int known)
    {
        const double equal = 1e-12;
        var sign = known;
        for (var i = 0; i < a.Length && sign != 2; i++)
        {
            var near = equal * Math.Abs(a[i]);
            var here = a[i] == 0 && b[i] == 0 ? 0 : Math.Abs(a[i] - b[i]) <= near ? 1 : Math.Abs(a[i] + b[i]) <= near ? -1 : 2;
            sign = here == 0 ? sign : sign == 0 || sign == here ? here : 2;
        }

        return sign;
    }

    private (SteelPiece? Steel, JointPiece? Joint) Add(CircuitBranch branch)
    {
        Reluctance_A_per_Wb += branch.Reluctance_A_per_Wb;
        SteelPiece? steel = null;
        if (branch.Steel is { } law && branch.Length_m > 0)
        {
            steel = Array.Find(Steel, s => ReferenceEquals(s.Law, law) && Math.Abs(s.Area_m2 - branch.Area_m2) <= 1e-12 * branch.Area_m2);
            if (steel is null)
            {
                steel = new SteelPiece(law, branch.Area_m2);
                Steel = [.. Steel, steel];
            }

            steel.Length_m += branch.Length_m;
        }

        JointPiece? joint = null;
        if (branch.Mmf is { } curve)
        {
            joint = Array.Find(Joints, j => ReferenceEquals(j.Curve, curve) && Math.Abs(j.Area_m2 - branch.Area_m2) <= 1e-12 * branch.Area_m2);
            if (joint is null)
            {
                joint = new JointPiece(curve, branch.Area_m2);
                Joints = [.. Joints, joint];
            }

            joint.Count++;
        }

        return (steel, joint);
    }
}

/// <summary>Where a branch lies: index of its path, sign of its flux along it, and the places of its pieces there (-1 for none).</summary>
internal readonly record struct PathPlace(int Path, int Sign, int Steel, int Joint);
