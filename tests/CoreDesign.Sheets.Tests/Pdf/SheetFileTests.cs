using System.Text.RegularExpressions;
using CoreDesign.Estimating.Contracts;
using CoreDesign.Sheets.Design;
using CoreDesign.Sheets.Pdf;
using UglyToad.PdfPig;
using UglyToad.PdfPig.Tokens;

namespace CoreDesign.Sheets.Tests.Pdf;

public class SheetFileTests
{
    [Theory]
    [InlineData(PaperSize.A4)]
    [InlineData(PaperSize.Letter)]
    public void File_is_sound_and_small(PaperSize paper)
    {
        foreach (var study in new[] { StudyFixture.ThreeLimb(), StudyFixture.ThreeLimb(14, 720), StudyFixture.SinglePhase(1) })
        {
            var bytes = DesignSheet.Render(SheetRequests.Of(study, paper));
            Assert.InRange(bytes.Length, 20_000, 200_000);
            Qpdf.Check(bytes);
        }
    }

    [Fact]
    public void Same_request_gives_the_same_bytes_one_after_another_and_at_once()
    {
        var once = DesignSheet.Render(SheetRequests.Of(StudyFixture.ThreeLimb()));
        DesignSheet.Render(SheetRequests.Of(StudyFixture.SinglePhase(), PaperSize.Letter));
        Assert.Equal(once, DesignSheet.Render(SheetRequests.Of(StudyFixture.ThreeLimb())));

        var atOnce = new byte[8][];
        Parallel.For(0, atOnce.Length, i => atOnce[i] = DesignSheet.Render(i % 2 == 0 ? SheetRequests.Of(StudyFixture.ThreeLimb()) : SheetRequests.Of(StudyFixture.SinglePhase())));
        Assert.All(Enumerable.Range(0, 4), i => Assert.Equal(once, atOnce[2 * i]));
    }

    [Fact]
    public void Another_figure_gives_another_file_and_another_identifier()
    {
        var study = StudyFixture.ThreeLimb();
        var other = study with { Estimate = study.Estimate with { NoLoadLoss_W = study.Estimate.NoLoadLoss_W + 1 } };
        Assert.NotEqual(Id(DesignSheet.Render(SheetRequests.Of(study))), Id(DesignSheet.Render(SheetRequests.Of(other))));
    }

    [Fact]
    public void All_fonts_are_embedded_subsets()
    {
        using var pdf = DesignSheetTests.Open(SheetRequests.Of(StudyFixture.ThreeLimb()));
        var fonts = pdf.GetPages().SelectMany(p => p.Letters).Select(l => l.FontName!).Distinct().ToList();
        Assert.All(fonts, f => Assert.Matches("^[A-Z]{6}\\+IBM", f));
        var opened = Qpdf.Opened(DesignSheet.Render(SheetRequests.Of(StudyFixture.ThreeLimb())));
        Assert.Equal(Regex.Count(opened, "/Type /FontDescriptor"), Regex.Count(opened, "/FontFile2 "));
    }

    [Fact]
    public void File_is_tagged_with_language_headings_tables_figures_and_bookmarks()
    {
        var request = SheetRequests.Of(StudyFixture.ThreeLimb());
        using var pdf = DesignSheetTests.Open(request);
        var catalog = pdf.Structure.Catalog.CatalogDictionary;
        Assert.True(catalog.TryGet(NameToken.Create("Lang"), out StringToken language) && language.Data == "en");
        Assert.True(catalog.ContainsKey(NameToken.Create("StructTreeRoot")));
        Assert.True(pdf.TryGetBookmarks(out var bookmarks));
        Assert.Contains(bookmarks.GetNodes(), n => n.Title == "Plates");
        Assert.Contains("Core, 1000 kVA", pdf.Information.Title, StringComparison.Ordinal);

        var opened = Qpdf.Opened(DesignSheet.Render(request));
        Assert.All(["/S /H1", "/S /H2", "/S /Table", "/S /TR", "/S /TH", "/S /TD", "/S /L", "/S /LI"], tag => Assert.Contains(tag + "\n", opened, StringComparison.Ordinal));
        var figures = Regex.Count(opened, "/S /Figure\n");
        Assert.True(figures >= 4, $"Front view, section, joint, scale and symbol are figures; found {figures}.");
        Assert.Equal(figures, Regex.Count(opened, "/Alt [(<]"));
        Assert.Matches("/Alt \\([^)]*Peak flux density", opened);
    }

    [Fact]
    public void Front_view_is_drawn_truly_to_its_stated_scale()
    {
        foreach (var (study, paper) in new (Study, PaperSize)[] { (StudyFixture.ThreeLimb(), PaperSize.A4), (StudyFixture.SinglePhase(), PaperSize.Letter), (StudyFixture.ThreeLimb(14, 720), PaperSize.A4) })
        {
            using var pdf = DesignSheetTests.Open(SheetRequests.Of(study, paper));
            var scale = int.Parse(Regex.Match(DesignSheetTests.Text(pdf, 1), "1:(?<n>[0-9]+) \\(section", RegexOptions.NonBacktracking).Groups["n"].Value, System.Globalization.CultureInfo.InvariantCulture);
            var g = study.Estimate.Geometry;
            var boxes = pdf.GetPage(1).Paths.Select(p => p.GetBoundingRectangle()).OfType<UglyToad.PdfPig.Core.PdfRectangle>().ToList();

            // An inch is 72 pt and 25.4 mm; a limb between the yokes is as wide and high as the core's over the scale.
            double width = g.LimbWidth_mm / scale * 72 / 25.4, height = g.WindowHeight_mm / scale * 72 / 25.4;
            Assert.Contains(boxes, b => Math.Abs(b.Width - width) < 0.01 && Math.Abs(b.Height - height) < 0.01);
            Assert.Contains(scale, new[] { 1, 2, 5, 10, 20, 50, 100 });
        }
    }

    private static string Id(byte[] pdf) => Regex.Match(System.Text.Encoding.Latin1.GetString(pdf), "/ID\\[<(?<id>[0-9A-F]{32})>", RegexOptions.NonBacktracking).Groups["id"].Value;
}
