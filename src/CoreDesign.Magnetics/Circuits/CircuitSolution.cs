namespace CoreDesign.Magnetics.Circuits;

/// <summary>
/// Periodic steady state of a circuit. Arrays run over one period, equal spacing from t = 0; first index is the branch or
/// winding in the circuit's order. Waveforms of branches are written out when they are asked for.
/// </summary>
public sealed class CircuitSolution
{
    private readonly SolverRun _run;
    private readonly PathPlace[] _places;
    private readonly PathWaves[] _paths;
    private double[][]? _flux;
    private double[][]? _rate;
    private double[][]? _mmf;
    private double[]? _hysteresis;
    private double[]? _classical;
    private double[]? _excess;
    private double[]? _extra;

    internal CircuitSolution(SolverRun run, PathWaves[] paths, double[][] current)
    {
        _run = run;
        _places = run.Prepared.Places;
        _paths = paths;
        foreach (var path in paths)
        {
            for (var i = 0; i < path.Heat.Length; i++)
            {
                CoreLoss_W += path.Heat[i].Total_W_per_m3 * path.Path.Steel[i].Area_m2 * path.Path.Steel[i].Length_m;
            }
        }

        for (var p = 0; p < paths.Length; p++)
        {
            CoreLoss_W += run.PathExtra[p] * paths[p].MeanSquareRate;
        }

        WindingCurrent_A = new double[current.Length][];
        for (var w = 0; w < current.Length; w++)
        {
            WindingCurrent_A[w] = Signed(current[w], 1);
            var winding = Circuit.Windings[w];
            var (re, im) = SupplyWaveform.Linkage(run.Supply, winding.Phase);
            double power = 0, squares = 0;
            var table = Excitation.PeriodTable.Of(Points);
            for (var t = 0; t < current[w].Length; t++)
            {
                power -= ((re * table.Sin[t]) + (im * table.Cos[t])) * current[w][t];
                squares += current[w][t] * current[w][t];
            }

            TerminalPower_W += 2 * Math.PI * run.Supply.Frequency_Hz * power / current[w].Length;
            CopperLoss_W += winding.Resistance_ohm * squares / current[w].Length;
        }
    }

    internal SolverRun Run => _run;

    internal PathWaves[] Paths => _paths;

    /// <summary>The circuit as it was prepared; <see cref="Supply"/> says at which voltage it was solved.</summary>
    public MagneticCircuit Circuit => _run.Circuit;

    public Supply Supply => _run.Supply;

    public int Points => _run.Points;

    public double[][] Flux_Wb => _flux ??= OfPaths(p => p.Flux_Wb);

    public double[][] FluxRate_Wb_per_s => _rate ??= OfPaths(p => p.Rate_Wb_per_s);

    /// <summary>MMF drop of each branch, without its windings.</summary>
    public double[][] Mmf_A => _mmf ??= [.. Enumerable.Range(0, _places.Length).Select(BranchMmf)];

    public double[][] WindingCurrent_A { get; }

    /// <summary>Heat of hysteresis, counted along the path of the flux; independent of the terminal power.</summary>
    public double[] HysteresisLoss_W => _hysteresis ??= BranchHeat(h => h.Hysteresis_W_per_m3);

    public double[] ClassicalLoss_W => _classical ??= BranchHeat(h => h.Classical_W_per_m3);

    public double[] ExcessLoss_W => _excess ??= BranchHeat(h => h.Excess_W_per_m3);

    /// <summary>Heat of the extra-loss term.</summary>
    public double[] ExtraLoss_W => _extra ??= [.. _places.Select((p, b) => _run.BranchExtra(b) * _paths[p.Path].MeanSquareRate)];

    public double CopperLoss_W { get; }

    public double TerminalPower_W { get; }

    /// <summary>Branch flux per winding linkage (branches by windings), where the linkages alone settle every flux; else null.</summary>
    public double[,]? FluxPerLinkage => _run.Prepared.FluxesImposed ? _run.Reduction.PerLinkage : null;

