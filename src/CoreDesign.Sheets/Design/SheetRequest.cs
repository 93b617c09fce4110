using CoreDesign.Estimating.Contracts;
using CoreDesign.Sheets.Pdf;

namespace CoreDesign.Sheets.Design;

/// <summary>A stored revision to be printed. The same request gives the same bytes.</summary>
public sealed record SheetRequest
{
    public required Study Study { get; init; }
    public required string DocumentNumber { get; init; }
    public required string Title { get; init; }
    public required int Revision { get; init; }

    /// <summary>When the revision was saved, not when it is printed.</summary>
    public required DateTimeOffset IssuedAt { get; init; }

    /// <summary><c>draft</c>, <c>checked</c>, <c>offered</c>, <c>built</c> or <c>tested</c>.</summary>
    public required string State { get; init; }
    public required string Author { get; init; }
    public required string LegalOwner { get; init; }
    public PaperSize Paper { get; init; }

    /// <summary>Marks the sheet as invented demo data in its title block.</summary>
    public bool InventedDemo { get; init; }
    public string? Note { get; init; }
}
