using CoreDesign.Estimating.Contracts;

namespace CoreDesign.Web.Tests.Design;

/// <summary>An order and an answer of plausible shape; the figures are invented and mean nothing.</summary>
internal static class Samples
{
    public static DesignInput Input { get; } = new()
    {
        Order = new OrderInput { Reference = "HR-1042", Phases = 3, RatedPower_kVA = 1000, Frequency_Hz = 50, RatedVoltages_kV = [20, 0.4], HighestVoltage_percent = 110, AskedNoLoadLoss_W = 693, AskedNoLoadCurrent_percent = 0.3 },
        ExcitedWinding = new ExcitedWindingInput { Connection = "YN", LineVoltage_V = 400, Turns = 18 },
        Steel = new SteelInput { Grade = "M75-23P" },
        Core = new CoreInput { Form = "threeLimb", Limb = new LimbInput { Diameter_mm = 220, Steps = 2 }, WindowHeight_mm = 520, WindowWidth_mm = 190 },
        Joint = new JointInput { Type = "stepLap", Positions = 5, SheetsPerPosition = 1, Gap_mm = 0.3, Overlap_mm = 4 },
    };

    public static EstimateResult Estimate { get; } = new()
    {
        NoLoadLoss_W = 674,
        NoLoadCurrent_percent = 0.2,
        NoLoadCurrent_A = 2.9,
        RatedCurrent_A = 1443,
        ExcitingPower_VA = 1991,
        PowerFactor = 0.34,
        Lines = [],
        Limbs = [],
        Parts = [],
        Shares = [],
        Mass_kg = new MassResult(408, 209, 293, 910),
        Margin = new MarginResult { AtRated_percent = 16.7, AtHighest_percent = 8.4, WorstPart = "limbA", PeakAtRated_T = 1.69, PeakAtHighest_T = 1.86, SaturationPolarization_T = 2.03, Definition = "" },
        EnergyBalance = new EnergyBalanceResult(674, 674, 0),
        Geometry = new GeometryResult
        {
            Form = "threeLimb",
            LimbSteps = [new StepResult { Width_mm = 210, Stack_mm = 65.5, YokeWidth_mm = 210, Sheets = 274 }, new StepResult { Width_mm = 190, Stack_mm = 45.5, YokeWidth_mm = 190, Sheets = 190 }],
            CircleDiameter_mm = 220,
            FillRatio = 0.9,
            GrossArea_mm2 = 35400,
            NetLimbArea_mm2 = 34166,
            NetYokeArea_mm2 = 34166,
            StackHeight_mm = 111,
            WindowHeight_mm = 520,
            WindowWidth_mm = 190,
            LimbPitch_mm = 400,
            LimbWidth_mm = 210,
            YokeHeight_mm = 210,
            OverallWidth_mm = 1010,
            OverallHeight_mm = 940,
            Plates = [],
        },
        Joint = new JointResult { Type = "stepLap", Positions = 5, SheetsPerPosition = 1, EffectiveGapUsed = false, PeakMmf_A = 10, BridgingFluxDensity_T = 1.5, Mmf = [] },
        Steel = new SteelResult { Grade = "M75-23P", Thickness_mm = 0.23, Density_kg_m3 = 7650, SaturationPolarization_T = 2.03, SheetLoss_W_kg = 0.73, Standing = "representative", StandingText = "" },
        Model = new ModelResult { BuildingFactor = 1.1, BuildingFactorSource = "", Temperature_C = 20, PointsPerPeriod = 512 },
        Inputs = Input with { Core = Input.Core! with { StackingFactor = 0.965, Yoke = new YokeInput { AreaFactor = 1 } } },
        Derived = ["core.stackingFactor", "core.yoke.areaFactor"],
        Warnings = [],
        Sources = [],
        KernelVersion = "test",
        SteelDataRevision = "test",
    };

    public static MarginsResult Margins { get; } = new()
    {
        FluxCurve = [],
        FluxCurveDefinition = "Rated voltage, other frequencies.",
        OverVoltage = new() { CurrentMultiple = 5, Voltage_percent = 111.2, PeakFluxDensity_T = 1.875, Definition = "Voltage for a multiple." },
        Inrush = new() { Peak_A = 28_700, PeakOverRated = 14, PeakLine = "A", PeakTime_ms = 10, FormulaLossless_A = 29_200, FormulaWithResistance_A = 29_200, FormulaText = "Closed form.", Definition = "Highest current.", Assumptions = "First phase first." },
        Notes = [new("protection", "For planning.")],
    };

    public static Outcome<EstimateResult> Ok(EstimateResult estimate) => new() { Value = estimate };

    public static LeverResult Lever(DesignInput design) => new()
    {
        Key = "tighterGap",
        Label = "Gap 0.2 mm",
        Design = design,
        LossChange_W = -5,
        CurrentChange_points = -0.01,
        MassChange_kg = 0,
        MarginChange_points = 0,
    };
}
