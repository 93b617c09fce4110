using System.Globalization;

namespace CoreDesign.Magnetics.Joints;

/// <summary>Ranges of a joint's figures, refused by name.</summary>
internal static class JointLimits
{
    public const int MostPositions = 12;
    public const int MostSheets = 4;

    public static void Check(JointSpec spec)
    {
        ArgumentNullException.ThrowIfNull(spec);
        switch (spec.Kind)
        {
            case JointKind.ButtLap or JointKind.MitredOverlap:
                if (spec.Positions != 2)
                {
                    throw Refusal(nameof(spec.Positions), $"Positions: {spec.Positions} is not possible for {spec.Kind}, which alternates between 2. Take 2, or a step-lap joint.");
                }

                break;
            case JointKind.StepLap:
                Hold(nameof(spec.Positions), "Positions", spec.Positions, 2, MostPositions, "");
                break;
            default:
                throw Refusal(nameof(spec.Kind), $"Kind: {(int)spec.Kind} names no kind of joint. Take {string.Join(", ", Enum.GetNames<JointKind>())}.");
        }

        Hold(nameof(spec.SheetsPerPosition), "Sheets per position", spec.SheetsPerPosition, 1, MostSheets, "");
        Hold(nameof(spec.Gap_m), "Gap", spec.Gap_m * 1e3, 0, 5, "mm");
        if (!(spec.Shift_m > 0))
        {
            throw Refusal(nameof(spec.Shift_m), $"Shift: {spec.Shift_m * 1e3:g6} mm is outside above 0 to 30 mm. Give the distance between neighbouring joint positions, normal to the line.");
        }

        Hold(nameof(spec.Shift_m), "Shift", spec.Shift_m * 1e3, 0, 30, "mm");
        Hold(nameof(spec.Interface_m), "Interface", spec.Interface_m * 1e6, 1, 60, "µm");
    }

    public static void Hold(string parameter, string name, double value, double low, double high, string unit)
    {
        // A figure converted from the unit of its border must not fail by its last bit.
        var slack = 1e-9 * high;
        if (!(value >= low - slack && value <= high + slack))
        {
            var blank = unit.Length == 0 ? "" : " ";
            throw Refusal(parameter, $"{name}: {value:g6}{blank}{unit} is outside {low:g6} to {high:g6}{blank}{unit}. Give a figure within that range.");
        }
    }

    private static ArgumentOutOfRangeException Refusal(string parameter, FormattableString message) =>
        new(parameter, message.ToString(CultureInfo.InvariantCulture));
}
