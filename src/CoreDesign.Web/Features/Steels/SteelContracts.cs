using System.Text.Json.Serialization;
using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Steels;
using CoreDesign.Estimating.Steels.Import;

namespace CoreDesign.Web.Features.Steels;

/// <summary>A figure with its source, and how sure it is: <c>read</c>, <c>from memory</c>, <c>derived</c>, <c>works</c>.</summary>
public sealed record FigureAnswer(double Value, string Source, string Standing)
{
    public static FigureAnswer? From(SourcedFigure? figure) => figure is null ? null : new(figure.Value, figure.Source, figure.Standing);
}

/// <summary>A grade in the list: what is guaranteed of it. What is not guaranteed is left out.</summary>
public sealed record SteelSummary
{
    public required string Grade { get; init; }
    public required string Class { get; init; }
    public required string Generation { get; init; }
    public required double Thickness_mm { get; init; }

    [JsonPropertyName("loss15T50Hz_W_kg")]
    public double? Loss15T50Hz { get; init; }

    [JsonPropertyName("loss17T50Hz_W_kg")]
    public double? Loss17T50Hz { get; init; }

    [JsonPropertyName("loss15T60Hz_W_kg")]
    public double? Loss15T60Hz { get; init; }

    [JsonPropertyName("loss17T60Hz_W_kg")]
    public double? Loss17T60Hz { get; init; }

    [JsonPropertyName("polarization800_T")]
    public double? Polarization800 { get; init; }
    public double? MinimumStackingFactor { get; init; }

    /// <summary>How sure the curves are: <c>representative</c> or <c>certificate</c>.</summary>
    public required string Standing { get; init; }

    public static SteelSummary From(SteelGrade grade) => new()
    {
        Grade = grade.Name,
        Class = grade.Class,
        Generation = grade.Generation,
        Thickness_mm = grade.Thickness_mm.Value,
        Loss15T50Hz = grade.GuaranteedLoss(1.5, 50)?.Value,
        Loss17T50Hz = grade.GuaranteedLoss(1.7, 50)?.Value,
        Loss15T60Hz = grade.GuaranteedLoss(1.5, 60)?.Value,
        Loss17T60Hz = grade.GuaranteedLoss(1.7, 60)?.Value,
        Polarization800 = grade.Polarization800_T?.Value,
        MinimumStackingFactor = grade.MinimumStackingFactor?.Value,
        Standing = grade.Standing,
    };
}

/// <summary>All grades, and the revision of the data they stand for.</summary>
public sealed record SteelListAnswer(string SteelDataRevision, IReadOnlyList<SteelSummary> Steels);

/// <summary>The curves of one direction, in the form in which an estimate takes steel data of one's own.</summary>
public sealed record SteelCurvesAnswer
{
    public required IReadOnlyList<MagnetizationPointInput> Magnetization { get; init; }
    public required IReadOnlyList<LossCurveInput> Loss { get; init; }
    public required string Source { get; init; }
    public required string Standing { get; init; }

    public static SteelCurvesAnswer From(SteelCurves curves) => new()
    {
        Magnetization = [.. curves.Magnetization.Select(p => new MagnetizationPointInput { B_T = p.B_T, H_A_m = p.H_A_per_m })],
        Loss = [.. curves.Loss.Select(c => new LossCurveInput
        {
            Frequency_Hz = c.Frequency_Hz,
            Points = [.. c.Points.Select(p => new LossPointInput { B_T = p.B_T, W_kg = p.Loss_W_per_kg })],
        })],
        Source = curves.Source,
        Standing = curves.Standing,
    };
}

/// <summary>A grade whole.</summary>
public sealed record SteelAnswer
{
    public required SteelSummary Summary { get; init; }
    public required string Note { get; init; }

    /// <summary>Sentence to print wherever a figure rests on this steel; empty for a certificate.</summary>
    public required string StandingText { get; init; }
    public required string SteelDataRevision { get; init; }
    public required FigureAnswer Thickness_mm { get; init; }

    [JsonPropertyName("density_kg_m3")]
    public required FigureAnswer Density { get; init; }

    [JsonPropertyName("resistivity_ohm_m")]
    public required FigureAnswer Resistivity { get; init; }
    public required FigureAnswer SaturationPolarization_T { get; init; }
    public FigureAnswer? MinimumStackingFactor { get; init; }

    [JsonPropertyName("polarization800_T")]
    public FigureAnswer? Polarization800 { get; init; }
    public required SteelCurvesAnswer Rolling { get; init; }
    public required SteelCurvesAnswer Transverse { get; init; }

    public static SteelAnswer From(SteelGrade grade) => new()
    {
        Summary = SteelSummary.From(grade),
        Note = grade.Note,
        StandingText = grade.StandingText,
        SteelDataRevision = SteelCatalog.RevisionOf(grade),
        Thickness_mm = FigureAnswer.From(grade.Thickness_mm)!,
        Density = FigureAnswer.From(grade.Density_kg_per_m3)!,
        Resistivity = FigureAnswer.From(grade.Resistivity_ohm_m)!,
        SaturationPolarization_T = FigureAnswer.From(grade.SaturationPolarization_T)!,
        MinimumStackingFactor = FigureAnswer.From(grade.MinimumStackingFactor),
        Polarization800 = FigureAnswer.From(grade.Polarization800_T),
        Rolling = SteelCurvesAnswer.From(grade.Rolling),
        Transverse = SteelCurvesAnswer.From(grade.Transverse),
    };
}

/// <summary>A file that can be taken: the steel it makes, what to look at, and whether it was stored.</summary>
public sealed record SteelImportAnswer(bool Stored, string ReadAs, IReadOnlyList<ImportProblem> Warnings, SteelAnswer Steel);
