using System.Text;
using CoreDesign.Estimating.Circuits;
using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Demo;
using CoreDesign.Web.Features.Circuits;

namespace CoreDesign.Web.Tests.CircuitPages;

public sealed class CircuitTrialTests
{
    private static readonly CircuitEngine Real = new(SolveCircuit.Run);
    private int repaints;

    [Fact]
    public async Task Example_is_solved_as_it_stands()
    {
        using var trial = Trial(Real, ExampleCircuit.Json);

        await trial.SolveAsync();

        Assert.Equal(TrialStanding.Solved, trial.Standing);
        Assert.Empty(trial.Errors);
        Assert.False(trial.FiguresAreOld);
        Assert.Equal(1, repaints);

        // By hand: phase flux of 400 V over 40 turns at 50 Hz, over the limb's area.
        Assert.Equal(400 * Math.Sqrt(2) / (2 * Math.PI * 50 * 40 * 0.0272), trial.Solved!.Answer.BPeak["limb B"], 1e-4);
        Assert.Equal(0, trial.Solved.Answer.EnergyBalanceResidualOverVA, 1e-3);
    }

    [Fact]
    public async Task Answer_is_that_of_the_use_case()
    {
        using var trial = Trial(Real, JsonCase.Circuit);
        trial.Points = 768;

        await trial.SolveAsync();

        var outcome = SolveCircuit.Run(DesignJson.Read<CircuitCase>(JsonCase.Circuit).Value!, 768);
        Assert.Equal(DesignJson.Write(outcome.Value!), DesignJson.Write(trial.Solved!.Answer));
    }

