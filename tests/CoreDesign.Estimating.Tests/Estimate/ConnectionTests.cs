using CoreDesign.Estimating.Contracts;
using CoreDesign.Magnetics.Excitation;

namespace CoreDesign.Estimating.Tests.Estimate;

/// <summary>Sides, taps, closed deltas, star points and capacitance, by relations that follow from the equations.</summary>
public class ConnectionTests
{
    [Fact]
    public void Figures_of_sides_with_like_connections_follow_the_turns_ratio()
    {
        foreach (var connection in new[] { "YN", "Y", "D" })
        {
            var d = Designs.Of("threeLimb", connection);
            var r = Designs.Solve(d with { OtherWinding = new() { Connection = connection, LineVoltage_V = 50 * d.ExcitedWinding!.LineVoltage_V } });
            var (excited, other) = (r.Sides[0], r.Sides[1]);
            Assert.Equal(("excited", "other"), (excited.Winding, other.Winding));
            Assert.Equal(50 * excited.Turns, other.Turns, 1e-9 * other.Turns);
            Assert.Equal(excited.NoLoadCurrent_A / 50, other.NoLoadCurrent_A, 1e-6 * other.NoLoadCurrent_A);
            Assert.Equal(excited.NoLoadCurrent_percent, other.NoLoadCurrent_percent, 1e-6 * other.NoLoadCurrent_percent);
            Assert.Equal(r.NoLoadCurrent_A, excited.NoLoadCurrent_A);
            Assert.Contains("otherWinding.turns", r.Derived);
        }
    }

    [Fact]
    public void Other_side_with_another_connection_has_the_same_volts_per_turn_and_its_own_lines()
    {
        var d = Designs.Of("threeLimb", "YN") with { OtherWinding = new() { Connection = "D", LineVoltage_V = 20_000 } };
        var r = Designs.Solve(d);
        var (star, delta) = (r.Sides[0], r.Sides[1]);
        Assert.Equal(star.LineVoltage_V / Math.Sqrt(3) / star.Turns, delta.LineVoltage_V / delta.Turns, 1e-9);
        var alone = Designs.Solve(d with { OtherWinding = null, ExcitedWinding = new() { Connection = "D", LineVoltage_V = 20_000, Turns = delta.Turns } });
        Assert.Equal(alone.NoLoadCurrent_A, delta.NoLoadCurrent_A, 1e-9 * alone.NoLoadCurrent_A);
        Assert.Equal(alone.RatedCurrent_A, delta.RatedCurrent_A, 1e-9 * alone.RatedCurrent_A);
        Assert.True(delta.NoLoadCurrent_percent < star.NoLoadCurrent_percent);
    }

    [Fact]
    public void Tap_changes_the_turns_in_circuit()
    {
        var d = Designs.Of("threeLimb");
        var tapped = Designs.Solve(d with { ExcitedWinding = d.ExcitedWinding! with { Tap_percent = -5 } });
        var fewer = Designs.Solve(d with { ExcitedWinding = d.ExcitedWinding! with { Turns = 0.95 * d.ExcitedWinding.Turns } });
        Assert.Equal(fewer.NoLoadCurrent_A, tapped.NoLoadCurrent_A, 1e-9 * fewer.NoLoadCurrent_A);
        Assert.Equal(fewer.NoLoadLoss_W, tapped.NoLoadLoss_W, 1e-9 * fewer.NoLoadLoss_W);
        Assert.Equal(18, tapped.Inputs.ExcitedWinding!.Turns);
    }

    [Theory]
    [InlineData("threeLimb", 1)]
    [InlineData("fiveLimb", 1)]
    [InlineData("singlePhaseThreeLimb", 3)]
    public void Closed_delta_takes_the_triplens_of_a_star(string form, int units)
    {
        var d = Designs.Of(form, "YN", units);
        EstimateResult without = Designs.Solve(d), with = Designs.Solve(d with { Tertiary = new() });
        Assert.Equal(without.NoLoadLoss_W, with.NoLoadLoss_W, 1e-9 * without.NoLoadLoss_W);
        Assert.True(with.NoLoadCurrent_A < without.NoLoadCurrent_A);
        Assert.Contains(with.Warnings, w => w.Key == "tertiary");
        Assert.Equal(100, with.Shares.Sum(s => s.Current_percent), 1e-6);

        // Turns of the excited winding by default, so the delta carries the mean of the lines' currents without it.
        var mean = Enumerable.Range(0, without.Lines[0].Waveform_A.Count).Select(t => without.Lines.Average(l => l.Waveform_A[t])).ToArray();
        Assert.Equal(Waveform.Rms(mean), with.Tertiary!.Rms_A, 1e-9 * with.Tertiary.Rms_A);
        Assert.True(with.Tertiary.Harmonics[2].Rms_A > 0);
        for (var t = 0; t < with.Lines[0].Waveform_A.Count; t++)
        {
            Assert.Equal(0, with.Lines.Sum(l => l.Waveform_A[t]), 1e-9 * with.Lines[0].Peak_A);
        }
    }

