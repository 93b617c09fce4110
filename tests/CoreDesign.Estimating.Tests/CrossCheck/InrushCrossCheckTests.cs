using System.Globalization;
using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Materials;
using CoreDesign.Magnetics.Transients;

namespace CoreDesign.Estimating.Tests.CrossCheck;

/// <summary>
/// Source: ngspice, a general-purpose circuit simulator (Debian package), closing the same switch on the same core at the time of the test. The core is a ring of
/// H = a·B + b·B¹⁵ up to 2.3 T and vacuum's slope beyond, with classical eddy currents; the simulator gets the law as it stands, ours a table of it.
/// </summary>
public sealed class InrushCrossCheckTests(ITestOutputHelper output)
{
    private const double Area_m2 = 0.02;
    private const double Length_m = 1.6;
    private const double Turns = 100;
    private const double End_T = 2.3;
    private const double A = 30;
    private const double B = 0.459;
    private const double Eddy = 0.01;
    private const double Mu0 = 4e-7 * Math.PI;
    private const int Steps = 1440;
    private const int Periods = 3;

    [Theory]
    [InlineData(0.7, 0, 0.5, 2)]
    [InlineData(0.3, 50, 1.5, 0.5)]
    public async Task Inrush_of_a_ring_agrees_with_a_circuit_simulator(double residual, double angle_deg, double resistance, double source_mH)
    {
        var volts = Math.Sqrt(2) * Math.PI * 50 * Turns * Area_m2 * 1.6;
        double[] flux = [.. Enumerable.Range(1, 460).Select(i => i * End_T / 460)];
        var law = new SheetLaw(new MonotoneCurve(flux, Array.ConvertAll(flux, H), 1 / Mu0), Eddy, 0, 1, []);
        CircuitBranch Half(string name, string from, string to) => new() { Name = name, From = from, To = to, Area_m2 = Area_m2, Length_m = Length_m / 2, Steel = law };
        var circuit = new MagneticCircuit(
            new Supply(SupplyConnection.Single, volts, 50),
            [Half("one", "p", "q"), Half("other", "q", "p")],
            [new Winding("S", WindingPhase.Single, [new Coil("one", Turns)])]);
        var mine = EnergizingSolver.Solve(
            new Energizing
            {
                Circuit = circuit,
                Angle_rad = angle_deg * Math.PI / 180,
                ResidualLinkage_Wb = Inrush.ResidualLinkage_Wb(circuit, residual),
                SourceInductance_H = source_mH / 1000,
                Resistance_ohm = [resistance],
                StepsPerPeriod = Steps,
                Periods = Periods,
            },
            TestContext.Current.CancellationToken);
        var start = residual * 1.6;
        var theirs = await Simulator.RunAsync(Netlist(volts, start, angle_deg, resistance, source_mH), Periods * Steps, TestContext.Current.CancellationToken);
        Assert.NotNull(theirs);
        var peak = theirs[0].Max(Math.Abs);
        var worst = Enumerable.Range(0, theirs[0].Length).Max(t => Math.Abs(theirs[0][t] - mine.WindingCurrent_A[0][t]));
        output.WriteLine(string.Create(CultureInfo.InvariantCulture, $"peak {mine.WindingCurrent_A[0].Max(Math.Abs):G6} A, simulator {peak:G6} A; largest difference at any instant {100 * worst / peak:0.000} % of it"));
        Assert.Equal(peak, mine.WindingCurrent_A[0].Max(Math.Abs), 1e-3 * peak);
        Assert.InRange(worst, 0, 3e-3 * peak);
    }

    private static double H(double b) => (A * b) + (B * Math.Pow(b, 15));

    private static string Netlist(double volts, double start_T, double angle_deg, double resistance, double source_mH)
    {
        var b = $"(i(Vf)/{Text(Area_m2)})";
        var beyond = $"({b}>0 ? 1 : -1)*({Text(H(End_T))} + (abs({b})-{Text(End_T)})/{Text(Mu0)})";
        var field = $"(abs({b})<{Text(End_T)} ? {Text(A)}*{b} + {Text(B)}*{b}*pow(abs({b}),14) : {beyond})";
        string[] lines =
        [
            "* inrush of a ring",
            "Vf 0 a 0",
            $"Bf a 0 V={Text(Length_m)}*{field} + {Text(Length_m * Eddy / Area_m2)}*v(d) - {Text(Turns)}*i(Vw)",
            "Fd 0 d Vf 1",
            $"Ld d 0 1 IC={Text(start_T * Area_m2)}",
            $"Be e 0 V={Text(Math.Sqrt(2) * volts)}*sin({Text(100 * Math.PI)}*time + {Text(angle_deg * Math.PI / 180)})",
            "Vw e x 0",
            $"Rw x y {Text(resistance)}",
            $"Lw y z {Text(source_mH / 1000)} IC={Text(Length_m * H(start_T) / Turns)}",
            $"Bw z 0 V={Text(Turns)}*v(d)",
            ".options reltol=1e-6 abstol=1e-9 vntol=1e-7 method=trap maxord=2 itl4=200",
            $".tran {Text(0.02 / Steps)} {Text(0.02 * Periods)} 0 {Text(0.02 / Steps / 4)} UIC",
            ".control", "set wr_singlescale", "set numdgt=12", "run", "linearize i(Vw)", "wrdata currents.txt i(Vw)", "quit", ".endc", ".end",
        ];
        return string.Join('\n', lines) + "\n";
    }

    private static string Text(double value) => value.ToString("R", CultureInfo.InvariantCulture);
}