    public double CoreLoss_W { get; }

    public double BranchLoss_W(int branch) =>
        HysteresisLoss_W[branch] + ClassicalLoss_W[branch] + ExcessLoss_W[branch] + ExtraLoss_W[branch];

    public double PeakFluxDensity_T(int branch) => _paths[_places[branch].Path].Peak_Wb / Circuit.Branches[branch].Area_m2;

    /// <summary>Extra-loss coefficient of a branch in this solve, A s/Wb.</summary>
    public double ExtraLossCoefficient(int branch) => _run.BranchExtra(branch);

    /// <summary>Mean square of the flux rate of a branch, Wb²/s²: what an extra loss of one A s/Wb costs in W.</summary>
    public double MeanSquareRate(int branch) => _paths[_places[branch].Path].MeanSquareRate;

    /// <summary>The steady state with other extra losses. Where linkages settle the fluxes only the currents change, and nothing is solved again.</summary>
    public CircuitSolution WithExtraLoss(double[] extraLoss_A_s_per_Wb, CancellationToken cancel = default)
    {
        ArgumentNullException.ThrowIfNull(extraLoss_A_s_per_Wb);
        if (!_run.Prepared.FluxesImposed)
        {
            return _run.Prepared.Solve(_run.Supply.Voltage_V, extraLoss_A_s_per_Wb, _run.Options, cancel);
        }

        var run = _run.With(extraLoss_A_s_per_Wb);
        var paths = new PathWaves[_paths.Length];
        for (var p = 0; p < paths.Length; p++)
        {
            paths[p] = _paths[p].With(run.PathExtra[p]);
        }

        return new CircuitSolution(run, paths, run.Currents(paths, []));
    }

    /// <summary>Branches of one path and sign share an array.</summary>
    private double[][] OfPaths(Func<PathWaves, double[]> wave)
    {
        var (along, against) = (new double[_paths.Length][], new double[_paths.Length][]);
        return Array.ConvertAll(_places, p => p.Sign > 0
            ? along[p.Path] ??= Signed(wave(_paths[p.Path]), 1)
            : against[p.Path] ??= Signed(wave(_paths[p.Path]), -1));
    }

    private double[] BranchHeat(Func<SteelWave, double> part)
    {
        var heat = new double[_places.Length];
        for (var b = 0; b < heat.Length; b++)
        {
            var (branch, place) = (Circuit.Branches[b], _places[b]);
            heat[b] = place.Steel < 0 ? 0 : part(_paths[place.Path].Heat[place.Steel]) * branch.Area_m2 * branch.Length_m;
        }

        return heat;
    }

    private double[] BranchMmf(int b)
    {
        var (branch, place, extra) = (Circuit.Branches[b], _places[b], _run.BranchExtra(b));
        var path = _paths[place.Path];
        var mmf = new double[path.Mmf_A.Length];
        for (var t = 0; t < mmf.Length; t++)
        {
            // The path's direction; the sign comes last.
            mmf[t] = (branch.Reluctance_A_per_Wb * path.Flux_Wb[t]) + (extra * path.Rate_Wb_per_s[t]);
        }

        if (place.Steel >= 0)
        {
            path.Fields[place.Steel].AddTo(mmf, branch.Length_m);
        }

        if (place.Joint >= 0)
        {
            path.JointMmf[place.Joint].AddTo(mmf, 1);
        }

        return Signed(mmf, place.Sign);
    }

    /// <summary>The whole period from half of it or all of it.</summary>
    private double[] Signed(double[] x, int sign)
    {
        var whole = new double[Points];
        for (var t = 0; t < x.Length; t++)
        {
            whole[t] = sign * x[t];
        }

        for (var t = x.Length; t < Points; t++)
        {
            whole[t] = -whole[t - x.Length];
        }

        return whole;
    }
}
