using System.Globalization;
using CoreDesign.Magnetics.Joints;
using CoreDesign.Magnetics.Materials;

namespace CoreDesign.Magnetics.Tests.Joints;

/// <summary>The steel of the reference tables, joints of usual size, and the tables themselves.</summary>
internal static class JointCases
{
    private static readonly double[] FluxDensity = [0.5, 1.0, 1.3, 1.5, 1.6, 1.7, 1.8, 1.85, 1.9, 1.95, 2.0];
    private static readonly double[] Field = [8, 14, 20, 30, 42, 75, 190, 400, 900, 2300, 6000];

    public static JointSteel Steel { get; } = SteelOf(0.27e-3);

    public static MonotoneCurve Curve { get; } = new(FluxDensity, Field, 1 / MagneticConstants.Mu0_H_per_m);

    public static JointSteel SteelOf(double thickness, double stiffness = JointSteel.DefaultRotationStiffness_J_per_m3) =>
        new(new MonotoneCurve(FluxDensity, Field, 1 / MagneticConstants.Mu0_H_per_m), thickness, 2.03, stiffness);

    public static JointSpec Lap(JointKind kind, double gap_mm = 0.5, double shift_mm = 7, int sheets = 1) => new()
    {
        Kind = kind,
        Positions = 2,
        SheetsPerPosition = sheets,
        Gap_m = gap_mm * 1e-3,
        Shift_m = shift_mm * 1e-3,
        Interface_m = 8e-6,
    };

    public static JointSpec StepLap(int positions, double gap_mm = 0.5, double shift_mm = 4, int sheets = 1) =>
        Lap(JointKind.StepLap, gap_mm, shift_mm, sheets) with { Positions = positions };

    /// <summary>Rows of a table, grouped by joint, each solved once.</summary>
    public static IEnumerable<(Row Row, double Mmf_A)> SolveAll(string table)
    {
        foreach (var group in Read(table).GroupBy(r => (r.Mitred, r.Spec, r.Thickness_m)))
        {
            var steel = SteelOf(group.Key.Thickness_m);
            var curve = new JointCurve(JointSolver.SolveCut(group.Key.Spec, steel, group.Key.Mitred, new JointGrid()));
            foreach (var row in group)
            {
                yield return (row, curve.Mmf_A(row.FluxDensity_T));
            }
        }
    }

    public static IReadOnlyList<Row> Read(string table)
    {
        using var stream = typeof(JointCases).Assembly.GetManifestResourceStream(table)!;
        using var reader = new StreamReader(stream);
        var rows = new List<Row>();
        while (reader.ReadLine() is { } line)
        {
            if (line.StartsWith('#') || line.StartsWith("cut,", StringComparison.Ordinal))
            {
                continue;
            }

            var cells = line.Split(',');
            double Number(int k) => double.Parse(cells[k], CultureInfo.InvariantCulture);
            var spec = StepLap((int)Number(1), Number(3), Number(4), (int)Number(2)) with { Interface_m = Number(5) * 1e-6 };
            rows.Add(new Row(cells[0] == "mitre", spec, Number(6) * 1e-3, Number(7), Number(8)));
        }

        return rows;
    }

    internal sealed record Row(bool Mitred, JointSpec Spec, double Thickness_m, double FluxDensity_T, double Mmf_A)
    {
        public override string ToString() => FormattableString.Invariant(
            $"{(Mitred ? "mitre" : "square")} M={Spec.Positions} p={Spec.SheetsPerPosition} g={Spec.Gap_m * 1e3:g3} s={Spec.Shift_m * 1e3:g3} mm ti={Spec.Interface_m * 1e6:g3} um d={Thickness_m * 1e3:g3} mm {FluxDensity_T} T");
    }
}
