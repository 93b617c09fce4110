namespace CoreDesign.History.Model;

/// <summary>A design page half filled in: the fields as typed, so that a reload or a restart loses nothing.</summary>
public sealed class Draft
{
    public required Guid Key { get; set; }

    /// <summary>The design and revision that the page started from; null for a new design.</summary>
    public long? DesignId { get; set; }
    public int? BaseRevision { get; set; }
    public required string Payload { get; set; }
    public required DateTime UpdatedAt { get; set; }
}
