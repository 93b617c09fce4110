using System.Globalization;
using System.Net.Sockets;
using System.Text;
using System.Text.Json;
using CoreDesign.Web.Tests.Designs;

namespace CoreDesign.Web.Tests.Platform;

/// <summary>What only a server on a real socket can be asked: broken requests, byte by byte.</summary>
public sealed class ListeningServerTests : IDisposable
{
    private const string Json = "Content-Type: application/json\r\n";
    private readonly Service _service = new();
    private readonly Uri _address;

    public ListeningServerTests()
    {
        _service.UseKestrel(0);
        _service.StartServer();
        _address = _service.ClientOptions.BaseAddress;
    }

    private static CancellationToken Cancel => TestContext.Current.CancellationToken;

    public void Dispose() => _service.Dispose();

    [Theory]
    [InlineData("GET /api/designs/%00 HTTP/1.1\r\nHost: x\r\n", 400)]
    [InlineData("GET /api/designs/\0 HTTP/1.1\r\nHost: x\r\n", 400)]
    [InlineData("GET /api/steels/\u00FF\u00FE HTTP/1.1\r\nHost: x\r\n", 400)]
    [InlineData("GET /api/designs HTTP/1.1\r\n", 400)]
    [InlineData("NONSENSE\r\n", 400)]
    [InlineData("PUT /api/designs/1 HTTP/1.1\r\nHost: x\r\nContent-Length: 2\r\nIf-Match: \u00FF\u00FE\r\n" + Json, 400)]
    [InlineData("POST /api/estimates HTTP/1.1\r\nHost: x\r\nContent-Length: -1\r\n" + Json, 400)]
    [InlineData("POST /api/estimates HTTP/1.1\r\nHost: x\r\nContent-Length: 99999999999999999999999\r\n" + Json, 400)]
    public async Task Request_that_is_none_is_answered_by_status_alone(string head, int status)
    {
        var answer = await AskAsync(head + "Connection: close\r\n\r\n{}");

        Assert.StartsWith(string.Create(CultureInfo.InvariantCulture, $"HTTP/1.1 {status} "), answer, StringComparison.Ordinal);
        Assert.DoesNotContain("   at ", answer, StringComparison.Ordinal);
        await StillThereAsync();
    }

    [Fact]
    public async Task Head_beyond_the_limit_is_answered_431()
    {
        Assert.StartsWith("HTTP/1.1 431 ", await AskAsync($"GET /api/designs HTTP/1.1\r\nHost: x\r\nX: {new string('a', 40_000)}\r\n\r\n"), StringComparison.Ordinal);
        await StillThereAsync();
    }

    [Theory]
    [InlineData("/api/estimates", "application/json", 10 * 1024 * 1024)]
    [InlineData("/api/designs", "application/json", 99_999_999_999)]
    [InlineData("/api/steels/import?commit=true", "text/csv", 10 * 1024 * 1024)]
    public async Task Stated_length_beyond_the_limit_is_answered_413_before_the_body(string address, string type, long length)
    {
        var answer = await AskAsync(string.Create(CultureInfo.InvariantCulture, $"POST {address} HTTP/1.1\r\nHost: x\r\nContent-Type: {type}\r\nContent-Length: {length}\r\nConnection: close\r\n\r\n"));

        Assert.Contains("KiB", Problem(answer, 413).GetProperty("detail").GetString(), StringComparison.Ordinal);
        await StillThereAsync();
    }

    [Theory]
    [InlineData("/api/designs", "application/json", 1024 * 1024)]
    [InlineData("/api/steels/import?commit=true", "text/csv", 2 * 1024 * 1024)]
    public async Task Body_without_stated_length_is_counted_and_answered_413(string address, string type, int limit)
    {
        var chunk = $"{limit + 1:x}\r\n{new string('x', limit + 1)}\r\n";

        var answer = await AskAsync($"POST {address} HTTP/1.1\r\nHost: x\r\nContent-Type: {type}\r\nTransfer-Encoding: chunked\r\nConnection: close\r\n\r\n{chunk}0\r\n\r\n");

        Assert.Contains($"{limit / 1024} KiB", Problem(answer, 413).GetProperty("detail").GetString(), StringComparison.Ordinal);
        await StillThereAsync();
    }

    [Fact]
    public async Task Body_that_breaks_its_own_form_is_answered_400()
    {
        var answer = await AskAsync($"POST /api/designs HTTP/1.1\r\nHost: x\r\n{Json}Transfer-Encoding: chunked\r\nConnection: close\r\n\r\nZZ\r\n{{}}\r\n0\r\n\r\n");

        Assert.Contains("Send it again whole", Problem(answer, 400).GetProperty("detail").GetString(), StringComparison.Ordinal);
        await StillThereAsync();
    }

    [Fact]
    public async Task Body_that_does_not_come_is_answered_408()
    {
        var answer = await AskAsync($"POST /api/designs HTTP/1.1\r\nHost: x\r\n{Json}Content-Length: 100\r\nConnection: close\r\n\r\n{{");

        Assert.Contains("too slowly", Problem(answer, 408).GetProperty("detail").GetString(), StringComparison.Ordinal);
        await StillThereAsync();
    }

    [Fact]
    public async Task Connection_that_is_dropped_within_the_body_stores_nothing()
    {
        for (var i = 0; i < 20; i++)
        {
            using var socket = await OpenAsync();
            await socket.SendAsync(Encoding.Latin1.GetBytes($"POST /api/designs HTTP/1.1\r\nHost: x\r\n{Json}Content-Length: 100\r\n\r\n{{\"title\":\"x\",\"design\":{{}}"), Cancel);
            socket.LingerState = new LingerOption(enable: true, seconds: 0);
        }

        await StillThereAsync();
    }

    private static JsonElement Problem(string answer, int status)
    {
        Assert.StartsWith(string.Create(CultureInfo.InvariantCulture, $"HTTP/1.1 {status} "), answer, StringComparison.Ordinal);
        Assert.Contains("application/problem+json", answer, StringComparison.Ordinal);
        using var document = JsonDocument.Parse(answer[answer.IndexOf('{', StringComparison.Ordinal)..(answer.LastIndexOf('}') + 1)]);
        return document.RootElement.Clone();
    }

    private async Task StillThereAsync()
    {
        Assert.Contains("Healthy", await AskAsync("GET /health/ready HTTP/1.1\r\nHost: x\r\nConnection: close\r\n\r\n"), StringComparison.Ordinal);
        Assert.Contains("\"total\":0", await AskAsync("GET /api/designs HTTP/1.1\r\nHost: x\r\nConnection: close\r\n\r\n"), StringComparison.Ordinal);
    }

    private async Task<string> AskAsync(string request)
    {
        using var socket = await OpenAsync();
        var bytes = Encoding.Latin1.GetBytes(request);
        for (var sent = 0; sent < bytes.Length;) sent += await socket.SendAsync(bytes.AsMemory(sent), Cancel);
        var answer = new StringBuilder();
        var block = new byte[16 * 1024];
        try
        {
            int count;
            while ((count = await socket.ReceiveAsync(block, Cancel)) > 0) answer.Append(Encoding.Latin1.GetString(block, 0, count));
        }
        catch (SocketException) when (answer.Length > 0)
        {
            // After its answer the server may cut a connection whose body it refused.
        }

        return answer.ToString();
    }

    private async Task<Socket> OpenAsync()
    {
        var socket = new Socket(SocketType.Stream, ProtocolType.Tcp);
        await socket.ConnectAsync(_address.Host, _address.Port, Cancel);
        return socket;
    }
}
