using CoreDesign.Estimating.Contracts;
using CsCheck;

namespace CoreDesign.Estimating.Tests.Estimate;

/// <summary>Physical laws on random designs. Expected relations follow from the laws themselves.</summary>
public class EstimateLawTests
{
    private const int Designs_count = 40;

    [Fact]
    public void Terminal_power_equals_material_loss() =>
        Designs.Random.Sample(d => Assert.InRange(Designs.Solve(d).EnergyBalance.RelativeError, 0, 1e-3), iter: Designs_count);

    [Fact]
    public void Mass_equals_sum_of_plates_and_of_parts() =>
        Designs.Random.Sample(
            d =>
            {
                var r = Designs.Solve(d);
                Assert.Equal(r.Mass_kg.Total, r.Geometry.Plates.Sum(p => p.Mass_kg), 1e-9 * r.Mass_kg.Total);
                Assert.Equal(r.Mass_kg.Total, r.Parts.Sum(p => p.Count * p.Mass_kg), 1e-9 * r.Mass_kg.Total);
                Assert.Equal(r.NoLoadLoss_W, r.Parts.Sum(p => p.Loss_W), 1e-9 * r.NoLoadLoss_W);
                Assert.Equal(100, r.Shares.Sum(s => s.Loss_percent), 1e-9);
                Assert.Equal(100, r.Shares.Sum(s => s.Current_percent), 1e-6);
            },
            iter: Designs_count);

    [Fact]
    public void Loss_is_building_factor_times_sheet_loss() =>
        Designs.Random.Sample(
            d =>
            {
                var with = Designs.Solve(d with { Model = new() { BuildingFactor = 1.2 } });
                var without = Designs.Solve(d with { Model = new() { BuildingFactor = 1 } });
                Assert.Equal(1.2 * without.NoLoadLoss_W, with.NoLoadLoss_W, 1e-6 * with.NoLoadLoss_W);
            },
            iter: Designs_count);

    [Fact]
    public void Doubling_all_lengths_scales_mass_by_eight_and_sheet_loss_with_it() =>
        Designs.Random.Where(d => d.Core!.Limb!.Diameter_mm < 450).Sample(
            d =>
            {
                // Volts grow fourfold for the same flux density in four times the area.
                var big = d with
                {
                    Core = d.Core! with
                    {
                        Limb = d.Core.Limb! with { Diameter_mm = 2 * d.Core.Limb!.Diameter_mm },
                        WindowHeight_mm = 2 * d.Core.WindowHeight_mm,
                        WindowWidth_mm = 2 * d.Core.WindowWidth_mm,
                    },
                    ExcitedWinding = d.ExcitedWinding! with { LineVoltage_V = 4 * d.ExcitedWinding.LineVoltage_V },
                };
                EstimateResult r = Designs.Solve(d), s = Designs.Solve(big);
                Assert.Equal(8 * r.Mass_kg.Total, s.Mass_kg.Total, 1e-9 * s.Mass_kg.Total);
                Assert.Equal(4 * r.Geometry.NetLimbArea_mm2, s.Geometry.NetLimbArea_mm2, 1e-9 * s.Geometry.NetLimbArea_mm2);
                Assert.Equal(8 * r.NoLoadLoss_W, s.NoLoadLoss_W, 1e-6 * s.NoLoadLoss_W);
                Assert.Equal(r.Margin.AtRated_percent, s.Margin.AtRated_percent, 1e-6);
            },
            iter: 15);

    [Fact]
    public void More_joint_positions_never_raise_the_current_at_1_7_T()
    {
        foreach (var gap in new[] { 0.2, 0.5, 1.0 })
        {
            var currents = Enumerable.Range(2, 7)
                .Select(m => Designs.Solve(Designs.WithFluxDensity(Designs.ThreeLimb, 1.7) with { Joint = new() { Type = "stepLap", Positions = m, Gap_mm = gap, Overlap_mm = 4 } }).NoLoadCurrent_A)
                .ToList();
            Assert.True(currents.Zip(currents.Skip(1)).All(p => p.Second <= p.First), string.Join(" ", currents));
        }
    }

