using CoreDesign.Estimating.Contracts;
using CoreDesign.Magnetics.Cores;
using CoreDesign.Magnetics.Excitation;
using CoreDesign.Magnetics.Geometry;

namespace CoreDesign.Estimating.Estimate;

/// <summary>The parts of a solved core, each by itself: limbs, yokes, corners and T zones by name, then the joints.</summary>
internal static class PartShape
{
    public static IReadOnlyList<PartResult> Of(CoreSolution core, double density_kg_m3)
    {
        var steel = core.Core.Geometry.Parts.ToDictionary(p => p.Name, StringComparer.Ordinal);
        return [.. core.Core.Parts.Select(p => Part(core, p.Part, p.Branches, steel.GetValueOrDefault(p.Part), density_kg_m3))];
    }

    /// <summary>The part with the highest peak flux density.</summary>
    public static (string Part, double Peak_T) Worst(CoreSolution core) =>
        core.Core.Parts
            .Where(p => core.Core.Geometry.Parts.Any(g => g.Name == p.Part))
            .Select(p => (p.Part, Peak_T: Peak(core, p.Branches)))
            .MaxBy(p => p.Peak_T);

    private static PartResult Part(CoreSolution core, string name, int[] branches, CorePart? steel, double density_kg_m3)
    {
        return new PartResult
        {
            Name = name,
            Kind = steel?.Kind switch
            {
                CorePartKind.Limb => "limb",
                CorePartKind.Yoke => "yoke",
                CorePartKind.Corner => "corner",
                CorePartKind.TZone => "tZone",
                _ => "joint",
            },
            Count = core.Core.Units,
            Area_mm2 = 1e6 * (steel?.NetArea_m2 ?? core.Core.Branches[branches[0]].Area_m2),
            Length_mm = 1000 * (steel?.Length_m ?? 0),
            Mass_kg = density_kg_m3 * (steel?.Volume_m3 ?? 0),
            PeakFluxDensity_T = Peak(core, branches),
            Loss_W = branches.Sum(core.Solution.BranchLoss_W),
            ExcitingPower_VA = branches.Sum(b => Waveform.Rms(core.Solution.Mmf_A[b]) * Math.Sqrt(core.Solution.MeanSquareRate(b))),
        };
    }

    private static double Peak(CoreSolution core, int[] branches) => branches.Max(core.Solution.PeakFluxDensity_T);
}
