namespace CoreDesign.Magnetics.Circuits;

/// <summary>Voltage across each winding, by the connection's rule.</summary>
internal static class SupplyWaveform
{
    public static double[] Voltage(Supply supply, WindingPhase phase, int points)
    {
        var (peak, angle) = Across(supply, phase);
        return Sample(points, peak, angle);
    }

    /// <summary>Zero-mean integral of the voltage, Wb.</summary>
    public static double[] Linkage(Supply supply, WindingPhase phase, int points)
    {
        var (peak, angle) = Across(supply, phase);
        return Sample(points, peak / (2 * Math.PI * supply.Frequency_Hz), angle - (Math.PI / 2));
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

    private static double[] Sample(int points, double peak, double angle)
    {
        var x = new double[points];
        for (var n = 0; n < points; n++)
        {
            x[n] = peak * Math.Cos((2 * Math.PI * n / points) + angle);
        }

        return x;
    }
}
