using System.Text;
using CoreDesign.Browser.Tests.Host;
using CoreDesign.Estimating.Steels.Import;
using Microsoft.Playwright;

namespace CoreDesign.Browser.Tests.Walks;

/// <summary>A certificate becomes a steel that designs can use; a bad file says where it is bad and leaves nothing behind.</summary>
public sealed class SteelImportTests(Site site) : BrowserTest(site)
{
    // The template is the format's own example; its figures are invented.
    private const string TemplateName = "Example steel coil 0001";

    [Fact]
    public async Task A_certificate_is_looked_at_kept_found_and_designed_with()
    {
        const string Name = "Coil 4711";
        var visitor = await ComeAsync();
        var page = visitor.Page;
        await visitor.GoAsync("/steels");
        await page.GetByRole(AriaRole.Link, new() { Name = "Import your certificate" }).ClickAsync();
        await ChooseAsync(page, "coil.csv", SteelImport.Template.Replace(TemplateName, Name, StringComparison.Ordinal));
        var result = page.Locator(".result");
        await Assertions.Expect(result).ToContainTextAsync($"{Name}, as it would be kept");
        await Assertions.Expect(result).ToContainTextAsync("from coil.csv, read as UTF-8, comma separated, decimal point");
        await Assertions.Expect(result.Locator("figure svg").First).ToBeVisibleAsync();
        await Assertions.Expect(result.Locator("figure")).ToHaveCountAsync(2);
        await AssertNotStoredAsync(page, Name);

        await page.GetByRole(AriaRole.Button, new() { Name = "Keep this steel" }).ClickAsync();
        await Assertions.Expect(page.GetByRole(AriaRole.Heading, new() { Name = Name, Exact = true })).ToBeVisibleAsync();
        await page.GetByRole(AriaRole.Link, new() { Name = "All steels" }).ClickAsync();
        await page.GetByRole(AriaRole.Searchbox).FillAsync("4711");
        await Assertions.Expect(page.Locator(".ht tbody tr")).ToHaveCountAsync(1);

        await visitor.OpenDemoAsync();
        var loss = await page.Figure("No-load loss").InnerTextAsync();
        await page.EditAsync(() => page.Field("steel.grade").SelectOptionAsync(Name));
        await Assertions.Expect(page.Figure("No-load loss")).Not.ToHaveTextAsync(loss);
        await Assertions.Expect(page.OldFigures()).ToHaveCountAsync(0);
        await page.SaveAsync("Coil walk");
        await visitor.GoAsync("/history?search=Coil+walk");
        await Assertions.Expect(page.Locator(".ht tbody tr").First).ToContainTextAsync(Name);
    }

    [Fact]
    public async Task A_bad_file_is_answered_by_line_column_value_and_rule_and_not_stored()
    {
        const string Name = "Coil 4712";
        var good = SteelImport.Template.Replace(TemplateName, Name, StringComparison.Ordinal);
        (string Text, string Old, string New, string Line, string[] Says)[] cases =
        [
            (good, "loss,50,1.5,0.756", "loss,50,1,5,0,756", "the row", ["cells where the header has 4", "decimal commas need semicolons"]),
            (good, "magnetization,50,1.3,22", "magnetization,50,1.3,12", "value", ["12", "must rise with flux density", "Correct or leave out one of the two"]),
            (good, "thickness_mm,0.3", "thickness_mm,300", "thickness_mm", ["300", "must lie between 0.1 and 0.65 mm", "looks like micrometres: write 0.3"]),
            (good, "loss,50,1.5,0.756", "loss,50,1.5,0.756 W/kg", "value", ["0.756 W/kg", "is not a number", "no unit"]),
        ];
        var visitor = await ComeAsync();
        var page = visitor.Page;
        await visitor.GoAsync("/steels/import");
        foreach (var (text, old, @new, column, says) in cases)
        {
            await ChooseAsync(page, "bad.csv", text.Replace(old + "\r\n", @new + "\r\n", StringComparison.Ordinal));
            var lineNumber = text.Split("\r\n").ToList().IndexOf(old) + 1;
            Assert.True(lineNumber > 0, $"The template has no row {old}.");
            var row = page.Locator(".result tbody tr").Filter(new() { HasText = says[^1] }).First;
            await Assertions.Expect(row.Locator("td").First).ToHaveTextAsync(lineNumber.ToString(System.Globalization.CultureInfo.InvariantCulture));
            await Assertions.Expect(row).ToContainTextAsync(column);
            foreach (var part in says) await Assertions.Expect(row).ToContainTextAsync(part);
            await Assertions.Expect(page.Locator(".result")).ToContainTextAsync("Nothing was stored.");
            await Assertions.Expect(page.GetByRole(AriaRole.Button, new() { Name = "Keep this steel" })).ToHaveCountAsync(0);
        }

        await AssertNotStoredAsync(page, Name);
    }

