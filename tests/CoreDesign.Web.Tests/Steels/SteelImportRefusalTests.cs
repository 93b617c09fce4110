using System.Net;
using System.Text;
using CoreDesign.Estimating.Steels.Import;
using CoreDesign.Web.Tests.Designs;

namespace CoreDesign.Web.Tests.Steels;

/// <summary>Files that are no steel data at the door of the import: the place is named, and nothing is stored even with commit=true.</summary>
public sealed class SteelImportRefusalTests(Service service) : IClassFixture<Service>
{
    private static readonly string Good = SteelImport.Template;
    private readonly HttpClient _client = service.CreateClient();

    private static CancellationToken Cancel => TestContext.Current.CancellationToken;

    public static TheoryData<string, byte[], string, string> Files() => new()
    {
        { "empty", [], "file", "start from the template" },
        { "blank", " \r\n\t"u8.ToArray(), "file", "start from the template" },
        { "NUL", Encoding.UTF8.GetBytes(Good.Replace("Example", "Ex\0mple", StringComparison.Ordinal)), "line 6", "U+0000" },
        { "UTF-16 without mark", Encoding.BigEndianUnicode.GetBytes(Good), "line 1", "U+0000" },
        { "UTF-32", [.. Encoding.UTF32.GetPreamble(), .. Encoding.UTF32.GetBytes(Good)], "line 1", "U+0000" },
        { "workbook", [.. "PK\u0003\u0004"u8, .. new byte[5000]], "file", "save the table as CSV" },
        { "PDF", "%PDF-1.7\n"u8.ToArray(), "file", "save the table as CSV" },
        { "picture", [0x89, .. "PNG\r\n"u8, 0x1A, .. new byte[100]], "line 1", "binary" },
        { "random", Random(), "line 1", "binary" },
        { "open quotation", Encoding.UTF8.GetBytes(Good.Replace("Example", "\"Example", StringComparison.Ordinal)), "line 1", "quotation mark" },
        { "name of 100000 characters", Encoding.UTF8.GetBytes(Good.Replace("Example steel coil 0001", new string('n', 100_000), StringComparison.Ordinal)), "line 1", "too long" },
        { "name of 100 characters", Encoding.UTF8.GetBytes(Good.Replace("Example steel coil 0001", new string('n', 100), StringComparison.Ordinal)), "line 6, name", "80 at most" },
        { "built-in name", Encoding.UTF8.GetBytes(Good.Replace("Example steel coil 0001", "M105-30P", StringComparison.Ordinal)), "name", "built-in grade" },
        { "name of points", Encoding.UTF8.GetBytes(Good.Replace("Example steel coil 0001", "..", StringComparison.Ordinal)), "name", "coil or certificate number" },
        { "name of an address", Encoding.UTF8.GetBytes(Good.Replace("Example steel coil 0001", "Import", StringComparison.Ordinal)), "name", "coil or certificate number" },
        { "turned writing", Encoding.UTF8.GetBytes(Good.Replace("Example", "Ex\u202Eample", StringComparison.Ordinal)), "line 6, name", "invisible" },
        { "rows alone", Encoding.UTF8.GetBytes(string.Concat(Enumerable.Repeat("loss,50,1.0,0.3\r\n", 100_000))), "file", "no header row" },
        { "JSON", "{\"name\":\"x\"}"u8.ToArray(), "file", "no header row" },
    };

    public static TheoryData<string, string, string> Values() => new()
    {
        { "NaN", "not a finite number", "not a finite number" },
        { "Infinity", "not a finite number", "not a finite number" },
        { "1e308", "between 0.1 and 0.65 mm", "1000000 A/m" },
        { "1e999", "too large", "too large" },
        { "-1", "between 0.1 and 0.65 mm", "0.000001 to" },
        { "-0", "between 0.1 and 0.65 mm", "0.000001 to" },
        { "0x10", "no unit", "no unit" },
        { "9 A/m", "no unit", "no unit" },
        { "1.234.567", "thousands", "thousands" },
        { "½", "not a number", "not a number" },
        { "", "empty", "empty" },
    };

    [Theory]
    [MemberData(nameof(Files), DisableDiscoveryEnumeration = true)]
    public async Task File_that_is_no_steel_data_is_refused_by_place_with_the_mend(string what, byte[] file, string place, string message)
    {
        Assert.NotEmpty(what);
        await RefusedAsync(file, place, message);
    }

    [Theory]
    [MemberData(nameof(Values))]
    public async Task Value_that_is_none_is_refused_by_line_and_column(string value, string ofThickness, string ofPoint)
    {
        await RefusedAsync(Encoding.UTF8.GetBytes(Good.Replace("thickness_mm,0.3\r", $"thickness_mm,{value}\r", StringComparison.Ordinal)), "line 8, thickness_mm", ofThickness);
        await RefusedAsync(Encoding.UTF8.GetBytes(Good.Replace("magnetization,50,0.5,9\r", $"magnetization,50,0.5,{value}\r", StringComparison.Ordinal)), "line 15, value", ofPoint);
    }

    [Fact]
    public async Task Decimal_commas_between_commas_are_refused_with_the_mend() =>
        await RefusedAsync(Encoding.UTF8.GetBytes(Good.Replace("magnetization,50,0.5,9\r", "magnetization,50,0,5,9\r", StringComparison.Ordinal)), "line 15", "semicolons or tabs");

