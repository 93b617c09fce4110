using System.Net;
using System.Text;
using CoreDesign.Web.Tests.Designs;

namespace CoreDesign.Web.Tests;

/// <summary>Bodies that are no JSON, or too much of it, at every door that takes JSON: one plain refusal, and nothing stored.</summary>
public sealed class JsonDoorTests(Service service) : IClassFixture<Service>
{
    private readonly HttpClient _client = service.CreateClient();

    private static CancellationToken Cancel => TestContext.Current.CancellationToken;

    private static readonly Dictionary<string, byte[]> Unreadable = new(StringComparer.Ordinal)
    {
        ["empty"] = [],
        ["blank"] = "  \r\n"u8.ToArray(),
        ["null"] = "null"u8.ToArray(),
        ["list"] = "[]"u8.ToArray(),
        ["text"] = "\"x\""u8.ToArray(),
        ["number"] = "1"u8.ToArray(),
        ["broken off"] = "{\"design\":"u8.ToArray(),
        ["two values"] = "{} {}"u8.ToArray(),
        ["comment"] = "{/* */}"u8.ToArray(),
        ["NaN"] = "{\"design\":NaN}"u8.ToArray(),
        ["deep"] = Encoding.ASCII.GetBytes(string.Concat(Enumerable.Repeat("{\"a\":", 50_000))),
        ["deep list"] = Encoding.ASCII.GetBytes(new string('[', 500_000)),
        ["Latin-1"] = Encoding.Latin1.GetBytes("{\"title\":\"Größe\"}"),
        ["UTF-16"] = [.. Encoding.Unicode.GetPreamble(), .. Encoding.Unicode.GetBytes("{}")],
        ["UTF-16 without mark"] = Encoding.BigEndianUnicode.GetBytes("{\"design\":{}}"),
        ["overlong"] = [.. "{\"title\":\""u8, 0xC0, 0x80, .. "\"}"u8],
        ["half pair in bytes"] = [.. "{\"title\":\""u8, 0xED, 0xA0, 0x80, .. "\"}"u8],
        ["NUL"] = new byte[1000],
        ["NUL in text"] = "{\"title\":\"a\0b\"}"u8.ToArray(),
        ["binary"] = [.. Enumerable.Range(0, 5000).Select(i => (byte)(i * 7))],
        ["unknown"] = "{\"colour\":1}"u8.ToArray(),
        ["half pair in a name"] = "{\"\\ud800\":1}"u8.ToArray(),
        ["twice"] = "{\"design\":1,\"d\\u0065sign\":1,\"order\":1,\"order\":1,\"text\":1,\"text\":1,\"payload\":1,\"payload\":1,\"frequency\":1,\"frequency\":1,\"title\":1}"u8.ToArray(),
        ["long name"] = Encoding.ASCII.GetBytes("{\"" + new string('n', 200_000) + "\":1}"),
        ["many members"] = Encoding.ASCII.GetBytes("{" + string.Join(',', Enumerable.Range(0, 90_000).Select(i => $"\"a{i}\":1")) + "}"),
        ["one member many times"] = Encoding.ASCII.GetBytes("{" + string.Join(',', Enumerable.Repeat("\"title\":1", 90_000)) + "}"),
    };

    public static TheoryData<string, string> Doors() => new()
    {
        { "POST", "/api/estimates" },
        { "POST", "/api/studies" },
        { "POST", "/api/circuits" },
        { "POST", "/api/designs" },
        { "PUT", "/api/designs/{id}" },
        { "POST", "/api/designs/{id}/copies" },
        { "POST", "/api/designs/{id}/revisions/1/notes" },
        { "PUT", "/api/drafts/5d1c7a30-4b9e-4f62-8a05-d3e91c6b7f24" },
    };

    [Theory]
    [MemberData(nameof(Doors))]
    public async Task Unreadable_body_is_answered_400_and_stores_nothing(string method, string door)
    {
        var address = await AddressAsync(door);
        var before = await StoredAsync();
        foreach (var (name, body) in Unreadable)
        {
            var problem = await (await SendAsync(method, address, body, "application/json")).ReadAsync(HttpStatusCode.BadRequest);
            Assert.True(problem.GetProperty("errors").EnumerateObject().Count() is > 0 and < 110, name);
        }

        Assert.Equal(before, await StoredAsync());
    }

    [Theory]
    [MemberData(nameof(Doors))]
    public async Task Ten_megabytes_are_answered_413_with_the_limit(string method, string door)
    {
        var address = await AddressAsync(door);
        var body = Encoding.ASCII.GetBytes("{\"title\":\"" + new string('x', 10 * 1024 * 1024) + "\"}");

        var problem = await (await SendAsync(method, address, body, "application/json")).ReadAsync(HttpStatusCode.RequestEntityTooLarge);

        Assert.Contains("1024 KiB", problem.GetProperty("detail").GetString(), StringComparison.Ordinal);
    }

    [Theory]
    [MemberData(nameof(Doors))]
    public async Task Other_content_is_answered_415_with_the_type_that_is_needed(string method, string door)
    {
        var address = await AddressAsync(door);
        foreach (var type in new[] { "text/plain", "text/csv", "application/xml", "text/json", "multipart/form-data; boundary=x", "application/x-www-form-urlencoded", "nonsense" })
        {
            var problem = await (await SendAsync(method, address, "{}"u8.ToArray(), type)).ReadAsync(HttpStatusCode.UnsupportedMediaType);
            Assert.Contains("application/json", problem.GetProperty("detail").GetString(), StringComparison.Ordinal);
        }
    }

    [Theory]
    [MemberData(nameof(Doors))]
    public async Task Mark_of_utf8_before_the_body_is_no_obstacle(string method, string door)
    {
        var body = door switch
        {
            "/api/estimates" or "/api/studies" => JsonCase.Estimate,
            "/api/circuits" => JsonCase.Circuit,
            "/api/designs" or "/api/designs/{id}" => """{"title":"x","design":{}}""",
            _ when door.EndsWith("notes", StringComparison.Ordinal) => """{"text":"x"}""",
            _ when door.EndsWith("copies", StringComparison.Ordinal) => "{}",
            _ => """{"payload":1}""",
        };

        var answer = await SendAsync(method, await AddressAsync(door), [0xEF, 0xBB, 0xBF, .. Encoding.UTF8.GetBytes(body)], "application/json; charset=utf-8");

        Assert.True(answer.IsSuccessStatusCode, $"{answer.StatusCode}");
    }

    private async Task<HttpResponseMessage> SendAsync(string method, string address, byte[] body, string contentType)
    {
        using var request = new HttpRequestMessage(new HttpMethod(method), address) { Content = Calls.Bytes(body, contentType) };
        if (method == "PUT") request.Headers.TryAddWithoutValidation("If-Match", "\"1\"");
        return await _client.SendAsync(request, Cancel);
    }

    private async Task<string> AddressAsync(string door) =>
        door.Contains("{id}", StringComparison.Ordinal)
            ? door.Replace("{id}", (await _client.CreateAsync()).GetProperty("id").GetRawText(), StringComparison.Ordinal)
            : door;

    private async Task<string> StoredAsync() => (await _client.GetAsync("/api/designs?revisions=all&sort=id", HttpStatusCode.OK)).GetRawText()
        + (await _client.GetAsync(new Uri("/api/drafts/5d1c7a30-4b9e-4f62-8a05-d3e91c6b7f24", UriKind.Relative), Cancel)).StatusCode;
}
