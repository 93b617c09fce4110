using System.Net;
using System.Text.Json;
using System.Text.Json.Nodes;
using CoreDesign.Web.Tests.Designs;

namespace CoreDesign.Web.Tests.Estimates;

/// <summary>Hostile and mistaken values at the door of the circuits.</summary>
public sealed class CircuitsRefusalTests(Service service) : IClassFixture<Service>
{
    private readonly HttpClient _client = service.CreateClient();

    public static TheoryData<string> Numbers() =>
        [.. JsonCase.Leaves(JsonNode.Parse(JsonCase.Circuit)).Where(p => JsonNode.Parse(JsonCase.Circuit) is { } root && Leaf(root, p).GetValueKind() == JsonValueKind.Number)];

    [Fact]
    public void Sample_has_numbers() => Assert.Equal(8, Numbers().Count);

    [Theory]
    [MemberData(nameof(Numbers))]
    public async Task Number_that_is_none_or_out_of_range_is_refused_by_its_path(string path)
    {
        foreach (var raw in new[] { "1e308", "-1e308", "1e999", "-1", "\"5\"", "[]", "{}", "true", "\"\\ud800\"" }.Where(r => r != "-1" || !path.EndsWith("turns", StringComparison.Ordinal)))
            Assert.NotEqual("", (await RefusedAsync(path, raw)).Error(path));

        // A length or gap of nothing is a junction without reluctance; the format allows it.
        foreach (var raw in new[] { "0", "-0", "1e-400", "5e-324" }.Where(_ => !path.EndsWith(".length", StringComparison.Ordinal) && !path.EndsWith(".gap", StringComparison.Ordinal)))
            Assert.NotEqual("", (await RefusedAsync(path, raw)).Error(path));
        foreach (var raw in new[] { "NaN", "Infinity", "-Infinity", "+1", "1,5" })
            Assert.Contains("not JSON", (await RefusedAsync(path, raw)).Error("$"), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("frequency", "null", "frequency", "missing")]
    [InlineData("frequency", "-50", "frequency", "-50 is outside 1 to 1000")]
    [InlineData("supply", "null", "supply", "missing")]
    [InlineData("supply.connection", "\"YD\"", "supply.connection", "Write single, YN, Y or D")]
    [InlineData("supply.connection", "null", "supply.connection", "Write single, YN, Y or D")]
    [InlineData("supply.connection", "\"YN\"", "windings", "Connection YN needs one winding of phase A; there are 0")]
    [InlineData("supply.connection", "\"D\"", "windings[0].phase", "Write A, B, C or closed")]
    [InlineData("format", "\"magnet-network-case/2\"", "format", "Write magnet-network-case/1")]
    [InlineData("rated_kVA", "0", "rated_kVA", "0 is outside 0.001 to")]
    [InlineData("materials.core", "null", "materials.core", "Give mu_r, or B and H")]
    [InlineData("materials.core", "{}", "materials.core", "or give mu_r")]
    [InlineData("materials.core", """{"mu_r":1,"B":[1],"H":[1]}""", "materials.core", "not both")]
    [InlineData("materials.core", """{"B":[1,2],"H":[1]}""", "materials.core", "B (2 values) and H (1 values)")]
    [InlineData("materials.core", """{"B":[1,1],"H":[1,2]}""", "materials.core", "must rise")]
    [InlineData("materials.core", """{"B":[1,2],"H":[2,1]}""", "materials.core", "must rise")]
    [InlineData("materials.core", """{"B":[-1,2],"H":[-2,1]}""", "materials.core", "must rise")]
    [InlineData("materials.core", """{"mu_r":100,"sigma":2e6}""", "materials.core", "needs both sigma and d")]
    [InlineData("materials.core", """{"mu_r":100,"stops":[{"r":-1,"w":1}]}""", "materials.core.stops[0].r", "-1 is outside")]
    [InlineData("materials.core", """{"mu_r":100,"stops":[null]}""", "materials.core.stops[0]", "null")]
    [InlineData("materials", """{"\ud800":{}}""", "materials", "half of a surrogate pair")]
    [InlineData("materials", """{"core":{"mu_r":2},"core":{"mu_r":3}}""", "materials.core", "given twice")]
    [InlineData("materials", "[]", "materials", "A list is given")]
    [InlineData("branches[0].material", "\"iron\"", "branches[0].material", "among the materials (core)")]
    [InlineData("branches[0].length", "null", "branches[0].length", "has a material but no length")]
    [InlineData("branches[0].name", "null", "branches[0].name", "missing")]
    [InlineData("branches[1].name", "\"core\"", "branches[1].name", "used twice")]
    [InlineData("branches[0].to", "\"p\"", "branches[0]", "two different nodes")]
    [InlineData("branches[1].gap", "null", "branches[1]", "has no length, gap or reluctance")]
    [InlineData("branches[1].gap", "-0.001", "branches[1].gap", "-0.001 is outside 0 to 10")]
    [InlineData("branches[1]", "null", "branches[1]", "null is given")]
    [InlineData("branches", "[]", "branches", "give 1 to 200")]
    [InlineData("windings", "[]", "windings", "give 1 to 12")]
    [InlineData("windings[0].phase", "\"X\"", "windings[0].phase", "Write S, A, B, C or closed")]
    [InlineData("windings[0].phase", "\"closed\"", "windings", "needs one winding of phase S; there are 0")]
    [InlineData("windings[0].coils", "[]", "windings[0].coils", "has no coil")]
    [InlineData("windings[0].coils[0].branch", "\"nowhere\"", "windings[0].coils[0].branch", "does not exist")]
    [InlineData("windings[0].coils[0].turns", "1e-300", "windings[0].coils[0].turns", "0.001 to 1000000 turns")]
    [InlineData("windings[0].coils[0].turns", "null", "windings[0].coils[0].turns", "Nothing is given")]
    [InlineData("windings[0].R", "-1", "windings[0].R", "-1 is outside 0 to")]
    [InlineData("expected", "{}", "expected", "'expected' is not a member here")]
    [InlineData("Frequency", "50", "Frequency", "Did you mean 'frequency'?")]
    public async Task Circuit_that_does_not_fit_is_refused_by_path_with_the_mend(string path, string raw, string errorPath, string message) =>
        Assert.Contains(message, (await RefusedAsync(path, raw)).Error(errorPath), StringComparison.Ordinal);

    [Theory]
    [InlineData("0")]
    [InlineData("-1")]
    [InlineData("254")]
    [InlineData("257")]
    [InlineData("4098")]
    [InlineData("384.0")]
    [InlineData("1e3")]
    [InlineData("NaN")]
    [InlineData("")]
    [InlineData("99999999999999999999")]
    [InlineData("%00")]
    [InlineData("%D9%A3%D9%A8%D9%A4")]
    [InlineData("384&pointsPerPeriod=512")]
    public async Task Points_per_period_out_of_range_are_refused(string given)
    {
        var problem = await (await _client.PostJsonAsync("/api/circuits?pointsPerPeriod=" + given, JsonCase.Circuit)).ReadAsync(HttpStatusCode.BadRequest);

        Assert.Contains("even number from 256 to 4096", problem.Error("pointsPerPeriod"), StringComparison.Ordinal);
    }

    [Fact]
    public async Task Names_of_100000_characters_are_refused_without_being_repeated()
    {
        var name = $"\"{new string('x', 100_000)}\"";
        foreach (var path in new[] { "format", "supply.connection", "branches[0].name", "branches[0].from", "branches[0].material", "windings[0].name", "windings[0].phase", "windings[0].coils[0].branch" })
        {
            var message = (await RefusedAsync(path, name)).Error(path);
            Assert.True(message.Length < 300, $"{path}: {message.Length} characters");
        }

        Assert.Contains("100000 characters", (await RefusedAsync("materials", $$"""{ {{name}}: {"mu_r":2} }""")).Error("materials"), StringComparison.Ordinal);
    }

    [Fact]
    public async Task Lists_longer_than_a_circuit_needs_are_refused_by_their_length()
    {
        Assert.Contains("101 stops", (await RefusedAsync("materials.core", $$"""{"mu_r":100,"stops":{{Many("""{"r":0.1,"w":1}""", 101)}}}""")).Error("materials.core.stops"), StringComparison.Ordinal);
        Assert.Contains("20000 coils", (await RefusedAsync("windings[0].coils", Many("""{"branch":"core","turns":1}""", 20_000))).Error("windings[0].coils"), StringComparison.Ordinal);
        Assert.Contains("5000 materials", (await RefusedAsync("materials", $"{{{string.Join(',', Enumerable.Range(0, 5000).Select(i => $"\"m{i}\":null"))}}}")).Error("materials"), StringComparison.Ordinal);
        Assert.Contains("1 to 2000", (await RefusedAsync("materials.core", $$"""{"B":{{Many("1", 20_000)}},"H":{{Many("1", 20_000)}}}""")).Error("materials.core"), StringComparison.Ordinal);
        Assert.True((await RefusedAsync("branches", Many("{}", 200))).GetProperty("errors").EnumerateObject().Count() <= 101);
    }

    private static string Many(string entry, int count) => $"[{string.Join(',', Enumerable.Repeat(entry, count))}]";

    private static JsonNode Leaf(JsonNode root, string path)
    {
        foreach (var step in path.Replace("[", ".[", StringComparison.Ordinal).Split('.'))
            root = (step[0] == '[' ? root[int.Parse(step.Trim('[', ']'), System.Globalization.CultureInfo.InvariantCulture)] : root[step])!;
        return root;
    }

    private async Task<JsonElement> RefusedAsync(string path, string raw) =>
        await (await _client.PostJsonAsync("/api/circuits", JsonCase.With(JsonCase.Circuit, path, raw))).ReadAsync(HttpStatusCode.BadRequest);
}
