using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Estimate;
using CoreDesign.Estimating.Fields;
using CoreDesign.Estimating.Steels;

namespace CoreDesign.Estimating.Tests.Estimate;

/// <summary>Every refusal names field, value, range and mend; nothing is corrected silently.</summary>
public class RefusalTests
{
    [Fact]
    public void Empty_design_lists_every_missing_field_at_once()
    {
        var errors = Errors(new DesignInput());
        foreach (var path in new[] { "core.form", "order.ratedPower_kVA", "order.frequency_Hz", "excitedWinding.lineVoltage_V", "excitedWinding.turns", "steel.grade", "joint.type", "core.limb", "core.windowHeight_mm", "core.windowWidth_mm" })
        {
            Assert.Contains(path, errors.Keys);
        }
    }

    public static TheoryData<string> NumberPaths() =>
        [.. FieldCatalog.All.Select(f => f.Path).Where(p => !p.Contains("[]", StringComparison.Ordinal) && p is not ("order.phases" or "core.limbPitch_mm"))];

    [Theory]
    [MemberData(nameof(NumberPaths))]
    public void Value_above_its_range_is_refused_by_name_with_value_and_range(string path)
    {
        var field = FieldCatalog.Find(path);
        foreach (var value in new[] { field.Max * 1.5, 1e300 })
        {
            var whole = field.Whole ? Math.Min(value, int.MaxValue) : value;
            var message = Assert.Contains(path, Errors(With(path, whole)));
            Assert.Contains(field.Label, message, StringComparison.Ordinal);
            Assert.Contains(field.Range, message, StringComparison.Ordinal);
        }
    }

    [Theory]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    [InlineData(-1)]
    [InlineData(0)]
    public void Impossible_line_voltage_is_refused(double volts) =>
        Assert.Contains("excitedWinding.lineVoltage_V", Errors(With("excitedWinding.lineVoltage_V", volts)));

    [Fact]
    public void Unknown_grade_names_the_nearest_ones()
    {
        var message = Errors(Designs.ThreeLimb with { Steel = new() { Grade = "M105-30" } })["steel.grade"];
        Assert.Contains("M105-30P", message, StringComparison.Ordinal);
    }

    [Fact]
    public void Steps_out_of_order_are_refused_in_millimetres()
    {
        var core = Designs.ThreeLimb.Core! with { Limb = null, LimbSteps = [new() { Width_mm = 180, Stack_mm = 60 }, new() { Width_mm = 210, Stack_mm = 62 }] };
        var message = Errors(Designs.ThreeLimb with { Core = core })["core.limbSteps[1].width_mm"];
        Assert.Contains("210 mm", message, StringComparison.Ordinal);
        Assert.Contains("180 mm", message, StringComparison.Ordinal);
    }

    [Fact]
    public void Yoke_too_low_for_a_mitred_T_joint_is_refused_and_fits_with_square_joints()
    {
        var low = Designs.ThreeLimb with { Core = Designs.ThreeLimb.Core! with { Yoke = new() { AreaFactor = 0.5 } } };
        Assert.Contains("too low", Errors(low)["core.yoke.areaFactor"], StringComparison.Ordinal);
        Assert.Empty(Errors(low with { Joint = new() { Type = "buttLap" } }));
    }

    public static TheoryData<string, string> Misfits() => new()
    {
        { "core.units", "has three phases on one core" },
        { "core.woundLimbs", "a choice of two-limb cores" },
        { "core.returnLimb", "no return limbs" },
        { "core.returnWindowWidth_mm", "no windows beside a return limb" },
    };

    [Theory]
    [MemberData(nameof(Misfits))]
    public void Field_of_another_core_form_is_refused_by_name(string path, string words)
    {
        var core = Designs.ThreeLimb.Core! with { Units = 3, WoundLimbs = 2, ReturnLimb = new(), ReturnWindowWidth_mm = 100 };
        Assert.Contains(words, Errors(Designs.ThreeLimb with { Core = core })[path], StringComparison.Ordinal);
    }

