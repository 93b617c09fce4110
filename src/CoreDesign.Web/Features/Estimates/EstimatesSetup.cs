using CoreDesign.Estimating.Circuits;
using CoreDesign.Estimating.Estimate;
using CoreDesign.Estimating.Margins;
using CoreDesign.Web.Features.Circuits;
using CoreDesign.Web.Features.Design;
using CoreDesign.Web.Features.Designs;
using CoreDesign.Web.Features.Steels;

namespace CoreDesign.Web.Features.Estimates;

/// <summary>Ties the estimating use cases, with the steels of this works, to the pages and the API that call them.</summary>
public static class EstimatesSetup
{
    public static void AddEstimates(this WebApplicationBuilder builder)
    {
        ArgumentNullException.ThrowIfNull(builder);
        builder.Services.AddSingleton<StudyOfDesign>(services =>
        {
            var steels = services.GetRequiredService<SteelShelf>();
            return (design, cancel) => Task.Run(() => TimedSolve.Run(TimedSolve.Study, limit => StudyDesign.Run(design, steels.Current, limit), cancel), cancel);
        });
        builder.Services.AddSingleton(new CircuitEngine(SolveCircuit.Run));
        builder.Services.AddSingleton(services =>
        {
            var steels = services.GetRequiredService<SteelShelf>();
            return new DesignEngine
            {
                Estimate = (design, cancel) => EstimateDesign.Run(design, steels.Current, cancel),
                Levers = (design, now, cancel) => Levers.Solve(design, now, steels.Current, cancel),
                VoltageCurve = (design, _, cancel) => VoltageSweep.Run(design, steels.Current, cancel).Value ?? [],
                Margins = (design, cancel) => StudyMargins.Run(design, steels.Current, cancel).Value,
                Steels = () => steels.Current,
            };
        });
    }
}
