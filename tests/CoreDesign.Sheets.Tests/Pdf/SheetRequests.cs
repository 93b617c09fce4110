using CoreDesign.Estimating.Contracts;
using CoreDesign.Sheets.Design;
using CoreDesign.Sheets.Pdf;

namespace CoreDesign.Sheets.Tests.Pdf;

internal static class SheetRequests
{
    public static SheetRequest Of(Study study, PaperSize paper = PaperSize.A4) => new()
    {
        Study = study,
        DocumentNumber = "HR-1042",
        Title = "Core, 1000 kVA",
        Revision = 7,
        IssuedAt = new DateTimeOffset(2026, 11, 30, 9, 30, 0, TimeSpan.Zero),
        State = "draft",
        Author = "Desk 2",
        LegalOwner = "Halden Ridge",
        Paper = paper,
        InventedDemo = true,
        Note = "Second try with the larger yoke.",
    };
}
