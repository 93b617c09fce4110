using static System.FormattableString;

namespace CoreDesign.Estimating.Steels.Checks;

/// <summary>Rules for one table: range, duplicates, rising order, number of points. Rows may stand in any order.</summary>
internal static class CurveRules
{
    public const int MostPoints = 500;

    /// <summary>Points closer than this make a step of the curve, not a shape.</summary>
    private const double Apart_T = 1e-4;

    /// <summary>The points in rising flux density, those left out that break a rule of their own. The origin may be given and is left out.</summary>
    public static List<DraftPoint> Check(IReadOnlyList<DraftPoint> points, PointKind kind, int fewest, Spot table, Findings findings)
    {
        var fit = points.Where(p => InRange(p, kind, findings)).ToList();
        var notOrigin = points.Count(p => !IsOrigin(p));
        if (notOrigin < fewest)
        {
            findings.Error(table, null, $"has {notOrigin} point{(notOrigin == 1 ? "" : "s")}; at least {fewest} are needed besides the origin. Add measured points.");
        }
        else if (notOrigin > MostPoints)
        {
            findings.Error(table, null, $"has {notOrigin} points; at most {MostPoints} are taken. Thin the table out.");
        }

        fit.Sort((a, b) => a.B.Value.CompareTo(b.B.Value));
        var rising = new List<DraftPoint>();
        foreach (var p in fit)
        {
            if (rising.Count == 0 || Follows(rising[^1], p, kind, findings))
            {
                rising.Add(p);
            }
        }

        return rising;
    }

    private static bool IsOrigin(DraftPoint p) => p.B.Value == 0 && p.Y.Value == 0;

    private static bool InRange(DraftPoint p, PointKind kind, Findings findings)
    {
        if (IsOrigin(p))
        {
            return false;
        }

        var ok = true;
        if (!(p.B.Value >= PointKind.Least_B_T && p.B.Value <= kind.Most_B_T))
        {
            ok = false;
            var mend = p.B.Value switch
            {
                < PointKind.Least_B_T => "peak values are above zero; leave this row out",
                <= 30 => "if the column is in kG, divide by 10",
                _ => "if the column is in mT, divide by 1000",
            };
            findings.Error(p.B, Invariant($"must be a peak flux density from {PointKind.Least_B_T} to {kind.Most_B_T} T; {mend}."));
        }

        if (!(p.Y.Value >= PointKind.Least && p.Y.Value <= kind.Most))
        {
            ok = false;
            var mend = p.Y.Value < PointKind.Least ? "leave the row out where nothing was measured" : "check the unit";
            findings.Error(p.Y, Invariant($"must be a {kind.Quantity} from {PointKind.Least:0.######} to {kind.Most} {kind.Unit}; {mend}."));
        }

        return ok;
    }

    private static bool Follows(DraftPoint before, DraftPoint p, PointKind kind, Findings findings)
    {
        if (p.B.Value - before.B.Value < Apart_T)
        {
            findings.Error(p.B, $"occurs twice in this table{At(before)}; keep one of the two rows.");
            return false;
        }

        if (p.Y.Value <= before.Y.Value)
        {
            findings.Error(p.Y, Invariant(
                $"must rise with flux density: {p.Y.Value} {kind.Unit} at {p.B.Value} T follows {before.Y.Value} {kind.Unit} at {before.B.Value} T{At(before)}. Correct or leave out one of the two."));
            return false;
        }

        return true;
    }

    private static string At(DraftPoint p) => p.B.Spot.Line > 0 ? Invariant($" (line {p.B.Spot.Line})") : "";
}
