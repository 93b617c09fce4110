using System.Globalization;
using System.Text;
using System.Text.Json;
using CoreDesign.Estimating.Contracts;

namespace CoreDesign.Web.Features.Circuits;

/// <summary>Lines of a JSON text on which the values lie that messages name by their path.</summary>
public static class JsonLines
{
    private const string Whole = "$";

    // A name is bounded by the readers too; a longer one is never part of a path that they tell.
    private const int LongestName_bytes = 600;

    /// <summary>
    /// Line of each path, counted from 1. Where the text lacks a member it is the line of what should hold it; for the whole text
    /// the line on which it stops being JSON, or the first.
    /// </summary>
    public static IReadOnlyDictionary<string, int> Of(string json, IReadOnlyCollection<string> paths)
    {
        ArgumentNullException.ThrowIfNull(json);
        ArgumentNullException.ThrowIfNull(paths);
        var open = paths.SelectMany(Upward).ToHashSet(StringComparer.Ordinal);
        var found = new Walk(Encoding.UTF8.GetBytes(json), open).Find();
        return paths.Distinct(StringComparer.Ordinal).ToDictionary(p => p, p => Upward(p).Append(Whole).Where(found.ContainsKey).Select(q => found[q]).First(), StringComparer.Ordinal);
    }

    /// <summary>The path and every part of it that may hold it, from the longest.</summary>
    private static IEnumerable<string> Upward(string path)
    {
        for (var end = path.Length; end > 0; end = path.AsSpan(0, end).LastIndexOfAny('.', '['))
        {
            yield return path[..end];
        }
    }

    private sealed class Walk(byte[] json, HashSet<string> open)
    {
        private readonly Dictionary<string, int> found = new(StringComparer.Ordinal) { [Whole] = 1 };
        private readonly Stack<(string Path, int Index)> above = new();
        private int line = 1;
        private int counted;

        public Dictionary<string, int> Find()
        {
            var reader = new Utf8JsonReader(json, new JsonReaderOptions { MaxDepth = DesignJson.MaxDepth });
            try
            {
                var next = "";
                while (reader.Read())
                {
                    next = Step(ref reader, next);
                }
            }
            catch (JsonException e)
            {
                found[Whole] = (int)(e.LineNumber ?? 0) + 1;
            }

            return found;
        }

        /// <summary>Takes one token; gives the path of the value that comes next, where a name told it. What no path leads through is passed over.</summary>
        private string Step(ref Utf8JsonReader reader, string named)
        {
            switch (reader.TokenType)
            {
                case JsonTokenType.PropertyName:
                    var path = Name(ref reader) is { } name ? (above.Peek().Path.Length == 0 ? name : $"{above.Peek().Path}.{name}") : null;
                    if (path is null || !Seen(path, reader.TokenStartIndex)) reader.Skip();
                    return path ?? "";
                case JsonTokenType.StartObject or JsonTokenType.StartArray:
                    var own = Value(named);
                    if (own.Length > 0 && !Seen(own, reader.TokenStartIndex)) reader.Skip();
                    else above.Push((own, reader.TokenType == JsonTokenType.StartArray ? 0 : -1));
                    return "";
                case JsonTokenType.EndObject or JsonTokenType.EndArray:
                    above.Pop();
                    return "";
                default:
                    if (above.Count > 0) Seen(Value(named), reader.TokenStartIndex);
                    return "";
            }
        }

        /// <summary>Path of the value at hand: by its name, or by its place in the list around it.</summary>
        private string Value(string named)
        {
            if (above.Count == 0 || above.Peek().Index < 0) return named;
            var (path, index) = above.Pop();
            above.Push((path, index + 1));
            return string.Create(CultureInfo.InvariantCulture, $"{path}[{index}]");
        }

        private bool Seen(string path, long at)
        {
            if (!open.Contains(path)) return false;
            for (; counted < at; counted++)
            {
                if (json[counted] == '\n') line++;
            }

            found.TryAdd(path, line);
            return true;
        }

        private static string? Name(ref Utf8JsonReader reader)
        {
            try
            {
                return reader.ValueSpan.Length <= LongestName_bytes ? reader.GetString() : null;
            }
            catch (InvalidOperationException)
            {
                // Half of a surrogate pair: no message can name it.
                return null;
            }
        }
    }
}