    [Fact]
    public void Closed_delta_beside_an_isolated_star_is_as_beside_an_earthed_one_and_beside_a_delta_it_is_idle()
    {
        foreach (var form in new[] { "threeLimb", "fiveLimb" })
        {
            EstimateResult earthed = Designs.Solve(Designs.Of(form, "YN") with { Tertiary = new() }), isolated = Designs.Solve(Designs.Of(form, "Y") with { Tertiary = new() });
            Assert.Equal(earthed.NoLoadCurrent_A, isolated.NoLoadCurrent_A, 1e-9 * earthed.NoLoadCurrent_A);
            Assert.Equal(earthed.Tertiary!.Rms_A, isolated.Tertiary!.Rms_A, 1e-9 * earthed.Tertiary.Rms_A);
            Assert.Equal(0, isolated.Neutral!.Rms_percent, 0.1);
            Assert.DoesNotContain(isolated.Warnings, w => w.Key is "tertiary" or "neutral");

            EstimateResult alone = Designs.Solve(Designs.Of(form, "D")), beside = Designs.Solve(Designs.Of(form, "D") with { Tertiary = new() });
            Assert.Equal(0, beside.Tertiary!.Rms_A);
            Assert.Equal(alone.NoLoadCurrent_A, beside.NoLoadCurrent_A, 1e-12 * alone.NoLoadCurrent_A);
            Assert.Contains(beside.Warnings, w => w.Key == "tertiary");
        }
    }

    [Fact]
    public void Neutral_of_an_isolated_star_oscillates_by_tens_of_per_cent_on_a_bank_and_little_on_three_limbs()
    {
        // Orders of magnitude derived in the project's physics notes: 0.1 to 2 % of phase voltage on three limbs, tens of per cent on banks.
        var bank = Designs.Solve(Designs.Of("singlePhaseTwoLimb", "Y", 3));
        var three = Designs.Solve(Designs.Of("threeLimb", "Y"));
        Assert.InRange(bank.Neutral!.ThirdHarmonic_percent, 20, 70);
        Assert.InRange(three.Neutral!.ThirdHarmonic_percent, 0.02, 2);
        Assert.Contains(bank.Warnings, w => w.Key == "neutral" && w.Text.Contains("oscillates", StringComparison.Ordinal));
        Assert.Contains(Designs.Solve(Designs.Of("fiveLimb", "Y")).Warnings, w => w.Key == "neutral");
        Assert.DoesNotContain(three.Warnings, w => w.Key == "neutral");
        Assert.Null(Designs.Solve(Designs.Of("threeLimb", "D")).Neutral);
    }

    [Fact]
    public void Zero_sequence_path_of_an_isolated_star_can_be_given()
    {
        var d = Designs.Of("threeLimb", "Y");
        EstimateResult low = Designs.Solve(d with { Model = new() { ZeroSequenceReactance_pu = 0.4 } }), high = Designs.Solve(d with { Model = new() { ZeroSequenceReactance_pu = 1.5 } });
        Assert.True(high.Neutral!.ThirdHarmonic_V > 2 * low.Neutral!.ThirdHarmonic_V);
        Assert.Contains("model.zeroSequenceReactance_pu", Designs.Solve(d).Derived);
        Assert.Equal(0.6, Designs.Solve(d).Inputs.Model!.ZeroSequenceReactance_pu);
    }

    [Fact]
    public void Capacitance_leads_in_the_lines_with_the_power_of_an_even_voltage()
    {
        // By hand for 6 nF at 110 kV, 50 Hz (worked in the project's physics notes as 7.6 kvar): 3 w (C/3) (110 kV/sqrt3)².
        var d = Designs.Of("threeLimb", "YN") with { Capacitance = new() { Phase_nF = 6, LineVoltage_kV = 110 } };
        EstimateResult with = Designs.Solve(d), without = Designs.Solve(d with { Capacitance = null });
        Assert.Equal(7602.7, with.Capacitive!.Power_var, 0.1);
        Assert.Equal(with.Capacitive.Power_var / (Math.Sqrt(3) * with.Sides[0].LineVoltage_V), with.Capacitive.Current_A, 1e-9);
        foreach (var (x, y) in with.Lines.Zip(without.Lines))
        {
            Assert.All(x.Harmonics.Zip(y.Harmonics).Skip(1), h => Assert.Equal(h.Second.Rms_A, h.First.Rms_A, 1e-9));
            (double re, double im) Phasor(HarmonicResult h) => (h.Rms_A * Math.Cos(h.Phase_deg * Math.PI / 180), h.Rms_A * Math.Sin(h.Phase_deg * Math.PI / 180));
            var (p, q) = (Phasor(x.Harmonics[0]), Phasor(y.Harmonics[0]));
            Assert.Equal(with.Capacitive.Current_A, Math.Sqrt(Math.Pow(p.re - q.re, 2) + Math.Pow(p.im - q.im, 2)), 1e-9);
        }

        // Leading: it turns the magnetizing power of a delta's lines down too, whatever their angle to the phases.
        var small = d with { Capacitance = new() { Phase_nF = 0.5, LineVoltage_kV = 110 } };
        foreach (var connection in new[] { "YN", "D" })
        {
            var f = Designs.Of("threeLimb", connection);
            Assert.True(Designs.Solve(f with { Capacitance = small.Capacitance }).NoLoadCurrent_A < Designs.Solve(f).NoLoadCurrent_A);
        }

        Assert.Contains(with.Sources, s => s.Key == "capacitance");
        Assert.Equal(without.NoLoadLoss_W, with.NoLoadLoss_W);
    }

    [Fact]
    public void Every_form_and_joint_has_a_building_factor_that_says_its_basis()
    {
        foreach (var form in new[] { "threeLimb", "fiveLimb", "singlePhaseTwoLimb", "singlePhaseThreeLimb", "singlePhaseFourLimb" })
        {
            var factors = new[] { "stepLap", "mitredOverlap", "buttLap" }.Select(j => Designs.Solve(Designs.Of(form) with { Joint = new() { Type = j } })).ToList();
            Assert.True(factors.Zip(factors.Skip(1)).All(f => f.First.Model.BuildingFactor < f.Second.Model.BuildingFactor));
            Assert.All(factors, f => Assert.Contains("Default building factor", f.Model.BuildingFactorSource, StringComparison.Ordinal));
        }
    }
}
