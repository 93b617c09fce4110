using System.Globalization;
using System.Text.Json;
using System.Text.Json.Serialization.Metadata;

namespace CoreDesign.Estimating.Contracts;

/// <summary>
/// Holds JSON against the shape of a contract and collects every misfit. The serializer alone would stop at the
/// first one, and would speak of .NET types.
/// </summary>
internal static class JsonShape
{
    private const int ShownValueLength = 40;
    private const int LongestName = 100;

    /// <summary>Past this the rest is not read: nobody mends more at once, and a body of misfits must not become an answer of megabytes.</summary>
    private const int MostErrors = 100;

    public static IReadOnlyList<FieldError> Check(JsonElement root, JsonTypeInfo type)
    {
        var errors = new List<FieldError>();
        Walk(root, type, "", errors);
        if (errors.Count < MostErrors) return errors;
        return [.. errors.Take(MostErrors), new FieldError("$", $"There are {MostErrors} misfits or more; only these are listed. Mend them and send again.")];
    }

    private static void Walk(JsonElement element, JsonTypeInfo type, string path, List<FieldError> errors)
    {
        if (errors.Count >= MostErrors || (Nullable.GetUnderlyingType(type.Type) ?? type.Type) == typeof(JsonElement)) return;
        if (element.ValueKind == JsonValueKind.Null)
        {
            // A null member counts as left out; the root and the entries of a list must be there.
            if (path.Length == 0 || path.EndsWith(']')) Add("null is given where a value is needed.");
            return;
        }

        switch (type.Kind)
        {
            case JsonTypeInfoKind.Object when element.ValueKind == JsonValueKind.Object:
                WalkObject(element, type, path, errors);
                break;
            case JsonTypeInfoKind.Object:
                Add($"{Shown(element)} is given where an object with the members {Names(type)} is needed.");
                break;
            case JsonTypeInfoKind.Enumerable when element.ValueKind == JsonValueKind.Array:
                var entryType = type.Options.GetTypeInfo(type.ElementType!);
                var index = 0;
                foreach (var entry in element.EnumerateArray())
                    Walk(entry, entryType, string.Create(CultureInfo.InvariantCulture, $"{path}[{index++}]"), errors);
                break;
            case JsonTypeInfoKind.Dictionary when element.ValueKind == JsonValueKind.Object:
                var names = new HashSet<string>(StringComparer.Ordinal);
                foreach (var member in element.EnumerateObject())
                {
                    if (NameOf(member, path, errors) is not { } name) continue;
                    var memberPath = Under(path, name);
                    if (!names.Add(name)) errors.Add(new FieldError(memberPath, $"'{Cut(name)}' is given twice. Give it once."));
                    Walk(member.Value, type.Options.GetTypeInfo(type.ElementType!), memberPath, errors);
                }

                break;
            case JsonTypeInfoKind.Dictionary:
                Add($"{Shown(element)} is given where an object of named entries is needed.");
                break;
            case JsonTypeInfoKind.Enumerable:
                Add($"{Shown(element)} is given where a list in square brackets is needed.");
                break;
            default:
                if (ScalarMisfit(element, Nullable.GetUnderlyingType(type.Type) ?? type.Type) is { } misfit) Add(misfit);
                break;
        }

        void Add(string message) => errors.Add(new FieldError(path.Length == 0 ? "$" : path, message));
    }

    private static void WalkObject(JsonElement element, JsonTypeInfo type, string path, List<FieldError> errors)
    {
        var seen = new HashSet<string>(StringComparer.Ordinal);
        foreach (var member in element.EnumerateObject())
        {
            if (errors.Count >= MostErrors) return;
            if (NameOf(member, path, errors) is not { } name) continue;
            var memberPath = Under(path, name);
            var property = type.Properties.FirstOrDefault(p => string.Equals(p.Name, name, StringComparison.Ordinal));
            if (property is null)
                errors.Add(new FieldError(memberPath, UnknownMember(name, type)));
            else if (!seen.Add(name))
                errors.Add(new FieldError(memberPath, $"'{name}' is given twice. Give it once."));
            else
                Walk(member.Value, type.Options.GetTypeInfo(property.PropertyType), memberPath, errors);
        }

        foreach (var missing in type.Properties.Where(p => p.IsRequired && !seen.Contains(p.Name)))
            errors.Add(new FieldError(Under(path, missing.Name), $"'{missing.Name}' is missing."));
    }

    /// <summary>The member's name, or null, with the error said, where it can't be decoded or is no name any more.</summary>
    private static string? NameOf(JsonProperty member, string path, List<FieldError> errors)
    {
        var place = path.Length == 0 ? "$" : path;
        try
        {
            if (member.Name.Length <= LongestName) return member.Name;
            errors.Add(new FieldError(place, $"A member's name has {member.Name.Length} characters; at most {LongestName}. It begins with '{Cut(member.Name)}'."));
        }
        catch (InvalidOperationException)
        {
            errors.Add(new FieldError(place, "A member's name holds half of a surrogate pair and can't be read."));
        }

        return null;
    }

    private static string Under(string path, string name) => path.Length == 0 ? name : $"{path}.{name}";

    private static string UnknownMember(string name, JsonTypeInfo type)
    {
        var shown = Cut(name);
        var near = NearestName.Of(name, type.Properties.Select(p => p.Name), count: 1);
        return near.Count == 0
            ? $"'{shown}' is not a member here. Known members: {Names(type)}."
            : $"'{shown}' is not a member here. Did you mean '{near[0]}'? Known members: {Names(type)}.";
    }

    private static string? ScalarMisfit(JsonElement element, Type type)
    {
        if (type == typeof(double))
        {
            if (element.ValueKind != JsonValueKind.Number)
                return $"{Shown(element)} is given where a JSON number is needed: no quotes, a decimal point, no unit.";
            return double.IsFinite(element.GetDouble()) ? null : $"{Shown(element)} is too large for a number. Give a finite one.";
        }

        if (type == typeof(int) || type == typeof(long))
        {
            return element.ValueKind == JsonValueKind.Number && (type == typeof(int) ? element.TryGetInt32(out _) : element.TryGetInt64(out _))
                ? null
                : $"{Shown(element)} is given where a whole number is needed.";
        }

        if (type == typeof(bool))
            return element.ValueKind is JsonValueKind.True or JsonValueKind.False ? null : $"{Shown(element)} is given where true or false is needed.";

        if (type == typeof(string))
        {
            if (element.ValueKind != JsonValueKind.String) return $"{Shown(element)} is given where a text in quotes is needed.";
            try
            {
                _ = element.GetString();
                return null;
            }
            catch (InvalidOperationException)
            {
                return "The text holds half of a surrogate pair and can't be read.";
            }
        }

        return $"{Shown(element)} can't be read here.";
    }

    private static string Names(JsonTypeInfo type) => string.Join(", ", type.Properties.Select(p => p.Name));

    private static string Shown(JsonElement element) => element.ValueKind switch
    {
        JsonValueKind.Object => "An object",
        JsonValueKind.Array => "A list",
        _ => Cut(element.GetRawText()),
    };

    private static string Cut(string text) => text.Length <= ShownValueLength ? text : text[..ShownValueLength] + "…";
}
