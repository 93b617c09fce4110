using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Demo;
using CoreDesign.Estimating.Fields;
using CoreDesign.Estimating.Steels;

namespace CoreDesign.Estimating.Tests.Demo;

public sealed class DemoOrdersTests
{
    // Gross stack over circle of the optimum step set; the closed form for 1 and 2 steps is common knowledge, the others
    // were computed once outside this program by coordinate ascent.
    private static readonly Dictionary<int, double> FillRatio = new() { [5] = 0.907897, [6] = 0.922842, [7] = 0.933668, [15] = 0.968958 };

    public static TheoryData<string> Keys => [.. DemoOrders.All.Select(o => o.Key)];

    [Fact]
    public void Demo_orders_span_25_kVA_single_phase_to_100_MVA_five_limb_and_say_that_they_are_invented()
    {
        var ratings = DemoOrders.All.Select(o => o.Design.Order!.RatedPower_kVA!.Value).ToList();

        Assert.Equal(ratings.Order(), ratings);
        Assert.Equal((25, 100_000), (ratings[0], ratings[^1]));
        Assert.Equal(["fiveLimb", "singlePhaseThreeLimb", "singlePhaseTwoLimb", "threeLimb"], DemoOrders.All.Select(o => o.Design.Core!.Form).Distinct().Order());
        Assert.Equal(1, DemoOrders.All[0].Design.Order!.Phases);
        Assert.Equal(DemoOrders.All.Count, DemoOrders.All.Select(o => o.Key).Distinct().Count());
        Assert.Equal(DemoOrders.All.Count, DemoOrders.All.Select(o => o.Design.Steel!.Grade).Distinct().Count());
        Assert.Equal(["buttLap", "mitredOverlap", "stepLap"], DemoOrders.All.Select(o => o.Design.Joint!.Type).Distinct().Order());
        Assert.All(DemoOrders.All, o => Assert.Contains("invented", o.Note, StringComparison.Ordinal));
        Assert.Null(DemoOrders.TryFind("nothing"));
    }

    /// <summary>Induced voltage of a sine flux, E = (2 pi / sqrt 2) f N A B: a textbook formula.</summary>
    [Theory]
    [MemberData(nameof(Keys))]
    public void Limb_works_between_1_4_and_1_72_tesla(string key)
    {
        var design = DemoOrders.TryFind(key)!.Design;
        var winding = design.ExcitedWinding!;
        var limb = design.Core!.Limb!;
        var phaseVoltage = winding.LineVoltage_V!.Value / (winding.Connection == "YN" ? Math.Sqrt(3) : 1);
        var circle_m2 = Math.PI / 4 * Math.Pow(limb.Diameter_mm!.Value / 1000, 2);
        var net_m2 = circle_m2 * FillRatio[limb.Steps!.Value] * design.Core.StackingFactor!.Value;

        var b = phaseVoltage / (2 * Math.PI / Math.Sqrt(2) * design.Order!.Frequency_Hz!.Value * winding.Turns!.Value * net_m2);

        Assert.InRange(b, 1.4, 1.72);
    }

    [Theory]
    [MemberData(nameof(Keys))]
    public void Steel_is_in_the_library_and_every_number_in_its_fields_range(string key)
    {
        var design = DemoOrders.TryFind(key)!.Design;

        Assert.True(new SteelCatalog([]).TryFind(design.Steel!.Grade, out _), design.Steel.Grade);
        Assert.All(
            Numbers(System.Text.Json.JsonSerializer.SerializeToElement(design, DesignJson.Options), ""),
            n => Assert.InRange(n.Value, FieldCatalog.Find(n.Path).Min, FieldCatalog.Find(n.Path).Max));
    }

    private static IEnumerable<(string Path, double Value)> Numbers(System.Text.Json.JsonElement element, string path) => element.ValueKind switch
    {
        System.Text.Json.JsonValueKind.Object => element.EnumerateObject().SelectMany(m => Numbers(m.Value, path.Length == 0 ? m.Name : $"{path}.{m.Name}")),
        System.Text.Json.JsonValueKind.Array => element.EnumerateArray().SelectMany((e, i) => Numbers(e, $"{path}[{i}]")),
        System.Text.Json.JsonValueKind.Number => [(path, element.GetDouble())],
        _ => [],
    };
}
