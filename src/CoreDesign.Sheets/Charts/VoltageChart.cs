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

        double[] u = [.. points.Select(p => p.Voltage_percent)], loss = [.. points.Select(p => p.NoLoadLoss_W)], current = [.. points.Select(p => p.NoLoadCurrent_percent)];
        var highest = study.Estimate.Inputs.Order?.HighestVoltage_percent;
        var mark = highest is { } h && h >= u[0] && h <= u[^1] ? h : 100;
        var (lossX, lossY) = Smooth(u, loss);
        var (currentX, currentY) = Smooth(u, current);
        var wanted = 2.5 * At(currentX, currentY, mark);
        var cut = current.Max() > 2 * wanted;
        var right = Axis.Linear(0, cut ? wanted : current.Max(), 4);
        var off = cut ? currentX.Where((_, i) => currentY[i] > right.High).DefaultIfEmpty(u[^1]).First() : (double?)null;
        var caption = "loss, W; right: current, %" + (off is { } v ? $" (off scale above {Figures.Fixed(v, 0)} %)" : "");
        var chart = new ChartBuilder(o, Axis.Exact(u[0], u[^1], 4), Axis.Linear(0, loss.Max(), 4), right, caption, "voltage, % of rated");
        chart.Marker(100, "Rated voltage");
        if (highest is { } top && top != 100)
        {
            chart.Marker(top, "Highest voltage");
        }

        chart.Line(new("loss", "W", lossX, lossY, LineLook.First) { Label = "loss, W", Dots = [.. points.Select(p => new XY(p.Voltage_percent, p.NoLoadLoss_W))] });
        chart.Line(new("current", "%", currentX, currentY, LineLook.Second) { Label = "current, %", Right = true, Dots = [.. points.Select(p => new XY(p.Voltage_percent, p.NoLoadCurrent_percent))] });
        var table = new ChartTable("voltage.csv",
        [
            new("voltage (% of rated)", u), new("no-load loss (W)", loss), new("no-load current (% of rated)", current), new("peak flux density (T)", [.. points.Select(p => p.PeakFluxDensity_T)]),
        ]);
        var words = new[] { 100, highest ?? 100 }.Distinct().Where(x => x >= u[0] && x <= u[^1])
            .Select(x => $"at {Figures.Plain(x, 1)} %: {Figures.With(Figures.Significant(At(lossX, lossY, x), 3), "W")} and {Figures.With(Figures.Significant(At(currentX, currentY, x), 3), "%")}");
        return chart.Build("voltage", "Loss and current against voltage", $"No-load loss and current from {Figures.Plain(u[0], 1)} to {Figures.Plain(u[^1], 1)} % of rated voltage; {string.Join("; ", words)}.", "voltage", "%", table);
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
}
