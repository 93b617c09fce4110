namespace CoreDesign.Magnetics.Geometry;

/// <summary>A limb sized for a net area: the section taken, its net area, and the smallest circle that would do before rounding up to the increment.</summary>
public sealed record SizedLimb(StepSet Section, double NetArea_m2, double NeededNetArea_m2, double LeastDiameter_m);

/// <summary>
/// Sizing of the limb under a sinusoidal voltage, both ways. The law is E = (2π/√2) f N A B, with E rms and B peak, exact for a sine
/// (the rounded factor is 4.44); leakage and resistance drops are left out. E is the voltage across the limb's winding: line voltage in D, line voltage over √3 in star.
/// </summary>
public static class Sizing
{
    private static readonly double EmfFactor = Math.Sqrt(2) * Math.PI;

    /// <summary>Net area in m² for rms volts per turn (1 µV to 100 kV), frequency (0.1 Hz to 100 kHz) and peak flux density (1 mT to 3 T).</summary>
    /// <exception cref="GeometryException">A value out of range.</exception>
    public static double NetArea(double voltsPerTurn_V, double frequency_Hz, double fluxDensity_T)
    {
        CheckVoltsPerTurn(voltsPerTurn_V);
        CheckFrequency(frequency_Hz);
        GeometryChecks.Range("fluxDensity_T", fluxDensity_T, 1e-3, 3, "T", "Give the peak value; grain-oriented cores are built for 1.5 to 1.75 T.");
        return voltsPerTurn_V / (EmfFactor * frequency_Hz * fluxDensity_T);
    }

    /// <summary>Peak flux density in T of a limb: rms limb voltage, turns (above 0), frequency, net area.</summary>
    /// <exception cref="GeometryException">A value out of range.</exception>
    public static double FluxDensity(double limbVoltage_V, double turns, double frequency_Hz, double netArea_m2)
    {
        GeometryChecks.Range("limbVoltage_V", limbVoltage_V, 1e-6, 1e7, "V", "Give the rms voltage across the winding of one limb.");
        GeometryChecks.Range("turns", turns, 1e-3, 1e7, "turns", "Give the turns of the excited winding.");
        CheckFrequency(frequency_Hz);
        CheckArea(netArea_m2);
        return limbVoltage_V / (EmfFactor * frequency_Hz * turns * netArea_m2);
    }

    /// <summary>As <see cref="FluxDensity(double, double, double, double)"/>, for a section and a stacking factor.</summary>
    /// <exception cref="GeometryException">A value out of range.</exception>
    public static double FluxDensity(double limbVoltage_V, double turns, double frequency_Hz, StepSet section, double stackingFactor)
    {
        ArgumentNullException.ThrowIfNull(section);
        GeometryChecks.StackingFactor(stackingFactor);
        return FluxDensity(limbVoltage_V, turns, frequency_Hz, section.GrossArea_m2 * stackingFactor);
    }

    /// <summary>
    /// The circle for a net area with <paramref name="steps"/> free widths, rounded up to a multiple of <paramref name="increment_m"/>.
    /// The optimum's area goes with the square of the diameter.
    /// </summary>
    /// <exception cref="GeometryException">A value out of range, or a circle beyond the largest length.</exception>
    public static SizedLimb Diameter(double netArea_m2, double stackingFactor, int steps, double increment_m)
    {
        CheckSizing(netArea_m2, stackingFactor, increment_m);
        var least = Math.Sqrt(netArea_m2 / (stackingFactor * StepOptimizer.Best(1, steps).GrossArea_m2));
        var rounded = RoundUp(least, increment_m) * increment_m;
        CheckReach(netArea_m2, rounded);
        return Sized(StepOptimizer.Best(rounded, steps), netArea_m2, stackingFactor, least);
    }

