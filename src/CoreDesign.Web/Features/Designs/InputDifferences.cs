using System.Globalization;
using System.Text.Json;
using CoreDesign.Estimating.Contracts;

namespace CoreDesign.Web.Features.Designs;

/// <summary>Where two designs differ, field by field.</summary>
public static class InputDifferences
{
    public static IReadOnlyList<InputDifference> Between(DesignInput yours, DesignInput theirs)
    {
        var (left, right) = (Leaves(yours), Leaves(theirs));
        return [.. left.Keys.Union(right.Keys, StringComparer.Ordinal)
            .Select(path => new InputDifference(path, left.GetValueOrDefault(path), right.GetValueOrDefault(path)))
            .Where(d => !string.Equals(d.Yours, d.Theirs, StringComparison.Ordinal))];
    }

    private static Dictionary<string, string> Leaves(DesignInput design)
    {
        var leaves = new Dictionary<string, string>(StringComparer.Ordinal);
        Walk(JsonSerializer.SerializeToElement(design, DesignJson.Options), "", leaves);
        return leaves;
    }

    private static void Walk(JsonElement element, string path, Dictionary<string, string> leaves)
    {
        switch (element.ValueKind)
        {
            case JsonValueKind.Object:
                foreach (var member in element.EnumerateObject())
                    Walk(member.Value, path.Length == 0 ? member.Name : $"{path}.{member.Name}", leaves);
                break;
            case JsonValueKind.Array:
                var index = 0;
                foreach (var entry in element.EnumerateArray())
                    Walk(entry, string.Create(CultureInfo.InvariantCulture, $"{path}[{index++}]"), leaves);
                break;
            default:
                leaves[path] = element.ToString();
                break;
        }
    }
}
