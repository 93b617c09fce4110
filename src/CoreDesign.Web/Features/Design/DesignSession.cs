using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Demo;
using CoreDesign.History.Designs;
using CoreDesign.History.Drafts;
using CoreDesign.History.Model;
using CoreDesign.Web.Features.Designs;

namespace CoreDesign.Web.Features.Design;

/// <summary>One open design page: what is open, what is typed, and how it is kept. The page shows it and passes on what is pressed.</summary>
public sealed class DesignSession : IAsyncDisposable
{
    private readonly DesignEngine engine;
    private readonly DesignStore designs;
    private readonly DraftStore drafts;
    private readonly DraftKeeper keeper;

    public DesignSession(DesignEngine engine, DesignStore designs, DraftStore drafts, Action changed)
    {
        this.engine = engine;
        this.designs = designs;
        this.drafts = drafts;
        keeper = new(drafts);
        Loop = new(engine, State, changed);
    }

    public DesignPageState State { get; } = new();

    public SolveLoop Loop { get; }

    /// <summary>The saved revision that the page started from; null for a new design.</summary>
    public RevisionDetail? Base { get; private set; }

    /// <summary>The newest revision when the page was opened; the next save goes on top of it or meets a conflict.</summary>
    public int NewestRevision { get; private set; }

    public DemoOrder? Demo { get; private set; }

    public bool NotFound { get; private set; }

    /// <summary>What today's kernel and steel data give for the saved revision; null until known.</summary>
    public RevisionCheck? Today { get; private set; }

    /// <summary>A draft that this browser left behind at this address, with its reference; null where there is none.</summary>
    public (Draft Draft, string Reference)? Left { get; private set; }

    public Guid? DraftKey => keeper.Key;

    public bool HasEdits => Base is null ? !State.Typed.IsEmpty : !State.Typed.Equals(FormReader.Texts(Base.Input));

    /// <summary>Reads what the address asks for; solves nothing.</summary>
    public async Task OpenAsync(long? id, int? revision, Guid? draftKey, string? demo)
    {
        keeper.Use(draftKey);
        var draft = draftKey is { } key && await drafts.FindAsync(key) is { } found && found.DesignId == id ? found : null;
        var payload = draft is null ? null : DraftPayload.FromJson(draft.Payload);
        if (id is { } design && !await OpenRevisionAsync(design, revision ?? draft?.BaseRevision))
        {
            NotFound = true;
            return;
        }

        Demo = demo is null ? null : DemoOrders.TryFind(demo);
        if (payload is not null && DesignText.FromJson(payload.Texts) is { } texts)
        {
            NewestRevision = payload.NewestRevision ?? NewestRevision;
            State.Load(texts, keepAnswer: true);
        }
        else if (Base is null && Demo is not null)
        {
            State.Load(FormReader.Texts(Demo.Design));
        }
    }

    /// <summary>The first answer, where the saved one does not stand, and the check of a saved one against today's kernel.</summary>
    public async Task StartAsync()
    {
        if (State.Answered != State.Serial)
        {
            await Loop.RunAsync();
        }

        if (Base is { } saved)
        {
            Today = await Task.Run(() => RevisionCheck.Run(saved, engine.Steels()));
        }
    }

    /// <summary>Looks for the draft that the browser remembers from an earlier visit.</summary>
    public async Task FindLeftAsync(string? remembered)
    {
        if (!Guid.TryParse(remembered, out var key) || key == DraftKey || await drafts.FindAsync(key) is not { } found || found.DesignId != Base?.Info.Id)
        {
            return;
        }

        var texts = DraftPayload.FromJson(found.Payload) is { } payload ? DesignText.FromJson(payload.Texts) : null;
        Left = texts is { IsEmpty: false } ? (found, texts[FormPaths.Reference]) : null;
    }

    public async Task DropLeftAsync()
    {
        if (Left is { } left)
        {
            Left = null;
            await drafts.RemoveAsync(left.Draft.Key);
        }
    }

    /// <summary>An edit was made: answer it and keep it.</summary>
    public Task EditedAsync() => Task.WhenAll(Loop.RunAsync(), KeepAsync());

    /// <summary>Saves what is typed as the next revision, on top of <paramref name="onTop"/> or of the newest that the page knows.</summary>
    public async Task<SaveResult> SaveAsync(string title, string note, string author, int? onTop = null)
    {
        await Loop.CompleteAsync(CancellationToken.None);
        var study = new Study { Estimate = State.Estimate!, VoltageCurve = State.VoltageCurve ?? [], Levers = State.Levers ?? [], Margins = State.Margins };
        var next = new NewRevision(title, note, author, State.SolvedDesign, study);
        var result = Base is { } open
            ? await designs.SaveAsync(open.Info.Id, onTop ?? NewestRevision, next)
            : new SaveResult.Saved(await designs.CreateAsync(next));
        if (result is SaveResult.Saved)
        {
            await keeper.RemoveAsync();
        }

        return result;
    }

    public async ValueTask DisposeAsync()
    {
        Loop.Dispose();
        await keeper.DisposeAsync();
    }

    private Task KeepAsync() =>
        keeper.KeepAsync(new DraftPayload(State.Typed.ToJson(), Base is null ? null : NewestRevision, Demo is not null), Base?.Info.Id, Base?.Info.Revision);

    private async Task<bool> OpenRevisionAsync(long id, int? revision)
    {
        if (await designs.FindAsync(id) is not { } detail || await designs.FindRevisionAsync(id, revision ?? detail.Current.Revision) is not { } open)
        {
            return false;
        }

        Base = open;
        NewestRevision = detail.Current.Revision;
        State.Load(open.Input, open.Study);
        return true;
    }
}
