using CoreDesign.Sheets.Design;
using CoreDesign.Sheets.Pdf;
using CoreDesign.Sheets.Tests.Drawings;
using UglyToad.PdfPig;
using UglyToad.PdfPig.DocumentLayoutAnalysis.TextExtractor;

namespace CoreDesign.Sheets.Tests.Pdf;

public class DesignSheetTests
{
    [Theory]
    [InlineData(PaperSize.A4, 595.276, 841.890)] // ISO 216: 210 mm by 297 mm
    [InlineData(PaperSize.Letter, 612, 792)] // ANSI/ASME Y14.1: 8.5 in by 11 in
    public void Every_page_has_the_size_of_its_paper(PaperSize paper, double width, double height)
    {
        using var pdf = Open(SheetRequests.Of(StudyFixture.ThreeLimb(), paper));
        Assert.All(pdf.GetPages(), page =>
        {
            Assert.Equal(width, page.Width, 0.01);
            Assert.Equal(height, page.Height, 0.01);
        });
    }

    [Theory]
    [InlineData(1)]
    [InlineData(7)]
    [InlineData(14)]
    public void Every_page_says_which_of_how_many_it_is(int steps)
    {
        using var pdf = Open(SheetRequests.Of(StudyFixture.ThreeLimb(steps)));
        Assert.True(pdf.NumberOfPages > 1);
        for (var p = 1; p <= pdf.NumberOfPages; p++)
        {
            Assert.Contains($"page {p} of {pdf.NumberOfPages}", Text(pdf, p), StringComparison.Ordinal);
        }
    }

    [Fact]
    public void Margins_stand_on_the_sheet_with_their_definitions()
    {
        var study = StudyFixture.ThreeLimb();
        using var pdf = Open(SheetRequests.Of(study with { Margins = MarginsFixture.Of(study) }));
        var text = Text(pdf);
        string[] wanted =
        [
            "Margins to saturation", "111.2\u00a0%", "Voltage for 5 times the current", "28\u2009660\u00a0A", "29\u2009170\u00a0A", "27\u2009950\u00a0A", "Direct current in each phase",
            "Inrush: Highest current after closing. The first phase closes first.", "Closed formula: A closed form.", "Over-voltage: Voltage at which", "Rated voltage at other frequencies.", "For planning.",
        ];
        Assert.All(wanted, w => Assert.Contains(Plain(w), Plain(text), StringComparison.Ordinal));
        static string Plain(string s) => string.Join(' ', s.Split((char[])[' ', '\n', '\r', '\u00a0', '\u2009'], StringSplitOptions.RemoveEmptyEntries));
    }

    [Fact]
    public void Study_from_before_there_were_margins_prints_without_them()
    {
        using var pdf = Open(SheetRequests.Of(StudyFixture.ThreeLimb() with { Margins = null }));
        Assert.DoesNotContain("How the margins are defined", Text(pdf), StringComparison.Ordinal);
    }

    [Fact]
    public void Key_figures_of_the_study_stand_on_the_sheet()
    {
        var study = StudyFixture.ThreeLimb();
        var e = study.Estimate;
        using var pdf = Open(SheetRequests.Of(study));
        var text = Text(pdf);
        string[] wanted =
        [
            Figures.With(Figures.Significant(e.NoLoadLoss_W, 4), "W"),
            Figures.With(Figures.Significant(e.NoLoadCurrent_percent, 3), "%"),
            Figures.With(Figures.Significant(e.ExcitingPower_VA, 4), "VA"),
            Figures.Fixed(e.PowerFactor, 3),
            Figures.With(Figures.Fixed(e.Margin.AtRated_percent, 1), "%"),
            Figures.With(Figures.Fixed(e.Margin.AtHighest_percent, 1), "%"),
            Figures.With(Figures.Significant(e.Mass_kg.Total, 4), "kg"),
            Figures.With(Figures.Fixed(e.Geometry.NetLimbArea_mm2, 0), "mm²"),
            Figures.Fixed(e.Geometry.FillRatio, 4),
            e.Steel.Grade,
            $"Kernel {e.KernelVersion}",
            $"steel data revision {e.SteelDataRevision}",
            e.Model.BuildingFactorSource,
            e.Warnings[0].Text,
            e.Sources[1].Text,
            .. e.Lines.SelectMany(l => l.Harmonics.Where(h => h.Order is 1 or 3 or 13)).Select(h => Figures.Fixed(h.Rms_A, 4)),
            .. study.VoltageCurve.Select(v => Figures.Fixed(v.NoLoadLoss_W, 1)),
            .. e.Geometry.LimbSteps.Select(s => Figures.Fixed(s.Stack_mm, 1)),
            .. e.Geometry.Plates.Select(p => Figures.Fixed(p.LongSide_mm, 1)),
        ];
        Assert.All(wanted, w => Assert.Contains(Plain(w), text, StringComparison.Ordinal));
    }

    public static TheoryData<string, string, int> EveryForm => Forms.Every();

