using System.Text;
using System.Text.Unicode;
using CoreDesign.Estimating.Circuits;
using CoreDesign.Estimating.Contracts;
using CoreDesign.Web.Features.Estimates;

namespace CoreDesign.Web.Features.Circuits;

/// <summary>The use case that the page calls, so that a test can stand in for a slow or failing solve.</summary>
public sealed record CircuitEngine(Func<CircuitCase, int, CancellationToken, Outcome<CircuitAnswer>> Solve);

public enum TrialStanding
{
    Blank,
    Solving,
    Solved,
    Refused,
    Unsolvable,
    Stopped,
}

/// <summary>One thing that must change, the line it is on, and its path in the text.</summary>
public sealed record PlacedError(int Line, string Path, string Message);

/// <summary>A case that was solved, with the text it stood in.</summary>
public sealed record SolvedCircuit(string Text, int Points, CircuitCase Case, CircuitAnswer Answer);

/// <summary>A circuit that someone tries: its text, the solve that runs, and what came of it.</summary>
public sealed class CircuitTrial(CircuitEngine engine, Action changed) : IDisposable
{
    // One message of the page carries the text whole, in which a character may take six bytes.
    public const int LongestText = 150_000;
    public const int LargestFile_bytes = BoundedBody.Limit_bytes;

    private CancellationTokenSource? running;

    public string Text { get; private set; } = "";

    /// <summary>Name of the file whose text is longer than the field takes; it is kept and solved, not shown.</summary>
    public string? LongFile { get; private set; }

    public int Points { get; set; } = SolveCircuit.DefaultPoints;

    public TrialStanding Standing { get; private set; }

    public IReadOnlyList<PlacedError> Errors { get; private set; } = [];

    /// <summary>Why there is no answer, where no line of the text is to blame.</summary>
    public string? Reason { get; private set; }

    /// <summary>The last case that had an answer; stays while a later text has none.</summary>
    public SolvedCircuit? Solved { get; private set; }

    public bool FiguresAreOld => Solved is { } s && (s.Points != Points || s.Text != Text);

    public void Type(string? text)
    {
        if (running is not null) (Standing, Reason) = (TrialStanding.Stopped, "Stopped, because the text changed.");
        End();
        Text = text ?? "";
        LongFile = null;
    }

    /// <summary>Takes a file in place of the text; one that can't be taken leaves the text as it was.</summary>
    public async Task ChooseAsync(string name, long size, Func<Stream> open)
    {
        ArgumentNullException.ThrowIfNull(open);
        End();
        if (size > LargestFile_bytes)
        {
            Refuse($"The file has {size / 1024} KiB; at most {LargestFile_bytes / 1024} KiB are read. Leave waveforms and other answers out: only the circuit is needed.");
            return;
        }

        using var all = new MemoryStream();
        await using (var stream = open())
        {
            await stream.CopyToAsync(all);
        }

        if (!Utf8.IsValid(all.ToArray()))
        {
            Refuse("The file is not text in UTF-8. Save it as UTF-8 and choose it again.");
            return;
        }

        Text = Encoding.UTF8.GetString(all.ToArray()).TrimStart('\uFEFF');
        LongFile = Text.Length > LongestText ? name : null;
        await SolveAsync();
    }

    public async Task SolveAsync()
    {
        End();
        if (string.IsNullOrWhiteSpace(Text))
        {
            Refuse("There is no text to solve. Paste a case, choose a file, or load the example.");
            return;
        }

        if (LongFile is null && Text.Length > LongestText)
        {
            Refuse($"The text has more than {LongestText} characters. Choose it as a file, up to {LargestFile_bytes / 1024} KiB.");
            return;
        }

        using var mine = new CancellationTokenSource();
        running = mine;
        (Standing, Errors, Reason) = (TrialStanding.Solving, [], null);
        changed();
        var (text, points) = (Text, Points);
        try
        {
            var ended = await Task.Run(() => Attempt(text, points, mine.Token));

            // Whoever stopped it, or began another, has said what stands now.
            if (running == mine) (Standing, Errors, Reason, Solved) = (ended.Standing, ended.Errors, ended.Reason, ended.Solved ?? Solved);
        }
        finally
        {
            if (running == mine) running = null;
            if (running is null && Standing == TrialStanding.Solving) Standing = TrialStanding.Blank;
        }
    }

    public void Stop()
    {
        if (running is null) return;
        End();
        (Standing, Reason) = (TrialStanding.Stopped, "Stopped before it was solved.");
    }

    public void Dispose() => End();

    private (TrialStanding Standing, IReadOnlyList<PlacedError> Errors, string? Reason, SolvedCircuit? Solved) Attempt(string text, int points, CancellationToken cancel)
    {
        var read = DesignJson.Read<CircuitCase>(text);
        if (read.Value is not { } @case) return (TrialStanding.Refused, Placed(text, read.Errors), null, null);
        Outcome<CircuitAnswer> outcome;
        try
        {
            outcome = TimedSolve.Run(TimedSolve.Circuit, limit => engine.Solve(@case, points, limit), cancel);
        }
        catch (OperationCanceledException)
        {
            return (TrialStanding.Stopped, [], null, null);
        }

        return outcome switch
        {
            { Value: { } answer } => (TrialStanding.Solved, [], null, new SolvedCircuit(text, points, @case, answer)),
            { Unsolvable: { } why } => (TrialStanding.Unsolvable, [], why.Residual is { } r && double.IsFinite(r) ? FormattableString.Invariant($"{why.Reason} Residual: {r:G3}.") : why.Reason, null),
            _ => (TrialStanding.Refused, Placed(text, outcome.Errors), null, null),
        };
    }

    private static IReadOnlyList<PlacedError> Placed(string text, IReadOnlyList<FieldError> errors)
    {
        var lines = JsonLines.Of(text, [.. errors.Select(e => e.Path)]);
        return [.. errors.Select(e => new PlacedError(lines[e.Path], e.Path, e.Message)).OrderBy(e => e.Line)];
    }

    private void Refuse(string reason) => (Standing, Errors, Reason) = (TrialStanding.Refused, [], reason);

    private void End()
    {
        running?.Cancel();
        running = null;
    }
}
