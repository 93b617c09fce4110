using CoreDesign.Estimating.Contracts;
using CoreDesign.Web.Features.Estimates;

namespace CoreDesign.Web.Tests.Estimates;

public sealed class TimedSolveTests
{
    [Fact]
    public void Solve_beyond_its_time_ends_as_a_design_that_cannot_be_solved()
    {
        var outcome = TimedSolve.Run(TimeSpan.FromMilliseconds(1), UntilStopped, TestContext.Current.CancellationToken);

        Assert.Contains("took longer than the 0.001 s allowed", outcome.Unsolvable!.Reason, StringComparison.Ordinal);
    }

    [Fact]
    public void Solve_that_nobody_waits_for_any_more_is_cancelled()
    {
        using var gone = new CancellationTokenSource();
        gone.Cancel();

        Assert.ThrowsAny<OperationCanceledException>(() => TimedSolve.Run(TimeSpan.FromHours(1), UntilStopped, gone.Token));
    }

    private static Outcome<Study> UntilStopped(CancellationToken limit)
    {
        limit.WaitHandle.WaitOne();
        limit.ThrowIfCancellationRequested();
        return new();
    }
}
