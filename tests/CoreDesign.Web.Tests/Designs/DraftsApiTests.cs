using System.Net;

namespace CoreDesign.Web.Tests.Designs;

public sealed class DraftsApiTests(Service service) : IClassFixture<Service>
{
    private readonly HttpClient _client = service.CreateClient();

    private static CancellationToken Cancel => TestContext.Current.CancellationToken;

    [Fact]
    public async Task Draft_comes_back_as_it_was_put()
    {
        const string Payload = """{"turns":"18,","half":"<b>\ud800","\ud800":[1e999,null]}""";
        var address = $"/api/drafts/{Guid.NewGuid()}";
        await _client.GetAsync(address, HttpStatusCode.NotFound);

        await (await _client.PutAsync(address, Calls.Json($$"""{"designId":3,"baseRevision":2,"payload":{{Payload}}}"""), Cancel)).ReadAsync(HttpStatusCode.OK);
        var draft = await _client.GetAsync(address, HttpStatusCode.OK);

        Assert.Equal(3, draft.GetProperty("designId").GetInt64());
        Assert.Equal(2, draft.GetProperty("baseRevision").GetInt32());
        Assert.Equal(Payload, draft.GetProperty("payload").GetRawText());
    }

    [Theory]
    [InlineData("{}", "payload", "missing")]
    [InlineData("""{"payload":{},"designId":-4}""", "designId", "-4 is given")]
    [InlineData("""{"payload":{},"key":"x"}""", "key", "'key' is not a member here")]
    [InlineData("""{"payload":{"a":}}""", "$", "not JSON")]
    public async Task Draft_with_a_wrong_body_is_refused(string body, string path, string message) =>
        Assert.Contains(message, (await (await _client.PutAsync($"/api/drafts/{Guid.NewGuid()}", Calls.Json(body), Cancel)).ReadAsync(HttpStatusCode.BadRequest)).Error(path), StringComparison.Ordinal);

    [Theory]
    [InlineData("1")]
    [InlineData("00000000-0000-0000-0000-000000000000")]
    [InlineData("..%2Fkeys")]
    public async Task Key_that_is_no_uuid_is_refused(string key)
    {
        await _client.GetAsync($"/api/drafts/{key}", HttpStatusCode.BadRequest);
        await (await _client.PutAsync($"/api/drafts/{key}", Calls.Json("""{"payload":{}}"""), Cancel)).ReadAsync(HttpStatusCode.BadRequest);
    }

    [Fact]
    public async Task Draft_beyond_256_KiB_is_refused()
    {
        var payload = new string('x', 256 * 1024);

        await (await _client.PutAsync($"/api/drafts/{Guid.NewGuid()}", Calls.Json($$"""{"payload":"{{payload}}"}"""), Cancel)).ReadAsync(HttpStatusCode.RequestEntityTooLarge);
    }
}
