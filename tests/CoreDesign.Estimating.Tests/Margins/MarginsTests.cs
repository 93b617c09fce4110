using System.Globalization;
using System.Text.Json.Nodes;
using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Demo;
using CoreDesign.Estimating.Estimate;
using CoreDesign.Estimating.Margins;
using CoreDesign.Estimating.Steels;
using CoreDesign.Estimating.Tests.Estimate;

namespace CoreDesign.Estimating.Tests.Margins;

public sealed class MarginsTests(ITestOutputHelper output)
{
    private static readonly DesignInput Single = Designs.WithFluxDensity(Designs.TwoLimb, 1.6);

    private static MarginsResult Solve(DesignInput design)
    {
        var outcome = StudyMargins.Run(design, SteelLibrary.Catalog, TestContext.Current.CancellationToken);
        Assert.True(outcome.Ok, outcome.Unsolvable?.Reason ?? string.Join("; ", outcome.Errors.Select(e => $"{e.Path}: {e.Message}")));
        return outcome.Value!;
    }

    public static TheoryData<string> Demos => [.. DemoOrders.All.Select(d => d.Key)];

    [Theory]
    [MemberData(nameof(Demos))]
    public void Every_demo_order_has_all_margins(string key)
    {
        var design = DemoOrders.TryFind(key)!.Design;
        var estimate = Designs.Solve(design);
        var m = Solve(design);
        output.WriteLine(string.Create(CultureInfo.InvariantCulture, $"{key}: {estimate.Margin.PeakAtRated_T:0.000} T; ×{m.OverVoltage.CurrentMultiple} at {m.OverVoltage.Voltage_percent:0.00} % ({m.OverVoltage.PeakFluxDensity_T:0.000} T) {m.OverVoltage.Reason}; air core {estimate.Inputs.Margins!.Inrush!.AirCoreInductance_mH:G4} mH; inrush {m.Inrush.Peak_A:G5} A in {m.Inrush.PeakLine} at {m.Inrush.PeakTime_ms:0.00} ms = {m.Inrush.PeakOverRated:0.00} rated, formulas {m.Inrush.FormulaLossless_A:G5}, {m.Inrush.FormulaWithResistance_A:G5} A, halving {m.Inrush.StepHalving_percent:G2} %, {m.Inrush.Reason}"));
        Assert.Null(m.Inrush.Reason);
        Assert.Null(m.OverVoltage.Reason);
        Assert.InRange(m.Inrush.StepHalving_percent!.Value, 0, 0.1);
        Assert.Null(m.DcBias);
        Assert.Equal(FluxSweep.Levels, m.FluxCurve.Select(p => p.VoltsPerHertz_percent));
        var rated = m.FluxCurve.Single(p => p.VoltsPerHertz_percent == 100);
        Assert.Equal(estimate.NoLoadLoss_W, rated.NoLoadLoss_W, 1e-9 * estimate.NoLoadLoss_W);
        Assert.Equal(estimate.NoLoadCurrent_percent, rated.NoLoadCurrent_percent, 1e-9 * estimate.NoLoadCurrent_percent);
        Assert.Contains(m.Notes, n => n.Key == "protection");
    }

    public static TheoryData<string, string, int> Forms => Designs.Every();

    [Theory]
    [MemberData(nameof(Forms))]
    public void Every_form_and_connection_has_all_margins(string form, string connection, int units)
    {
        var design = Designs.Of(form, connection, units) with { Margins = new() { DcBias_A = 1 } };
        var m = Solve(design);
        output.WriteLine(string.Create(CultureInfo.InvariantCulture, $"{form} {connection} {units}: ×5 at {m.OverVoltage.Voltage_percent:0.0} %, inrush {m.Inrush.Peak_A:G4} A, formula {m.Inrush.FormulaLossless_A:G4} A, bias offset {m.DcBias!.Offset_T:G3} T {m.DcBias.Reason}"));
        Assert.Null(m.OverVoltage.Reason);
        Assert.Null(m.Inrush.Reason);
        Assert.InRange(m.Inrush.StepHalving_percent!.Value, 0, 0.1);
        Assert.InRange(m.Inrush.Peak_A!.Value / m.Inrush.FormulaLossless_A!.Value, 0.6, 2);
        Assert.Equal(connection is "D" or "Y", m.DcBias.Reason is not null);
    }

