using System.Text.Json;

namespace CoreDesign.Web.Features.Design;

/// <summary>What a draft keeps beside the typed texts: which revision was the newest when the page was opened, and whether the order is invented.</summary>
public sealed record DraftPayload(string Texts, int? NewestRevision, bool Demo)
{
    public string ToJson() => JsonSerializer.Serialize(this);

    /// <summary>Reads a draft; an unreadable one is null.</summary>
    public static DraftPayload? FromJson(string json)
    {
        try
        {
            return JsonSerializer.Deserialize<DraftPayload>(json);
        }
        catch (JsonException)
        {
            return null;
        }
    }
}
