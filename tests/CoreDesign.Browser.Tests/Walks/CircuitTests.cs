using System.Text;
using System.Text.Json;
using CoreDesign.Browser.Tests.Host;
using Microsoft.Playwright;

namespace CoreDesign.Browser.Tests.Walks;

/// <summary>An engineer tries a circuit: pastes it, reads the figures, breaks it, is told where, mends it, takes the answer along.</summary>
public sealed class CircuitTests(Site site) : BrowserTest(site)
{
    [Fact]
    public async Task A_circuit_is_pasted_solved_broken_mended_and_its_answer_taken_along()
    {
        var visitor = await ComeAsync();
        var page = visitor.Page;
        await visitor.GoAsync("/design/new");
        await page.GetByRole(AriaRole.Link, new() { Name = "Circuits" }).ClickAsync();
        await Assertions.Expect(page.GetByRole(AriaRole.Heading, new() { Name = "A circuit of your own" })).ToBeVisibleAsync();
        await SolveAsync(page, Circuits.Ring);

        // Linear: I = U·R/(w·N²), with R the core's and the gap's reluctance.
        const double Mu0 = 1.25663706212e-6;
        var current = 230 * ((0.8 / (Mu0 * 2000 * 0.003)) + (0.001 / (Mu0 * 0.003))) / (2 * Math.PI * 50 * 200 * 200);
        var shown = current.ToString("F3", System.Globalization.CultureInfo.InvariantCulture);
        await Assertions.Expect(page.Locator(".said dl")).ToContainTextAsync($"{shown}\u00A0A");
        await Assertions.Expect(page.Locator(".branches tbody tr")).ToHaveCountAsync(2);
        await Assertions.Expect(page.Locator("[role=status]").First).ToContainTextAsync("Solved.");

        await SolveAsync(page, Circuits.Ring.Replace("\"gap\": 0.001", "\"gap\": -0.001", StringComparison.Ordinal));
        var row = page.Locator(".errors tbody tr");
        await Assertions.Expect(row).ToContainTextAsync("branches[1].gap");
        await Assertions.Expect(row).ToContainTextAsync("-0.001 is outside 0 to 10");
        await Assertions.Expect(page.Locator(".said")).ToContainTextAsync("Figures of the text that was solved last");
        await row.GetByRole(AriaRole.Button).ClickAsync();
        Assert.Equal(Circuits.Ring.Split('\n')[6].Replace("0.001", "-0.001", StringComparison.Ordinal), await page.EvaluateAsync<string>("() => getSelection().toString()"));

        await page.Keyboard.InsertTextAsync(Circuits.Ring.Split('\n')[6]);
        await page.GetByRole(AriaRole.Button, new() { Name = "Solve", Exact = true }).ClickAsync();
        await Assertions.Expect(page.Locator(".errors")).ToHaveCountAsync(0);
        await Assertions.Expect(page.Locator(".figures.old")).ToHaveCountAsync(0);

        var saving = await page.RunAndWaitForDownloadAsync(() => page.GetByRole(AriaRole.Button, new() { Name = "Save the answer as JSON" }).ClickAsync());
        Assert.Equal("circuit-answer.json", saving.SuggestedFilename);
        using var answer = JsonDocument.Parse(await File.ReadAllTextAsync(await saving.PathAsync()));
        Assert.Equal(1, answer.RootElement.GetProperty("windings").GetProperty("W").GetProperty("rms").GetDouble() / current, 1e-6);
    }

    [Fact]
    public async Task Waveforms_are_chosen_and_read_out()
    {
        var visitor = await ComeAsync();
        var page = visitor.Page;
        await visitor.GoAsync("/circuits");
        await page.GetByRole(AriaRole.Button, new() { Name = "Solve the example" }).ClickAsync();
        var chart = page.Locator("[data-chart=flux-density]");
        await Assertions.Expect(chart.Locator("desc")).ToContainTextAsync("limb A");
        await page.GetByLabel("Waveform of limb A").UncheckAsync();
        await Assertions.Expect(chart.Locator("desc")).Not.ToContainTextAsync("limb A");
        await page.GetByLabel("Waveform of yoke BC low").CheckAsync();
        await Assertions.Expect(chart.Locator("desc")).ToContainTextAsync("yoke BC low");

        await chart.Locator(".plot").FocusAsync();
        await page.Keyboard.PressAsync("Home");
        await Assertions.Expect(chart.Locator(".read")).ToContainTextAsync("0 ms: limb B");
        await page.Locator("[data-chart=windings] svg").HoverAsync();
        await Assertions.Expect(page.Locator("[data-chart=windings] .read")).ToContainTextAsync("W-A");
    }

    [Fact]
    public async Task A_text_survives_a_reload_and_a_file_takes_its_place()
    {
        var visitor = await ComeAsync();
        var page = visitor.Page;
        await visitor.GoAsync("/circuits");
        await SolveAsync(page, Circuits.Ring);
        await Assertions.Expect(page.Locator(".branches")).ToBeVisibleAsync();

        await visitor.GoAsync("/circuits");
        await Assertions.Expect(page.Locator("#circuit")).ToHaveValueAsync(Circuits.Ring);

        await ChooseAsync(page, Circuits.Ring.Replace("\"name\": \"gap\"", "\"name\": \"slot\"", StringComparison.Ordinal));
        await Assertions.Expect(page.Locator(".branches")).ToContainTextAsync("slot");
    }

    [Fact]
    public async Task Hostile_texts_are_answered_in_words_and_the_page_lives_on()
    {
        var visitor = await ComeAsync();
        var page = visitor.Page;
        await visitor.GoAsync("/circuits");
        (string Text, string Says)[] cases =
        [
            ("", "There is no text to solve."),
            ("{ \"frequency\": NaN }", "This is not JSON that can be read near line 1"),
            ("{\n\"frequency\": 5\u0001 }", "near line 2"),
            (new string('[', 100_000), "At most 32 levels of nesting"),
            (Circuits.Ring.Replace("\"core\", \"from\"", "\"gap\", \"from\"", StringComparison.Ordinal), "is used twice"),
            (Circuits.Ring.Replace("\"name\": \"gap\"", "\"name\": \"g\\u0000\"", StringComparison.Ordinal), "control or invisible characters"),
            (new string('1', 1_000_000), "has more than 150000 characters"),
        ];
        foreach (var (text, says) in cases)
        {
            await SolveAsync(page, text);
            await Assertions.Expect(page.Locator(".said")).ToContainTextAsync(says);
        }

        await ChooseAsync(page, new string(' ', 10 * 1024 * 1024));
        await Assertions.Expect(page.Locator(".said")).ToContainTextAsync("at most 1024 KiB are read");
        await SolveAsync(page, Circuits.Ring);
        await Assertions.Expect(page.Locator(".branches")).ToBeVisibleAsync();
    }

    private static async Task SolveAsync(IPage page, string text)
    {
        // As a paste does it: what is longer than the field takes is cut there.
        await page.Locator("#circuit").EvaluateAsync("(field, text) => { field.value = text.slice(0, field.maxLength); field.dispatchEvent(new Event('change', { bubbles: true })); }", text);
        await page.GetByRole(AriaRole.Button, new() { Name = "Solve", Exact = true }).ClickAsync();
    }

    private static Task ChooseAsync(IPage page, string text) =>
        page.Locator("#circuit-file").SetInputFilesAsync(new FilePayload { Name = "case.json", MimeType = "application/json", Buffer = Encoding.UTF8.GetBytes(text) });
}
