using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Steels;
using CoreDesign.Magnetics.Geometry;

namespace CoreDesign.Estimating.LimbSizing;

/// <summary>
/// What the sizing aid proposes. <see cref="FluxDensity_T"/> is that of the design as it stands; turns and diameter are the
/// two ways to the wanted flux density, each with the flux density that it really gives after rounding.
/// </summary>
public sealed record SizingProposal
{
    public double? VoltsPerTurn_V { get; init; }
    public double? FluxDensity_T { get; init; }
    public double? NeededNetArea_mm2 { get; init; }
    public int? Turns { get; init; }
    public double? FluxDensityWithTurns_T { get; init; }
    public double? Diameter_mm { get; init; }
    public double? FluxDensityWithDiameter_T { get; init; }
}

/// <summary>Between volts per turn, flux density and limb, in both directions, for a design that may still be incomplete.</summary>
public static class SizingAid
{
    /// <summary>Works round limb circles to this; common practice, no source.</summary>
    public const double DiameterIncrement_mm = 1;

    /// <summary>
    /// The design with what follows from a wanted yoke height (the area factor that gives it, to six decimals) and a wanted flux density (whole turns,
    /// where none are typed). A design that does not say enough comes back as it is, and the estimate says what is missing.
    /// </summary>
    public static DesignInput Complete(DesignInput design, double? yokeHeight_mm, double? wantedFluxDensity_T, SteelCatalog steels)
    {
        ArgumentNullException.ThrowIfNull(design);
        if ((yokeHeight_mm is null && wantedFluxDensity_T is null) || LimbSection.Of(design, steels) is not { } limb)
        {
            return design;
        }

        if (yokeHeight_mm is { } height && design.Core?.Yoke is null)
        {
            design = design with { Core = (design.Core ?? new()) with { Yoke = new YokeInput { AreaFactor = Math.Round(height / 1000 / limb.Steps.Steps[0].Width_m, 6) } } };
        }

        if (wantedFluxDensity_T is { } wanted && design.ExcitedWinding?.Turns is null && TurnsFor(design, wanted, limb) is { } turns)
        {
            design = design with { ExcitedWinding = (design.ExcitedWinding ?? new()) with { Turns = turns } };
        }

        return design;
    }

    /// <summary>Proposals for a design; what can't be said yet is null.</summary>
    public static SizingProposal Propose(DesignInput design, double? wantedFluxDensity_T, SteelCatalog steels)
    {
        ArgumentNullException.ThrowIfNull(design);
        var limb = LimbSection.Of(design, steels);
        var proposal = new SizingProposal();
        if (LimbVoltage_V(design) is not { } voltage || design.Order?.Frequency_Hz is not { } frequency)
        {
            return proposal;
        }

        if (wantedFluxDensity_T is { } wanted && limb is not null && TurnsFor(design, wanted, limb) is { } turns)
        {
            proposal = proposal with { Turns = turns, FluxDensityWithTurns_T = Sizing.FluxDensity(voltage, turns * Tap(design), frequency, limb.NetArea_m2) };
        }

        if (design.ExcitedWinding?.Turns is not { } given)
        {
            return proposal;
        }

        var typed = given * Tap(design);

        proposal = proposal with
        {
            VoltsPerTurn_V = voltage / typed,
            FluxDensity_T = limb is null ? null : Sizing.FluxDensity(voltage, typed, frequency, limb.NetArea_m2),
        };
        return wantedFluxDensity_T is { } b && LimbSection.StackingFactorOf(design, steels) is { } factor
            ? WithDiameter(proposal, design.Core?.Limb, voltage / typed, frequency, b, factor)
            : proposal;
    }

    private static SizingProposal WithDiameter(SizingProposal proposal, LimbInput? limb, double voltsPerTurn, double frequency, double wanted, double factor)
    {
        var area = Sizing.NetArea(voltsPerTurn, frequency, wanted);
        proposal = proposal with { NeededNetArea_mm2 = area * 1e6 };
        try
        {
            const double increment = DiameterIncrement_mm / 1000;
            var sized = limb?.StockWidths_mm is { Count: > 0 } stock
                ? Sizing.DiameterFromStock(area, factor, [.. stock.Select(w => w / 1000)], limb.Steps, increment)
                : Sizing.Diameter(area, factor, limb?.Steps ?? 7, increment);
            return proposal with
            {
                Diameter_mm = Math.Round(sized.Section.CircleDiameter_m * 1000, 6),
                FluxDensityWithDiameter_T = wanted * area / sized.NetArea_m2,
            };
        }
        catch (GeometryException)
        {
            return proposal;
        }
    }

    private static int? TurnsFor(DesignInput design, double wanted, LimbSection limb)
    {
        if (LimbVoltage_V(design) is not { } voltage || design.Order?.Frequency_Hz is not { } frequency || wanted <= 0 || frequency <= 0)
        {
            return null;
        }

        var exact = Sizing.FluxDensity(voltage, Tap(design), frequency, limb.NetArea_m2) / wanted;
        return exact is > 0 and < 1e7 ? Math.Max(1, (int)Math.Round(exact, MidpointRounding.AwayFromZero)) : null;
    }

    /// <summary>Turns in circuit over the turns given; a tap beyond any range is left for the estimate to refuse.</summary>
    private static double Tap(DesignInput design) => design.ExcitedWinding?.Tap_percent is { } tap and > -100 and < 1000 ? 1 + (tap / 100) : 1;

    /// <summary>Voltage across the winding of one limb: over √3 in star; a single-phase core carries half of its turns on each limb, the whole winding counts.</summary>
    private static double? LimbVoltage_V(DesignInput design) => (design.ExcitedWinding?.LineVoltage_V, design.ExcitedWinding?.Connection) switch
    {
        (not > 0, _) => null,
        ({ } u, "D" or "single") => u,
        ({ } u, null) when design.Order?.Phases == 1 => u,
        ({ } u, _) => u / Math.Sqrt(3),
    };
}
