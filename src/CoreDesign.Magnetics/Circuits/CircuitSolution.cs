namespace CoreDesign.Magnetics.Circuits;

/// <summary>
/// Periodic steady state of a circuit. Arrays run over one period, equal spacing from t = 0; first index is the branch or
/// winding in the circuit's order.
/// </summary>
public sealed record CircuitSolution
{
    public required MagneticCircuit Circuit { get; init; }
    public required int Points { get; init; }
    public required double[][] Flux_Wb { get; init; }
    public required double[][] FluxRate_Wb_per_s { get; init; }

    /// <summary>MMF drop of each branch, without its windings.</summary>
    public required double[][] Mmf_A { get; init; }
    public required double[][] WindingCurrent_A { get; init; }

    /// <summary>Heat of the hysteresis stops, counted stop by stop; independent of the terminal power.</summary>
    public required double[] HysteresisLoss_W { get; init; }
    public required double[] ClassicalLoss_W { get; init; }
    public required double[] ExcessLoss_W { get; init; }

    /// <summary>Heat of the extra-loss term.</summary>
    public required double[] ExtraLoss_W { get; init; }
    public required double CopperLoss_W { get; init; }
    public required double TerminalPower_W { get; init; }

    /// <summary>Branch flux per winding linkage (branches by windings), where the linkages alone settle every flux; else null.</summary>
    public double[,]? FluxPerLinkage { get; init; }

    public double CoreLoss_W => HysteresisLoss_W.Sum() + ClassicalLoss_W.Sum() + ExcessLoss_W.Sum() + ExtraLoss_W.Sum();

    public double BranchLoss_W(int branch) =>
        HysteresisLoss_W[branch] + ClassicalLoss_W[branch] + ExcessLoss_W[branch] + ExtraLoss_W[branch];

    public double PeakFluxDensity_T(int branch)
    {
        var peak = 0.0;
        foreach (var f in Flux_Wb[branch])
        {
            peak = Math.Max(peak, Math.Abs(f));
        }

        return peak / Circuit.Branches[branch].Area_m2;
    }
}
