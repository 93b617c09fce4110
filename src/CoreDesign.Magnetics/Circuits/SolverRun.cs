namespace CoreDesign.Magnetics.Circuits;

/// <summary>One solve of a prepared circuit: its supply, extra losses and points, and what they impose on each path.</summary>
internal sealed class SolverRun
{
    private readonly (double Re, double Im)[] _linkage;
    private readonly double[]? _extra;

    public SolverRun(PreparedCircuit prepared, Supply supply, double[]? extraLoss_A_s_per_Wb, SolverOptions options)
    {
        Prepared = prepared;
        Supply = supply;
        Options = options;
        _extra = extraLoss_A_s_per_Wb;
        PathExtra = new double[prepared.Paths.Length];
        for (var b = 0; b < prepared.Places.Length; b++)
        {
            PathExtra[prepared.Places[b].Path] += BranchExtra(b);
        }

        _linkage = new (double, double)[Reduction.Imposed.Length];
        for (var w = 0; w < _linkage.Length; w++)
        {
            var winding = Circuit.Windings[Reduction.Imposed[w]];
            _linkage[w] = SupplyWaveform.Linkage(supply, winding.Phase);
            HasOffset |= winding.LinkageOffset_Wb != 0;
        }

        // Sources and materials are odd, so the state repeats with the opposite sign after half a period, unless direct current breaks that.
        Span = options.UseSymmetry && !HasOffset ? Points / 2 : Points;
    }

    public PreparedCircuit Prepared { get; }

    public MagneticCircuit Circuit => Prepared.Circuit;

    public CircuitReduction Reduction => Prepared.Reduction;

    public FluxPath[] Paths => Prepared.Paths;

    public Supply Supply { get; }

    public SolverOptions Options { get; }

    public int Points => Options.PointsPerPeriod;

    /// <summary>Points that are solved: half a period or the whole.</summary>
    public int Span { get; }

    public bool HasOffset { get; }

    /// <summary>Extra-loss coefficient of each path.</summary>
    public double[] PathExtra { get; }

    public double BranchExtra(int branch) => _extra is null ? Circuit.Branches[branch].ExtraLoss_A_s_per_Wb : _extra[branch];

    /// <summary>Extra-loss coefficients between the free fluxes, free by free.</summary>
    public double[] FreeExtra()
    {
        var f = Reduction.FreeCount;
        var extra = new double[f * f];
        for (var p = 0; p < Paths.Length; p++)
        {
            var q = Paths[p].PerFree;
            for (var i = 0; i < f; i++)
            {
                for (var j = 0; j < f; j++)
                {
                    extra[(i * f) + j] += q[i] * PathExtra[p] * q[j];
                }
            }
        }

        return extra;
    }

    /// <summary>The same run with other extra losses.</summary>
    public SolverRun With(double[] extraLoss_A_s_per_Wb) => new(Prepared, Supply, extraLoss_A_s_per_Wb, Options);

    /// <summary>The sine that the imposed linkages give to a path: re·cos(wt) - im·sin(wt), Wb.</summary>
    public (double Re, double Im) FluxPhasor(int path)
    {
        double re = 0, im = 0;
        for (var w = 0; w < _linkage.Length; w++)
        {
            re += Paths[path].PerLinkage[w] * _linkage[w].Re;
            im += Paths[path].PerLinkage[w] * _linkage[w].Im;
        }

        return (re, im);
    }

    /// <summary>The same for the linkage of a driven winding.</summary>
    public (double Re, double Im) DrivenPhasor(int driven)
    {
        double re = 0, im = 0;
        for (var w = 0; w < _linkage.Length; w++)
        {
            re += Reduction.DrivenPerLinkage[driven, w] * _linkage[w].Re;
            im += Reduction.DrivenPerLinkage[driven, w] * _linkage[w].Im;
        }

        return (re, im);
    }

    /// <summary>Writes the flux that the imposed linkages give to a path, offsets counted, and its rate.</summary>
    public void Impose(int path, double[] flux, double[] rate)
    {
        var table = Excitation.PeriodTable.Of(Points);
        double[] cos = table.Cos, sin = table.Sin;
        var (re, im) = FluxPhasor(path);
        var w = 2 * Math.PI * Supply.Frequency_Hz;
        var offset = 0.0;
        for (var k = 0; k < _linkage.Length; k++)
        {
            offset += Paths[path].PerLinkage[k] * Circuit.Windings[Reduction.Imposed[k]].LinkageOffset_Wb;
        }

        for (var t = 0; t < flux.Length; t++)
        {
            flux[t] = (re * cos[t]) - (im * sin[t]) + offset;
            rate[t] = -w * ((re * sin[t]) + (im * cos[t]));
        }
    }

    /// <summary>Currents of all windings: imposed ones from the paths' MMF, driven ones as found.</summary>
    public double[][] Currents(PathWaves[] paths, double[][] driven)
    {
        var current = new double[Circuit.Windings.Count][];
        for (var d = 0; d < Reduction.Driven.Length; d++)
        {
            current[Reduction.Driven[d]] = driven[d];
        }

        for (var w = 0; w < Reduction.Imposed.Length; w++)
        {
            var i = current[Reduction.Imposed[w]] = new double[Span];
            foreach (var path in paths)
            {
                Add(i, path.Mmf_A, path.Path.PerLinkage[w]);
            }

            for (var d = 0; d < Reduction.Driven.Length; d++)
            {
                Add(i, driven[d], -Reduction.DrivenPerLinkage[d, w]);
            }
        }

        return current;
    }

    private static void Add(double[] to, double[] x, double factor)
    {
        for (var t = 0; factor != 0 && t < to.Length && t < x.Length; t++)
        {
            to[t] += factor * x[t];
        }
    }
}
