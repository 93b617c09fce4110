using CoreDesign.Estimating.Contracts;

namespace CoreDesign.Sheets.Tests;

public class WindingFiguresTests
{
    private static readonly SideResult Excited = new()
    {
        Winding = "excited",
        Connection = "YN",
        LineVoltage_V = 400,
        Turns = 18,
        RatedCurrent_A = 1443,
        NoLoadCurrent_A = 5.2,
        NoLoadCurrent_percent = 0.36,
        Lines = [.. "ABC".Select(p => new SideLineResult { Phase = p.ToString(), Rms_A = 5.2, Peak_A = 9, Harmonics = [] })],
    };

    [Fact]
    public void One_winding_alone_says_nothing_twice() =>
        Assert.Empty(WindingFigures.Of(StudyFixture.ThreeLimb().Estimate with { Sides = [Excited] }));

    [Fact]
    public void Both_sides_delta_star_point_and_capacitance_are_told()
    {
        var figures = WindingFigures.Of(StudyFixture.ThreeLimb().Estimate with
        {
            Sides = [Excited, Excited with { Winding = "other", Connection = "D", LineVoltage_V = 20000, NoLoadCurrent_A = 0.104 }],
            Tertiary = new TertiaryResult { Turns = 18, Rms_A = 2.5, Peak_A = 4, Harmonics = [] },
            Neutral = new NeutralResult { Rms_V = 4, Rms_percent = 1.7, ThirdHarmonic_V = 3.9, ThirdHarmonic_percent = 1.69 },
            Capacitive = new CapacitiveResult { Current_A = 0.2, Power_var = 140 },
        });
        Assert.Equal(["Excited winding", "Other winding, as if fed", "Closed delta", "Isolated star point", "Capacitance"], figures.Select(f => f.Winding));
        Assert.Contains("0.104", figures[1].Current, StringComparison.Ordinal);
        Assert.Contains("0.36", figures[0].Beside, StringComparison.Ordinal);
        Assert.Contains("1.69", figures[3].Beside, StringComparison.Ordinal);
    }
}