    /// <summary>
    /// The smallest circle, on multiples of <paramref name="increment_m"/>, in which the best set of stock widths (at most
    /// <paramref name="steps"/>, null for all that fit) reaches the net area. Written as Σ h_i (w_i − w_(i+1)), the area of any set grows with the
    /// diameter through its stacks h_i, so the best one does too and the search may halve its bracket.
    /// </summary>
    /// <exception cref="GeometryException">A value out of range, or no circle up to the largest length is enough.</exception>
    public static SizedLimb DiameterFromStock(double netArea_m2, double stackingFactor, IReadOnlyList<double> stockWidths_m, int? steps, double increment_m)
    {
        CheckSizing(netArea_m2, stackingFactor, increment_m);
        StepOptimizer.CheckStock(stockWidths_m, steps);
        var gross = netArea_m2 / stackingFactor;

        // No set fills more than its circle, so the circle of that very area is a lower bound.
        var low = Math.Floor(Math.Sqrt(gross * 4 / Math.PI) / increment_m);
        var high = Math.Floor(GeometryChecks.GreatestLength_m / increment_m);
        if (low >= high || Area(high) < gross)
        {
            CheckReach(netArea_m2, double.PositiveInfinity);
        }

        while (high - low > 1)
        {
            var mid = Math.Floor((low + high) / 2);
            if (Area(mid) >= gross)
            {
                high = mid;
            }
            else
            {
                low = mid;
            }
        }

        // The same halving again, now between two multiples, for the circle that would just do.
        var (below, least) = (low, high);
        for (var i = 0; i < 40; i++)
        {
            var mid = (below + least) / 2;
            (below, least) = Area(mid) >= gross ? (below, mid) : (mid, least);
        }

        return Sized(StepOptimizer.FromStock(high * increment_m, stockWidths_m, steps), netArea_m2, stackingFactor, least * increment_m);

        double Area(double multiple)
        {
            // A hair of tolerance: a set that reaches the area but for rounding reaches it.
            var d = multiple * increment_m;
            return stockWidths_m.Any(w => w < d) ? StepOptimizer.FromStock(d, stockWidths_m, steps).GrossArea_m2 * (1 + 1e-12) : 0;
        }
    }

    private static SizedLimb Sized(StepSet section, double netArea_m2, double stackingFactor, double least_m) =>
        new(section, section.GrossArea_m2 * stackingFactor, netArea_m2, least_m);

    /// <summary>Multiples of the increment; a diameter that is one already, but for rounding, stays.</summary>
    private static double RoundUp(double diameter, double increment) => Math.Max(1, Math.Ceiling((diameter / increment) - 1e-9));

    private static void CheckSizing(double netArea_m2, double stackingFactor, double increment_m)
    {
        CheckArea(netArea_m2);
        GeometryChecks.StackingFactor(stackingFactor);
        GeometryChecks.Range("increment_m", increment_m, GeometryChecks.LeastLength_m, 1, "m", "Give the step between diameters, for example 0.005 m.");
    }

    private static void CheckReach(double netArea_m2, double diameter_m)
    {
        if (diameter_m > GeometryChecks.GreatestLength_m)
        {
            throw GeometryChecks.Refuse(
                "netArea_m2",
                netArea_m2,
                FormattableString.Invariant($"what a circle of at most {GeometryChecks.GreatestLength_m} m holds with these steps"),
                "Take a higher flux density, more turns or wider plates.");
        }
    }

    private static void CheckArea(double netArea_m2) =>
        GeometryChecks.Range("netArea_m2", netArea_m2, 1e-9, 1e4, "m²", "Give the net steel area of the limb.");

    private static void CheckFrequency(double frequency_Hz) =>
        GeometryChecks.Range("frequency_Hz", frequency_Hz, 0.1, 1e5, "Hz", "Power networks have 16.7, 50 or 60 Hz.");

    private static void CheckVoltsPerTurn(double voltsPerTurn_V) =>
        GeometryChecks.Range("voltsPerTurn_V", voltsPerTurn_V, 1e-6, 1e5, "V", "Give the rms voltage of one limb over its turns.");
}
