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
/// A core with its windings, ready to be solved at any voltage. Solves first with the sheets' own losses, then lays the extra loss (building factor less one, times
/// the sheets' loss) on corners and T zones by their share of the loss there, as a field in phase with dB/dt. The extra loss so draws its active current at the
/// terminals, and the energy balance holds with it. Why the zones: rotation, normal flux and distortion act there; the split is the model's, common practice, no source.
/// </summary>
public sealed class PreparedCore
{
    private const int MostPasses = 8;
    private const double ExtraWithin = 2e-4;
    private readonly CoreCircuit _core;
    private readonly Supply _supply;
    private readonly PreparedCircuit _whole;
    private readonly PreparedCircuit? _unit;
    private readonly int[] _zones;

    /// <exception cref="CircuitException">Currents are not determined.</exception>
    public PreparedCore(CoreCircuit core, CoreExcitation excitation)
        : this(core, excitation, asItStands: false)
    {
    }

    /// <param name="core">The core.</param>
    /// <param name="excitation">Its windings and supply.</param>
    /// <param name="asItStands">Every equation of the circuit, no bank solved by one unit, no closed delta settled by choice.</param>
    internal PreparedCore(CoreCircuit core, CoreExcitation excitation, bool asItStands)
    {
        ArgumentNullException.ThrowIfNull(core);
        ArgumentNullException.ThrowIfNull(excitation);
        var settled = asItStands ? excitation : TertiaryShare.Settled(excitation);
        _core = core;
        _supply = settled.Supply;
        _whole = new PreparedCircuit(core.With(settled));
        _unit = !asItStands && BankSymmetry.Holds(core, settled) ? new PreparedCircuit(core.Unit.With(BankSymmetry.OfUnit(settled))) : null;
        _zones = ZoneBranches(core);
    }

    /// <param name="voltage_V">Line voltage, or that of the one winding.</param>
    /// <param name="buildingFactor">1 or more.</param>
    /// <param name="options">Grid, tolerance, use of symmetry.</param>
    /// <param name="cancel">Stops the solve.</param>
    /// <exception cref="NotConvergedException">No steady state.</exception>
    public CoreSolution Solve(double voltage_V, double buildingFactor, SolverOptions options, CancellationToken cancel = default)
    {
        ArgumentNullException.ThrowIfNull(options);
        ArgumentOutOfRangeException.ThrowIfLessThan(buildingFactor, 1);
        var supply = _supply with { Voltage_V = voltage_V };
        if (_unit is not null && options.UseSymmetry && BankSymmetry.FitsGrid(options.PointsPerPeriod))
        {
            var one = WithExtra(_unit.Solve(BankSymmetry.PhaseVoltage_V(supply), null, options, cancel), buildingFactor, cancel);
            return new CoreSolution(_core, BankSymmetry.Spread(_whole, supply, one));
        }

        return new CoreSolution(_core, WithExtra(_whole.Solve(voltage_V, null, options, cancel), buildingFactor, cancel));
    }

    /// <summary>The solution of a core, or of a bank's first unit, with its extra loss.</summary>
    private CircuitSolution WithExtra(CircuitSolution bare, double buildingFactor, CancellationToken cancel)
    {
        if (buildingFactor == 1)
        {
            return bare;
        }

        // A bank's branches stand unit after unit, so the first unit's zones come first.
        var zoneLoss = 0.0;
        var coefficients = new double[bare.Circuit.Branches.Count];
        foreach (var b in _zones)
        {
            zoneLoss += b < coefficients.Length ? bare.BranchLoss_W(b) : 0;
        }

        var extra = (buildingFactor - 1) * bare.CoreLoss_W;
        foreach (var b in _zones)
        {
            if (b < coefficients.Length)
            {
                coefficients[b] = extra * bare.BranchLoss_W(b) / zoneLoss / bare.MeanSquareRate(b);
            }
        }

        return Fitted(bare, coefficients, buildingFactor, cancel);
    }

    /// <summary>
    /// Where paths are free, the extra field moves flux between them, and with it the loss that the factor is of: its size is set again until the extra is
    /// the factor less one times the sheets' loss as it then is. Imposed fluxes fit at once.
    /// </summary>
    private static CircuitSolution Fitted(CircuitSolution bare, double[] coefficients, double buildingFactor, CancellationToken cancel)
    {
        var laden = bare.WithExtraLoss(coefficients, cancel);
        for (var pass = 0; pass < MostPasses; pass++)
        {
            var found = laden.ExtraLoss_W.Sum();
            var wanted = (buildingFactor - 1) * (laden.CoreLoss_W - found);
            if (Math.Abs(found - wanted) < ExtraWithin * laden.CoreLoss_W)
            {
                break;
            }

            coefficients = Array.ConvertAll(coefficients, c => c * wanted / found);
            laden = bare.WithExtraLoss(coefficients, cancel);
        }

        return laden;
    }

    private static int[] ZoneBranches(CoreCircuit core)
    {
        var kinds = core.Geometry.Parts.ToDictionary(p => p.Name, p => p.Kind, StringComparer.Ordinal);
        return [.. core.Parts
            .Where(p => kinds.TryGetValue(p.Part, out var kind) && kind is CorePartKind.Corner or CorePartKind.TZone)
            .SelectMany(p => p.Branches)];
    }
}

/// <summary>One solve of a core.</summary>
public static class CoreSolver
{
    /// <exception cref="CircuitException">Currents are not determined.</exception>
    /// <exception cref="NotConvergedException">No steady state.</exception>
    public static CoreSolution Solve(CoreCircuit core, CoreExcitation excitation, double buildingFactor, SolverOptions options, CancellationToken cancel = default)
    {
        ArgumentNullException.ThrowIfNull(excitation);
        return new PreparedCore(core, excitation).Solve(excitation.Supply.Voltage_V, buildingFactor, options, cancel);
    }
}
