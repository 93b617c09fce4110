namespace CoreDesign.Web.Features.Design;

/// <summary>Snapshots for undo and redo. Keystrokes in one field make one step until the field is left.</summary>
public sealed class UndoStack
{
    private const int Depth = 200;
    private readonly LinkedList<DesignText> past = new();
    private readonly Stack<DesignText> future = new();
    private string? openPath;

    public bool CanUndo => past.Count > 0;

    public bool CanRedo => future.Count > 0;

    /// <summary>Keeps what stood before an edit; <paramref name="path"/> is null for an edit that is a step of its own.</summary>
    public void Keep(DesignText before, string? path)
    {
        future.Clear();
        if (path is not null && path == openPath)
        {
            return;
        }

        openPath = path;
        past.AddLast(before);
        if (past.Count > Depth)
        {
            past.RemoveFirst();
        }
    }

    /// <summary>Ends the step of the field that is being typed in.</summary>
    public void Close() => openPath = null;

    public DesignText Undo(DesignText now)
    {
        var before = past.Last?.Value ?? throw new InvalidOperationException("There is nothing to undo.");
        past.RemoveLast();
        future.Push(now);
        openPath = null;
        return before;
    }

    public DesignText Redo(DesignText now)
    {
        var after = future.Pop();
        past.AddLast(now);
        openPath = null;
        return after;
    }

    public void Clear()
    {
        past.Clear();
        future.Clear();
        openPath = null;
    }
}
