using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Tests.Estimate;

namespace CoreDesign.Estimating.Tests.Published;

/// <summary>Designs that stand in for the published ones; what is not published is assumed, and varied over what is plausible.</summary>
internal static class PublishedDesigns
{
    public static readonly double[] FluxDensities_T = [1.5, 1.6, 1.7];
    public static readonly double[] Gaps_mm = [0.2, 0.3, 0.5];
    public static readonly int[] Positions = [3, 5, 7];
    public static readonly string[] Grades = ["M105-30P", "M130-30S", "M120-27S"];

    /// <summary>The 20 and the 31.5 MVA unit: net limb area about 0.2 and 0.28 m², excited from a low-voltage delta of 10.5 kV.</summary>
    public static DesignInput Power(double mva, JointInput joint, string grade = "M130-30S", double b = 1.6)
    {
        var (diameter, height, width) = mva == 20 ? (545.0, 1350.0, 370.0) : (640.0, 1550.0, 430.0);
        return Designs.WithFluxDensity(
            new DesignInput
            {
                Order = new() { RatedPower_kVA = 1000 * mva, Frequency_Hz = 50 },
                ExcitedWinding = new() { Connection = "D", LineVoltage_V = 10500, Turns = 150 },
                Steel = new() { Grade = grade },
                Core = new() { Form = "threeLimb", Limb = new() { Diameter_mm = diameter, Steps = 12 }, WindowHeight_mm = height, WindowWidth_mm = width, StackingFactor = 0.96 },
                Joint = joint,
            },
            b);
    }

    public static JointInput Overlap(double gap = 0.3) => new() { Type = "mitredOverlap", Gap_mm = gap };

    public static JointInput StepLap(int positions = 5, double gap = 0.3) => new() { Type = "stepLap", Positions = positions, Gap_mm = gap };

    /// <summary>The 100 kVA model core: 15 sheets in one step, 45° joints with 5 mm of overlap. Width and window are assumed; loss per kilogram hardly knows them.</summary>
    public static DesignInput ModelCore(string grade, double thickness_mm)
    {
        const double stacking = 0.95, width = 160, turns = 30;
        var stack = 15 * thickness_mm / stacking;
        var area = width * 1e-3 * stack * 1e-3 * stacking;
        return new DesignInput
        {
            Order = new() { RatedPower_kVA = 100, Frequency_Hz = 50 },
            ExcitedWinding = new() { Connection = "YN", LineVoltage_V = Math.Sqrt(3) * Math.Sqrt(2) * Math.PI * 50 * turns * area * 1.5, Turns = turns },
            Steel = new() { Grade = grade },
            Core = new() { Form = "threeLimb", LimbSteps = [new() { Width_mm = width, Stack_mm = stack }], WindowHeight_mm = 480, WindowWidth_mm = 190, StackingFactor = stacking },
            Joint = new() { Type = "mitredOverlap", Overlap_mm = 5 },
        };
    }

    /// <summary>A three-limb core of 1000 kVA at a flux density, star or delta.</summary>
    public static DesignInput Distribution(string connection, JointInput joint, double b, string grade = "M105-30P") =>
        Designs.WithFluxDensity(
            Designs.ThreeLimb with { ExcitedWinding = Designs.ThreeLimb.ExcitedWinding! with { Connection = connection }, Joint = joint, Steel = new() { Grade = grade } },
            b);

    /// <summary>A single-phase unit, or one of a bank.</summary>
    public static DesignInput SinglePhase(JointInput joint, double b, string grade) =>
        Designs.WithFluxDensity(Designs.TwoLimb with { Joint = joint, Steel = new() { Grade = grade }, Core = Designs.TwoLimb.Core! with { Limb = new() { Diameter_mm = 300, Steps = 9 }, WindowHeight_mm = 900, WindowWidth_mm = 300 } }, b);
}
