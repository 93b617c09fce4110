using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Steels;
using CoreDesign.Magnetics;
using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Cores;
using CoreDesign.Magnetics.Excitation;
using CoreDesign.Magnetics.Geometry;

namespace CoreDesign.Estimating.Estimate;

/// <summary>Turns the steady state of a core into the figures of an estimate.</summary>
internal static class EstimateShape
{
    public const string MarginDefinition =
        "Saturation polarization at core temperature less the highest peak flux density of any part, over saturation polarization; per cent. At highest voltage it is told at the lowest frequency, where the core must carry most flux.";

    public static EstimateResult Of(CoreAtWork core, CancellationToken cancel)
    {
        var design = core.Design;
        var atRated = core.SolveAt(100, cancel);
        var atHighest = core.SolveAt(design.HighestVoltage_percent, design.LowestFrequency_Hz, cancel);
        var solution = atRated.Solution;
        var lines = CoreLines.Of(design, atRated, design.Excited);
        var current = lines.Average(l => Waveform.Rms(l.Current_A));
        var apparent = (design.Phases == 3 ? Math.Sqrt(3) : 1) * design.Supply.Voltage_V * current;
        var wound = "limb" + design.Geometry.Limbs.First(l => !l.IsReturn).Letter;
        var peakFlux = solution.PeakFluxDensity_T(atRated.Core.Parts.First(p => p.Part == wound).Branches[0]);
        return new EstimateResult
        {
            NoLoadLoss_W = solution.CoreLoss_W,
            NoLoadCurrent_A = current,
            NoLoadCurrent_percent = 100 * current / design.RatedCurrent_A,
            RatedCurrent_A = design.RatedCurrent_A,
            ExcitingPower_VA = apparent,
            PowerFactor = solution.TerminalPower_W / apparent,
            Lines = [.. lines.Select(Line)],
            Sides = SideShape.Of(core, atRated, cancel),
            Tertiary = SideShape.Tertiary(design, solution),
            Neutral = SideShape.Neutral(design, solution),
            Capacitive = SideShape.Capacitive(design),
            Limbs = [.. design.Geometry.Limbs.Select(l => Limb(atRated, l.Letter, PhaseOf(design, l)))],
            Parts = PartShape.Of(atRated, design.Steel.Density_kg_per_m3.Value),
            Shares = ShareShape.Of(atRated),
            Mass_kg = GeometryShape.Mass(design),
            Margin = Margin(core, atRated, atHighest),
            EnergyBalance = Balance(solution),
            Geometry = GeometryShape.Of(design),
            Joint = JointOf(core, peakFlux),
            Steel = SteelOf(core, peakFlux),
            Model = new ModelResult
            {
                BuildingFactor = design.BuildingFactor.Value,
                BuildingFactorSource = design.BuildingFactor.Source,
                Temperature_C = design.Temperature_C,
                PointsPerPeriod = CoreAtWork.PointsPerPeriod,
            },
            Inputs = design.Inputs,
            Derived = design.Derived,
            Warnings = [.. design.Warnings, .. EstimateWarnings.Of(core, atRated, atHighest)],
            Sources = EstimateSources.Of(core),
            KernelVersion = Kernel.Version,
            SteelDataRevision = SteelCatalog.RevisionOf(design.Steel),
        };
    }

    private static LineResult Line((string Name, double[] Current_A) line) => new()
    {
        Phase = line.Name,
        Rms_A = Waveform.Rms(line.Current_A),
        Peak_A = Waveform.Peak(line.Current_A),
        Harmonics = SideShape.Harmonics(line.Current_A),
        Waveform_A = line.Current_A,
    };

    private static string PhaseOf(ResolvedDesign design, CoreLimb limb) =>
        design.Phases == 1 ? "L" : design.Units == 3 ? "A" : limb.IsReturn ? "" : limb.Letter;

    private static LimbResult Limb(CoreSolution core, string letter, string phase)
    {
        var index = core.Core.Parts.First(p => p.Part == "limb" + letter).Branches[0];
        var branch = core.Solution.Circuit.Branches[index];
        return new LimbResult
        {
            Name = "limb" + letter,
            Phase = phase,
            FluxDensity_T = Array.ConvertAll(core.Solution.Flux_Wb[index], f => f / branch.Area_m2),
            FieldStrength_A_m = Array.ConvertAll(core.Solution.Mmf_A[index], f => f / branch.Length_m),
        };
    }

    private static MarginResult Margin(CoreAtWork core, CoreSolution atRated, CoreSolution atHighest)
    {
        var js = core.Sheet.SaturationPolarization_T;
        var (part, rated) = PartShape.Worst(atRated);
        var (_, highest) = PartShape.Worst(atHighest);
        return new MarginResult
        {
            AtRated_percent = 100 * (js - rated) / js,
            AtHighest_percent = 100 * (js - highest) / js,
            LowestFrequency_Hz = core.Design.LowestFrequency_Hz,
            WorstPart = part,
            PeakAtRated_T = rated,
            PeakAtHighest_T = highest,
            SaturationPolarization_T = js,
            Definition = MarginDefinition,
        };
    }

    private static EnergyBalanceResult Balance(CircuitSolution s)
    {
        var material = s.CoreLoss_W + s.CopperLoss_W;
        return new EnergyBalanceResult(s.TerminalPower_W, material, material > 0 ? Math.Abs(s.TerminalPower_W - material) / material : 0);
    }

    private static JointResult JointOf(CoreAtWork core, double peakFlux_T)
    {
        var spec = core.Design.Joint;
        var limbArea = core.Design.Geometry.NetLimbArea_m2;
        double Mmf(double b) => core.Joint is { } joint
            ? joint.Curve?.Mmf_A(b) ?? 0
            : b * core.Design.EffectiveGap_m!.Value / MagneticConstants.Mu0_H_per_m;
        return new JointResult
        {
            Type = core.Design.Inputs.Joint!.Type!,
            Positions = spec.Positions,
            SheetsPerPosition = spec.SheetsPerPosition,
            EffectiveGapUsed = core.Joint is null,
            PeakMmf_A = limbArea > 0 ? Mmf(peakFlux_T) : 0,
            BridgingFluxDensity_T = core.Joint?.Curve?.BridgingFluxDensity_T(peakFlux_T) ?? 0,
            Mmf = core.Joint is { } solved
                ? [.. solved.Table.FluxDensity_T.Select((b, i) => new JointPointResult(b, solved.Table.Mmf_A[i]))]
                : [new JointPointResult(1, Mmf(1)), new JointPointResult(2, Mmf(2))],
        };
    }

    private static SteelResult SteelOf(CoreAtWork core, double peakFlux_T)
    {
        var grade = core.Design.Steel;
        var sheet = core.Sheet.Sheet;
        return new SteelResult
        {
            Grade = grade.Name,
            Thickness_mm = grade.Thickness_mm.Value,
            Density_kg_m3 = grade.Density_kg_per_m3.Value,
            SaturationPolarization_T = grade.SaturationPolarization_T.Value,
            SheetLoss_W_kg = sheet.Loss.Loss_W_per_kg(peakFlux_T, sheet.Frequency_Hz),
            Standing = grade.Standing,
            StandingText = grade.StandingText,
        };
    }
}
