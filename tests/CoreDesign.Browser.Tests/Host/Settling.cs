using Microsoft.Playwright;

namespace CoreDesign.Browser.Tests.Host;

/// <summary>Waiting for what a page itself shows, never for a time.</summary>
internal static class Settling
{
    // The page says so itself, once its parts were painted over the line to the server; what is typed before is lost.
    private const string IsLive = """
        () => document.readyState === 'complete' && document.fonts.status === 'loaded'
          && document.documentElement.dataset.live === 'true' && !document.querySelector('.loading')
        """;

    private const string IsAnswered = """
        () => {
          const page = document.querySelector('[data-design]');
          return page !== null && page.dataset.serial === page.dataset.answered;
        }
        """;

    /// <summary>The document is whole and its parts are live.</summary>
    public static Task SettledAsync(this IPage page) => page.WaitForFunctionAsync(IsLive);

    /// <summary>The design page shows the answer to the last edit.</summary>
    public static Task AnsweredAsync(this IPage page) => page.WaitForFunctionAsync(IsAnswered);

    /// <summary>The field of a path on the design page.</summary>
    public static ILocator Field(this IPage page, string path) => page.Locator($"[id=\"{path}\"]");
}
