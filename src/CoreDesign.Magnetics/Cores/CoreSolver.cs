using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Geometry;

namespace CoreDesign.Magnetics.Cores;

/// <summary>A core's steady state with the extra loss of its joint and T zones in it.</summary>
public sealed record CoreSolution(CoreCircuit Core, CircuitSolution Solution)
{
    /// <summary>Sum of the sheets' own losses, without the extra of the zones.</summary>
    public double SheetLoss_W => Solution.CoreLoss_W - Solution.ExtraLoss_W.Sum();
}

/// <summary>
/// Solves a core twice: once with the sheets' own losses, then with the extra loss (building factor less one, times the sheets' loss) laid
/// on corners and T zones by their share of the loss there, as a field in phase with dB/dt. The extra loss so draws its active current at the
/// terminals, and the energy balance holds with it. Why the zones: rotation, normal flux and distortion act there; the split is the model's, common practice, no source.
/// </summary>
public static class CoreSolver
{
    /// <exception cref="CircuitException">Currents are not determined.</exception>
    /// <exception cref="NotConvergedException">No steady state.</exception>
    public static CoreSolution Solve(CoreCircuit core, CoreExcitation excitation, double buildingFactor, SolverOptions options, CancellationToken cancel = default)
    {
        ArgumentNullException.ThrowIfNull(core);
        ArgumentNullException.ThrowIfNull(excitation);
        ArgumentNullException.ThrowIfNull(options);
        ArgumentOutOfRangeException.ThrowIfLessThan(buildingFactor, 1);
        var settled = TertiaryShare.Settled(excitation);
        if (options.UseSymmetry && BankSymmetry.Holds(core, settled, options.PointsPerPeriod))
        {
            var unit = Whole(core.Unit, BankSymmetry.OfUnit(settled), buildingFactor, options, cancel);
            return new CoreSolution(core, BankSymmetry.Spread(core, settled, unit.Solution));
        }

        return Whole(core, settled, buildingFactor, options, cancel);
    }

    /// <summary>Every equation of the circuit as it stands, without the use of symmetry.</summary>
    internal static CoreSolution Whole(CoreCircuit core, CoreExcitation excitation, double buildingFactor, SolverOptions options, CancellationToken cancel)
    {
        var bare = CircuitSolver.Solve(core.With(excitation), options, cancel);
        if (buildingFactor == 1)
        {
            return new CoreSolution(core, bare);
        }

        var zones = ZoneBranches(core);
        var zoneLoss = zones.Sum(bare.BranchLoss_W);
        var extra = (buildingFactor - 1) * bare.CoreLoss_W;
        var coefficients = new double[core.Branches.Count];
        foreach (var b in zones)
        {
            coefficients[b] = extra * bare.BranchLoss_W(b) / zoneLoss / bare.MeanSquareRate(b);
        }

        return new CoreSolution(core, bare.WithExtraLoss(coefficients, cancel));
    }

    private static List<int> ZoneBranches(CoreCircuit core)
    {
        var kinds = core.Geometry.Parts.ToDictionary(p => p.Name, p => p.Kind, StringComparer.Ordinal);
        return [.. core.Parts
            .Where(p => kinds.TryGetValue(p.Part, out var kind) && kind is CorePartKind.Corner or CorePartKind.TZone)
            .SelectMany(p => p.Branches)];
    }
}
