using CoreDesign.Estimating.Contracts;
using CoreDesign.Sheets.Drawings;

namespace CoreDesign.Sheets.Tests.Drawings;

/// <summary>Front views of random cores, from sane to absurd proportions, at random picture sizes.</summary>
public class FrontLayoutTests
{
    [Theory]
    [InlineData(1)]
    [InlineData(2)]
    [InlineData(3)]
    [InlineData(4)]
    public void Front_randomCores_keepsTextsApart(int seed)
    {
        var random = new Random(seed);
        for (var n = 0; n < 250; n++)
        {
            var r = Core(random, out var which);
            var o = new DrawingOptions { Width = random.Next(80, 1200), Height = random.Next(80, 900) };
            var reading = (Reading)random.Next(4);
            Layout.HoldsApart(CoreDrawing.Front(r, reading, o), $"seed {seed} case {n}: {which}, {reading}, {o.Width} x {o.Height}");
        }
    }

    internal static EstimateResult Core(Random random, out string which)
    {
        var limbs = random.Next(2, 6);
        double Length(double low, double high) => Math.Round(low * Math.Pow(high / low, random.NextDouble()), random.Next(3));
        double w = Length(10, 1500), yoke = random.Next(3) == 0 ? w : Length(10, 1500), wh = Length(20, 6000), ww = Length(10, 3000);
        var positions = random.Next(1, 9);
        var shift = Length(0.5, 20);
        var type = new[] { "stepLap", "mitredOverlap", "buttLap" }[random.Next(3)];
        var r = (limbs == 2 ? StudyFixture.SinglePhase() : StudyFixture.ThreeLimb()).Estimate;
        var factor = Length(0.01, 1000);
        var (share, beside) = (0.2 + (1.3 * random.NextDouble()), Length(10, 3000));
        var returns = limbs > 2 && random.Next(2) == 0;
        var row = Row(returns, limbs, w, ww, share * w, beside);
        which = $"{limbs} limbs{(returns ? $" of which two return, {share * w} wide beside {beside}" : "")}, limb {w}, yoke {yoke}, window {wh} x {ww}, {type} {positions} x {shift}, figures x {factor}";
        return r with
        {
            Geometry = r.Geometry with
            {
                LimbWidth_mm = w,
                YokeHeight_mm = yoke,
                WindowHeight_mm = wh,
                WindowWidth_mm = ww,
                LimbPitch_mm = w + ww,
                OverallWidth_mm = row[^1].Axis_mm + (row[^1].Width_mm / 2) + (row[0].Width_mm / 2),
                Limbs = returns || random.Next(2) == 0 ? row : [],
                ReturnWindowWidth_mm = returns && limbs > 3 ? beside : null,
                Units = random.Next(3) == 0 ? 3 : 1,
                OverallHeight_mm = wh + (2 * yoke),
            },
            Parts = [.. r.Parts.Select(p => p with { Loss_W = p.Loss_W * factor, ExcitingPower_VA = p.ExcitingPower_VA * factor })],
            Joint = r.Joint with { Type = type, Positions = positions },
            Inputs = r.Inputs with { Joint = r.Inputs.Joint! with { Type = type, Positions = positions, Overlap_mm = shift } },
        };
    }

    /// <summary>Axes from widths and windows, as a works would add them up; beside the one wound limb of three all windows are alike.</summary>
    private static List<CoreLimbResult> Row(bool returns, int limbs, double w, double ww, double returnWidth, double beside)
    {
        var row = new List<CoreLimbResult>();
        for (var i = 0; i < limbs; i++)
        {
            var isReturn = returns && (i == 0 || i == limbs - 1);
            var width = isReturn ? returnWidth : w;
            var window = returns && limbs > 3 && (isReturn || i == 1) ? beside : ww;
            var axis = i == 0 ? 0 : row[^1].Axis_mm + ((row[^1].Width_mm + width) / 2) + window;
            var name = returns ? (i == 0 ? "R" : i == limbs - 1 ? "S" : $"{(char)('A' + i - 1)}") : $"{(char)('A' + i)}";
            row.Add(new CoreLimbResult { Name = "limb" + name, Axis_mm = axis, Width_mm = width, WidthShare = width / w, NetArea_mm2 = 1, Wound = !isReturn, IsReturn = isReturn });
        }

        return row;
    }
}
