using Microsoft.Playwright;

namespace CoreDesign.Browser.Tests.Host;

/// <summary>Waiting for what a page itself shows, never for a time.</summary>
internal static class Settling
{
    // The server's markers for parts that are not yet live stand in comments until the line to the server is up.
    private const string IsLive = """
        () => {
          if (document.readyState !== 'complete' || document.fonts.status !== 'loaded') return false;
          const walker = document.createTreeWalker(document, NodeFilter.SHOW_COMMENT);
          while (walker.nextNode()) if (/^Blazor:\{.*"type":"server"/.test(walker.currentNode.data)) return false;
          return !document.querySelector('.loading');
        }
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
