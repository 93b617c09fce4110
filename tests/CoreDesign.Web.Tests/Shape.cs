using System.Text.Json;
using System.Text.Json.Nodes;

namespace CoreDesign.Web.Tests;

/// <summary>Holds an answer against a sample of it: every member there, of the same kind; numbers finite; the first entry of a list stands for all.</summary>
internal static class Shape
{
    public static void Holds(JsonNode sample, JsonElement found, string path)
    {
        switch (sample)
        {
            case JsonObject members:
                Assert.True(found.ValueKind == JsonValueKind.Object, $"{path} is no object");
                foreach (var (name, member) in members)
                {
                    Assert.True(found.TryGetProperty(name, out var there), $"{path}.{name} is missing");
                    Holds(member!, there, $"{path}.{name}");
                }

                break;
            case JsonArray list:
                Assert.True(found.ValueKind == JsonValueKind.Array, $"{path} is no list");
                if (list.Count == 0) break;
                Assert.True(found.GetArrayLength() > 0, $"{path} is empty");
                foreach (var entry in found.EnumerateArray()) Holds(list[0]!, entry, path + "[]");
                break;
            default:
                Assert.True(sample.GetValueKind() == found.ValueKind, $"{path} is {found.ValueKind}");
                if (found.ValueKind == JsonValueKind.Number) Assert.True(double.IsFinite(found.GetDouble()), $"{path} is {found.GetRawText()}");
                break;
        }
    }
}
