using Microsoft.AspNetCore.Routing.Template;

namespace CoreDesign.Web.Platform;

/// <summary>
/// An address of the API that answers to other methods than the one asked is 405 and says which. The files of the pages are found by an
/// address for anything, so that routing alone calls a GET there not found, and counts GET among the methods of every address.
/// </summary>
internal static class ApiMethods
{
    public static void UseApiMethods(this IApplicationBuilder api) => api.Use(async (context, next) =>
    {
        await next(context);
        if (context.Response.HasStarted || context.Response.StatusCode is not (StatusCodes.Status404NotFound or StatusCodes.Status405MethodNotAllowed) || IsApi(context.GetEndpoint()))
        {
            return;
        }

        var methods = Of(context).Distinct(StringComparer.Ordinal).Order(StringComparer.Ordinal).ToArray();
        if (methods.Length == 0) return;
        context.Response.StatusCode = StatusCodes.Status405MethodNotAllowed;
        context.Response.Headers.Allow = string.Join(", ", methods);
    });

    private static IEnumerable<string> Of(HttpContext context) => context.RequestServices.GetRequiredService<EndpointDataSource>().Endpoints
        .Where(IsApi).Cast<RouteEndpoint>()
        .Where(e => new TemplateMatcher(TemplateParser.Parse(Text(e)), []).TryMatch(context.Request.Path, []))
        .SelectMany(e => e.Metadata.GetMetadata<IHttpMethodMetadata>()?.HttpMethods ?? []);

    private static bool IsApi(Endpoint? endpoint) => endpoint is RouteEndpoint route && Text(route).StartsWith("api/", StringComparison.Ordinal);

    private static string Text(RouteEndpoint endpoint) => (endpoint.RoutePattern.RawText ?? "").TrimStart('/');
}
