namespace CoreDesign.Magnetics.Transients;

/// <summary>A winding on an ideal core, as the closed formulas take it: no current until the core saturates, then its air-core inductance.</summary>
/// <param name="Voltage_V">Rms across the winding.</param>
/// <param name="PeakFluxDensity_T">Of the limb in steady state at that voltage.</param>
/// <param name="Residual_T">In the direction in which the flux starts.</param>
/// <param name="Angle_rad">Of the voltage when the switch closes; 0 at its zero.</param>
/// <param name="Inductance_H">Of the saturated winding and the source together.</param>
public sealed record IdealInrush(double Voltage_V, double Frequency_Hz, double PeakFluxDensity_T, double Residual_T, double Saturation_T, double Angle_rad, double Inductance_H, double Resistance_ohm);

/// <summary>Closed formulas for the first peak of the current that a transformer draws when it is put on its supply. Textbook forms, from memory.</summary>
public static class InrushFormulas
{
    /// <summary>
    /// Without resistance: i = sqrt2 V/(w L)·(B_r + B_n (1 + cos a) - B_s)/B_n; 0 where the flux stays below saturation. For a = 0 the form of Specht (1951), from memory.
    /// </summary>
    public static double Lossless_A(IdealInrush x)
    {
        ArgumentNullException.ThrowIfNull(x);
        var most = x.Residual_T + (x.PeakFluxDensity_T * (1 + Math.Cos(x.Angle_rad)));
        return Math.Max(0, Math.Sqrt(2) * x.Voltage_V / (2 * Math.PI * x.Frequency_Hz * x.Inductance_H) * (most - x.Saturation_T) / x.PeakFluxDensity_T);
    }

    /// <summary>
    /// With resistance, which counts from the instant t_s at which the core saturates:
    /// i(t) = sqrt2 V/Z·[sin(wt + a - p) - exp(-R(t - t_s)/L)·sin(w t_s + a - p)], Z² = R² + (wL)², tan p = wL/R. The form of Holcomb (1961), from memory. Highest value in the first period.
    /// </summary>
    public static double WithResistance_A(IdealInrush x)
    {
        ArgumentNullException.ThrowIfNull(x);
        var needed = Math.Cos(x.Angle_rad) - ((x.Saturation_T - x.Residual_T) / x.PeakFluxDensity_T);
        if (needed <= -1)
        {
            return 0;
        }

        // The flux rises towards saturation while w t + a goes from a to pi.
        double w = 2 * Math.PI * x.Frequency_Hz, reactance = w * x.Inductance_H;
        var start = needed >= Math.Cos(x.Angle_rad) ? x.Angle_rad : Math.Acos(needed);
        var (z, p) = (Math.Sqrt((x.Resistance_ohm * x.Resistance_ohm) + (reactance * reactance)), Math.Atan2(reactance, x.Resistance_ohm));
        const int points = 20_000;
        var peak = 0.0;
        for (var n = 0; n <= points; n++)
        {
            var angle = start + (2 * Math.PI * n / points);
            peak = Math.Max(peak, Math.Sin(angle - p) - (Math.Exp(-x.Resistance_ohm * (angle - start) / reactance) * Math.Sin(start - p)));
        }

        return Math.Sqrt(2) * x.Voltage_V / z * peak;
    }
}
