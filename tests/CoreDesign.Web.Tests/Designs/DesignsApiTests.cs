using System.Net;
using System.Text.Json;

namespace CoreDesign.Web.Tests.Designs;

public sealed class DesignsApiTests : IDisposable
{
    private readonly Service _service = new();
    private readonly HttpClient _client;

    public DesignsApiTests() => _client = _service.CreateClient();

    private static CancellationToken Cancel => TestContext.Current.CancellationToken;

    public void Dispose()
    {
        _client.Dispose();
        _service.Dispose();
    }

    [Fact]
    public async Task Create_answers_with_id_revision_location_and_tag_and_the_location_can_be_read()
    {
        var answer = await _client.PostAsync("/api/designs", Calls.Json("""{"title":" Station ","design":{"order":{"reference":"HR-1"},"core":{"windowHeight_mm":520.1}},"note":"first"}"""), Cancel);
        var created = await answer.ReadAsync(HttpStatusCode.Created);

        Assert.Equal(1, created.GetProperty("revision").GetInt32());
        Assert.Equal("Station", created.GetProperty("title").GetString());
        Assert.Equal("draft", created.GetProperty("state").GetString());
        Assert.Equal("this desk", created.GetProperty("author").GetString());
        Assert.EndsWith("Z", created.GetProperty("createdAt").GetString(), StringComparison.Ordinal);
        Assert.Equal("\"1\"", answer.Headers.ETag!.Tag);
        var read = await _client.GetAsync(answer.Headers.Location!.ToString(), HttpStatusCode.OK);
        Assert.Equal(created.GetProperty("id").GetInt64(), read.GetProperty("id").GetInt64());
        Assert.Equal(520.1, read.GetProperty("design").GetProperty("core").GetProperty("windowHeight_mm").GetDouble());
        Assert.Equal(created.GetRawText(), read.GetProperty("current").GetRawText());
    }

    [Fact]
    public async Task Save_with_the_newest_revision_adds_one_and_old_revisions_stay_readable()
    {
        var id = (await _client.CreateAsync()).GetProperty("id").GetInt64();
        _service.Loss_W = 640.25;

        var answer = await _client.SaveAsync(id, "\"1\"", """{"design":{"order":{"reference":"HR-1"},"core":{"windowWidth_mm":200}},"note":"wider"}""");
        var saved = await answer.ReadAsync(HttpStatusCode.OK);

        Assert.Equal(2, saved.GetProperty("revision").GetInt32());
        Assert.Equal("Station", saved.GetProperty("title").GetString());
        Assert.Equal("\"2\"", answer.Headers.ETag!.Tag);
        var old = await _client.GetAsync($"/api/designs/{id}/revisions/1", HttpStatusCode.OK);
        Assert.Equal(650, old.GetProperty("study").GetProperty("estimate").GetProperty("noLoadLoss_W").GetDouble());
        Assert.False(old.GetProperty("design").TryGetProperty("core", out _));
        var whole = await _client.GetAsync($"/api/designs/{id}", HttpStatusCode.OK);
        Assert.Equal([2, 1], whole.GetProperty("revisions").EnumerateArray().Select(r => r.GetProperty("revision").GetInt32()));
    }

    [Fact]
    public async Task Save_on_an_older_revision_is_refused_with_both_sides_and_stores_nothing()
    {
        var id = (await _client.CreateAsync()).GetProperty("id").GetInt64();
        await (await _client.SaveAsync(id, "\"1\"", """{"title":"Theirs","design":{"order":{"reference":"HR-1"},"core":{"windowWidth_mm":200}}}""")).ReadAsync(HttpStatusCode.OK);

        var stale = await (await _client.SaveAsync(id, "\"1\"", """{"title":"Yours","design":{"order":{"reference":"HR-1"},"core":{"windowWidth_mm":180}}}""")).ReadAsync(HttpStatusCode.PreconditionFailed);

        Assert.Equal(2, stale.GetProperty("current").GetProperty("revision").GetInt32());
        Assert.Equal("Theirs", stale.GetProperty("theirs").GetProperty("title").GetString());
        Assert.Equal("Yours", stale.GetProperty("yours").GetProperty("title").GetString());
        var difference = Assert.Single(stale.GetProperty("differences").EnumerateArray());
        Assert.Equal("core.windowWidth_mm", difference.GetProperty("path").GetString());
        Assert.Equal("180", difference.GetProperty("yours").GetString());
        Assert.Equal("200", difference.GetProperty("theirs").GetString());
        Assert.Equal(2, (await _client.GetAsync($"/api/designs/{id}", HttpStatusCode.OK)).GetProperty("revision").GetInt32());
    }

    [Fact]
    public async Task Saves_at_the_same_moment_let_one_through()
    {
        var id = (await _client.CreateAsync()).GetProperty("id").GetInt64();

        var answers = await Task.WhenAll(Enumerable.Range(0, 20).Select(i => Task.Run(() => _client.SaveAsync(id, "\"1\"", $$"""{"design":{},"title":"Desk {{i}}"}"""), Cancel)));

        Assert.Single(answers, a => a.StatusCode == HttpStatusCode.OK);
        Assert.Equal(19, answers.Count(a => a.StatusCode == HttpStatusCode.PreconditionFailed));
        var whole = await _client.GetAsync($"/api/designs/{id}", HttpStatusCode.OK);
        Assert.Equal([2, 1], whole.GetProperty("revisions").EnumerateArray().Select(r => r.GetProperty("revision").GetInt32()));
    }