    [Fact]
    public async Task Every_error_stands_with_its_line_in_the_order_of_the_text()
    {
        using var trial = Trial(Real, ExampleCircuit.Json
            .Replace("\"area\": 0.0272, \"length\": 0.5, \"material\": \"steel\", \"gap\": 80e-6 },\n    { \"name\": \"limb B\"", "\"area\": -1, \"length\": 0.5, \"material\": \"iron\" },\n    { \"name\": \"limb B\"", StringComparison.Ordinal)
            .Replace("\"V\": 400", "\"V\": 0", StringComparison.Ordinal));

        await trial.SolveAsync();

        Assert.Equal(TrialStanding.Refused, trial.Standing);
        Assert.Null(trial.Solved);
        var lines = ExampleCircuit.Json.Split('\n').ToList();
        var (supply, limb) = (lines.FindIndex(l => l.Contains("\"supply\"", StringComparison.Ordinal)) + 1, lines.FindIndex(l => l.Contains("limb A", StringComparison.Ordinal)) + 1);
        Assert.Equal([(supply, "supply.V"), (limb, "branches[0].area"), (limb, "branches[0].material")], trial.Errors.Select(e => (e.Line, e.Path)));
        Assert.StartsWith("0 is outside 0.001", trial.Errors[0].Message, StringComparison.Ordinal);
        Assert.Contains("among the materials (steel)", trial.Errors[2].Message, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("{ \"frequency\": NaN }", "This is not JSON that can be read near line 1")]
    [InlineData("{\n\n\"frequency\": 5\0 }", "near line 3")]
    [InlineData("5", "5 is given where an object with the members format, name")]
    [InlineData("{ \"branches\": 1, \"branches\": 1 }", "'branches' is given twice")]
    [InlineData("{ \"frequenzy\": 50 }", "Did you mean 'frequency'?")]
    public async Task Text_that_is_no_case_is_answered_in_the_words_of_the_api(string text, string message)
    {
        using var trial = Trial(Real, text);

        await trial.SolveAsync();

        Assert.Equal(TrialStanding.Refused, trial.Standing);
        Assert.Contains(trial.Errors, e => e.Message.Contains(message, StringComparison.Ordinal));
    }

    [Fact]
    public async Task Nesting_deeper_than_a_case_needs_is_refused()
    {
        using var trial = Trial(Real, new string('[', 100_000));

        await trial.SolveAsync();

        Assert.Contains("At most 32 levels of nesting", Assert.Single(trial.Errors).Message, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("branches[1].name", "\"a\\u0000b\"", "branches[1].name")]
    [InlineData("windings[0].name", "\"a\\u202eb\"", "windings[0].name")]
    [InlineData("branches[1].to", "\"p\\u200b\"", "branches[1].to")]
    [InlineData("materials", "{ \"core\": { \"mu_r\": 2 }, \"a\\u0007\": { \"mu_r\": 2 } }", "materials")]
    public async Task Names_that_can_not_be_seen_are_refused(string path, string raw, string at)
    {
        using var trial = Trial(Real, JsonCase.With(JsonCase.Circuit, path, raw));

        await trial.SolveAsync();

        Assert.Contains(trial.Errors, e => e.Path == at && e.Message.Contains("control or invisible characters", StringComparison.Ordinal));
    }

    [Theory]
    [InlineData("")]
    [InlineData(" \r\n\t ")]
    public async Task Nothing_is_answered_with_what_to_do_first(string text)
    {
        using var trial = Trial(Real, text);

        await trial.SolveAsync();

        Assert.Equal(TrialStanding.Refused, trial.Standing);
        Assert.StartsWith("There is no text to solve.", trial.Reason, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Text_longer_than_the_field_takes_is_not_read()
    {
        using var trial = Trial(new((_, _, _) => throw new InvalidOperationException("solved")), JsonCase.Circuit + new string(' ', CircuitTrial.LongestText));

        await trial.SolveAsync();

        Assert.Contains("more than 150000 characters. Choose it as a file, up to 1024 KiB", trial.Reason, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Circuit_without_an_answer_keeps_the_figures_of_the_last_that_had_one()
    {
        using var trial = Trial(Real, JsonCase.Circuit);
        await trial.SolveAsync();
        var first = trial.Solved;

        trial.Type(JsonCase.With(JsonCase.Circuit, "branches[1].to", "\"r\""));
        await trial.SolveAsync();

        Assert.Equal(TrialStanding.Unsolvable, trial.Standing);
        Assert.Contains("no closed loop", trial.Reason, StringComparison.Ordinal);
        Assert.Same(first, trial.Solved);
        Assert.True(trial.FiguresAreOld);
    }

    [Fact]
    public async Task Other_points_make_the_figures_old_until_they_are_solved()
    {
        using var trial = Trial(Real, JsonCase.Circuit);
        await trial.SolveAsync();

        trial.Points = 1536;
        Assert.True(trial.FiguresAreOld);
        await trial.SolveAsync();

        Assert.False(trial.FiguresAreOld);
    }

    [Theory]
    [InlineData("stop")]
    [InlineData("type")]
    [InlineData("leave")]
    public async Task Solve_ends_when_it_is_stopped_the_text_changes_or_the_page_is_left(string what)
    {
        var begun = new TaskCompletionSource();
        var told = false;
        using var trial = Trial(new((_, _, cancel) =>
        {
            begun.SetResult();
            told = cancel.WaitHandle.WaitOne(TimeSpan.FromSeconds(30));
            cancel.ThrowIfCancellationRequested();
            throw new InvalidOperationException("not told to stop");
        }), JsonCase.Circuit);
        var solving = trial.SolveAsync();
        await begun.Task;
        Assert.Equal(TrialStanding.Solving, trial.Standing);

        if (what == "stop") trial.Stop();
        else if (what == "type") trial.Type("{}");
        else trial.Dispose();

        await solving;
        Assert.True(told);
        Assert.Null(trial.Solved);
        if (what != "leave") Assert.Equal(TrialStanding.Stopped, trial.Standing);
    }

    [Fact]
    public async Task Answer_that_comes_after_the_stop_is_dropped()
    {
        var begun = new TaskCompletionSource();
        using var go = new ManualResetEventSlim();
        using var trial = Trial(new((@case, points, _) =>
        {
            begun.SetResult();
            go.Wait(CancellationToken.None);
            return SolveCircuit.Run(@case, points, CancellationToken.None);
        }), JsonCase.Circuit);
        var solving = trial.SolveAsync();
        await begun.Task;

        trial.Stop();
        go.Set();
        await solving;

        Assert.Equal(TrialStanding.Stopped, trial.Standing);
        Assert.Null(trial.Solved);
    }

    [Fact]
    public async Task Failure_of_the_solver_leaves_a_trial_that_can_be_solved_again()
    {
        var fail = true;
        using var trial = Trial(new((@case, points, cancel) => fail ? throw new InvalidOperationException("broken") : SolveCircuit.Run(@case, points, cancel)), JsonCase.Circuit);

        await Assert.ThrowsAsync<InvalidOperationException>(trial.SolveAsync);
        Assert.NotEqual(TrialStanding.Solving, trial.Standing);
        fail = false;
        await trial.SolveAsync();

        Assert.Equal(TrialStanding.Solved, trial.Standing);
    }

    [Fact]
    public async Task File_is_solved_at_once_and_its_text_can_be_mended()
    {
        using var trial = Trial(Real, "");

        await ChooseAsync(trial, "\uFEFF" + JsonCase.Circuit);

        Assert.Equal(TrialStanding.Solved, trial.Standing);
        Assert.Equal(JsonCase.Circuit, trial.Text);
        Assert.Null(trial.LongFile);
    }

    [Fact]
    public async Task File_longer_than_the_field_is_solved_without_being_shown()
    {
        using var trial = Trial(Real, "");

        await ChooseAsync(trial, JsonCase.Circuit + new string(' ', CircuitTrial.LongestText));

        Assert.Equal(TrialStanding.Solved, trial.Standing);
        Assert.Equal("case.json", trial.LongFile);
        trial.Type("");
        Assert.Null(trial.LongFile);
    }

    [Fact]
    public async Task File_that_is_too_large_is_refused_before_it_is_opened()
    {
        using var trial = Trial(Real, "kept");

        await trial.ChooseAsync("large.json", 10 * 1024 * 1024, () => throw new InvalidOperationException("opened"));

        Assert.StartsWith("The file has 10240 KiB; at most 1024 KiB are read.", trial.Reason, StringComparison.Ordinal);
        Assert.Equal("kept", trial.Text);
    }

    [Fact]
    public async Task File_that_is_no_text_is_refused_and_the_text_stays()
    {
        using var trial = Trial(Real, "kept");

        await trial.ChooseAsync("noise.json", 3, () => new MemoryStream([0xff, 0xfe, 0x00]));

        Assert.StartsWith("The file is not text in UTF-8.", trial.Reason, StringComparison.Ordinal);
        Assert.Equal("kept", trial.Text);
    }

    private static Task ChooseAsync(CircuitTrial trial, string text)
    {
        var bytes = Encoding.UTF8.GetBytes(text);
        return trial.ChooseAsync("case.json", bytes.Length, () => new MemoryStream(bytes));
    }

    private CircuitTrial Trial(CircuitEngine engine, string text)
    {
        var trial = new CircuitTrial(engine, () => repaints++);
        trial.Type(text);
        return trial;
    }
}
