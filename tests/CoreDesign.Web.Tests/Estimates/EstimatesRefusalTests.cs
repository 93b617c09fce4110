using System.Net;
using System.Text.Json;
using System.Text.Json.Nodes;
using CoreDesign.Estimating.Fields;
using CoreDesign.Web.Tests.Designs;

namespace CoreDesign.Web.Tests.Estimates;

/// <summary>Hostile and mistaken values at the door of the estimates.</summary>
public sealed class EstimatesRefusalTests(Service service) : IClassFixture<Service>
{
    private const string HalfPair = "\"\\ud800\"";
    private static readonly string Long = $"\"{new string('x', 100_000)}\"";
    private readonly HttpClient _client = service.CreateClient();

    public static TheoryData<string> Numbers() =>
        [.. JsonCase.Leaves(JsonNode.Parse(JsonCase.Estimate)).Where(p => FieldCatalog.TryFind(p) is not null)];

    public static TheoryData<string> Texts() =>
        [.. JsonCase.Leaves(JsonNode.Parse(JsonCase.Estimate)).Where(p => FieldCatalog.TryFind(p) is null)];

    [Fact]
    public void Sample_has_numbers_and_texts()
    {
        Assert.Equal(25, Numbers().Count);
        Assert.Equal(5, Texts().Count);
    }

    [Theory]
    [MemberData(nameof(Numbers))]
    public async Task Number_that_is_none_or_out_of_range_is_refused_by_its_path(string path)
    {
        var field = FieldCatalog.Find(path);
        foreach (var raw in new[] { "1e308", "-1e308", "1e999", "-99", "\"5\"", "\"\"", "[]", "[1]", "{}", "true", HalfPair, "12345678901234567890" })
        {
            var problem = await RefusedAsync(path, raw);
            Assert.NotEqual("", problem.Error(path));
        }

        foreach (var raw in new[] { "1e308", "-1e308", "-99" }.Where(_ => !field.Whole))
        {
            var message = (await RefusedAsync(path, raw)).Error(path);
            Assert.Contains(field.Label, message, StringComparison.Ordinal);
            Assert.Contains(raw.ToUpperInvariant().Replace("E3", "E+3", StringComparison.Ordinal), message, StringComparison.Ordinal);
            Assert.Contains(field.Range, message, StringComparison.Ordinal);
        }

        foreach (var raw in new[] { "NaN", "Infinity", "-Infinity", "+1", ".5", "1,5", "0x10", "1e" })
            Assert.Contains("$", Paths(await RefusedAsync(path, raw)));
    }

    [Theory]
    [MemberData(nameof(Texts))]
    public async Task Text_that_is_none_or_unknown_is_refused_by_its_path(string path)
    {
        foreach (var raw in new[] { "5", "[]", "{}", "true", HalfPair, Long, "\"\\u0000\"", "\"a\\u202Eb\"" })
        {
            var problem = await RefusedAsync(path, raw);
            Assert.True(problem.Error(path).Length < 400, problem.Error(path));
        }
    }

    [Theory]
    [InlineData("order.ratedPower_kVA", "null")]
    [InlineData("order.frequency_Hz", "null")]
    [InlineData("excitedWinding", "null")]
    [InlineData("steel", "null")]
    [InlineData("core", "null")]
    [InlineData("joint", "null")]
    [InlineData("core.windowHeight_mm", "null")]
    [InlineData("core.limbSteps[1]", "null")]
    [InlineData("core.limbSteps[1].stack_mm", "null")]
    [InlineData("core.limbSteps", "[]")]
    public async Task What_is_missing_is_named(string path, string raw) =>
        Assert.Contains(Paths(await RefusedAsync(path, raw)), p => p.StartsWith(path.Split('[')[0].Replace("limbSteps", "limb", StringComparison.Ordinal), StringComparison.Ordinal));

    [Theory]
    [InlineData("core.windowHigh_mm", "1", "core.windowHigh_mm", "Did you mean 'windowHeight_mm'?")]
    [InlineData("Order", "{}", "Order", "Did you mean 'order'?")]
    [InlineData("$type", "\"System.IO.FileInfo\"", "$type", "Known members")]
    [InlineData("__proto__", "{}", "__proto__", "Known members")]
    [InlineData("core.limb", """{ "diameter_mm": 220, "steps": 7 }""", "core.limb", "not both")]
    [InlineData("core.form", "\"sevenLimb\"", "core.form", "threeLimb, fiveLimb, singlePhaseTwoLimb, singlePhaseThreeLimb or singlePhaseFourLimb")]
    [InlineData("order.phases", "2", "order.phases", "Give 1 or 3")]
    [InlineData("order.phases", "1", "order.phases", "does not fit the core form")]
    [InlineData("excitedWinding.connection", "\"single\"", "excitedWinding.connection", "Give YN, Y or D")]
    [InlineData("steel.grade", "\"M105-30Q\"", "steel.grade", "M105-30P")]
    [InlineData("steel.data", "{}", "steel.grade", "not both")]
    [InlineData("core.limbSteps[1].width_mm", "210", "core.limbSteps[1].width_mm", "not below 210 mm")]
    [InlineData("core.limbSteps[1].width_mm", "300", "core.limbSteps[1].width_mm", "from the widest outward")]
    [InlineData("core.yoke.areaFactor", "0.5", "core.yoke.areaFactor", "too low for the points of the middle limb")]
    [InlineData("core.yoke", """{ "stepWidths_mm": [ 200 ] }""", "core.yoke.stepWidths_mm", "1 yoke widths for 3 limb steps")]
    [InlineData("core.limbPitch_mm", "395", "core.limbPitch_mm", "do not agree")]
    [InlineData("joint", """{ "type": "buttLap", "positions": 3 }""", "joint.positions", "Give 2, or choose stepLap")]
    [InlineData("joint", """{ "type": "stepLap", "positions": 12, "overlap_mm": 30 }""", "joint.overlap_mm", "330 mm")]
    [InlineData("joint.positions", "1", "joint.positions", "2 to 12")]
    [InlineData("joint.effectiveGap_mm", "6", "joint.effectiveGap_mm", "0 to 5 mm")]
    public async Task Design_that_does_not_fit_together_is_refused_with_the_mend(string path, string raw, string errorPath, string message) =>
        Assert.Contains(message, (await RefusedAsync(path, raw)).Error(errorPath), StringComparison.Ordinal);

