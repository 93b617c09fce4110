using CoreDesign.Estimating.Circuits;

namespace CoreDesign.Estimating.Tests.CrossCheck;

/// <summary>
/// A circuit drawn at random within the bounds of real cores. Its steel follows H = a·B + b·Bⁿ (n odd), which the simulator gets as it stands
/// and our solver as a table of it.
/// </summary>
internal sealed record RandomCircuit(CircuitCase Case, double A, double B, int Exponent)
{
    private const int TablePoints = 200;
    private const double TableEnd_T = 2.6;

    /// <param name="form">shell (single phase, two return limbs), threeLimb, fiveLimb.</param>
    /// <param name="connection">As the format has it.</param>
    /// <param name="eddy">With classical eddy currents and excess loss.</param>
    /// <param name="stops">With hysteresis.</param>
    /// <param name="random">Where the numbers come from.</param>
    public static RandomCircuit Draw(string form, string connection, bool eddy, bool stops, Random random)
    {
        double In(double low, double high) => low + ((high - low) * random.NextDouble());
        var exponent = 9 + (2 * random.Next(3));
        double a = In(15, 60), b = In(200, 600) / Math.Pow(1.7, exponent);
        double area = In(0.01, 0.03), frequency = random.Next(2) == 0 ? 50 : 60;
        var turns = random.Next(20, 61);
        double[] flux = [.. Enumerable.Range(1, TablePoints).Select(i => i * TableEnd_T / TablePoints)];
        var steel = new CaseMaterial
        {
            B = flux,
            H = Array.ConvertAll(flux, x => (a * x) + (b * Math.Pow(x, exponent))),
            Sigma = eddy ? 2e6 : null,
            D = eddy ? In(0.23e-3, 0.35e-3) : null,
            KExc = eddy ? In(0.2, 0.6) : null,
            S0 = eddy ? 50 : null,
            Stops = stops ? [new() { R = In(0.05, 0.2), W = In(20, 60) }, new() { R = In(0.4, 0.9), W = In(5, 20) }] : null,
        };
        var branches = form == "shell" ? Shell(area, In) : Limbs(area, form == "fiveLimb", In);
        string[] phases = form == "shell" ? ["S"] : ["A", "B", "C"];
        var acrossLimb_V = Math.Sqrt(2) * Math.PI * frequency * turns * area * In(1.4, 1.8);
        var circuit = new CircuitCase
        {
            Format = "magnet-network-case/1",
            Name = $"{form} {connection}",
            Frequency = frequency,
            Supply = new() { Connection = connection, V = connection is "YN" or "Y" ? Math.Sqrt(3) * acrossLimb_V : acrossLimb_V },
            Materials = new Dictionary<string, CaseMaterial>(StringComparer.Ordinal) { ["steel"] = steel },
            Branches = branches,
            Windings = [.. phases.Select(p => new CaseWinding { Name = p, Phase = p, Coils = [new() { Branch = "limb" + p, Turns = turns }] })],
        };
        return new(circuit, a, b, exponent);
    }

    private static List<CaseBranch> Shell(double area, Func<double, double, double> within) =>
    [
        new() { Name = "limbS", From = "bottom", To = "top", Area = area, Length = within(0.4, 0.8), Material = "steel" },
        .. new[] { "left", "right" }.Select(side => new CaseBranch
        {
            Name = side, From = "top", To = "bottom", Area = area * within(0.5, 0.7), Length = within(1, 2), Material = "steel", Gap = within(1e-5, 1e-4),
        }),
    ];

    private static List<CaseBranch> Limbs(double area, bool returns, Func<double, double, double> within)
    {
        var branches = new List<CaseBranch>();
        for (var i = 0; i < 3; i++)
        {
            branches.Add(new() { Name = "limb" + "ABC"[i], From = $"b{i}", To = $"t{i}", Area = area, Length = within(0.5, 1), Material = "steel", Gap = within(1e-5, 5e-5) });
        }

        for (var i = 0; i < 2; i++)
        {
            branches.Add(new() { Name = $"yokeTop{i}", From = $"t{i}", To = $"t{i + 1}", Area = area * within(0.95, 1.1), Length = within(0.4, 0.8), Material = "steel" });
            branches.Add(new() { Name = $"yokeBottom{i}", From = $"b{i + 1}", To = $"b{i}", Area = area * within(0.95, 1.1), Length = within(0.4, 0.8), Material = "steel" });
        }

        if (returns)
        {
            branches.AddRange(new[] { 0, 2 }.Select(i => new CaseBranch
            {
                Name = $"return{i}",
                From = $"t{i}",
                To = $"b{i}",
                Area = area * within(0.45, 0.6),
                Length = within(1.5, 2.5),
                Material = "steel",
                Gap = within(1e-5, 1e-4),
            }));
        }
        else
        {
            branches.Add(new() { Name = "air", From = "t1", To = "b1", Area = 1, Reluctance = within(2e5, 2e6) });
        }

        return branches;
    }
}
