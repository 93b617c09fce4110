using System.Net;
using System.Text.Json;
using System.Text.Json.Nodes;
using CoreDesign.Web.Tests.Designs;

namespace CoreDesign.Web.Tests.Estimates;

public sealed class EstimatesApiTests(Service service) : IClassFixture<Service>
{
    /// <summary>The members that others rely on, written out from the published contract; an entry of a list stands for every entry.</summary>
    private const string Answer = """
        { "noLoadLoss_W": 0, "noLoadCurrent_percent": 0, "noLoadCurrent_A": 0, "excitingPower_VA": 0, "powerFactor": 0,
          "lines": [ { "phase": "A", "rms_A": 0, "peak_A": 0, "harmonics": [ { "order": 1, "rms_A": 0, "phase_deg": 0 } ], "waveform_A": [ 0 ] } ],
          "parts": [ { "name": "limbA", "kind": "limb", "count": 1, "area_mm2": 0, "length_mm": 0, "mass_kg": 0, "peakFluxDensity_T": 0, "loss_W": 0, "excitingPower_VA": 0 } ],
          "mass_kg": { "limbs": 0, "yokes": 0, "corners": 0, "total": 0 },
          "margin": { "atRated_percent": 0, "atHighest_percent": 0, "definition": "..." },
          "energyBalance": { "terminal_W": 0, "material_W": 0, "relativeError": 0 },
          "inputs": { }, "warnings": [ ], "sources": [ ], "kernelVersion": "...", "steelDataRevision": "..." }
        """;

    private readonly HttpClient _client = service.CreateClient();

    private static CancellationToken Cancel => TestContext.Current.CancellationToken;

    [Fact]
    public async Task Estimate_answers_with_the_members_of_the_contract()
    {
        var answer = await EstimateAsync(JsonCase.Estimate);

        Shape.Holds(JsonNode.Parse(Answer)!, answer, "$");
        Assert.Equal(["A", "B", "C"], answer.GetProperty("lines").EnumerateArray().Select(l => l.GetProperty("phase").GetString()));
    }

    [Fact]
    public async Task Figures_agree_with_one_another_by_their_definitions()
    {
        var answer = await EstimateAsync(JsonCase.Estimate);

        double Of(string name) => answer.GetProperty(name).GetDouble();
        var mean = answer.GetProperty("lines").EnumerateArray().Average(l => l.GetProperty("rms_A").GetDouble());
        Close(mean, Of("noLoadCurrent_A"));
        Close(100 * mean / (1_000_000 / (Math.Sqrt(3) * 400)), Of("noLoadCurrent_percent"));
        Close(Math.Sqrt(3) * 400 * mean, Of("excitingPower_VA"));
        Close(answer.GetProperty("energyBalance").GetProperty("terminal_W").GetDouble() / Of("excitingPower_VA"), Of("powerFactor"));
        Assert.InRange(answer.GetProperty("energyBalance").GetProperty("relativeError").GetDouble(), 0, 1e-3);
        var mass = answer.GetProperty("mass_kg");
        Close(mass.GetProperty("limbs").GetDouble() + mass.GetProperty("yokes").GetDouble() + mass.GetProperty("corners").GetDouble(), mass.GetProperty("total").GetDouble());
        Close(mass.GetProperty("total").GetDouble(), answer.GetProperty("parts").EnumerateArray().Sum(p => p.GetProperty("count").GetInt32() * p.GetProperty("mass_kg").GetDouble()));
        Close(Of("noLoadLoss_W"), answer.GetProperty("parts").EnumerateArray().Sum(p => p.GetProperty("loss_W").GetDouble()));

        // Net steel in the limb: 166 mm of plates, widths as given, times the stacking factor.
        var limb = answer.GetProperty("parts").EnumerateArray().First(p => p.GetProperty("name").GetString() == "limbA");
        Close(0.965 * ((210 * 62) + (180 * 60) + (140 * 44)), limb.GetProperty("area_mm2").GetDouble());
    }

    [Fact]
    public async Task Answer_repeats_every_value_that_was_sent_and_fills_what_was_left_out()
    {
        var inputs = (await EstimateAsync(JsonCase.Estimate)).GetProperty("inputs");

        var sent = JsonNode.Parse(JsonCase.Estimate)!;
        foreach (var path in JsonCase.Leaves(sent)) Assert.Equal(At(JsonDocument.Parse(JsonCase.Estimate).RootElement, path), At(inputs, path));

        var bare = JsonNode.Parse(JsonCase.Estimate)!.AsObject();
        bare.Remove("model");
        bare["order"]!.AsObject().Remove("highestVoltage_percent");
        bare["core"]!.AsObject().Remove("yoke");
        var answer = await EstimateAsync(bare.ToJsonString());
        foreach (var path in new[] { "model.buildingFactor", "model.temperature_C", "order.highestVoltage_percent", "core.yoke.areaFactor" }) Assert.NotEqual("", At(answer.GetProperty("inputs"), path));
        Assert.Contains("model.buildingFactor", answer.GetProperty("derived").EnumerateArray().Select(d => d.GetString()));
    }

