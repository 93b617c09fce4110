using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Cores;
using CoreDesign.Magnetics.Joints;

namespace CoreDesign.Estimating.Estimate;

/// <summary>A resolved design with its fitted steel and solved joint, ready to be solved at any voltage.</summary>
internal sealed class CoreAtWork
{
    /// <summary>A multiple of 96, so that thirds and halves of a period fall on points.</summary>
    public const int PointsPerPeriod = 288;
    private readonly CoreCircuit _core;
    private readonly PreparedCore _excited;

    /// <exception cref="ArgumentException">Steel curves that no law fits.</exception>
    /// <exception cref="JointSolveException">The joint lattice has no balance.</exception>
    public CoreAtWork(ResolvedDesign design)
    {
        Design = design;
        Sheet = CalibratedSheets.Of(design.Steel, design.Supply.Frequency_Hz, design.Temperature_C);
        if (design.EffectiveGap_m is null)
        {
            Joint = JointTables.Of(design.Joint, Sheet.Joint);
        }

        ZeroSequenceReluctance_A_per_Wb = ZeroSequence(design);
        var core = CoreCircuit.Build(
            design.Geometry,
            Sheet.Sheet.Law,
            new JointBranch(Joint?.Curve?.Drop, design.EffectiveGap_m ?? 0),
            ZeroSequenceReluctance_A_per_Wb);
        _core = design.Units == 3 ? core.AsBank() : core;
        _excited = Prepare(design.Excited);
    }

    public ResolvedDesign Design { get; }

    public SheetAtWork Sheet { get; }

    /// <summary>Null where a works' effective gap replaced the joint model.</summary>
    public SolvedJoint? Joint { get; }

    public double ZeroSequenceReluctance_A_per_Wb { get; }

    /// <summary>Steady state at a voltage in per cent of rated.</summary>
    /// <exception cref="NotConvergedException">No steady state.</exception>
    public CoreSolution SolveAt(double voltage_percent, CancellationToken cancel) => Solve(Design.Excited, voltage_percent, cancel);

    /// <summary>Steady state at another frequency as well; the sheet's law stays that of the rated one, carried by its own eddy and excess terms.</summary>
    /// <exception cref="NotConvergedException">No steady state.</exception>
    public CoreSolution SolveAt(double voltage_percent, double frequency_Hz, CancellationToken cancel) =>
        frequency_Hz == Design.Supply.Frequency_Hz ? SolveAt(voltage_percent, cancel) : Solve(Design.Excited with { Supply = Design.Supply with { Frequency_Hz = frequency_Hz } }, voltage_percent, cancel);

    /// <summary>Steady state with a winding fed, at a voltage in per cent of its own.</summary>
    /// <exception cref="NotConvergedException">No steady state.</exception>
    public CoreSolution Solve(FedWinding winding, double voltage_percent, CancellationToken cancel)
    {
        var core = ReferenceEquals(winding, Design.Excited) ? _excited : Prepare(winding);
        return core.Solve(winding.Supply.Voltage_V * voltage_percent / 100, Design.BuildingFactor.Value, new SolverOptions(PointsPerPeriod), cancel);
    }

    private PreparedCore Prepare(FedWinding winding) =>
        new(_core, new CoreExcitation(winding.Supply, winding.Turns, winding.Resistance_ohm, Design.Tertiary) { WoundLimbs = Design.WoundLimbs });

    /// <summary>The air path that gives the zero-sequence reactance: X0 = w N²/(3 R) of rated impedance.</summary>
    private static double ZeroSequence(ResolvedDesign design)
    {
        var rated = design.Supply.Voltage_V * design.Supply.Voltage_V / design.RatedPower_VA;
        var reactance = design.ZeroSequenceReactance_pu * rated;
        return 2 * Math.PI * design.Supply.Frequency_Hz * design.Turns * design.Turns / (3 * reactance);
    }
}
