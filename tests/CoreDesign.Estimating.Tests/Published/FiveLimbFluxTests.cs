using System.Globalization;
using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Excitation;
using CoreDesign.Magnetics.Materials;
using CoreDesign.Tests.Shared;

namespace CoreDesign.Estimating.Tests.Published;

/// <summary>
/// Yoke fluxes of five-limb cores against another solver: one unknown flux per instant, found by a root search; sinusoidal limb flux, steel without loss,
/// no joints, limb 2.0 m, main yoke span 1.6 m, outer path 3.6 m. Source of the expected figures: the project's physics notes, derived there, not measured.
/// </summary>
public class FiveLimbFluxTests
{
    private static readonly double[] FluxDensity = [0.5, 1.0, 1.3, 1.5, 1.6, 1.7, 1.8, 1.85, 1.9, 1.95, 2.0];
    private static readonly double[] Field = [8, 14, 20, 30, 42, 75, 190, 400, 900, 2300, 6000];

    // Limb flux density, main and outer area over the limb's; outer: peak T, fundamental over the limb flux, third harmonic %; main: the same.
    private static readonly (double B, double Main, double Outer, double[] Theirs)[] Cases =
    [
        (1.50, .50, .50, [1.37, .51, 15, 1.64, .61, 12]),
        (1.60, .55, .45, [1.50, .47, 16, 1.68, .63, 12]),
        (1.70, .50, .50, [1.65, .55, 19, 1.75, .59, 17]),
        (1.70, .55, .45, [1.64, .49, 18, 1.75, .62, 14]),
        (1.70, .58, .50, [1.47, .49, 15, 1.67, .63, 12]),
        (1.70, .58, .58, [1.32, .51, 14, 1.62, .62, 11]),
        (1.75, .58, .50, [1.54, .49, 17, 1.70, .62, 13]),
        (1.75, .58, .58, [1.39, .52, 15, 1.64, .61, 13]),
    ];

    [Fact]
    public void Yoke_fluxes_agree_with_the_other_solver()
    {
        foreach (var (b, main, outer, theirs) in Cases)
        {
            var ours = Solve(b, main, outer);
            double[] allowed = [0.015, 0.007, 1, 0.015, 0.007, 1];
            for (var i = 0; i < theirs.Length; i++)
            {
                Assert.True(Math.Abs(ours[i] - theirs[i]) <= allowed[i], $"{b} T, {main}/{outer}, figure {i}: {ours[i]} for {theirs[i]}");
            }
        }
    }

    [Fact]
    public void Handbook_table_of_five_limb_fluxes_is_what_the_solver_gives() => HandbookTable.Hold("12-published.md", "Five-limb cores", [
        ["Limb", "Main / outer area", "Outer: peak T", "fundamental", "third", "Main: peak T", "fundamental", "third"],
        .. Cases.Select(c =>
        {
            var ours = Solve(c.B, c.Main, c.Outer);
            string Pair(int i, string format) => $"{ours[i].ToString(format, CultureInfo.InvariantCulture)} ({c.Theirs[i].ToString(format, CultureInfo.InvariantCulture)})";
            return (string[])
            [
                string.Create(CultureInfo.InvariantCulture, $"{c.B:0.00} T"), string.Create(CultureInfo.InvariantCulture, $"{c.Main:0.00} / {c.Outer:0.00}"),
                Pair(0, "0.00"), Pair(1, "0.00"), Pair(2, "0") + " %", Pair(3, "0.00"), Pair(4, "0.00"), Pair(5, "0") + " %",
            ];
        }),
    ]);

    private static double[] Solve(double b, double main, double outer)
    {
        const double area = 0.3, turns = 50;
        var steel = SheetLaw.Lossless(new MonotoneCurve(FluxDensity, Field, 1 / (4e-7 * Math.PI)));
        CircuitBranch Iron(string name, string from, string to, double share, double length) => new() { Name = name, From = from, To = to, Area_m2 = share * area, Length_m = length, Steel = steel };
        List<CircuitBranch> branches = [Iron("outer0", "t0", "b0", outer, 3.6), Iron("outer2", "t2", "b2", outer, 3.6)];
        for (var i = 0; i < 3; i++)
        {
            branches.Add(Iron($"limb{i}", $"b{i}", $"t{i}", 1, 2.0));
        }

        for (var i = 0; i < 2; i++)
        {
            branches.Add(Iron($"top{i}", $"t{i}", $"t{i + 1}", main, 1.6));
            branches.Add(Iron($"bottom{i}", $"b{i + 1}", $"b{i}", main, 1.6));
        }

        var s = CircuitSolver.Solve(
            new MagneticCircuit(
                new Supply(SupplyConnection.StarWithNeutral, Math.Sqrt(3) * Math.Sqrt(2) * Math.PI * 50 * turns * area * b, 50),
                branches,
                [.. Enumerable.Range(0, 3).Select(i => new Winding("ABC"[i].ToString(), WindingPhase.A + i, [new Coil($"limb{i}", turns)]))]),
            new SolverOptions(720));
        return [.. Figures("outer0"), .. Figures("top0")];

        double[] Figures(string name)
        {
            var flux = s.Flux_Wb[branches.FindIndex(x => x.Name == name)];
            var h = Waveform.Harmonics(flux, 3);
            return [Waveform.Peak(flux) / branches.Single(x => x.Name == name).Area_m2, h[0].Amplitude / (b * area), 100 * h[2].Amplitude / h[0].Amplitude];
        }
    }
}
