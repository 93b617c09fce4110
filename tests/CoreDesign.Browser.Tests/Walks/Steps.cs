using System.Globalization;
using System.Text.RegularExpressions;
using CoreDesign.Browser.Tests.Host;
using Microsoft.Playwright;

namespace CoreDesign.Browser.Tests.Walks;

/// <summary>What a person does on the pages, each step waited for until the page shows its effect.</summary>
internal static partial class Steps
{
    /// <summary>The first demo order of the catalogue is small and answers fast.</summary>
    public const string Demo = "pole-25";

    public static async Task OpenDemoAsync(this Visitor visitor, string key = Demo)
    {
        await visitor.GoAsync($"/design?demo={key}");
        await visitor.Page.AnsweredAsync();
    }

    /// <summary>Puts a text into a field at one go and waits for the answer.</summary>
    public static Task EnterAsync(this IPage page, string path, string text) => page.EditAsync(() => page.Field(path).FillAsync(text));

    /// <summary>Does something that edits the design, and waits until the server has taken it and answered.</summary>
    public static async Task EditAsync(this IPage page, Func<Task> edit)
    {
        var before = await page.SerialAsync();
        await edit();
        await page.WaitForFunctionAsync("before => Number(document.querySelector('[data-design]').dataset.serial) > before", before);
        await page.AnsweredAsync();
    }

    public static async Task<long> SerialAsync(this IPage page) =>
        long.Parse(await page.Locator("[data-design]").GetAttributeAsync("data-serial") ?? "", CultureInfo.InvariantCulture);

    /// <summary>The large figure under a heading of the verdict, such as "No-load loss".</summary>
    public static ILocator Figure(this IPage page, string heading) =>
        page.Locator(".verdict .vd").Filter(new() { Has = page.GetByRole(AriaRole.Heading, new() { Name = heading, Exact = true }) }).Locator(".n");

    /// <summary>The verdict's figures are shown as ones that no longer stand for what is typed.</summary>
    public static ILocator OldFigures(this IPage page) => page.Locator(".verdict .strip.old");

    public static ILocator Strip(this IPage page) => page.Locator(".verdict .strip");

    public static ILocator SaveButton(this IPage page) => page.Locator("header").GetByRole(AriaRole.Button, new() { NameRegex = SaveName() });

    /// <summary>Fills in the dialog and presses its save; says nothing about what comes of it.</summary>
    public static async Task SayAndSaveAsync(this IPage page, string title, string note = "", string author = "A. Tester")
    {
        await page.SaveButton().ClickAsync();
        var dialog = page.Locator("#save-dialog");
        await dialog.GetByLabel("Title").FillAsync(title);
        await dialog.GetByLabel("Note").FillAsync(note);
        await dialog.GetByLabel("Your name").FillAsync(author);
        await dialog.GetByRole(AriaRole.Button, new() { NameRegex = SaveName() }).ClickAsync();
    }

    /// <summary>Saves and waits for the page of the new revision; gives the design's number.</summary>
    public static async Task<long> SaveAsync(this IPage page, string title, string note = "", string author = "A. Tester")
    {
        await page.SayAndSaveAsync(title, note, author);
        return await page.SavedAsync();
    }

    /// <summary>Waits until the page stands at a saved design without edits, and gives its number.</summary>
    public static async Task<long> SavedAsync(this IPage page)
    {
        await Assertions.Expect(page).ToHaveURLAsync(SavedAddress());
        await Assertions.Expect(page.Locator("dialog[open]")).ToHaveCountAsync(0);
        await Assertions.Expect(page.Locator(".who")).ToContainTextAsync(Standing());
        return long.Parse(DesignAddress().Match(page.Url).Groups["id"].Value, CultureInfo.InvariantCulture);
    }

    [GeneratedRegex("^Save", RegexOptions.None, 1000)]
    private static partial Regex SaveName();

    [GeneratedRegex(@"/design/[\d/]+$", RegexOptions.None, 1000)]
    private static partial Regex SavedAddress();

    // Matched here, not in the browser, which knows no such option.
    [GeneratedRegex(@"/design/(?<id>\d+)(/\d+)?$", RegexOptions.ExplicitCapture, 1000)]
    private static partial Regex DesignAddress();

    // "revision 2, draft"; with edits it would say "revision 2, edited".
    [GeneratedRegex(@"revision \d+, (?!edited)", RegexOptions.None, 1000)]
    private static partial Regex Standing();
}
