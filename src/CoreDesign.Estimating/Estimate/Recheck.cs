using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Steels;

namespace CoreDesign.Estimating.Estimate;

/// <summary>What today's kernel and steel data say of a stored revision.</summary>
/// <param name="Same">True where loss and current agree within <see cref="Recheck.Tolerance"/>.</param>
/// <param name="NoLoadLoss_W">Today's figure; null where the design can't be solved any more, and <paramref name="Reason"/> says why.</param>
public sealed record RecheckResult(bool Same, double? NoLoadLoss_W, double? NoLoadCurrent_percent, string KernelVersion, string? SteelDataRevision, string? Reason);

/// <summary>Use case: solves a stored design again and says whether the figures still stand. The stored ones are never touched.</summary>
public static class Recheck
{
    /// <summary>Relative difference that counts as another figure: half a unit of the fourth digit.</summary>
    public const double Tolerance = 5e-5;

    public static RecheckResult Run(DesignInput design, EstimateResult stored, SteelCatalog steels, CancellationToken cancel = default)
    {
        ArgumentNullException.ThrowIfNull(stored);
        var today = EstimateDesign.Run(design, steels, cancel);
        if (today.Value is not { } now)
        {
            var reason = today.Unsolvable?.Reason ?? string.Join(" ", today.Errors.Select(e => e.Message));
            return new RecheckResult(false, null, null, Magnetics.Kernel.Version, null, reason);
        }

        var same = Near(now.NoLoadLoss_W, stored.NoLoadLoss_W) && Near(now.NoLoadCurrent_percent, stored.NoLoadCurrent_percent);
        return new RecheckResult(same, now.NoLoadLoss_W, now.NoLoadCurrent_percent, now.KernelVersion, now.SteelDataRevision, null);
    }

    private static bool Near(double a, double b) => Math.Abs(a - b) <= Tolerance * Math.Max(Math.Abs(a), Math.Abs(b));
}
