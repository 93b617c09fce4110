using CoreDesign.Browser.Tests.Host;
using CoreDesign.Browser.Tests.Looks;
using Microsoft.Playwright;
using static Microsoft.Playwright.Assertions;

namespace CoreDesign.Browser.Tests;

/// <summary>Every page and state of the tool. A place listed here is held against axe, clipping and overlap, and leaves screenshots.</summary>
public static class Places
{
    private const string Demo = "/design?demo=station-1000";
    private const string Missing = "404|status of 404";

    /// <summary>The design page.</summary>
    public static IReadOnlyList<Place> Design { get; } =
    [
        new("design-empty", "/design/new"),
        new("design-demo", Demo) { Enter = SolvedAsync },
        new("design-one-phase", "/design?demo=pole-25") { Enter = SolvedAsync },
        new("design-largest", "/design?demo=substation-40000") { Enter = SolvedAsync },
        new("design-field-focused", Demo) { Enter = async v => { await SolvedAsync(v); await v.Page.Field("core.windowHeight_mm").FocusAsync(); } },
        new("design-field-in-error", Demo) { Enter = v => RefusedAsync(v, ("core.windowHeight_mm", "0"), ("joint.gap_mm", "9"), ("order.frequency_Hz", "fifty")) },
        new("design-thousands", Demo) { Enter = async v => { await SolvedAsync(v); await TypeAsync(v, ("order.ratedPower_kVA", "1.000")); } },
        new("design-steps-open", Demo) { Enter = StepsAsync },
        new("design-step-in-error", Demo) { Enter = StepInErrorAsync },
        new("design-oversaturated", Demo) { Enter = async v => { await SolvedAsync(v); await TypeAsync(v, ("excitedWinding.turns", "12")); await StudiedAsync(v); } },
        new("design-sizing", Demo) { Enter = async v => { await SolvedAsync(v); await TypeAsync(v, ("excitedWinding.turns", ""), ("form.wantedFluxDensity_T", "1.65")); } },
        .. new[] { "LossDensity", "ExcitingPower", "Margin" }.Select(reading => new Place($"design-reading-{reading}", Demo) { Enter = v => ReadingAsync(v, reading) }),
        new("design-direct-current", "/design?demo=pole-25") { Enter = DirectCurrentAsync },
        new("design-scrolled", Demo) { Enter = ScrolledAsync },
        new("design-half-typed", "/design/new") { Enter = v => TypeAsync(v, ("order.reference", "HR-1060"), ("order.ratedPower_kVA", "630"), ("order.frequency_Hz", "50")) },
        new("design-save-dialog", Demo) { Enter = async v => { await SolvedAsync(v); await OpenSaveAsync(v.Page); } },
        new("design-save-refused", Demo) { Enter = SaveRefusedAsync },
        new("design-revision", $"/design/{Records.Revised}") { Enter = SolvedAsync },
        new("design-old-revision", $"/design/{Records.Revised}/1") { Enter = async v => { await SolvedAsync(v); await Expect(v.Page.Locator(".banner")).ToContainTextAsync("Today's kernel"); } },
        new("design-print-menu", $"/design/{Records.Revised}") { Enter = async v => { await SolvedAsync(v); await v.Page.Locator("#sheets-button").ClickAsync(); await Expect(v.Page.Locator("#sheets-menu a").First).ToBeVisibleAsync(); } },
        new("design-conflict", $"/design/{Records.Contested}") { Enter = ConflictAsync },
        new("design-left-draft", "/design/new") { Enter = LeftAsync },
        new("design-line-down", Demo) { Enter = LineDownAsync },
        new("design-missing", "/design/99999"),
    ];

