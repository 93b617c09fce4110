using CoreDesign.Estimating.Contracts;

namespace CoreDesign.Web.Features.Design;

/// <summary>Messages of one state of the form: at their field, and those that belong to no field of the page.</summary>
public sealed class FieldMessages
{
    private readonly Dictionary<string, string> byPath = new(StringComparer.Ordinal);

    public FieldMessages(DesignText typed, FormReading reading, IReadOnlyList<FieldError> refused, IReadOnlySet<string> touched, DesignText? solved, DerivedTexts derived)
    {
        foreach (var (path, message) in reading.Errors)
        {
            byPath[path] = message + StandsFor(path, solved is null ? null : reading.Standing, derived);
        }

        var needed = new HashSet<string>(StringComparer.Ordinal);
        foreach (var error in refused)
        {
            var path = PlaceOf(error.Path, typed);
            if (path is null)
            {
                General.Add(error.Message);
            }
            else if (typed[path].Length == 0 && !touched.Contains(path) && solved is null)
            {
                needed.Add(path);
            }
            else
            {
                byPath.TryAdd(path, error.Message + StandsFor(path, solved, derived));
            }
        }

        // The stacking factor comes with the grade.
        _ = needed.Contains(FormPaths.Grade) && needed.Remove(FormPaths.StackingFactor);
        Needed = [.. FormLayout.Sections.SelectMany(s => s.Fields).Where(f => needed.Contains(f.Path))];
    }

    /// <summary>Messages that no single field can mend.</summary>
    public List<string> General { get; } = [];

    /// <summary>Fields that are still to be filled in before there is a first answer.</summary>
    public IReadOnlyList<FormField> Needed { get; }

    public IEnumerable<string> Paths => byPath.Keys;

    /// <summary>The message of a field, or null.</summary>
    public string? this[string path] => byPath.GetValueOrDefault(path);

    private static string StandsFor(string path, DesignText? standing, DerivedTexts derived)
    {
        if (standing is null)
        {
            return "";
        }

        var field = FormLayout.Find(path);
        var value = standing[path].Length > 0 ? standing[path] : derived[path];
        var choice = field.Choices.FirstOrDefault(c => c.Value == value)?.Label ?? value;
        return choice.Length == 0 ? "" : $" The figures still stand for {choice}{(field.Unit.Length == 0 ? "" : " " + field.Unit)}.";
    }

    /// <summary>The field of the form at or above a path.</summary>
    private static string? PlaceOf(string path, DesignText typed)
    {
        var known = FormLayout.Sections.SelectMany(s => s.Fields).Select(f => f.Path).ToHashSet(StringComparer.Ordinal);
        for (var at = path; at.Length > 0; at = at[..Math.Max(0, at.LastIndexOfAny(['.', '[']))])
        {
            if (known.Contains(at) || typed.Has(at))
            {
                return at;
            }
        }

        return path switch
        {
            "core.limb" or "core.limbSteps" or "core" => FormPaths.Diameter,
            "core.yoke" => FormPaths.YokeFactor,
            "steel" or "steel.data" => FormPaths.Grade,
            "order.phases" => FormPaths.Form,
            "joint" => FormPaths.JointType,
            _ => null,
        };
    }
}
