using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Estimate;
using CoreDesign.History.Designs;
using CoreDesign.Magnetics;
using CoreDesign.Web.Platform;
using Microsoft.AspNetCore.Http.HttpResults;
using Microsoft.AspNetCore.Mvc;

namespace CoreDesign.Web.Features.Designs;

/// <summary>Designs and their revisions: list, open, save, copy, remark.</summary>
public static class DesignsApi
{
    public static void MapDesignsApi(this IEndpointRouteBuilder routes)
    {
        var designs = routes.MapGroup("/api/designs").WithTags("Designs");
        designs.MapGet("/", ListAsync).WithName("ListDesigns")
            .WithSummary("Search, filter and sort the designs")
            .WithDescription($"One line for the newest revision of each design, or for every revision with revisions=all. Sort keys: {string.Join(", ", DesignSort.Keys)}; a minus in front puts the largest first.")
            .ProducesProblem(400);
        designs.MapPost("/", DesignSaves.CreateAsync).WithName("CreateDesign")
            .WithSummary("Estimate a design and keep it as revision 1 of a new one")
            .WithDescription("The design is the body of an estimate. Title and note are optional; the order's reference stands in for a title. A design that can't be estimated is not stored.")
            .ProducesProblem(400).ProducesProblem(413).ProducesProblem(415).ProducesProblem(422);
        designs.MapGet("/{id}", FindAsync).WithName("GetDesign")
            .WithSummary("A design with its newest input and all its revisions")
            .ProducesProblem(404);
        designs.MapPut("/{id}", DesignSaves.SaveAsync).WithName("SaveDesign")
            .WithSummary("Estimate a changed design and keep it as its next revision")
            .WithDescription("The header If-Match names the revision that the change started from, in quotes. When another was saved since, nothing is stored and the answer (412) shows both.")
            .ProducesProblem(400).ProducesProblem(404).ProducesProblem(412).ProducesProblem(413).ProducesProblem(415).ProducesProblem(422).ProducesProblem(428)
            .WithMetadata(new IfMatchNeeded());
        designs.MapGet("/{id}/revisions/{number}", FindRevisionAsync).WithName("GetRevision")
            .WithSummary("A revision as it was saved: input, study, versions, remarks")
            .WithDescription("With today=true also what today's kernel gives for the same input.")
            .ProducesProblem(400).ProducesProblem(404);
        designs.MapPost("/{id}/copies", DesignSaves.CopyAsync).WithName("CopyDesign")
            .WithSummary("A new design that begins with a revision of this one")
            .ProducesProblem(400).ProducesProblem(404).ProducesProblem(413).ProducesProblem(415);
        designs.MapPost("/{id}/revisions/{number}/notes", DesignSaves.AddNoteAsync).WithName("AddNote")
            .WithSummary("Add a remark to a revision; the revision itself stays as it is")
            .ProducesProblem(400).ProducesProblem(404).ProducesProblem(413).ProducesProblem(415);
        routes.MapDraftsApi();
    }

    private static async Task<Results<Ok<DesignPage>, ProblemHttpResult>> ListAsync(
        string? search, string? state, string? steel, string? joint, string? sort, string? page, string? pageSize, string? revisions,
        DesignList list, CancellationToken cancel)
    {
        var query = DesignQuery.Read(search, state, steel, joint, sort, page, pageSize, revisions);
        return query.Value is { } read ? TypedResults.Ok(await list.FindAsync(read, cancel)) : query.ToProblem();
    }

    private static async Task<Results<Ok<DesignAnswer>, ProblemHttpResult>> FindAsync(string id, DesignStore store, HttpResponse response, CancellationToken cancel)
    {
        if (!DesignAddress.TryId(id, out var designId) || await store.FindAsync(designId, cancel) is not { } design) return DesignAddress.NoDesign(id);
        var newest = (await store.FindRevisionAsync(designId, design.Current.Revision, cancel))!;
        response.Headers.ETag = DesignAddress.Tag(design.Current.Revision);
        return TypedResults.Ok(new DesignAnswer
        {
            Id = design.Id,
            Revision = design.Current.Revision,
            Title = design.Current.Title,
            CreatedAt = design.CreatedAt,
            Current = design.Current,
            Design = newest.Input,
            Revisions = design.Revisions,
        });
    }

    private static async Task<Results<Ok<RevisionAnswer>, ProblemHttpResult>> FindRevisionAsync(
        string id, string number, string? today, DesignStore store, [FromServices] StudyOfDesign study, CancellationToken cancel)
    {
        if (today is not (null or "true" or "false")) return Problems.Refused("today", $"'{DesignAddress.Cut(today)}' is given; 'true' or 'false' is needed.");
        if (!DesignAddress.TryId(id, out var designId) || !DesignAddress.TryNumber(number, out var revision)
            || await store.FindRevisionAsync(designId, revision, cancel) is not { } found)
        {
            return DesignAddress.NoRevision(id, number);
        }

        return TypedResults.Ok(new RevisionAnswer
        {
            Id = designId,
            Revision = revision,
            Summary = found.Info,
            Design = found.Input,
            Study = found.Study,
            Versions = new VersionsAnswer(found.Info.KernelVersion, found.Info.SteelDataRevision, Kernel.Version, found.Info.KernelVersion == Kernel.Version),
            Notes = found.Remarks,
            Today = today == "true" ? Today(found, await study(found.Input, cancel)) : null,
        });
    }

    private static TodayAnswer Today(RevisionDetail then, Outcome<Study> solved)
    {
        var now = RevisionCheck.Of(then, new() { Value = solved.Value?.Estimate, Errors = solved.Errors, Unsolvable = solved.Unsolvable }).Today;
        return new TodayAnswer
        {
            KernelVersion = now.KernelVersion,
            SteelDataRevision = now.SteelDataRevision ?? "",
            NoLoadLoss_W = now.NoLoadLoss_W,
            NoLoadCurrent_percent = now.NoLoadCurrent_percent,
            MarginAtRated_percent = now.MarginAtRated_percent,
            Mass_kg = now.Mass_kg,
            SameFigures = now.Same,
            Refusal = now.Reason,
        };
    }
}