    [Fact]
    public void Closed_delta_takes_part_in_the_inrush_only_behind_a_supply_that_gives_way()
    {
        // Stiff phase voltages add to zero, so that nothing is induced in a delta round all three.
        double Peak(double source_mH, bool delta)
        {
            var m = Solve(Designs.Of("fiveLimb") with { Tertiary = delta ? new() { Turns = 20, Resistance_ohm = 0.001 } : null, Margins = new() { DcBias_A = 1, Inrush = new() { SourceInductance_mH = source_mH } } });
            Assert.Null(m.Inrush.Reason);
            Assert.Null(m.DcBias!.Reason);
            return m.Inrush.Peak_A!.Value;
        }

        Assert.Equal(Peak(0, delta: false), Peak(0, delta: true), 1e-6 * Peak(0, delta: false));
        Assert.NotEqual(Peak(0.05, delta: false), Peak(0.05, delta: true), 1e-3 * Peak(0.05, delta: false));
    }

    [Theory]
    [InlineData("YN")]
    [InlineData("Y")]
    [InlineData("D")]
    public void Closed_delta_without_resistance_leaves_every_margin(string connection)
    {
        var m = Solve(Designs.Of("threeLimb", connection) with { Tertiary = new(), Margins = new() { DcBias_A = 1 } });
        Assert.Null(m.Inrush.Reason);
        Assert.Null(m.OverVoltage.Reason);
        Assert.Equal(connection != "YN", m.DcBias!.Reason is not null);
    }

    [Fact]
    public void Over_voltage_gives_the_multiple_when_it_is_set_as_rated_voltage()
    {
        var m = Solve(Single with { Margins = new() { CurrentMultiple = 3 } }).OverVoltage;
        var rated = Designs.Solve(Single);
        var there = Designs.Solve(Single with { ExcitedWinding = Single.ExcitedWinding! with { LineVoltage_V = Single.ExcitedWinding.LineVoltage_V * m.Voltage_percent / 100 } });
        Assert.Equal(3, there.NoLoadCurrent_A / rated.NoLoadCurrent_A, 1e-3);
        Assert.Equal(there.Margin.PeakAtRated_T, m.PeakFluxDensity_T!.Value, 1e-4);
    }

    [Fact]
    public void Multiple_that_is_not_reached_is_said_with_the_one_that_is()
    {
        var m = Solve(Designs.WithFluxDensity(Single, 1.0) with { Margins = new() { CurrentMultiple = 100 } }).OverVoltage;
        Assert.Null(m.Voltage_percent);
        Assert.Equal(150, m.HighestTried_percent);
        Assert.InRange(m.MultipleAtHighest!.Value, 1.5, 20);
        Assert.StartsWith("Not reached up to 150 % of rated voltage: the current there is ", m.Reason, StringComparison.Ordinal);
    }

    [Fact]
    public void Curves_end_where_no_law_holds_and_say_so()
    {
        var design = Designs.WithFluxDensity(Single, 2.45) with { Order = Single.Order! with { HighestVoltage_percent = 110 } };
        var m = Solve(design);
        Assert.Equal(120, m.FluxCurve[^1].VoltsPerHertz_percent);
        Assert.Equal(120, VoltageSweep.Run(design, SteelLibrary.Catalog, TestContext.Current.CancellationToken).Value![^1].Voltage_percent);
        Assert.Contains("curves end at 120 % voltage and 120 % volts per hertz", m.Notes.Single(n => n.Key == "curveEnd").Text, StringComparison.Ordinal);
        Assert.DoesNotContain(Solve(Single).Notes, n => n.Key == "curveEnd");
    }

    [Fact]
    public void Volts_per_hertz_curve_has_the_same_flux_as_the_voltage_curve()
    {
        // U/f alone sets the peak of an imposed flux.
        var volts = VoltageSweep.Run(Single, SteelLibrary.Catalog, TestContext.Current.CancellationToken).Value!.ToDictionary(p => p.Voltage_percent);
        foreach (var p in Solve(Single).FluxCurve)
        {
            Assert.Equal(volts[p.VoltsPerHertz_percent].PeakFluxDensity_T, p.PeakFluxDensity_T, 1e-6);
            Assert.Equal(50 * 100 / p.VoltsPerHertz_percent, p.Frequency_Hz, 1e-9);
        }
    }

