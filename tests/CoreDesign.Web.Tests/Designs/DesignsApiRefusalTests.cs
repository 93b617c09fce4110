using System.Net;
using System.Text;

namespace CoreDesign.Web.Tests.Designs;

/// <summary>Hostile and mistaken input at every door of the designs API: a plain answer, and nothing stored.</summary>
public sealed class DesignsApiRefusalTests(Service service) : IClassFixture<Service>
{
    private readonly HttpClient _client = service.CreateClient();

    private static CancellationToken Cancel => TestContext.Current.CancellationToken;

    [Theory]
    [InlineData("0")]
    [InlineData("-1")]
    [InlineData("+1")]
    [InlineData("1e3")]
    [InlineData("999999999")]
    [InlineData("99999999999999999999999999")]
    [InlineData("1' OR '1'='1")]
    [InlineData("%3Cscript%3Ealert(1)%3C%2Fscript%3E")]
    [InlineData("..%2F..%2Fetc%2Fpasswd")]
    [InlineData("\u0661")]
    public async Task Unknown_design_is_answered_404_with_its_id(string id)
    {
        foreach (var address in new[] { $"/api/designs/{id}", $"/api/designs/{id}/revisions/1", $"/api/designs/{id}/revisions/{id}" })
        {
            var problem = await _client.GetAsync(address, HttpStatusCode.NotFound);
            Assert.Contains("There is no", problem.GetProperty("detail").GetString(), StringComparison.Ordinal);
        }
    }

    [Theory]
    [InlineData("?pageSize=1000000", "pageSize", "from 1 to 200")]
    [InlineData("?pageSize=0", "pageSize", "from 1 to 200")]
    [InlineData("?page=-3", "page", "from 1 to 1000000")]
    [InlineData("?page=1&page=2", "page", "1,2")]
    [InlineData("?page=NaN", "page", "'NaN' is given")]
    [InlineData("?sort=Id;DROP TABLE Designs", "sort", "changed, id, revision")]
    [InlineData("?state=deleted", "state", "draft, checked, offered")]
    [InlineData("?search=%00", "search", "control character")]
    public async Task List_with_a_wrong_query_is_answered_400_naming_it(string query, string path, string message) =>
        Assert.Contains(message, (await _client.GetAsync("/api/designs" + query, HttpStatusCode.BadRequest)).Error(path), StringComparison.Ordinal);

    [Theory]
    [InlineData("""{"title":"x"}""", "design", "missing")]
    [InlineData("""{"design":{}}""", "title", "empty")]
    [InlineData("""{"title":"   ","design":{}}""", "title", "empty")]
    [InlineData("""{"title":"two\nlines","design":{}}""", "title", "control or invisible characters")]
    [InlineData("""{"title":"a\u202eb","design":{}}""", "title", "The title holds control or invisible characters. Type it again as plain text, at most 200 characters.")]
    [InlineData("""{"title":"a\u200bb","design":{}}""", "title", "control or invisible characters")]
    [InlineData("""{"title":"x","note":"a\u2066b","design":{}}""", "note", "The note holds control or invisible characters. Type it again as plain text, at most 4000 characters.")]
    [InlineData("""{"title":"x","note":"\u0000","design":{}}""", "note", "control or invisible characters")]
    [InlineData("""{"title":"x","state":"checked","design":{}}""", "state", "'state' is not a member here")]
    [InlineData("""{"title":"x","author":"someone","design":{}}""", "author", "'author' is not a member here")]
    [InlineData("""{"title":"x","design":{"core":{"windowHeight_mm":"520"}}}""", "design.core.windowHeight_mm", "JSON number")]
    [InlineData("""{"title":"x","design":{"core":{"windowHeight_mm":1e999}}}""", "design.core.windowHeight_mm", "too large")]
    [InlineData("""{"title":"x","design":{"core":{"windowHeight_mm":NaN}}}""", "$", "not JSON")]
    [InlineData("""{"title":"x","design":{"order":{"reference":"out of range"}}}""", "design.core.windowHeight_mm", "-5 mm")]
    [InlineData("", "$", "empty")]
    public async Task Create_with_a_wrong_body_is_answered_400_naming_the_member(string body, string path, string message)
    {
        var before = await CountAsync();

        var problem = await (await _client.PostAsync("/api/designs", Calls.Json(body), Cancel)).ReadAsync(HttpStatusCode.BadRequest);

        Assert.Contains(message, problem.Error(path), StringComparison.Ordinal);
        Assert.Equal(before, await CountAsync());
    }

