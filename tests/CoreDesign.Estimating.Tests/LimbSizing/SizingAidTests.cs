using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.LimbSizing;
using CoreDesign.Estimating.Steels;

namespace CoreDesign.Estimating.Tests.LimbSizing;

public sealed class SizingAidTests
{
    private static readonly SteelCatalog Steels = new([]);

    // One step of 100 x 100 mm at factor 1: A = 0.01 m2, so that the expected figures follow by hand from E = 4.4429 f N A B.
    private static readonly DesignInput Square = new()
    {
        Order = new OrderInput { Phases = 1, Frequency_Hz = 50 },
        ExcitedWinding = new ExcitedWindingInput { Connection = "single", LineVoltage_V = 222.144, Turns = 100 },
        Core = new CoreInput { LimbSteps = [new StepInput { Width_mm = 100, Stack_mm = 100 }], StackingFactor = 1 },
    };

    [Fact]
    public void Flux_density_of_the_design_follows_from_volts_per_turn() =>
        // 222.144 / (4.44288 * 50 * 100 * 0.01) = 1.0000 T
        Assert.Equal(1.0, SizingAid.Propose(Square, null, Steels).FluxDensity_T!.Value, 1e-4);

    [Fact]
    public void Turns_are_whole_and_their_flux_density_is_said()
    {
        // 1 T at 100 turns, so 1.7 T at 58.82: 59 turns, 100 / 59 = 1.6949 T
        var proposal = SizingAid.Propose(Square, 1.7, Steels);

        Assert.Equal(59, proposal.Turns);
        Assert.Equal(100.0 / 59, proposal.FluxDensityWithTurns_T!.Value, 1e-4);
    }

    [Fact]
    public void Open_turns_are_filled_in_and_typed_ones_stay()
    {
        var open = Square with { ExcitedWinding = Square.ExcitedWinding! with { Turns = null } };

        Assert.Equal(59, SizingAid.Complete(open, null, 1.7, Steels).ExcitedWinding!.Turns);
        Assert.Equal(100, SizingAid.Complete(Square, null, 1.7, Steels).ExcitedWinding!.Turns);
    }

    [Fact]
    public void Star_winding_has_the_line_voltage_over_root_three()
    {
        var star = Square with { Order = Square.Order! with { Phases = 3 }, ExcitedWinding = Square.ExcitedWinding! with { Connection = "YN" } };

        Assert.Equal(1 / Math.Sqrt(3), SizingAid.Propose(star, null, Steels).FluxDensity_T!.Value, 1e-4);
    }

    [Fact]
    public void Proposed_circle_reaches_the_wanted_flux_density_and_one_less_does_not()
    {
        var round = Square with { Core = new CoreInput { Limb = new LimbInput { Diameter_mm = 100, Steps = 1 }, StackingFactor = 1 } };
        var proposal = SizingAid.Propose(round, 1.0, Steels);

        // One step fills the circle by a square of side d / sqrt 2 (closed form), so A = d2 / 2 = 0.01 m2 gives d = 141.42 mm.
        Assert.Equal(142, proposal.Diameter_mm);
        Assert.InRange(proposal.FluxDensityWithDiameter_T!.Value, 0.98, 1.0);
    }

    [Fact]
    public void Yoke_height_becomes_the_area_factor_of_the_widest_step() =>
        Assert.Equal(1.05, SizingAid.Complete(Square, 105, null, Steels).Core!.Yoke!.AreaFactor!.Value, 1e-12);

    [Fact]
    public void Design_that_says_too_little_comes_back_as_it_is()
    {
        var empty = new DesignInput();

        Assert.Same(empty, SizingAid.Complete(empty, 100, 1.7, Steels));
        Assert.Null(SizingAid.Propose(empty, 1.7, Steels).Turns);
    }
}
