using System.Net;
using System.Net.Http.Json;
using System.Text;
using System.Text.Json;
using CoreDesign.Estimating.Circuits;
using Microsoft.AspNetCore.Hosting;
using Microsoft.AspNetCore.Http.Metadata;
using Microsoft.AspNetCore.Mvc.Testing;
using Microsoft.AspNetCore.Routing;
using Microsoft.Extensions.DependencyInjection;

namespace CoreDesign.Web.Tests.HandbookPages;

/// <summary>The examples and addresses of the handbook, tried on the running service.</summary>
public sealed class HandbookExamplesTests : IDisposable
{
    private static readonly CancellationToken Cancel = TestContext.Current.CancellationToken;
    private readonly string folder = Directory.CreateTempSubdirectory("coredesign-handbook-").FullName;
    private readonly WebApplicationFactory<Program> service;
    private readonly HttpClient client;

    public HandbookExamplesTests()
    {
        service = new WebApplicationFactory<Program>().WithWebHostBuilder(b => b.UseSetting("CoreDesign:Data", folder));
        client = service.CreateClient();
    }

    [Fact]
    public async Task Steel_file_can_be_imported_as_it_stands()
    {
        using var file = new StringContent(HandbookText.Examples("files")[0], Encoding.UTF8, "text/csv");

        var answer = await client.PostAsync("/api/steels/import?commit=true", file, Cancel);

        Assert.Equal(HttpStatusCode.Created, answer.StatusCode);
        var kept = await client.GetFromJsonAsync<JsonElement>("/api/steels/Example%20steel%20coil%200002", Cancel);
        Assert.Equal("certificate", kept.GetProperty("rolling").GetProperty("standing").GetString());
    }

    [Fact]
    public async Task Steel_file_of_the_handbook_does_not_take_the_name_of_the_template()
    {
        using var handbook = new StringContent(HandbookText.Examples("files")[0], Encoding.UTF8, "text/csv");
        Assert.Equal(HttpStatusCode.Created, (await client.PostAsync("/api/steels/import?commit=true", handbook, Cancel)).StatusCode);
        using var template = new StringContent(await client.GetStringAsync("/api/steels/import/template.csv?decimal=comma", Cancel), Encoding.UTF8, "text/csv");

        Assert.Equal(HttpStatusCode.Created, (await client.PostAsync("/api/steels/import?commit=true", template, Cancel)).StatusCode);
    }

    [Fact]
    public async Task Circuit_gives_the_current_that_is_found_by_hand()
    {
        using var body = Json(HandbookText.Examples("circuits")[0]);

        var answer = await client.PostAsync("/api/circuits", body, Cancel);

        Assert.Equal(HttpStatusCode.OK, answer.StatusCode);
        var line = (await answer.Content.ReadFromJsonAsync<JsonElement>(Cancel)).GetProperty("lines").GetProperty("L");

        // By hand, as the chapter does it: B/mu0 times (1/5000 + 0.001), over 100 turns.
        var peak = 230 / (Math.Sqrt(2) * Math.PI * 50 * 100 * 0.01) / 1.25663706212e-6 * 0.0012 / 100;
        Assert.Equal(peak, line.GetProperty("peak").GetDouble(), 1e-6 * peak);
        Assert.Equal(6.99, line.GetProperty("rms").GetDouble(), 0.005);
        Assert.Contains("6.99 A rms", HandbookText.Of("circuits"), StringComparison.Ordinal);
    }

    [Fact]
    public async Task Design_is_estimated_as_it_stands()
    {
        using var body = Json(HandbookText.Examples("api").Single(e => e.StartsWith('{')));

        Assert.Equal(HttpStatusCode.OK, (await client.PostAsync("/api/estimates", body, Cancel)).StatusCode);
    }

