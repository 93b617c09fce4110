using System.IO.Compression;
using System.Net;
using System.Text;
using System.Text.Json;
using CoreDesign.Web.Tests.Designs;

namespace CoreDesign.Web.Tests.Sheets;

public sealed class SheetsApiTests(Service service) : IClassFixture<Service>
{
    private readonly HttpClient _client = service.CreateClient();

    private static CancellationToken Cancel => TestContext.Current.CancellationToken;

    [Theory]
    [InlineData("", "595", "841")]
    [InlineData("?paper=a4", "595", "841")]
    [InlineData("?paper=letter", "612", "792")]
    public async Task Sheet_is_a_tagged_pdf_of_its_paper(string query, string width, string height)
    {
        var answer = await SheetAsync(await CreateAsync("Station"), query);

        Assert.Equal("application/pdf", answer.Content.Headers.ContentType!.ToString());
        var bytes = await answer.Content.ReadAsByteArrayAsync(Cancel);
        Assert.StartsWith("%PDF-1.7", Encoding.ASCII.GetString(bytes, 0, 20), StringComparison.Ordinal);
        Assert.EndsWith("%%EOF", Encoding.ASCII.GetString(bytes).TrimEnd(), StringComparison.Ordinal);
        var text = Inflated(bytes);
        Assert.Contains("/MarkInfo", text, StringComparison.Ordinal);
        Assert.Contains("/Marked true", text, StringComparison.Ordinal);
        Assert.Contains("/StructTreeRoot", text, StringComparison.Ordinal);
        Assert.Contains("/Lang", text, StringComparison.Ordinal);
        Assert.Matches($@"/MediaBox\s*\[\s*0 0 {width}(\.\d+)? {height}(\.\d+)?\s*\]", text);
    }

    [Fact]
    public async Task Same_revision_gives_the_same_bytes_also_after_a_later_one()
    {
        var id = await CreateAsync("Station");
        var first = await BytesAsync(id, "");
        await (await _client.SaveAsync(id, "\"1\"", """{"title":"Other title","design":{}}""")).ReadAsync(HttpStatusCode.OK);

        Assert.Equal(first, await BytesAsync(id, "?paper=a4"));
        Assert.Equal(await BytesAsync(id, "?paper=letter"), await BytesAsync(id, "?paper=letter&download=1"));
        Assert.NotEqual(first, await BytesAsync(id, "?paper=letter"));
        var second = await (await _client.GetAsync(new Uri($"/api/designs/{id}/revisions/2/sheets/design.pdf", UriKind.Relative), Cancel)).Content.ReadAsByteArrayAsync(Cancel);
        Assert.NotEqual(first, second);
    }

    [Fact]
    public async Task Sheets_asked_for_at_the_same_moment_are_the_same()
    {
        var id = await CreateAsync("Station");

        var sheets = await Task.WhenAll(Enumerable.Range(0, 8).Select(_ => Task.Run(async () => Convert.ToHexString(await BytesAsync(id, "")), Cancel)));

        Assert.Single(sheets.Distinct(StringComparer.Ordinal));
    }

    [Theory]
    [InlineData("<script>alert(1)</script>")]
    [InlineData("a\"; filename=\"evil.exe")]
    [InlineData("../../etc/passwd")]
    [InlineData("%0d%0aX-Evil: 1")]
    [InlineData("日本語 😀 عربي")]
    [InlineData("(a) \\ << >> stream endstream")]
    public async Task File_is_named_by_number_whatever_the_title_holds(string title)
    {
        var id = await CreateAsync(title);
        var name = $"CD-{id:00000}-rev1-a4.pdf";

        Assert.Equal($"inline; filename=\"{name}\"", (await SheetAsync(id, "")).Content.Headers.ContentDisposition!.ToString());
        var answer = await SheetAsync(id, "?download=1");
        Assert.Equal($"attachment; filename=\"{name}\"", answer.Content.Headers.ContentDisposition!.ToString());
        Assert.False(answer.Headers.Contains("X-Evil"));
        Assert.StartsWith("%PDF-1.7", Encoding.ASCII.GetString(await answer.Content.ReadAsByteArrayAsync(Cancel), 0, 8), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("a3")]
    [InlineData("A4")]
    [InlineData("")]
    [InlineData("a4&paper=letter")]
    [InlineData("%00")]
    [InlineData("../a4")]
    public async Task Paper_that_is_not_kept_is_answered_400_with_those_that_are(string paper)
    {
        var problem = await _client.GetAsync($"/api/designs/{await CreateAsync("x")}/revisions/1/sheets/design.pdf?paper={paper}", HttpStatusCode.BadRequest);

        Assert.Contains("a4 or letter", problem.Error("paper"), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("2", "design", "There is no revision '2'")]
    [InlineData("0", "design", "There is no revision '0'")]
    [InlineData("-1", "design", "There is no revision '-1'")]
    [InlineData("1.0", "design", "There is no revision '1.0'")]
    [InlineData("99999999999999999999", "design", "There is no revision")]
    [InlineData("1", "cutting2", "Sheets: design")]
    [InlineData("1", "..%2Fdesign", "Sheets: design")]
    [InlineData("1", "Design", "Sheets: design")]
    public async Task Sheet_that_does_not_exist_is_answered_404_by_name(string revision, string kind, string message)
    {
        var problem = await _client.GetAsync($"/api/designs/{await CreateAsync("x")}/revisions/{revision}/sheets/{kind}.pdf", HttpStatusCode.NotFound);

        Assert.Contains(message, problem.GetProperty("detail").GetString(), StringComparison.Ordinal);
    }

    private async Task<long> CreateAsync(string title)
    {
        var saved = await (await _client.PostJsonAsync("/api/designs", $$"""{"title":{{JsonSerializer.Serialize(title)}},"note":{{JsonSerializer.Serialize(title)}},"design":{} }""")).ReadAsync(HttpStatusCode.Created);
        return saved.GetProperty("id").GetInt64();
    }

    private async Task<HttpResponseMessage> SheetAsync(long id, string query)
    {
        var answer = await _client.GetAsync(new Uri($"/api/designs/{id}/revisions/1/sheets/design.pdf{query}", UriKind.Relative), Cancel);
        Assert.Equal(HttpStatusCode.OK, answer.StatusCode);
        return answer;
    }

    private async Task<byte[]> BytesAsync(long id, string query) => await (await SheetAsync(id, query)).Content.ReadAsByteArrayAsync(Cancel);

    /// <summary>The file as text with every deflated stream opened; objects lie in such streams.</summary>
    private static string Inflated(byte[] pdf)
    {
        var text = new StringBuilder(Encoding.Latin1.GetString(pdf));
        var raw = text.ToString();
        for (var at = raw.IndexOf("stream\n", StringComparison.Ordinal); at >= 0; at = raw.IndexOf("stream\n", at + 1, StringComparison.Ordinal))
        {
            if (raw[at - 1] == 'd') continue;
            try
            {
                using var deflated = new ZLibStream(new MemoryStream(pdf, at + 7, pdf.Length - at - 7), CompressionMode.Decompress);
                using var reader = new StreamReader(deflated, Encoding.Latin1);
                text.Append('\n').Append(reader.ReadToEnd());
            }
            catch (InvalidDataException)
            {
                // A stream that is not deflated, metadata for one, stands in the text already.
            }
        }

        return text.ToString();
    }
}
