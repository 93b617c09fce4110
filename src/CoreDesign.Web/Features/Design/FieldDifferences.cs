using CoreDesign.Estimating.Contracts;

namespace CoreDesign.Web.Features.Design;

/// <summary>A field that two designs hold differently.</summary>
public sealed record FieldDifference(string Label, string Mine, string Theirs);

/// <summary>Two designs field by field, in the order of the form; what is equal is left out.</summary>
public static class FieldDifferences
{
    public static IReadOnlyList<FieldDifference> Between(DesignInput mine, DesignInput theirs)
    {
        var (a, b) = (FormReader.Texts(mine), FormReader.Texts(theirs));
        var order = FormLayout.Sections.SelectMany(s => s.Fields).Select(f => f.Path).ToList();
        return
        [
            .. a.All.Concat(b.All).Select(p => p.Key).Distinct(StringComparer.Ordinal)
                .Where(path => a[path] != b[path])
                .OrderBy(path => order.IndexOf(path) is var i and >= 0 ? i : int.MaxValue).ThenBy(path => path, StringComparer.Ordinal)
                .Select(path => new FieldDifference(Label(path), Value(path, a[path]), Value(path, b[path]))),
        ];
    }

    private static string Label(string path)
    {
        var field = FormLayout.Find(path);
        var row = path.IndexOf('[', StringComparison.Ordinal) is var at and > 0 && int.TryParse(path[(at + 1)..path.IndexOf(']', at)], System.Globalization.CultureInfo.InvariantCulture, out var index) ? $", {index + 1}" : "";
        return field.Label + row;
    }

    private static string Value(string path, string text)
    {
        var field = FormLayout.Find(path);
        return text.Length == 0 ? "left open" : field.Choices.FirstOrDefault(c => c.Value == text)?.Label ?? (field.Unit.Length > 0 ? $"{text} {field.Unit}" : text);
    }
}
