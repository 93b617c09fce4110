using System.Globalization;
using CoreDesign.Estimating.Circuits;
using CoreDesign.Sheets;
using CoreDesign.Sheets.Charts;

namespace CoreDesign.Web.Features.Circuits;

/// <summary>A current with its place in the table: the group it belongs to and its name there.</summary>
public sealed record CurrentColumn(string Group, string Name, CurrentAnswer Current);

/// <summary>A row of the table of currents; harmonics have a phase beside their amplitude.</summary>
public sealed record CurrentRow(string Head, IReadOnlyList<(string Value, string? Phase)> Cells);

public sealed record BranchRow(string Name, string PeakFluxDensity, string Loss, string Share);

/// <summary>What is shown of a solved circuit, as text and charts; of the branches' waveforms as many as someone chose.</summary>
public sealed class CircuitView
{
    // Below this share of its rms value a harmonic is what the arithmetic leaves, and its phase means nothing.
    private const double Nothing = 1e-6;

    // The same of a branch's flux density beside the largest; branches of air may have a nominal area and little of it by right.
    private const double Noise = 1e-12;

    private static readonly ChartOptions Size = new() { Width = 580, Height = 260 };
    private readonly SolvedCircuit solved;
    private readonly HashSet<string> chosen;

    public CircuitView(SolvedCircuit solved)
    {
        ArgumentNullException.ThrowIfNull(solved);
        this.solved = solved;
        var a = solved.Answer;
        chosen = [.. a.BPeak.OrderByDescending(b => b.Value).Take(CircuitCharts.MostLines).Select(b => b.Key)];
        Columns =
        [
            .. a.Windings.Select(w => new CurrentColumn("Windings", w.Key, w.Value)),
            .. a.Lines.Select(l => new CurrentColumn("Lines", l.Key, l.Value)),
            .. a.Neutral is { } n ? [new CurrentColumn("Neutral", "A + B + C", n)] : Array.Empty<CurrentColumn>(),
            .. a.DeltaCirculating is { } d ? [new CurrentColumn("Delta loop", "mean of A, B, C", d)] : Array.Empty<CurrentColumn>(),
        ];
        Rows =
        [
            new("rms", [.. Columns.Select(c => (Four(c.Current.Rms), (string?)null))]),
            new("peak", [.. Columns.Select(c => (Four(c.Current.Peak), (string?)null))]),
            new("mean", [.. Columns.Select(c => (Share(c.Current.Mean, c.Current.Rms, Nothing), (string?)null))]),
            .. a.Lines.First().Value.Harmonics.Keys.Select(order => new CurrentRow(order, [.. Columns.Select(c => Harmonic(c.Current, order))])),
        ];
        var loss = a.CoreLoss_W;
        Branches = [.. a.BranchLoss_W.Select(b => new BranchRow(b.Key, Share(a.BPeak[b.Key], a.BPeak.Values.Max(), Noise), Figures.Significant(b.Value, 4), loss > 0 ? Figures.Fixed(100 * b.Value / loss, 1) : Figures.Nothing))];
        CurrentCharts = [.. CircuitCharts.WindingCurrents(a, solved.Case.Frequency, Size), .. LinesDiffer ? CircuitCharts.LineCurrents(a, solved.Case.Frequency, Size) : []];
        FluxChart = Flux();
        Summary =
        [
            ("Supply", string.Create(CultureInfo.InvariantCulture, $"{solved.Case.Supply?.Connection}, {Figures.With(Figures.Plain(solved.Case.Supply?.V ?? 0), "V")}, {Figures.With(Figures.Plain(solved.Case.Frequency ?? 0), "Hz")}")),
            ("Mean rms line current", Figures.With(Four(a.MeanLineRms), "A") + (a.I0_percent is { } i ? $" ({Figures.With(Figures.Significant(i, 4), "%")} of rated)" : "")),
            ("Apparent power", Figures.With(Figures.Significant(a.Apparent_VA, 4), "VA")),
            ("Power into the terminals", Figures.With(Figures.Significant(a.TerminalPower_W, 4), "W")),
            ("Loss in the materials", Figures.With(Figures.Significant(a.CoreLoss_W, 4), "W")),
            ("Loss in the windings", Figures.With(Figures.Significant(a.CopperLoss_W, 4), "W")),
            ("Energy balance", $"{Figures.With(Figures.Significant(100 * a.EnergyBalanceResidualOverVA, 2), "%")} of the apparent power"),
            ("Points per period", solved.Points.ToString(CultureInfo.InvariantCulture)),
        ];
    }

    public IReadOnlyList<(string Name, string Value)> Summary { get; }

    public IReadOnlyList<CurrentColumn> Columns { get; }

    public IReadOnlyList<CurrentRow> Rows { get; }

    public IReadOnlyList<BranchRow> Branches { get; }

    public IReadOnlyList<Chart> CurrentCharts { get; }

    public Chart FluxChart { get; private set; }

    /// <summary>In star and single phase a line carries its winding's current; a second chart would say the same.</summary>
    public bool LinesDiffer => solved.Answer.DeltaCirculating is not null;

    public bool IsChosen(string branch) => chosen.Contains(branch);

    /// <summary>A further line would look like one of the others.</summary>
    public bool CanChoose(string branch) => IsChosen(branch) || chosen.Count < CircuitCharts.MostLines;

    public void Choose(string branch, bool wanted)
    {
        if (wanted ? CanChoose(branch) && chosen.Add(branch) : chosen.Remove(branch)) FluxChart = Flux();
    }

    private Chart Flux() => CircuitCharts.FluxDensity(solved.Answer, [.. solved.Answer.BPeak.Keys.Where(chosen.Contains)], solved.Case.Frequency, Size);

    private static (string Value, string? Phase) Harmonic(CurrentAnswer current, string order) =>
        current.Harmonics[order] is [var amplitude, var phase] && amplitude > Nothing * current.Rms
            ? (Four(amplitude), Figures.Fixed(phase, 1) + "\u00B0")
            : (Figures.Nothing, null);

    private static string Share(double value, double of, double least) => Math.Abs(value) > least * of ? Four(value) : Figures.Nothing;

    private static string Four(double value) => Figures.Significant(value, 4);
}
