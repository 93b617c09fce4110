using CoreDesign.Magnetics.Materials;
using static System.FormattableString;

namespace CoreDesign.Estimating.Steels.Checks;

/// <summary>Names of the steel in the door it came through, and what the finished grade is to say of itself.</summary>
internal sealed record SteelDoor(string Generation, string Standing, string StandingText, Func<string, Spot> SpotOf);

/// <summary>Checks a draft as a whole, with every error at once, and makes the grade of it when there is none.</summary>
internal static class SteelChecker
{
    public const int FewestMagnetization = 5;
    public const int FewestLoss = 4;
    private const int MostFrequencies = 10;
    private const double LeastFrequency_Hz = 10;
    private const double MostFrequency_Hz = 1000;
    private const double Knee_T = 1.5;

    /// <summary>Flux density that most cores are designed near.</summary>
    private const double UsualPeak_T = 1.7;

    public static SteelGrade? Check(SteelDraft draft, SteelDoor door, Findings findings)
    {
        var figures = FieldRule.All.ToDictionary(r => r.Key, r => Figure(r, draft, door, findings), StringComparer.Ordinal);
        double? Value(FieldRule rule) => figures[rule.Key]?.Value;

        var magnetization = Magnetization(draft, door, findings);
        var loss = Curves(draft.Loss, PointKind.Loss, draft.Unreadable.Contains(PointKind.Loss.Key) ? 0 : FewestLoss, door, findings);
        if (draft.Loss.Count == 0 && !draft.Unreadable.Contains(PointKind.Loss.Key))
        {
            findings.Error(door.SpotOf(PointKind.Loss.Key), null, $"is missing: give at least {FewestLoss} points at one frequency or more.");
        }

        var power = Curves(draft.ExcitingPower, PointKind.ExcitingPower, 0, door, findings);
        Physics(magnetization, loss, power, Value, findings);
        if (findings.ErrorCount > 0)
        {
            return null;
        }

        var lossCurves = loss.Select(c => new LossCurve(c.Hz, [.. c.Points.Select(p => new LossPoint(p.B.Value, p.Y.Value))])).ToList();
        var saturation = figures[FieldRule.Saturation.Key]!;
        var grade = new SteelGrade
        {
            Name = draft.Name,
            Class = door.Generation,
            Generation = door.Generation,
            Thickness_mm = figures[FieldRule.Thickness.Key]!,
            Density_kg_per_m3 = figures[FieldRule.Density.Key]!,
            Resistivity_ohm_m = figures[FieldRule.Resistivity.Key]!,
            SaturationPolarization_T = saturation,
            MinimumStackingFactor = figures[FieldRule.StackingFactor.Key],
            Rolling = new SteelCurves
            {
                Magnetization = [.. magnetization.Select(p => new MagnetizationPoint(p.B.Value, p.Y.Value))],
                Loss = lossCurves,
                ExcitingPower = [.. power.Select(c => new ExcitingPowerCurve(
                    c.Hz, [.. c.Points.Select(p => new ExcitingPowerPoint(p.B.Value, p.Y.Value))]))],
                Source = draft.Source,
                Standing = door.Standing,
            },
            Transverse = new SteelCurves
            {
                Magnetization = RepresentativeCurves.TransversePeakCurve(saturation.Value),
                Loss = [.. RepresentativeCurves.TransverseLoss(lossCurves).Where(c => c.Points.Count > 0)],
                Source = "three times the loss along rolling, and one peak curve for all grades, from memory",
                Standing = SteelStanding.Representative,
            },
            Standing = door.Standing,
            StandingText = door.StandingText,
        };
        LawRules.Check(grade, door, findings);
        return findings.ErrorCount > 0 ? null : grade;
    }

    private static SourcedFigure? Figure(FieldRule rule, SteelDraft draft, SteelDoor door, Findings findings)
    {
        if (draft.Fields.TryGetValue(rule.Key, out var entry))
        {
            return rule.Check(entry, findings) ? new SourcedFigure(entry.Value, draft.Source, FigureStanding.Works) : null;
        }

        if (rule.Default is { } value && !draft.Unreadable.Contains(rule.Key))
        {
            findings.Warning(door.SpotOf(rule.Key), null, Invariant($"is left out; {value.Value} {rule.Unit} is taken ({value.Standing})."));
        }
        else if (rule == FieldRule.Thickness && !draft.Unreadable.Contains(rule.Key))
        {
            findings.Error(door.SpotOf(rule.Key), null, Invariant($"is missing: give the sheet thickness, {rule.Least} to {rule.Most} mm."));
        }

        return rule.Default;
    }

