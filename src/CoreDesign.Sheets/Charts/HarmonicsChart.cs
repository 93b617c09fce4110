using System.Globalization;
using CoreDesign.Estimating.Contracts;
using CoreDesign.Sheets.Scenes;

namespace CoreDesign.Sheets.Charts;

/// <summary>Odd harmonics of the current up to the thirteenth, each phase in per cent of its own fundamental.</summary>
public static class HarmonicsChart
{
    private static readonly int[] Orders = [1, 3, 5, 7, 9, 11, 13];

    public static Chart Of(EstimateResult r, ChartOptions o)
    {
        ArgumentNullException.ThrowIfNull(r);
        ArgumentNullException.ThrowIfNull(o);
        var phases = r.Lines.Select(l => (l.Phase, Shares: Orders.Select(n => Share(l, n)).ToArray())).ToArray();
        var top = Math.Max(100, phases.SelectMany(p => p.Shares).DefaultIfEmpty(100).Max());
        var many = phases.Length > 1;
        var caption = "% of the fundamental" + (many ? $"; figure: phase {phases[0].Phase}" : "");

        // Room above the highest bar for its figure comes from the head of the plot.
        var chart = new ChartBuilder(o, new Axis(0, Orders.Length, false, [.. Orders.Select((n, i) => (i + 0.5, n.ToString(CultureInfo.InvariantCulture)))]), Axis.Linear(0, top, 4), null, caption, "harmonic order");
        var group = chart.Plot.Width / Orders.Length;
        var width = Math.Min(12, 0.66 * group / Math.Max(phases.Length, 1));
        for (var i = 0; i < Orders.Length; i++)
        {
            var middle = chart.X(i + 0.5);
            for (var p = 0; p < phases.Length; p++)
            {
                var x = middle + ((p - (phases.Length / 2.0)) * width);
                chart.Bar(x + 0.5, width - 1, phases[p].Shares[i], Fill(p), $"Phase {phases[p].Phase}, order {Orders[i].ToString(CultureInfo.InvariantCulture)}: {Figures.With(Figures.Significant(phases[p].Shares[i], 3), "%")}");
            }

            if (phases.Length > 0 && Orders[i] > 1)
            {
                var highest = phases.Max(p => p.Shares[i]);
                var figure = Figures.Fixed(phases[0].Shares[i], phases[0].Shares[i] is > 0 and < 1 ? 1 : 0);
                chart.Text(new TextMark(new(middle, Math.Max(chart.Y(highest) - 4, chart.Plot.Y + o.TextSize)), figure, o.TextSize, Anchor.Middle, Ink.Ink2));
            }
        }

        var columns = new List<ChartColumn> { new("order", [.. Orders.Select(n => (double)n)]) };
        columns.AddRange(phases.Select(p => new ChartColumn($"phase {p.Phase} (% of fundamental)", p.Shares)));
        var words = phases.Select(p => $"phase {p.Phase}: " + string.Join(", ", Orders.Skip(1).Select((n, i) => $"{n.ToString(CultureInfo.InvariantCulture)}: {Figures.With(Figures.Significant(p.Shares[i + 1], 2), "%")}")));
        return chart.Build("harmonics", "Harmonics of the current", $"Odd harmonics of the no-load current in per cent of the fundamental; {string.Join("; ", words)}.", "order", "", new ChartTable("harmonics.csv", columns));
    }

    private static Paint Fill(int phase) => (phase % 3) switch { 0 => Ink.Ink2, 1 => Ink.Accent, _ => Ink.Edge };

    private static double Share(LineResult line, int order)
    {
        double At(int n) => line.Harmonics.FirstOrDefault(h => h.Order == n)?.Rms_A ?? 0;
        var first = At(1);
        return first > 0 ? 100 * At(order) / first : 0;
    }
}