    [Fact]
    public void Windings_that_do_not_fit_the_phases_are_refused_by_name()
    {
        var errors = Errors(Designs.TwoLimb with
        {
            OtherWinding = new() { Connection = "YN", LineVoltage_V = 11_000 },
            Tertiary = new(),
            Capacitance = new() { Phase_nF = 5 },
            Model = new() { ZeroSequenceReactance_pu = 0.6 },
        });
        Assert.Contains("Give single", errors["otherWinding.connection"], StringComparison.Ordinal);
        Assert.Contains("three phases", errors["tertiary"], StringComparison.Ordinal);
        Assert.Contains("rated voltages", errors["capacitance.lineVoltage_kV"], StringComparison.Ordinal);
        Assert.Contains("Leave it out", errors["model.zeroSequenceReactance_pu"], StringComparison.Ordinal);
        Assert.Contains("Give D", Errors(Designs.ThreeLimb with { Tertiary = new() { Connection = "Y" } })["tertiary.connection"], StringComparison.Ordinal);
        Assert.Contains("neither 1 nor 3", Errors(Designs.TwoLimb with { Core = Designs.TwoLimb.Core! with { Units = 2 } })["core.units"], StringComparison.Ordinal);
        Assert.Contains("bank of three units", Errors(Designs.TwoLimb with { Core = Designs.TwoLimb.Core! with { Units = 3 } })["excitedWinding.connection"], StringComparison.Ordinal);
    }

    [Fact]
    public void Both_ways_to_say_one_thing_are_refused()
    {
        var core = Designs.ThreeLimb.Core!;
        Assert.Contains("core.limb", Errors(Designs.ThreeLimb with { Core = core with { LimbSteps = [new() { Width_mm = 200, Stack_mm = 100 }] } }));
        Assert.Contains("core.yoke", Errors(Designs.ThreeLimb with { Core = core with { Yoke = new() { AreaFactor = 1, StepWidths_mm = [1] } } }));
        Assert.Contains("core.limbPitch_mm", Errors(Designs.ThreeLimb with { Core = core with { LimbPitch_mm = 500 } }));
        Assert.Contains("joint.positions", Errors(Designs.ThreeLimb with { Joint = new() { Type = "buttLap", Positions = 5 } }));
        Assert.Contains("excitedWinding.connection", Errors(Designs.ThreeLimb with { ExcitedWinding = Designs.ThreeLimb.ExcitedWinding! with { Connection = "single" } }));
    }

    [Fact]
    public void Answer_repeats_every_value_used_and_solves_the_same_again()
    {
        var first = Designs.Solve(Designs.TwoLimb);
        Assert.Contains("joint.gap_mm", first.Derived);
        Assert.Contains("model.buildingFactor", first.Derived);
        Assert.Contains("core.limbPitch_mm", first.Derived);
        Assert.DoesNotContain("core.windowWidth_mm", first.Derived);
        Assert.Equal(DesignDefaults.Gap_mm, first.Inputs.Joint!.Gap_mm);
        var again = Designs.Solve(first.Inputs);
        Assert.Equal(first.NoLoadLoss_W, again.NoLoadLoss_W);
        Assert.Equal(first.NoLoadCurrent_A, again.NoLoadCurrent_A);
    }

    private static Dictionary<string, string> Errors(DesignInput design) =>
        EstimateDesign.Run(design, SteelLibrary.Catalog).Errors.GroupBy(e => e.Path).ToDictionary(g => g.Key, g => g.First().Message, StringComparer.Ordinal);

