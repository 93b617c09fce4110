namespace CoreDesign.Magnetics.Circuits;

/// <summary>A winding driven by voltage: what the imposed linkages leave of its voltage and linkage, with the sign of the left side of its equation.</summary>
internal sealed class DrivenWinding
{
    public DrivenWinding(SolverRun run, int d)
    {
        var winding = run.Circuit.Windings[run.Reduction.Driven[d]];
        var table = Excitation.PeriodTable.Of(run.Points);
        var (re, im) = run.DrivenPhasor(d);
        var own = SupplyWaveform.Linkage(run.Supply, winding.Phase);
        (re, im) = (re - own.Re, im - own.Im);
        var w = 2 * Math.PI * run.Supply.Frequency_Hz;
        Resistance_ohm = winding.Resistance_ohm;
        InStar = run.Supply.Connection == SupplyConnection.StarIsolated && winding.Phase != WindingPhase.Closed;
        LinkageLeft_Wb = new double[run.Span];
        VoltageLeft_V = new double[run.Span];
        for (var t = 0; t < run.Span; t++)
        {
            LinkageLeft_Wb[t] = (re * table.Cos[t]) - (im * table.Sin[t]);
            VoltageLeft_V[t] = -w * ((re * table.Sin[t]) + (im * table.Cos[t]));
        }
    }

    public double Resistance_ohm { get; }

    public bool InStar { get; }

    public double[] LinkageLeft_Wb { get; }

    public double[] VoltageLeft_V { get; }
}

/// <summary>What the imposed linkages alone give at every point: flux density and rate of the curved pieces, and the linear MMF of the free rows.</summary>
internal sealed class ImposedPart
{
    public ImposedPart(SolverRun run)
    {
        var pieces = run.Prepared.Free;
        int n = pieces.Count, f = pieces.FreeCount, span = run.Span;
        FluxDensity_T = new double[n * span];
        Rate_T_per_s = new double[pieces.HasRate ? n * span : 0];
        Mmf_A = new double[f * span];
        ExtraMmf_A = new double[f * span];
        Largest_T = 1e-3;
        var (flux, rate) = (new double[span], new double[span]);
        for (int p = 0, i = 0; p < run.Paths.Length; p++)
        {
            var path = run.Paths[p];
            if (!path.IsFree)
            {
                continue;
            }

            run.Impose(p, flux, rate);
            for (; i < n && pieces.Path[i] == p; i++)
            {
                var perArea = pieces.BasePerArea[i];
                for (var t = 0; t < span; t++)
                {
                    var b = flux[t] * perArea;
                    FluxDensity_T[(t * n) + i] = b;
                    Largest_T = Math.Max(Largest_T, Math.Abs(b));
                }

                for (var t = 0; t < span && pieces.HasRate; t++)
                {
                    Rate_T_per_s[(t * n) + i] = rate[t] * perArea;
                }
            }

            for (var j = 0; j < f; j++)
            {
                var (reluctance, extra) = (path.PerFree[j] * path.Reluctance_A_per_Wb, path.PerFree[j] * run.PathExtra[p]);
                for (var t = 0; t < span; t++)
                {
                    Mmf_A[(t * f) + j] += reluctance * flux[t];
                    ExtraMmf_A[(t * f) + j] += extra * rate[t];
                }
            }
        }
    }

    /// <summary>Points by pieces.</summary>
    public double[] FluxDensity_T { get; }

    /// <summary>Points by pieces; empty where no law has rate terms.</summary>
    public double[] Rate_T_per_s { get; }

    /// <summary>Points by free rows.</summary>
    public double[] Mmf_A { get; }

    public double[] ExtraMmf_A { get; }

    /// <summary>Largest flux density; what counts as small is measured by it.</summary>
    public double Largest_T { get; }
}
