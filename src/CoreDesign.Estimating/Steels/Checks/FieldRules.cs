using static System.FormattableString;

namespace CoreDesign.Estimating.Steels.Checks;

/// <summary>A single number that steel data has: its range, what is taken when it is left out, and the usual slips of unit.</summary>
internal sealed record FieldRule(string Key, string Unit, double Least, double Most, SourcedFigure? Default, Func<double, string?> Slip)
{
    public static FieldRule Thickness { get; } = new("thickness_mm", "mm", 0.1, 0.65, null, v => v switch
    {
        >= 100 and <= 650 => Invariant($"this looks like micrometres: write {v / 1000:0.###}"),
        >= 1e-4 and <= 6.5e-4 => Invariant($"this looks like metres: write {v * 1000:0.###}"),
        >= 4 and <= 26 => "this looks like mil: 1 mil is 0.0254 mm",
        _ => null,
    });

    public static FieldRule Density { get; } = new(
        "density_kg_m3", "kg/m³", 7000, 8200, new(7650, "not given; conventional density of grain-oriented sheet", FigureStanding.Read), v => v switch
        {
            >= 7 and <= 8.2 => Invariant($"this looks like kg/dm³: write {v * 1000:0}"),
            _ => null,
        });

    public static FieldRule Resistivity { get; } = new(
        "resistivity_ohm_m", "Ωm", 1e-7, 1.5e-6, new(0.48e-6, "not given; usual handbook figure for about 3 % silicon iron", FigureStanding.FromMemory), v => v switch
        {
            >= 0.1 and <= 1.5 => Invariant($"this looks like µΩm: write {v}e-6"),
            >= 10 and <= 150 => Invariant($"this looks like µΩcm: write {v}e-8"),
            _ => null,
        });

    public static FieldRule Saturation { get; } = new(
        "saturationPolarization_T", "T", 1.5, 2.2, new(2.03, "not given; about 3 % silicon iron, 20 °C", FigureStanding.Read), v => v switch
        {
            >= 15 and <= 22 => Invariant($"this looks like kG: write {v / 10:0.###}"),
            _ => null,
        });

    /// <summary>Left out, the design states its own; no default.</summary>
    public static FieldRule StackingFactor { get; } = new("stackingFactor", "", 0.8, 1, null, v => v switch
    {
        >= 80 and <= 100 => Invariant($"this looks like per cent: write {v / 100:0.###}"),
        _ => null,
    });

    public static IReadOnlyList<FieldRule> All { get; } = [Thickness, Density, Resistivity, Saturation, StackingFactor];

    /// <summary>True if the entry is within the range; reports it otherwise.</summary>
    public bool Check(Entry entry, Findings findings)
    {
        if (entry.Value >= Least && entry.Value <= Most)
        {
            return true;
        }

        var mend = Slip(entry.Value) is { } slip ? "; " + slip : "; check the unit";
        findings.Error(entry, Invariant($"must lie between {Least} and {Most}{(Unit.Length > 0 ? " " + Unit : "")}{mend}."));
        return false;
    }
}
