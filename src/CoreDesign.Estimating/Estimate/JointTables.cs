using System.Collections.Concurrent;
using CoreDesign.Magnetics.Joints;

namespace CoreDesign.Estimating.Estimate;

/// <summary>
/// Joint curves, solved once per joint and steel and kept. The number kept is bounded: a works uses a few dozen, a search some hundreds; when full,
/// all are dropped and solved again as needed.
/// </summary>
internal static class JointTables
{
    private const int MostKept = 2000;
    private static readonly ConcurrentDictionary<(JointSpec Spec, string Steel), Lazy<SolvedJoint>> Kept = new();

    /// <exception cref="JointSolveException">The lattice has no balance.</exception>
    public static SolvedJoint Of(JointSpec spec, JointSteel steel)
    {
        if (Kept.Count > MostKept)
        {
            Kept.Clear();
        }

        // A failure is not kept: the next call tries again and reports anew.
        var key = (spec, steel.Fingerprint);
        var lazy = Kept.GetOrAdd(key, _ => new Lazy<SolvedJoint>(() => Solve(spec, steel)));
        try
        {
            return lazy.Value;
        }
        catch
        {
            Kept.TryRemove(key, out _);
            throw;
        }
    }

    private static SolvedJoint Solve(JointSpec spec, JointSteel steel)
    {
        var table = JointSolver.Solve(spec, steel);
        return new SolvedJoint(table, spec.Gap_m > 0 && table.Mmf_A.Count > 1 && table.Mmf_A[^1] > 0 ? new JointCurve(table) : null);
    }
}

/// <summary>A joint's table and curve; no curve where the joint costs nothing (no gap).</summary>
internal sealed record SolvedJoint(JointTable Table, JointCurve? Curve);
