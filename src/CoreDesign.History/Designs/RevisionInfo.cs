using System.Linq.Expressions;
using CoreDesign.History.Model;

namespace CoreDesign.History.Designs;

/// <summary>What a list shows of one revision; everything but input, study and remarks.</summary>
public sealed record RevisionInfo
{
    /// <summary>The design's id.</summary>
    public required long Id { get; init; }
    public required int Revision { get; init; }
    public required string Title { get; init; }
    public required DesignState State { get; init; }
    public required DateTime CreatedAt { get; init; }
    public required string Author { get; init; }
    public required string Note { get; init; }
    public required string Reference { get; init; }
    public required string Rating { get; init; }
    public required int Phases { get; init; }
    public required double RatedPower_kVA { get; init; }
    public required string Form { get; init; }
    public required string Steel { get; init; }
    public required string JointType { get; init; }
    public required int JointPositions { get; init; }
    public required double LimbPeakFluxDensity_T { get; init; }
    public required double NoLoadLoss_W { get; init; }
    public required double? AskedNoLoadLoss_W { get; init; }
    public required double NoLoadCurrent_percent { get; init; }
    public required double? AskedNoLoadCurrent_percent { get; init; }
    public required double Mass_kg { get; init; }
    public required double MarginAtRated_percent { get; init; }
    public required double MarginAtHighest_percent { get; init; }
    public required string KernelVersion { get; init; }
    public required string SteelDataRevision { get; init; }

    internal static Expression<Func<Revision, RevisionInfo>> FromRow { get; } = r => new RevisionInfo
    {
        Id = r.DesignId,
        Revision = r.Number,
        Title = r.Title,
        State = r.State,
        CreatedAt = r.CreatedAt,
        Author = r.Author,
        Note = r.Note,
        Reference = r.Reference,
        Rating = r.Rating,
        Phases = r.Phases,
        RatedPower_kVA = r.RatedPower_kVA,
        Form = r.Form,
        Steel = r.Steel,
        JointType = r.JointType,
        JointPositions = r.JointPositions,
        LimbPeakFluxDensity_T = r.LimbPeakFluxDensity_T,
        NoLoadLoss_W = r.NoLoadLoss_W,
        AskedNoLoadLoss_W = r.AskedNoLoadLoss_W,
        NoLoadCurrent_percent = r.NoLoadCurrent_percent,
        AskedNoLoadCurrent_percent = r.AskedNoLoadCurrent_percent,
        Mass_kg = r.Mass_kg,
        MarginAtRated_percent = r.MarginAtRated_percent,
        MarginAtHighest_percent = r.MarginAtHighest_percent,
        KernelVersion = r.KernelVersion,
        SteelDataRevision = r.SteelDataRevision,
    };

    internal static Func<Revision, RevisionInfo> Of { get; } = FromRow.Compile();
}
