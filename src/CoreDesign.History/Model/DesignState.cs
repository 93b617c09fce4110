using System.Text.Json.Serialization;

namespace CoreDesign.History.Model;

/// <summary>How far a revision has come, in the order of the work. The number is what is stored, and what sorts.</summary>
[JsonConverter(typeof(JsonStringEnumConverter<DesignState>))]
public enum DesignState
{
    [JsonStringEnumMemberName("draft")] Draft = 0,
    [JsonStringEnumMemberName("checked")] Checked = 1,
    [JsonStringEnumMemberName("offered")] Offered = 2,
    [JsonStringEnumMemberName("built")] Built = 3,
    [JsonStringEnumMemberName("tested")] Tested = 4,
    [JsonStringEnumMemberName("withdrawn")] Withdrawn = 5,
}

/// <summary>The states by the names used in the API and on the page.</summary>
public static class DesignStates
{
    public static IReadOnlyDictionary<string, DesignState> ByName { get; } =
        Enum.GetValues<DesignState>().ToDictionary(Name, StringComparer.Ordinal);

    public static string Name(this DesignState state) => state.ToString().ToLowerInvariant();
}
