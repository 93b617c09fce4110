using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Materials;
using CoreDesign.Magnetics.Transients;

namespace CoreDesign.Magnetics.Tests.Transients;

/// <summary>Small circuits for transients whose answers are known by hand.</summary>
internal static class TransientCircuits
{
    public const double Area_m2 = 0.02;
    public const double Length_m = 1.6;
    public const double Turns = 100;
    public const double Saturation_T = 2;

    /// <summary>No field up to saturation (a hundred millionth of vacuum's slope), vacuum beyond.</summary>
    public static SheetLaw Ideal { get; } =
        SheetLaw.Lossless(new MonotoneCurve([Saturation_T], [1e-8 * Saturation_T / MagneticConstants.Mu0_H_per_m], 1 / MagneticConstants.Mu0_H_per_m));

    /// <summary>A sheet with hysteresis and eddy currents that saturates at about 2 T.</summary>
    public static SheetLaw Lossy { get; } = new(
        new MonotoneCurve([0.5, 1, 1.5, 1.7, 1.8, 1.9, 2, 2.1], [8, 16, 30, 60, 150, 700, 6000, 60_000], 1 / MagneticConstants.Mu0_H_per_m),
        0.008, 0.5, 150, [new(0.1, 60), new(0.5, 8)]);

    public static double SaturatedInductance_H => MagneticConstants.Mu0_H_per_m * Turns * Turns * Area_m2 / Length_m;

    /// <summary>Rms voltage that drives a peak flux density through the ring.</summary>
    public static double Voltage_V(double peak_T) => Math.Sqrt(2) * Math.PI * 50 * Turns * Area_m2 * peak_T;

    public static MagneticCircuit Ring(SheetLaw law, double peak_T)
    {
        CircuitBranch Half(string name, string from, string to) => new() { Name = name, From = from, To = to, Area_m2 = Area_m2, Length_m = Length_m / 2, Steel = law };
        return new MagneticCircuit(
            new Supply(SupplyConnection.Single, Voltage_V(peak_T), 50),
            [Half("one", "p", "q"), Half("other", "q", "p")],
            [new Winding("S", WindingPhase.Single, [new Coil("one", Turns)])]);
    }

    /// <summary>Three rings, one for each phase, or a three-limb core with a path through air.</summary>
    public static MagneticCircuit ThreePhase(SheetLaw law, SupplyConnection connection, double peak_T, bool bank = false)
    {
        var branches = new List<CircuitBranch>();
        foreach (var (letter, share) in new[] { ("A", 1.0), ("B", 0.4), ("C", 1.0) })
        {
            CircuitBranch Path(string name, string from, string to, double length) => new() { Name = name, From = from, To = to, Area_m2 = Area_m2, Length_m = length, Steel = law };
            branches.Add(Path("limb" + letter, "bottom" + (bank ? letter : ""), "mid" + letter, Length_m / 2));
            branches.Add(Path("rest" + letter, "mid" + letter, (bank ? "bottom" + letter : "top"), bank ? Length_m / 2 : share * Length_m / 2));
        }

        if (!bank)
        {
            branches.Add(new CircuitBranch { Name = "air", From = "top", To = "bottom", Area_m2 = 1, Reluctance_A_per_Wb = 2e6 });
        }

        var volts = Voltage_V(peak_T) * (connection == SupplyConnection.Delta ? 1 : Math.Sqrt(3));
        return new MagneticCircuit(
            new Supply(connection, volts, 50),
            branches,
            [.. new[] { "A", "B", "C" }.Select((l, i) => new Winding(l, WindingPhase.A + i, [new Coil("limb" + l, Turns)]))]);
    }

    /// <summary>Air inside the coil beside the steel, linked with it: adds its inductance to the ring's.</summary>
    public static MagneticCircuit WithAir(MagneticCircuit ring, double inductance_H)
    {
        // Its own loop, so that it is linked with the coil alone.
        CircuitBranch Half(string name, string from, string to) => new() { Name = name, From = from, To = to, Area_m2 = 1, Reluctance_A_per_Wb = Turns * Turns / inductance_H / 2 };
        return ring with
        {
            Branches = [.. ring.Branches, Half("air", "r", "s"), Half("airBack", "s", "r")],
            Windings = [.. ring.Windings.Select(w => w with { Coils = [.. w.Coils, new Coil("air", Turns)] })],
        };
    }

    public static Energizing Close(MagneticCircuit circuit, double residual = 0, double angle_deg = 0, double source_H = 0, double resistance = 0) => new()
    {
        Circuit = circuit,
        Angle_rad = angle_deg * Math.PI / 180,
        ResidualLinkage_Wb = Inrush.ResidualLinkage_Wb(circuit, residual),
        SourceInductance_H = source_H,
        Resistance_ohm = [.. circuit.Windings.Select(_ => resistance)],
    };
}
