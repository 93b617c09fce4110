using CoreDesign.Magnetics.Circuits;

namespace CoreDesign.Magnetics.Transients;

/// <summary>MMF drop of one branch in time: its law, and the memory of its hysteresis at the last accepted instant.</summary>
internal sealed class BranchState(CircuitBranch branch)
{
    private readonly LoopMemory? _memory = branch.Steel is { Together.IsEmpty: false } steel ? new LoopMemory(steel.Together) : null;

    /// <summary>MMF at flux <paramref name="flux"/> if it went there from the last accepted instant, without rate terms, and its slope; nothing is remembered.</summary>
    public double StaticMmf(double flux, out double slope)
    {
        var b = flux / branch.Area_m2;
        var mmf = flux * branch.Reluctance_A_per_Wb;
        slope = branch.Reluctance_A_per_Wb;
        if (branch.Steel is { } steel)
        {
            var h = steel.Spine.Value(b, out var dh);
            if (_memory is not null)
            {
                h += _memory.Field(b, out var dm);
                dh += dm;
            }

            mmf += branch.Length_m * h;
            slope += branch.Length_m * dh / branch.Area_m2;
        }

        if (branch.Mmf is { } curve)
        {
            mmf += curve.Value(b, out var df);
            slope += df / branch.Area_m2;
        }

        return mmf;
    }

    /// <summary>MMF of classical, excess and extra-loss terms at flux rate <paramref name="rate"/> (Wb/s).</summary>
    public double RateMmf(double rate, out double slope)
    {
        var mmf = branch.ExtraLoss_A_s_per_Wb * rate;
        slope = branch.ExtraLoss_A_s_per_Wb;
        if (branch.Steel is { HasRate: true } steel)
        {
            mmf += branch.Length_m * steel.RateField(rate / branch.Area_m2, out var dh);
            slope += branch.Length_m * dh / branch.Area_m2;
        }

        return mmf;
    }

    /// <summary>Accepts the flux of this instant.</summary>
    public void Accept(double flux) => _memory?.Accept(flux / branch.Area_m2);
}
