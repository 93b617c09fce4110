namespace CoreDesign.Magnetics.Circuits;

/// <summary>An odd wave that another piece shares, read <see cref="Shift"/> points later.</summary>
internal readonly record struct SharedWave(double[] Values, int Shift, int Points)
{
    /// <summary>Adds factor times the wave to a target of the same length.</summary>
    public void AddTo(double[] target, double factor)
    {
        var span = Values.Length;
        var halfWave = span < Points;
        var at = Shift % Points;
        for (var t = 0; t < span;)
        {
            var turned = halfWave && at >= span;
            var start = turned ? at - span : at;
            var count = Math.Min(span - start, span - t);
            var f = turned ? -factor : factor;
            var from = Values.AsSpan(start, count);
            var to = target.AsSpan(t, count);
            for (var i = 0; i < to.Length; i++)
            {
                to[i] += f * from[i];
            }

            t += count;
            at = (at + count) % Points;
        }
    }
}

/// <summary>Waveforms of one path over half a period or a whole one, and those of its pieces.</summary>
internal sealed class PathWaves
{
    public PathWaves(FluxPath path, int span)
    {
        Path = path;
        Flux_Wb = new double[span];
        Rate_Wb_per_s = new double[span];
        Mmf_A = new double[span];
        Fields = new SharedWave[path.Steel.Length];
        JointMmf = new SharedWave[path.Joints.Length];
        Heat = new SteelWave[path.Steel.Length];
    }

    private PathWaves(PathWaves other)
    {
        (Path, Flux_Wb, Rate_Wb_per_s, Peak_Wb) = (other.Path, other.Flux_Wb, other.Rate_Wb_per_s, other.Peak_Wb);
        (Fields, JointMmf, Heat) = (other.Fields, other.JointMmf, other.Heat);
        Mmf_A = new double[other.Mmf_A.Length];
    }

    public FluxPath Path { get; }

    public double[] Flux_Wb { get; }

    public double[] Rate_Wb_per_s { get; }

    /// <summary>MMF of all branches of the path, along its direction.</summary>
    public double[] Mmf_A { get; }

    public double Peak_Wb { get; set; }

    /// <summary>Field of each steel piece, MMF of one joint of each kind.</summary>
    public SharedWave[] Fields { get; }

    public SharedWave[] JointMmf { get; }

    public SteelWave[] Heat { get; }

    /// <summary>Mean square of the rate; the heat of an extra-loss term of one A s/Wb, W.</summary>
    public double MeanSquareRate { get; private set; }

    /// <summary>The waves of a like path in a copy of the circuit, read some points later.</summary>
    public PathWaves Shifted(FluxPath path, int shift, int points, double extraLoss_A_s_per_Wb)
    {
        var copy = new PathWaves(path, Flux_Wb.Length) { Peak_Wb = Peak_Wb };
        new SharedWave(Flux_Wb, shift, points).AddTo(copy.Flux_Wb, 1);
        new SharedWave(Rate_Wb_per_s, shift, points).AddTo(copy.Rate_Wb_per_s, 1);
        SharedWave Later(SharedWave x) => x with { Shift = (x.Shift + shift) % points };
        for (var i = 0; i < Fields.Length; i++)
        {
            (copy.Fields[i], copy.Heat[i]) = (Later(Fields[i]), Heat[i]);
        }

        for (var i = 0; i < JointMmf.Length; i++)
        {
            copy.JointMmf[i] = Later(JointMmf[i]);
        }

        copy.SumUp(extraLoss_A_s_per_Wb);
        return copy;
    }

    /// <summary>The same waves with another extra-loss term; only its own MMF is new.</summary>
    public PathWaves With(double extraLoss_A_s_per_Wb)
    {
        var other = new PathWaves(this);
        other.SumUp(extraLoss_A_s_per_Wb);
        return other;
    }

    /// <summary>Adds up the MMF of the whole path from its pieces.</summary>
    public void SumUp(double extra)
    {
        double reluctance = Path.Reluctance_A_per_Wb, squares = 0;
        for (var t = 0; t < Mmf_A.Length; t++)
        {
            Mmf_A[t] = (reluctance * Flux_Wb[t]) + (extra * Rate_Wb_per_s[t]);
            squares += Rate_Wb_per_s[t] * Rate_Wb_per_s[t];
        }

        MeanSquareRate = squares / Mmf_A.Length;
        for (var i = 0; i < Fields.Length; i++)
        {
            Fields[i].AddTo(Mmf_A, Path.Steel[i].Length_m);
        }

        for (var i = 0; i < JointMmf.Length; i++)
        {
            JointMmf[i].AddTo(Mmf_A, Path.Joints[i].Count);
        }
    }

    /// <summary>Pieces under whatever waveform the flux has.</summary>
    public void FillPieces(int points, double frequency_Hz)
    {
        foreach (var f in Flux_Wb)
        {
            Peak_Wb = Math.Max(Peak_Wb, Math.Abs(f));
        }

        for (var i = 0; i < Fields.Length; i++)
        {
            Heat[i] = SteelWave.Of(Path.Steel[i].Law, Flux_Wb, Rate_Wb_per_s, 1 / Path.Steel[i].Area_m2, points, frequency_Hz);
            Fields[i] = new SharedWave(Heat[i].Field_A_per_m, 0, points);
        }

        for (var i = 0; i < JointMmf.Length; i++)
        {
            var (curve, perArea) = (Path.Joints[i].Curve, 1 / Path.Joints[i].Area_m2);
            var mmf = new double[Flux_Wb.Length];
            for (var t = 0; t < mmf.Length; t++)
            {
                mmf[t] = curve.Value(Flux_Wb[t] * perArea);
            }

            JointMmf[i] = new SharedWave(mmf, 0, points);
        }
    }
}
