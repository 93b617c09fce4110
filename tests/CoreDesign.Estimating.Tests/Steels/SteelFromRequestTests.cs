using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Steels;

namespace CoreDesign.Estimating.Tests.Steels;

public sealed class SteelFromRequestTests
{
    private static SteelDataInput Input() => new()
    {
        Name = "Own",
        Thickness_mm = 0.27,
        Density_kg_m3 = 7650,
        Resistivity_ohm_m = 4.8e-7,
        SaturationPolarization_T = 2.03,
        Magnetization = Points((0.5, 8), (1.0, 14), (1.3, 20), (1.5, 30), (1.6, 42), (1.7, 75), (1.8, 190), (1.85, 400), (1.9, 900), (1.95, 2300), (2.0, 6000)),
        Loss = [new LossCurveInput { Frequency_Hz = 50, Points = Losses((0.5, 0.08), (1.0, 0.3), (1.5, 0.7), (1.7, 0.97)) }],
    };

    private static MagnetizationPointInput[] Points(params (double B, double H)[] points) =>
        [.. points.Select(p => new MagnetizationPointInput { B_T = p.B, H_A_m = p.H })];

    private static LossPointInput[] Losses(params (double B, double P)[] points) =>
        [.. points.Select(p => new LossPointInput { B_T = p.B, W_kg = p.P })];

    [Fact]
    public void Good_data_becomes_a_grade_that_says_it_was_given()
    {
        var result = SteelFromRequest.Convert(Input());
        Assert.Empty(result.Errors);
        Assert.Empty(result.Warnings);
        Assert.Empty(result.Derived);
        Assert.Equal("given", result.Grade!.Standing);
        Assert.NotEmpty(result.Grade.StandingText);
        var steel = result.Grade.ToSteelData();
        Assert.Equal("Own", steel.Name);
        Assert.Equal(0.27e-3, steel.SheetThickness_m, 12);
        Assert.Equal(11, steel.Magnetization.Count);
        Assert.Equal(0.97, steel.Loss.Single().Points[^1].Loss_W_per_kg);
    }

    [Fact]
    public void Fields_left_open_are_derived_and_named()
    {
        var result = SteelFromRequest.Convert(Input() with { Name = null, Density_kg_m3 = null, Resistivity_ohm_m = null, SaturationPolarization_T = null });
        Assert.Equal(["steel.data.density_kg_m3", "steel.data.resistivity_ohm_m", "steel.data.saturationPolarization_T"], result.Derived);
        Assert.Equal(2.03, result.Grade!.SaturationPolarization_T.Value);
        Assert.Equal("Steel given with the request", result.Grade.Name);
    }

    [Fact]
    public void Every_error_carries_its_json_path()
    {
        var result = SteelFromRequest.Convert(Input() with
        {
            Thickness_mm = 270,
            Density_kg_m3 = double.NaN,
            Magnetization = [.. Points((0.5, 8), (1.0, 14), (1.3, 20), (1.5, -30), (1.6, 1e308)), new MagnetizationPointInput { B_T = 1.7 }, null!],
            Loss =
            [
                new LossCurveInput { Frequency_Hz = 50, Points = Losses((0.5, 0.08), (1.0, 0.3), (1.5, double.PositiveInfinity), (1.7, 0.97)) },
                new LossCurveInput { Frequency_Hz = 60, Points = Losses((0.5, 0.1), (1.0, 0.4), (1.5, 0.9)) },
                new LossCurveInput { Points = Losses((0.5, 0.1)) },
                new LossCurveInput { Frequency_Hz = 100 },
            ],
        });
        Assert.Null(result.Grade);
        var errors = result.Errors.ToDictionary(e => e.Path, e => e.Message, StringComparer.Ordinal);
        Assert.Equal("270 must lie between 0.1 and 0.65 mm; this looks like micrometres: write 0.27.", errors["steel.data.thickness_mm"]);
        Assert.Equal("NaN is not a finite number; leave the point out where nothing was measured.", errors["steel.data.density_kg_m3"]);
        Assert.Equal("-30 must be a peak field strength from 0.000001 to 1000000 A/m; leave the row out where nothing was measured.", errors["steel.data.magnetization[3].H_A_m"]);
        Assert.Equal("1E+308 must be a peak field strength from 0.000001 to 1000000 A/m; check the unit.", errors["steel.data.magnetization[4].H_A_m"]);
        Assert.Equal("steel.data.magnetization[5].H_A_m is missing: give the number or leave the whole point out.", errors["steel.data.magnetization[5].H_A_m"]);
        Assert.Contains("steel.data.magnetization[6].B_T", errors.Keys);
        Assert.Contains("steel.data.loss[0].points[2].W_kg", errors.Keys);
        Assert.Contains("steel.data.loss[2].frequency_Hz", errors.Keys);
        Assert.Equal("steel.data.loss[3].points is missing: give at least 4 points or leave the curve out.", errors["steel.data.loss[3].points"]);
    }

    [Fact]
    public void Short_loss_curve_is_named_by_its_path()
    {
        var result = SteelFromRequest.Convert(Input() with
        {
            Loss = [new LossCurveInput { Frequency_Hz = 50, Points = Losses((0.5, 0.08), (1.0, 0.3), (1.7, 0.97)) }],
        });
        Assert.Equal(
            new FieldError("steel.data.loss[0].points", "steel.data.loss[0].points has 3 points; at least 4 are needed besides the origin. Add measured points."),
            Assert.Single(result.Errors));
    }

    [Fact]
    public void Empty_data_names_everything_it_needs()
    {
        var result = SteelFromRequest.Convert(new SteelDataInput());
        Assert.Equal(["steel.data.thickness_mm", "steel.data.magnetization", "steel.data.loss"], result.Errors.Select(e => e.Path));
    }

    [Fact]
    public void Unprintable_and_endless_names_are_refused()
    {
        Assert.Equal("steel.data.name", Assert.Single(SteelFromRequest.Convert(Input() with { Name = "a\u0000b" }).Errors).Path);
        Assert.Equal("steel.data.name", Assert.Single(SteelFromRequest.Convert(Input() with { Name = "a\ud800b" }).Errors).Path);
        Assert.Equal("steel.data.name", Assert.Single(SteelFromRequest.Convert(Input() with { Name = new string('n', 1_000_000) }).Errors).Path);
        Assert.Equal("<b>Own</b>", SteelFromRequest.Convert(Input() with { Name = "<b>Own</b>" }).Grade!.Name);
    }
}
