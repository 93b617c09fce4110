using CoreDesign.Estimating.Contracts;

namespace CoreDesign.Sheets.Tests;

/// <summary>
/// Studies that look like what the kernel returns: lengths, areas and masses follow from one another, electrical figures are
/// invented, of the right size, for tests of drawings and sheets only.
/// </summary>
internal static class StudyFixture
{
    private const double StackingFactor = 0.965;
    private const double Density = 7650;

    public static Study ThreeLimb(int steps = 7, double diameter_mm = 220, string connection = "YN", string standing = "representative") =>
        Build("threeLimb", steps, diameter_mm, windowHeight: 520, windowWidth: 190, yokeFactor: 1.05, connection, standing);

    public static Study SinglePhase(int steps = 5, double diameter_mm = 120, string standing = "certificate") =>
        Build("singlePhaseTwoLimb", steps, diameter_mm, windowHeight: 260, windowWidth: 110, yokeFactor: 1, "single", standing);

    public static Study Build(string form, int steps, double diameter, double windowHeight, double windowWidth, double yokeFactor, string connection, string standing)
    {
        var three = form == "threeLimb";
        var limbs = three ? new[] { "A", "B", "C" } : ["A", "B"];
        var geometry = Geometry(form, limbs.Length, steps, diameter, windowHeight, windowWidth, yokeFactor);
        var lines = three ? new[] { Line("A", 0, 1), Line("B", -120, 0.93), Line("C", 120, 1) } : [Line("A", 0, 1)];
        var ratedCurrent = three ? 1443.4 : 62.5;
        var mean = lines.Average(l => l.Rms_A);
        var net = geometry.Plates.Sum(p => p.Mass_kg);
        var rough = Parts(geometry, limbs, three);
        var parts = rough.ConvertAll(p => p with { Mass_kg = p.Mass_kg * net / rough.Sum(q => q.Count * q.Mass_kg) });
        var loss = parts.Sum(p => p.Loss_W);
        var inputs = Inputs(form, geometry, three, connection, yokeFactor, diameter, steps);
        var representative = standing == "representative";

        return new Study
        {
            Estimate = new EstimateResult
            {
                NoLoadLoss_W = loss,
                NoLoadCurrent_percent = 100 * mean / ratedCurrent,
                NoLoadCurrent_A = mean,
                RatedCurrent_A = ratedCurrent,
                ExcitingPower_VA = parts.Sum(p => p.ExcitingPower_VA),
                PowerFactor = loss / parts.Sum(p => p.ExcitingPower_VA),
                Lines = lines,
                Limbs = [.. limbs.Select((l, i) => Limb(l, three ? -120 * i : 180 * i))],
                Parts = parts,
                Shares = Shares(loss),
                Mass_kg = new MassResult(
                    parts.Where(p => p.Kind == "limb").Sum(p => p.Count * p.Mass_kg),
                    parts.Where(p => p.Kind == "yoke").Sum(p => p.Count * p.Mass_kg),
                    parts.Where(p => p.Kind is "corner" or "tZone").Sum(p => p.Count * p.Mass_kg),
                    parts.Sum(p => p.Count * p.Mass_kg)),
                Margin = new MarginResult
                {
                    AtRated_percent = 16.7,
                    AtHighest_percent = 8.4,
                    WorstPart = "limbA",
                    PeakAtRated_T = 1.69,
                    PeakAtHighest_T = 1.859,
                    SaturationPolarization_T = 2.03,
                    Definition = "(saturation polarization less peak flux density) over saturation polarization, in the part with the highest peak",
                },
                EnergyBalance = new EnergyBalanceResult(loss * 1.00021, loss, 2.1e-4),
                Geometry = geometry,
                Joint = new JointResult
                {
                    Type = "stepLap",
                    Positions = 5,
                    SheetsPerPosition = 1,
                    EffectiveGapUsed = false,
                    PeakMmf_A = 7.4,
                    BridgingFluxDensity_T = 1.49,
                    Mmf = [.. Enumerable.Range(1, 10).Select(i => new JointPointResult(0.19 * i, 0.06 * Math.Exp(0.48 * i)))],
                },
                Steel = new SteelResult
                {
                    Grade = "M105-30P",
                    Thickness_mm = 0.30,
                    Density_kg_m3 = Density,
                    SaturationPolarization_T = 2.03,
                    SheetLoss_W_kg = 1.03,
                    Standing = standing,
                    StandingText = representative ? "Representative curve shaped to pass the guaranteed points; replace by your certificate before you quote." : "",
                },
                Model = new ModelResult
                {
                    BuildingFactor = 1.1,
                    BuildingFactorSource = "prior for multi-step joints of three-limb cores, 1.08 to 1.20, from memory; replace by your works' own",
                    Temperature_C = 20,
                    PointsPerPeriod = 512,
                },
                Inputs = inputs,
                Derived = ["core.limbSteps", "core.limbPitch_mm", "joint.interface_um", "model.temperature_C"],
                Warnings = [new NoteResult("steel.representative", "The steel curve is representative; loss and current carry its uncertainty.")],
                Sources =
                [
                    new SourceResult("steel.M105-30P", "EN 10107 / IEC 60404-8-7, tables of magnetic properties", "from memory"),
                    new SourceResult("joint.lattice", "Sheet-by-sheet model of the joint zone, solved for this joint and steel", "derived"),
                    new SourceResult("mu0", "Magnetic constant, CODATA 2018", "read"),
                ],
                KernelVersion = "0.1.0",
                SteelDataRevision = "2026-11",
            },
            VoltageCurve = [.. Enumerable.Range(0, 9).Select(i => VoltagePoint(80 + (5 * i), loss, 100 * mean / ratedCurrent))],
            Levers =
            [
                new LeverResult { Key = "betterSteel", Label = "Next better steel, M100-30P", Design = inputs, LossChange_W = -31, CurrentChange_points = -0.01, MassChange_kg = 0, MarginChange_points = 0 },
                new LeverResult { Key = "largerDiameter", Label = "5 mm more diameter", Design = inputs, LossChange_W = -22, CurrentChange_points = -0.04, MassChange_kg = 46, MarginChange_points = 3.6 },
            ],
        };
    }

