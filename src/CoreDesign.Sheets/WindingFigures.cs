using CoreDesign.Estimating.Contracts;
using static CoreDesign.Sheets.Figures;

namespace CoreDesign.Sheets;

/// <summary>One line of the windings' figures: a winding, what it is fed or wound with, what it carries.</summary>
public sealed record WindingFigure(string Winding, string With, string Current, string Beside);

/// <summary>No-load figures of each winding, as a test floor reads them: both sides as if fed, the closed delta, an isolated star point, the capacitive current.</summary>
public static class WindingFigures
{
    /// <summary>Empty where the excited winding is all there is; its figures stand elsewhere.</summary>
    public static IReadOnlyList<WindingFigure> Of(EstimateResult e)
    {
        ArgumentNullException.ThrowIfNull(e);
        var figures = new List<WindingFigure>();
        if (e.Sides is { Count: > 1 } sides)
        {
            figures.AddRange(sides.Select(s => new WindingFigure(
                s.Winding == "excited" ? "Excited winding" : "Other winding, as if fed",
                $"{Connection(s.Connection)}, {With(Significant(s.LineVoltage_V, 5), "V")}, {With(Plain(s.Turns, 1), "turns")}",
                With(Significant(s.NoLoadCurrent_A, 4), "A"),
                $"{With(Significant(s.NoLoadCurrent_percent, 3), "%")} of rated; lines {string.Join(" · ", s.Lines.Select(l => Significant(l.Rms_A, 3)))} A")));
        }

        if (e.Tertiary is { } delta)
        {
            figures.Add(new("Closed delta", With(Plain(delta.Turns, 1), "turns"), With(Significant(delta.Rms_A, 4), "A"), $"circulating; peak {With(Significant(delta.Peak_A, 3), "A")}"));
        }

        if (e.Neutral is { } neutral)
        {
            figures.Add(new("Isolated star point", "voltage against the supply's neutral", With(Significant(neutral.Rms_V, 4), "V"), $"{With(Significant(neutral.Rms_percent, 3), "%")} of the phase voltage, third harmonic {With(Significant(neutral.ThirdHarmonic_percent, 3), "%")}"));
        }

        if (e.Capacitive is { } leading)
        {
            figures.Add(new("Capacitance", "leading, in each line", With(Significant(leading.Current_A, 4), "A"), $"{With(Significant(leading.Power_var, 3), "var")} in all; in the line currents above"));
        }

        return figures;
    }

    private static string Connection(string connection) => connection == "single" ? "single-phase" : connection;
}
