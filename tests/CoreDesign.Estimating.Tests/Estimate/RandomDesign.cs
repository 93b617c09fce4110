using System.Globalization;
using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Estimate;
using CoreDesign.Estimating.Steels;

namespace CoreDesign.Estimating.Tests.Estimate;

/// <summary>
/// A design of one form and connection, everything else drawn from one seed within bounds that a works could build. COREDESIGN_SEED in the environment
/// draws others; a design that the checks refuse (a book of sheets that does not fit, say) is drawn again.
/// </summary>
internal sealed class RandomDesign
{
    private const string SeedVariable = "COREDESIGN_SEED";
    private const int UsualSeed = 20261201;
    private const int Redraws = 30;
    private static readonly string[] Grades = ["M105-30P", "M130-27S", "M85-23P (domain refined)", "M-4", "M165-35S", "M103-27P"];
    private static readonly string[] Joints = ["stepLap", "mitredOverlap", "buttLap"];
    private readonly Random _random;

    private RandomDesign(int seed) => _random = new Random(seed);

    private static int FirstSeed { get; } =
        int.TryParse(Environment.GetEnvironmentVariable(SeedVariable), NumberStyles.None, CultureInfo.InvariantCulture, out var given) ? given : UsualSeed;

    /// <summary>Designs with the words that lead back to them.</summary>
    public static IEnumerable<(DesignInput Design, string Where)> Draw(string form, string connection, int units, int count)
    {
        for (var i = 0; i < count; i++)
        {
            var seed = FirstSeed + i;
            var drawing = new RandomDesign(seed);
            var design = drawing.Of(form, connection, units);
            for (var n = 0; n < Redraws && EstimateDesign.Run(design, SteelLibrary.Catalog).Errors.Count > 0; n++)
            {
                design = drawing.Of(form, connection, units);
            }

            yield return (design, $"{form} {connection} x{units}, {SeedVariable}={seed}: {DesignJson.Write(design)}");
        }
    }

    private DesignInput Of(string form, string connection, int units)
    {
        var returns = form is "fiveLimb" or "singlePhaseThreeLimb" or "singlePhaseFourLimb";
        var diameter = Within(150, 900);
        double b = Within(1.2, 1.75), frequency = _random.Next(2) == 0 ? 50 : 60;
        var joint = Joints[_random.Next(Joints.Length)];
        var turns = _random.Next(10, 300);
        var threePhase = units == 3 || form is "threeLimb" or "fiveLimb";

        // Volts per turn of about 0.45·sqrt(kVA), common practice: only to give the zero-sequence path and the resistance a sensible size.
        var perTurn = Math.Sqrt(2) * Math.PI * frequency * b * 0.85 * Math.PI / 4 * diameter * diameter * 1e-6;
        var power = Math.Pow(perTurn / 0.45, 2);
        var ohms = perTurn * turns * perTurn * turns / (1000 * power);
        return Designs.WithFluxDensity(
            new DesignInput
            {
                Order = new() { RatedPower_kVA = power, Frequency_Hz = frequency, HighestVoltage_percent = Within(100, 112) },
                ExcitedWinding = new() { Connection = connection, LineVoltage_V = 400, Turns = turns, Resistance_ohm = _random.Next(3) == 0 ? ohms * Within(0.002, 0.01) : 0 },
                Tertiary = threePhase && _random.Next(4) == 0 ? new() { Turns = turns * Within(0.2, 1) } : null,
                Steel = new() { Grade = Grades[_random.Next(Grades.Length)] },
                Core = new()
                {
                    Form = form,
                    Units = units == 1 ? null : units,
                    Limb = new() { Diameter_mm = diameter, Steps = _random.Next(1, 13) },
                    Yoke = new() { AreaFactor = form == "fiveLimb" ? Within(0.52, 0.7) : returns ? Within(0.5, 0.62) : Within(0.95, 1.3) },
                    ReturnLimb = returns ? new() { AreaFactor = Within(0.45, 0.6) } : null,
                    ReturnWindowWidth_mm = form is "fiveLimb" or "singlePhaseFourLimb" ? diameter * Within(0.2, 0.6) : null,
                    WindowHeight_mm = diameter * Within(1.2, 3.5),
                    WindowWidth_mm = diameter * Within(0.5, 1.4),
                    StackingFactor = Within(0.94, 0.975),
                },
                Joint = new() { Type = joint, Positions = joint == "stepLap" ? _random.Next(3, 7) : 2, Gap_mm = Within(0.1, 1), Overlap_mm = joint == "stepLap" ? Within(2, 4) : Within(5, 12) },
            },
            b);
    }

    private double Within(double low, double high) => low + ((high - low) * _random.NextDouble());
}
