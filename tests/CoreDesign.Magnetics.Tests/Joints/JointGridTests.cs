using System.Globalization;
using CoreDesign.Magnetics.Joints;
using CoreDesign.Tests.Shared;

namespace CoreDesign.Magnetics.Tests.Joints;

/// <summary>
/// The whole grid of joints against an independent lattice (see the CSV's head): 2 to 8 positions, gaps of 0.1 to 3 mm, both cuts, 1.0 to 1.9 T, within
/// 5 %; drops below 2 A within 0.1 A. Makes the handbook's table.
/// </summary>
public sealed class JointGridTests(ITestOutputHelper output)
{
    private const double Allowed = 0.05;
    private const double AllowedBelow2A_A = 0.1;

    // A third of the anisotropy constant: the lower bound that domains at 90° are given in the handbook.
    private const double SoftRotation_J_per_m3 = 12e3;
    private static readonly IReadOnlyList<(JointCases.Row Row, double Mmf_A)> All = [.. JointCases.SolveAll("joint_mmf_grid.csv")];

    [Fact]
    public void Grid_is_whole()
    {
        int[] positions = [2, 3, 4, 5, 6, 7, 8];
        double[] gaps = [0.1, 0.25, 0.5, 1, 2, 3], levels = [1.0, 1.2, 1.3, 1.4, 1.5, 1.6, 1.65, 1.7, 1.75, 1.8, 1.85, 1.9];
        var wanted = from mitred in (bool[])[false, true] from m in positions from g in gaps from b in levels select (mitred, m, g, b);
        Assert.Equal(wanted.Order(), All.Select(x => (x.Row.Mitred, x.Row.Spec.Positions, Math.Round(x.Row.Spec.Gap_m * 1e3, 3), x.Row.FluxDensity_T)).Order());
    }

    [Fact]
    public void Every_drop_of_the_grid_agrees_with_the_independent_lattice()
    {
        var worst = All.Where(x => x.Row.Mmf_A >= 2).MaxBy(x => Math.Abs(Deviation(x)));
        output.WriteLine($"worst of {All.Count}: {worst.Row}: {worst.Mmf_A:g4} A for {worst.Row.Mmf_A:g4} A, {Deviation(worst):p1}; mean {All.Average(Deviation):p1}");
        var misses = All.Where(x => Math.Abs(x.Mmf_A - x.Row.Mmf_A) > (x.Row.Mmf_A < 2 ? AllowedBelow2A_A : Allowed * x.Row.Mmf_A));
        Assert.Empty(misses.Select(x => string.Create(CultureInfo.InvariantCulture, $"{x.Row}: {x.Mmf_A:g4} A, lattice {x.Row.Mmf_A:g4} A, {Deviation(x):p1}")));
    }

    [Fact]
    public void Handbook_shows_both_lattices_side_by_side()
    {
        string[] head = ["Cut", "M", "Gap mm", "1.5 T", "1.7 T", "1.9 T", "Soft, 1.7 T", "Worst"];
        var rows = new List<string[]> { head };
        foreach (var joint in All.GroupBy(x => (x.Row.Mitred, x.Row.Spec)).Where(g => Shown(g.Key.Mitred, g.Key.Spec)))
        {
            (JointCases.Row Row, double Mmf_A) At(double b) => joint.Single(x => x.Row.FluxDensity_T == b);
            var soft = new JointCurve(JointSolver.SolveCut(joint.Key.Spec, JointCases.SteelOf(0.27e-3, SoftRotation_J_per_m3), joint.Key.Mitred, new JointGrid())).Mmf_A(1.7);
            var worst = joint.Where(x => x.Row.Mmf_A >= 2).Select(Deviation).MaxBy(Math.Abs);
            rows.Add(
            [
                joint.Key.Mitred ? "45°" : "90°",
                joint.Key.Spec.Positions.ToString(CultureInfo.InvariantCulture),
                (joint.Key.Spec.Gap_m * 1e3).ToString("0.##", CultureInfo.InvariantCulture),
                .. new[] { 1.5, 1.7, 1.9 }.Select(b => $"{HandbookTable.Figure(At(b).Mmf_A)} ({HandbookTable.Figure(At(b).Row.Mmf_A)})"),
                joint.Key.Mitred ? HandbookTable.Figure(soft) : "as ours",
                HandbookTable.Percent(worst),
            ]);
        }

        HandbookTable.Hold("04-joints.md", "Held against another lattice", rows);
    }

    private static bool Shown(bool mitred, JointSpec spec) =>
        spec.Positions is 2 or 3 or 5 or 8 && Math.Round(spec.Gap_m * 1e3, 2) is 0.1 or 0.5 or 3 && (mitred || spec.Positions is 2 or 5);

    private static double Deviation((JointCases.Row Row, double Mmf_A) x) => (x.Mmf_A / x.Row.Mmf_A) - 1;
}