    [Theory]
    [InlineData("joint", """{ "type": "stepLap", "positions": 5, "effectiveGap_mm": 0.02 }""")]
    [InlineData("joint", """{ "type": "mitredOverlap" }""")]
    [InlineData("joint", """{ "type": "buttLap" }""")]
    [InlineData("excitedWinding.connection", "\"D\"")]
    [InlineData("excitedWinding.connection", "\"Y\"")]
    [InlineData("excitedWinding.resistance_ohm", "-0")]
    [InlineData("order.reference", "\"<b>&</b>\"")]
    [InlineData("steel", """{ "data": { "name": "Own", "thickness_mm": 0.27, "density_kg_m3": 7650, "resistivity_ohm_m": 4.8e-7, "saturationPolarization_T": 2.03, "magnetization": [ { "B_T": 0.2, "H_A_m": 4.5 }, { "B_T": 0.5, "H_A_m": 9 }, { "B_T": 1, "H_A_m": 15.5 }, { "B_T": 1.3, "H_A_m": 22 }, { "B_T": 1.5, "H_A_m": 33 }, { "B_T": 1.6, "H_A_m": 46 }, { "B_T": 1.7, "H_A_m": 82 }, { "B_T": 1.8, "H_A_m": 215 }, { "B_T": 1.88, "H_A_m": 790 }, { "B_T": 1.95, "H_A_m": 2400 } ], "loss": [ { "frequency_Hz": 50, "points": [ { "B_T": 0.5, "W_kg": 0.091 }, { "B_T": 1, "W_kg": 0.335 }, { "B_T": 1.3, "W_kg": 0.56 }, { "B_T": 1.5, "W_kg": 0.756 }, { "B_T": 1.7, "W_kg": 1.05 } ] } ] } }""")]
    public async Task Variants_of_the_contract_are_estimated(string path, string raw) =>
        Shape.Holds(JsonNode.Parse(Answer)!, await EstimateAsync(JsonCase.With(JsonCase.Estimate, path, raw)), "$");

    [Fact]
    public async Task Circle_with_steps_or_stock_widths_stands_for_typed_steps()
    {
        foreach (var limb in new[] { """{ "diameter_mm": 220, "steps": 7 }""", """{ "diameter_mm": 220, "stockWidths_mm": [ 210, 200, 180, 160, 130, 100, 70 ] }""" })
        {
            var body = JsonNode.Parse(JsonCase.Estimate)!;
            body["core"]!.AsObject().Remove("limbSteps");
            body["core"]!["limb"] = JsonNode.Parse(limb);
            Assert.True((await EstimateAsync(body.ToJsonString())).GetProperty("noLoadLoss_W").GetDouble() > 0);
        }
    }

    [Fact]
    public async Task Same_design_gives_the_same_bytes_also_at_the_same_moment()
    {
        var answers = await Task.WhenAll(Enumerable.Range(0, 20).Select(_ => Task.Run(async () =>
            Convert.ToHexString(await (await _client.PostJsonAsync("/api/estimates", JsonCase.Estimate)).Content.ReadAsByteArrayAsync(Cancel)), Cancel)));

        Assert.Single(answers.Distinct(StringComparer.Ordinal));
        Assert.NotEqual(answers[0], Convert.ToHexString(await (await _client.PostJsonAsync("/api/estimates", JsonCase.With(JsonCase.Estimate, "joint.gap_mm", "0.31"))).Content.ReadAsByteArrayAsync(Cancel)));
    }

    [Fact]
    public async Task Study_holds_the_estimate_its_voltage_curve_and_solved_changes()
    {
        var study = await (await _client.PostJsonAsync("/api/studies", JsonCase.Estimate)).ReadAsync(HttpStatusCode.OK);

        Assert.Equal((await EstimateAsync(JsonCase.Estimate)).GetRawText(), study.GetProperty("estimate").GetRawText());
        Assert.True(study.GetProperty("voltageCurve").GetArrayLength() > 5);
        foreach (var point in study.GetProperty("voltageCurve").EnumerateArray()) Assert.True(point.GetProperty("noLoadLoss_W").GetDouble() > 0);
        Assert.NotEmpty(study.GetProperty("levers").EnumerateArray());
        var lever = study.GetProperty("levers")[0];
        var changed = await EstimateAsync(lever.GetProperty("design").GetRawText());
        var loss = changed.GetProperty("noLoadLoss_W").GetDouble() - study.GetProperty("estimate").GetProperty("noLoadLoss_W").GetDouble();
        Assert.Equal(loss, lever.GetProperty("lossChange_W").GetDouble(), 1e-6);
    }

    private async Task<JsonElement> EstimateAsync(string body) => await (await _client.PostJsonAsync("/api/estimates", body)).ReadAsync(HttpStatusCode.OK);

    private static string At(JsonElement element, string path)
    {
        foreach (var step in path.Replace("[", ".[", StringComparison.Ordinal).Split('.'))
            element = step[0] == '[' ? element[int.Parse(step.Trim('[', ']'), System.Globalization.CultureInfo.InvariantCulture)] : element.GetProperty(step);
        return element.ValueKind == JsonValueKind.Number ? element.GetDouble().ToString("R", System.Globalization.CultureInfo.InvariantCulture) : element.GetString()!;
    }

    private static void Close(double expected, double found) => Assert.Equal(1, found / expected, 1e-9);
}