    private static DesignInput Inputs(string form, GeometryResult g, bool three, string connection, double yokeFactor, double diameter, int steps) => new()
    {
        Order = new OrderInput
        {
            Reference = "HR-1042",
            Phases = three ? 3 : 1,
            RatedPower_kVA = three ? 1000 : 25,
            Frequency_Hz = 50,
            RatedVoltages_kV = three ? [20, 0.4] : [11, 0.4],
            HighestVoltage_percent = 110,
            AskedNoLoadLoss_W = three ? 693 : 70,
            AskedNoLoadCurrent_percent = 0.5,
        },
        ExcitedWinding = new ExcitedWindingInput { Connection = connection, LineVoltage_V = 400, Turns = three ? 18 : 118, Resistance_ohm = 0 },
        Steel = new SteelInput { Grade = "M105-30P" },
        Core = new CoreInput
        {
            Form = form,
            LimbSteps = [.. g.LimbSteps.Select(s => new StepInput { Width_mm = s.Width_mm, Stack_mm = s.Stack_mm })],
            Limb = new LimbInput { Diameter_mm = diameter, Steps = steps },
            Yoke = new YokeInput { AreaFactor = yokeFactor },
            WindowHeight_mm = g.WindowHeight_mm,
            WindowWidth_mm = g.WindowWidth_mm,
            LimbPitch_mm = g.LimbPitch_mm,
            StackingFactor = StackingFactor,
        },
        Joint = new JointInput { Type = "stepLap", Positions = 5, SheetsPerPosition = 1, Gap_mm = 0.3, Overlap_mm = 4, Interface_um = 4 },
        Model = new ModelInput { BuildingFactor = 1.1, Temperature_C = 20 },
    };

