using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Estimate;
using CoreDesign.Estimating.Steels;
using CoreDesign.History.Designs;
using CoreDesign.Sheets;

namespace CoreDesign.Web.Features.Designs;

/// <summary>Whether the figures of a saved revision still stand, for page and API alike.</summary>
/// <param name="Saved">The stored figures that today's were held against.</param>
public sealed record RevisionCheck(RecheckResult Today, EstimateResult Saved)
{
    public bool Same => Today.Same;

    /// <summary>The check in words.</summary>
    public string Text
    {
        get
        {
            if (Same)
            {
                return "Today's kernel gives the same figures.";
            }

            if (Today.Reason is { } reason)
            {
                return $"Today's kernel {Today.KernelVersion} can't solve this design: {reason}";
            }

            var figures = Differing();
            return $"Today's kernel gives {string.Join(", ", figures.Select(f => f.Now))} (saved: {string.Join(", ", figures.Select(f => f.Then))}). {Cause()}";
        }
    }

    /// <summary>
    /// Solves the revision again. Its figures are stored twice, in the study that sheets are printed from and in the columns that
    /// lists show; today's must agree with both.
    /// </summary>
    public static RevisionCheck Run(RevisionDetail revision, SteelCatalog steels, CancellationToken cancel = default)
    {
        ArgumentNullException.ThrowIfNull(revision);
        return Of(revision, EstimateDesign.Run(revision.Input, steels, cancel));
    }

    /// <summary>Holds an answer of today against the revision.</summary>
    public static RevisionCheck Of(RevisionDetail revision, Outcome<EstimateResult> solved)
    {
        ArgumentNullException.ThrowIfNull(revision);
        var (study, info) = (revision.Study.Estimate, revision.Info);
        var today = Recheck.Of(solved, study);
        if (!today.Same)
        {
            return new(today, study);
        }

        var listed = study with
        {
            NoLoadLoss_W = info.NoLoadLoss_W,
            NoLoadCurrent_percent = info.NoLoadCurrent_percent,
            Margin = study.Margin with { AtRated_percent = info.MarginAtRated_percent },
            Mass_kg = study.Mass_kg with { Total = info.Mass_kg },
        };
        return new(today.Against(listed), listed);
    }

    // Loss and current always; margin and mass where they differ.
    private List<(string Now, string Then)> Differing()
    {
        var figures = new List<(string Now, string Then)>();
        Add(Today.NoLoadLoss_W, Saved.NoLoadLoss_W, 4, "W", Recheck.Near, always: true);
        Add(Today.NoLoadCurrent_percent, Saved.NoLoadCurrent_percent, 3, "%", Recheck.Near, always: true);
        Add(Today.MarginAtRated_percent, Saved.Margin.AtRated_percent, 3, "% margin", Recheck.NearMargin, always: false);
        Add(Today.Mass_kg, Saved.Mass_kg.Total, 4, "kg", Recheck.Near, always: false);
        return figures;

        void Add(double? today, double then, int digits, string unit, Func<double, double, bool> near, bool always)
        {
            if (today is not { } now || (!always && near(now, then)))
            {
                return;
            }

            // As many digits as it takes to tell the two apart.
            while (digits < 9 && !near(now, then) && Figures.Significant(now, digits) == Figures.Significant(then, digits))
            {
                digits++;
            }

            figures.Add((Figures.With(Figures.Significant(now, digits), unit), Figures.With(Figures.Significant(then, digits), unit)));
        }
    }

    private string Cause()
    {
        var changed = new List<string>();
        if (Saved.KernelVersion != Today.KernelVersion)
        {
            changed.Add($"the kernel from {Saved.KernelVersion} to {Today.KernelVersion}");
        }

        if (Saved.SteelDataRevision != Today.SteelDataRevision)
        {
            changed.Add($"the data of {Saved.Steel.Grade} from {Saved.SteelDataRevision} to {Today.SteelDataRevision}");
        }

        return changed.Count > 0
            ? $"Changed since: {string.Join(" and ", changed)}."
            : "Kernel and steel data are the ones it was saved with, so the stored figures themselves are in doubt; don't quote from them.";
    }
}
