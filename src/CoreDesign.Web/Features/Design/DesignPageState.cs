using CoreDesign.Estimating.Contracts;

namespace CoreDesign.Web.Features.Design;

/// <summary>
/// The design page without its screen: texts as typed, pins, undo, messages, and the last answer with the texts it stands for.
/// One circuit uses it; it is not safe for use from several threads.
/// </summary>
public sealed class DesignPageState
{
    private readonly UndoStack undo = new();
    private readonly HashSet<string> touched = new(StringComparer.Ordinal);
    private FormReading reading = FormReader.Read(DesignText.Empty, DesignText.Empty);
    private IReadOnlyList<FieldError> refused = [];

    public DesignText Typed { get; private set; } = DesignText.Empty;

    /// <summary>The texts for which <see cref="Estimate"/> stands.</summary>
    public DesignText Solved { get; private set; } = DesignText.Empty;

    public EstimateResult? Estimate { get; private set; }
    public DerivedTexts Derived { get; private set; } = DerivedTexts.None;
    public IReadOnlyList<LeverResult>? Levers { get; private set; }
    public IReadOnlyList<VoltagePointResult>? VoltageCurve { get; private set; }

    /// <summary>Null until they are solved, and for a revision kept from before there were margins.</summary>
    public MarginsResult? Margins { get; private set; }
    public Unsolvable? Unsolvable { get; private set; }

    /// <summary>Grows with every edit; an answer to an older one is dropped.</summary>
    public long Serial { get; private set; }

    /// <summary>The edit that was answered last.</summary>
    public long Answered { get; private set; }

    public bool CanUndo => undo.CanUndo;
    public bool CanRedo => undo.CanRedo;

    /// <summary>The design that <see cref="Estimate"/> was solved for, turns and yoke filled in.</summary>
    public DesignInput SolvedDesign { get; private set; } = new();

    public DesignRequest Request => DesignRequest.From(reading);

    public Solving Begin() => new(Serial, reading.Standing, Request);

    /// <summary>True where a typed text is not what the figures stand for.</summary>
    public bool FiguresAreOld => Estimate is not null && (reading.Errors.Count > 0 || refused.Count > 0 || Unsolvable is not null);

    /// <summary>True where everything typed is valid and answered, so that it can be saved.</summary>
    public bool IsComplete => Estimate is not null && !FiguresAreOld && Solved.Equals(Typed);

    /// <summary>Starts from these texts; <paramref name="keepAnswer"/> leaves the figures of what was open before until the new ones are in.</summary>
    public void Load(DesignText texts, bool keepAnswer = false)
    {
        undo.Clear();
        touched.Clear();
        refused = [];
        Unsolvable = null;
        if (!keepAnswer)
        {
            Estimate = null;
            Derived = DerivedTexts.None;
        }

        if (!keepAnswer || !texts.Equals(Typed))
        {
            Set(texts);
        }
    }

    public void Type(string path, string text)
    {
        if (Typed[path] == text)
        {
            return;
        }

        touched.Add(path);
        undo.Keep(Typed, path);

        // A set that this keystroke pins stands as it was derived, until what is typed is a value.
        reading = FormReader.Read(FormRules.Pin(Typed, path, Estimate?.Geometry), reading.Standing);
        Set(FormRules.Type(Typed, path, text, Estimate?.Geometry));
    }

    /// <summary>The field lost the focus: the next keystroke in it is a new step of undo.</summary>
    public void Leave(string path)
    {
        touched.Add(path);
        undo.Close();
    }

    /// <summary>Gives a pinned field back to its derived value.</summary>
    public void Release(string path) =>
        Step(path == FormPaths.LimbSteps ? FormRules.ReleaseSteps(Typed, Estimate?.Geometry) : Typed.Without(path));

    public void PinSteps() => Step(FormRules.PinSteps(Typed, Estimate?.Geometry));

    public void RemoveStep(int row) => Step(FormRules.RemoveStep(FormRules.PinSteps(Typed, Estimate?.Geometry), row));