    private static GeometryResult Geometry(string form, int limbs, int count, double d, double windowHeight, double windowWidth, double yokeFactor)
    {
        var steps = new List<StepResult>();
        double half = 0;
        for (var i = 1; i <= count; i++)
        {
            var width = 2 * Math.Round(d * Math.Cos(Math.PI / 2 * i / (count + 1)) / 2);
            var reach = Math.Round(Math.Sqrt((d * d) - (width * width)) / 2, 2);
            var stack = Math.Round(2 * (reach - half), 1);
            half = reach;
            steps.Add(new StepResult { Width_mm = width, Stack_mm = stack, YokeWidth_mm = width * yokeFactor, Sheets = (int)Math.Round(stack * StackingFactor / 0.30) });
        }

        var gross = steps.Sum(s => s.Width_mm * s.Stack_mm);
        var limbWidth = steps[0].Width_mm;
        var yokeHeight = steps[0].YokeWidth_mm;
        var pitch = windowWidth + limbWidth;
        return new GeometryResult
        {
            Form = form,
            LimbSteps = steps,
            CircleDiameter_mm = d,
            FillRatio = gross / (Math.PI * d * d / 4),
            GrossArea_mm2 = gross,
            NetLimbArea_mm2 = gross * StackingFactor,
            NetYokeArea_mm2 = gross * StackingFactor * yokeFactor,
            StackHeight_mm = steps.Sum(s => s.Stack_mm),
            WindowHeight_mm = windowHeight,
            WindowWidth_mm = windowWidth,
            LimbPitch_mm = pitch,
            LimbWidth_mm = limbWidth,
            YokeHeight_mm = yokeHeight,
            OverallWidth_mm = ((limbs - 1) * pitch) + limbWidth,
            OverallHeight_mm = windowHeight + (2 * yokeHeight),
            Plates = [.. steps.SelectMany((s, i) => Plates(i + 1, s, limbs, pitch, windowHeight + (yokeHeight - s.YokeWidth_mm)))],
        };
    }

    private static IEnumerable<PlateResult> Plates(int step, StepResult s, int limbs, double pitch, double opening)
    {
        yield return Plate("outerLimb", 2 * s.Sheets, s.Width_mm, opening + (2 * s.Width_mm), opening);
        if (limbs == 3)
        {
            yield return Plate("middleLimb", s.Sheets, s.Width_mm, opening + s.Width_mm, opening);
        }

        yield return Plate("yoke", 2 * s.Sheets, s.YokeWidth_mm, ((limbs - 1) * pitch) + s.Width_mm, ((limbs - 1) * pitch) - s.Width_mm);

        PlateResult Plate(string shape, int pieces, double width, double longSide, double shortSide) => new()
        {
            Step = step,
            Shape = shape,
            Pieces = pieces,
            Width_mm = width,
            LongSide_mm = longSide,
            ShortSide_mm = shortSide,
            Mass_kg = pieces * 0.30e-3 * width * 1e-3 * (longSide + shortSide) / 2 * 1e-3 * Density,
            Outline =
            [
                new PointResult(0, 0), new PointResult(longSide, 0),
                new PointResult((longSide + shortSide) / 2, width), new PointResult((longSide - shortSide) / 2, width),
            ],
        };
    }