    [Fact]
    public async Task Design_without_a_solution_is_answered_422_with_the_residual()
    {
        var answer = await _client.PostAsync("/api/designs", Calls.Json("""{"title":"x","design":{"order":{"reference":"no solution"}}}"""), Cancel);

        var problem = await answer.ReadAsync(HttpStatusCode.UnprocessableEntity);

        Assert.Equal("The core saturates.", problem.GetProperty("detail").GetString());
        Assert.Equal(0.25, problem.GetProperty("residual").GetDouble());
    }

    [Fact]
    public async Task Failure_of_the_service_is_answered_500_without_its_inner_working()
    {
        var answer = await _client.PostAsync("/api/designs", Calls.Json("""{"title":"x","design":{"order":{"reference":"breaks"}}}"""), Cancel);

        var problem = await answer.ReadAsync(HttpStatusCode.InternalServerError);

        Assert.DoesNotContain("secret", problem.GetRawText(), StringComparison.Ordinal);
    }

    [Fact]
    public async Task Body_of_other_content_or_size_is_refused()
    {
        var form = await _client.PostAsync("/api/designs", new StringContent("title=x", Encoding.UTF8, "application/x-www-form-urlencoded"), Cancel);
        await form.ReadAsync(HttpStatusCode.UnsupportedMediaType);

        var large = "{\"title\":\"x\",\"design\":{},\"note\":\"" + new string('n', 1024 * 1024) + "\"}";
        await (await _client.PostAsync("/api/designs", Calls.Json(large), Cancel)).ReadAsync(HttpStatusCode.RequestEntityTooLarge);

        // Without a stated length the service must count for itself.
        using var chunked = new HttpRequestMessage(HttpMethod.Post, "/api/designs") { Content = new StreamContent(new MemoryStream(Encoding.UTF8.GetBytes(large))) };
        chunked.Content.Headers.ContentType = new("application/json");
        chunked.Content.Headers.ContentLength = null;
        chunked.Headers.TransferEncodingChunked = true;
        await (await _client.SendAsync(chunked, Cancel)).ReadAsync(HttpStatusCode.RequestEntityTooLarge);
    }

    [Fact]
    public async Task Method_that_a_design_does_not_have_is_a_problem_too()
    {
        await (await _client.DeleteAsync(new Uri("/api/designs/1", UriKind.Relative), Cancel)).ReadAsync(HttpStatusCode.MethodNotAllowed);
        await _client.GetAsync("/api/nothing", HttpStatusCode.NotFound);
    }

    [Fact]
    public async Task Html_in_titles_and_notes_comes_back_as_the_text_it_is()
    {
        const string Html = "<script>alert('x')</script> & \"more\"";

        var created = await _client.CreateAsync(Html, note: Html);
        var read = await _client.GetAsync($"/api/designs/{created.GetProperty("id").GetInt64()}", HttpStatusCode.OK);

        Assert.Equal(Html, read.GetProperty("title").GetString());
        Assert.Equal(Html, read.GetProperty("current").GetProperty("note").GetString());
        Assert.DoesNotContain("<script>", read.GetRawText(), StringComparison.Ordinal);
    }

    private async Task<int> CountAsync() => (await _client.GetAsync("/api/designs", HttpStatusCode.OK)).GetProperty("total").GetInt32();
}
