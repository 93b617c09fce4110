using System.Globalization;
using System.Text.Json;
using CoreDesign.Estimating.Steels;

namespace CoreDesign.Estimating.Tests.Steels;

public sealed class SteelLibraryTests
{
    public static TheoryData<string> Names => [.. SteelLibrary.All.Select(g => g.Name)];

    private static SteelGrade Grade(string name) =>
        SteelLibrary.TryFind(name, out var grade) ? grade : throw new InvalidOperationException(name);

    [Fact]
    public void Library_holds_every_row_of_the_tables()
    {
        Assert.Equal(12, SteelLibrary.All.Count(g => g.Generation == "current" && g.Class == "conventional"));
        Assert.Equal(10, SteelLibrary.All.Count(g => g.Generation == "current" && g.Class == "high permeability"));
        Assert.Equal(5, SteelLibrary.All.Count(g => g.Class == "domain refined"));
        Assert.Equal(7, SteelLibrary.All.Count(g => g.Generation == "older"));
        Assert.Equal(["M-2", "M-3", "M-4", "M-5", "M-6"], SteelLibrary.All.Where(g => g.Generation == "AISI").Select(g => g.Name));
        Assert.Equal(39, SteelLibrary.All.Count);
    }

    // Designation rule of IEC 60404-8-7: M, 100 x greatest loss in W/kg, 100 x thickness in mm, letter. S and P count at 1.7 T, N at 1.5 T.
    [Theory]
    [MemberData(nameof(Names))]
    public void Name_states_thickness_and_guaranteed_loss(string name)
    {
        if (name.StartsWith("M-", StringComparison.Ordinal))
        {
            return;
        }

        var grade = Grade(name);
        var code = name.Split(' ')[0];
        var loss = double.Parse(code[1..code.IndexOf('-', StringComparison.Ordinal)], CultureInfo.InvariantCulture) / 100;
        var b = code.EndsWith('N') ? 1.5 : 1.7;
        Assert.Equal(double.Parse(code[^3..^1], CultureInfo.InvariantCulture) / 100, grade.Thickness_mm.Value, 9);
        Assert.Equal(loss, grade.GuaranteedLoss(b, 50)!.Value, 9);
    }

    // Designations of ASTM A876 that go with the AISI names: 23G045 means 0.45 W/lb at 1.5 T, 60 Hz; 1 lb = 0.45359237 kg.
    [Theory]
    [InlineData("M-2", 0.18, 0.41)]
    [InlineData("M-3", 0.23, 0.45)]
    [InlineData("M-4", 0.27, 0.51)]
    [InlineData("M-5", 0.30, 0.58)]
    [InlineData("M-6", 0.35, 0.66)]
    public void Aisi_grade_has_the_loss_of_its_designation(string name, double thickness, double wattsPerPound)
    {
        Assert.Equal(thickness, Grade(name).Thickness_mm.Value);
        Assert.Equal(wattsPerPound / 0.45359237, Grade(name).GuaranteedLoss(1.5, 60)!.Value, 12);
        Assert.Null(Grade(name).GuaranteedLoss(1.5, 50));
    }

    [Theory]
    [MemberData(nameof(Names))]
    public void Every_figure_says_where_it_comes_from(string name)
    {
        string[] standings = [FigureStanding.Read, FigureStanding.FromMemory, FigureStanding.FromMemoryDoubtful, FigureStanding.Derived];
        var g = Grade(name);
        SourcedFigure?[] figures =
        [
            g.Thickness_mm, g.Density_kg_per_m3, g.Resistivity_ohm_m, g.SaturationPolarization_T, g.MinimumStackingFactor, g.Polarization800_T,
            .. g.LossAnchors.Select(a => a.Loss_W_per_kg),
        ];
        Assert.All(figures, f => Assert.True(f is { Source.Length: > 5 } && standings.Contains(f.Standing), f?.ToString()));
        Assert.Equal("representative", g.Standing);
        Assert.Equal("Representative curve, shaped to pass the guaranteed points; replace by your certificate before you quote.", g.StandingText);
    }

    [Fact]
    public void Unknown_name_gets_the_nearest_ones()
    {
        Assert.False(SteelLibrary.TryFind("M105-30", out _));
        Assert.Equal("M105-30P", SteelLibrary.Nearest("M105-30", 3)[0]);
        Assert.Equal(3, SteelLibrary.Nearest(new string('x', 100_000), 3).Count);
        Assert.True(SteelLibrary.TryFind(" m105-30p ", out var grade));
        Assert.Equal("M105-30P", grade.Name);
    }

    [Theory]
    [InlineData("M120-23S", "M110-23S")]
    [InlineData("M111-30P", "M105-30P")]
    [InlineData("M-6", "M155-35S")]
    [InlineData("M097-30N", "M140-30S (1995 ed.)")]
    [InlineData("M80-23P (domain refined)", null)]
    public void Next_better_steel_is_the_nearest_lower_loss_at_like_thickness(string name, string? expected)
    {
        Assert.Equal(expected, SteelLibrary.NextBetter(Grade(name))?.Name);
    }

    [Fact]
    public void Works_steel_enters_catalog_and_revision()
    {
        var own = Grade("M105-30P") with { Name = "Coil 4711", Generation = "works", Class = "works" };
        var catalog = new SteelCatalog([own]);
        Assert.True(catalog.TryFind("coil 4711", out _));
        Assert.NotEqual(SteelLibrary.Revision, catalog.Revision);
        Assert.NotEqual(catalog.Revision, new SteelCatalog([own with { Density_kg_per_m3 = new(7651, "x", "works") }]).Revision);
        Assert.Equal(SteelLibrary.Revision, new SteelCatalog([]).Revision);
        Assert.Throws<ArgumentException>(() => new SteelCatalog([own with { Name = "m105-30p" }]));
    }

    [Fact]
    public void Grade_survives_a_round_trip_through_json()
    {
        var grade = Grade("M105-30P");
        var again = JsonSerializer.Deserialize<SteelGrade>(JsonSerializer.Serialize(grade))!;
        Assert.Equal(SteelCatalog.RevisionOf(grade), SteelCatalog.RevisionOf(again));
        Assert.Equal(grade.StandingText, again.StandingText);
    }
}
