namespace CoreDesign.Magnetics.Circuits;

/// <summary>MMF drop of one branch in time: its law, and the memory of its hysteresis stops at the last accepted instant.</summary>
internal sealed class BranchState
{
    private readonly CircuitBranch _branch;
    private readonly double[] _threshold;
    private readonly double[] _weight;
    private readonly double[] _memory;
    private readonly double[] _memoryAtTurn;
    private double _lastB;
    private double _lastBAtTurn;

    public BranchState(CircuitBranch branch)
    {
        _branch = branch;
        var stops = branch.Steel?.Stops ?? [];
        _threshold = [.. stops.Select(s => s.Threshold_T)];
        _weight = [.. stops.Select(s => s.Weight_A_per_m_T)];
        _memory = new double[stops.Length];
        _memoryAtTurn = new double[stops.Length];
    }

    /// <summary>MMF of the memory-free, rate-free part at flux <paramref name="flux"/>, and its slope.</summary>
    public double StaticMmf(double flux, out double slope)
    {
        var b = flux / _branch.Area_m2;
        var mmf = flux * _branch.Reluctance_A_per_Wb;
        slope = _branch.Reluctance_A_per_Wb;
        if (_branch.Steel is { } steel)
        {
            mmf += _branch.Length_m * steel.Spine.Value(b, out var dh);
            slope += _branch.Length_m * dh / _branch.Area_m2;
        }

        if (_branch.Mmf is { } curve)
        {
            mmf += curve.Value(b, out var df);
            slope += df / _branch.Area_m2;
        }

        return mmf;
    }

    /// <summary>MMF of the stops if the flux went to <paramref name="flux"/> from the last accepted instant; nothing is remembered.</summary>
    public double StopMmf(double flux, out double slope)
    {
        double h = 0, dh = 0, step = (flux / _branch.Area_m2) - _lastB;
        for (var i = 0; i < _threshold.Length; i++)
        {
            var x = _memory[i] + step;
            var r = _threshold[i];
            if (x > r)
            {
                x = r;
            }
            else if (x < -r)
            {
                x = -r;
            }
            else
            {
                dh += _weight[i];
            }

            h += _weight[i] * x;
        }

        slope = dh * _branch.Length_m / _branch.Area_m2;
        return h * _branch.Length_m;
    }

    /// <summary>MMF of classical, excess and extra-loss terms at flux rate <paramref name="rate"/> (Wb/s).</summary>
    public double RateMmf(double rate, out double slope)
    {
        var mmf = _branch.ExtraLoss_A_s_per_Wb * rate;
        slope = _branch.ExtraLoss_A_s_per_Wb;
        if (_branch.Steel is { HasRate: true } steel)
        {
            mmf += _branch.Length_m * steel.RateField(rate / _branch.Area_m2, out var dh);
            slope += _branch.Length_m * dh / _branch.Area_m2;
        }

        return mmf;
    }

    /// <summary>Accepts the flux of this instant: moves the stops.</summary>
    public void Accept(double flux)
    {
        var b = flux / _branch.Area_m2;
        var step = b - _lastB;
        for (var i = 0; i < _threshold.Length; i++)
        {
            _memory[i] = Math.Clamp(_memory[i] + step, -_threshold[i], _threshold[i]);
        }

        _lastB = b;
    }

    /// <summary>
    /// Turns the memory over, as half-wave symmetry does from one half period to the next. With <paramref name="mean"/> the next half period starts
    /// from the mean of what the last one started from and what it left.
    /// </summary>
    public void Turn(bool mean)
    {
        _lastB = mean ? 0.5 * (_lastBAtTurn - _lastB) : -_lastB;
        _lastBAtTurn = _lastB;
        for (var i = 0; i < _memory.Length; i++)
        {
            _memory[i] = mean ? 0.5 * (_memoryAtTurn[i] - _memory[i]) : -_memory[i];
            _memoryAtTurn[i] = _memory[i];
        }
    }
}