    /// <summary>The three-limb design with one number set, by way of its JSON shape.</summary>
    private static DesignInput With(string path, double value)
    {
        var d = Designs.ThreeLimb;
        var order = d.Order!;
        var winding = d.ExcitedWinding!;
        var core = d.Core!;
        var joint = d.Joint!;
        return path switch
        {
            "order.ratedPower_kVA" => d with { Order = order with { RatedPower_kVA = value } },
            "order.frequency_Hz" => d with { Order = order with { Frequency_Hz = value } },
            "order.highestVoltage_percent" => d with { Order = order with { HighestVoltage_percent = value } },
            "order.askedNoLoadLoss_W" => d with { Order = order with { AskedNoLoadLoss_W = value } },
            "order.askedNoLoadCurrent_percent" => d with { Order = order with { AskedNoLoadCurrent_percent = value } },
            "excitedWinding.lineVoltage_V" => d with { ExcitedWinding = winding with { LineVoltage_V = value } },
            "excitedWinding.turns" => d with { ExcitedWinding = winding with { Turns = value } },
            "excitedWinding.tap_percent" => d with { ExcitedWinding = winding with { Tap_percent = value } },
            "otherWinding.lineVoltage_V" => d with { OtherWinding = new() { Connection = "D", LineVoltage_V = value } },
            "otherWinding.turns" => d with { OtherWinding = new() { Connection = "D", LineVoltage_V = 20000, Turns = value } },
            "otherWinding.tap_percent" => d with { OtherWinding = new() { Connection = "D", LineVoltage_V = 20000, Tap_percent = value } },
            "tertiary.turns" => d with { Tertiary = new() { Turns = value } },
            "tertiary.resistance_ohm" => d with { Tertiary = new() { Resistance_ohm = value } },
            "capacitance.phase_nF" => d with { Capacitance = new() { Phase_nF = value, LineVoltage_kV = 110 } },
            "capacitance.lineVoltage_kV" => d with { Capacitance = new() { Phase_nF = 6, LineVoltage_kV = value } },
            "core.units" => Designs.TwoLimb with { Core = Designs.TwoLimb.Core! with { Units = (int)value } },
            "core.woundLimbs" => Designs.TwoLimb with { Core = Designs.TwoLimb.Core! with { WoundLimbs = (int)value } },
            "core.returnLimb.areaFactor" => d with { Core = core with { Form = "fiveLimb", ReturnLimb = new() { AreaFactor = value } } },
            "core.returnWindowWidth_mm" => d with { Core = core with { Form = "fiveLimb", ReturnWindowWidth_mm = value } },
            "model.zeroSequenceReactance_pu" => d with { Model = new() { ZeroSequenceReactance_pu = value } },
            "excitedWinding.resistance_ohm" => d with { ExcitedWinding = winding with { Resistance_ohm = value } },
            "core.limb.diameter_mm" => d with { Core = core with { Limb = core.Limb! with { Diameter_mm = value } } },
            "core.limb.steps" => d with { Core = core with { Limb = core.Limb! with { Steps = (int)value } } },
            "core.yoke.areaFactor" => d with { Core = core with { Yoke = new() { AreaFactor = value } } },
            "core.windowHeight_mm" => d with { Core = core with { WindowHeight_mm = value } },
            "core.windowWidth_mm" => d with { Core = core with { WindowWidth_mm = value } },
            "core.stackingFactor" => d with { Core = core with { StackingFactor = value } },
            "joint.positions" => d with { Joint = joint with { Positions = (int)value } },
            "joint.sheetsPerPosition" => d with { Joint = joint with { SheetsPerPosition = (int)value } },
            "joint.gap_mm" => d with { Joint = joint with { Gap_mm = value } },
            "joint.overlap_mm" => d with { Joint = joint with { Overlap_mm = value } },
            "joint.interface_um" => d with { Joint = joint with { Interface_um = value } },
            "joint.effectiveGap_mm" => d with { Joint = joint with { EffectiveGap_mm = value } },
            "model.buildingFactor" => d with { Model = new() { BuildingFactor = value } },
            "model.temperature_C" => d with { Model = new() { Temperature_C = value } },
            "order.lowestFrequency_Hz" => d with { Order = order with { LowestFrequency_Hz = value } },
            "margins.currentMultiple" => d with { Margins = new() { CurrentMultiple = value } },
            "margins.dcBias_A" => d with { Margins = new() { DcBias_A = value } },
            "margins.inrush.residual_percent" => d with { Margins = new() { Inrush = new() { Residual_percent = value } } },
            "margins.inrush.switchingAngle_deg" => d with { Margins = new() { Inrush = new() { SwitchingAngle_deg = value } } },
            "margins.inrush.sourceInductance_mH" => d with { Margins = new() { Inrush = new() { SourceInductance_mH = value } } },
            "margins.inrush.airCoreInductance_mH" => d with { Margins = new() { Inrush = new() { AirCoreInductance_mH = value } } },
            "margins.inrush.resistance_ohm" => d with { Margins = new() { Inrush = new() { Resistance_ohm = value } } },
            _ => throw new ArgumentOutOfRangeException(nameof(path), path, "A new field needs a line here."),
        };
    }
}
