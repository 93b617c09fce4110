using CoreDesign.Estimating.Contracts;
using CoreDesign.History.Designs;

namespace CoreDesign.Web.Features.Designs;

/// <summary>Body of a save. State and author are not the sender's to set.</summary>
public sealed record SaveDesignRequest
{
    /// <summary>One line. Left out: the order's reference for a new design, the title so far for a further revision.</summary>
    public string? Title { get; init; }
    public DesignInput? Design { get; init; }
    public string? Note { get; init; }
}

/// <summary>Body of a copy: which revision, the newest if left out, and the new design's title.</summary>
public sealed record CopyDesignRequest
{
    public int? Revision { get; init; }
    public string? Title { get; init; }
}

/// <summary>Body of a remark on a revision.</summary>
public sealed record AddNoteRequest
{
    public string? Text { get; init; }
}

/// <summary>A design: its newest revision with the input to go on from, and all revisions, newest first.</summary>
public sealed record DesignAnswer
{
    public required long Id { get; init; }
    public required int Revision { get; init; }
    public required string Title { get; init; }
    public required DateTime CreatedAt { get; init; }
    public required RevisionInfo Current { get; init; }
    public required DesignInput Design { get; init; }
    public required IReadOnlyList<RevisionInfo> Revisions { get; init; }
}

/// <summary>A revision as it was saved.</summary>
public sealed record RevisionAnswer
{
    public required long Id { get; init; }
    public required int Revision { get; init; }
    public required RevisionInfo Summary { get; init; }
    public required DesignInput Design { get; init; }
    public required Study Study { get; init; }
    public required VersionsAnswer Versions { get; init; }
    public required IReadOnlyList<Remark> Notes { get; init; }

    /// <summary>What today's kernel and steel data give for the same input, where asked for with <c>today=true</c>.</summary>
    public TodayAnswer? Today { get; init; }
}

/// <summary>The versions behind a revision's figures, beside today's.</summary>
public sealed record VersionsAnswer(string Kernel, string SteelData, string TodaysKernel, bool SameKernel);

/// <summary>Today's figures for an old input, and whether they are the old ones, within 0.005 %.</summary>
public sealed record TodayAnswer
{
    public required string KernelVersion { get; init; }
    public required string SteelDataRevision { get; init; }
    public double? NoLoadLoss_W { get; init; }
    public double? NoLoadCurrent_percent { get; init; }
    public double? MarginAtRated_percent { get; init; }
    public double? Mass_kg { get; init; }
    public required bool SameFigures { get; init; }

    /// <summary>Why today's kernel gives no figures for this input; left out when it gives some.</summary>
    public string? Refusal { get; init; }
}

/// <summary>One input that differs between two designs; a side is left out where the design leaves the field open.</summary>
public sealed record InputDifference(string Path, string? Yours, string? Theirs);
