using System.Globalization;
using System.Text.Json;
using System.Text.Json.Nodes;
using System.Text.RegularExpressions;
using CoreDesign.Estimating.Contracts;

namespace CoreDesign.Web.Features.Design;

/// <summary>Between a design and its fields by JSON path; the contract's names are the form's names, so no field is mapped by hand.</summary>
public static partial class DesignPaths
{
    private const int LongestList = 200;

    /// <summary>Every value of a design by its path, list items as <c>core.limbSteps[0].width_mm</c>; numbers as double, the rest as string.</summary>
    public static IReadOnlyDictionary<string, object> Flatten(DesignInput design)
    {
        var values = new Dictionary<string, object>(StringComparer.Ordinal);
        Walk(JsonSerializer.SerializeToNode(design, DesignJson.Options), "", values);
        return values;
    }

    /// <summary>The design that holds these values; an empty group stays out.</summary>
    public static DesignInput Build(IEnumerable<KeyValuePair<string, object>> values)
    {
        var root = new JsonObject();
        foreach (var (path, value) in values)
        {
            Put(root, Step().Matches(path).Select(m => m.Value).ToList(), Leaf(path, value));
        }

        return root.Deserialize<DesignInput>(DesignJson.Options) ?? new();
    }

    private static JsonValue Leaf(string path, object value) => value switch
    {
        double number when path.StartsWith("order.phases", StringComparison.Ordinal) || IsWhole(path) => JsonValue.Create((int)number),
        double number => JsonValue.Create(number),
        string text => JsonValue.Create(text),
        _ => throw new ArgumentException($"The field {path} holds a {value.GetType().Name}; it takes a number or a text.", nameof(value)),
    };

    private static bool IsWhole(string path) => Estimating.Fields.FieldCatalog.TryFind(path)?.Whole ?? false;

    private static void Walk(JsonNode? node, string path, Dictionary<string, object> values)
    {
        switch (node)
        {
            case JsonObject group:
                foreach (var (name, child) in group)
                {
                    Walk(child, path.Length == 0 ? name : $"{path}.{name}", values);
                }

                break;
            case JsonArray list:
                for (var i = 0; i < list.Count; i++)
                {
                    Walk(list[i], string.Create(CultureInfo.InvariantCulture, $"{path}[{i}]"), values);
                }

                break;
            case JsonValue leaf:
                values[path] = leaf.GetValueKind() == JsonValueKind.String ? leaf.GetValue<string>() : leaf.Deserialize<double>();
                break;
        }
    }

    private static void Put(JsonNode at, List<string> steps, JsonNode leaf)
    {
        for (var i = 0; i < steps.Count; i++)
        {
            var next = i == steps.Count - 1 ? leaf : null;
            JsonNode Make() => next ?? (steps[i + 1][0] == '[' ? new JsonArray() : new JsonObject());
            if (at is JsonArray list)
            {
                var index = int.Parse(steps[i].Trim('[', ']'), CultureInfo.InvariantCulture);
                if (index >= LongestList)
                {
                    throw new FormatException($"A list of the form has at most {LongestList} items.");
                }

                // A row that is left out is an empty row, so that its fields are the ones that are missing.
                var rows = i < steps.Count - 1 && steps[i + 1][0] != '[';
                while (list.Count <= index)
                {
                    list.Add(rows ? new JsonObject() : null);
                }

                at = list[index] ??= Make();
            }
            else
            {
                at = at[steps[i]] ??= Make();
            }
        }
    }

    [GeneratedRegex(@"\[\d+\]|[^.\[\]]+", RegexOptions.ExplicitCapture, 1000)]
    private static partial Regex Step();
}
