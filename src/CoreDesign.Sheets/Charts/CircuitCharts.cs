using CoreDesign.Estimating.Circuits;

namespace CoreDesign.Sheets.Charts;

/// <summary>Waveforms of a solved circuit over one period. A chart takes as many lines as can be told apart.</summary>
public static class CircuitCharts
{
    public const int MostLines = 4;

    /// <summary>Currents of the windings, four to a chart.</summary>
    public static IReadOnlyList<Chart> WindingCurrents(CircuitAnswer answer, double? frequency_Hz, ChartOptions o)
    {
        ArgumentNullException.ThrowIfNull(answer);
        return Currents(answer.Waveforms.I, answer.Windings, "windings", "Current of the windings", frequency_Hz, o);
    }

    /// <summary>Currents of the supply lines.</summary>
    public static IReadOnlyList<Chart> LineCurrents(CircuitAnswer answer, double? frequency_Hz, ChartOptions o)
    {
        ArgumentNullException.ThrowIfNull(answer);
        return Currents(answer.Waveforms.Lines, answer.Lines, "lines", "Current of the supply lines", frequency_Hz, o);
    }

    /// <summary>Flux density of the named branches, at most four.</summary>
    public static Chart FluxDensity(CircuitAnswer answer, IReadOnlyList<string> branches, double? frequency_Hz, ChartOptions o)
    {
        ArgumentNullException.ThrowIfNull(answer);
        ArgumentNullException.ThrowIfNull(branches);
        ArgumentOutOfRangeException.ThrowIfGreaterThan(branches.Count, MostLines);
        var peaks = branches.Select(b => $"{b} {Value(answer.BPeak[b], "T")}");
        var description = branches.Count == 0 ? "No branch is chosen." : $"Flux density over one period. Peaks: {string.Join(", ", peaks)}.";
        var words = new PeriodWords("flux-density", "Flux density over one period", description, "flux density", "T") { Caption = "flux density" };
        return PeriodChart.Of(words, frequency_Hz, [.. branches.Select(b => (b, (IReadOnlyList<double>)answer.Waveforms.B[b]))], o, scaled: true);
    }

    private static IReadOnlyList<Chart> Currents(
        IReadOnlyDictionary<string, double[]> waves, IReadOnlyDictionary<string, CurrentAnswer> figures, string key, string title, double? frequency_Hz, ChartOptions o)
    {
        var groups = waves.Chunk(MostLines).ToArray();
        return
        [
            .. groups.Select((group, i) =>
            {
                var peaks = group.Select(w => $"{w.Key} {Value(figures[w.Key].Rms, "A")} rms, {Value(figures[w.Key].Peak, "A")} peak");
                var name = groups.Length > 1 ? $"{title}, {i + 1} of {groups.Length}" : title;
                var words = new PeriodWords(groups.Length > 1 ? $"{key}-{i + 1}" : key, name, $"Current over one period: {string.Join("; ", peaks)}.", "current", "A") { Caption = "current" };
                return PeriodChart.Of(words, frequency_Hz, [.. group.Select(w => (w.Key, (IReadOnlyList<double>)w.Value))], o, scaled: true);
            }),
        ];
    }

    private static string Value(double value, string unit) => Figures.With(Figures.Significant(value, 3), unit);
}
