using CoreDesign.Estimating.Contracts;

namespace CoreDesign.Web.Features.Design;

/// <summary>What the last estimate took for the fields that were left open.</summary>
public sealed class DerivedTexts
{
    private readonly Dictionary<string, string> texts = new(StringComparer.Ordinal);

    public static DerivedTexts None { get; } = new();

    /// <summary>The derived value as text, or empty where the estimate has none.</summary>
    public string this[string path] => texts.GetValueOrDefault(path, "");

    public static DerivedTexts From(EstimateResult estimate)
    {
        var derived = new DerivedTexts();
        foreach (var (path, value) in DesignPaths.Flatten(estimate.Inputs))
        {
            derived.texts[path] = value switch
            {
                double number => NumberText.Short(number, 6),
                string text => text,
                _ => "",
            };
        }

        var g = estimate.Geometry;
        derived.texts[FormPaths.Diameter] = NumberText.Short(g.CircleDiameter_mm);
        derived.texts[FormPaths.StepCount] = NumberText.Exact(g.LimbSteps.Count);
        derived.texts[FormPaths.WindowWidth] = NumberText.Short(g.WindowWidth_mm);
        derived.texts[FormPaths.LimbPitch] = NumberText.Short(g.LimbPitch_mm);
        derived.texts[FormPaths.YokeHeight] = NumberText.Short(g.YokeHeight_mm);
        derived.texts[FormPaths.YokeFactor] = NumberText.Short(g.NetYokeArea_mm2 / g.NetLimbArea_mm2);
        for (var i = 0; i < g.LimbSteps.Count; i++)
        {
            derived.texts[FormPaths.StepWidth(i)] = NumberText.Short(g.LimbSteps[i].Width_mm);
            derived.texts[FormPaths.StepStack(i)] = NumberText.Short(g.LimbSteps[i].Stack_mm);
            derived.texts[FormPaths.YokeWidth(i)] = NumberText.Short(g.LimbSteps[i].YokeWidth_mm);
        }

        return derived;
    }
}
