using System.Globalization;
using CoreDesign.Estimating.Contracts;
using CoreDesign.History;
using CoreDesign.History.Designs;
using Microsoft.AspNetCore.Http.HttpResults;
using Microsoft.AspNetCore.Mvc;

namespace CoreDesign.Web.Features.Designs;

/// <summary>The endpoints that add something to the history.</summary>
internal static class DesignSaves
{
    public static async Task<Results<Created<RevisionInfo>, ProblemHttpResult>> CreateAsync(
        JsonBody<SaveDesignRequest> body, DesignStore store, HistorySettings settings, [FromServices] StudyOfDesign study, HttpResponse response, CancellationToken cancel)
    {
        if (body.Value is not { } request) return body.Problem!;
        var title = request.Title ?? request.Design?.Order?.Reference;
        if (Check(request, title) is { } refused) return refused;
        var outcome = await study(request.Design!, cancel);
        if (outcome.Value is not { } found) return outcome.ToProblem("design");
        var saved = await store.CreateAsync(new NewRevision(title!.Trim(), request.Note ?? "", settings.Author, request.Design!, found), cancel);
        return Created(saved, response);
    }

    public static async Task<Results<Ok<RevisionInfo>, ProblemHttpResult>> SaveAsync(
        string id, JsonBody<SaveDesignRequest> body, DesignStore store, HistorySettings settings, [FromServices] StudyOfDesign study, HttpContext context, CancellationToken cancel)
    {
        if (!DesignAddress.TryId(id, out var designId) || await store.FindAsync(designId, cancel) is not { } design) return DesignAddress.NoDesign(id);
        if (DesignAddress.ReadIfMatch(context.Request, out var startedFrom) is { } header) return header;
        if (body.Value is not { } request) return body.Problem!;
        var title = request.Title ?? design.Current.Title;
        if (Check(request, title) is { } refused) return refused;

        // Asked before the estimate as well: a save that can't succeed need not wait for one.
        if (design.Current.Revision != startedFrom)
            return Stale(startedFrom, title, request, (await store.FindRevisionAsync(designId, design.Current.Revision, cancel))!);

        var outcome = await study(request.Design!, cancel);
        if (outcome.Value is not { } found) return outcome.ToProblem("design");
        var result = await store.SaveAsync(designId, startedFrom, new NewRevision(title.Trim(), request.Note ?? "", settings.Author, request.Design!, found), cancel);
        switch (result)
        {
            case SaveResult.Saved saved:
                context.Response.Headers.ETag = DesignAddress.Tag(saved.Revision.Revision);
                return TypedResults.Ok(saved.Revision);
            case SaveResult.Conflict conflict:
                return Stale(startedFrom, title, request, conflict.Current);
            default:
                return DesignAddress.NoDesign(id);
        }
    }

    public static async Task<Results<Created<RevisionInfo>, ProblemHttpResult>> CopyAsync(
        string id, JsonBody<CopyDesignRequest> body, DesignStore store, HistorySettings settings, HttpResponse response, CancellationToken cancel)
    {
        if (!DesignAddress.TryId(id, out var designId) || await store.CurrentRevisionAsync(designId, cancel) is not { } newest) return DesignAddress.NoDesign(id);
        if (body.Value is not { } request) return body.Problem!;
        if (request.Title is not null && HistoryText.CheckTitle(request.Title) is { } refused) return Problems.Refused([refused]);
        var revision = request.Revision ?? newest;
        var copy = await store.CopyAsync(designId, revision, settings.Author, request.Title?.Trim(), cancel);
        return copy is null
            ? DesignAddress.NoRevision(id, revision.ToString(CultureInfo.InvariantCulture))
            : Created(copy, response);
    }

    public static async Task<Results<Created<Remark>, ProblemHttpResult>> AddNoteAsync(
        string id, string number, JsonBody<AddNoteRequest> body, DesignStore store, HistorySettings settings, CancellationToken cancel)
    {
        if (!DesignAddress.TryId(id, out var designId) || !DesignAddress.TryNumber(number, out var revision)) return DesignAddress.NoRevision(id, number);
        if (body.Value is not { } request) return body.Problem!;
        if (HistoryText.CheckRemark(request.Text) is { } refused) return Problems.Refused([refused]);
        return await store.AddRemarkAsync(designId, revision, request.Text!, settings.Author, cancel) is { } added
            ? TypedResults.Created(string.Create(CultureInfo.InvariantCulture, $"{DesignAddress.Of(designId)}/revisions/{revision}"), added)
            : DesignAddress.NoRevision(id, number);
    }

    private static ProblemHttpResult? Check(SaveDesignRequest request, string? title)
    {
        var errors = new List<FieldError>();
        if (HistoryText.CheckTitle(title) is { } badTitle) errors.Add(badTitle);
        if (HistoryText.CheckNote(request.Note) is { } badNote) errors.Add(badNote);
        if (request.Design is null) errors.Add(new FieldError("design", "The design is missing. Send the body of an estimate here."));
        return errors.Count == 0 ? null : Problems.Refused(errors);
    }

    private static Created<RevisionInfo> Created(RevisionInfo saved, HttpResponse response)
    {
        response.Headers.ETag = DesignAddress.Tag(saved.Revision);
        return TypedResults.Created(DesignAddress.Of(saved.Id), saved);
    }

    // Both sides, so that whoever comes second can choose field by field and save again on top.
    private static ProblemHttpResult Stale(int startedFrom, string title, SaveDesignRequest yours, RevisionDetail theirs)
    {
        var problem = new ProblemDetails
        {
            Status = StatusCodes.Status412PreconditionFailed,
            Title = "Another revision was saved in the meantime; yours was not stored.",
            Detail = string.Create(CultureInfo.InvariantCulture, $"You started from revision {startedFrom}; the newest is {theirs.Info.Revision}, by {theirs.Info.Author}. Compare, then save again with If-Match: \"{theirs.Info.Revision}\"."),
        };
        problem.Extensions["current"] = theirs.Info;
        problem.Extensions["yours"] = new SaveDesignRequest { Title = title, Note = yours.Note, Design = yours.Design };
        problem.Extensions["theirs"] = new SaveDesignRequest { Title = theirs.Info.Title, Note = theirs.Info.Note, Design = theirs.Input };
        problem.Extensions["differences"] = InputDifferences.Between(yours.Design!, theirs.Input);
        return TypedResults.Problem(problem);
    }
}
