using CoreDesign.Magnetics.Excitation;
using CoreDesign.Magnetics.Materials;

namespace CoreDesign.Magnetics.Circuits;

/// <summary>
/// Circuits whose every flux follows from the windings' linkages: fluxes are sines and exact, fields are evaluated point by point, currents follow from
/// one constant matrix. No iteration. Equal sines that differ by a whole number of points, as those of three phases do, are evaluated once.
/// </summary>
internal static class ImposedFluxSolver
{
    public static CircuitSolution Solve(SolverRun run)
    {
        var options = run.Options;
        var f = run.Supply.Frequency_Hz;
        var waves = new List<(object Law, double Amplitude, double Phase, double[] Values, SteelWave? Heat)>();
        var span = run.Span;
        var table = PeriodTable.Of(options.PointsPerPeriod);
        var paths = new PathWaves[run.Paths.Length];
        for (var p = 0; p < paths.Length; p++)
        {
            var path = paths[p] = new PathWaves(run.Paths[p], span);
            run.Impose(p, path.Flux_Wb, path.Rate_Wb_per_s);
            if (run.HasOffset)
            {
                path.FillPieces(options.PointsPerPeriod, f);
            }
            else
            {
                var (re, im) = run.FluxPhasor(p);
                path.Peak_Wb = Math.Sqrt((re * re) + (im * im));
                FillPieces(path, Math.Atan2(im, re));
            }

            path.SumUp(run.PathExtra[p]);
        }

        return new CircuitSolution(run, paths, run.Currents(paths, []));

        void FillPieces(PathWaves path, double phase)
        {
            for (var i = 0; i < path.Fields.Length; i++)
            {
                var piece = path.Path.Steel[i];
                (path.Fields[i], path.Heat[i]) = Wave(piece.Law, path.Peak_Wb / piece.Area_m2, phase)!;
            }

            for (var i = 0; i < path.JointMmf.Length; i++)
            {
                var piece = path.Path.Joints[i];
                path.JointMmf[i] = Wave(piece.Curve, path.Peak_Wb / piece.Area_m2, phase).Wave;
            }
        }

        (SharedWave Wave, SteelWave Heat) Wave(object law, double amplitude, double phase)
        {
            if (options.UseSymmetry)
            {
                foreach (var known in waves)
                {
                    var shift = (phase - known.Phase) * options.PointsPerPeriod / (2 * Math.PI);
                    if (ReferenceEquals(known.Law, law) && Math.Abs(known.Amplitude - amplitude) <= 1e-12 * amplitude && Math.Abs(shift - Math.Round(shift)) < 1e-8)
                    {
                        var points = (int)Math.Round(shift) % options.PointsPerPeriod;
                        return (new SharedWave(known.Values, points < 0 ? points + options.PointsPerPeriod : points, options.PointsPerPeriod), known.Heat!);
                    }
                }
            }

            var heat = law is SheetLaw sheet ? SteelWave.OfSine(sheet, amplitude, phase, span, options.PointsPerPeriod, f) : null;
            var values = heat?.Field_A_per_m ?? OfSine((MonotoneCurve)law, amplitude, phase, span, table);
            waves.Add((law, amplitude, phase, values, heat));
            return (new SharedWave(values, 0, options.PointsPerPeriod), heat!);
        }
    }

    private static double[] OfSine(MonotoneCurve curve, double amplitude, double phase, int span, PeriodTable table)
    {
        var (sin, cos) = Math.SinCos(phase);
        var values = new double[span];
        for (var t = 0; t < span; t++)
        {
            values[t] = curve.Value(amplitude * ((table.Cos[t] * cos) - (table.Sin[t] * sin)));
        }

        return values;
    }
}
