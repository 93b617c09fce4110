namespace CoreDesign.Magnetics.Circuits;

/// <summary>Voltage across each winding, by the connection's rule.</summary>
internal static class SupplyWaveform
{
    public static double[] Voltage(Supply supply, WindingPhase phase, int points, int span)
    {
        var (peak, angle) = Across(supply, phase);
        return Sample(points, span, peak, angle);
    }

    /// <summary>Zero-mean integral of the voltage, Wb: re·cos(wt) - im·sin(wt).</summary>
    public static (double Re, double Im) Linkage(Supply supply, WindingPhase phase)
    {
        var (peak, angle) = Across(supply, phase);
        var (sin, cos) = Math.SinCos(angle - (Math.PI / 2));
        var w = 2 * Math.PI * supply.Frequency_Hz;
        return (peak / w * cos, peak / w * sin);
    }

    /// <summary>Peak and phase of the voltage that the supply puts across a winding; a star winding's is to the supply's neutral.</summary>
    private static (double Peak_V, double Phase_rad) Across(Supply supply, WindingPhase phase)
    {
        var k = phase switch { WindingPhase.B => 1, WindingPhase.C => 2, _ => 0 };
        var shift = -k * 2 * Math.PI / 3;
        var v = supply.Voltage_V;
        return phase switch
        {
            WindingPhase.Closed => (0, 0),
            WindingPhase.Single => (Math.Sqrt(2) * v, 0),
            _ when supply.Connection == SupplyConnection.Delta => (Math.Sqrt(2) * v, shift + (Math.PI / 6)),
            _ => (Math.Sqrt(2.0 / 3.0) * v, shift),
        };
    }

    private static double[] Sample(int points, int span, double peak, double angle)
    {
        var table = Excitation.PeriodTable.Of(points);
        var (sin, cos) = Math.SinCos(angle);
        var x = new double[span];
        for (var n = 0; n < span; n++)
        {
            x[n] = peak * ((table.Cos[n] * cos) - (table.Sin[n] * sin));
        }

        return x;
    }
}
