using System.Collections.Concurrent;
using CoreDesign.Estimating.Steels;
using CoreDesign.Magnetics.Joints;
using CoreDesign.Magnetics.Losses;
using CoreDesign.Magnetics.Materials;

namespace CoreDesign.Estimating.Estimate;

/// <summary>A grade's law at one frequency and temperature, with its steel for joints.</summary>
internal sealed record SheetAtWork(CalibratedSheet Sheet, JointSteel Joint, double SaturationPolarization_T);

/// <summary>Calibrations, kept by steel data, frequency and temperature.</summary>
internal static class CalibratedSheets
{
    private const int MostKept = 500;

    // No-load loss falls by 0.065 % per kelvin near 20 °C (IEEE C57.12.90 clause 8, from memory); Js by about 0.02 % per kelvin (textbooks, from memory, doubtful).
    private const double LossPerKelvin = 0.00065;
    private const double SaturationPerKelvin = 0.0002;
    private const double Reference_C = 20;
    private static readonly ConcurrentDictionary<(string Steel, double Frequency, double Temperature), SheetAtWork> Kept = new();

    /// <exception cref="ArgumentException">Curves that no law fits; the message says which figure to check.</exception>
    public static SheetAtWork Of(SteelGrade grade, double frequency_Hz, double temperature_C)
    {
        if (Kept.Count > MostKept)
        {
            Kept.Clear();
        }

        return Kept.GetOrAdd((SteelCatalog.RevisionOf(grade), frequency_Hz, temperature_C), _ => Fit(grade, frequency_Hz, temperature_C));
    }

    /// <summary>Saturation polarization at core temperature.</summary>
    public static double Saturation_T(SteelGrade grade, double temperature_C) =>
        grade.SaturationPolarization_T.Value * (1 - (SaturationPerKelvin * (temperature_C - Reference_C)));

    private static SheetAtWork Fit(SteelGrade grade, double frequency_Hz, double temperature_C)
    {
        var data = grade.ToSteelData();
        var lossFactor = 1 / (1 + (LossPerKelvin * (temperature_C - Reference_C)));
        var warm = data with
        {
            Loss = [.. data.Loss.Select(c => c with { Points = [.. c.Points.Select(p => p with { Loss_W_per_kg = p.Loss_W_per_kg * lossFactor })] })],
        };
        return new SheetAtWork(
            SheetLawCalibration.Fit(warm, frequency_Hz),
            JointSteel.From(data),
            Saturation_T(grade, temperature_C));
    }
}
