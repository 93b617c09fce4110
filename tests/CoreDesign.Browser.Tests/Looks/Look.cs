using CoreDesign.Browser.Tests.Host;
using Deque.AxeCore.Commons;
using Deque.AxeCore.Playwright;
using Microsoft.Playwright;

namespace CoreDesign.Browser.Tests.Looks;

/// <summary>How a page looks: what a person could not read, and what keeps some people out.</summary>
internal static class Look
{
    private static readonly Lazy<string> Fit = new(() => File.ReadAllText(Path.Combine(AppContext.BaseDirectory, "Looks", "fit.js")));

    // The drawing and the charts are made anew on the server for the room that they have; until then the old ones stand in it.
    private const string HasItsRoom = """
        () => {
          const near = (a, b) => Math.abs(a - b) < 2;
          const front = document.querySelector('[data-drawing] .front svg');
          if (front && !near(front.getBoundingClientRect().width, front.closest('[data-drawing]').clientWidth)) return false;
          return [...document.querySelectorAll('[data-evidence] .chart svg')].every(c => near(c.width.baseVal.value, Math.min(640, Math.max(220, c.closest('.fig').clientWidth))));
        }
        """;

    public static async Task ResizeAsync(this IPage page, int width, int height)
    {
        await page.SetViewportSizeAsync(width, height);
        await page.RoomAsync();
    }

    /// <summary>Drawing and charts fill their columns.</summary>
    public static Task RoomAsync(this IPage page) => page.WaitForFunctionAsync(HasItsRoom);

    /// <summary>Text that is cut off, outside its place or over other text.</summary>
    public static async Task<IReadOnlyList<string>> MisfitsAsync(this IPage page) => await page.EvaluateAsync<string[]>(Fit.Value);

    /// <summary>Serious and critical violations of WCAG 2.2 AA and of good practice.</summary>
    public static Task<IReadOnlyList<string>> BarriersAsync(this IPage page) => BarriersAsync(page, new AxeRunOptions { ResultTypes = [ResultType.Violations] });

    /// <summary>The same of what depends on colour alone, for a second theme of a page whose structure was looked at already.</summary>
    public static Task<IReadOnlyList<string>> ColourBarriersAsync(this IPage page) =>
        BarriersAsync(page, new AxeRunOptions { ResultTypes = [ResultType.Violations], RunOnly = RunOnlyOptions.Rules("color-contrast", "link-in-text-block") });

    private static async Task<IReadOnlyList<string>> BarriersAsync(IPage page, AxeRunOptions options)
    {
        var result = await page.RunAxe(options);
        return
        [
            .. result.Violations.Where(v => v.Impact is "serious" or "critical")
                .SelectMany(v => v.Nodes.Take(3).Select(n => $"{v.Id} ({v.Impact}): {v.Help}: {n.Target}: {n.Html[..Math.Min(n.Html.Length, 160)]}")),
        ];
    }
}
