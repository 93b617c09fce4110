using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Estimate;
using CoreDesign.Estimating.Steels;
using CsCheck;

namespace CoreDesign.Estimating.Tests.Estimate;

/// <summary>Designs for tests: one of each form, and random ones within bounds that a works could build.</summary>
internal static class Designs
{
    public static DesignInput ThreeLimb { get; } = new()
    {
        Order = new() { RatedPower_kVA = 1000, Frequency_Hz = 50, HighestVoltage_percent = 110 },
        ExcitedWinding = new() { Connection = "YN", LineVoltage_V = 400, Turns = 18 },
        Steel = new() { Grade = "M105-30P" },
        Core = new() { Form = "threeLimb", Limb = new() { Diameter_mm = 220, Steps = 7 }, WindowHeight_mm = 520, WindowWidth_mm = 190, StackingFactor = 0.965 },
        Joint = new() { Type = "stepLap", Positions = 5 },
    };

    public static DesignInput TwoLimb { get; } = new()
    {
        Order = new() { RatedPower_kVA = 25, Frequency_Hz = 50 },
        ExcitedWinding = new() { Connection = "single", LineVoltage_V = 240, Turns = 60 },
        Steel = new() { Grade = "M130-27S" },
        Core = new() { Form = "singlePhaseTwoLimb", Limb = new() { Diameter_mm = 125, Steps = 5 }, WindowHeight_mm = 250, WindowWidth_mm = 90, StackingFactor = 0.95 },
        Joint = new() { Type = "mitredOverlap" },
    };

    /// <summary>A design of every form, at 1.7 T: single-phase ones fed from one winding, three-phase ones with this connection, a bank of each single-phase form last.</summary>
    public static DesignInput Of(string form, string connection = "YN", int units = 1, double b = 1.7)
    {
        var single = form.StartsWith("singlePhase", StringComparison.Ordinal) && units == 1;
        return WithFluxDensity(
            ThreeLimb with
            {
                ExcitedWinding = new() { Connection = single ? "single" : connection, LineVoltage_V = 400, Turns = 18 },
                Core = ThreeLimb.Core! with { Form = form, Units = units == 1 ? null : units },
            },
            b);
    }

    /// <summary>Forms and connections that fit.</summary>
    public static TheoryData<string, string, int> Every()
    {
        var all = new TheoryData<string, string, int>();
        foreach (var form in new[] { "singlePhaseTwoLimb", "singlePhaseThreeLimb", "singlePhaseFourLimb" })
        {
            all.Add(form, "single", 1);
        }

        foreach (var connection in new[] { "YN", "Y", "D" })
        {
            all.Add("threeLimb", connection, 1);
            all.Add("fiveLimb", connection, 1);
            all.Add("singlePhaseTwoLimb", connection, 3);
            all.Add("singlePhaseThreeLimb", connection, 3);
        }

        return all;
    }

    /// <summary>Random designs; flux density 1.3 to 1.75 T by choice of the voltage.</summary>
    public static Gen<DesignInput> Random { get; } =
        from three in Gen.Bool
        from grade in OneOf("M105-30P", "M130-27S", "M85-23P (domain refined)", "M-4", "M165-35S")
        from diameter in Gen.Double[80, 900]
        from steps in Gen.Int[1, 12]
        from height in Gen.Double[1.2, 4]
        from width in Gen.Double[0.5, 1.5]
        from yoke in Gen.Double[0.9, 1.3]
        from joint in OneOf("stepLap", "mitredOverlap", "buttLap")
        from positions in Gen.Int[2, 7]
        from gap in Gen.Double[0.1, 1.5]
        from connection in OneOf("YN", "D")
        from b in Gen.Double[1.3, 1.75]
        from turns in Gen.Int[10, 400]
        from frequency in OneOf(50.0, 60.0)
        select WithFluxDensity(
            new DesignInput
            {
                Order = new() { RatedPower_kVA = 1000, Frequency_Hz = frequency, HighestVoltage_percent = 110 },
                ExcitedWinding = new() { Connection = three ? connection : "single", LineVoltage_V = 1000, Turns = turns },
                Steel = new() { Grade = grade },
                Core = new()
                {
                    Form = three ? "threeLimb" : "singlePhaseTwoLimb",
                    Limb = new() { Diameter_mm = diameter, Steps = steps },
                    Yoke = new() { AreaFactor = yoke },
                    WindowHeight_mm = diameter * height,
                    WindowWidth_mm = diameter * width,
                    StackingFactor = 0.96,
                },
                Joint = new() { Type = joint, Positions = joint == "stepLap" ? positions : 2, Gap_mm = gap },
            },
            b);

    private static Gen<T> OneOf<T>(params T[] values) => Gen.Int[0, values.Length - 1].Select(i => values[i]);

    public static EstimateResult Solve(DesignInput design)
    {
        var outcome = EstimateDesign.Run(design, SteelLibrary.Catalog);
        Assert.True(outcome.Ok, outcome.Unsolvable?.Reason ?? string.Join("; ", outcome.Errors.Select(e => $"{e.Path}: {e.Message}")));
        return outcome.Value!;
    }

    /// <summary>The design at the line voltage that gives this flux density in the limbs: E = sqrt2 pi f N A B.</summary>
    public static DesignInput WithFluxDensity(DesignInput design, double b)
    {
        var area = CoreDesign.Magnetics.Geometry.StepOptimizer.Best(design.Core!.Limb!.Diameter_mm!.Value / 1000, design.Core.Limb.Steps!.Value).GrossArea_m2 * design.Core.StackingFactor!.Value;
        var limb = Math.Sqrt(2) * Math.PI * design.Order!.Frequency_Hz!.Value * design.ExcitedWinding!.Turns!.Value * area * b;
        var line = design.ExcitedWinding.Connection is "YN" or "Y" ? limb * Math.Sqrt(3) : limb;
        return design with { ExcitedWinding = design.ExcitedWinding with { LineVoltage_V = line } };
    }
}
