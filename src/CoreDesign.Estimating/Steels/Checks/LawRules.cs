using CoreDesign.Magnetics.Losses;
using static System.FormattableString;

namespace CoreDesign.Estimating.Steels.Checks;

/// <summary>
/// Last check of a steel that is whole: the solver's law must fit its curves, so that a stored steel always solves; and where exciting power was
/// measured, the curves should give it back.
/// </summary>
internal static class LawRules
{
    /// <summary>Exciting power is read off steep curves, from strips or single sheets: closer agreement says nothing. Common practice, no source.</summary>
    private const double WorthSaying = 0.15;

    public static void Check(SteelGrade grade, SteelDoor door, Findings findings)
    {
        try
        {
            var data = grade.ToSteelData();
            foreach (var curve in grade.Rolling.Loss)
            {
                SheetLawCalibration.Fit(data, curve.Frequency_Hz);
            }

            foreach (var power in grade.Rolling.ExcitingPower)
            {
                Compare(power, SheetLawCalibration.Fit(data, power.Frequency_Hz), door, findings);
            }
        }
        catch (ArgumentException e)
        {
            findings.Error(door.SpotOf("loss"), null, e.Message.Split(" (Parameter", StringSplitOptions.None)[0]);
        }
    }

    private static void Compare(ExcitingPowerCurve power, CalibratedSheet sheet, SteelDoor door, Findings findings)
    {
        var worst = power.Points
            .Select(p => (p.B_T, Measured: p.Power_VA_per_kg, Found: SheetExcitation.Power_VA_per_kg(sheet, p.B_T, power.Frequency_Hz)))
            .MaxBy(p => Math.Abs(Math.Log(p.Found / p.Measured)));
        if (Math.Abs((worst.Found / worst.Measured) - 1) > WorthSaying)
        {
            findings.Warning(
                door.SpotOf("excitingPower"),
                null,
                Invariant($"differs from what the magnetization and loss curves give: at {worst.B_T} T, {power.Frequency_Hz} Hz {worst.Measured:0.###} VA/kg measured, {worst.Found:0.###} VA/kg found. The curves are used; check whether they come from the same sample."));
        }
    }
}
