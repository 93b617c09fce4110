namespace CoreDesign.Sheets.Charts;

/// <summary>What a chart over one period shows, and how it is named.</summary>
internal sealed record PeriodWords(string Key, string Title, string Description, string What, string Unit)
{
    /// <summary>Caption over the axis; the unit follows.</summary>
    public required string Caption { get; init; }
}

/// <summary>Waveforms over one period, equally spaced from its start and closed by their first point.</summary>
internal static class PeriodChart
{
    private const string Milli = "m", Micro = "\u00B5";
    private static readonly (double Size, string Prefix)[] Scales = [(1e6, "M"), (1e3, "k"), (1, ""), (1e-3, Milli), (1e-6, Micro), (1e-9, "n"), (1e-12, "p")];

    /// <param name="frequency_Hz">Where there is none the abscissa is the angle.</param>
    /// <param name="scaled">Choose a prefix for the unit so that axis and read-out have few digits; the data keep the plain unit.</param>
    public static Chart Of(PeriodWords words, double? frequency_Hz, IReadOnlyList<(string Name, IReadOnlyList<double> Values)> all, ChartOptions o, bool scaled = false)
    {
        ArgumentNullException.ThrowIfNull(o);
        var period = frequency_Hz is { } f && f > 0 ? 1000 / f : (double?)null;
        var (span, xName, xUnit) = period is { } p ? (p, "time", "ms") : (360, "angle", "\u00B0");
        var top = all.SelectMany(s => s.Values).Select(Math.Abs).DefaultIfEmpty(1).Max();
        var (size, prefix) = scaled ? Scale(top) : (1, "");
        var unit = prefix + words.Unit;
        var chart = new ChartBuilder(o, Axis.Exact(0, span, 4), Axis.Linear(-top / size, top / size, 4), null, $"{words.Caption}, {unit}", $"{xName}, {xUnit}");

        // The accent line lies on top: last drawn.
        foreach (var i in Enumerable.Range(0, all.Count).OrderBy(i => i == 1 ? 1 : 0))
        {
            var values = Closed(all[i].Values, size);
            var x = Enumerable.Range(0, values.Length).Select(k => span * k / (values.Length - 1)).ToArray();
            chart.Line(new(all[i].Name, unit, x, values, LineLook.Of(i)) { Label = all.Count > 1 ? all[i].Name : null });
        }

        var points = all.Select(s => s.Values.Count).DefaultIfEmpty(0).Max();
        var columns = new List<ChartColumn> { new($"{xName} ({xUnit})", [.. Enumerable.Range(0, points).Select(i => span * i / points)]) };
        columns.AddRange(all.Select(s => new ChartColumn($"{words.What} {s.Name} ({words.Unit})", s.Values)));
        return chart.Build(words.Key, words.Title, words.Description, xName, xUnit, new ChartTable(words.Key + ".csv", columns));
    }

    /// <summary>The prefix that leaves the largest value between 1 and 1000; below a millionth of a millionth the last one stays.</summary>
    public static (double Size, string Prefix) Scale(double largest) => largest == 0 ? (1, "") : Scales.Where(s => largest >= s.Size).DefaultIfEmpty(Scales[^1]).First();

    private static double[] Closed(IReadOnlyList<double> values, double size) => values.Count == 0 ? [] : [.. values.Select(v => v / size), values[0] / size];
}
