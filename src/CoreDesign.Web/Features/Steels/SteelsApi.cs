using System.Text;
using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Steels.Import;
using Microsoft.AspNetCore.Http.HttpResults;
using Microsoft.AspNetCore.Mvc;

namespace CoreDesign.Web.Features.Steels;

/// <summary>Grades with their curves, and the import of a works' own data.</summary>
public static class SteelsApi
{
    private const string Csv = "text/csv";

    public static void AddSteels(this WebApplicationBuilder builder)
    {
        builder.Services.AddSingleton<SteelShelf>();
        builder.Services.AddHostedService(services => services.GetRequiredService<SteelShelf>());
    }

    public static void MapSteelsApi(this IEndpointRouteBuilder routes)
    {
        var steels = routes.MapGroup("/api/steels").WithTags("Steels");
        steels.MapGet("/", (SteelShelf shelf) => new SteelListAnswer(shelf.Current.Revision, [.. shelf.Current.All.Select(SteelSummary.From)]))
            .WithName("ListSteels").WithSummary("All grades with what is guaranteed of them");
        steels.MapGet("/{grade}", Find)
            .WithName("GetSteel").WithSummary("A grade with its figures, their sources, and its curves along and across rolling")
            .ProducesProblem(404);
        steels.MapPost("/import", ImportAsync)
            .WithName("ImportSteel").WithSummary("Check a works' own steel data, and keep them with commit=true")
            .WithDescription("Body: the CSV file, at most 2 MiB. Without commit=true it is only checked. Nothing is stored unless the file is whole.")
            .Accepts<string>(Csv)
            .ProducesProblem(400).ProducesProblem(409).ProducesProblem(413).ProducesProblem(415);
        steels.MapGet("/import/template.csv", Template)
            .WithName("SteelImportTemplate").WithSummary("An example of the import format; decimal=comma gives semicolons and decimal commas")
            .Produces<string>(200, Csv).ProducesProblem(400);
    }

    private static Results<Ok<SteelAnswer>, ProblemHttpResult> Find(string grade, SteelShelf shelf)
    {
        var catalog = shelf.Current;

        // The server leaves %2F in a route value as it is, since a slash would part it; a steel's name may hold one.
        return catalog.TryFind(grade, out var found) || catalog.TryFind(grade.Replace("%2F", "/", StringComparison.OrdinalIgnoreCase), out found)
            ? TypedResults.Ok(SteelAnswer.From(found))
            : Problems.NotFound($"There is no steel \"{Cut(grade)}\". Nearest names: {string.Join(", ", catalog.Nearest(Cut(grade), 3))}.");
    }

    private static async Task<Results<Ok<SteelImportAnswer>, Created<SteelImportAnswer>, ProblemHttpResult>> ImportAsync(
        HttpRequest request, SteelShelf shelf, CancellationToken cancel, string? commit = null)
    {
        if (commit is not (null or "true" or "false"))
            return Problems.Refused("commit", $"'{Cut(commit)}' is given; true or false is needed.");
        if (!IsCsv(request.ContentType))
            return Problems.Plain(StatusCodes.Status415UnsupportedMediaType, "The file is not CSV.", $"The content type is \"{Cut(request.ContentType ?? "")}\"; send the file as {Csv}.");
        if (await BoundedBody.ReadAsync(request, cancel, SteelImport.MaxBytes) is not { } bytes)
            return BoundedBody.TooLarge(SteelImport.MaxBytes);

        var preview = SteelImport.Read(bytes, fileName: null);
        if (preview.Grade is not { } grade) return NotWhole(preview);
        if (commit != "true") return TypedResults.Ok(new SteelImportAnswer(Stored: false, preview.ReadAs, preview.Warnings, SteelAnswer.From(grade)));

        var kept = await shelf.KeepAsync(grade, cancel);
        return kept.NameTaken
            ? Problems.Plain(StatusCodes.Status409Conflict, "The name is taken.", TakenText(grade.Name))
            : TypedResults.Created($"/api/steels/{Uri.EscapeDataString(grade.Name)}", new SteelImportAnswer(Stored: true, preview.ReadAs, preview.Warnings, SteelAnswer.From(grade)));
    }

    /// <summary>Said on the page and by the API where other data are kept under the same name.</summary>
    public static string TakenText(string name) =>
        $"Other data are already kept as \"{name}\"; they stay as they are, because designs may rest on them. Give the new data a name of their own, the coil or certificate number for one.";

    private static Results<FileContentHttpResult, ProblemHttpResult> Template(string? @decimal = null)
    {
        if (@decimal is not (null or "point" or "comma"))
            return Problems.Refused("decimal", $"'{Cut(@decimal)}' is given; point or comma is needed.");
        var text = @decimal == "comma" ? SteelImport.TemplateWithDecimalComma : SteelImport.Template;
        return TypedResults.File(Encoding.UTF8.GetBytes(text), Csv + "; charset=utf-8", "steel-template.csv");
    }

    private static ProblemHttpResult NotWhole(SteelImportPreview preview)
    {
        var byPlace = preview.Errors
            .GroupBy(p => (p.Line, p.Column) switch
            {
                ({ } line, { } column) => $"line {line}, {column}",
                ({ } line, null) => $"line {line}",
                (null, { } column) => column,
                _ => "file",
            })
            .ToDictionary(g => g.Key, g => g.Select(p => p.Message).ToArray(), StringComparer.Ordinal);
        var problem = new HttpValidationProblemDetails(byPlace)
        {
            Status = StatusCodes.Status400BadRequest,
            Title = "The file can't be taken as it is; nothing was stored.",
            Detail = preview.Errors.Count == 1 ? preview.Errors[0].Message : $"{preview.Errors.Count} places need a change; see errors.",
        };
        problem.Extensions["problems"] = preview.Errors;
        problem.Extensions["warnings"] = preview.Warnings;
        return TypedResults.Problem(problem);
    }

    private static bool IsCsv(string? contentType) =>
        contentType?.Split(';')[0].Trim().Equals(Csv, StringComparison.OrdinalIgnoreCase) == true;

    private static string Cut(string text) => text.Length <= 60 ? text : text[..60] + "…";
}