    [Theory]
    [MemberData(nameof(EveryForm))]
    public void Every_form_has_its_dimensions_on_the_first_page_and_its_lengths_in_the_tables(string form, string joint, int units)
    {
        var study = Forms.Study(form, joint, units);
        var g = study.Estimate.Geometry;
        foreach (var paper in new[] { PaperSize.A4, PaperSize.Letter })
        {
            using var pdf = Open(SheetRequests.Of(study, paper));
            var first = Text(pdf, 1);
            Assert.Contains($"({Plain(Figures.Plain(g.OverallWidth_mm, 2))})", first, StringComparison.Ordinal);
            Assert.Contains($"({Plain(Figures.Plain(g.LimbPitch_mm, 2))})", first, StringComparison.Ordinal);
            Assert.Contains(Plain(Figures.Plain(g.WindowWidth_mm, 2)), first, StringComparison.Ordinal);
            Assert.Equal(units > 1, first.Contains($"{units} units", StringComparison.Ordinal));
            var text = Text(pdf);
            Assert.Contains(Plain($"{Figures.Plain(g.OverallWidth_mm, 1)} × {Figures.Plain(g.OverallHeight_mm, 1)} mm"), text, StringComparison.Ordinal);
            Assert.Equal(g.Limbs.Any(l => l.IsReturn), text.Contains("Return limb, width; net area", StringComparison.Ordinal));
            Assert.Equal(g.ReturnWindowWidth_mm is not null, text.Contains("Window beside a return limb", StringComparison.Ordinal));
            Assert.Equal(units > 1, text.Contains("Plates of one unit", StringComparison.Ordinal));
            Assert.All(g.Limbs, l => Assert.Contains("Limb " + l.Name["limb".Length..], text, StringComparison.Ordinal));
        }
    }

    [Fact]
    public void Masses_of_a_bank_are_those_of_all_its_units()
    {
        var e = Forms.Of("singlePhaseThreeLimb", units: 3);
        using var pdf = Open(SheetRequests.Of(Forms.Study("singlePhaseThreeLimb", units: 3)));

        // Whole mass and the sum over the plates are the same figure, found in two ways.
        var total = Plain(Figures.With(Figures.Fixed(e.Mass_kg.Total, 1), "kg"));
        Assert.Equal(2, Text(pdf).Split(total).Length - 1);
    }

    [Fact]
    public void Title_block_holds_its_fields_and_says_that_demo_data_are_invented()
    {
        using var pdf = Open(SheetRequests.Of(StudyFixture.ThreeLimb()));
        var first = Text(pdf, 1);
        string[] wanted =
        [
            "Legal owner", "Halden Ridge", "Core, 1000 kVA", "Identification number", "HR-1042", "Core design sheet", "Draft, not checked",
            "Revision index", "Responsible department", "Created by", "Desk 2", "Approved by", "not yet", "Date of issue", "2026-11-30", "Scale", "en, page 1",
            "invented demo data",
        ];
        Assert.All(wanted, w => Assert.Contains(w, first, StringComparison.Ordinal));
        using var real = Open(SheetRequests.Of(StudyFixture.ThreeLimb()) with { InventedDemo = false });
        Assert.DoesNotContain("invented", Text(real, 1), StringComparison.Ordinal);
    }

    [Fact]
    public void Representative_steel_is_named_on_the_first_page_and_a_certificate_is_not()
    {
        const string sentence = "replace by your certificate before you quote";
        using var representative = Open(SheetRequests.Of(StudyFixture.ThreeLimb()));
        Assert.Contains(sentence, Text(representative, 1), StringComparison.Ordinal);
        using var certificate = Open(SheetRequests.Of(StudyFixture.ThreeLimb(standing: "certificate")));
        Assert.DoesNotContain(sentence, Text(certificate), StringComparison.Ordinal);
    }

    [Fact]
    public void Cautions_stand_on_every_design_sheet()
    {
        using var pdf = Open(SheetRequests.Of(StudyFixture.SinglePhase(), PaperSize.Letter));
        var text = Text(pdf);
        Assert.All(["not a guarantee", "qualified staff only", "net steel", "licensed engineer"], w => Assert.Contains(w, text, StringComparison.Ordinal));
    }

    [Fact]
    public void Head_of_a_long_table_comes_back_on_the_next_page()
    {
        using var pdf = Open(SheetRequests.Of(StudyFixture.ThreeLimb(24, 400)));
        var heads = Enumerable.Range(1, pdf.NumberOfPages).Count(p => Text(pdf, p).Contains("long side", StringComparison.Ordinal));
        Assert.True(heads >= 2, $"72 plates must reach over a page, with their head on each; found it on {heads}.");
    }

    internal static PdfDocument Open(SheetRequest request) => PdfDocument.Open(DesignSheet.Render(request));

    internal static string Text(PdfDocument pdf) => string.Join(" ", Enumerable.Range(1, pdf.NumberOfPages).Select(p => Text(pdf, p)));

    internal static string Text(PdfDocument pdf, int page) => Plain(ContentOrderTextExtractor.GetText(pdf.GetPage(page)));

    /// <summary>One kind of blank: thin and fixed ones and line ends count the same.</summary>
    internal static string Plain(string text) => string.Join(' ', text.Replace('\u00A0', ' ').Replace('\u2009', ' ').Split((char[]?)null, StringSplitOptions.RemoveEmptyEntries));
}
