using System.Collections.Immutable;
using System.Text.Json;

namespace CoreDesign.Web.Features.Design;

/// <summary>
/// The design page's fields as typed: JSON path to text. A field that is absent is open, so that the estimate derives it.
/// Immutable, so undo keeps whole snapshots, and a draft is this and nothing more.
/// </summary>
public sealed class DesignText : IEquatable<DesignText>
{
    private readonly ImmutableSortedDictionary<string, string> texts;

    private DesignText(ImmutableSortedDictionary<string, string> texts) => this.texts = texts;

    public static DesignText Empty { get; } = new(ImmutableSortedDictionary.Create<string, string>(StringComparer.Ordinal));

    public IEnumerable<KeyValuePair<string, string>> All => texts;

    public bool IsEmpty => texts.IsEmpty;

    /// <summary>The text of a field; empty where it is open.</summary>
    public string this[string path] => texts.GetValueOrDefault(path, "");

    public bool Has(string path) => texts.ContainsKey(path);

    /// <summary>True where the list <paramref name="path"/> has items of its own.</summary>
    public bool HasItems(string path) => texts.Keys.Any(k => k.StartsWith(path + "[", StringComparison.Ordinal));

    public DesignText With(string path, string text) =>
        new(string.IsNullOrWhiteSpace(text) ? texts.Remove(path) : texts.SetItem(path, text));

    /// <summary>Without a field, and without everything below it.</summary>
    public DesignText Without(string path) =>
        new(texts.RemoveRange(texts.Keys.Where(k => k == path || k.StartsWith(path + "[", StringComparison.Ordinal) || k.StartsWith(path + ".", StringComparison.Ordinal))));

    public string ToJson() => JsonSerializer.Serialize(texts);

    /// <summary>Reads a draft; an unreadable one is null, not an exception, because a draft must never keep the page from opening.</summary>
    public static DesignText? FromJson(string json)
    {
        try
        {
            var read = JsonSerializer.Deserialize<Dictionary<string, string>>(json);
            return read is null ? null : new(read.ToImmutableSortedDictionary(StringComparer.Ordinal));
        }
        catch (JsonException)
        {
            return null;
        }
    }

    public bool Equals(DesignText? other) => other is not null && (ReferenceEquals(texts, other.texts) || texts.SequenceEqual(other.texts));

    public override bool Equals(object? obj) => Equals(obj as DesignText);

    public override int GetHashCode() => texts.Aggregate(0, (h, p) => HashCode.Combine(h, p.Key, p.Value));
}
