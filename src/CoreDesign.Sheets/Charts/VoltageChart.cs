using CoreDesign.Estimating.Contracts;
using CoreDesign.Magnetics.Materials;
using CoreDesign.Sheets.Scenes;

namespace CoreDesign.Sheets.Charts;

/// <summary>No-load loss and current against voltage, solved points dotted; the current's axis is cut where saturation would flatten all the rest.</summary>
public static class VoltageChart
{
    public static Chart Of(Study study, ChartOptions o)
    {
        ArgumentNullException.ThrowIfNull(study);
        ArgumentNullException.ThrowIfNull(o);
        var points = study.VoltageCurve.OrderBy(p => p.Voltage_percent).ToArray();
        if (points.Length < 2)
        {
            throw new ArgumentException($"Loss and current against voltage need at least two solved points; the study holds {points.Length}.", nameof(study));
        }

        var curve = new Curve(
            "voltage",
            "voltage",
            "voltage, % of rated",
            "voltage (% of rated)",
            [.. points.Select(p => p.Voltage_percent)],
            [.. points.Select(p => p.NoLoadLoss_W)],
            [.. points.Select(p => p.NoLoadCurrent_percent)],
            [new("peak flux density (T)", [.. points.Select(p => p.PeakFluxDensity_T)])]);
        return Draw(curve, study.Estimate.Inputs.Order?.HighestVoltage_percent, o);
    }

    /// <summary>The same against volts per hertz: rated voltage at other frequencies.</summary>
    public static Chart OfVoltsPerHertz(EstimateResult estimate, MarginsResult margins, ChartOptions o)
    {
        ArgumentNullException.ThrowIfNull(estimate);
        ArgumentNullException.ThrowIfNull(margins);
        ArgumentNullException.ThrowIfNull(o);
        var points = margins.FluxCurve.OrderBy(p => p.VoltsPerHertz_percent).ToArray();
        if (points.Length < 2)
        {
            throw new ArgumentException($"Loss and current against volts per hertz need at least two solved points; the margins hold {points.Length}.", nameof(margins));
        }

        var order = estimate.Inputs.Order;
        var curve = new Curve(
            "volts-per-hertz",
            "U/f",
            "U/f at rated voltage, % of rated",
            "volts per hertz (% of rated)",
            [.. points.Select(p => p.VoltsPerHertz_percent)],
            [.. points.Select(p => p.NoLoadLoss_W)],
            [.. points.Select(p => p.NoLoadCurrent_percent)],
            [new("frequency (Hz)", [.. points.Select(p => p.Frequency_Hz)]), new("peak flux density (T)", [.. points.Select(p => p.PeakFluxDensity_T)])]);
        return Draw(curve, order?.HighestVoltage_percent * (order?.Frequency_Hz / (order?.LowestFrequency_Hz ?? order?.Frequency_Hz)), o);
    }

    private static Chart Draw(Curve c, double? highest, ChartOptions o)
    {
        var (u, loss, current) = (c.X, c.Loss_W, c.Current_percent);
        var mark = highest is { } h && h >= u[0] && h <= u[^1] ? h : 100;
        var (lossX, lossY) = Smooth(u, loss);
        var (currentX, currentY) = Smooth(u, current);
        var wanted = 2.5 * At(currentX, currentY, mark);
        var cut = current.Max() > 2 * wanted;
        var right = Axis.Linear(0, cut ? wanted : current.Max(), 4);
        var off = cut ? currentX.Where((_, i) => currentY[i] > right.High).DefaultIfEmpty(u[^1]).First() : (double?)null;
        var caption = "loss, W; right: current, %" + (off is { } v ? $" (off scale above {Figures.Fixed(v, 0)} %)" : "");
        var chart = new ChartBuilder(o, Axis.Exact(u[0], u[^1], 4), Axis.Linear(0, loss.Max(), 4), right, caption, c.XCaption);
        chart.Marker(100, "Rated");
        if (highest is { } top && top != 100)
        {
            chart.Marker(top, "Highest voltage");
        }

        chart.Line(new("loss", "W", lossX, lossY, LineLook.First) { Label = "loss, W", Dots = [.. u.Select((x, i) => new XY(x, loss[i]))] });
        chart.Line(new("current", "%", currentX, currentY, LineLook.Second) { Label = "current, %", Right = true, Dots = [.. u.Select((x, i) => new XY(x, current[i]))] });
        var table = new ChartTable(c.Key + ".csv", [new(c.Head, u), new("no-load loss (W)", loss), new("no-load current (% of rated)", current), .. c.More]);
        var words = new[] { 100, highest ?? 100 }.Distinct().Where(x => x >= u[0] && x <= u[^1])
            .Select(x => $"at {Figures.Plain(x, 1)} %: {Figures.With(Figures.Significant(At(lossX, lossY, x), 3), "W")} and {Figures.With(Figures.Significant(At(currentX, currentY, x), 3), "%")}");
        return chart.Build(c.Key, $"Loss and current against {c.What}", $"No-load loss and current from {Figures.Plain(u[0], 1)} to {Figures.Plain(u[^1], 1)} % of rated {c.What}; {string.Join("; ", words)}.", c.What, "%", table);
    }

    // Both rise from nothing at no voltage, which is what the kernel's interpolation starts from; a set that doesn't rise is joined straight.
    private static (double[] X, double[] Y) Smooth(double[] x, double[] y)
    {
        if (x[0] <= 0 || y[0] < 0 || Enumerable.Range(1, x.Length - 1).Any(i => x[i] <= x[i - 1] || y[i] < y[i - 1]))
        {
            return (x, y);
        }

        var curve = new MonotoneCurve(x, y, 0);
        var fine = Enumerable.Range(0, 121).Select(i => x[0] + ((x[^1] - x[0]) * i / 120)).Concat(x).Distinct().Order().ToArray();
        return (fine, [.. fine.Select(v => curve.Value(v))]);
    }

    private static double At(double[] x, double[] y, double at)
    {
        var i = Math.Clamp(Array.FindIndex(x, v => v >= at), 1, x.Length - 1);
        return y[i - 1] + ((y[i] - y[i - 1]) * (at - x[i - 1]) / (x[i] - x[i - 1]));
    }

    private sealed record Curve(string Key, string What, string XCaption, string Head, double[] X, double[] Loss_W, double[] Current_percent, IReadOnlyList<ChartColumn> More);
}
