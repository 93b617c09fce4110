using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Steels;
using CoreDesign.Web.Features.Design;

namespace CoreDesign.Web.Tests.Design;

public sealed class SolveLoopTests
{
    [Fact]
    public async Task Edit_shows_the_estimate_before_levers_and_curve()
    {
        var state = new DesignPageState();
        state.Load(FormReader.Texts(Samples.Input));
        var shown = new List<(bool Estimate, bool Levers)>();
        using var loop = Loop(Engine(), state, () => shown.Add((state.Estimate is not null, state.Levers is not null)));

        await loop.RunAsync();

        Assert.Equal([(true, false), (true, true), (true, true)], shown);
        Assert.False(loop.IsEstimating || loop.IsStudying);
    }

    [Fact]
    public async Task Levers_and_curve_are_shown_before_the_margins()
    {
        var state = new DesignPageState();
        state.Load(FormReader.Texts(Samples.Input));
        var shown = new List<(bool Levers, bool Margins)>();
        using var loop = Loop(Engine(), state, () => shown.Add((state.Levers is not null, state.Margins is not null)));

        await loop.RunAsync();

        Assert.Equal([(false, false), (true, false), (true, true)], shown);
        Assert.Same(Samples.Margins, state.Margins);
    }

    [Fact]
    public async Task Newer_edit_cancels_the_older_solve()
    {
        var state = new DesignPageState();
        state.Load(FormReader.Texts(Samples.Input));
        using var started = new ManualResetEventSlim();
        var cancelled = false;
        var first = true;
        using var loop = Loop(
            Engine() with
            {
                Estimate = (design, cancel) =>
                {
                    if (first)
                    {
                        first = false;
                        started.Set();
                        cancelled = cancel.WaitHandle.WaitOne(TimeSpan.FromSeconds(10));
                        cancel.ThrowIfCancellationRequested();
                    }

                    return Samples.Ok(Samples.Estimate with { NoLoadLoss_W = design.Core!.WindowHeight_mm!.Value });
                },
            },
            state,
            () => { });

        var older = loop.RunAsync();
        started.Wait(TimeSpan.FromSeconds(10), TestContext.Current.CancellationToken);
        state.Type(FormPaths.WindowHeight, "600");
        await loop.RunAsync();
        await older;

        Assert.True(cancelled);
        Assert.Equal(600, state.Estimate!.NoLoadLoss_W);
    }

    [Fact]
    public async Task Edit_while_nothing_is_answered_waits_for_no_pause()
    {
        var state = new DesignPageState();
        state.Load(FormReader.Texts(Samples.Input));
        using var loop = new SolveLoop(Engine(), state, () => { }) { Pause = TimeSpan.FromHours(1), Rest = TimeSpan.Zero };

        await loop.RunAsync().WaitAsync(TimeSpan.FromMinutes(1), TestContext.Current.CancellationToken);

        Assert.NotNull(state.Estimate);
    }

    [Fact]
    public async Task Who_waits_for_the_answer_gets_that_of_the_newest_edit()
    {
        var state = new DesignPageState();
        state.Load(FormReader.Texts(Samples.Input));
        var first = true;
        using var started = new ManualResetEventSlim();
        using var loop = new SolveLoop(
            Engine() with
            {
                Estimate = (design, cancel) =>
                {
                    if (first)
                    {
                        first = false;
                        started.Set();
                        cancel.WaitHandle.WaitOne(TimeSpan.FromSeconds(10));
                        cancel.ThrowIfCancellationRequested();
                    }

                    return Samples.Ok(Samples.Estimate with { NoLoadLoss_W = design.Core!.WindowHeight_mm!.Value });
                },
            },
            state,
            () => { })
        { Rest = TimeSpan.FromHours(1) };
        Assert.True(loop.Answered.IsCompleted);

        var older = loop.RunAsync();
        started.Wait(TimeSpan.FromSeconds(10), TestContext.Current.CancellationToken);
        state.Type(FormPaths.WindowHeight, "600");
        _ = loop.RunAsync();
        await loop.Answered.WaitAsync(TimeSpan.FromMinutes(1), TestContext.Current.CancellationToken);

        Assert.Equal(600, state.Estimate!.NoLoadLoss_W);
        await older;
    }

    [Fact]
    public async Task Refused_design_solves_no_levers()
    {
        var state = new DesignPageState();
        var asked = false;
        using var loop = Loop(
            Engine() with
            {
                Estimate = (_, _) => new Outcome<EstimateResult> { Errors = [new(FormPaths.Grade, "Missing.")] },
                Levers = (_, _, _) => { asked = true; return []; },
            },
            state,
            () => { });

        await loop.RunAsync();

        Assert.False(asked);
        Assert.Single(state.Messages.Needed);
    }

    private static SolveLoop Loop(DesignEngine engine, DesignPageState state, Action changed) =>
        new(engine, state, changed) { Pause = TimeSpan.Zero, Rest = TimeSpan.Zero };

    private static DesignEngine Engine()
    {
        var steels = new SteelCatalog([]);
        return new()
        {
            Estimate = (_, _) => Samples.Ok(Samples.Estimate),
            Levers = (d, _, _) => [Samples.Lever(d)],
            VoltageCurve = (_, _, _) => [],
            Margins = (_, _) => Samples.Margins,
            Steels = () => steels,
        };
    }
}
