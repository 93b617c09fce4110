using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Materials;

namespace CoreDesign.Magnetics.Tests.Losses;

/// <summary>Heat of one sheet law under any periodic wave of flux density, as the solver counts it for a branch; no supply can impose every wave.</summary>
internal sealed record SheetHeat(double Hysteresis_W_per_m3, double Classical_W_per_m3, double Excess_W_per_m3)
{
    public static SheetHeat Of(SheetLaw law, double[] fluxDensity_T, double[] rate_T_per_s, double frequency_Hz)
    {
        var wave = SteelWave.Of(law, fluxDensity_T, rate_T_per_s, 1, fluxDensity_T.Length, frequency_Hz);
        return new(wave.Hysteresis_W_per_m3, wave.Classical_W_per_m3, wave.Excess_W_per_m3);
    }
}