    [Fact]
    public async Task What_is_no_text_or_too_large_is_refused_before_it_is_read()
    {
        var visitor = await ComeAsync();
        var page = visitor.Page;
        await visitor.GoAsync("/steels/import");
        await ChooseAsync(page, "book.xlsx", "PK\u0003\u0004");
        await Assertions.Expect(page.Locator(".result")).ToContainTextAsync("is a workbook, archive or PDF, not text; save the table as CSV");
        await ChooseAsync(page, "noise.csv", "name,x\nsou\0rce,y");
        await Assertions.Expect(page.Locator(".result")).ToContainTextAsync("holds the control character U+0000");
        await ChooseAsync(page, "big.csv", new string('1', SteelImport.MaxBytes + 1));
        await Assertions.Expect(page.Locator(".msg")).ToContainTextAsync("at most 2048 KiB are read");
        await Assertions.Expect(page.Locator(".result")).ToHaveCountAsync(0);
    }

    [Fact]
    public async Task A_pasted_table_of_any_length_is_answered()
    {
        var visitor = await ComeAsync();
        var page = visitor.Page;
        await visitor.GoAsync("/steels/import");
        var paste = page.Locator("#paste");
        await paste.FillAsync(SteelImport.TemplateWithDecimalComma);
        await page.GetByRole(AriaRole.Button, new() { Name = "Check the text" }).ClickAsync();
        await Assertions.Expect(page.Locator(".result")).ToContainTextAsync("read as text, semicolon separated, decimal comma");

        await PasteAsync(paste, SteelImport.Template + string.Concat(Enumerable.Repeat("loss,50,1,x\r\n", 4000)));
        await page.GetByRole(AriaRole.Button, new() { Name = "Check the text" }).ClickAsync();
        await Assertions.Expect(page.Locator(".result")).ToContainTextAsync("And 3950 more errors.");

        await PasteAsync(paste, new string('1', 250_000));
        await page.GetByRole(AriaRole.Button, new() { Name = "Check the text" }).ClickAsync();
        await Assertions.Expect(page.Locator(".msg")).ToContainTextAsync("has more than 200000 characters");
    }

    [Fact]
    public async Task A_name_that_is_taken_is_refused_and_the_first_steel_stays()
    {
        var visitor = await ComeAsync();
        var page = visitor.Page;
        await visitor.GoAsync("/steels/import");
        await ChooseAsync(page, "one.csv", SteelImport.Template.Replace(TemplateName, "Coil 4713", StringComparison.Ordinal));
        await page.GetByRole(AriaRole.Button, new() { Name = "Keep this steel" }).ClickAsync();
        await Assertions.Expect(page.GetByRole(AriaRole.Heading, new() { Name = "Coil 4713", Exact = true })).ToBeVisibleAsync();
        var first = await (await page.APIRequest.GetAsync("/api/steels/Coil%204713")).TextAsync();

        await visitor.GoAsync("/steels/import");
        await ChooseAsync(page, "two.csv", SteelImport.Template.Replace(TemplateName, "Coil 4713", StringComparison.Ordinal).Replace("thickness_mm,0.3", "thickness_mm,0.27", StringComparison.Ordinal));
        await page.GetByRole(AriaRole.Button, new() { Name = "Keep this steel" }).ClickAsync();
        await Assertions.Expect(page.Locator(".msg")).ToContainTextAsync("Coil 4713");
        Assert.Equal(first, await (await page.APIRequest.GetAsync("/api/steels/Coil%204713")).TextAsync());
    }

    // At one go: the browser's own way of typing takes a long text letter by letter.
    private static async Task PasteAsync(ILocator field, string text) =>
        await field.EvaluateAsync("(field, text) => { field.value = text; field.dispatchEvent(new Event('change', { bubbles: true })); }", text);

    private static Task ChooseAsync(IPage page, string name, string text) =>
        page.Locator("#file").SetInputFilesAsync(new FilePayload { Name = name, MimeType = "text/csv", Buffer = Encoding.UTF8.GetBytes(text) });

    private static async Task AssertNotStoredAsync(IPage page, string name)
    {
        var answer = await page.APIRequest.GetAsync($"/api/steels/{Uri.EscapeDataString(name)}");
        Assert.Equal(404, answer.Status);
    }
}
