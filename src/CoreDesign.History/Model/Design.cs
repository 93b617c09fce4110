namespace CoreDesign.History.Model;

/// <summary>A design is the thread that ties its revisions together; all that can be said about it stands in them.</summary>
public sealed class Design
{
    public long Id { get; set; }
    public required DateTime CreatedAt { get; set; }

    /// <summary>Number of the newest revision. Two saves that start from the same number can't both raise it.</summary>
    public required int CurrentRevision { get; set; }
    public ICollection<Revision> Revisions { get; } = [];
}