    private static List<DraftPoint> Magnetization(SteelDraft draft, SteelDoor door, Findings findings)
    {
        var kind = PointKind.Magnetization;
        var spot = door.SpotOf(kind.Key);
        var frequencies = draft.Magnetization.Select(p => p.Frequency?.Value).Distinct().ToList();
        if (frequencies.Count > 1)
        {
            findings.Error(
                draft.Magnetization.First(p => p.Frequency?.Value != frequencies[0]).Frequency?.Spot ?? spot,
                null,
                "differs from the other magnetization rows; give one peak curve, at one frequency, and leave the others out.");
        }

        foreach (var f in draft.Magnetization.Select(p => p.Frequency).OfType<Entry>().Where(f => !(f.Value is >= 0 and <= MostFrequency_Hz)))
        {
            findings.Error(f, Invariant($"must be a frequency of at most {MostFrequency_Hz} Hz, 0 or empty for a static curve; check the column."));
        }

        // Rows that could not be read have their own messages; the count without them would only mislead.
        var partly = draft.Unreadable.Contains(kind.Key);
        var curve = CurveRules.Check(draft.Magnetization, kind, partly ? 0 : FewestMagnetization, spot, findings);
        if (!partly && draft.Magnetization.Count > 0 && draft.Magnetization.All(p => p.B.Value < Knee_T))
        {
            findings.Error(spot, null, Invariant(
                $"ends at {draft.Magnetization.Max(p => p.B.Value)} T; at least one point at {Knee_T} T or above is needed. Add the upper part of the curve."));
        }

        WarnOfShortReach(curve, UsualPeak_T + 0.1, spot, findings);
        return curve;
    }

    private static void WarnOfShortReach(List<DraftPoint> curve, double reach_T, Spot table, Findings findings)
    {
        if (curve.Count > 0 && curve[^1].B.Value is var last && last < reach_T)
        {
            findings.Warning(table, null, Invariant($"ends at {last} T; a design above that leaves the measured range. Add points up to {reach_T} T if you have them."));
        }
    }

    private static List<(double Hz, List<DraftPoint> Points)> Curves(
        List<DraftPoint> points, PointKind kind, int fewest, SteelDoor door, Findings findings)
    {
        var curves = new List<(double Hz, List<DraftPoint> Points)>();
        var groups = points.GroupBy(p => p.Frequency!.Value).OrderBy(g => g.Key).ToList();
        if (groups.Count > MostFrequencies)
        {
            findings.Error(door.SpotOf(kind.Key), null, $"has {groups.Count} frequencies; at most {MostFrequencies} are taken. Leave some out.");
            return [];
        }

        foreach (var group in groups)
        {
            var frequency = group.First().Frequency!;
            if (!(frequency.Value is >= LeastFrequency_Hz and <= MostFrequency_Hz))
            {
                findings.Error(frequency, Invariant($"must be a frequency from {LeastFrequency_Hz} to {MostFrequency_Hz} Hz; check the column."));
                continue;
            }

            var table = frequency.Spot.Path.Length > 0
                ? frequency.Spot with { Path = frequency.Spot.Path.Replace(".frequency_Hz", ".points", StringComparison.Ordinal) }
                : new Spot(0, Invariant($"{kind.Key} at {frequency.Value} Hz"), "");
            curves.Add((frequency.Value, CurveRules.Check([.. group], kind, fewest, table, findings)));
            if (kind == PointKind.Loss)
            {
                WarnOfShortReach(curves[^1].Points, UsualPeak_T, table, findings);
            }
        }

        return curves;
    }

    private static void Physics(
        List<DraftPoint> magnetization,
        List<(double Hz, List<DraftPoint> Points)> loss,
        List<(double Hz, List<DraftPoint> Points)> power,
        Func<FieldRule, double?> value,
        Findings findings)
    {
        if (value(FieldRule.Saturation) is { } saturation)
        {
            PhysicsRules.Polarization(magnetization, saturation, findings);
        }

        for (var i = 0; i < loss.Count; i++)
        {
            if (value(FieldRule.Thickness) is { } d && value(FieldRule.Density) is { } density && value(FieldRule.Resistivity) is { } rho)
            {
                PhysicsRules.ClassicalEddy(loss[i].Points, loss[i].Hz, d, density, rho, findings);
            }

            if (i > 0)
            {
                PhysicsRules.Frequencies(loss[i - 1].Hz, loss[i - 1].Points, loss[i].Hz, loss[i].Points, findings);
            }
        }

        foreach (var (hz, points) in power)
        {
            PhysicsRules.ExcitingPower(points, loss.Find(c => c.Hz == hz).Points ?? [], hz, findings);
        }

        // Compared at the frequency of the peak curve, else at the lowest one, where the loop is narrowest.
        var stated = magnetization.Count > 0 ? magnetization[0].Frequency?.Value : null;
        var (at, curve) = stated is { } f && loss.Exists(c => c.Hz == f) ? loss.Find(c => c.Hz == f) : loss.FirstOrDefault();
        if (curve is not null && value(FieldRule.Density) is { } rhoMass)
        {
            PhysicsRules.LoopFits(magnetization, curve, at, rhoMass, findings);
        }
    }
}
