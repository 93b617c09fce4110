using CoreDesign.Estimating.Contracts;

namespace CoreDesign.History.Designs;

/// <summary>A design with all its revisions, the newest first.</summary>
public sealed record DesignDetail(long Id, DateTime CreatedAt, RevisionInfo Current, IReadOnlyList<RevisionInfo> Revisions);

/// <summary>One revision whole, as it was saved, with the remarks added since, oldest first.</summary>
public sealed record RevisionDetail(RevisionInfo Info, DesignInput Input, Study Study, IReadOnlyList<Remark> Remarks);

public sealed record Remark(DateTime At, string Author, string Text);

/// <summary>What a save brings: the input, what was found for it, and the words of the person who saves.</summary>
public sealed record NewRevision(string Title, string Note, string Author, DesignInput Input, Study Study);

/// <summary>How a save ended.</summary>
public abstract record SaveResult
{
    private SaveResult()
    {
    }

    public sealed record Saved(RevisionInfo Revision) : SaveResult;

    /// <summary>Someone saved since: nothing was stored. <paramref name="Current"/> is what stands there now.</summary>
    public sealed record Conflict(RevisionDetail Current) : SaveResult;

    public sealed record NoSuchDesign : SaveResult;
}
