using System.Globalization;
using CoreDesign.Estimating.Demo;
using CoreDesign.History.Designs;
using CoreDesign.History.Model;
using CoreDesign.Sheets.Design;
using CoreDesign.Sheets.Pdf;
using CoreDesign.Web.Features.Designs;
using Microsoft.AspNetCore.Http.HttpResults;

namespace CoreDesign.Web.Features.Sheets;

/// <summary>Printed sheets of a stored revision, from what was stored with it: the same bytes at every call.</summary>
public static class SheetsApi
{
    private const string DesignKind = "design";

    public static void MapSheetsApi(this IEndpointRouteBuilder routes) =>
        routes.MapGet("/api/designs/{id}/revisions/{number}/sheets/{kind}.pdf", SheetAsync).WithTags("Sheets").WithName("GetSheet")
            .WithSummary("A sheet of a revision as PDF")
            .WithDescription("Kinds: design. Paper: a4 (first-angle symbol) or letter (third-angle symbol).")
            .Produces<byte[]>(200, "application/pdf")
            .ProducesProblem(400).ProducesProblem(404);

    private static async Task<Results<FileContentHttpResult, ProblemHttpResult>> SheetAsync(
        string id, string number, string kind, string? paper, string? download, DesignStore store, IConfiguration settings, HttpResponse response, CancellationToken cancel)
    {
        PaperSize? size = paper switch { null or "a4" => PaperSize.A4, "letter" => PaperSize.Letter, _ => null };
        if (size is null)
        {
            return Problems.Refused("paper", $"'{DesignAddress.Cut(paper!)}' is not a paper size here. Give a4 or letter.");
        }

        if (!DesignAddress.TryId(id, out var designId) || !DesignAddress.TryNumber(number, out var revision)
            || await store.FindRevisionAsync(designId, revision, cancel) is not { } found)
        {
            return DesignAddress.NoRevision(id, number);
        }

        if (kind != DesignKind)
        {
            return Problems.NotFound($"There is no sheet '{DesignAddress.Cut(kind)}'. Sheets: {DesignKind}.");
        }

        // Opened in the browser's own viewer unless a download is asked for; named by number alone, whatever the title holds.
        var request = Request(found, size.Value, settings["CoreDesign:LegalOwner"]);
        var name = string.Create(CultureInfo.InvariantCulture, $"{request.DocumentNumber}-rev{revision}-{(size == PaperSize.A4 ? "a4" : "letter")}.pdf");
        response.Headers.ContentDisposition = $"{(download is null ? "inline" : "attachment")}; filename=\"{name}\"";
        return TypedResults.Bytes(DesignSheet.Render(request), "application/pdf");
    }

    private static SheetRequest Request(RevisionDetail found, PaperSize paper, string? owner)
    {
        var demo = DemoOrders.All.FirstOrDefault(d => d.Design.Order?.Reference is { Length: > 0 } r && r == found.Info.Reference);
        return new SheetRequest
        {
            Study = found.Study,
            DocumentNumber = string.Create(CultureInfo.InvariantCulture, $"CD-{found.Info.Id:00000}"),
            Title = found.Info.Title,
            Revision = found.Info.Revision,
            IssuedAt = new DateTimeOffset(DateTime.SpecifyKind(found.Info.CreatedAt, DateTimeKind.Utc)),
            State = found.Info.State.Name(),
            Author = found.Info.Author,
            LegalOwner = demo is not null ? "Halden Ridge (invented works)" : string.IsNullOrWhiteSpace(owner) ? "not set (CoreDesign:LegalOwner)" : owner.Trim(),
            Paper = paper,
            InventedDemo = demo is not null,
            Note = found.Info.Note,
        };
    }
}
