using System.Text.Json;
using CoreDesign.Browser.Tests.Host;

namespace CoreDesign.Browser.Tests.Looks;

/// <summary>From a key in a field to the new verdict on screen, as the browser's own clock has it. Measured and left in artifacts, never judged here.</summary>
public sealed class LatencyTests(Site site) : BrowserTest(site)
{
    private const int WarmUp = 1;
    private const int Edits = 5;

    private static readonly JsonSerializerOptions Indented = new() { WriteIndented = true };

    // Each is stepped up by the arrow key, so that every edit asks for a design that was not solved before.
    private static readonly string[] Fields =
    [
        "core.limb.diameter_mm", "core.windowHeight_mm", "core.windowWidth_mm", "core.yoke.areaFactor",
        "joint.gap_mm", "joint.overlap_mm", "joint.positions", "excitedWinding.turns", "order.highestVoltage_percent", "model.buildingFactor", "model.temperature_C",
    ];

    private const string Watch = """
        () => {
          window.waits = [];
          let from = null;
          document.addEventListener('input', e => { if (e.target.closest('.fields')) from = performance.now(); }, true);
          const page = document.querySelector('[data-design]');
          new MutationObserver(() => {
            if (from === null || page.dataset.serial !== page.dataset.answered) return;
            const began = from;
            from = null;
            // The frame that shows the new verdict is painted between its callback and the next task.
            requestAnimationFrame(() => {
              const painted = new MessageChannel();
              painted.port1.onmessage = () => window.waits.push(performance.now() - began);
              painted.port2.postMessage(null);
            });
          }).observe(page, { attributes: true, attributeFilter: ['data-serial', 'data-answered'] });
        }
        """;

    [Fact]
    public async Task Edits_are_answered_and_their_times_kept()
    {
        var visitor = await ComeAsync();
        var page = visitor.Page;
        await visitor.GoAsync("/design?demo=station-1000");
        await page.AnsweredAsync();
        await page.EvaluateAsync(Watch);
        var times = new Dictionary<string, double[]>(StringComparer.Ordinal);
        var done = 0;
        foreach (var field in Fields)
        {
            await page.Field(field).FocusAsync();
            for (var i = 0; i < WarmUp + Edits; i++)
            {
                await page.Keyboard.PressAsync("ArrowUp");
                done++;
                await page.WaitForFunctionAsync("n => window.waits.length === n", done);
            }

            times[field] = (await page.EvaluateAsync<double[]>("() => window.waits"))[^Edits..];
        }

        Assert.Equal(0, await page.Locator("[data-design] [aria-invalid=true]").CountAsync());
        var all = times.Values.SelectMany(t => t).Order().ToList();
        var report = new
        {
            what = "ms from the input event in a field to the painted verdict, order HR-1042",
            n = all.Count,
            median_ms = Rank(all, 0.5),
            p90_ms = Rank(all, 0.9),
            max_ms = all[^1],
            load = File.Exists("/proc/loadavg") ? (await File.ReadAllTextAsync("/proc/loadavg")).Trim() : null,
            median_of_field_ms = times.ToDictionary(t => t.Key, t => Rank([.. t.Value.Order()], 0.5)),
        };
        await File.WriteAllTextAsync(Paths.Artifact("latency.json"), JsonSerializer.Serialize(report, Indented));
        Assert.Equal(Fields.Length * Edits, all.Count);
        Assert.True(all.Count >= 40, $"{all.Count} edits were measured; 40 are needed.");
        Assert.All(all, t => Assert.True(t > 0, $"An edit was answered in {t} ms."));
    }

    private static double Rank(List<double> sorted, double share) => Math.Round(sorted[(int)Math.Ceiling(share * sorted.Count) - 1], 1);
}
