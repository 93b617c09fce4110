using System.Net;
using System.Text.Json;
using System.Text.Json.Nodes;
using CoreDesign.Web.Tests.Designs;

namespace CoreDesign.Web.Tests.Estimates;

public sealed class CircuitsApiTests(Service service) : IClassFixture<Service>
{
    private readonly HttpClient _client = service.CreateClient();

    [Theory]
    [InlineData("g05_1ph_two_limb_25kVA")]
    [InlineData("g07_3limb_YN_250kVA")]
    [InlineData("g08_3limb_Y_noair")]
    [InlineData("g10_3limb_D")]
    public async Task Answer_has_every_member_of_the_expected_block(string name)
    {
        var (body, expected) = Load(name);

        var answer = await SolveAsync(body);

        Shape.Holds(expected, answer, "$");
        foreach (var current in answer.GetProperty("windings").EnumerateObject())
            Assert.Equal(Enumerable.Range(1, 13).Select(h => $"{h}"), current.Value.GetProperty("harmonics").EnumerateObject().Select(h => h.Name));
        foreach (var wave in answer.GetProperty("waveforms").GetProperty("i").EnumerateObject()) Assert.Equal(96, wave.Value.GetArrayLength());
    }

    [Fact]
    public async Task Linear_ring_with_a_gap_draws_the_current_of_its_reluctance()
    {
        // I = U / (w L), L = N² / R, R = l/(mu0 mur A) + g/(mu0 A): linear magnetic circuit.
        const double Mu0 = 1.25663706212e-6;
        var reluctance = (0.8 / (Mu0 * 2000 * 0.003)) + (0.001 / (Mu0 * 0.003));
        var current = 230 * reluctance / (2 * Math.PI * 50 * 200 * 200);

        var answer = await SolveAsync(JsonCase.Circuit);

        Assert.Equal(1, answer.GetProperty("windings").GetProperty("W").GetProperty("rms").GetDouble() / current, 1e-6);
        Assert.Equal(1, answer.GetProperty("apparent_VA").GetDouble() / (230 * current), 1e-6);
        Assert.Equal(1, answer.GetProperty("B_peak").GetProperty("gap").GetDouble() / (Math.Sqrt(2) * 230 / (2 * Math.PI * 50 * 200 * 0.003)), 1e-6);
    }

    [Fact]
    public async Task Points_per_period_change_nothing_in_a_linear_circuit()
    {
        var coarse = await SolveAsync(JsonCase.Circuit, "?pointsPerPeriod=256");
        var fine = await SolveAsync(JsonCase.Circuit, "?pointsPerPeriod=4096");

        Assert.Equal(1, coarse.GetProperty("mean_line_rms").GetDouble() / fine.GetProperty("mean_line_rms").GetDouble(), 1e-9);
    }

    [Fact]
    public async Task Isolated_star_without_an_air_path_has_line_currents_that_add_to_nothing()
    {
        var answer = await SolveAsync(Load("g08_3limb_Y_noair").Body);

        var waves = answer.GetProperty("waveforms").GetProperty("i").EnumerateObject().Select(w => w.Value.EnumerateArray().Select(x => x.GetDouble()).ToArray()).ToList();
        var peak = waves.Max(w => w.Max());
        for (var t = 0; t < 96; t++) Assert.Equal(0, waves.Sum(w => w[t]) / peak, 1e-9);
    }

    [Fact]
    public async Task Star_with_neutral_without_an_air_path_is_not_determined()
    {
        var body = JsonNode.Parse(Load("g07_3limb_YN_250kVA").Body)!;
        var branches = body["branches"]!.AsArray();
        branches.Remove(branches.First(b => (string?)b!["name"] == "Z0"));

        Assert.Contains("Add a zero-sequence path", (await UnsolvableAsync(body.ToJsonString())).GetProperty("detail").GetString(), StringComparison.Ordinal);
    }

    [Fact]
    public async Task Largest_circuit_is_solved_and_one_branch_or_winding_more_is_refused()
    {
        Assert.Equal(200, (await SolveAsync(Ring(200, 1))).GetProperty("B_peak").EnumerateObject().Count());
        Assert.Contains("201 branches; give 1 to 200", (await RefusedAsync(Ring(201, 1))).Error("branches"), StringComparison.Ordinal);
        Assert.Contains("13 windings; give 1 to 12", (await RefusedAsync(Ring(20, 13))).Error("windings"), StringComparison.Ordinal);
    }

