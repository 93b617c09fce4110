using CoreDesign.Estimating.Steels;
using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Losses;

namespace CoreDesign.Estimating.Tests.Steels;

/// <summary>A ring of each grade, without joints, must give the guaranteed figures back through the time-domain solver.</summary>
public class UniformCoreTests
{
    private const double Area_m2 = 0.01;
    private const double Length_m = 1;
    private const double Turns = 10;

    public static TheoryData<string> Grades() => [.. SteelLibrary.All.Select(g => g.Name)];

    [Theory]
    [MemberData(nameof(Grades))]
    public void Ring_gives_every_loss_anchor_back(string name)
    {
        Assert.True(SteelLibrary.TryFind(name, out var grade));
        Assert.NotEmpty(grade.LossAnchors);
        foreach (var anchor in grade.LossAnchors)
        {
            var sheet = SheetLawCalibration.Fit(grade.ToSteelData(), anchor.Frequency_Hz);
            var s = Solve(sheet, anchor.B_T, anchor.Frequency_Hz);
            var perKilogram = s.CoreLoss_W / (Area_m2 * Length_m * sheet.Data.Density_kg_m3);
            TestContext.Current.TestOutputHelper?.WriteLine($"{name} {anchor.B_T} T {anchor.Frequency_Hz} Hz: {perKilogram:F4} for {anchor.Loss_W_per_kg.Value}, hysteresis {sheet.HysteresisShare:P0} classical {sheet.ClassicalShare:P0}, balance {(s.TerminalPower_W / s.CoreLoss_W) - 1:E1}");
            Assert.Equal(anchor.Loss_W_per_kg.Value, perKilogram, 0.001 * anchor.Loss_W_per_kg.Value);
            Assert.Equal(s.CoreLoss_W, s.TerminalPower_W, 0.001 * s.CoreLoss_W);
        }
    }

    [Theory]
    [MemberData(nameof(Grades))]
    public void Ring_loop_tips_lie_on_the_peak_curve(string name)
    {
        Assert.True(SteelLibrary.TryFind(name, out var grade));
        var sheet = SheetLawCalibration.Fit(grade.ToSteelData(), 50);
        foreach (var b in new[] { 0.5, 1.0, 1.5, 1.7, 1.8 })
        {
            var s = Solve(sheet, b, 50);
            var n = Array.IndexOf(s.Flux_Wb[0], s.Flux_Wb[0].Max());
            var h = (2 * s.Mmf_A[0][n] / Length_m) - sheet.Law.RateField(s.FluxRate_Wb_per_s[0][n] / Area_m2, out _);
            Assert.Equal(SheetLawCalibration.PeakCurve(sheet.Data).Value(b), h, 0.005 * h);
        }
    }

    private static CircuitSolution Solve(CalibratedSheet sheet, double b, double f)
    {
        var voltage = Math.Sqrt(2) * Math.PI * f * Turns * Area_m2 * b;
        return CircuitSolver.Solve(new MagneticCircuit(
            new Supply(SupplyConnection.Single, voltage, f),
            [
                new CircuitBranch { Name = "half", From = "p", To = "q", Area_m2 = Area_m2, Length_m = Length_m / 2, Steel = sheet.Law },
                new CircuitBranch { Name = "other", From = "q", To = "p", Area_m2 = Area_m2, Length_m = Length_m / 2, Steel = sheet.Law },
            ],
            [new Winding("W", WindingPhase.Single, [new Coil("half", Turns)])]));
    }
}
