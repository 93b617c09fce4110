using Microsoft.AspNetCore.Diagnostics.HealthChecks;
using Microsoft.AspNetCore.ResponseCompression;

namespace CoreDesign.Web.Platform;

/// <summary>The pages and what surrounds them: errors in plain words, compression, health, the API's description.</summary>
public static class Pages
{
    /// <summary>Tag of the health checks that <c>/health/ready</c> asks; <c>/health/live</c> asks none.</summary>
    public const string ReadyTag = "ready";

    /// <summary>Largest message of a page: the longest text a field takes, with room for what encloses it. A longer one would end the page.</summary>
    private const int LargestMessage_bytes = 1024 * 1024;

    public static void AddPages(this WebApplicationBuilder builder)
    {
        var services = builder.Services;
        services.AddRazorComponents().AddInteractiveServerComponents().AddHubOptions(o => o.MaximumReceiveMessageSize = LargestMessage_bytes);
        services.AddApiDescription();
        services.AddHealthChecks();
        services.AddResponseCompression(o => o.MimeTypes = [.. ResponseCompressionDefaults.MimeTypes, "image/svg+xml", "application/problem+json"]);

        // A request that can't be read is answered 400 under every environment, not thrown.
        services.Configure<RouteHandlerOptions>(o => o.ThrowOnBadRequest = false);
        builder.WebHost.ConfigureKestrel(o => o.AddServerHeader = false);

        // Static assets lie beside the build output until they are published; without this only Development would find them.
        builder.WebHost.UseStaticWebAssets();
    }

    public static void UsePages(this WebApplication app)
    {
        app.UseSecurityHeaders();
        app.UseResponseCompression();
        app.UseWhen(context => !IsApi(context), pages =>
        {
            pages.UseExceptionHandler("/error", createScopeForErrors: true);
            pages.UseStatusCodePagesWithReExecute("/not-found", createScopeForStatusCodePages: true);
        });
        app.UseRouting();
        app.UseAntiforgery();
    }

    public static void MapPages(this WebApplication app)
    {
        app.MapStaticAssets();
        app.MapRazorComponents<App>().AddInteractiveServerRenderMode(o => o.ContentSecurityFrameAncestorsPolicy = null);
        app.MapGet("/", () => TypedResults.Redirect("/design")).ExcludeFromDescription();
        app.MapOpenApi();
        app.MapHealthChecks("/health/live", new HealthCheckOptions { Predicate = _ => false });
        app.MapHealthChecks("/health/ready", new HealthCheckOptions { Predicate = check => check.Tags.Contains(ReadyTag) });
    }

    private static bool IsApi(HttpContext context) =>
        context.Request.Path.StartsWithSegments("/api", StringComparison.OrdinalIgnoreCase)
        || context.Request.Path.StartsWithSegments("/health", StringComparison.OrdinalIgnoreCase)
        || context.Request.Path.StartsWithSegments("/openapi", StringComparison.OrdinalIgnoreCase);
}