    /// <summary>Takes several values at once, as one step of undo.</summary>
    public void Take(IEnumerable<KeyValuePair<string, string>> values) =>
        Step(values.Aggregate(Typed, (texts, v) => FormRules.Type(texts, v.Key, v.Value, Estimate?.Geometry)));

    /// <summary>
    /// Tries a solved change: types what the lever changed and releases what it took away; what was open stays open. Only where the change would make the
    /// page fill in other turns or another yoke, those are pinned to what the lever was solved with, so that it brings what it promised.
    /// </summary>
    public void Try(LeverResult lever)
    {
        var (solved, tried) = (DesignPaths.Flatten(SolvedDesign), DesignPaths.Flatten(lever.Design));
        var changed = tried.Where(v => !solved.TryGetValue(v.Key, out var s) || !Equals(s, v.Value)).ToList();
        var section = changed.Exists(v => v.Key.StartsWith("core.limb", StringComparison.Ordinal));
        var pins = tried.Where(v => !Typed.Has(v.Key) && ((v.Key == FormPaths.YokeFactor && section) || (v.Key == FormPaths.Turns && (section || changed.Exists(c => c.Key == FormPaths.Grade)))));
        var open = solved.Keys.Where(k => !tried.ContainsKey(k)).Aggregate(Typed, (texts, path) => texts.Without(path));
        Step(changed.Concat(pins).DistinctBy(v => v.Key)
            .Aggregate(open, (texts, v) => FormRules.Type(texts, v.Key, v.Value is double n ? NumberText.Exact(n) : (string)v.Value, Estimate?.Geometry)));
    }

    public void Undo() => Set(undo.Undo(Typed));

    public void Redo() => Set(undo.Redo(Typed));

    /// <summary>Takes the answer to an edit; false where it came too late.</summary>
    public bool Accept(Solving solving, DesignInput design, Outcome<EstimateResult> outcome)
    {
        if (solving.Serial != Serial)
        {
            return false;
        }

        Answered = solving.Serial;
        refused = outcome.Errors;
        Unsolvable = outcome.Unsolvable;
        if (outcome.Value is { } estimate)
        {
            Show(solving.Texts, design, estimate);
        }

        return true;
    }

    /// <summary>Takes levers and curve of an edit; false where they came too late.</summary>
    public bool Accept(Solving solving, IReadOnlyList<LeverResult> levers, IReadOnlyList<VoltagePointResult> curve)
    {
        if (solving.Serial != Serial)
        {
            return false;
        }

        Levers = levers;
        VoltageCurve = curve;
        return true;
    }

    /// <summary>Takes the margins of an edit; false where they came too late.</summary>
    public bool Accept(Solving solving, MarginsResult margins)
    {
        if (solving.Serial != Serial)
        {
            return false;
        }

        Margins = margins;
        return true;
    }

    /// <summary>Opens a stored revision with its figures as they were saved; nothing is solved.</summary>
    public void Load(DesignInput design, Study study)
    {
        Load(FormReader.Texts(design));
        Show(Typed, design, study.Estimate);
        Levers = study.Levers;
        VoltageCurve = study.VoltageCurve;
        Margins = study.Margins;
        Answered = Serial;
    }

    /// <summary>The texts that are asked for now: as typed, with the value before in the place of one that is no valid value.</summary>
    public DesignText Standing => reading.Standing;

    /// <summary>Messages by field; a field that was left open is not called wrong before it was visited.</summary>
    public FieldMessages Messages => new(Typed, reading, refused, touched, Estimate is null ? null : Solved, Derived);

    private void Show(DesignText texts, DesignInput design, EstimateResult estimate)
    {
        Estimate = estimate;
        SolvedDesign = design;
        Derived = DerivedTexts.From(estimate);
        Solved = texts;
        Levers = null;
        VoltageCurve = null;
        Margins = null;
    }

    private void Step(DesignText texts)
    {
        if (texts.Equals(Typed))
        {
            return;
        }

        undo.Keep(Typed, null);
        Set(texts);
    }

    private void Set(DesignText texts)
    {
        Typed = texts;
        reading = FormReader.Read(texts, reading.Standing);
        Serial++;
    }
}
