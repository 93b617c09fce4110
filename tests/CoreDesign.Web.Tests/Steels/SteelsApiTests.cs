using System.Globalization;
using System.Net;
using System.Text;
using System.Text.Json;
using System.Text.Json.Nodes;
using CoreDesign.Estimating.Steels.Import;
using CoreDesign.Web.Tests.Designs;

namespace CoreDesign.Web.Tests.Steels;

public sealed class SteelsApiTests : IDisposable
{
    private const string Import = "/api/steels/import";
    private readonly Service _service = new();
    private readonly HttpClient _client;

    public SteelsApiTests() => _client = _service.CreateClient();

    private static CancellationToken Cancel => TestContext.Current.CancellationToken;

    public void Dispose()
    {
        _client.Dispose();
        _service.Dispose();
    }

    [Fact]
    public async Task List_gives_every_grade_with_what_is_guaranteed_of_it()
    {
        var list = await _client.GetAsync("/api/steels", HttpStatusCode.OK);

        Shape.Holds(JsonNode.Parse("""{ "steelDataRevision": "x", "steels": [ { "grade": "x", "class": "x", "generation": "x", "thickness_mm": 0.3, "standing": "x" } ] }""")!, list, "$");
        var one = list.GetProperty("steels").EnumerateArray().Single(s => s.GetProperty("grade").GetString() == "M105-30P");

        // IEC 60404-8-7:2017, table of high-permeability grades: 1.05 W/kg at 1.7 T, 50 Hz; 0.30 mm.
        Assert.Equal(1.05, one.GetProperty("loss17T50Hz_W_kg").GetDouble());
        Assert.Equal(0.3, one.GetProperty("thickness_mm").GetDouble());
    }

    [Fact]
    public async Task Every_listed_grade_can_be_opened()
    {
        foreach (var steel in (await _client.GetAsync("/api/steels", HttpStatusCode.OK)).GetProperty("steels").EnumerateArray())
        {
            var grade = steel.GetProperty("grade").GetString()!;
            var whole = await _client.GetAsync("/api/steels/" + Uri.EscapeDataString(grade), HttpStatusCode.OK);
            Assert.Equal(steel.GetRawText(), whole.GetProperty("summary").GetRawText());
            Shape.Holds(JsonNode.Parse("""{ "density_kg_m3": { "value": 1, "source": "x", "standing": "x" }, "rolling": { "magnetization": [ { "B_T": 1, "H_A_m": 1 } ], "loss": [ { "frequency_Hz": 50, "points": [ { "B_T": 1, "W_kg": 1 } ] } ] }, "transverse": { "magnetization": [ { "B_T": 1, "H_A_m": 1 } ] } }""")!, whole, grade);
        }
    }

    [Theory]
    [InlineData("M105-30Q", "M105-30P")]
    [InlineData("%3Cscript%3E", "There is no steel")]
    [InlineData("..%2F..%2Fetc%2Fpasswd", "There is no steel")]
    [InlineData("%0D%0AX-Evil:1", "There is no steel")]
    [InlineData("%F0%9F%98%80", "There is no steel")]
    [InlineData("1'%20OR%20'1'='1", "There is no steel")]
    public async Task Unknown_grade_is_answered_404_with_the_nearest_names(string grade, string message) =>
        Assert.Contains(message, (await _client.GetAsync("/api/steels/" + grade, HttpStatusCode.NotFound)).GetProperty("detail").GetString(), StringComparison.Ordinal);

    [Fact]
    public async Task Long_unknown_grade_is_not_repeated_whole() =>
        Assert.True((await _client.GetAsync("/api/steels/" + new string('x', 5000), HttpStatusCode.NotFound)).GetRawText().Length < 1000);

    [Fact]
    public async Task Template_can_be_imported_as_it_is_in_both_forms()
    {
        foreach (var address in new[] { "/api/steels/import/template.csv", "/api/steels/import/template.csv?decimal=point", "/api/steels/import/template.csv?decimal=comma" })
        {
            var answer = await _client.GetAsync(new Uri(address, UriKind.Relative), Cancel);
            Assert.Equal("text/csv; charset=utf-8", answer.Content.Headers.ContentType!.ToString());
            Assert.Equal("steel-template.csv", answer.Content.Headers.ContentDisposition!.FileName);
            await (await SendAsync(await answer.Content.ReadAsByteArrayAsync(Cancel))).ReadAsync(HttpStatusCode.OK);
        }

        Assert.Contains("point or comma", (await _client.GetAsync("/api/steels/import/template.csv?decimal=both", HttpStatusCode.BadRequest)).Error("decimal"), StringComparison.Ordinal);
    }

