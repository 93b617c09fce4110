using CoreDesign.Estimating.Contracts;

namespace CoreDesign.Web.Features.Estimates;

/// <summary>Solves within a time limit: one request must not hold the machine for ever.</summary>
public static class TimedSolve
{
    public static readonly TimeSpan Circuit = TimeSpan.FromSeconds(20);
    public static readonly TimeSpan Estimate = TimeSpan.FromSeconds(30);
    public static readonly TimeSpan Study = TimeSpan.FromSeconds(120);

    public static Outcome<T> Run<T>(TimeSpan longest, Func<CancellationToken, Outcome<T>> solve, CancellationToken cancel)
        where T : class
    {
        ArgumentNullException.ThrowIfNull(solve);
        using var limit = CancellationTokenSource.CreateLinkedTokenSource(cancel);
        limit.CancelAfter(longest);
        try
        {
            return solve(limit.Token);
        }
        catch (OperationCanceledException) when (!cancel.IsCancellationRequested)
        {
            return new() { Unsolvable = new Unsolvable($"The solve took longer than the {longest.TotalSeconds} s allowed. A large winding resistance makes it slow: take a smaller one, or 0.", null) };
        }
    }
}
