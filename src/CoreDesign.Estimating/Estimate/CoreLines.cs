using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Cores;
using CoreDesign.Magnetics.Excitation;

namespace CoreDesign.Estimating.Estimate;

/// <summary>Line currents as the supply sees them: those of the core, and the leading current of a winding's capacitance.</summary>
internal static class CoreLines
{
    /// <param name="design">Its capacitance counts, where there is one.</param>
    /// <param name="solved">At any voltage, fed from any winding.</param>
    /// <param name="rated">The winding that is fed, at its rated voltage.</param>
    public static IReadOnlyList<(string Name, double[] Current_A)> Of(ResolvedDesign design, CoreSolution solved, FedWinding rated)
    {
        var lines = LineCurrents.Of(solved.Solution);
        var supply = solved.Solution.Circuit.Supply;
        var capacitive = Capacitive_A(design, rated, supply.Voltage_V) * supply.Frequency_Hz / rated.Supply.Frequency_Hz;
        return capacitive == 0 ? lines : [.. lines.Select((l, k) => (l.Name, Leading(l.Current_A, capacitive, k)))];
    }

    /// <summary>Reactive power of all phases at rated voltage: with the voltage rising evenly along the winding, w (C/3) U² each (integral of the square of the voltage).</summary>
    public static double Power_var(ResolvedDesign design) => design.Capacitance is { } c
        ? design.Phases * 2 * Math.PI * design.Supply.Frequency_Hz * c.Phase_F / 3 * c.PhaseVoltage_V * c.PhaseVoltage_V
        : 0;

    /// <summary>Line current rms: it grows with the voltage, and its power is the same from whichever winding it is drawn.</summary>
    public static double Capacitive_A(ResolvedDesign design, FedWinding rated, double voltage_V) =>
        Power_var(design) * Connections.CurrentPerVoltAmpere(rated.Supply.Connection) / rated.Supply.Voltage_V * (voltage_V / rated.Supply.Voltage_V);

    /// <summary>Line voltages to neutral are cosines that lag by thirds; the capacitive current leads each by a quarter period.</summary>
    private static double[] Leading(double[] current, double rms, int k)
    {
        var n = current.Length;
        return [.. current.Select((i, t) => i + (Math.Sqrt(2) * rms * Math.Cos((2 * Math.PI * (((double)t / n) - (k / 3.0))) + (Math.PI / 2))))];
    }
}
