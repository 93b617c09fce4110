using System.Text;
using System.Text.Json;
using CoreDesign.Estimating.Contracts;
using CoreDesign.Sheets.Tests;
using CoreDesign.Web.Features.Designs;
using Microsoft.AspNetCore.Hosting;
using Microsoft.AspNetCore.Mvc.Testing;
using Microsoft.AspNetCore.TestHost;
using Microsoft.Extensions.DependencyInjection;
using Microsoft.Extensions.Logging;

namespace CoreDesign.Web.Tests.Designs;

/// <summary>
/// The whole service on a data folder of its own. The estimate is stood in for: its figures are a fixture's, its refusals are
/// chosen by the order's reference, so that the tests of the history do not wait for solves.
/// </summary>
public sealed class Service : WebApplicationFactory<Program>
{
    public const string OutOfRange = "out of range";
    public const string NoSolution = "no solution";
    public const string Breaks = "breaks";

    public string Folder { get; } = Directory.CreateTempSubdirectory("service-").FullName;

    /// <summary>Loss of the next studies, to tell revisions apart.</summary>
    public double Loss_W { get; set; } = 650;

    protected override void ConfigureWebHost(IWebHostBuilder builder)
    {
        builder.UseSetting("CoreDesign:Data", Folder);
        builder.ConfigureLogging(logging => logging.ClearProviders());
        builder.ConfigureTestServices(services => services.AddSingleton<StudyOfDesign>((design, _) => Task.FromResult(Study(design))));
    }

    protected override void Dispose(bool disposing)
    {
        base.Dispose(disposing);
        if (disposing && Directory.Exists(Folder)) Directory.Delete(Folder, recursive: true);
    }

    private Outcome<Study> Study(DesignInput design)
    {
        switch (design.Order?.Reference)
        {
            case OutOfRange:
                return new Outcome<Study> { Errors = [new FieldError("core.windowHeight_mm", "-5 mm is given; 20 to 6000 mm is allowed.")] };
            case NoSolution:
                return new Outcome<Study> { Unsolvable = new Unsolvable("The core saturates.", 0.25) };
            case Breaks:
                throw new InvalidOperationException("secret inner working");
            default:
                var study = StudyFixture.ThreeLimb();
                var order = (study.Estimate.Inputs.Order ?? new OrderInput()) with { Reference = design.Order?.Reference };
                var estimate = study.Estimate with { NoLoadLoss_W = Loss_W, Inputs = study.Estimate.Inputs with { Order = order } };
                return new Outcome<Study> { Value = study with { Estimate = estimate } };
        }
    }
}

internal static class Calls
{
    private static CancellationToken Cancel => TestContext.Current.CancellationToken;

    public static StringContent Json(string body) => new(body, Encoding.UTF8, "application/json");

    public static ByteArrayContent Bytes(byte[] body, string? contentType)
    {
        var content = new ByteArrayContent(body);
        if (contentType is not null) content.Headers.TryAddWithoutValidation("Content-Type", contentType);
        return content;
    }

    public static Task<HttpResponseMessage> PostJsonAsync(this HttpClient client, string address, string body) => client.PostAsync(new Uri(address, UriKind.Relative), Json(body), Cancel);

    public static async Task<JsonElement> CreateAsync(this HttpClient client, string title = "Station", string design = """{"order":{"reference":"HR-1"}}""", string note = "")
    {
        var answer = await client.PostAsync("/api/designs", Json($$"""{"title":{{JsonSerializer.Serialize(title)}},"note":{{JsonSerializer.Serialize(note)}},"design":{{design}}}"""), Cancel);
        return await answer.ReadAsync(System.Net.HttpStatusCode.Created);
    }

    public static async Task<HttpResponseMessage> SaveAsync(this HttpClient client, long id, string? ifMatch, string body)
    {
        using var request = new HttpRequestMessage(HttpMethod.Put, $"/api/designs/{id}") { Content = Json(body) };
        if (ifMatch is not null) request.Headers.TryAddWithoutValidation("If-Match", ifMatch);
        return await client.SendAsync(request, Cancel);
    }

    /// <summary>The body, after status and kind of content are as they should be.</summary>
    public static async Task<JsonElement> ReadAsync(this HttpResponseMessage answer, System.Net.HttpStatusCode expected)
    {
        var text = await answer.Content.ReadAsStringAsync(Cancel);
        Assert.True(expected == answer.StatusCode, $"{(int)answer.StatusCode} in the place of {(int)expected}: {text}");
        Assert.Equal((int)expected < 400 ? "application/json" : "application/problem+json", answer.Content.Headers.ContentType?.MediaType);
        Assert.DoesNotContain("   at ", text, StringComparison.Ordinal);
        Assert.DoesNotContain("Exception", text, StringComparison.Ordinal);
        using var document = JsonDocument.Parse(text);
        if ((int)expected >= 400)
        {
            Assert.DoesNotContain("System.", text, StringComparison.Ordinal);
            Assert.DoesNotContain("CoreDesign.", text, StringComparison.Ordinal);
            Assert.True(text.Length < 100_000, $"A refusal of {text.Length} characters.");
            Assert.Equal((int)expected, document.RootElement.GetProperty("status").GetInt32());
            Assert.NotEqual("", document.RootElement.GetProperty("detail").GetString());
        }

        return document.RootElement.Clone();
    }

    public static async Task<JsonElement> GetAsync(this HttpClient client, string address, System.Net.HttpStatusCode expected) =>
        await (await client.GetAsync(new Uri(address, UriKind.Relative), Cancel)).ReadAsync(expected);

    public static string Error(this JsonElement problem, string path) => problem.GetProperty("errors").GetProperty(path)[0].GetString()!;
}
