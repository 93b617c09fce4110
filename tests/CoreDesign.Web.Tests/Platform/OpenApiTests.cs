using System.Net;
using System.Text.Json;
using CoreDesign.Estimating.Fields;
using CoreDesign.Web.Tests.Designs;
using Microsoft.AspNetCore.Routing;
using Microsoft.Extensions.DependencyInjection;

namespace CoreDesign.Web.Tests.Platform;

public sealed class OpenApiTests(Service service) : IClassFixture<Service>
{
    private readonly HttpClient _client = service.CreateClient();

    private static CancellationToken Cancel => TestContext.Current.CancellationToken;

    [Fact]
    public async Task Document_lists_every_address_of_the_contract()
    {
        var paths = (await DocumentAsync()).GetProperty("paths");

        foreach (var (address, method) in new[]
        {
            ("/api/estimates", "post"), ("/api/studies", "post"), ("/api/circuits", "post"), ("/api/designs", "post"), ("/api/designs", "get"), ("/api/designs/{id}", "get"), ("/api/designs/{id}", "put"),
            ("/api/designs/{id}/revisions/{number}", "get"), ("/api/designs/{id}/revisions/{number}/sheets/{kind}.pdf", "get"), ("/api/drafts/{key}", "get"), ("/api/drafts/{key}", "put"),
            ("/api/steels", "get"), ("/api/steels/{grade}", "get"), ("/api/steels/import", "post"),
        })
        {
            Assert.True(paths.TryGetProperty(address, out var methods) && methods.TryGetProperty(method, out _), $"{method} {address}");
        }
    }

    [Fact]
    public async Task Document_lists_every_route_that_the_service_has_under_api()
    {
        var paths = (await DocumentAsync()).GetProperty("paths");
        var routes = service.Services.GetRequiredService<EndpointDataSource>().Endpoints.OfType<RouteEndpoint>()
            .Where(e => e.RoutePattern.RawText?.StartsWith("/api", StringComparison.Ordinal) == true)
            .SelectMany(e => e.Metadata.GetMetadata<HttpMethodMetadata>()?.HttpMethods.Select(m => (Address: e.RoutePattern.RawText!.TrimEnd('/'), Method: m.ToLowerInvariant())) ?? [])
            .ToList();

        Assert.True(routes.Count > 14);
        Assert.All(routes, r => Assert.True(paths.TryGetProperty(r.Address, out var methods) && methods.TryGetProperty(r.Method, out _), $"{r.Method} {r.Address}"));
    }

    [Fact]
    public async Task Document_has_a_title_and_every_operation_a_name_a_summary_and_its_refusals()
    {
        var document = await DocumentAsync();

        Assert.Equal("CoreDesign", document.GetProperty("info").GetProperty("title").GetString());
        Assert.Contains("millimetres", document.GetProperty("info").GetProperty("description").GetString(), StringComparison.Ordinal);
        foreach (var path in document.GetProperty("paths").EnumerateObject())
        {
            foreach (var operation in path.Value.EnumerateObject())
            {
                Assert.NotEqual("", operation.Value.GetProperty("operationId").GetString());
                Assert.NotEqual("", operation.Value.GetProperty("summary").GetString());
                var answers = operation.Value.GetProperty("responses").EnumerateObject().Select(r => r.Name).ToList();
                Assert.Contains(answers, a => a[0] == '2');
                if (!operation.Value.TryGetProperty("requestBody", out _)) continue;
                foreach (var status in new[] { "400", "413", "415" }) Assert.True(answers.Contains(status), $"{operation.Name} {path.Name} does not tell {status}");
            }
        }
    }

    [Fact]
    public async Task Every_field_of_the_catalogue_is_described_with_its_range_and_unit()
    {
        var schemas = (await DocumentAsync()).GetProperty("components").GetProperty("schemas");
        var descriptions = schemas.EnumerateObject()
            .Where(s => s.Value.TryGetProperty("properties", out _))
            .SelectMany(s => s.Value.GetProperty("properties").EnumerateObject())
            .Where(p => p.Value.TryGetProperty("description", out _))
            .ToLookup(p => p.Name, p => p.Value.GetProperty("description").GetString()!);

        Assert.All(FieldCatalog.All, field => Assert.Contains(descriptions[field.Path.Split('.')[^1].Replace("[]", "", StringComparison.Ordinal)], d => d.Contains(field.Range, StringComparison.Ordinal)));
    }

    [Fact]
    public async Task Save_asks_for_the_header_that_names_the_revision()
    {
        var parameters = (await DocumentAsync()).GetProperty("paths").GetProperty("/api/designs/{id}").GetProperty("put").GetProperty("parameters");

        Assert.Contains(parameters.EnumerateArray(), p => p.GetProperty("name").GetString() == "If-Match" && p.GetProperty("required").GetBoolean());
    }

    [Fact]
    public async Task Document_names_no_type_of_the_program() =>
        Assert.DoesNotContain("CoreDesign.", (await DocumentAsync()).GetRawText(), StringComparison.Ordinal);

    [Theory]
    [InlineData("/health/live")]
    [InlineData("/health/ready")]
    public async Task Health_is_answered_in_a_word(string address)
    {
        var answer = await _client.GetAsync(new Uri(address, UriKind.Relative), Cancel);

        Assert.Equal(HttpStatusCode.OK, answer.StatusCode);
        Assert.Equal("Healthy", await answer.Content.ReadAsStringAsync(Cancel));
    }

    [Theory]
    [InlineData("GET", "/api/nothing", HttpStatusCode.NotFound)]
    [InlineData("GET", "/api", HttpStatusCode.NotFound)]
    [InlineData("DELETE", "/api/estimates", HttpStatusCode.MethodNotAllowed)]
    [InlineData("PATCH", "/api/designs/1", HttpStatusCode.MethodNotAllowed)]
    [InlineData("NONSENSE", "/api/steels", HttpStatusCode.MethodNotAllowed)]
    public async Task Address_or_method_that_does_not_exist_points_to_the_document(string method, string address, HttpStatusCode expected)
    {
        using var request = new HttpRequestMessage(new HttpMethod(method), address);

        var problem = await (await _client.SendAsync(request, Cancel)).ReadAsync(expected);

        Assert.Contains("/openapi/v1.json", problem.GetProperty("detail").GetString(), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("GET", "/api/estimates", "POST")]
    [InlineData("GET", "/api/studies", "POST")]
    [InlineData("GET", "/api/circuits", "POST")]
    [InlineData("HEAD", "/api/circuits", "POST")]
    [InlineData("GET", "/api/designs/1/copies", "POST")]
    [InlineData("GET", "/api/designs/1/revisions/1/notes", "POST")]
    [InlineData("DELETE", "/api/estimates", "POST")]
    [InlineData("DELETE", "/api/designs/1", "GET, PUT")]
    [InlineData("POST", "/api/steels/M105-30P", "GET")]
    public async Task Method_that_an_address_does_not_take_is_answered_by_those_it_takes(string method, string address, string allowed)
    {
        using var request = new HttpRequestMessage(new HttpMethod(method), address);

        var answer = await _client.SendAsync(request, Cancel);

        Assert.Equal(HttpStatusCode.MethodNotAllowed, answer.StatusCode);
        Assert.Equal(allowed, string.Join(", ", answer.Content.Headers.Allow.Order(StringComparer.Ordinal)));
    }

    private Task<JsonElement> DocumentAsync() => _client.GetAsync("/openapi/v1.json", HttpStatusCode.OK);
}