    [Fact]
    public async Task Html_in_names_comes_back_as_the_text_it_is()
    {
        var answer = await SolveAsync(JsonCase.With(JsonCase.Circuit, "branches[1].name", "\"<script>&\""));

        Assert.True(answer.GetProperty("B_peak").TryGetProperty("<script>&", out _));
        Assert.DoesNotContain("<script>", answer.GetRawText(), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("windings[0].coils", """[{"branch":"core","turns":100},{"branch":"core","turns":-100}]""", "links no flux")]
    [InlineData("branches[1].to", "\"r\"", "no closed loop")]
    public async Task Circuit_without_an_answer_is_answered_422_with_the_reason(string path, string raw, string message) =>
        Assert.Contains(message, (await UnsolvableAsync(JsonCase.With(JsonCase.Circuit, path, raw))).GetProperty("detail").GetString(), StringComparison.Ordinal);

    [Fact]
    public async Task Solve_that_does_not_settle_is_answered_422_with_the_residual()
    {
        var body = JsonCase.With(JsonCase.Circuit, "materials.core", """{"B":[1,1.7,2],"H":[10,80,6000]}""");
        body = JsonCase.With(body, "windings[0].R", "1");

        var problem = await UnsolvableAsync(JsonCase.With(body, "supply.V", "200000"));

        Assert.Contains("did not settle", problem.GetProperty("detail").GetString(), StringComparison.Ordinal);
        Assert.True(problem.GetProperty("residual").GetDouble() > 0);
    }

    [Fact]
    public async Task Steel_driven_far_above_its_table_is_solved_along_the_law_of_the_format()
    {
        // A winding resistance moves the flux far from the first guess: many Newton steps of at most 0.3 T. Beyond the table
        // H = Hn + (B - Bn)/mu0, and N i = l H; hysteresis and eddies are some hundred A/m there, against millions.
        var body = JsonCase.With(Load("g04_loop_hyst_eddy").Body, "windings[0].R", "1");

        var answer = await SolveAsync(JsonCase.With(body, "supply.V", "2000"));

        var B = answer.GetProperty("B_peak").GetProperty("core").GetDouble();
        Assert.True(B > 2.5, $"{B} T");
        var current = 0.85 * (6000 + ((B - 2) / 1.25663706212e-6)) / 200;
        Assert.Equal(1, answer.GetProperty("windings").GetProperty("W").GetProperty("peak").GetDouble() / current, 1e-3);
    }

    private static string Ring(int branches, int windings) => $$"""
        { "frequency": 50, "supply": { "connection": "single", "V": 230 }, "materials": { "m": { "B": [1, 1.7, 2], "H": [10, 80, 6000] } },
          "branches": [ {{string.Join(',', Enumerable.Range(0, branches).Select(i => $$"""{"name":"b{{i}}","from":"n{{i}}","to":"n{{(i + 1) % branches}}","area":0.003,"length":0.005,"material":"m"}"""))}} ],
          "windings": [ {{string.Join(',', Enumerable.Range(0, windings).Select(i => $$"""{"name":"w{{i}}","phase":"{{(i == 0 ? "S" : "closed")}}","coils":[{"branch":"b0","turns":200}]}"""))}} ] }
        """;

    private static (string Body, JsonObject Expected) Load(string name)
    {
        var node = JsonNode.Parse(File.ReadAllText(Path.Combine(AppContext.BaseDirectory, "Reference", name + ".json")))!.AsObject();
        var expected = node["expected"]!.AsObject();
        node.Remove("expected");
        return (node.ToJsonString(), expected);
    }

    private async Task<JsonElement> SolveAsync(string body, string query = "") => await (await _client.PostJsonAsync("/api/circuits" + query, body)).ReadAsync(HttpStatusCode.OK);

    private async Task<JsonElement> RefusedAsync(string body) => await (await _client.PostJsonAsync("/api/circuits", body)).ReadAsync(HttpStatusCode.BadRequest);

    private async Task<JsonElement> UnsolvableAsync(string body) => await (await _client.PostJsonAsync("/api/circuits", body)).ReadAsync(HttpStatusCode.UnprocessableEntity);
}
