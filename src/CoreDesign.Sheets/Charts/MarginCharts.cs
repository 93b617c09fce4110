using CoreDesign.Estimating.Contracts;
using CoreDesign.Sheets.Scenes;

namespace CoreDesign.Sheets.Charts;

/// <summary>Charts of the margins to saturation: the worst part's peak flux density, the inrush, and the current under a direct current.</summary>
public static class MarginCharts
{
    /// <summary>Highest peak flux density of any part against voltage and against volts per hertz, below the saturation polarization.</summary>
    public static Chart PeakFluxDensity(EstimateResult e, IReadOnlyList<VoltagePointResult> curve, MarginsResult m, ChartOptions o)
    {
        ArgumentNullException.ThrowIfNull(e);
        ArgumentNullException.ThrowIfNull(curve);
        ArgumentNullException.ThrowIfNull(m);
        ArgumentNullException.ThrowIfNull(o);
        if (curve.Count < 2)
        {
            throw new ArgumentException($"Peak flux density against voltage needs at least two solved points; the study holds {curve.Count}.", nameof(curve));
        }

        double[] u = [.. curve.Select(p => p.Voltage_percent)], b = [.. curve.Select(p => p.PeakFluxDensity_T)];
        double[] q = [.. m.FluxCurve.Select(p => p.VoltsPerHertz_percent)], c = [.. m.FluxCurve.Select(p => p.PeakFluxDensity_T)];
        var js = e.Margin.SaturationPolarization_T;
        double low = u.Concat(q).Min(), high = u.Concat(q).Max(), floor = b.Concat(c).Min();
        var chart = new ChartBuilder(o, Axis.Exact(low, high, 4), Axis.Linear(Math.Min(floor, 1), Math.Max(b.Concat(c).Max(), js), 4), null, "highest peak flux density of any part, T", "voltage or U/f, % of rated");
        chart.Marker(100, "Rated");
        chart.Line(new("saturation polarization", "T", [low, high], [js, js], LineLook.Third) { Label = "saturation" });
        chart.Line(new("against U/f", "T", q, c, LineLook.Second));
        chart.Line(new("against voltage", "T", u, b, LineLook.First) { Dots = [.. u.Select((x, i) => new XY(x, b[i]))] });
        var table = new ChartTable("peak-flux-density.csv", [new("voltage (% of rated)", u), new("peak flux density (T)", b), new("volts per hertz (% of rated)", q), new("peak flux density at rated voltage (T)", c)]);
        var words = $"Highest peak flux density of any part from {Figures.Plain(u[0], 1)} to {Figures.Plain(u[^1], 1)} % of rated voltage: {Figures.With(Figures.Fixed(b[0], 2), "T")} to {Figures.With(Figures.Fixed(b[^1], 2), "T")}; saturation polarization {Figures.With(Figures.Fixed(js, 2), "T")}.";
        return chart.Build("peak-flux-density", "Peak flux density", words, "voltage or U/f", "%", table);
    }

    public static Chart Inrush(InrushResult r, ChartOptions o)
    {
        ArgumentNullException.ThrowIfNull(r);
        ArgumentNullException.ThrowIfNull(o);
        if (r.Peak_A is not { } peak || r.Time_ms.Count < 2)
        {
            throw new ArgumentException("The inrush holds no solved current.", nameof(r));
        }

        var all = r.Lines.SelectMany(l => l.Current_A).ToArray();
        var chart = new ChartBuilder(o, Axis.Exact(0, r.Time_ms[^1], 4), Axis.Linear(Math.Min(0, all.Min()), Math.Max(0, all.Max()), 4), null, r.Lines.Count == 1 ? "current, A" : "line current, A", "time after closing, ms");
        foreach (var (line, i) in r.Lines.Select((l, i) => (l, i)).OrderBy(x => x.i == 1 ? 1 : 0))
        {
            chart.Line(new(line.Phase, "A", r.Time_ms, line.Current_A, LineLook.Of(i)) { Label = r.Lines.Count > 1 ? line.Phase : null });
        }

        var table = new ChartTable("inrush.csv", [new("time (ms)", r.Time_ms), .. r.Lines.Select(l => new ChartColumn($"current {l.Phase} (A)", l.Current_A))]);
        return chart.Build("inrush", "Inrush", $"Current after closing; highest peak {Figures.With(Figures.Significant(peak, 3), "A")} in {r.PeakLine} after {Figures.With(Figures.Fixed(r.PeakTime_ms ?? 0, 1), "ms")}.", "time", "ms", table);
    }

    /// <summary>Current over one period with direct current in the windings.</summary>
    public static Chart DcBias(EstimateResult e, DcBiasResult d, ChartOptions o)
    {
        ArgumentNullException.ThrowIfNull(e);
        ArgumentNullException.ThrowIfNull(d);
        ArgumentNullException.ThrowIfNull(o);
        if (d.Lines.Count == 0)
        {
            throw new ArgumentException("The direct current holds no solved waveform.", nameof(d));
        }

        var span = e.Inputs.Order?.Frequency_Hz is { } f && f > 0 ? 1000 / f : 20;
        var all = d.Lines.SelectMany(l => l.Waveform_A).ToArray();
        var chart = new ChartBuilder(o, Axis.Exact(0, span, 4), Axis.Linear(Math.Min(0, all.Min()), Math.Max(0, all.Max()), 4), null, d.Lines.Count == 1 ? "current, A" : "line current, A", "time, ms");
        foreach (var (line, i) in d.Lines.Select((l, i) => (l, i)).OrderBy(x => x.i == 1 ? 1 : 0))
        {
            double[] y = [.. line.Waveform_A, line.Waveform_A[0]];
            chart.Line(new(line.Phase, "A", [.. y.Select((_, n) => span * n / (y.Length - 1))], y, LineLook.Of(i)) { Label = d.Lines.Count > 1 ? line.Phase : null });
        }

        var points = d.Lines[0].Waveform_A.Count;
        var table = new ChartTable("dc-bias.csv", [new("time (ms)", [.. Enumerable.Range(0, points).Select(n => span * n / points)]), .. d.Lines.Select(l => new ChartColumn($"current {l.Phase} (A)", l.Waveform_A))]);
        return chart.Build("dc-bias", $"Current with {Figures.Plain(d.Bias_A)} A direct", $"Current over one period with {Figures.With(Figures.Plain(d.Bias_A), "A")} of direct current in each phase; peaks {string.Join(", ", d.Lines.Select(l => $"{l.Phase} {Figures.With(Figures.Significant(l.Peak_A, 3), "A")}"))}.", "time", "ms", table);
    }
}
