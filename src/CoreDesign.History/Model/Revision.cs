namespace CoreDesign.History.Model;

/// <summary>
/// One save of a design. What a list shows, sorts or searches stands here in columns, taken from the study when it
/// is saved; input and study themselves lie in <see cref="RevisionContent"/>, so that lists need not read past them.
/// </summary>
public sealed class Revision : IKept
{
    public long Id { get; set; }
    public long DesignId { get; set; }
    public required int Number { get; set; }
    public required DateTime CreatedAt { get; set; }
    public required string Author { get; set; }
    public required string Title { get; set; }
    public required string Note { get; set; }
    public required DesignState State { get; set; }
    public required string KernelVersion { get; set; }
    public required string SteelDataRevision { get; set; }

    public required string Reference { get; set; }

    /// <summary>Rated power and voltages as one reads them: <c>1000 kVA, 20/0.4 kV</c>.</summary>
    public required string Rating { get; set; }
    public required int Phases { get; set; }
    public required double RatedPower_kVA { get; set; }
    public required string Form { get; set; }
    public required string Steel { get; set; }
    public required string JointType { get; set; }
    public required int JointPositions { get; set; }
    public required double LimbPeakFluxDensity_T { get; set; }
    public required double NoLoadLoss_W { get; set; }
    public required double? AskedNoLoadLoss_W { get; set; }
    public required double NoLoadCurrent_percent { get; set; }
    public required double? AskedNoLoadCurrent_percent { get; set; }
    public required double Mass_kg { get; set; }
    public required double MarginAtRated_percent { get; set; }
    public required double MarginAtHighest_percent { get; set; }

    /// <summary>All words that a search looks at, in small letters.</summary>
    public required string SearchText { get; set; }

    public Design? Design { get; set; }
    public required RevisionContent? Content { get; set; }
    public ICollection<RevisionRemark> Remarks { get; } = [];
}

/// <summary>Input and whole study of a revision as JSON, to the bit as they were.</summary>
public sealed class RevisionContent : IKept
{
    public long RevisionId { get; set; }
    public required string Input { get; set; }
    public required string Study { get; set; }
}

/// <summary>A remark added later to a revision; remarks are only ever added.</summary>
public sealed class RevisionRemark : IKept
{
    public long Id { get; set; }
    public long RevisionId { get; set; }
    public required DateTime At { get; set; }
    public required string Author { get; set; }
    public required string Text { get; set; }
    public required string SearchText { get; set; }
    public Revision? Revision { get; set; }
}
