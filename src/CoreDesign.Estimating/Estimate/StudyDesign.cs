using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Margins;
using CoreDesign.Estimating.Steels;

namespace CoreDesign.Estimating.Estimate;

/// <summary>Use case: a design in, the whole study out: estimate, voltage curve, levers and margins. What a revision stores.</summary>
public static class StudyDesign
{
    public static Outcome<Study> Run(DesignInput design, SteelCatalog steels, CancellationToken cancel = default) =>
        EstimateDesign.Prepare(design, steels, core =>
        {
            var estimate = EstimateShape.Of(core, cancel);
            return new Study
            {
                Estimate = estimate,
                VoltageCurve = VoltageSweep.Of(core, cancel),
                Levers = Levers.Solve(design, estimate, steels, cancel),
                Margins = StudyMargins.Of(core, cancel),
            };
        });
}
