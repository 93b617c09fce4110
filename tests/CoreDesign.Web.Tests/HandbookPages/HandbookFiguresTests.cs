using System.Globalization;
using System.Text.Json;
using System.Text.Json.Nodes;
using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Estimate;
using CoreDesign.Estimating.LimbSizing;
using CoreDesign.Estimating.Steels;
using CoreDesign.Estimating.Steels.Import;
using CoreDesign.Magnetics.Joints;
using CoreDesign.Magnetics.Losses;

namespace CoreDesign.Web.Tests.HandbookPages;

/// <summary>Every default and constant that the handbook names is the one that the program computes with.</summary>
public sealed class HandbookFiguresTests
{
    private static readonly string[] Joints = ["stepLap", "mitredOverlap", "buttLap"];

    [Fact]
    public void Defaults_are_those_of_an_estimate_with_everything_left_open()
    {
        var table = HandbookText.Table("order", "What is taken when a field is left open");
        Assert.NotEmpty(table);
        for (var j = 0; j < Joints.Length; j++)
        {
            var found = Estimate("threeLimb", Joints[j]);
            var used = JsonSerializer.SerializeToNode(found.Inputs, DesignJson.Options)!;
            foreach (var row in table)
            {
                var value = row[1].Split('.').Aggregate((JsonNode?)used, (node, name) => node?[name]);
                Assert.Equal($"{row[1]} {row[2 + j]}", $"{row[1]} {value}");
            }

            // What else was derived is told in words below the table, or follows from another field.
            Assert.Equal(
                ["core.limbPitch_mm", "core.stackingFactor", "margins.inrush.airCoreInductance_mH", "model.buildingFactor", "order.lowestFrequency_Hz", "order.phases"],
                found.Derived.Except(table.Select(r => r[1])).Order(StringComparer.Ordinal));
        }
    }

    [Fact]
    public void Defaults_of_other_core_forms_are_the_programs()
    {
        var table = HandbookText.Table("order", "What other core forms take");
        Assert.Equal(4, table.Count);
        foreach (var row in table)
        {
            var core = Estimate(row[1], "stepLap").Inputs.Core!;
            var window = core.ReturnWindowWidth_mm is null ? "" : core.ReturnWindowWidth_mm == core.WindowWidth_mm / 2 ? "W/2" : "other";
            Assert.Equal(string.Join(" | ", row[2..]), string.Join(" | ", Said($"{core.Yoke!.AreaFactor}"), Said($"{core.ReturnLimb?.AreaFactor}"), window, Said($"{core.WoundLimbs}")));
        }
    }

    [Fact]
    public void Stacking_factor_left_open_is_the_least_of_the_grade() =>
        Assert.Equal(SteelLibrary.Catalog.All.Single(s => s.Name == "M90-23P").MinimumStackingFactor!.Value, Estimate("threeLimb", "stepLap").Inputs.Core!.StackingFactor);

    [Fact]
    public void Default_building_factors_are_the_programs()
    {
        var table = HandbookText.Table("building-factor", "Defaults");
        string[] forms = ["threeLimb", "fiveLimb", "singlePhaseTwoLimb", "singlePhaseThreeLimb"];
        Assert.Equal(forms.Length, table.Count);
        for (var f = 0; f < forms.Length; f++)
        {
            Assert.Equal(table[f][1..], Joints.Select(j => Estimate(forms[f], j).Model.BuildingFactor.ToString("0.00", CultureInfo.InvariantCulture)));
        }
    }

