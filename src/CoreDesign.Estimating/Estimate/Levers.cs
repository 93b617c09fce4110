using System.Globalization;
using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Steels;

namespace CoreDesign.Estimating.Estimate;

/// <summary>
/// What would help: for the handful of changes that a works really has, the design changed by one step and solved. A lever that does not apply
/// (no better steel, joint model replaced by an effective gap, hand-typed section) or whose design is refused is left out.
/// </summary>
public static class Levers
{
    private const double Diameter_mm = 5;
    private const double TighterGap_mm = 0.1;
    private const double YokeFactor = 0.05;

    public static IReadOnlyList<LeverResult> Solve(DesignInput design, EstimateResult now, SteelCatalog steels, CancellationToken cancel = default)
    {
        ArgumentNullException.ThrowIfNull(design);
        ArgumentNullException.ThrowIfNull(now);
        ArgumentNullException.ThrowIfNull(steels);
        var levers = new List<LeverResult>();
        foreach (var (key, label, changed) in Changes(design, now, steels))
        {
            cancel.ThrowIfCancellationRequested();
            if (EstimateDesign.Run(changed, steels, cancel).Value is { } then)
            {
                levers.Add(new LeverResult
                {
                    Key = key,
                    Label = label,
                    Design = changed,
                    LossChange_W = then.NoLoadLoss_W - now.NoLoadLoss_W,
                    CurrentChange_points = then.NoLoadCurrent_percent - now.NoLoadCurrent_percent,
                    MassChange_kg = then.Mass_kg.Total - now.Mass_kg.Total,
                    MarginChange_points = then.Margin.AtRated_percent - now.Margin.AtRated_percent,
                });
            }
        }

        return [.. levers.OrderBy(l => l.LossChange_W)];
    }

    private static IEnumerable<(string Key, string Label, DesignInput Design)> Changes(DesignInput design, EstimateResult now, SteelCatalog steels)
    {
        var core = design.Core!;
        var joint = now.Inputs.Joint!;
        if (steels.TryFind(design.Steel?.Grade, out var grade) && steels.NextBetter(grade) is { } better)
        {
            yield return ("betterSteel", "Steel " + better.Name, design with { Steel = new SteelInput { Grade = better.Name } });
        }

        if (core.Limb?.Diameter_mm is { } diameter)
        {
            yield return ("largerDiameter", Text($"{Diameter_mm} mm more diameter"), design with { Core = core with { Limb = core.Limb with { Diameter_mm = diameter + Diameter_mm } } });
        }

        if (joint.EffectiveGap_mm is null)
        {
            if (joint.Type == "stepLap")
            {
                yield return ("morePositions", Text($"{joint.Positions + 1} joint positions"), design with { Joint = design.Joint! with { Positions = joint.Positions + 1 } });
            }
            else
            {
                yield return ("morePositions", Text($"Step-lap, {DesignDefaults.StepLapPositions} positions"), design with { Joint = design.Joint! with { Type = "stepLap", Positions = null, Overlap_mm = null } });
            }

            if (joint.Gap_mm > TighterGap_mm)
            {
                var gap = Math.Round(joint.Gap_mm.Value - TighterGap_mm, 6);
                yield return ("tighterGap", Text($"Gap {gap} mm"), design with { Joint = design.Joint! with { Gap_mm = gap } });
            }
        }

        if (core.Yoke?.StepWidths_mm is null)
        {
            var factor = Math.Round((core.Yoke?.AreaFactor ?? now.Inputs.Core?.Yoke?.AreaFactor ?? DesignDefaults.YokeAreaFactor) + YokeFactor, 6);
            yield return ("largerYoke", Text($"Yoke area factor {factor}"), design with { Core = core with { Yoke = new YokeInput { AreaFactor = factor } } });
        }
    }

    private static string Text(FormattableString text) => text.ToString(CultureInfo.InvariantCulture);
}
