using CoreDesign.Estimating.Contracts;
using CoreDesign.Sheets.Pdf;
using static CoreDesign.Sheets.Figures;

namespace CoreDesign.Sheets.Design;

/// <summary>Derived geometry, steps, parts and plates.</summary>
internal static class GeometryTables
{
    public static Table Derived(EstimateResult e)
    {
        var g = e.Geometry;
        (string, string, bool, bool)[] units = g.Units > 1 ? [("Units alike; all that follows is of one", Plain(g.Units), false, false)] : [];
        var beside = g.Limbs.FirstOrDefault(l => l.IsReturn);
        (string, string, bool, bool)[] limb = beside is null ? [] : [("Return limb, width; net area", $"{Mm(beside.Width_mm)}; {With(Fixed(beside.NetArea_mm2, 0), "mm²")}", false, false)];
        (string, string, bool, bool)[] window = g.ReturnWindowWidth_mm is { } width ? [("Window beside a return limb, width", Mm(width), false, false)] : [];
        return Table.KeyValues([
            .. units,
            ("Circle around the limb", Mm(g.CircleDiameter_mm), false, false),
            ("Gross limb area", With(Fixed(g.GrossArea_mm2, 0), "mm²"), false, false),
            ("Net limb area", With(Fixed(g.NetLimbArea_mm2, 0), "mm²"), false, false),
            ("Net yoke area", With(Fixed(g.NetYokeArea_mm2, 0), "mm²"), false, false),
            ("Fill ratio, gross area to circle", Fixed(g.FillRatio, 4), false, false),
            ("Stack height", Mm(g.StackHeight_mm), false, false),
            ("Limb width; yoke height", $"{Mm(g.LimbWidth_mm)}; {Mm(g.YokeHeight_mm)}", false, false),
            .. limb,
            ("Window, height by width", $"{Plain(g.WindowHeight_mm, 1)} × {Mm(g.WindowWidth_mm)}", false, false),
            .. window,
            ("Limb pitch", Mm(g.LimbPitch_mm), false, false),
            ("Overall, width by height", $"{Plain(g.OverallWidth_mm, 1)} × {Mm(g.OverallHeight_mm)}", false, false),
        ]);
    }

    public static Table Excitation(EstimateResult e)
    {
        var rows = new List<(string Name, string Value, bool Strong, bool Derived)>
        {
            ("Volts per turn", VoltsPerTurn(e.Inputs.ExcitedWinding) is { } v ? With(Significant(v, 4), "V") : Nothing, false, false),
        };
        foreach (var kind in e.Parts.Where(p => p.Kind != "joint").GroupBy(p => p.Kind))
        {
            rows.Add(($"Peak flux density, {KindName(kind.Key)}", With(Fixed(kind.Max(p => p.PeakFluxDensity_T), 3), "T"), false, false));
        }

        if (!e.Joint.EffectiveGapUsed)
        {
            rows.Add(("Bridging sheets, normal to the joint", With(Fixed(e.Joint.BridgingFluxDensity_T, 2), "T"), false, false));
        }

        rows.Add(("MMF drop of one joint, peak", With(Significant(e.Joint.PeakMmf_A, 3), "A"), false, false));
        rows.Add(("Loss of the sheet at the limb's peak", With(Fixed(e.Steel.SheetLoss_W_kg, 3), "W/kg"), false, false));
        rows.Add(("Highest peak at highest voltage", $"{With(Fixed(e.Margin.PeakAtHighest_T, 3), "T")}, {Words.Part(e.Margin.WorstPart)}", false, false));
        rows.Add(("Rated current", With(Significant(e.RatedCurrent_A, 4), "A"), false, false));
        return Table.KeyValues(rows);
    }

    public static Table Steps(EstimateResult e) => new(
        [new Column("Step", false), new Column("limb width\nmm"), new Column("yoke width\nmm"), new Column("stack\nmm"), new Column("sheets,\nboth sides")],
        [
            .. e.Geometry.LimbSteps.Select((s, i) => new Row(Plain(i + 1), Plain(s.Width_mm, 1), Plain(s.YokeWidth_mm, 1), Fixed(s.Stack_mm, 1), Plain(s.Sheets))),
            new Row(["Stack", "", "", Fixed(e.Geometry.StackHeight_mm, 1), Plain(e.Geometry.LimbSteps.Sum(s => s.Sheets))], Sum: true),
        ]);

    public static Table Parts(EstimateResult e) => new(
        [
            new Column("Part", false, true), new Column("n"), new Column("net area of one\nmm²"), new Column("length of one\nmm"), new Column("mass of one\nkg"),
            new Column("peak flux density\nT"), new Column("loss of all\nW"), new Column("exciting power of all\nVA"),
        ],
        [
            .. PartGroups.Of(e).Select(p => new Row(
                p.Name, Plain(p.Count), Fixed(p.Area_mm2, 0), p.Length_mm > 0 ? Fixed(p.Length_mm, 1) : "", p.Mass_kg > 0 ? Fixed(p.Mass_kg, 1) : "",
                Fixed(p.PeakFluxDensity_T, 3), p.Kind == "joint" ? "" : Fixed(p.Loss_W, 1), Fixed(p.ExcitingPower_VA, 0))),
            new Row([e.Geometry.Units > 1 ? "All units" : "Whole core", "", "", "", Fixed(e.Mass_kg.Total, 1), "", Fixed(e.NoLoadLoss_W, 1), Fixed(e.ExcitingPower_VA, 0)], Sum: true),
        ]);

    public static Table Mass(EstimateResult e) => Table.KeyValues(
        ("Limbs", Kg(e.Mass_kg.Limbs), false, false),
        ("Yokes", Kg(e.Mass_kg.Yokes), false, false),
        ("Corners and T zones", Kg(e.Mass_kg.Corners), false, false),
        (e.Geometry.Units > 1 ? "All units, net steel" : "Whole core, net steel", Kg(e.Mass_kg.Total), true, false),
        ("Sum over the plates", Kg(e.Geometry.Units * e.Geometry.Plates.Sum(p => p.Mass_kg)), false, false));

    public static Table Plates(EstimateResult e) => new(
        [
            new Column("Step", false), new Column("Plate", false), new Column("pieces"), new Column("width\nmm"), new Column("long side\nmm"),
            new Column("short side\nmm"), new Column("mass of all\nkg"),
        ],
        [
            .. e.Geometry.Plates.Select(p => new Row(
                Plain(p.Step), Words.Shape(p.Shape), Plain(p.Pieces), Plain(p.Width_mm, 1), Fixed(p.LongSide_mm, 1), Fixed(p.ShortSide_mm, 1), Fixed(p.Mass_kg, 2))),
            new Row(["All", "", Plain(e.Geometry.Plates.Sum(p => p.Pieces)), "", "", "", Fixed(e.Geometry.Plates.Sum(p => p.Mass_kg), 2)], Sum: true),
        ]);

    /// <summary>Rms voltage of a turn of the excited winding: the phase's voltage over its turns.</summary>
    private static double? VoltsPerTurn(ExcitedWindingInput? w) => w is { LineVoltage_V: { } v, Turns: { } n }
        ? (w.Connection is "Y" or "YN" ? v / Math.Sqrt(3) : v) / n
        : null;

    private static string KindName(string kind) => kind switch
    {
        "limb" => "limbs",
        "yoke" => "yokes",
        "corner" => "corners",
        "tZone" => "T zones",
        _ => kind,
    };

    private static string Mm(double value) => With(Plain(value, 1), "mm");

    private static string Kg(double value) => With(Fixed(value, 1), "kg");
}
