using System.Globalization;
using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Steels;
using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Joints;

namespace CoreDesign.Estimating.Estimate;

/// <summary>Use case: a design in, its no-load figures out; nothing is stored.</summary>
public static class EstimateDesign
{
    public static Outcome<EstimateResult> Run(DesignInput design, SteelCatalog steels, CancellationToken cancel = default) =>
        Prepare<EstimateResult>(design, steels, core => EstimateShape.Of(core, cancel));

    /// <summary>The highest flux density for which steel data are taken (see the rules of the import); no law here knows anything beyond.</summary>
    internal const double Highest_T = 3;

    /// <summary>Checks the design, prepares the core and runs <paramref name="solve"/> on it; every refusal becomes part of the outcome.</summary>
    internal static Outcome<T> Prepare<T>(DesignInput design, SteelCatalog steels, Func<CoreAtWork, T> solve)
        where T : class
    {
        ArgumentNullException.ThrowIfNull(design);
        ArgumentNullException.ThrowIfNull(steels);
        var resolver = new DesignResolver(design, steels);
        if (resolver.Resolve() is not { } resolved)
        {
            return new() { Errors = resolver.Errors };
        }

        if (FarAboveSaturation(resolved) is { } reason)
        {
            return new() { Unsolvable = new Unsolvable(reason, null) };
        }

        try
        {
            return new() { Value = solve(new CoreAtWork(resolved)) };
        }
        catch (CircuitException e)
        {
            return new() { Unsolvable = new Unsolvable(e.Message, null) };
        }
        catch (NotConvergedException e)
        {
            return new() { Unsolvable = new Unsolvable(e.Message, e.Residual) };
        }
        catch (JointSolveException e)
        {
            return new() { Unsolvable = new Unsolvable(e.Message, e.Residual_T) };
        }
        catch (ArgumentException e) when (e is not ArgumentNullException)
        {
            return new() { Unsolvable = new Unsolvable(e.Message.Split(" (Parameter", StringSplitOptions.None)[0], null) };
        }
    }

    /// <summary>Why the design is beyond any law at rated voltage, or at a lowest frequency of its own; else null.</summary>
    private static string? FarAboveSaturation(ResolvedDesign design)
    {
        var extreme = design.LimbFluxDensity_T(design.HighestVoltage_percent, design.LowestFrequency_Hz);
        if (design.LimbFluxDensity_T(100, design.Supply.Frequency_Hz) is var rated && rated > Highest_T)
        {
            return Text($"The limbs would have to carry {rated:0.0#} T; the steel saturates at {design.Steel.SaturationPolarization_T.Value} T, and no figure is given beyond {Highest_T} T. Take more turns, a larger limb or a lower voltage.");
        }

        return extreme <= Highest_T || design.LowestFrequency_Hz >= design.Supply.Frequency_Hz ? null : Text(
            $"At {design.HighestVoltage_percent} % voltage and {design.LowestFrequency_Hz} Hz the limbs would have to carry {extreme:0.0#} T; the steel saturates at {design.Steel.SaturationPolarization_T.Value} T, and no figure is given beyond {Highest_T} T. Take a lower highest voltage, a higher lowest frequency, more turns or a larger limb.");
    }

    private static string Text(FormattableString text) => text.ToString(CultureInfo.InvariantCulture);
}