    [Fact]
    public async Task Lists_longer_than_a_works_could_mean_are_refused_by_their_length()
    {
        Assert.Contains("at most 60", (await RefusedAsync("core.limbSteps", List(10_000, i => $$"""{"width_mm":{{2000 - (i * 0.1)}},"stack_mm":0.2}"""))).Error("core.limbSteps"), StringComparison.Ordinal);
        Assert.Contains("at most 6", (await RefusedAsync("order.ratedVoltages_kV", List(50_000, _ => "11"))).Error("order.ratedVoltages_kV"), StringComparison.Ordinal);
        var stock = JsonNode.Parse(JsonCase.Estimate)!;
        stock["core"]!.AsObject().Remove("limbSteps");
        var body = JsonCase.With(stock.ToJsonString(), "core.limb", $$"""{"diameter_mm":220,"stockWidths_mm":{{List(50_000, _ => "-1")}}}""");
        Assert.Contains("at most 500", (await (await _client.PostJsonAsync("/api/estimates", body)).ReadAsync(HttpStatusCode.BadRequest)).Error("core.limb.stockWidths_mm"), StringComparison.Ordinal);
        Assert.Contains("at most 500", (await RefusedAsync("steel", $$"""{"data":{"name":"own","thickness_mm":0.27,"magnetization":{{List(20_000, _ => """{"B_T":1,"H_A_m":1}""")}},"loss":[] } }""")).Error("steel.data.magnetization"), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("excitedWinding.turns", "1")]
    [InlineData("excitedWinding.lineVoltage_V", "400000")]
    [InlineData("order.frequency_Hz", "10")]
    public async Task Core_far_above_saturation_is_answered_422_with_its_flux_density_and_the_mend(string path, string raw)
    {
        var problem = await (await _client.PostJsonAsync("/api/estimates", JsonCase.With(JsonCase.Estimate, path, raw))).ReadAsync(HttpStatusCode.UnprocessableEntity);

        Assert.Contains("the steel saturates at 2.03 T", problem.GetProperty("detail").GetString(), StringComparison.Ordinal);
        Assert.Contains("Take more turns", problem.GetProperty("detail").GetString(), StringComparison.Ordinal);
    }

    [Fact]
    public async Task Core_somewhat_above_saturation_is_answered_with_a_warning()
    {
        var answer = await (await _client.PostJsonAsync("/api/estimates", JsonCase.With(JsonCase.Estimate, "excitedWinding.turns", "14"))).ReadAsync(HttpStatusCode.OK);

        Assert.Contains(answer.GetProperty("warnings").EnumerateArray(), w => w.GetProperty("key").GetString() == "saturation");
        Assert.True(answer.GetProperty("margin").GetProperty("atHighest_percent").GetDouble() < 0);
    }

    [Fact]
    public async Task Every_error_of_a_body_is_told_at_once()
    {
        var problem = await (await _client.PostJsonAsync("/api/estimates", """{"order":{"phases":"3","rating":5},"steal":{},"core":{"windowWidth_mm":false}}""")).ReadAsync(HttpStatusCode.BadRequest);

        Assert.Equal(["core.windowWidth_mm", "order.phases", "order.rating", "steal"], Paths(problem).Order(StringComparer.Ordinal));
        Assert.Contains("4 fields", problem.GetProperty("detail").GetString(), StringComparison.Ordinal);
    }

    private static string List(int count, Func<int, string> entry) =>
        "[" + string.Join(',', Enumerable.Range(0, count).Select(i => FormattableString.Invariant($"{entry(i)}"))) + "]";

    private static List<string> Paths(JsonElement problem) => [.. problem.GetProperty("errors").EnumerateObject().Select(e => e.Name)];

    private async Task<JsonElement> RefusedAsync(string path, string raw) =>
        await (await _client.PostJsonAsync("/api/estimates", JsonCase.With(JsonCase.Estimate, path, raw))).ReadAsync(HttpStatusCode.BadRequest);
}
