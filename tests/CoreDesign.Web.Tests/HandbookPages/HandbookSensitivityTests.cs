using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Estimate;
using CoreDesign.Estimating.Steels;
using CoreDesign.Magnetics.Joints;

namespace CoreDesign.Web.Tests.HandbookPages;

/// <summary>What the handbook says in round words of the joint model and of the current, held against the kernel at the values it speaks of.</summary>
public sealed class HandbookSensitivityTests
{
    private static readonly JointSpec StepLap = new() { Kind = JointKind.StepLap, Positions = 5, SheetsPerPosition = 1, Gap_m = 0.3e-3, Shift_m = 4e-3, Interface_m = 8e-6 };
    private static readonly JointSpec Single = StepLap with { Kind = JointKind.MitredOverlap, Positions = 2, Shift_m = 10e-3 };

    public static TheoryData<string> Grades => ["M105-30P", "M130-27S"];

    [Theory]
    [MemberData(nameof(Grades))]
    public void Gap_counts_as_told(string grade)
    {
        Says("joints", "trebles for a single overlap, doubles for 3 positions and grows by 50 to 70 % for 5");

        Assert.InRange(Ratio(grade, Single, Single with { Gap_m = 1e-3 }), 2.8, 3.2);
        Assert.InRange(Ratio(grade, StepLap with { Positions = 3 }, StepLap with { Positions = 3, Gap_m = 1e-3 }), 1.9, 2.2);
        Assert.InRange(Ratio(grade, StepLap, StepLap with { Gap_m = 1e-3 }), 1.5, 1.7);
    }

    [Theory]
    [MemberData(nameof(Grades))]
    public void Sheets_interface_and_overlap_count_as_told(string grade)
    {
        Says("joints", "raise the drop of a step-lap joint by a quarter to a half");
        Says("joints", "16 µm instead of 8 µm adds 10 to 20 %");

        Assert.InRange(Ratio(grade, StepLap, StepLap with { SheetsPerPosition = 2 }), 1.25, 1.5);
        Assert.InRange(Ratio(grade, StepLap, StepLap with { Interface_m = 16e-6 }), 1.1, 1.2);
        Assert.InRange(Ratio(grade, StepLap, StepLap with { Shift_m = 6e-3 }), 0.95, 1.05);
    }

    [Theory]
    [MemberData(nameof(Grades))]
    public void Anisotropy_counts_as_told(string grade)
    {
        Says("joints", "at 1.7 T falls by 40 to 55 %, that of a single overlap by less than a tenth");
        const double third = JointSteel.DefaultRotationStiffness_J_per_m3 / 3;

        Assert.All([3, 5, 7], m => Assert.InRange(1 - (Drop(grade, StepLap with { Positions = m }, third) / Drop(grade, StepLap with { Positions = m })), 0.4, 0.55));
        Assert.InRange(1 - (Drop(grade, Single, third) / Drop(grade, Single)), 0, 0.1);
    }

    [Theory]
    [MemberData(nameof(Grades))]
    public void Current_grows_with_the_powers_that_are_told(string grade)
    {
        Says("cautions", "Near 1.55 T the current grows with about the fifth to eighth power of the flux density, near 1.7 T with the eighth to fifteenth");

        foreach (var joint in new[] { "stepLap", "mitredOverlap" })
        {
            Assert.InRange(Power(grade, joint, 20, 19.5), 4.5, 8.5);
            Assert.InRange(Power(grade, joint, 18.5, 18), 7.5, 15.5);
        }
    }

    private static void Says(string chapter, string words) => Assert.Contains(words, HandbookText.Of(chapter), StringComparison.Ordinal);

    private static double Ratio(string grade, JointSpec from, JointSpec to) => Drop(grade, to) / Drop(grade, from);

    private static double Drop(string grade, JointSpec joint, double stiffness = JointSteel.DefaultRotationStiffness_J_per_m3)
    {
        var data = SteelLibrary.Catalog.All.Single(s => s.Name == grade).ToSteelData();
        return new JointCurve(JointSolver.Solve(joint, JointSteel.From(data, stiffness))).Mmf_A(1.7);
    }

    /// <summary>Exponent of the current over the flux density between two numbers of turns of a 1000 kVA core.</summary>
    private static double Power(string grade, string joint, double turns, double fewer)
    {
        var (a, b) = (Estimate(turns), Estimate(fewer));
        return Math.Log(b.NoLoadCurrent_percent / a.NoLoadCurrent_percent) / Math.Log(b.Margin.PeakAtRated_T / a.Margin.PeakAtRated_T);

        EstimateResult Estimate(double n) => EstimateDesign.Run(
            new DesignInput
            {
                Order = new OrderInput { RatedPower_kVA = 1000, Frequency_Hz = 50 },
                ExcitedWinding = new ExcitedWindingInput { LineVoltage_V = 400, Turns = n },
                Steel = new SteelInput { Grade = grade },
                Core = new CoreInput { Form = "threeLimb", Limb = new LimbInput { Diameter_mm = 220, Steps = 7 }, WindowHeight_mm = 520, WindowWidth_mm = 190 },
                Joint = new JointInput { Type = joint },
            },
            SteelLibrary.Catalog).Value!;
    }
}