    [Theory]
    [InlineData(null, HttpStatusCode.PreconditionRequired)]
    [InlineData("\"abc\"", HttpStatusCode.BadRequest)]
    [InlineData("*", HttpStatusCode.BadRequest)]
    [InlineData("\"1\", \"2\"", HttpStatusCode.BadRequest)]
    [InlineData("\"0\"", HttpStatusCode.BadRequest)]
    [InlineData("\"7\"", HttpStatusCode.PreconditionFailed)]
    public async Task Save_without_one_readable_revision_is_refused(string? ifMatch, HttpStatusCode expected)
    {
        var id = (await _client.CreateAsync()).GetProperty("id").GetInt64();

        await (await _client.SaveAsync(id, ifMatch, """{"design":{}}""")).ReadAsync(expected);

        Assert.Equal(1, (await _client.GetAsync($"/api/designs/{id}", HttpStatusCode.OK)).GetProperty("revision").GetInt32());
    }

    [Fact]
    public async Task Revision_tells_the_versions_behind_it_and_on_request_todays_figures()
    {
        var id = (await _client.CreateAsync()).GetProperty("id").GetInt64();
        _service.Loss_W = 651;

        var plain = await _client.GetAsync($"/api/designs/{id}/revisions/1", HttpStatusCode.OK);
        var today = await _client.GetAsync($"/api/designs/{id}/revisions/1?today=true", HttpStatusCode.OK);

        var versions = plain.GetProperty("versions");
        Assert.Equal(CoreDesign.Magnetics.Kernel.Version, versions.GetProperty("todaysKernel").GetString());
        Assert.Equal(versions.GetProperty("kernel").GetString() == CoreDesign.Magnetics.Kernel.Version, versions.GetProperty("sameKernel").GetBoolean());
        Assert.False(plain.TryGetProperty("today", out _));
        Assert.Equal(651, today.GetProperty("today").GetProperty("noLoadLoss_W").GetDouble());
        Assert.False(today.GetProperty("today").GetProperty("sameFigures").GetBoolean());
        Assert.Equal(650, today.GetProperty("summary").GetProperty("noLoadLoss_W").GetDouble());
    }

    [Fact]
    public async Task Copy_begins_a_design_of_its_own()
    {
        var id = (await _client.CreateAsync()).GetProperty("id").GetInt64();

        var copy = await (await _client.PostAsync($"/api/designs/{id}/copies", Calls.Json("""{"revision":1,"title":"Variant"}"""), Cancel)).ReadAsync(HttpStatusCode.Created);
        var newest = await (await _client.PostAsync($"/api/designs/{id}/copies", Calls.Json("{}"), Cancel)).ReadAsync(HttpStatusCode.Created);

        Assert.Equal("Variant", copy.GetProperty("title").GetString());
        Assert.Equal("Station", newest.GetProperty("title").GetString());
        Assert.Contains($"Copy of design {id}, revision 1", copy.GetProperty("note").GetString(), StringComparison.Ordinal);
        await (await _client.PostAsync($"/api/designs/{id}/copies", Calls.Json("""{"revision":9}"""), Cancel)).ReadAsync(HttpStatusCode.NotFound);
    }

    [Fact]
    public async Task Notes_are_added_to_a_revision()
    {
        var id = (await _client.CreateAsync()).GetProperty("id").GetInt64();

        await (await _client.PostAsync($"/api/designs/{id}/revisions/1/notes", Calls.Json("""{"text":"gap 0.25 mm\nmeasured"}"""), Cancel)).ReadAsync(HttpStatusCode.Created);
        await (await _client.PostAsync($"/api/designs/{id}/revisions/1/notes", Calls.Json("""{"text":"  "}"""), Cancel)).ReadAsync(HttpStatusCode.BadRequest);
        await (await _client.PostAsync($"/api/designs/{id}/revisions/2/notes", Calls.Json("""{"text":"x"}"""), Cancel)).ReadAsync(HttpStatusCode.NotFound);

        var note = Assert.Single((await _client.GetAsync($"/api/designs/{id}/revisions/1", HttpStatusCode.OK)).GetProperty("notes").EnumerateArray());
        Assert.Equal("gap 0.25 mm\nmeasured", note.GetProperty("text").GetString());
        Assert.Equal("this desk", note.GetProperty("author").GetString());
    }

    [Fact]
    public async Task List_searches_and_pages_and_gives_the_total()
    {
        for (var i = 1; i <= 3; i++) await _client.CreateAsync($"Design {i}", note: i == 2 ? "needle" : "");

        var page = await _client.GetAsync("/api/designs?sort=title&page=2&pageSize=2", HttpStatusCode.OK);
        var found = await _client.GetAsync("/api/designs?search=needle&state=draft&joint=stepLap", HttpStatusCode.OK);

        Assert.Equal(3, page.GetProperty("total").GetInt32());
        Assert.Equal("Design 3", Assert.Single(page.GetProperty("items").EnumerateArray()).GetProperty("title").GetString());
        Assert.Equal("Design 2", Assert.Single(found.GetProperty("items").EnumerateArray()).GetProperty("title").GetString());
    }

    [Fact]
    public async Task Service_is_ready_when_the_history_answers()
    {
        Assert.Equal(HttpStatusCode.OK, (await _client.GetAsync(new Uri("/health/ready", UriKind.Relative), Cancel)).StatusCode);
        Assert.True(File.Exists(Path.Combine(_service.Folder, "coredesign.db")));
    }
}
