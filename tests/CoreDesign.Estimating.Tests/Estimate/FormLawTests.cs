using CoreDesign.Estimating.Contracts;

namespace CoreDesign.Estimating.Tests.Estimate;

/// <summary>Laws on every core form and connection.</summary>
public class FormLawTests
{
    [Theory]
    [MemberData(nameof(Designs.Every), MemberType = typeof(Designs))]
    public void Energy_mass_and_shares_add_up(string form, string connection, int units)
    {
        var r = Designs.Solve(Designs.Of(form, connection, units));
        TestContext.Current.TestOutputHelper?.WriteLine($"{form} {connection} x{units}: {r.NoLoadLoss_W:F0} W, {r.NoLoadCurrent_percent:F3} %, {string.Join(" ", r.Lines.Select(l => $"{l.Phase} {l.Rms_A:F2}"))}, worst {r.Margin.WorstPart} {r.Margin.PeakAtRated_T:F3} T, balance {r.EnergyBalance.RelativeError:E1}, neutral {r.Neutral?.Rms_percent:F1} %");
        Assert.InRange(r.EnergyBalance.RelativeError, 0, 1e-3);
        Assert.Equal(r.Mass_kg.Total, r.Geometry.Units * r.Geometry.Plates.Sum(p => p.Mass_kg), 1e-9 * r.Mass_kg.Total);
        Assert.Equal(r.Mass_kg.Total, r.Parts.Sum(p => p.Count * p.Mass_kg), 1e-9 * r.Mass_kg.Total);
        Assert.Equal(r.NoLoadLoss_W, r.Parts.Sum(p => p.Loss_W), 1e-9 * r.NoLoadLoss_W);
        Assert.Equal(100, r.Shares.Sum(s => s.Loss_percent), 1e-9);
        Assert.Equal(100, r.Shares.Sum(s => s.Current_percent), 1e-6);
        Assert.All(r.Parts, p => Assert.Equal(units, p.Count));
    }

    [Theory]
    [MemberData(nameof(Designs.Every), MemberType = typeof(Designs))]
    public void Turns_and_voltage_scale_the_current_and_lengths_scale_the_mass(string form, string connection, int units)
    {
        var d = Designs.Of(form, connection, units);
        var more = d with { ExcitedWinding = d.ExcitedWinding! with { Turns = 10 * d.ExcitedWinding.Turns, LineVoltage_V = 10 * d.ExcitedWinding.LineVoltage_V } };
        EstimateResult r = Designs.Solve(d), s = Designs.Solve(more);
        Assert.Equal(r.NoLoadCurrent_A / 10, s.NoLoadCurrent_A, 1e-6 * s.NoLoadCurrent_A);
        Assert.Equal(r.NoLoadLoss_W, s.NoLoadLoss_W, 1e-6 * r.NoLoadLoss_W);

        // An effective gap scales with the lengths too, a joint table's sheets would not.
        var gapped = d with { Joint = d.Joint! with { EffectiveGap_mm = 0.02 } };
        var big = gapped with
        {
            Core = d.Core! with { Limb = d.Core.Limb! with { Diameter_mm = 2 * d.Core.Limb!.Diameter_mm }, WindowHeight_mm = 2 * d.Core.WindowHeight_mm, WindowWidth_mm = 2 * d.Core.WindowWidth_mm },
            Joint = d.Joint! with { EffectiveGap_mm = 0.04 },
            Order = d.Order! with { RatedPower_kVA = 8 * d.Order.RatedPower_kVA },
            ExcitedWinding = d.ExcitedWinding! with { LineVoltage_V = 4 * d.ExcitedWinding.LineVoltage_V },
        };
        EstimateResult one = Designs.Solve(gapped), two = Designs.Solve(big);
        Assert.Equal(8 * one.Mass_kg.Total, two.Mass_kg.Total, 1e-9 * two.Mass_kg.Total);
        Assert.Equal(8 * one.NoLoadLoss_W, two.NoLoadLoss_W, 1e-4 * two.NoLoadLoss_W);

        // Air keeps its share of an isolated star's flux too: half the reluctance for twice the length.
        Assert.Equal(2 * one.NoLoadCurrent_A, two.NoLoadCurrent_A, 1e-4 * two.NoLoadCurrent_A);
    }

    [Theory]
    [InlineData("threeLimb", "D", 1)]
    [InlineData("threeLimb", "Y", 1)]
    [InlineData("fiveLimb", "D", 1)]
    [InlineData("fiveLimb", "Y", 1)]
    [InlineData("singlePhaseTwoLimb", "D", 3)]
    [InlineData("singlePhaseThreeLimb", "Y", 3)]
    public void Line_currents_of_a_delta_and_an_isolated_star_add_to_zero_at_every_instant(string form, string connection, int units)
    {
        var lines = Designs.Solve(Designs.Of(form, connection, units)).Lines;
        for (var t = 0; t < lines[0].Waveform_A.Count; t++)
        {
            Assert.Equal(0, lines.Sum(l => l.Waveform_A[t]), 1e-7 * lines[0].Peak_A);
        }
    }

