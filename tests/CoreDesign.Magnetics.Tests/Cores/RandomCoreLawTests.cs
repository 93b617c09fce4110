using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Cores;
using CoreDesign.Magnetics.Excitation;
using CoreDesign.Magnetics.Geometry;

namespace CoreDesign.Magnetics.Tests.Cores;

/// <summary>Laws on random cores of every form and connection, with building factor, closed deltas and winding resistance among them.</summary>
public sealed class RandomCoreLawTests
{
    private const int Draws = 3;
    private const double BuildingFactor = 1.2;

    [Theory]
    [MemberData(nameof(Cores.Every), MemberType = typeof(Cores))]
    public void Energy_and_flux_balance_and_the_extra_loss_is_what_the_factor_says(CoreForm form, SupplyConnection connection, bool bank)
    {
        foreach (var (core, excitation, where) in RandomCores.Draw(form, connection, bank, Draws))
        {
            var solved = Solve(core, excitation, new SolverOptions());
            var s = solved.Solution;
            var heat = s.CoreLoss_W + s.CopperLoss_W;
            Assert.True(Math.Abs(s.TerminalPower_W - heat) < 1e-3 * heat, $"{where}: {s.TerminalPower_W} W in, {heat} W out");
            Assert.True(Math.Abs(((BuildingFactor - 1) * solved.SheetLoss_W) - s.ExtraLoss_W.Sum()) < 3e-4 * s.CoreLoss_W, $"{where}: {s.ExtraLoss_W.Sum()} W extra on {solved.SheetLoss_W} W");

            var branches = s.Circuit.Branches;
            var peak = s.Flux_Wb.Max(Waveform.Peak);
            foreach (var node in branches.SelectMany(b => new[] { b.From, b.To }).Distinct(StringComparer.Ordinal))
            {
                var left = Enumerable.Range(0, s.Points).Max(t => Math.Abs(branches.Select((b, i) => (b.From == node ? -1 : b.To == node ? 1 : 0) * s.Flux_Wb[i][t]).Sum()));
                Assert.True(left < 1e-12 * peak, $"{where}: {left} Wb left over at {node}");
            }
        }
    }

    [Theory]
    [MemberData(nameof(Cores.Every), MemberType = typeof(Cores))]
    public void A_finer_time_grid_moves_no_rms_current_by_a_thousandth(CoreForm form, SupplyConnection connection, bool bank)
    {
        foreach (var (core, excitation, where) in RandomCores.Draw(form, connection, bank, Draws))
        {
            CircuitSolution coarse = Solve(core, excitation, new SolverOptions(256)).Solution, fine = Solve(core, excitation, new SolverOptions(1024)).Solution;
            var largest = fine.WindingCurrent_A.Max(i => Waveform.Rms(i));
            foreach (var (c, f) in coarse.WindingCurrent_A.Zip(fine.WindingCurrent_A).Concat(LineCurrents.Of(coarse).Zip(LineCurrents.Of(fine), (x, y) => (x.Current_A, y.Current_A))))
            {
                // A closed delta that a supply leaves idle carries rounding alone.
                Assert.True(Math.Abs(Waveform.Rms(c) - Waveform.Rms(f)) < 1e-3 * Math.Max(Waveform.Rms(f), 1e-3 * largest), $"{where}: {Waveform.Rms(c)} A for {Waveform.Rms(f)} A");
            }
        }
    }

    private static CoreSolution Solve(CoreCircuit core, CoreExcitation excitation, SolverOptions options) =>
        CoreSolver.Solve(core, excitation, BuildingFactor, options, TestContext.Current.CancellationToken);
}
