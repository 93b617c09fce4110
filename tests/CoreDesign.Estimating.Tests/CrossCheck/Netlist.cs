using System.Globalization;
using CoreDesign.Estimating.Circuits;

namespace CoreDesign.Estimating.Tests.CrossCheck;

/// <summary>
/// A magnetic circuit as a netlist for a general-purpose circuit simulator: flux is a current, MMF a voltage. A copy of each branch's flux runs
/// through an inductor of 1 H, whose voltage is dΦ/dt: that gives the windings' voltages, the eddy term, and the charge of the capacitors that stand
/// for the stops of hysteresis. The voltages rise over the first period so that no direct flux is left.
/// </summary>
internal static class Netlist
{
    private const int Periods = 3;
    private const double StopConductance = 1e6;

    /// <param name="circuit">The circuit.</param>
    /// <param name="stepsPerPeriod">Longest step of the simulator, and spacing of its answer.</param>
    /// <param name="tolerance">Relative tolerance of each of its steps.</param>
    public static string Write(RandomCircuit circuit, int stepsPerPeriod, double tolerance = 1e-6)
    {
        var @case = circuit.Case;
        var ground = @case.Branches![0].From;
        string Node(string? name) => name == ground ? "0" : "m_" + name;
        var lines = new List<string> { "* " + @case.Name };
        foreach (var branch in @case.Branches)
        {
            var name = branch.Name!;
            lines.Add($"Vf{name} {Node(branch.From)} a{name} 0");
            lines.Add($"B{name} a{name} {Node(branch.To)} V={string.Join(" + ", Drops(circuit, branch, lines))}");
            lines.Add($"F{name} 0 d{name} Vf{name} 1");
            lines.Add($"L{name} d{name} 0 1 IC=0");
        }

        AddSupply(@case, lines);
        var period = 1 / @case.Frequency!.Value;
        var currents = string.Join(' ', @case.Windings!.Select(w => $"i(Vw{w.Name})"));
        lines.Add($".options reltol={Text(tolerance)} abstol=1e-9 vntol=1e-7 method=trap maxord=2 itl4=200");
        lines.Add($".tran {Text(period / stepsPerPeriod)} {Text(Periods * period)} {Text((Periods - 1) * period)} {Text(period / stepsPerPeriod)} UIC");
        lines.AddRange([".control", "set wr_singlescale", "set numdgt=12", "run", $"linearize {currents}", $"wrdata currents.txt {currents}", "quit", ".endc", ".end"]);
        return string.Join('\n', lines) + "\n";
    }

    private static List<string> Drops(RandomCircuit circuit, CaseBranch branch, List<string> lines)
    {
        var name = branch.Name!;
        var area = branch.Area!.Value;
        var flux = $"i(Vf{name})";
        var drops = new List<string>();
        if (branch.Material is { } material)
        {
            var steel = circuit.Case.Materials![material];
            var length = branch.Length!.Value;
            var density = $"({flux}/{Text(area)})";
            drops.Add($"{Text(length)}*{density}*({Text(circuit.A)} + {Text(circuit.B)}*pow(abs({density}),{circuit.Exponent - 1}))");
            if (steel.Sigma is { } sigma)
            {
                drops.Add($"{Text(length * sigma * steel.D!.Value * steel.D.Value / 12 / area)}*v(d{name})");
            }

            if (steel.KExc is { } excess)
            {
                var rate = $"v(d{name})/{Text(area)}";
                drops.Add($"{Text(length * excess)}*{rate}*pow({rate}*{rate} + {Text(steel.S0!.Value * steel.S0.Value)}, -0.25)");
            }

            foreach (var (stop, i) in (steel.Stops ?? []).Select((s, i) => (s, i)))
            {
                var node = $"h{i}{name}";
                var (r, over) = (Text(stop.R!.Value), Text(StopConductance));
                lines.Add($"C{node} {node} 0 1 IC=0");
                lines.Add($"B{node} 0 {node} I=v(d{name})/{Text(area)} - (v({node})>{r} ? {over}*(v({node})-{r}) : (v({node})<-{r} ? {over}*(v({node})+{r}) : 0))");
                drops.Add($"{Text(length * stop.W!.Value)}*v({node})");
            }
        }

        var reluctance = (branch.Reluctance ?? 0) + ((branch.Gap ?? 0) / (4e-7 * Math.PI * area));
        if (reluctance > 0)
        {
            drops.Add($"{Text(reluctance)}*{flux}");
        }

        drops.AddRange(circuit.Case.Windings!.SelectMany(w => w.Coils!.Where(c => c.Branch == name).Select(c => $"({Text(-c.Turns!.Value)})*i(Vw{w.Name})")));
        return drops;
    }

    private static void AddSupply(CircuitCase @case, List<string> lines)
    {
        var connection = @case.Supply!.Connection;
        var (omega, period) = (Text(2 * Math.PI * @case.Frequency!.Value), Text(1 / @case.Frequency.Value));
        var half = Text(Math.PI * @case.Frequency.Value);
        var amplitude = Text(Math.Sqrt(2) * @case.Supply.V!.Value / (connection == "single" ? 1 : Math.Sqrt(3)));
        foreach (var (winding, k) in @case.Windings!.Select((w, k) => (w, k)))
        {
            var angle = $"({omega}*time - {Text(k * 2 * Math.PI / 3)})";
            lines.Add($"Be{k} e{k} 0 V={amplitude}*(time<{period} ? 0.5*(1-cos({half}*time))*cos{angle} + 0.25*sin({half}*time)*sin{angle} : cos{angle})");
            var end = connection switch { "Y" => "star", "D" => $"e{(k + 1) % 3}", _ => "0" };
            lines.Add($"Vw{winding.Name} e{k} x{k} 0");
            lines.Add($"Bw{k} x{k} {end} V={string.Join(" + ", winding.Coils!.Select(c => $"{Text(c.Turns!.Value)}*v(d{c.Branch})"))}");
        }

        if (connection == "Y")
        {
            lines.Add("Rstar star 0 1e9");
        }
    }

    private static string Text(double value) => value.ToString("R", CultureInfo.InvariantCulture);
}