    private static List<PartResult> Parts(GeometryResult g, string[] limbs, bool three)
    {
        var parts = new List<PartResult>();
        foreach (var l in limbs)
        {
            parts.Add(Part("limb" + l, "limb", 1, g.NetLimbArea_mm2, g.WindowHeight_mm, 1.69, 0.85, 1.9));
        }

        parts.Add(Part("yokes", "yoke", three ? 4 : 2, g.NetYokeArea_mm2, g.WindowWidth_mm, 1.61, 0.76, 1.5));
        parts.Add(Part("corners", "corner", 4, g.NetYokeArea_mm2, g.LimbWidth_mm, 1.58, 0.84, 1.6));
        if (three)
        {
            parts.Add(Part("tZones", "tZone", 2, g.NetYokeArea_mm2, g.LimbWidth_mm, 1.52, 0.95, 1.7));
        }

        parts.Add(new PartResult { Name = "joints", Kind = "joint", Count = three ? 6 : 4, Area_mm2 = g.NetLimbArea_mm2, Length_mm = 0, Mass_kg = 0, PeakFluxDensity_T = 1.69, Loss_W = 0, ExcitingPower_VA = three ? 640 : 41 });
        return parts;
    }

    private static PartResult Part(string name, string kind, int count, double area, double length, double peak, double lossPerKg, double powerPerKg)
    {
        var mass = area * length * 1e-9 * Density;
        return new PartResult { Name = name, Kind = kind, Count = count, Area_mm2 = area, Length_mm = length, Mass_kg = mass, PeakFluxDensity_T = peak, Loss_W = count * mass * lossPerKg, ExcitingPower_VA = count * mass * powerPerKg };
    }

    private static List<ShareResult> Shares(double loss) =>
    [
        Share("limbSteel", "Limbs, steel", 0.44, 31, loss),
        Share("cornerSteel", "Corners and T, steel", 0.27, 17, loss),
        Share("yokeSteel", "Yokes, steel", 0.20, 12, loss),
        Share("joints", "Joints", 0.0, 38, loss),
        Share("zoneExtra", "Building factor, joint and T zones", 0.09, 2, loss),
    ];

    private static ShareResult Share(string cause, string label, double part, double current, double loss) =>
        new() { Cause = cause, Label = label, Loss_W = part * loss, Loss_percent = 100 * part, Current_percent = current };

    private static LineResult Line(string phase, double angle, double factor)
    {
        double[] peak = [4.2 * factor, 0, 1.9 * factor, 0, 1.1 * factor, 0, 0.45 * factor, 0, 0.12 * factor, 0, 0.03 * factor, 0, 0.012 * factor];
        var wave = Enumerable.Range(0, 512)
            .Select(i => peak.Select((p, k) => p * Math.Sin(((k + 1) * ((2 * Math.PI * i / 512) + (angle * Math.PI / 180))) + (k / 2 * Math.PI) - (k == 0 ? 0.9 : 1.4))).Sum())
            .ToList();
        return new LineResult
        {
            Phase = phase,
            Rms_A = Math.Sqrt(peak.Sum(p => p * p) / 2),
            Peak_A = wave.Max(Math.Abs),
            Harmonics = [.. peak.Select((p, k) => new HarmonicResult(k + 1, p / Math.Sqrt(2), k % 2 == 1 ? 0 : 37 - (11 * k)))],
            Waveform_A = wave,
        };
    }

    private static LimbResult Limb(string phase, double angle)
    {
        var phases = Enumerable.Range(0, 512).Select(i => (2 * Math.PI * i / 512) + (angle * Math.PI / 180)).ToList();
        return new LimbResult
        {
            Name = "limb" + phase,
            Phase = phase,
            FluxDensity_T = [.. phases.Select(x => 1.69 * Math.Sin(x))],
            FieldStrength_A_m = [.. phases.Select(x => (14 * Math.Cos(x)) + (6 * Math.Sin(x)) + (26 * Math.Pow(Math.Sin(x), 15)))],
        };
    }

    private static VoltagePointResult VoltagePoint(double percent, double loss, double current)
    {
        var x = percent / 100;
        return new VoltagePointResult
        {
            Voltage_percent = percent,
            NoLoadLoss_W = loss * Math.Pow(x, x > 1 ? 2.9 : 2.1),
            NoLoadCurrent_percent = current * (x > 1 ? Math.Exp(12 * (x - 1)) : Math.Pow(x, 2.5)),
            PeakFluxDensity_T = 1.69 * x,
        };
    }
}
