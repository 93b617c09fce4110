using CoreDesign.Estimating.Contracts;
using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Cores;
using CoreDesign.Magnetics.Excitation;
using CoreDesign.Magnetics.Geometry;

namespace CoreDesign.Estimating.Estimate;

/// <summary>Loss and current by part and cause, largest loss first.</summary>
internal static class ShareShape
{
    private const double Rounding = 1e-9;

    public static IReadOnlyList<ShareResult> Of(CoreSolution core)
    {
        var s = core.Solution;
        var current = CurrentShares.Of(s);
        var kinds = core.Core.Geometry.Parts.ToDictionary(p => p.Name, p => p.Kind, StringComparer.Ordinal);
        (string Cause, string Label, Func<string, bool> Has)[] steel =
        [
            ("limbSteel", "Limbs, steel", p => kinds.TryGetValue(p, out var k) && k == CorePartKind.Limb),
            ("yokeSteel", "Yokes, steel", p => kinds.TryGetValue(p, out var k) && k == CorePartKind.Yoke),
            ("cornerSteel", kinds.ContainsValue(CorePartKind.TZone) ? "Corners and T zones, steel" : "Corners, steel", p => kinds.TryGetValue(p, out var k) && k is CorePartKind.Corner or CorePartKind.TZone),
            ("joints", "Joints", p => !kinds.ContainsKey(p)),
        ];
        var total = s.CoreLoss_W;
        var shares = new List<(string Cause, string Label, double Loss, double Current)>();
        foreach (var (cause, label, has) in steel)
        {
            var branches = core.Core.Parts.Where(p => has(p.Part)).SelectMany(p => p.Branches).ToList();
            shares.Add((cause, label, branches.Sum(b => s.BranchLoss_W(b) - s.ExtraLoss_W[b]), branches.Sum(b => current[b].Whole - current[b].Extra)));
        }

        shares.Add(("zoneExtra", "Joint and T zones, building factor", s.ExtraLoss_W.Sum(), current.Sum(c => c.Extra)));

        // The air path carries flux with an isolated star, or where other fluxes are free too.
        var air = 1 - shares.Sum(x => x.Current);
        if (Math.Abs(air) > Rounding)
        {
            shares.Add(("airPath", "Zero-sequence path through air", 0, air));
        }

        return [.. shares
            .Select(x => new ShareResult
            {
                Cause = x.Cause,
                Label = x.Label,
                Loss_W = x.Loss,
                Loss_percent = total > 0 ? 100 * x.Loss / total : 0,
                Current_percent = 100 * x.Current,
            })
            .OrderByDescending(x => x.Loss_W)];
    }
}