    /// <summary>All other pages.</summary>
    public static IReadOnlyList<Place> Others { get; } =
    [
        new("history-empty", "/history") { InEmptyHistory = true },
        new("history", "/history"),
        new("history-filtered", "/history?steel=M105-30P&sort=-loss"),
        new("history-nothing-found", "/history?search=no+such+order"),
        new("history-refused", "/history?sort=colour"),
        new("record", $"/designs/{Records.Revised}"),
        new("record-old-revision", $"/designs/{Records.Revised}?revision=1"),
        new("record-note-refused", $"/designs/{Records.Revised}") { Enter = async v => { await v.Page.GetByRole(AriaRole.Button, new() { Name = "Add note" }).ClickAsync(); await Expect(v.Page.Locator("#note-m")).ToBeVisibleAsync(); } },
        new("record-no-revision", $"/designs/{Records.Revised}?revision=77"),
        new("record-missing", "/designs/99999"),
        new("steels", "/steels"),
        new("steels-filtered", "/steels?search=M10"),
        new("steels-nothing-found", "/steels?search=no+such+steel"),
        new("steel", "/steels/M105-30P"),
        new("steel-points", "/steels/M105-30P") { Enter = async v => { await v.Page.Locator("summary").First.ClickAsync(); await Expect(v.Page.Locator("details table").First).ToBeVisibleAsync(); } },
        new("steel-own", $"/steels/{Records.OwnSteel}"),
        new("steel-missing", "/steels/M105-30X"),
        new("import", "/steels/import"),
        new("import-good", "/steels/import") { Enter = v => PasteAsync(v, Records.Certificate("Good certificate"), "Good certificate, as it would be kept") },
        new("import-warned", "/steels/import") { Enter = v => PasteAsync(v, Records.Certificate("Certificate without density").Replace("density_kg_m3,7650\n", "", StringComparison.Ordinal), "Worth a look") },
        new("import-errors", "/steels/import") { Enter = v => PasteAsync(v, Records.BrokenCertificate, "270") },
        .. Chapters("order", "steels", "geometry", "joints", "solver", "building-factor", "sheet", "files", "circuits", "api", "cautions", "published", "margins"),
        new("handbook-missing", "/handbook/no-such-chapter"),
        new("not-found", "/no/such/page") { Expected = Missing },
        new("error", "/error"),
    ];

    /// <summary>Circuits of one's own.</summary>
    public static IReadOnlyList<Place> Trials { get; } =
    [
        new("circuits", "/circuits"),
        new("circuits-example", "/circuits") { Enter = ExampleAsync },
        new("circuits-in-error", "/circuits") { Enter = CircuitInErrorAsync },
        new("circuits-unsolvable", "/circuits") { Enter = v => SolveAsync(v, Circuits.Ring.Replace("\"to\": \"p\"", "\"to\": \"r\"", StringComparison.Ordinal), ".said .msg") },
        new("circuits-largest", "/circuits") { Enter = v => SolveAsync(v, Circuits.Largest, ".branches") },
        new("circuits-many-errors", "/circuits") { Enter = v => SolveAsync(v, Circuits.Largest.Replace("\"area\":0.003", "\"area\":-1", StringComparison.Ordinal), ".errors") },
    ];

    public static Place Find(string name) => Design.Concat(Others).Concat(Trials).Single(p => p.Name == name);

    private static IEnumerable<Place> Chapters(params string[] names) => names.Select(name => new Place($"handbook-{name}", $"/handbook/{name}"));

    private static async Task SolvedAsync(Visitor v)
    {
        await v.Page.AnsweredAsync();
        await StudiedAsync(v);
    }

    // Levers, voltage curve and margins come in the pause after the answer.
    private static async Task StudiedAsync(Visitor v)
    {
        await Expect(v.Page.Locator("button.lever:enabled").First).ToBeVisibleAsync();
        await Expect(v.Page.Locator("[data-chart]")).ToHaveCountAsync(8);
    }

    private static async Task TypeAsync(Visitor v, params (string Path, string Text)[] fields)
    {
        foreach (var (path, text) in fields) await v.Page.Field(path).FillAsync(text);
        await v.Page.AnsweredAsync();
    }

    private static async Task RefusedAsync(Visitor v, params (string Path, string Text)[] fields)
    {
        await SolvedAsync(v);
        await TypeAsync(v, fields);
        await v.Page.Field(fields[^1].Path).BlurAsync();
        foreach (var (path, _) in fields) await Expect(v.Page.Field(path)).ToHaveAttributeAsync("aria-invalid", "true");
    }

    private static async Task StepsAsync(Visitor v)
    {
        await SolvedAsync(v);
        await v.Page.Locator("[aria-controls=step-table]").ClickAsync();
        await v.Page.GetByRole(AriaRole.Button, new() { Name = "Type the steps by hand" }).ClickAsync();
        await Expect(v.Page.GetByRole(AriaRole.Button, new() { Name = "Add a step" })).ToBeVisibleAsync();
        await v.Page.AnsweredAsync();
        await StudiedAsync(v);
    }

