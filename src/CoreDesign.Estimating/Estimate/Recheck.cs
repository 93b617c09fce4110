using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Steels;

namespace CoreDesign.Estimating.Estimate;

/// <summary>What today's kernel and steel data say of a stored revision. The figures are null where the design can't be solved any more.</summary>
public sealed record RecheckResult
{
    /// <summary>True where loss, current, margin at rated voltage and mass all agree within <see cref="Recheck.Tolerance"/>.</summary>
    public required bool Same { get; init; }

    public required string KernelVersion { get; init; }

    public string? SteelDataRevision { get; init; }

    public double? NoLoadLoss_W { get; init; }

    public double? NoLoadCurrent_percent { get; init; }

    public double? MarginAtRated_percent { get; init; }

    public double? Mass_kg { get; init; }

    /// <summary>Why there are no figures; null when there are.</summary>
    public string? Reason { get; init; }

    /// <summary>The same answer, held against these stored figures.</summary>
    public RecheckResult Against(EstimateResult stored)
    {
        ArgumentNullException.ThrowIfNull(stored);
        return this with
        {
            Same = NoLoadLoss_W is { } loss && Recheck.Near(loss, stored.NoLoadLoss_W)
                && NoLoadCurrent_percent is { } current && Recheck.Near(current, stored.NoLoadCurrent_percent)
                && MarginAtRated_percent is { } margin && Recheck.NearMargin(margin, stored.Margin.AtRated_percent)
                && Mass_kg is { } mass && Recheck.Near(mass, stored.Mass_kg.Total),
        };
    }
}

/// <summary>Use case: solves a stored design again and says whether the figures still stand. The stored ones are never touched.</summary>
public static class Recheck
{
    /// <summary>Relative difference that counts as another figure: half a unit of the fourth digit. A margin is held to it in points of the whole.</summary>
    public const double Tolerance = 5e-5;

    public static RecheckResult Run(DesignInput design, EstimateResult stored, SteelCatalog steels, CancellationToken cancel = default) =>
        Of(EstimateDesign.Run(design, steels, cancel), stored);

    /// <summary>Holds an answer of today against the stored one.</summary>
    public static RecheckResult Of(Outcome<EstimateResult> today, EstimateResult stored)
    {
        ArgumentNullException.ThrowIfNull(today);
        ArgumentNullException.ThrowIfNull(stored);
        if (today.Value is not { } now)
        {
            var reason = today.Unsolvable?.Reason ?? string.Join(" ", today.Errors.Select(e => e.Message));
            return new RecheckResult { Same = false, KernelVersion = Magnetics.Kernel.Version, Reason = reason };
        }

        var solved = new RecheckResult
        {
            Same = true,
            KernelVersion = now.KernelVersion,
            SteelDataRevision = now.SteelDataRevision,
            NoLoadLoss_W = now.NoLoadLoss_W,
            NoLoadCurrent_percent = now.NoLoadCurrent_percent,
            MarginAtRated_percent = now.Margin.AtRated_percent,
            Mass_kg = now.Mass_kg.Total,
        };
        return solved.Against(stored);
    }

    /// <summary>Whether two values of one figure count as the same.</summary>
    public static bool Near(double a, double b) => Math.Abs(a - b) <= Tolerance * Math.Max(Math.Abs(a), Math.Abs(b));

    // A margin may be close to nothing, where a relative difference says nothing.
    public static bool NearMargin(double a_percent, double b_percent) => Math.Abs(a_percent - b_percent) <= Tolerance * 100;
}
