namespace CoreDesign.Magnetics.Circuits;

/// <summary>MMF and losses of every branch for known flux waveforms over one period.</summary>
internal sealed class BranchEvaluation(MagneticCircuit circuit, int points)
{
    private readonly double[] _hysteresis = new double[circuit.Branches.Count];
    private readonly double[] _classical = new double[circuit.Branches.Count];
    private readonly double[] _excess = new double[circuit.Branches.Count];
    private readonly double[] _extra = new double[circuit.Branches.Count];

    public double[][] Mmf_A { get; } = [.. circuit.Branches.Select(_ => new double[points])];

    /// <summary>Evaluates branch <paramref name="index"/>; the memory is brought to its periodic state from the demagnetised one first.</summary>
    public void Run(int index, double[] flux, double[] rate)
    {
        var branch = circuit.Branches[index];
        var state = new BranchState(branch);
        var mmf = Mmf_A[index];
        if (state.HasStops)
        {
            // From zero, one period passes both extremes; what the stops do after that repeats.
            for (var t = 0; t < points; t++)
            {
                state.Accept(flux[t]);
            }

            state.ResetHeat();
            for (var t = 0; t < points; t++)
            {
                mmf[t] = state.Accept(flux[t]);
            }
        }

        double classical = 0, excess = 0, extra = 0;
        for (var t = 0; t < points; t++)
        {
            mmf[t] += state.StaticMmf(flux[t], out _) + state.RateMmf(rate[t], out _);
            extra += rate[t] * rate[t];
            if (branch.Steel is { } steel)
            {
                var s = rate[t] / branch.Area_m2;
                classical += steel.Eddy_A_s_per_m_T * s * s;
                excess += steel.ExcessField(s) * s;
            }
        }

        var volume = branch.Area_m2 * branch.Length_m;
        _hysteresis[index] = state.Heat_J_per_m3 * volume * circuit.Supply.Frequency_Hz;
        _classical[index] = classical * volume / points;
        _excess[index] = excess * volume / points;
        _extra[index] = branch.ExtraLoss_A_s_per_Wb * extra / points;
    }

    public CircuitSolution Solution(double[][] flux, double[][] rate, double[][] current, double[][] voltage)
    {
        double terminal = 0, copper = 0;
        for (var w = 0; w < current.Length; w++)
        {
            for (var t = 0; t < points; t++)
            {
                terminal += voltage[w][t] * current[w][t] / points;
                copper += circuit.Windings[w].Resistance_ohm * current[w][t] * current[w][t] / points;
            }
        }

        return new CircuitSolution
        {
            Circuit = circuit,
            Points = points,
            Flux_Wb = flux,
            FluxRate_Wb_per_s = rate,
            Mmf_A = Mmf_A,
            WindingCurrent_A = current,
            HysteresisLoss_W = _hysteresis,
            ClassicalLoss_W = _classical,
            ExcessLoss_W = _excess,
            ExtraLoss_W = _extra,
            CopperLoss_W = copper,
            TerminalPower_W = terminal,
        };
    }
}