    [Fact]
    public void Constants_of_the_sheet_law_are_the_programs()
    {
        var text = HandbookText.Of("steels");
        var data = SteelLibrary.Catalog.All.Single(s => s.Name == "M90-23P").ToSteelData();
        var sheet = SheetLawCalibration.Fit(data, 50);

        Assert.Contains(Said($"Hysteresis is given {100 * SheetLawCalibration.HysteresisShareAt15T:0} % of the loss at 1.5 T"), text, StringComparison.Ordinal);
        Assert.Contains(Said($"linear for rates below {sheet.Law.ExcessFloor_T_per_s:0} T/s"), text, StringComparison.Ordinal);
        Assert.Contains(Said($"a sine of 1.7 T at 50 Hz reaches {2 * Math.PI * 50 * 1.7:0} T/s"), text, StringComparison.Ordinal);
        Assert.Contains(Said($"at {sheet.Law.Stops.Length + 1} flux densities from {sheet.Law.Stops[0].Threshold_T} to 2.0 T"), text, StringComparison.Ordinal);

        Assert.Contains("Below 0.3 T the spine is straight", text, StringComparison.Ordinal);
        Assert.Equal(2 * sheet.Law.Spine.Value(0.145), sheet.Law.Spine.Value(0.29), 1e-9);
        Assert.NotEqual(2 * sheet.Law.Spine.Value(0.16), sheet.Law.Spine.Value(0.32), 1e-3);
    }

    [Fact]
    public void Split_of_the_loss_is_the_prior_for_a_certificate_with_two_frequencies_too()
    {
        var sheet = SheetLawCalibration.Fit(SteelImport.Read(SteelImport.Template, null).Grade!.ToSteelData(), 50);

        Assert.Equal(SheetLawCalibration.HysteresisShareAt15T, sheet.HysteresisShare, 1e-9);
    }

    [Fact]
    public void Knee_from_memory_is_the_list_that_is_told()
    {
        var told = HandbookText.Of("steels");
        Assert.Contains("(20 A/m at 1.3 T, 30 at 1.5 T, 75 at 1.7 T, 900 at 1.9 T)", told, StringComparison.Ordinal);
        foreach (var (b, h) in new[] { (1.3, 20), (1.5, 30), (1.7, 75), (1.9, 900) })
        {
            Assert.Equal(h, PeakCurveTemplate.Reference.Single(p => p.B_T == b).H_A_per_m);
        }

        Assert.True(PeakCurveTemplate.Reference.Where(p => p.B_T < 0.7).All(p => p.H_A_per_m <= 10));
        Assert.DoesNotContain(PeakCurveTemplate.Reference, p => p.B_T is 1.528 or 1.716);
    }

    [Fact]
    public void Constants_of_joints_solver_and_check_are_the_programs()
    {
        Assert.Contains(Said($"anisotropy constant of {JointSteel.DefaultRotationStiffness_J_per_m3 / 1000:0} kJ/m³"), HandbookText.Of("joints"), StringComparison.Ordinal);
        Assert.Contains(Said($"at {Estimate("threeLimb", "stepLap").Model.PointsPerPeriod} points of the period"), HandbookText.Of("solver"), StringComparison.Ordinal);
        Assert.Contains(Said($"reactance is {DesignDefaults.ZeroSequenceReactance_pu} of rated impedance"), HandbookText.Of("solver"), StringComparison.Ordinal);
        Assert.Contains(Said($"solved from {VoltageSweep.Levels[0]} to {VoltageSweep.Levels[^1]} %"), HandbookText.Of("solver"), StringComparison.Ordinal);
        Assert.Contains(Said($"the same within {100 * Recheck.Tolerance:0.000} %"), HandbookText.Of("sheet"), StringComparison.Ordinal);
        Assert.Contains(Said($"up to the next millimetre"), HandbookText.Of("order"), StringComparison.Ordinal);
        Assert.Equal(1, SizingAid.DiameterIncrement_mm);
        Assert.Equal(13, Estimate("threeLimb", "stepLap").Lines[0].Harmonics.Max(h => h.Order));
    }

    private static string Said(FormattableString text) => text.ToString(CultureInfo.InvariantCulture);

    private static EstimateResult Estimate(string form, string joint) => EstimateDesign.Run(
        new DesignInput
        {
            Order = new OrderInput { RatedPower_kVA = 1000, Frequency_Hz = 50 },
            ExcitedWinding = new ExcitedWindingInput { LineVoltage_V = form == "threeLimb" ? 400 : 230, Turns = 18 },
            Steel = new SteelInput { Grade = "M90-23P" },
            Core = new CoreInput { Form = form, Limb = new LimbInput { Diameter_mm = 220, Steps = 7 }, WindowHeight_mm = 520, WindowWidth_mm = 190 },
            Joint = new JointInput { Type = joint },
        },
        SteelLibrary.Catalog).Value!;
}
