namespace CoreDesign.Sheets.Pdf;

/// <summary>Data fields of a title block, named as in ISO 7200.</summary>
internal sealed record TitleFields
{
    public required string LegalOwner { get; init; }

    /// <summary>A line under the owner, e.g. that the data are invented.</summary>
    public string OwnerNote { get; init; } = "";
    public required string Title { get; init; }
    public string SupplementaryTitle { get; init; } = "";
    public required string IdentificationNumber { get; init; }
    public required string DocumentType { get; init; }
    public required string DocumentStatus { get; init; }
    public required string RevisionIndex { get; init; }
    public string Department { get; init; } = "";
    public required string CreatedBy { get; init; }
    public string ApprovedBy { get; init; } = "not yet";
    public required DateTimeOffset IssuedAt { get; init; }
    public string Scale { get; init; } = "none";

    /// <summary>What computed the figures, with its version.</summary>
    public required string FiguresBy { get; init; }
    public string Language { get; init; } = "en";

    public string DateOfIssue => IssuedAt.UtcDateTime.ToString("yyyy-MM-dd", System.Globalization.CultureInfo.InvariantCulture);
}