    [Theory]
    [InlineData("\n")]
    [InlineData("\r")]
    [InlineData("\r\n")]
    public async Task Any_line_end_separator_mark_and_encoding_reads_the_same_steel(string lineEnd)
    {
        var text = Good.Replace("\r\n", lineEnd, StringComparison.Ordinal);
        var semicolons = SteelImport.TemplateWithDecimalComma.Replace("\r\n", lineEnd, StringComparison.Ordinal);
        var quoted = text.Replace("Example steel coil 0001", "\"Example steel coil 0001\"", StringComparison.Ordinal);
        byte[][] files =
        [
            Encoding.UTF8.GetBytes(text),
            [.. Encoding.UTF8.GetPreamble(), .. Encoding.UTF8.GetBytes(text)],
            [.. Encoding.Unicode.GetPreamble(), .. Encoding.Unicode.GetBytes(text)],
            [.. Encoding.BigEndianUnicode.GetPreamble(), .. Encoding.BigEndianUnicode.GetBytes(text)],
            Encoding.UTF8.GetBytes(semicolons),
            Encoding.UTF8.GetBytes(semicolons.Replace(';', '\t')),
            Encoding.UTF8.GetBytes(quoted),
        ];
        var steels = new HashSet<string>(StringComparer.Ordinal);
        foreach (var file in files)
            steels.Add((await (await SendAsync(file, "text/csv")).ReadAsync(HttpStatusCode.OK)).GetProperty("steel").GetRawText());

        Assert.Single(steels);
    }

    [Fact]
    public async Task Latin1_is_read_with_a_warning()
    {
        var preview = await (await SendAsync(Encoding.Latin1.GetBytes(Good.Replace("Example steel", "Größe", StringComparison.Ordinal)), "text/csv")).ReadAsync(HttpStatusCode.OK);

        Assert.Equal("Größe coil 0001", preview.GetProperty("steel").GetProperty("summary").GetProperty("grade").GetString());
        Assert.Contains("Latin-1", preview.GetProperty("warnings")[0].GetProperty("message").GetString(), StringComparison.Ordinal);
    }

    [Fact]
    public async Task Quoted_name_keeps_separators_and_quotation_marks()
    {
        var preview = await (await SendAsync(Encoding.UTF8.GetBytes(Good.Replace("Example steel coil 0001", "\"Coil \"\"A\"\", 1; 2\"", StringComparison.Ordinal)), "text/csv")).ReadAsync(HttpStatusCode.OK);

        Assert.Equal("Coil \"A\", 1; 2", preview.GetProperty("steel").GetProperty("summary").GetProperty("grade").GetString());
    }

    [Fact]
    public async Task Ten_megabytes_are_answered_413_with_the_limit()
    {
        var problem = await (await SendAsync(Encoding.ASCII.GetBytes(string.Concat(Enumerable.Repeat("loss,50,1.0,0.3\r\n", 620_000))), "text/csv")).ReadAsync(HttpStatusCode.RequestEntityTooLarge);

        Assert.Contains("2048 KiB", problem.GetProperty("detail").GetString(), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(null)]
    [InlineData("application/json")]
    [InlineData("text/plain")]
    [InlineData("application/octet-stream")]
    [InlineData("multipart/form-data; boundary=x")]
    [InlineData("text/csvx")]
    public async Task Other_content_is_answered_415_with_the_type_that_is_needed(string? contentType)
    {
        var problem = await (await SendAsync(Encoding.UTF8.GetBytes(Good), contentType)).ReadAsync(HttpStatusCode.UnsupportedMediaType);

        Assert.Contains("text/csv", problem.GetProperty("detail").GetString(), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("")]
    [InlineData("TRUE")]
    [InlineData("1")]
    [InlineData("%00")]
    [InlineData("true&commit=false")]
    public async Task Commit_is_true_or_false(string given)
    {
        var answer = await _client.PostAsync(new Uri("/api/steels/import?commit=" + given, UriKind.Relative), Calls.Bytes(Encoding.UTF8.GetBytes(Good), "text/csv"), Cancel);

        Assert.Contains("true or false", (await answer.ReadAsync(HttpStatusCode.BadRequest)).Error("commit"), StringComparison.Ordinal);
    }

    private static byte[] Random()
    {
        var bytes = new byte[100_000];
        new Random(7).NextBytes(bytes);
        bytes[0] = 0;
        return bytes;
    }

    private async Task RefusedAsync(byte[] file, string place, string message)
    {
        var before = await StoredAsync();
        foreach (var query in new[] { "", "?commit=true" })
        {
            var problem = await (await SendAsync(file, "text/csv", query)).ReadAsync(HttpStatusCode.BadRequest);
            Assert.Contains(message, problem.Error(place), StringComparison.Ordinal);
            Assert.Contains("nothing was stored", problem.GetProperty("title").GetString(), StringComparison.Ordinal);
        }

        Assert.Equal(before, await StoredAsync());
    }

    private Task<HttpResponseMessage> SendAsync(byte[] file, string? contentType, string query = "") =>
        _client.PostAsync(new Uri("/api/steels/import" + query, UriKind.Relative), Calls.Bytes(file, contentType), Cancel);

    private async Task<string> StoredAsync() => (await _client.GetAsync("/api/steels", HttpStatusCode.OK)).GetRawText();
}