    [Fact]
    public async Task Preview_shows_the_steel_and_stores_nothing()
    {
        var before = await CountAsync();

        var preview = await (await SendAsync(Encoding.UTF8.GetBytes(SteelImport.Template))).ReadAsync(HttpStatusCode.OK);

        Assert.False(preview.GetProperty("stored").GetBoolean());
        Assert.Equal("Example steel coil 0001", preview.GetProperty("steel").GetProperty("summary").GetProperty("grade").GetString());
        Assert.Equal(before, await CountAsync());
    }

    [Fact]
    public async Task Committed_steel_is_listed_opened_and_used()
    {
        var before = await CountAsync();

        var answer = await SendAsync(Encoding.UTF8.GetBytes(SteelImport.Template), "?commit=true");
        var stored = await answer.ReadAsync(HttpStatusCode.Created);

        Assert.True(stored.GetProperty("stored").GetBoolean());
        var read = await _client.GetAsync(answer.Headers.Location!.OriginalString, HttpStatusCode.OK);
        Assert.Equal(stored.GetProperty("steel").GetRawText(), read.GetRawText());
        Assert.Equal(before + 1, await CountAsync());
        var estimate = await (await _client.PostJsonAsync("/api/estimates", JsonCase.With(JsonCase.Estimate, "steel.grade", "\"Example steel coil 0001\""))).ReadAsync(HttpStatusCode.OK);
        Assert.Equal("certificate", estimate.GetProperty("steel").GetProperty("standing").GetString());
    }

    [Fact]
    public async Task Same_name_with_other_data_is_answered_409_and_keeps_the_first()
    {
        await (await SendAsync(Encoding.UTF8.GetBytes(SteelImport.Template), "?commit=true")).ReadAsync(HttpStatusCode.Created);
        var before = await _client.GetAsync("/api/steels/Example%20steel%20coil%200001", HttpStatusCode.OK);

        await (await SendAsync(Encoding.UTF8.GetBytes(SteelImport.Template), "?commit=true")).ReadAsync(HttpStatusCode.Created);
        var problem = await (await SendAsync(Changed("thickness_mm,0.3", "thickness_mm,0.27"), "?commit=true")).ReadAsync(HttpStatusCode.Conflict);

        Assert.Contains("a name of their own", problem.GetProperty("detail").GetString(), StringComparison.Ordinal);
        Assert.Equal(before.GetRawText(), (await _client.GetAsync("/api/steels/Example%20steel%20coil%200001", HttpStatusCode.OK)).GetRawText());
    }

    [Fact]
    public async Task Imports_of_one_name_at_the_same_moment_let_one_set_of_data_through()
    {
        var before = await CountAsync();

        var answers = await Task.WhenAll(Enumerable.Range(0, 8).Select(i => Task.Run(() => SendAsync(Changed("resistivity_ohm_m,4.8E-07", string.Create(CultureInfo.InvariantCulture, $"resistivity_ohm_m,4.8{i}E-07")), "?commit=true"), Cancel)));

        Assert.Single(answers, a => a.StatusCode == HttpStatusCode.Created);
        Assert.Equal(7, answers.Count(a => a.StatusCode == HttpStatusCode.Conflict));
        Assert.Equal(before + 1, await CountAsync());
    }

    [Theory]
    [InlineData("a/b?c#d%")]
    [InlineData("../x")]
    [InlineData("100% <b>&amp;</b>")]
    [InlineData("=cmd|' /C calc'!A0")]
    [InlineData("Größe 日本 😀")]
    [InlineData("a%2Fb")]
    public async Task Name_with_signs_of_addresses_and_markup_can_be_opened_again(string name)
    {
        var answer = await SendAsync(Changed("Example steel coil 0001", name), "?commit=true");
        await answer.ReadAsync(HttpStatusCode.Created);

        var read = await _client.GetAsync(answer.Headers.Location!.OriginalString, HttpStatusCode.OK);

        Assert.Equal(name, read.GetProperty("summary").GetProperty("grade").GetString());
        Assert.DoesNotContain("<b>", read.GetRawText(), StringComparison.Ordinal);
    }

    private static byte[] Changed(string old, string @new)
    {
        Assert.Contains(old, SteelImport.Template, StringComparison.Ordinal);
        return Encoding.UTF8.GetBytes(SteelImport.Template.Replace(old, @new, StringComparison.Ordinal));
    }

    private Task<HttpResponseMessage> SendAsync(byte[] csv, string query = "") => _client.PostAsync(new Uri(Import + query, UriKind.Relative), Calls.Bytes(csv, "text/csv"), Cancel);

    private async Task<int> CountAsync() => (await _client.GetAsync("/api/steels", HttpStatusCode.OK)).GetProperty("steels").GetArrayLength();
}
