using CoreDesign.Estimating.Contracts;
using CoreDesign.Magnetics.Geometry;

namespace CoreDesign.Estimating.Estimate;

/// <summary>Derived geometry and masses in workshop units.</summary>
internal static class GeometryShape
{
    public static GeometryResult Of(ResolvedDesign design)
    {
        var g = design.Geometry;
        var sheet = design.Steel.Thickness_mm.Value / 1000;
        return new GeometryResult
        {
            Form = design.Inputs.Core!.Form!,
            Units = design.Units,
            Limbs = [.. g.Limbs.Select((l, i) => new CoreLimbResult
            {
                Name = "limb" + l.Letter,
                Axis_mm = Mm(l.Axis_m),
                Width_mm = Mm(l.WidthShare * g.Steps[0].LimbWidth_m),
                WidthShare = l.WidthShare,
                NetArea_mm2 = l.NetArea_m2 * 1e6,
                Wound = !l.IsReturn && (g.Form != CoreForm.SinglePhaseTwoLimb || i < design.WoundLimbs),
                IsReturn = l.IsReturn,
            })],
            LimbSteps = [.. g.Steps.Select(s => new StepResult
            {
                Width_mm = Mm(s.LimbWidth_m),
                Stack_mm = Mm(s.Stack_m),
                YokeWidth_mm = Mm(s.YokeWidth_m),
                Sheets = (int)Math.Round(s.Stack_m * g.StackingFactor / sheet),
            })],
            CircleDiameter_mm = Mm(g.CircleDiameter_m),
            FillRatio = g.GrossLimbArea_m2 / (Math.PI / 4 * g.CircleDiameter_m * g.CircleDiameter_m),
            GrossArea_mm2 = g.GrossLimbArea_m2 * 1e6,
            NetLimbArea_mm2 = g.NetLimbArea_m2 * 1e6,
            NetYokeArea_mm2 = g.NetYokeArea_m2 * 1e6,
            StackHeight_mm = Mm(g.StackHeight_m),
            WindowHeight_mm = Mm(g.WindowHeight_m),
            WindowWidth_mm = Mm(g.WindowWidth_m),
            ReturnWindowWidth_mm = CoreForms.HasReturnWindows(g.Form) ? Mm(g.ReturnWindowWidth_m) : null,
            LimbPitch_mm = Mm(g.LimbPitch_m),
            LimbWidth_mm = Mm(g.Steps[0].LimbWidth_m),
            YokeHeight_mm = Mm(g.Steps[0].YokeWidth_m),
            OverallWidth_mm = Mm(g.OverallWidth_m),
            OverallHeight_mm = Mm(g.OverallHeight_m),
            Plates = [.. g.Plates.Select(p => Plate(p, design.Steel.Density_kg_per_m3.Value))],
        };
    }

    /// <summary>Corners and T zones together are the corners.</summary>
    public static MassResult Mass(ResolvedDesign design)
    {
        var density = design.Steel.Density_kg_per_m3.Value;
        double Of(params CorePartKind[] kinds) => design.Units * density * design.Geometry.Parts.Where(p => kinds.Contains(p.Kind)).Sum(p => p.Volume_m3);
        double limbs = Of(CorePartKind.Limb), yokes = Of(CorePartKind.Yoke), corners = Of(CorePartKind.Corner, CorePartKind.TZone);
        return new MassResult(limbs, yokes, corners, limbs + yokes + corners);
    }

    private static PlateResult Plate(CorePlate p, double density) => new()
    {
        Step = p.Step,
        Shape = p.Shape switch { PlateShape.OuterLimb => "outerLimb", PlateShape.MiddleLimb => "middleLimb", _ => "yoke" },
        Pieces = p.Pieces,
        Width_mm = Mm(p.Width_m),
        LongSide_mm = Mm(p.LongSide_m),
        ShortSide_mm = Mm(p.ShortSide_m),
        Mass_kg = p.NetVolume_m3 * density,
        Outline = [.. p.Outline.Select(o => new PointResult(Mm(o.X_m), Mm(o.Y_m)))],
    };

    /// <summary>Millimetres without the last-bit noise of the conversion.</summary>
    private static double Mm(double metres) => Math.Round(metres * 1000, 6);
}
