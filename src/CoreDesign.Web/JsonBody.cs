using System.Reflection;
using CoreDesign.Estimating.Contracts;
using Microsoft.AspNetCore.Http.HttpResults;
using Microsoft.AspNetCore.Http.Metadata;

namespace CoreDesign.Web;

/// <summary>
/// A request body read by <see cref="DesignJson"/>: as a handler's parameter it holds the value, or the problem to
/// answer with. Used instead of the framework's own reading, which stops at the first misfit.
/// </summary>
public sealed class JsonBody<T> : IBindableFromHttpContext<JsonBody<T>>, IEndpointParameterMetadataProvider
    where T : class
{
    private JsonBody(T? value, ProblemHttpResult? problem)
    {
        Value = value;
        Problem = problem;
    }

    public T? Value { get; }

    /// <summary>Why there is no value; null when there is one.</summary>
    public ProblemHttpResult? Problem { get; }

    static async ValueTask<JsonBody<T>?> IBindableFromHttpContext<JsonBody<T>>.BindAsync(HttpContext context, ParameterInfo parameter)
    {
        var bytes = await BoundedBody.ReadAsync(context.Request, context.RequestAborted);
        if (bytes is null) return new JsonBody<T>(null, BoundedBody.TooLarge());
        var outcome = DesignJson.Read<T>(bytes);
        return new JsonBody<T>(outcome.Value, outcome.Ok ? null : outcome.ToProblem());
    }

    static void IEndpointParameterMetadataProvider.PopulateMetadata(ParameterInfo parameter, EndpointBuilder builder)
    {
        builder.Metadata.Add(new AcceptsMetadata(["application/json"], typeof(T)));
    }
}

/// <summary>Reads a request body up to a limit, whatever its stated length.</summary>
public static class BoundedBody
{
    public const int Limit_bytes = 1024 * 1024;

    /// <summary>Null when the body is longer than the limit; the rest is then left unread.</summary>
    public static async Task<byte[]?> ReadAsync(HttpRequest request, CancellationToken cancel, int limit_bytes = Limit_bytes)
    {
        ArgumentNullException.ThrowIfNull(request);
        if (request.ContentLength > limit_bytes) return null;
        using var all = new MemoryStream();
        var block = new byte[16 * 1024];
        int count;
        while ((count = await request.Body.ReadAsync(block, cancel)) > 0)
        {
            if (all.Length + count > limit_bytes) return null;
            all.Write(block, 0, count);
        }

        return all.ToArray();
    }

    public static ProblemHttpResult TooLarge(int limit_bytes = Limit_bytes) => Problems.Plain(
        StatusCodes.Status413PayloadTooLarge,
        "The request is too large.",
        $"A body may have at most {limit_bytes / 1024} KiB. Send less at once.");
}
