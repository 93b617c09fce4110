using CoreDesign.History.Designs;
using Microsoft.JSInterop;

namespace CoreDesign.Web.Features.Design;

/// <summary>Saving: the words of the person, the next revision, and what happens when someone else was first.</summary>
public sealed partial class DesignPage
{
    private SaveDialog? saveDialog;
    private ConflictDialog? conflictDialog;
    private SaveWords? words;

    private async Task AskSave()
    {
        await session!.Loop.Answered;
        if (!State.IsComplete)
        {
            await script!.InvokeVoidAsync("focusFirstError");
            return;
        }

        await saveDialog!.ShowAsync(session.Base?.Info.Title ?? string.Join(", ", new[] { State.Typed[FormPaths.Reference], Rating }.Where(t => t.Length > 0)));
    }

    private async Task<string?> Save(SaveWords given)
    {
        words = given;
        return await SaveAsync(null);
    }

    private async Task SaveOnTop(int revision) => await SaveAsync(revision);

    private async Task<string?> SaveAsync(int? onTop)
    {
        switch (await session!.SaveAsync(words!.Title, words.Note, words.Author, onTop))
        {
            case SaveResult.Saved saved:
                saveDialog!.Forget();
                Navigation.NavigateTo($"design/{saved.Revision.Id}", replace: session.Base is null);
                return null;
            case SaveResult.Conflict conflict:
                await conflictDialog!.ShowAsync(conflict.Current, State.SolvedDesign);
                return null;
            default:
                return "This design is no longer in the history. Copy what you need and start a new design.";
        }
    }

    private string LeftAddress(Guid key) => Id is { } id ? $"design/{id}?draft={key}" : $"design?draft={key}";

    private void OpenNewest() => Navigation.NavigateTo($"design/{Id}");
}
