using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Excitation;
using CoreDesign.Magnetics.Materials;

namespace CoreDesign.Magnetics.Losses;

/// <summary>What a uniform ring of a fitted sheet shows under a sine flux: the figures that a catalogue gives.</summary>
public static class SheetExcitation
{
    /// <summary>Specific exciting power, VA/kg: rms field times rms rate of flux density over density.</summary>
    /// <param name="sheet">Fitted at the frequency asked for, or nearest to it.</param>
    /// <param name="fluxDensity_T">Peak, above 0 to 2.5 T.</param>
    /// <param name="frequency_Hz">Above 0.</param>
    public static double Power_VA_per_kg(CalibratedSheet sheet, double fluxDensity_T, double frequency_Hz)
    {
        ArgumentNullException.ThrowIfNull(sheet);
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(fluxDensity_T);
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(frequency_Hz);

        // One turn around one square metre, one metre long in two halves (a loop needs two branches): volts are dB/dt, amperes are H.
        var volts = Math.Sqrt(2) * Math.PI * frequency_Hz * fluxDensity_T;
        CircuitBranch Half(string name, string from, string to) => new() { Name = name, From = from, To = to, Area_m2 = 1, Length_m = 0.5, Steel = sheet.Law };
        var ring = CircuitSolver.Solve(new MagneticCircuit(
            new Supply(SupplyConnection.Single, volts, frequency_Hz),
            [Half("one", "p", "q"), Half("other", "q", "p")],
            [new Winding("W", WindingPhase.Single, [new Coil("one", 1)])]));
        return volts * Waveform.Rms(ring.WindingCurrent_A[0]) / sheet.Data.Density_kg_m3;
    }
}
