using System.Globalization;
using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Fields;
using CoreDesign.Magnetics.Joints;

namespace CoreDesign.Estimating.Estimate;

/// <summary>Reads the joint of a design.</summary>
internal sealed class JointReader(DesignResolver resolver)
{
    public (JointSpec? Spec, double? EffectiveGap_m, JointInput? Filled) Read(JointInput? joint)
    {
        JointKind? kind = joint?.Type switch
        {
            "buttLap" => JointKind.ButtLap,
            "mitredOverlap" => JointKind.MitredOverlap,
            "stepLap" => JointKind.StepLap,
            _ => null,
        };
        if (kind is null)
        {
            resolver.Say("joint.type", joint?.Type is { } type
                ? $"Joint type '{(type.Length > 40 ? type[..40] + "…" : type)}' is not known. Give stepLap, mitredOverlap or buttLap."
                : "The joint type is missing. Give stepLap, mitredOverlap or buttLap.");
        }

        var k = kind ?? JointKind.StepLap;
        var positions = resolver.Optional("joint.positions", joint?.Positions, DesignDefaults.Positions(k));
        if (kind is JointKind.ButtLap or JointKind.MitredOverlap && positions is not 2 and not double.NaN)
        {
            resolver.Say("joint.positions", string.Create(CultureInfo.InvariantCulture, $"Joint positions {positions} do not fit a single overlap, which alternates between 2. Give 2, or choose stepLap."));
        }

        var sheets = resolver.Optional("joint.sheetsPerPosition", joint?.SheetsPerPosition, DesignDefaults.SheetsPerPosition);
        var gap = resolver.Optional("joint.gap_mm", joint?.Gap_mm, DesignDefaults.Gap_mm);
        var overlap = resolver.Optional("joint.overlap_mm", joint?.Overlap_mm, DesignDefaults.Overlap_mm(k));
        var coating = resolver.Optional("joint.interface_um", joint?.Interface_um, DesignDefaults.Interface_um);
        var effective = joint?.EffectiveGap_mm is { } g ? resolver.Needed("joint.effectiveGap_mm", g) : (double?)null;
        if (double.IsNaN(positions + sheets + gap + overlap + coating) || kind is null)
        {
            return (null, null, null);
        }

        if (gap >= overlap && effective is null)
        {
            resolver.Warn("joint.gap", string.Create(CultureInfo.InvariantCulture, $"The gap of {gap} mm is not smaller than the overlap of {overlap} mm: the gaps of neighbouring sheets overlie each other."));
        }

        var spec = new JointSpec
        {
            Kind = k,
            Positions = (int)positions,
            SheetsPerPosition = (int)sheets,
            Gap_m = gap / 1000,
            Shift_m = overlap / 1000,
            Interface_m = coating / 1e6,
        };
        return (spec, effective / 1000, joint! with { Positions = (int)positions, SheetsPerPosition = (int)sheets, Gap_mm = gap, Overlap_mm = overlap, Interface_um = coating });
    }
}