    [Fact]
    public void Wider_gap_never_lowers_the_current()
    {
        foreach (var type in new[] { "stepLap", "mitredOverlap", "buttLap" })
        {
            var currents = new[] { 0, 0.1, 0.3, 0.6, 1, 2 }
                .Select(g => Designs.Solve(Designs.ThreeLimb with { Joint = new() { Type = type, Gap_mm = g, Overlap_mm = 6 } }).NoLoadCurrent_A)
                .ToList();
            Assert.True(currents.Zip(currents.Skip(1)).All(p => p.Second >= p.First), type + " " + string.Join(" ", currents));
        }
    }

    [Fact]
    public void Current_and_loss_grow_with_voltage() =>
        Designs.Random.Sample(
            d =>
            {
                EstimateResult r = Designs.Solve(d);
                var s = Designs.Solve(d with { ExcitedWinding = d.ExcitedWinding! with { LineVoltage_V = 1.05 * d.ExcitedWinding.LineVoltage_V } });
                Assert.True(s.NoLoadCurrent_A > r.NoLoadCurrent_A);
                Assert.True(s.NoLoadLoss_W > r.NoLoadLoss_W);
                Assert.True(s.Margin.AtRated_percent < r.Margin.AtRated_percent);
            },
            iter: Designs_count);

    [Fact]
    public void Outer_phases_of_a_three_limb_core_draw_the_same_and_more_than_the_middle_one() =>
        Designs.Random.Where(d => d.ExcitedWinding!.Connection == "YN").Sample(
            d =>
            {
                var lines = Designs.Solve(d).Lines.ToDictionary(l => l.Phase, l => l.Rms_A);
                Assert.Equal(lines["A"], lines["C"], 1e-9 * lines["A"]);
                Assert.True(lines["A"] > lines["B"], $"A {lines["A"]} B {lines["B"]}");
            },
            iter: Designs_count);

    [Fact]
    public void Line_currents_of_a_delta_add_to_zero_at_every_instant()
    {
        var lines = Designs.Solve(Designs.ThreeLimb with { ExcitedWinding = new() { Connection = "D", LineVoltage_V = 400, Turns = 31 } }).Lines;
        for (var t = 0; t < lines[0].Waveform_A.Count; t++)
        {
            Assert.Equal(0, lines.Sum(l => l.Waveform_A[t]), 1e-9);
        }
    }

    [Fact]
    public void Scaling_turns_and_voltage_together_scales_current_inversely()
    {
        var r = Designs.Solve(Designs.ThreeLimb);
        var s = Designs.Solve(Designs.ThreeLimb with { ExcitedWinding = new() { Connection = "YN", LineVoltage_V = 4000, Turns = 180 } });
        Assert.Equal(r.NoLoadCurrent_A / 10, s.NoLoadCurrent_A, 1e-9 * s.NoLoadCurrent_A);
        Assert.Equal(r.NoLoadLoss_W, s.NoLoadLoss_W, 1e-9 * r.NoLoadLoss_W);
    }

    [Fact]
    public void Current_shares_of_isolated_star_add_to_one_too()
    {
        var r = Designs.Solve(Designs.ThreeLimb with { ExcitedWinding = Designs.ThreeLimb.ExcitedWinding! with { Connection = "Y" } });
        Assert.Equal(100, r.Shares.Sum(s => s.Loss_percent), 1e-9);
        Assert.InRange(r.EnergyBalance.RelativeError, 0, 1e-3);
        for (var t = 0; t < r.Lines[0].Waveform_A.Count; t++)
        {
            Assert.Equal(0, r.Lines.Sum(l => l.Waveform_A[t]), 1e-6);
        }
    }
}
