using System.Globalization;
using CoreDesign.Estimating.Circuits;
using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Estimate;
using CoreDesign.Web.Features.Steels;
using Microsoft.AspNetCore.Http.HttpResults;

namespace CoreDesign.Web.Features.Estimates;

/// <summary>Solve without storing: a design's figures, and any magnetic circuit.</summary>
public static class EstimatesApi
{
    public static void MapEstimatesApi(this IEndpointRouteBuilder routes)
    {
        var estimates = routes.MapGroup("/api").WithTags("Estimates");
        estimates.MapPost("/estimates", Estimate).WithName("EstimateDesign")
            .WithSummary("The no-load figures of a design; nothing is stored")
            .WithDescription("What is left open and has a stated default is taken by it; the answer repeats every value used and lists the derived ones.")
            .ProducesProblem(400).ProducesProblem(413).ProducesProblem(415).ProducesProblem(422);
        estimates.MapPost("/studies", Study).WithName("StudyDesign")
            .WithSummary("The figures of a design with its voltage curve and what would help; nothing is stored")
            .ProducesProblem(400).ProducesProblem(413).ProducesProblem(415).ProducesProblem(422);
        estimates.MapPost("/circuits", Circuit).WithName("SolveCircuit")
            .WithSummary("The periodic steady state of any magnetic circuit")
            .WithDescription($"At most 200 branches and 12 windings, {TimedSolve.Circuit.TotalSeconds} s. Query pointsPerPeriod: even, 256 to 4096.")
            .ProducesProblem(400).ProducesProblem(413).ProducesProblem(415).ProducesProblem(422);
    }

    private static Results<Ok<EstimateResult>, ProblemHttpResult> Estimate(JsonBody<DesignInput> body, SteelShelf steels, CancellationToken cancel) =>
        body.Problem is { } problem ? problem : TimedSolve.Run(TimedSolve.Estimate, limit => EstimateDesign.Run(body.Value!, steels.Current, limit), cancel).ToResult();

    private static Results<Ok<Study>, ProblemHttpResult> Study(JsonBody<DesignInput> body, SteelShelf steels, CancellationToken cancel) =>
        body.Problem is { } problem ? problem : TimedSolve.Run(TimedSolve.Study, limit => StudyDesign.Run(body.Value!, steels.Current, limit), cancel).ToResult();

    private static Results<Ok<CircuitAnswer>, ProblemHttpResult> Circuit(JsonBody<CircuitCase> body, string? pointsPerPeriod, CancellationToken cancel)
    {
        if (body.Problem is { } problem)
        {
            return problem;
        }

        var points = SolveCircuit.DefaultPoints;
        if (pointsPerPeriod is { } text && !int.TryParse(text, NumberStyles.None, CultureInfo.InvariantCulture, out points))
        {
            return Problems.Refused("pointsPerPeriod", $"'{text[..Math.Min(40, text.Length)]}' is not a whole number. Give an even number from 256 to 4096, or leave it out.");
        }

        return TimedSolve.Run(TimedSolve.Circuit, limit => SolveCircuit.Run(body.Value!, points, limit), cancel).ToResult();
    }
}
