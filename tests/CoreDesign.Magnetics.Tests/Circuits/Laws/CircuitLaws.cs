using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Excitation;

namespace CoreDesign.Magnetics.Tests.Circuits.Laws;

/// <summary>Forms and connections over which the laws run, and changes of a circuit that must change its answer in a known way.</summary>
internal static class CircuitLaws
{
    public const int Draws = 3;

    /// <summary>Every form with every connection it can have.</summary>
    public static IEnumerable<(Frame Frame, SupplyConnection Connection)> Every() =>
        from frame in Enum.GetValues<Frame>()
        from connection in frame is Frame.TwoLimb or Frame.Shell or Frame.FourLimb
            ? [SupplyConnection.Single]
            : (SupplyConnection[])[SupplyConnection.StarWithNeutral, SupplyConnection.StarIsolated, SupplyConnection.Delta]
        select (frame, connection);

    /// <summary>A closed delta beside a supply that imposes all three fluxes leaves its current open unless something resists.</summary>
    public static bool Possible(SupplyConnection connection, Ingredients with) =>
        !with.HasFlag(Ingredients.ClosedDelta) || connection == SupplyConnection.StarIsolated || (connection != SupplyConnection.Single && with.HasFlag(Ingredients.Resistance));

    public static CircuitSolution Solve(MagneticCircuit circuit, int points = 288) =>
        CircuitSolver.Solve(circuit, new SolverOptions(points), TestContext.Current.CancellationToken);

    /// <summary>All turns times n, volts with them: the same flux, currents by n smaller.</summary>
    public static MagneticCircuit WithTurns(MagneticCircuit c, double n) => c with
    {
        Supply = c.Supply with { Voltage_V = n * c.Supply.Voltage_V },
        Windings = [.. c.Windings.Select(w => w with { Coils = [.. w.Coils.Select(x => x with { Turns = n * x.Turns })], Resistance_ohm = n * n * w.Resistance_ohm })],
    };

    /// <summary>All lengths times k at the same flux density: volts by k², ampere-turns by k, loss by k³. Joints keep their drop, so there may be none.</summary>
    public static MagneticCircuit WithSize(MagneticCircuit c, double k) => c with
    {
        Supply = c.Supply with { Voltage_V = k * k * c.Supply.Voltage_V },
        Branches = [.. c.Branches.Select(b => b with { Area_m2 = k * k * b.Area_m2, Length_m = k * b.Length_m, Reluctance_A_per_Wb = b.Reluctance_A_per_Wb / k })],
        Windings = [.. c.Windings.Select(w => w with { Resistance_ohm = k * w.Resistance_ohm })],
    };

    /// <summary>Each winding of a phase gets the phase that <paramref name="to"/> says; nothing is moved.</summary>
    public static MagneticCircuit WithPhases(MagneticCircuit c, Func<WindingPhase, WindingPhase> to) => c with
    {
        Windings = [.. c.Windings.Select(w => w with { Phase = w.Phase is WindingPhase.A or WindingPhase.B or WindingPhase.C ? to(w.Phase) : w.Phase })],
    };

    /// <summary>The same circuit, written down in another order, with some branches read the other way round.</summary>
    public static MagneticCircuit Shuffled(MagneticCircuit c, int seed)
    {
        var random = new Random(seed);
        var turned = c.Branches.Where(_ => random.Next(2) == 0).Select(b => b.Name).ToHashSet(StringComparer.Ordinal);
        var branches = c.Branches.Select(b => turned.Contains(b.Name) ? b with { From = b.To, To = b.From } : b).ToArray();
        var windings = c.Windings.Select(w => w with { Coils = [.. w.Coils.Select(x => turned.Contains(x.Branch) ? x with { Turns = -x.Turns } : x)] }).ToArray();
        random.Shuffle(branches);
        random.Shuffle(windings);
        return c with { Branches = branches, Windings = windings };
    }

    public static double[] Current(CircuitSolution s, string winding) => s.WindingCurrent_A[IndexOf(s.Circuit.Windings.Select(w => w.Name), winding)];

    public static double[] Flux(CircuitSolution s, string branch) => s.Flux_Wb[IndexOf(s.Circuit.Branches.Select(b => b.Name), branch)];

    public static double Loss(CircuitSolution s, string branch) => s.BranchLoss_W(IndexOf(s.Circuit.Branches.Select(b => b.Name), branch));

    /// <summary>Largest difference of two sets of waves, point by point, over the largest value of the first set: a wave that is nothing but rounding beside the others is none.</summary>
    public static double Apart(IReadOnlyList<double[]> before, Func<int, int, double> after) =>
        before.Select((x, i) => Enumerable.Range(0, x.Length).Max(t => Math.Abs(x[t] - after(i, t)))).Max() / before.Max(Waveform.Peak);

    private static int IndexOf(IEnumerable<string> names, string name) => names.ToList().IndexOf(name);
}
