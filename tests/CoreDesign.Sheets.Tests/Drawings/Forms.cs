using System.Collections.Concurrent;
using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Estimate;
using CoreDesign.Estimating.Steels;

namespace CoreDesign.Sheets.Tests.Drawings;

/// <summary>A core of every form, with each kind of joint, as the estimator solves it; invented.</summary>
internal static class Forms
{
    private static readonly ConcurrentDictionary<(string, string, int), EstimateResult> Solved = new();

    /// <summary>Form, joint, units. A bank is three of a single-phase form.</summary>
    public static TheoryData<string, string, int> Every()
    {
        var all = new TheoryData<string, string, int>();
        foreach (var joint in new[] { "stepLap", "mitredOverlap", "buttLap" })
        {
            foreach (var form in new[] { "threeLimb", "fiveLimb", "singlePhaseTwoLimb", "singlePhaseThreeLimb", "singlePhaseFourLimb" })
            {
                all.Add(form, joint, 1);
            }

            all.Add("singlePhaseTwoLimb", joint, 3);
            all.Add("singlePhaseThreeLimb", joint, 3);
            all.Add("singlePhaseFourLimb", joint, 3);
        }

        return all;
    }

    public static EstimateResult Of(string form, string joint = "stepLap", int units = 1) => Solved.GetOrAdd((form, joint, units), _ =>
    {
        var outcome = EstimateDesign.Run(Design(form, joint, units), new SteelCatalog([]));
        Assert.True(outcome.Ok, $"{form}, {joint}, {units}: {outcome.Unsolvable?.Reason} {string.Join(' ', outcome.Errors.Select(e => $"{e.Path}: {e.Message}"))}");
        return outcome.Value!;
    });

    public static Study Study(string form, string joint = "stepLap", int units = 1) => StudyFixture.ThreeLimb() with { Estimate = Of(form, joint, units), Levers = [] };

    private static DesignInput Design(string form, string joint, int units)
    {
        var single = form.StartsWith("singlePhase", StringComparison.Ordinal) && units == 1;

        // 18 turns at 231 V, 50 Hz on a circle of 220 mm (some 33 500 mm² net) are 1.72 T: E = sqrt2 pi f N A B.
        return new DesignInput
        {
            Order = new() { Reference = "HR-1080", RatedPower_kVA = 1000, Frequency_Hz = 50, HighestVoltage_percent = 110 },
            ExcitedWinding = new() { Connection = single ? "single" : "YN", LineVoltage_V = single ? 225 : 390, Turns = 18 },
            Steel = new() { Grade = "M105-30P" },
            Core = new() { Form = form, Units = units == 1 ? null : units, Limb = new() { Diameter_mm = 220, Steps = 7 }, WindowHeight_mm = 520, WindowWidth_mm = 190, StackingFactor = 0.965 },
            Joint = new() { Type = joint, Positions = joint == "stepLap" ? 5 : null },
        };
    }
}
