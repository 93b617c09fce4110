using CoreDesign.Estimating.Contracts;
using CoreDesign.Sheets.Design;
using CoreDesign.Sheets.Pdf;
using UglyToad.PdfPig;

namespace CoreDesign.Sheets.Tests.Pdf;

public class HostileTextTests
{
    public static readonly TheoryData<string> Texts =
    [
        "<script>alert('x')</script> & \"quotes\" &amp;",
        ">>\nstream\nendstream endobj xref trailer startxref 0 %%EOF",
        ") Tj ET Q (unbalanced \\ ((",
        "😀👩‍🔧 漢字 עברית \u0000\u0007\u200B\uFFFE \ud83d",
        new string('W', 5000),
        string.Concat(Enumerable.Repeat("very long title, ", 400)),
        "/ABCDEF+Font <</Type/Font>>",
        "",
        " ",
    ];

    [Theory]
    [MemberData(nameof(Texts))]
    public void Any_text_in_any_field_gives_a_readable_file(string text)
    {
        var study = StudyFixture.ThreeLimb();
        var e = study.Estimate;
        study = study with
        {
            Estimate = e with
            {
                Inputs = e.Inputs with { Order = e.Inputs.Order! with { Reference = text }, ExcitedWinding = e.Inputs.ExcitedWinding! with { Connection = text } },
                Steel = e.Steel with { Grade = text, StandingText = text },
                Warnings = [new NoteResult(text, text)],
                Sources = [new SourceResult(text, text, text)],
                Model = e.Model with { BuildingFactorSource = text },
                Parts = [.. e.Parts.Select(p => p with { Name = text })],
                Shares = [.. e.Shares.Select(s => s with { Label = text })],
                Lines = [.. e.Lines.Select(l => l with { Phase = text })],
                KernelVersion = text,
                SteelDataRevision = text,
            },
        };
        var request = SheetRequests.Of(study) with { Title = text, DocumentNumber = text, Author = text, LegalOwner = text, State = text, Note = text };
        var bytes = DesignSheet.Render(request);
        using var pdf = PdfDocument.Open(bytes);
        Assert.Contains($"page 1 of {pdf.NumberOfPages}", DesignSheetTests.Text(pdf, 1), StringComparison.Ordinal);
        Qpdf.Check(bytes);
    }

    [Fact]
    public void Characters_that_the_face_lacks_are_drawn_as_the_replacement_character()
    {
        using var pdf = DesignSheetTests.Open(SheetRequests.Of(StudyFixture.ThreeLimb()) with { Title = "Kern 漢 😀 Ω" });
        Assert.Contains("Kern \uFFFD \uFFFD Ω", DesignSheetTests.Text(pdf, 1), StringComparison.Ordinal);
    }

    [Fact]
    public void Markup_in_a_title_is_printed_as_typed()
    {
        using var pdf = DesignSheetTests.Open(SheetRequests.Of(StudyFixture.ThreeLimb()) with { Title = "<b>Core</b> & \"yoke\"" });
        Assert.Contains("<b>Core</b> & \"yoke\"", DesignSheetTests.Text(pdf, 1), StringComparison.Ordinal);
        Assert.EndsWith("<b>Core</b> & \"yoke\"", pdf.Information.Title, StringComparison.Ordinal);
        Assert.True(pdf.TryGetXmpMetadata(out var metadata));
        Assert.Contains("<b>Core</b> & \"yoke\"", metadata.GetXDocument().Root!.Value, StringComparison.Ordinal);
    }
}
