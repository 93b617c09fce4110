namespace CoreDesign.Magnetics.Joints;

/// <summary>The lattice of a joint was not solved: Newton's method stopped short, or the drop that came out breaks a law.</summary>
public sealed class JointSolveException(string message, double fluxDensity_T, double residual_T) : Exception(message)
{
    /// <summary>Mean flux density at which it stopped.</summary>
    public double FluxDensity_T { get; } = fluxDensity_T;

    /// <summary>Largest imbalance of flux at a node, as a flux density of the sheet.</summary>
    public double Residual_T { get; } = residual_T;
}
