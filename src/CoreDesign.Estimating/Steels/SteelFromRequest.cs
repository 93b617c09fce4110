using System.Globalization;
using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Steels.Checks;

namespace CoreDesign.Estimating.Steels;

/// <summary>What became of steel data in a request: a grade, or what is wrong with it.</summary>
/// <param name="Grade">Null as long as there is any error.</param>
/// <param name="Errors">Every error, the first fifty and a count of the others.</param>
/// <param name="Warnings">Doubts that do not stop the computation.</param>
/// <param name="Derived">JSON paths of fields that were left open, for which a usual value was taken.</param>
public sealed record SteelFromRequestResult(
    SteelGrade? Grade, IReadOnlyList<FieldError> Errors, IReadOnlyList<FieldError> Warnings, IReadOnlyList<string> Derived);

/// <summary>Steel data given with a request, under the same rules as an imported file.</summary>
public static class SteelFromRequest
{
    private const string Root = "steel.data";
    private const string DefaultName = "Steel given with the request";

    public static SteelFromRequestResult Convert(SteelDataInput input)
    {
        ArgumentNullException.ThrowIfNull(input);
        var findings = new Findings();
        var draft = new SteelDraft { Name = input.Name?.Trim() is { Length: > 0 } name ? name : DefaultName, Source = "given with the request" };
        NameRules.Check(draft.Name, NameRules.LongestName, At("name"), findings);
        Field(draft, FieldRule.Thickness, input.Thickness_mm, findings);
        Field(draft, FieldRule.Density, input.Density_kg_m3, findings);
        Field(draft, FieldRule.Resistivity, input.Resistivity_ohm_m, findings);
        Field(draft, FieldRule.Saturation, input.SaturationPolarization_T, findings);
        Magnetization(draft, input.Magnetization ?? [], findings);
        Loss(draft, input.Loss ?? [], findings);

        var door = new SteelDoor("given", SteelStanding.Given, SteelStanding.GivenText, At);
        var grade = SteelChecker.Check(draft, door, findings);
        var derived = new List<(string Key, double? Given)>
        {
            (FieldRule.Density.Key, input.Density_kg_m3),
            (FieldRule.Resistivity.Key, input.Resistivity_ohm_m),
            (FieldRule.Saturation.Key, input.SaturationPolarization_T),
        };
        return new SteelFromRequestResult(
            grade,
            FieldErrors(findings.Errors, findings.ErrorCount),
            FieldErrors(findings.Warnings, findings.WarningCount),
            [.. derived.Where(d => d.Given is null).Select(d => $"{Root}.{d.Key}")]);
    }

    private static Spot At(string path) => new(0, path, $"{Root}.{path}");

    private static void Field(SteelDraft draft, FieldRule rule, double? value, Findings findings)
    {
        if (value is not null && Number(value, rule.Key, findings) is { } entry)
        {
            draft.Fields[rule.Key] = entry;
        }
        else if (value is not null)
        {
            draft.Unreadable.Add(rule.Key);
        }
    }

    private static Entry? Number(double? value, string path, Findings findings)
    {
        if (value is not { } v)
        {
            findings.Error(At(path), null, "is missing: give the number or leave the whole point out.");
            return null;
        }

        var text = v.ToString("R", CultureInfo.InvariantCulture);
        if (!double.IsFinite(v))
        {
            findings.Error(At(path), text, "is not a finite number; leave the point out where nothing was measured.");
            return null;
        }

        return new Entry(v, text, At(path));
    }

    private static void Magnetization(SteelDraft draft, IReadOnlyList<MagnetizationPointInput> points, Findings findings)
    {
        for (var i = 0; i < points.Count; i++)
        {
            var b = Number(points[i]?.B_T, $"magnetization[{i}].B_T", findings);
            var h = Number(points[i]?.H_A_m, $"magnetization[{i}].H_A_m", findings);
            if (b is not null && h is not null)
            {
                draft.Magnetization.Add(new DraftPoint(null, b, h));
            }
            else
            {
                draft.Unreadable.Add(PointKind.Magnetization.Key);
            }
        }
    }

    private static void Loss(SteelDraft draft, IReadOnlyList<LossCurveInput> curves, Findings findings)
    {
        for (var c = 0; c < curves.Count; c++)
        {
            var frequency = Number(curves[c]?.Frequency_Hz, $"loss[{c}].frequency_Hz", findings);
            var points = curves[c]?.Points ?? [];
            if (points.Count == 0)
            {
                draft.Unreadable.Add(PointKind.Loss.Key);
                findings.Error(At($"loss[{c}].points"), null, $"is missing: give at least {SteelChecker.FewestLoss} points or leave the curve out.");
            }

            for (var i = 0; i < points.Count; i++)
            {
                var b = Number(points[i]?.B_T, $"loss[{c}].points[{i}].B_T", findings);
                var p = Number(points[i]?.W_kg, $"loss[{c}].points[{i}].W_kg", findings);
                if (frequency is not null && b is not null && p is not null)
                {
                    draft.Loss.Add(new DraftPoint(frequency, b, p));
                }
                else
                {
                    draft.Unreadable.Add(PointKind.Loss.Key);
                }
            }
        }
    }

    private static List<FieldError> FieldErrors(IReadOnlyList<Finding> findings, int count)
    {
        var errors = findings.Select(f => new FieldError(
            f.Spot.Path, f.ShownValue is { } value ? $"{value} {f.Rule}" : $"{f.Spot.Path} {f.Rule}")).ToList();
        if (count > findings.Count)
        {
            errors.Add(new FieldError(Root, $"And {count - findings.Count} more."));
        }

        return errors;
    }
}