    [Fact]
    public void Highest_voltage_is_judged_at_the_lowest_frequency()
    {
        var rated = Designs.Solve(Single).Margin;
        var low = Designs.Solve(Single with { Order = Single.Order! with { LowestFrequency_Hz = 47.5 } }).Margin;
        Assert.Equal(50, rated.LowestFrequency_Hz);
        Assert.Equal(47.5, low.LowestFrequency_Hz);
        Assert.Equal(rated.PeakAtRated_T, low.PeakAtRated_T, 1e-12);
        Assert.Equal(1.1 * 50 / 47.5 * rated.PeakAtRated_T, low.PeakAtHighest_T, 1e-6);
        Assert.Equal(100 * (low.SaturationPolarization_T - low.PeakAtHighest_T) / low.SaturationPolarization_T, low.AtHighest_percent, 1e-9);
    }

    [Theory]
    [InlineData(60, "Lowest frequency 60 Hz is above the rated frequency of 50 Hz. Enter at most the rated one, or leave it open.")]
    [InlineData(5, "Lowest frequency 5 Hz is outside 10 to 400 Hz")]
    public void Lowest_frequency_that_can_not_be_is_refused(double frequency, string message)
    {
        var outcome = EstimateDesign.Run(Single with { Order = Single.Order! with { LowestFrequency_Hz = frequency } }, SteelLibrary.Catalog, TestContext.Current.CancellationToken);
        var error = Assert.Single(outcome.Errors);
        Assert.Equal("order.lowestFrequency_Hz", error.Path);
        Assert.StartsWith(message, error.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Extreme_beyond_every_law_is_refused_with_what_to_change()
    {
        var outcome = EstimateDesign.Run(Single with { Order = Single.Order! with { LowestFrequency_Hz = 20 } }, SteelLibrary.Catalog, TestContext.Current.CancellationToken);
        Assert.StartsWith("At 110 % voltage and 20 Hz the limbs would have to carry 4.4 T", outcome.Unsolvable!.Reason, StringComparison.Ordinal);
    }

    [Fact]
    public void Study_kept_from_before_there_were_margins_still_opens()
    {
        var study = StudyDesign.Run(Single, SteelLibrary.Catalog, TestContext.Current.CancellationToken).Value!;
        var old = JsonNode.Parse(DesignJson.Write(study))!.AsObject();
        Assert.True(old.Remove("margins"));
        var estimate = old["estimate"]!.AsObject();
        Assert.True(estimate["margin"]!.AsObject().Remove("lowestFrequency_Hz"));
        Assert.True(estimate["inputs"]!.AsObject().Remove("margins"));
        Assert.True(estimate["inputs"]!["order"]!.AsObject().Remove("lowestFrequency_Hz"));

        var read = DesignJson.ReadStored<Study>(old.ToJsonString());
        Assert.Null(read.Margins);
        Assert.Null(read.Estimate.Margin.LowestFrequency_Hz);
        Assert.Equal(study.Estimate.Margin.AtHighest_percent, read.Estimate.Margin.AtHighest_percent);
        var back = DesignJson.ReadStored<Study>(DesignJson.Write(study));
        Assert.Equal(study.Margins!.Inrush.Peak_A, back.Margins!.Inrush.Peak_A);
        Assert.Equal(study.Margins.Inrush.Lines[0].Current_A, back.Margins.Inrush.Lines[0].Current_A);
    }

    [Fact]
    public void What_is_left_open_is_told_with_its_value()
    {
        var r = Designs.Solve(Single);
        var m = r.Inputs.Margins!;
        Assert.Equal((5.0, 0.0, 80.0, 0.0, 0.0, 0.0), (m.CurrentMultiple, m.DcBias_A, m.Inrush!.Residual_percent, m.Inrush.SwitchingAngle_deg, m.Inrush.SourceInductance_mH, m.Inrush.Resistance_ohm));
        Assert.True(m.Inrush.AirCoreInductance_mH > 0);
        foreach (var path in new[] { "order.lowestFrequency_Hz", "margins.currentMultiple", "margins.dcBias_A", "margins.inrush.residual_percent", "margins.inrush.switchingAngle_deg", "margins.inrush.sourceInductance_mH", "margins.inrush.airCoreInductance_mH", "margins.inrush.resistance_ohm" })
        {
            Assert.Contains(path, r.Derived);
        }
    }
}
