using CoreDesign.Estimating.Contracts;
using CoreDesign.Web.Platform;
using Microsoft.AspNetCore.Diagnostics;
using Microsoft.AspNetCore.Http.HttpResults;
using Microsoft.AspNetCore.Http.Metadata;
using Microsoft.AspNetCore.Mvc;

namespace CoreDesign.Web;

/// <summary>Everything the API refuses leaves as problem details (RFC 9457), in the same words as on the page.</summary>
public static class Problems
{
    private const int MostErrors = 100;

    /// <summary>The answer to an outcome: 200 with the value, 400 with every field's message, or 422 with reason and residual.</summary>
    public static Results<Ok<T>, ProblemHttpResult> ToResult<T>(this Outcome<T> outcome)
        where T : class =>
        outcome.Value is { } value ? TypedResults.Ok(value) : outcome.ToProblem();

    /// <summary>The problem of an outcome that has no value. Paths are put under <paramref name="prefix"/>, where the design is a member of a larger body.</summary>
    public static ProblemHttpResult ToProblem<T>(this Outcome<T> outcome, string prefix = "")
        where T : class
    {
        ArgumentNullException.ThrowIfNull(outcome);
        if (outcome.Errors.Count > 0) return Refused(outcome.Errors, prefix);
        var reason = outcome.Unsolvable ?? throw new ArgumentException("The outcome has a value: there is no problem to report.", nameof(outcome));
        return Unsolvable(reason);
    }

    /// <summary>400: unreadable or out of range. One entry per path, in the order found.</summary>
    public static ProblemHttpResult Refused(IReadOnlyList<FieldError> errors, string prefix = "")
    {
        if (errors.Count > MostErrors)
            errors = [.. errors.Take(MostErrors), new FieldError("$", $"And {errors.Count - MostErrors} more. Mend these first.")];
        var byPath = errors
            .GroupBy(e => Under(prefix, e.Path), StringComparer.Ordinal)
            .ToDictionary(g => g.Key, g => g.Select(e => e.Message).ToArray(), StringComparer.Ordinal);
        return TypedResults.Problem(new HttpValidationProblemDetails(byPath)
        {
            Status = StatusCodes.Status400BadRequest,
            Title = "The request can't be taken as it is.",
            Detail = byPath.Count == 1 ? errors[0].Message : $"{byPath.Count} fields need a change; see errors.",
        });
    }

    public static ProblemHttpResult Refused(string path, string message) => Refused([new FieldError(path, message)]);

    /// <summary>422: readable, but without a solution.</summary>
    public static ProblemHttpResult Unsolvable(Unsolvable reason)
    {
        ArgumentNullException.ThrowIfNull(reason);
        return Plain(
            StatusCodes.Status422UnprocessableEntity,
            "The design can't be solved.",
            reason.Reason,
            reason.Residual is { } residual && double.IsFinite(residual) ? ("residual", residual) : null);
    }

    public static ProblemHttpResult NotFound(string detail) => Plain(StatusCodes.Status404NotFound, "Not found.", detail);

    /// <summary>Any other refusal, with at most one member of its own beside the standard ones.</summary>
    public static ProblemHttpResult Plain(int status, string title, string detail, (string Name, object Value)? extra = null)
    {
        var problem = new ProblemDetails { Status = status, Title = title, Detail = detail };
        if (extra is var (name, value)) problem.Extensions[name] = value;
        return TypedResults.Problem(problem);
    }

    /// <summary>Answers of the framework itself (404, 405, 415, 500) become problem details too; none shows a stack trace.</summary>
    public static void AddProblems(this WebApplicationBuilder builder)
    {
        ArgumentNullException.ThrowIfNull(builder);
        builder.Services.AddProblemDetails(o => o.CustomizeProblemDetails = context =>
            context.ProblemDetails.Detail ??= MendOf(context.ProblemDetails.Status, context.HttpContext.Request));
        builder.Services.ConfigureHttpJsonOptions(o => DesignJson.Configure(o.SerializerOptions));
    }

    /// <summary>For everything under /api; pages have their own error page.</summary>
    public static void UseProblems(this WebApplication app)
    {
        ArgumentNullException.ThrowIfNull(app);
        app.UseWhen(
            context => context.Request.Path.StartsWithSegments("/api", StringComparison.OrdinalIgnoreCase),
            api =>
            {
                api.UseExceptionHandler(failed => failed.Run(context => Failure(context).ExecuteAsync(context)));
                api.UseStatusCodePages();
                api.UseApiMethods();
            });
    }

    private static ProblemHttpResult Failure(HttpContext context) =>
        context.Features.Get<IExceptionHandlerFeature>()?.Error is BadHttpRequestException unreadable
            ? Plain(
                unreadable.StatusCode,
                "The request can't be read.",
                unreadable.StatusCode == StatusCodes.Status408RequestTimeout
                    ? "The body came too slowly. Send it again over a better line."
                    : "The body broke off, or does not come in the form that its headers say. Send it again whole.")
            : Plain(
                StatusCodes.Status500InternalServerError,
                "The service failed.",
                "An error of the service, not of the request; nothing was stored. The service's log holds the details.");

    private static string? MendOf(int? status, HttpRequest request) => status switch
    {
        StatusCodes.Status404NotFound => "Nothing answers at this address. /openapi/v1.json lists the addresses and their methods.",
        StatusCodes.Status405MethodNotAllowed => $"{Shown(request.Method)} is not possible at this address. /openapi/v1.json lists the methods.",
        StatusCodes.Status415UnsupportedMediaType =>
            $"The content type is '{Shown(request.ContentType ?? "")}'; here it must be {string.Join(" or ", request.HttpContext.GetEndpoint()?.Metadata.GetMetadata<IAcceptsMetadata>()?.ContentTypes ?? [request.Path.StartsWithSegments("/api/steels", StringComparison.OrdinalIgnoreCase) ? "text/csv" : "application/json"])}.",
        _ => null,
    };

    private static string Shown(string text) => text.Length <= 40 ? text : text[..40] + "…";

    private static string Under(string prefix, string path) =>
        prefix.Length == 0 ? path
        : path is "" or "$" ? prefix
        : path.StartsWith('[') ? prefix + path
        : $"{prefix}.{path}";
}
