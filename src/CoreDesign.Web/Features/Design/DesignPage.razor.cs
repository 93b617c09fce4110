using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.LimbSizing;
using CoreDesign.Sheets.Drawings;
using CoreDesign.Web.Components;
using Microsoft.AspNetCore.Components;
using Microsoft.JSInterop;

namespace CoreDesign.Web.Features.Design;

/// <summary>Wiring of the design page: addresses and events to the session, the session to what is shown.</summary>
public sealed partial class DesignPage
{
    private const string Unnamed = "New design";

    private readonly DrawingScenes drawing = new();
    private readonly EvidenceView evidence = new();
    private DesignSession? session;
    private IEnumerable<IGrouping<string, Choice>> grades = [];
    private SizingProposal? sizing;
    private Reading reading;
    private string spoken = "";
    private (long? Id, int? Revision, Guid? Draft, string? Demo)? opened;
    private DotNetObjectReference<DesignPage>? self;
    private IJSObjectReference? script;

    [Parameter]
    public long? Id { get; set; }

    [Parameter]
    public int? Revision { get; set; }

    /// <summary>Key of the draft, so that a reload finds what was typed.</summary>
    [SupplyParameterFromQuery(Name = "draft")]
    public Guid? Draft { get; set; }

    [SupplyParameterFromQuery(Name = "demo")]
    public string? DemoKey { get; set; }

    private DesignPageState State => session!.State;

    private string Name => session is null ? "" : State.Typed[FormPaths.Reference] is { Length: > 0 } reference ? reference : session.Base?.Info.Title ?? Unnamed;

    private string Title => Name is "" or Unnamed ? Unnamed : $"{Name} design";

    private string Rating => session is null ? "" : RatingText.Of(State.Request.Design);

    /// <summary>Where the browser remembers the draft of this address.</summary>
    private string DraftPlace => Id is { } id ? $"draft-{id}" : "draft-new";

    private int NextNumber => session?.Base is null ? 1 : session.NewestRevision + 1;

    private string? SheetAddress => session?.Base is { } open ? $"/api/designs/{open.Info.Id}/revisions/{open.Info.Revision}/sheets/design.pdf" : null;

    protected override async Task OnParametersSetAsync()
    {
        var wanted = (Id, Revision, Draft, DemoKey);
        if (opened == wanted || (opened is { } now && now.Id == Id && now.Revision == Revision && Draft is not null && Draft == session?.DraftKey))
        {
            opened = wanted;
            return;
        }

        opened = wanted;
        if (session is not null)
        {
            await session.DisposeAsync();
        }

        var opening = new DesignSession(Engine, Designs, Drafts, Refresh);
        await opening.OpenAsync(Id, Revision, Draft, DemoKey);
        session = opening;
        grades = GradeChoices.Of(Engine.Steels());
        Show();
        if (RendererInfo.IsInteractive && !opening.NotFound)
        {
            StateHasChanged();
            await opening.FindLeftAsync(await Js.InvokeAsync<string?>("coreDesign.remembered", DraftPlace));
            StateHasChanged();
            await opening.StartAsync();
            Show();
        }
    }

    protected override async Task OnAfterRenderAsync(bool firstRender)
    {
        if (firstRender)
        {
            self = DotNetObjectReference.Create(this);
            script = await Js.InvokeAsync<IJSObjectReference>("import", "/js/design.js");
            await script.InvokeVoidAsync("start", self);
        }
    }

    /// <summary>The browser says how much room drawing and charts have.</summary>
    [JSInvokable]
    public void OnRoom(int drawingWidth, int drawingHeight, int chartWidth)
    {
        var again = drawing.Fit(drawingWidth, drawingHeight);
        if (evidence.Fit(chartWidth) || again)
        {
            Refresh();
        }
    }

    public async ValueTask DisposeAsync()
    {
        if (session is not null)
        {
            await session.DisposeAsync();
        }

        try
        {
            if (script is not null)
            {
                await script.InvokeVoidAsync("stop");
                await script.DisposeAsync();
            }
        }
        catch (JSDisconnectedException)
        {
            // The browser is gone, and its script with it.
        }

        self?.Dispose();
    }

    private void Refresh()
    {
        Show();
        StateHasChanged();
    }

    // Everything that is shown but not typed follows from the state; what did not change is not made again.
    private void Show()
    {
        if (State.Estimate is { } estimate)
        {
            drawing.Paint(estimate, reading);
            evidence.Make(estimate, State.VoltageCurve, State.Margins);
            spoken = State.Answered == State.Serial ? VerdictFigures.Of(estimate, null).Spoken : spoken;
        }

        sizing = SizingAid.Propose(State.Request.Design, State.Request.WantedFluxDensity_T, Engine.Steels());
    }

    private void Read(Reading wanted)
    {
        reading = wanted;
        Show();
    }

    private Task Type((string Path, string Text) edit)
    {
        State.Type(edit.Path, edit.Text);
        return Edited();
    }

    private Task Take((string Path, string Text) value)
    {
        State.Take([KeyValuePair.Create(value.Path, value.Text)]);
        return Edited();
    }

    private Task PinSteps()
    {
        State.PinSteps();
        return Edited();
    }

    private Task Release(string path)
    {
        State.Release(path);
        return Edited();
    }

    private Task RemoveStep(int row)
    {
        State.RemoveStep(row);
        return Edited();
    }

    private Task Try(LeverResult lever)
    {
        State.Try(lever);
        return Edited();
    }

    private Task Undo()
    {
        State.Undo();
        return Edited();
    }

    private Task Redo()
    {
        State.Redo();
        return Edited();
    }

    private async Task Edited()
    {
        Show();
        var keyed = session!.DraftKey is not null;
        var answering = session.EditedAsync();
        if (!keyed && session.DraftKey is { } key)
        {
            Navigation.NavigateTo(Navigation.GetUriWithQueryParameter("draft", key), replace: true);
            await Js.InvokeVoidAsync("coreDesign.remember", DraftPlace, key.ToString());
        }

        await answering;
        Show();
    }
}
