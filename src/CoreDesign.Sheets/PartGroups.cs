using CoreDesign.Estimating.Contracts;

namespace CoreDesign.Sheets;

/// <summary>Equal parts as one line of a table. Area, length, mass and flux density are of one part; loss and exciting power of all.</summary>
public sealed record PartGroup(string Name, string Kind, int Count, double Area_mm2, double Length_mm, double Mass_kg, double PeakFluxDensity_T, double Loss_W, double ExcitingPower_VA);

/// <summary>Gathers the parts of an estimate for reading: limbs one by one, equal yokes, corners, T zones and joints together.</summary>
public static class PartGroups
{
    public static IReadOnlyList<PartGroup> Of(EstimateResult estimate)
    {
        ArgumentNullException.ThrowIfNull(estimate);
        return [.. estimate.Parts
            .GroupBy(p => (Single: p.Kind == "limb" ? p.Name : p.Kind, Math.Round(p.Area_mm2, 3), Math.Round(p.Mass_kg, 6), Math.Round(p.PeakFluxDensity_T, 6)))
            .Select(Group)];
    }

    private static PartGroup Group(IGrouping<(string, double, double, double), PartResult> parts)
    {
        var first = parts.First();
        var count = parts.Sum(p => p.Count);
        var name = count == 1 ? Design.Words.Part(first.Name) : first.Kind switch
        {
            "yoke" => "Yokes",
            "corner" => "Corners",
            "tZone" => "T zones",
            "joint" => "Joints",
            _ => Design.Words.Part(first.Name),
        };
        return new PartGroup(name, first.Kind, count, first.Area_mm2, first.Length_mm, first.Mass_kg, first.PeakFluxDensity_T, parts.Sum(p => p.Loss_W), parts.Sum(p => p.ExcitingPower_VA));
    }
}
