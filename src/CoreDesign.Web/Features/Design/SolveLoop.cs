using CoreDesign.Estimating.LimbSizing;

namespace CoreDesign.Web.Features.Design;

/// <summary>
/// Answers each edit: the estimate at once, levers, voltage curve and margins in the pause after it. A newer edit cancels what is still
/// being solved for an older one. Call it where the page renders; only the solving itself leaves that thread.
/// </summary>
public sealed class SolveLoop(DesignEngine engine, DesignPageState state, Action changed) : IDisposable
{
    private CancellationTokenSource? running;
    private TaskCompletionSource answered = Answering();

    /// <summary>Keystrokes that come while an edit is being answered and closer than this are one edit; the first of them is answered at once.</summary>
    public TimeSpan Pause { get; init; } = TimeSpan.FromMilliseconds(40);

    /// <summary>How long nothing must be typed before levers and curve are solved, which takes the processor from the next edit.</summary>
    public TimeSpan Rest { get; init; } = TimeSpan.FromMilliseconds(250);

    public bool IsEstimating { get; private set; }

    public bool IsStudying { get; private set; }

    /// <summary>Ends when the newest edit is answered or refused; at once where nothing is being answered.</summary>
    public Task Answered => IsEstimating ? answered.Task : Task.CompletedTask;

    /// <summary>Solves for the texts as they are now; returns when everything is in, or when a newer edit took over.</summary>
    public async Task RunAsync()
    {
        var own = new CancellationTokenSource();
        var older = Interlocked.Exchange(ref running, own);
        if (older is not null)
        {
            await older.CancelAsync();
        }

        var cancel = own.Token;
        var answering = IsEstimating;
        answered = answering ? answered : Answering();
        var solving = state.Begin();
        try
        {
            IsStudying = false;
            IsEstimating = true;
            if (answering)
            {
                await Task.Delay(Pause, cancel);
            }

            var design = SizingAid.Complete(solving.Request.Design, solving.Request.YokeHeight_mm, solving.Request.WantedFluxDensity_T, engine.Steels());
            var outcome = await Task.Run(() => engine.Estimate(design, cancel), cancel);
            if (!state.Accept(solving, design, outcome))
            {
                return;
            }

            IsEstimating = false;
            IsStudying = outcome.Ok;
            answered.TrySetResult();
            changed();
            await StudyAsync(solving, cancel);
        }
        catch (OperationCanceledException) when (cancel.IsCancellationRequested)
        {
            // A newer edit is being answered.
        }
        finally
        {
            if (ReferenceEquals(running, own))
            {
                IsEstimating = IsStudying = false;
                answered.TrySetResult();
            }
        }
    }

    /// <summary>Solves levers, curve and margins now if they are missing, for a save that can't wait for the pause. The margins come last: they take longest.</summary>
    public async Task CompleteAsync(CancellationToken cancel)
    {
        var solving = state.Begin();
        var design = state.SolvedDesign;
        if (state.Estimate is { } estimate && (state.Levers is null || state.VoltageCurve is null))
        {
            var curve = await Task.Run(() => engine.VoltageCurve(design, estimate, cancel), cancel);
            var levers = await Task.Run(() => engine.Levers(design, estimate, cancel), cancel);
            if (state.Accept(solving, levers, curve))
            {
                changed();
            }
        }

        if (state.Estimate is not null && state.Margins is null && await Task.Run(() => engine.Margins(design, cancel), cancel) is { } margins)
        {
            state.Accept(solving, margins);
        }
    }

    public void Dispose()
    {
        var last = Interlocked.Exchange(ref running, null);
        last?.Cancel();
        last?.Dispose();
    }

    private static TaskCompletionSource Answering() => new(TaskCreationOptions.RunContinuationsAsynchronously);

    private async Task StudyAsync(Solving solving, CancellationToken cancel)
    {
        if (!IsStudying)
        {
            return;
        }

        await Task.Delay(Rest, cancel);
        await CompleteAsync(cancel);
        IsStudying = false;
        if (solving.Serial == state.Serial)
        {
            changed();
        }
    }
}
