using Bunit;
using Bunit.TestDoubles;
using CoreDesign.Estimating.Steels.Import;
using CoreDesign.Web.Features.Steels;
using CoreDesign.Web.Tests.HistoryPages;
using Microsoft.AspNetCore.Components.Forms;
using Microsoft.Extensions.DependencyInjection;

namespace CoreDesign.Web.Tests.SteelPages;

public sealed class SteelImportPageTests : BunitContext
{
    private const string Name = "Example steel coil 0001";
    private readonly KeptDesigns kept = new();
    private readonly SteelShelf shelf;

    public SteelImportPageTests()
    {
        shelf = kept.Shelf();
        Services.AddSingleton(shelf);
        JSInterop.Mode = JSRuntimeMode.Loose;
    }

    [Fact]
    public void Whole_file_is_shown_with_its_curves_and_kept_only_when_told_so()
    {
        var page = Choose(SteelImport.Template, "coil.csv");

        page.WaitForElement(".result");
        Assert.Equal($"{Name}, as it would be kept", page.Find("#result-h").TextContent);
        Assert.Contains("UTF-8, comma separated, decimal point", page.Find(".result .lead").TextContent, StringComparison.Ordinal);
        Assert.Equal(2, page.FindAll(".result figure svg").Count);
        Assert.False(Kept());

        page.Find(".result button.pri").Click();

        page.WaitForAssertion(() => Assert.True(Kept()));
        Assert.EndsWith("steels/Example%20steel%20coil%200001", Services.GetRequiredService<BunitNavigationManager>().Uri, StringComparison.Ordinal);
    }

    [Fact]
    public void Text_that_is_pasted_is_read_as_a_file_is()
    {
        var page = Render<SteelImportPage>();

        page.Find("#paste").Change(SteelImport.TemplateWithDecimalComma);
        page.FindAll("button").Single(b => b.TextContent == "Check the text").Click();

        Assert.Contains("read as text, semicolon separated, decimal comma", page.Find(".result").TextContent, StringComparison.Ordinal);
        Assert.False(Kept());
    }

    [Fact]
    public void Every_error_stands_with_its_line_column_and_value_and_nothing_can_be_kept()
    {
        var text = SteelImport.Template
            .Replace("magnetization,50,1.7,82", "magnetization,50,17,82", StringComparison.Ordinal)
            .Replace("loss,50,1.5,0.756", "loss,50,1.5,0.0756", StringComparison.Ordinal)
            .Replace("loss,60,1.7,1.38", "loss,60,1.7,abc", StringComparison.Ordinal);
        var lines = text.Split("\r\n");
        int LineOf(string row) => Array.IndexOf(lines, row) + 1;

        var page = Choose(text, "coil.csv");

        page.WaitForElement(".result table");
        var rows = page.FindAll(".result table")[0].QuerySelectorAll("tbody tr").Select(r => r.Children.Select(c => c.TextContent).ToArray()).ToList();
        Assert.Equal(
            [$"{LineOf("magnetization,50,17,82")}", $"{LineOf("loss,50,1.5,0.0756")}", $"{LineOf("loss,60,1.7,abc")}"],
            rows.Select(r => r[0]));
        Assert.StartsWith("B_T: \"17\" must be a peak flux density from 0.001 to 3 T", rows[0][^1], StringComparison.Ordinal);
        Assert.StartsWith("value: \"0.0756\" must rise with flux density", rows[1][^1], StringComparison.Ordinal);
        Assert.StartsWith("value: \"abc\" is not a number", rows[2][^1], StringComparison.Ordinal);
        Assert.Empty(page.FindAll(".result button.pri"));
        Assert.Contains("Nothing was stored.", page.Find(".result").TextContent, StringComparison.Ordinal);
        Assert.False(Kept());
    }

    [Fact]
    public void Hostile_name_is_shown_as_text()
    {
        var page = Choose(SteelImport.Template.Replace(Name, "<img src=x onerror=alert(1)>", StringComparison.Ordinal), "<b>.csv");

        page.WaitForElement(".result");
        Assert.Empty(page.FindAll("img"));
        Assert.Empty(page.FindAll(".result b"));
    }

    [Fact]
    public void File_that_is_too_large_is_refused_before_it_is_read()
    {
        var page = Choose(new string('#', SteelImport.MaxBytes + 1), "large.csv");

        page.WaitForAssertion(() => Assert.Contains("at most 2048 KiB", page.Find(".msg").TextContent, StringComparison.Ordinal));
        Assert.Empty(page.FindAll(".result"));
    }

    [Fact]
    public async Task Name_that_other_data_have_is_refused_and_the_first_stay()
    {
        var first = SteelImport.Read(SteelImport.Template, null).Grade!;
        await shelf.KeepAsync(first, Xunit.TestContext.Current.CancellationToken);
        var page = Choose(SteelImport.Template.Replace("loss,50,1.7,1.05", "loss,50,1.7,1.04", StringComparison.Ordinal), "coil.csv");

        page.WaitForElement(".result button.pri").Click();

        page.WaitForAssertion(() => Assert.Contains("Other data are already kept", page.Find(".msg").TextContent, StringComparison.Ordinal));
        Assert.True(shelf.Current.TryFind(Name, out var still));
        Assert.Equal(1.05, still.Rolling.Loss[0].Points.Single(p => p.B_T == 1.7).Loss_W_per_kg);
    }

    protected override void Dispose(bool disposing)
    {
        base.Dispose(disposing);
        if (disposing) kept.Dispose();
    }

    private bool Kept() => shelf.Current.TryFind(Name, out _);

    private IRenderedComponent<SteelImportPage> Choose(string text, string name)
    {
        var page = Render<SteelImportPage>();
        page.FindComponent<InputFile>().UploadFiles(InputFileContent.CreateFromText(text, name));
        return page;
    }
}