    [Theory]
    [InlineData("singlePhaseTwoLimb")]
    [InlineData("singlePhaseThreeLimb")]
    [InlineData("singlePhaseFourLimb")]
    public void Bank_in_delta_has_no_triplen_in_its_lines_and_one_in_star_has(string form)
    {
        var delta = Designs.Solve(Designs.Of(form, "D", 3));
        var star = Designs.Solve(Designs.Of(form, "YN", 3));
        foreach (var line in delta.Lines)
        {
            Assert.All(line.Harmonics.Where(h => h.Order % 3 == 0), h => Assert.True(h.Rms_A < 1e-9 * line.Rms_A));
        }

        Assert.All(star.Lines, l => Assert.True(l.Harmonics[2].Rms_A > 0.05 * l.Rms_A));
        Assert.Equal(star.NoLoadLoss_W, delta.NoLoadLoss_W, 1e-6 * star.NoLoadLoss_W);
    }

    [Fact]
    public void Bank_is_three_single_phase_units()
    {
        foreach (var form in new[] { "singlePhaseTwoLimb", "singlePhaseThreeLimb", "singlePhaseFourLimb" })
        {
            EstimateResult one = Designs.Solve(Designs.Of(form)), bank = Designs.Solve(Designs.Of(form, "YN", 3));
            Assert.Equal(3 * one.NoLoadLoss_W, bank.NoLoadLoss_W, 1e-9 * bank.NoLoadLoss_W);
            Assert.Equal(3 * one.Mass_kg.Total, bank.Mass_kg.Total, 1e-9 * bank.Mass_kg.Total);
            Assert.Equal(one.NoLoadCurrent_A, bank.NoLoadCurrent_A, 1e-9 * one.NoLoadCurrent_A);
        }
    }

    [Fact]
    public void Winding_on_both_limbs_of_a_two_limb_core_draws_what_one_on_one_limb_draws()
    {
        var d = Designs.Of("singlePhaseTwoLimb");
        EstimateResult both = Designs.Solve(d), one = Designs.Solve(d with { Core = d.Core! with { WoundLimbs = 1 } });
        Assert.Equal(one.NoLoadCurrent_A, both.NoLoadCurrent_A, 1e-9 * one.NoLoadCurrent_A);
        Assert.Equal(one.NoLoadLoss_W, both.NoLoadLoss_W, 1e-9 * one.NoLoadLoss_W);
        Assert.Equal([true, false], one.Geometry.Limbs.Select(l => l.Wound));
        Assert.Equal([true, true], both.Geometry.Limbs.Select(l => l.Wound));
    }

    [Theory]
    [InlineData("singlePhaseThreeLimb")]
    [InlineData("singlePhaseFourLimb")]
    public void Return_limbs_of_half_area_carry_half_the_flux_each(string form)
    {
        var r = Designs.Solve(Designs.Of(form));
        var parts = r.Parts.ToDictionary(p => p.Name, StringComparer.Ordinal);
        Assert.Equal(parts["limbR"].PeakFluxDensity_T, parts["limbS"].PeakFluxDensity_T, 1e-6);
        Assert.Equal(parts["limbA"].Area_mm2 / 2, parts["limbR"].Area_mm2, 1e-6);
        if (form == "singlePhaseThreeLimb")
        {
            Assert.Equal(parts["limbA"].PeakFluxDensity_T, parts["limbR"].PeakFluxDensity_T, 1e-6);
        }
    }

    /// <summary>Fractions and harmonics published for five limbs: fundamental of both yokes near 1/sqrt3 of the limb's flux, not sinusoidal (derived in the project's physics notes).</summary>
    [Fact]
    public void Yokes_of_a_five_limb_core_carry_about_half_the_flux_with_a_third_harmonic()
    {
        var r = Designs.Solve(Designs.Of("fiveLimb"));
        var limb = r.Limbs.Single(l => l.Name == "limbR");
        var share = r.Geometry.Limbs[0].NetArea_mm2 / r.Geometry.NetLimbArea_mm2;
        var h = Magnetics.Excitation.Waveform.Harmonics([.. limb.FluxDensity_T], 3);
        Assert.InRange(share * h[0].Amplitude / 1.7, 0.4, 0.6);
        Assert.InRange(h[2].Amplitude / h[0].Amplitude, 0.05, 0.35);
    }
}
