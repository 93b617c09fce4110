using System.Text.Json;
using System.Text.Json.Serialization;
using CoreDesign.Estimating.Contracts;
using CoreDesign.History.Drafts;
using CoreDesign.History.Model;
using Microsoft.AspNetCore.Http.HttpResults;

namespace CoreDesign.Web.Features.Designs;

/// <summary>Body of a draft: any JSON, and where the page started from.</summary>
public sealed record PutDraftRequest
{
    public long? DesignId { get; init; }
    public int? BaseRevision { get; init; }

    [JsonConverter(typeof(VerbatimJson))]
    public JsonElement? Payload { get; init; }
}

/// <summary>A draft as it was last put.</summary>
public sealed record DraftAnswer(Guid Key, long? DesignId, int? BaseRevision, [property: JsonConverter(typeof(VerbatimJson))] JsonElement Payload, DateTime UpdatedAt);

/// <summary>
/// Takes JSON as it is and writes it the same. The usual way decodes every text and name, and fails at half of a surrogate
/// pair, which a half-typed field may well hold.
/// </summary>
public sealed class VerbatimJson : JsonConverter<JsonElement>
{
    public override JsonElement Read(ref Utf8JsonReader reader, Type typeToConvert, JsonSerializerOptions options) => JsonElement.ParseValue(ref reader);

    public override void Write(Utf8JsonWriter writer, JsonElement value, JsonSerializerOptions options)
    {
        ArgumentNullException.ThrowIfNull(writer);
        writer.WriteRawValue(value.GetRawText());
    }
}

/// <summary>Half-filled design pages under keys that the page makes up; whoever knows a key may read and replace its draft.</summary>
internal static class DraftsApi
{
    public static void MapDraftsApi(this IEndpointRouteBuilder routes)
    {
        var drafts = routes.MapGroup("/api/drafts").WithTags("Drafts");
        drafts.MapGet("/{key}", FindAsync).WithName("GetDraft")
            .WithSummary("A half-filled design page")
            .ProducesProblem(400).ProducesProblem(404);
        drafts.MapPut("/{key}", PutAsync).WithName("PutDraft")
            .WithSummary("Keep a half-filled design page, in the place of what was there")
            .WithDescription($"The key is a UUID. The payload is any JSON of at most {DraftStore.LargestPayload_bytes / 1024} KiB. A draft that nobody touches for {DraftStore.KeptFor.Days} days is dropped.")
            .ProducesProblem(400).ProducesProblem(413).ProducesProblem(415);
    }

    private static async Task<Results<Ok<DraftAnswer>, ProblemHttpResult>> FindAsync(string key, DraftStore store, CancellationToken cancel)
    {
        if (!TryKey(key, out var found)) return BadKey(key);
        return await store.FindAsync(found, cancel) is { } draft ? TypedResults.Ok(Answer(draft)) : Problems.NotFound($"There is no draft '{found:D}'.");
    }

    private static async Task<Results<Ok<DraftAnswer>, ProblemHttpResult>> PutAsync(string key, JsonBody<PutDraftRequest> body, DraftStore store, CancellationToken cancel)
    {
        if (!TryKey(key, out var found)) return BadKey(key);
        if (body.Value is not { } request) return body.Problem!;
        if (request.Payload is not { } payload) return Problems.Refused("payload", "The payload is missing. Send the fields as typed, as JSON.");
        if (request.DesignId <= 0) return Problems.Refused("designId", $"{request.DesignId} is given; the id of a design is needed, or nothing.");
        if (request.BaseRevision <= 0) return Problems.Refused("baseRevision", $"{request.BaseRevision} is given; a revision number is needed, or nothing.");
        var text = payload.GetRawText();
        return DraftStore.Fits(text)
            ? TypedResults.Ok(Answer(await store.PutAsync(found, text, request.DesignId, request.BaseRevision, cancel)))
            : BoundedBody.TooLarge(DraftStore.LargestPayload_bytes);
    }

    private static DraftAnswer Answer(Draft draft)
    {
        using var payload = JsonDocument.Parse(draft.Payload);
        return new DraftAnswer(draft.Key, draft.DesignId, draft.BaseRevision, payload.RootElement.Clone(), draft.UpdatedAt);
    }

    private static bool TryKey(string text, out Guid key) => Guid.TryParseExact(text, "D", out key) && key != Guid.Empty;

    private static ProblemHttpResult BadKey(string key) =>
        Problems.Refused("key", $"'{DesignAddress.Cut(key)}' is given; a UUID is needed, as in 5d1c7a30-4b9e-4f62-8a05-d3e91c6b7f24.");
}
