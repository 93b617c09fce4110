using CoreDesign.Estimating.Steels;
using CoreDesign.History.Designs;

namespace CoreDesign.Web.Features.Designs;

/// <summary>
/// Solves the revision that is looked at with today's kernel, aside from the page; when another is chosen meanwhile, the answer
/// for the first is dropped.
/// </summary>
public sealed class TodayCheck(Func<SteelCatalog> steels) : IDisposable
{
    private CancellationTokenSource? running;
    private (long Id, int Revision)? asked;

    /// <summary>The answer for the revision asked about last; null until it is in.</summary>
    public RevisionCheck? Today { get; private set; }

    public async Task AskAsync(RevisionDetail revision)
    {
        ArgumentNullException.ThrowIfNull(revision);
        var place = (revision.Info.Id, revision.Info.Revision);
        if (asked == place) return;
        asked = place;
        Today = null;
        running?.Cancel();
        running?.Dispose();
        running = new CancellationTokenSource();
        var cancel = running.Token;
        try
        {
            var answer = await Task.Run(() => RevisionCheck.Run(revision, steels(), cancel), cancel);
            if (!cancel.IsCancellationRequested) Today = answer;
        }
        catch (OperationCanceledException) when (cancel.IsCancellationRequested)
        {
            // Another revision was chosen, or the page is gone.
        }
    }

    public void Dispose()
    {
        running?.Cancel();
        running?.Dispose();
        running = null;
    }
}