    private static async Task StepInErrorAsync(Visitor v)
    {
        await StepsAsync(v);
        await TypeAsync(v, ("core.limbSteps[1].width_mm", "wide"));
        await v.Page.Field("core.limbSteps[1].width_mm").BlurAsync();
        await Expect(v.Page.Locator("#step-table .msg").First).ToBeVisibleAsync();
    }

    private static async Task ReadingAsync(Visitor v, string reading)
    {
        await SolvedAsync(v);
        await v.Page.Locator($"input[name=reading][value={reading}]").CheckAsync();
    }

    private static async Task DirectCurrentAsync(Visitor v)
    {
        await SolvedAsync(v);
        await TypeAsync(v, ("margins.dcBias_A", "2"));
        await Expect(v.Page.Locator("[data-chart=dc-bias]")).ToBeVisibleAsync();
        await v.Page.Locator("[data-margins] summary").ClickAsync();
    }

    private static async Task ScrolledAsync(Visitor v)
    {
        await SolvedAsync(v);
        await v.Page.EvaluateAsync("() => scrollTo(0, document.documentElement.scrollHeight)");
        await Expect(v.Page.Locator(".pinned")).ToBeVisibleAsync();
    }

    private static async Task OpenSaveAsync(IPage page)
    {
        await page.Locator(".tools").GetByRole(AriaRole.Button, new() { Name = "Save" }).ClickAsync();
        await Expect(page.Locator("#save-dialog")).ToBeVisibleAsync();
    }

    private static async Task SaveRefusedAsync(Visitor v)
    {
        await SolvedAsync(v);
        await OpenSaveAsync(v.Page);
        await v.Page.GetByLabel("Title").FillAsync(" ");
        await v.Page.Locator("#save-dialog [type=submit]").ClickAsync();
        await Expect(v.Page.Locator("#save-dialog .msg")).ToBeVisibleAsync();
    }

    // The page knows revision 1; revision 2 is saved from elsewhere before it saves.
    private static async Task ConflictAsync(Visitor v)
    {
        await SolvedAsync(v);
        await TypeAsync(v, ("core.windowHeight_mm", "540"), ("core.windowWidth_mm", "195"));
        await Records.SaveElsewhereAsync(v.Address, Records.Contested);
        await OpenSaveAsync(v.Page);
        await v.Page.Locator("#save-dialog [type=submit]").ClickAsync();
        await Expect(v.Page.Locator("#conflict-dialog")).ToBeVisibleAsync();
    }

    private static async Task LeftAsync(Visitor v)
    {
        await TypeAsync(v, ("order.reference", "HR-1061"));
        await v.Page.WaitForURLAsync("**draft=*");
        await v.GoAsync("/design");
        await Expect(v.Page.Locator(".banner")).ToContainTextAsync("HR-1061");
    }

    // As the browser script shows it; that a lost line leads here is another test's matter.
    private static async Task LineDownAsync(Visitor v)
    {
        await SolvedAsync(v);
        await v.Page.EvaluateAsync("() => { const b = document.getElementById('components-reconnect-modal'); b.classList.add('components-reconnect-failed'); b.showPopover(); }");
        await Expect(v.Page.Locator("#components-reconnect-modal .fail")).ToBeVisibleAsync();
    }

    private static async Task ExampleAsync(Visitor v)
    {
        await v.Page.GetByRole(AriaRole.Button, new() { Name = "Solve the example" }).ClickAsync();
        await Expect(v.Page.Locator(".branches")).ToBeVisibleAsync();
    }

    private static async Task CircuitInErrorAsync(Visitor v)
    {
        await ExampleAsync(v);
        var text = await v.Page.Locator("#circuit").InputValueAsync();
        await SolveAsync(v, text.Replace("\"V\": 400", "\"V\": \"400\"", StringComparison.Ordinal).Replace("\"area\": 1,", "\"aera\": 1,", StringComparison.Ordinal), ".errors");
    }

    private static async Task SolveAsync(Visitor v, string text, string answer)
    {
        await v.Page.Locator("#circuit").FillAsync(text);
        await v.Page.GetByRole(AriaRole.Button, new() { Name = "Solve", Exact = true }).ClickAsync();
        await Expect(v.Page.Locator(answer)).ToBeVisibleAsync();
    }

    private static async Task PasteAsync(Visitor v, string text, string answer)
    {
        await v.Page.Locator("#paste").FillAsync(text);
        await v.Page.GetByRole(AriaRole.Button, new() { Name = "Check the text" }).ClickAsync();
        await Expect(v.Page.Locator(".result")).ToContainTextAsync(answer);
    }
}
