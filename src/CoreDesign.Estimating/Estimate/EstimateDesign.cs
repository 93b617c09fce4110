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
}
