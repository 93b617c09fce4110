using System.Text.RegularExpressions;
using CoreDesign.Estimating.Contracts;

namespace CoreDesign.Web.Features.Design;

/// <summary>
/// What the typed texts say: a design, and a message for each text that is no valid value. A text that can't be read keeps the value it
/// had before (<paramref name="Standing"/>), so that the other fields go on answering while one is half typed.
/// </summary>
public sealed record FormReading(DesignInput Design, DesignText Standing, IReadOnlyDictionary<string, string> Errors);

/// <summary>Reads the form; ranges are the field catalogue's, so the words are those of the API.</summary>
public static partial class FormReader
{
    public static FormReading Read(DesignText typed, DesignText before)
    {
        var errors = new Dictionary<string, string>(StringComparer.Ordinal);
        var standing = typed;
        foreach (var (path, text) in typed.All)
        {
            if (Check(path, text) is { } error)
            {
                errors[path] = error;
                standing = standing.With(path, Check(path, before[path]) is null ? before[path] : "");
            }
        }

        foreach (var path in FormRules.OpenYokeWidths(typed))
        {
            errors[path] = FormLayout.Find(path).Descriptor!.Missing();
            standing = standing.With(path, before[path]);
        }

        // A list can't have a hole; where nothing stood in it before, the yoke is the default one until the row is filled in.
        standing = FormRules.OpenYokeWidths(standing).Any() ? standing.Without(FormPaths.YokeWidths) : standing;
        return new(Design(standing), standing, errors);
    }

    /// <summary>The design of texts that are all valid.</summary>
    public static DesignInput Design(DesignText texts)
    {
        var values = new List<KeyValuePair<string, object>>();
        foreach (var (path, text) in texts.All.Where(p => !p.Key.StartsWith("form.", StringComparison.Ordinal)))
        {
            switch (FormLayout.Find(path).Kind)
            {
                case FieldKind.Number when NumberText.TryRead(text, out var number, out _):
                    values.Add(new(path, number));
                    break;
                case FieldKind.NumberList:
                    values.AddRange(Split(text).Select((t, i) => NumberText.TryRead(t, out var n, out _) ? new KeyValuePair<string, object>($"{path}[{i}]", n) : default).Where(p => p.Key is not null));
                    break;
                case FieldKind.Choice or FieldKind.Text:
                    values.Add(new(path, text.Trim()));
                    break;
            }
        }

        if (FormFit.Phases(texts) is { } phases)
        {
            values.Add(new(FormPaths.Phases, phases));
        }

        return DesignPaths.Build(values);
    }

    /// <summary>The texts of a stored design; what it left open stays open.</summary>
    public static DesignText Texts(DesignInput design)
    {
        var texts = DesignText.Empty;
        foreach (var (path, value) in DesignPaths.Flatten(design).Where(p => p.Key != FormPaths.Phases))
        {
            var list = ItemIndex().Replace(path, "");
            texts = value switch
            {
                double number when list != path && FormLayout.Find(list).Kind == FieldKind.NumberList =>
                    texts.With(list, texts.Has(list) ? $"{texts[list]} / {NumberText.Exact(number)}" : NumberText.Exact(number)),
                double number => texts.With(path, NumberText.Exact(number)),
                string text => texts.With(path, text),
                _ => texts,
            };
        }

        // A closed delta may be there without a word; on the form the word is what says so.
        return design.Tertiary is { Connection: null } ? texts.With(FormPaths.Tertiary, "D") : texts;
    }

    /// <summary>True for a text that can be taken for its field.</summary>
    public static bool IsValue(string path, string text) => !string.IsNullOrWhiteSpace(text) && Check(path, text) is null;

    private static string? Check(string path, string text)
    {
        var field = FormLayout.Find(path);
        switch (field.Kind)
        {
            case FieldKind.Number:
                return CheckNumber(field, text);
            case FieldKind.NumberList:
                return Split(text).Select(t => CheckNumber(field, t)).FirstOrDefault(m => m is not null);
            default:
                return text.Length > 100 ? $"{field.Label} has {text.Length} characters. Take at most 100." : null;
        }
    }

    private static string? CheckNumber(FormField field, string text)
    {
        if (text.Length == 0)
        {
            return null;
        }

        if (NumberText.TryRead(text, out var value, out var mend))
        {
            return field.Descriptor?.Check(value);
        }

        return field.Descriptor is { } known ? $"{known.Label} {mend} The range is {known.Range}." : mend;
    }

    private static string[] Split(string text) => ListSign().Split(text.Trim()).Where(t => t.Length > 0).ToArray();

    [GeneratedRegex(@"\s*[/;]\s*|\s+", RegexOptions.ExplicitCapture, 1000)]
    private static partial Regex ListSign();

    [GeneratedRegex(@"\[\d+\]$", RegexOptions.ExplicitCapture, 1000)]
    private static partial Regex ItemIndex();
}
