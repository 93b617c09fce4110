using CoreDesign.Estimating.Contracts;

namespace CoreDesign.Estimating.Tests.Estimate;

/// <summary>Laws on random designs of every form and connection, through the whole estimate; expected relations follow from the laws themselves.</summary>
public class RandomFormLawTests
{
    private const int Draws = 4;

    [Theory]
    [MemberData(nameof(Designs.Every), MemberType = typeof(Designs))]
    public void Energy_parts_and_shares_add_up(string form, string connection, int units)
    {
        foreach (var (design, where) in RandomDesign.Draw(form, connection, units, Draws))
        {
            var r = Designs.Solve(design);
            Assert.True(r.EnergyBalance.RelativeError < 1e-3, $"{where}: {r.EnergyBalance.RelativeError}");
            Near(r.Mass_kg.Total, r.Parts.Sum(p => p.Count * p.Mass_kg), 1e-9, where);
            Near(r.Mass_kg.Total, units * r.Geometry.Plates.Sum(p => p.Mass_kg), 1e-9, where);
            Near(r.NoLoadLoss_W, r.Shares.Sum(s => s.Loss_W), 1e-9, where);
            Near(100, r.Shares.Sum(s => s.Current_percent), 1e-5, where);
        }
    }

    [Theory]
    [MemberData(nameof(Designs.Every), MemberType = typeof(Designs))]
    public void Lines_without_a_neutral_add_to_zero_and_a_bank_in_delta_keeps_its_triplens(string form, string connection, int units)
    {
        foreach (var (design, where) in RandomDesign.Draw(form, connection, units, Draws))
        {
            var r = Designs.Solve(design);
            var peak = r.Lines.Max(l => l.Peak_A);
            if (connection is "D" or "Y")
            {
                Assert.All(Enumerable.Range(0, r.Lines[0].Waveform_A.Count), t => Assert.True(Math.Abs(r.Lines.Sum(l => l.Waveform_A[t])) < 1e-7 * peak, where));
            }

            if (connection == "D" && units == 3)
            {
                Assert.All(r.Lines.SelectMany(l => l.Harmonics).Where(h => h.Order % 3 == 0), h => Assert.True(h.Rms_A < 1e-6 * peak, $"{where}: harmonic {h.Order}, {h.Rms_A} A"));
            }

            // Three limbs mirrored are the same core with the outer phases changed, and where the supply imposes every flux they draw the same.
            if (connection == "YN" && form != "fiveLimb" && design.Tertiary is null && design.ExcitedWinding!.Resistance_ohm == 0)
            {
                Near(r.Lines[0].Rms_A, r.Lines[2].Rms_A, 1e-6, where);
            }
        }
    }

    [Theory]
    [MemberData(nameof(Designs.Every), MemberType = typeof(Designs))]
    public void Turns_scale_the_current_and_nothing_else(string form, string connection, int units)
    {
        foreach (var (design, where) in RandomDesign.Draw(form, connection, units, Draws))
        {
            const double n = 3;
            var winding = design.ExcitedWinding!;
            var more = design with
            {
                ExcitedWinding = winding with { Turns = n * winding.Turns, LineVoltage_V = n * winding.LineVoltage_V, Resistance_ohm = n * n * winding.Resistance_ohm },
                Tertiary = design.Tertiary is { } t ? t with { Turns = n * t.Turns } : null,
            };
            EstimateResult r = Designs.Solve(design), s = Designs.Solve(more);
            Near(r.NoLoadCurrent_A, n * s.NoLoadCurrent_A, 1e-6, where);
            Near(r.NoLoadLoss_W, s.NoLoadLoss_W, 1e-6, where);
            Near(r.Margin.PeakAtRated_T, s.Margin.PeakAtRated_T, 1e-6, where);
        }
    }

    /// <summary>All lengths by k at the same flux density, plain gaps for joints so that they grow too: mass and loss by k³, ampere-turns by k.</summary>
    [Theory]
    [MemberData(nameof(Designs.Every), MemberType = typeof(Designs))]
    public void Size_scales_mass_and_loss_by_its_cube_and_current_by_itself(string form, string connection, int units)
    {
        foreach (var (drawn, where) in RandomDesign.Draw(form, connection, units, Draws))
        {
            const double k = 1.6;
            var design = drawn with
            {
                Joint = new() { Type = "buttLap", EffectiveGap_mm = 0.05 },
                Core = drawn.Core! with { Limb = drawn.Core.Limb! with { Diameter_mm = Math.Min(drawn.Core.Limb.Diameter_mm!.Value, 600) } },
            };
            design = Designs.WithFluxDensity(design, 1.6);
            var (core, winding) = (design.Core!, design.ExcitedWinding!);
            var big = design with
            {
                Order = design.Order! with { RatedPower_kVA = k * k * k * design.Order.RatedPower_kVA },
                ExcitedWinding = winding with { LineVoltage_V = k * k * winding.LineVoltage_V, Resistance_ohm = k * winding.Resistance_ohm },
                Core = core with
                {
                    Limb = core.Limb! with { Diameter_mm = k * core.Limb.Diameter_mm },
                    WindowHeight_mm = k * core.WindowHeight_mm,
                    WindowWidth_mm = k * core.WindowWidth_mm,
                    ReturnWindowWidth_mm = k * core.ReturnWindowWidth_mm,
                },
                Joint = design.Joint! with { EffectiveGap_mm = k * design.Joint.EffectiveGap_mm },
            };
            EstimateResult r = Designs.Solve(design), s = Designs.Solve(big);
            Near(k * k * k * r.Mass_kg.Total, s.Mass_kg.Total, 1e-9, where);
            Near(k * k * k * r.NoLoadLoss_W, s.NoLoadLoss_W, 1e-5, where);
            Near(k * r.NoLoadCurrent_A, s.NoLoadCurrent_A, 1e-5, where);
            Near(r.Margin.PeakAtHighest_T, s.Margin.PeakAtHighest_T, 1e-5, where);
        }
    }

    [Theory]
    [MemberData(nameof(Designs.Every), MemberType = typeof(Designs))]
    public void Loss_is_the_building_factor_times_the_loss_of_all_sheets(string form, string connection, int units)
    {
        foreach (var (design, where) in RandomDesign.Draw(form, connection, units, Draws))
        {
            var r = Designs.Solve(design with { Model = new() { BuildingFactor = 1.25 } });
            var extra = r.Shares.Single(x => x.Cause == "zoneExtra").Loss_W;
            Near(0.25 * (r.NoLoadLoss_W - extra), extra, 2e-3, where);
        }
    }

    private static void Near(double expected, double actual, double relative, string where) =>
        Assert.True(Math.Abs(actual - expected) <= relative * Math.Abs(expected), $"{where}: {actual} for {expected}");
}
