namespace CoreDesign.Magnetics.Circuits;

/// <summary>MMF and losses of every branch for known flux waveforms over one period.</summary>
internal sealed class BranchEvaluation(MagneticCircuit circuit, int points)
{
    private readonly double[] _hysteresis = new double[circuit.Branches.Count];
    private readonly double[] _classical = new double[circuit.Branches.Count];
    private readonly double[] _excess = new double[circuit.Branches.Count];
    private readonly double[] _extra = new double[circuit.Branches.Count];

    // Limb, corner and yoke of one phase often share one waveform: each distinct one is worked out once.
    private readonly List<SteelWave> _waves = [];

    public double[][] Mmf_A { get; } = [.. circuit.Branches.Select(_ => new double[points])];

    public void Run(int index, double[] flux, double[] rate)
    {
        var branch = circuit.Branches[index];
        var mmf = Mmf_A[index];
        double area = branch.Area_m2, extra = 0;
        for (var t = 0; t < points; t++)
        {
            mmf[t] = (flux[t] * branch.Reluctance_A_per_Wb) + (branch.ExtraLoss_A_s_per_Wb * rate[t]);
            extra += rate[t] * rate[t];
            if (branch.Mmf is { } curve)
            {
                mmf[t] += curve.Value(flux[t] / area);
            }
        }

        _extra[index] = branch.ExtraLoss_A_s_per_Wb * extra / points;
        if (branch.Steel is not null)
        {
            AddSteel(index, flux, rate);
        }
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

    private void AddSteel(int index, double[] flux, double[] rate)
    {
        var branch = circuit.Branches[index];
        var law = branch.Steel!;
        var b = Array.ConvertAll(flux, f => f / branch.Area_m2);
        SteelWave? wave = null;
        var sign = 0;
        foreach (var known in _waves)
        {
            sign = known.SignFor(law, b);
            if (sign != 0)
            {
                wave = known;
                break;
            }
        }

        if (wave is null)
        {
            sign = 1;
            wave = new SteelWave(law, b, Array.ConvertAll(rate, s => s / branch.Area_m2), circuit.Supply.Frequency_Hz);
            _waves.Add(wave);
        }

        for (var t = 0; t < points; t++)
        {
            Mmf_A[index][t] += sign * branch.Length_m * wave.Field_A_per_m[t];
        }

        var volume = branch.Area_m2 * branch.Length_m;
        _hysteresis[index] = wave.Hysteresis_W_per_m3 * volume;
        _classical[index] = wave.Classical_W_per_m3 * volume;
        _excess[index] = wave.Excess_W_per_m3 * volume;
    }
}