    [Fact]
    public void Table_of_the_api_names_every_endpoint_and_no_other()
    {
        // The health checks answer to any method.
        var real = service.Services.GetRequiredService<EndpointDataSource>().Endpoints.OfType<RouteEndpoint>()
            .Where(e => e.RoutePattern.RawText is { } path && (path.StartsWith("/api", StringComparison.Ordinal) || path.StartsWith("/health", StringComparison.Ordinal)))
            .SelectMany(e => (e.Metadata.GetMetadata<HttpMethodMetadata>()?.HttpMethods ?? ["GET"]).Select(m => $"{m} {e.RoutePattern.RawText!.TrimEnd('/')}"));

        Assert.Equal(real.Order(StringComparer.Ordinal), HandbookText.Table("api", "API").Select(r => r[0]).Order(StringComparer.Ordinal));
    }

    [Fact]
    public void Limits_of_a_circuit_are_those_of_the_endpoint()
    {
        var endpoint = service.Services.GetRequiredService<EndpointDataSource>().Endpoints.OfType<RouteEndpoint>().Single(e => e.RoutePattern.RawText == "/api/circuits");
        var description = endpoint.Metadata.GetMetadata<IEndpointDescriptionMetadata>()!.Description;
        var text = HandbookText.Of("circuits");

        Assert.StartsWith("At most 200 branches and 12 windings, 20 s.", description, StringComparison.Ordinal);
        Assert.Contains("| 1 to 200;", text, StringComparison.Ordinal);
        Assert.Contains("| 1 to 12;", text, StringComparison.Ordinal);
        Assert.Contains("A solve ends after 20 s.", text, StringComparison.Ordinal);
        Assert.Contains(FormattableString.Invariant($"{SolveCircuit.DefaultPoints} if left out"), text, StringComparison.Ordinal);
    }

    [Fact]
    public void Members_of_a_circuit_are_those_that_are_read()
    {
        var read = JsonSerializer.SerializeToNode(new CircuitCase(), JsonSerializerOptions.Web)!.AsObject().Select(m => m.Key);
        var told = HandbookText.Table("circuits", "Members").SelectMany(r => r[0].Split(',')).Select(n => n.Trim(' ', '`'));

        Assert.Equal(read.Order(StringComparer.Ordinal), told.Concat(["tolerance", "agreement", "methods"]).Order(StringComparer.Ordinal));
    }

    [Fact]
    public async Task Every_address_that_reads_answers()
    {
        using var design = Json($$"""{ "title": "Handbook", "design": {{HandbookText.Examples("api").Single(e => e.StartsWith('{'))}} }""");
        Assert.Equal(HttpStatusCode.Created, (await client.PostAsync("/api/designs", design, Cancel)).StatusCode);
        const string key = "5d1c7a30-4b9e-4f62-8a05-d3e91c6b7f24";
        using var draft = Json("""{ "payload": { "a": 1 } }""");
        Assert.Equal(HttpStatusCode.OK, (await client.PutAsync($"/api/drafts/{key}", draft, Cancel)).StatusCode);

        var reading = HandbookText.Table("api", "API").Select(r => r[0]).Where(a => a.StartsWith("GET ", StringComparison.Ordinal)).ToList();
        Assert.True(reading.Count > 8);
        foreach (var address in reading)
        {
            var path = address[4..].Replace("{id}", "1", StringComparison.Ordinal).Replace("{number}", "1", StringComparison.Ordinal)
                .Replace("{kind}", "design", StringComparison.Ordinal).Replace("{key}", key, StringComparison.Ordinal).Replace("{grade}", "M105-30P", StringComparison.Ordinal);
            using var answer = await client.GetAsync(path, Cancel);
            Assert.True(answer.IsSuccessStatusCode, $"{path} answers {(int)answer.StatusCode}.");
        }
    }

    public void Dispose()
    {
        client.Dispose();
        service.Dispose();
        Microsoft.Data.Sqlite.SqliteConnection.ClearAllPools();
        Directory.Delete(folder, recursive: true);
    }

    private static StringContent Json(string text) => new(text, Encoding.UTF8, "application/json");
}
