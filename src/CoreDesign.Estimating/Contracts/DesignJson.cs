using System.Text;
using System.Text.Encodings.Web;
using System.Text.Json;
using System.Text.Json.Serialization;
using System.Text.Unicode;

namespace CoreDesign.Estimating.Contracts;

/// <summary>
/// The one way in which designs, results and other contracts become JSON and come back: in the API and in the
/// stored revisions. Doubles are written in the shortest form that reads back to the same bits.
/// </summary>
public static class DesignJson
{
    public const int MaxDepth = 32;

    public static JsonSerializerOptions Options { get; } = Frozen(JsonUnmappedMemberHandling.Disallow);

    // A member that a later contract gave up must not make an old revision unreadable.
    private static readonly JsonSerializerOptions StoredOptions = Frozen(JsonUnmappedMemberHandling.Skip);

    /// <summary>Sets the rules on options that someone else owns, those of the web server for one.</summary>
    public static void Configure(JsonSerializerOptions options)
    {
        ArgumentNullException.ThrowIfNull(options);
        options.PropertyNamingPolicy = JsonNamingPolicy.CamelCase;
        options.PropertyNameCaseInsensitive = false;
        options.UnmappedMemberHandling = JsonUnmappedMemberHandling.Disallow;
        options.NumberHandling = JsonNumberHandling.Strict;
        options.DefaultIgnoreCondition = JsonIgnoreCondition.WhenWritingNull;
        options.AllowDuplicateProperties = false;
        options.MaxDepth = MaxDepth;
        options.Encoder = JavaScriptEncoder.Create(UnicodeRanges.All);
    }

    /// <exception cref="ArgumentException">A number is NaN or infinite; JSON has no such numbers.</exception>
    public static string Write<T>(T value) => JsonSerializer.Serialize(value, Options);

    /// <summary>Reads what <see cref="Write"/> wrote. For text from outside use <see cref="Read{T}(ReadOnlyMemory{byte})"/>.</summary>
    public static T ReadStored<T>(string json)
        where T : class =>
        JsonSerializer.Deserialize<T>(json, StoredOptions) ?? throw new JsonException($"The stored {typeof(T).Name} is empty.");

    public static Outcome<T> Read<T>(string json)
        where T : class =>
        Read<T>(Encoding.UTF8.GetBytes(json));

    /// <summary>
    /// Reads JSON from outside. Every member that is unknown, given twice or of the wrong type is reported with its
    /// path, all in one go; nothing is ignored.
    /// </summary>
    public static Outcome<T> Read<T>(ReadOnlyMemory<byte> utf8)
        where T : class
    {
        if (utf8.Span.StartsWith("\uFEFF"u8)) utf8 = utf8[3..];
        if (!Utf8.IsValid(utf8.Span)) return Refused<T>("$", "The text is not UTF-8. Send JSON encoded as UTF-8.");
        if (utf8.Span.Trim(" \t\r\n"u8).IsEmpty) return Refused<T>("$", "The body is empty. Send a JSON object.");
        try
        {
            using var document = JsonDocument.Parse(utf8, new JsonDocumentOptions { MaxDepth = MaxDepth });
            var errors = JsonShape.Check(document.RootElement, Options.GetTypeInfo(typeof(T)));
            return errors.Count > 0
                ? new Outcome<T> { Errors = errors }
                : new Outcome<T> { Value = document.RootElement.Deserialize<T>(Options) };
        }
        catch (JsonException e)
        {
            var place = e.LineNumber is { } line
                ? $" near line {line + 1}, byte {(e.BytePositionInLine ?? 0) + 1} of that line"
                : "";
            return Refused<T>("$", $"This is not JSON that can be read{place}. At most {MaxDepth} levels of nesting; no comments, no trailing commas.");
        }
    }

    private static Outcome<T> Refused<T>(string path, string message)
        where T : class =>
        new() { Errors = [new FieldError(path, message)] };

    private static JsonSerializerOptions Frozen(JsonUnmappedMemberHandling unknownMembers)
    {
        var options = new JsonSerializerOptions();
        Configure(options);
        options.UnmappedMemberHandling = unknownMembers;
        options.MakeReadOnly(populateMissingResolver: true);
        return options;
    }
}
