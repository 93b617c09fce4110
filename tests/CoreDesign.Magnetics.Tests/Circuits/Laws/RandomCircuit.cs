using System.Globalization;
using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Materials;

namespace CoreDesign.Magnetics.Tests.Circuits.Laws;

/// <summary>What a circuit is drawn with, besides its single-valued steel.</summary>
[Flags]
public enum Ingredients
{
    None = 0,
    Eddy = 1,
    Excess = 2,
    Hysteresis = 4,
    Joints = 8,
    Resistance = 16,
    ClosedDelta = 32,
    AllLosses = Eddy | Excess | Hysteresis,
}

/// <summary>The forms whose circuits are drawn: number of limbs, or a bank of single-phase units.</summary>
public enum Frame
{
    TwoLimb,
    Shell,
    FourLimb,
    ThreeLimb,
    FiveLimb,
    Bank,
}

/// <summary>
/// Circuits of every form, drawn within the bounds of real cores. Each number of a draw comes from one seed; the environment variable
/// COREDESIGN_SEED gives others than the usual ones, and every failure names the seed it came from.
/// </summary>
internal sealed class RandomCircuit
{
    private const string SeedVariable = "COREDESIGN_SEED";
    private const int UsualSeed = 20261201;
    private readonly Random _random;
    private readonly Ingredients _with;
    private readonly List<CircuitBranch> _branches = [];
    private readonly SheetLaw _steel;
    private readonly MonotoneCurve? _joint;
    private readonly double _area;

    private RandomCircuit(int seed, Ingredients with)
    {
        _random = new Random(seed);
        _with = with;
        _steel = Steel();
        _joint = with.HasFlag(Ingredients.Joints) ? new MonotoneCurve([1.0, 1.4, 1.6, 1.8], [1, 2, Within(8, 30), Within(60, 200)], 2000) : null;
        _area = Within(0.01, 0.2);
    }

    public static int FirstSeed { get; } =
        int.TryParse(Environment.GetEnvironmentVariable(SeedVariable), NumberStyles.None, CultureInfo.InvariantCulture, out var given) ? given : UsualSeed;

    /// <param name="frame">The form.</param>
    /// <param name="connection">Single for the single-phase forms, else one of the three-phase ones.</param>
    /// <param name="with">What is drawn besides the steel.</param>
    /// <param name="seed">Of the generator.</param>
    public static MagneticCircuit Draw(Frame frame, SupplyConnection connection, Ingredients with, int seed)
    {
        var draw = new RandomCircuit(seed, with);
        switch (frame)
        {
            case Frame.TwoLimb:
                draw.Branch("limbS", "b", "t", 1, draw.Within(0.4, 1));
                draw.Branch("rest", "t", "b", draw.Within(0.95, 1.1), draw.Within(1, 2));
                break;
            case Frame.Shell:
                draw.Branch("limbS", "b", "t", 1, draw.Within(0.4, 1));
                draw.Branch("left", "t", "b", draw.Within(0.48, 0.6), draw.Within(1, 2));
                draw.Branch("right", "t", "b", draw.Within(0.48, 0.6), draw.Within(1, 2));
                break;
            case Frame.FourLimb:
                draw.Branch("limbS", "b0", "t0", 1, draw.Within(0.4, 1));
                draw.Branch("limbBack", "t1", "b1", 1, draw.Within(0.4, 1));
                draw.Yokes(2);
                draw.Branch("left", "t0", "b0", draw.Within(0.45, 0.6), draw.Within(1, 2));
                draw.Branch("right", "t1", "b1", draw.Within(0.45, 0.6), draw.Within(1, 2));
                break;
            case Frame.Bank:
                draw.Bank();
                break;
            default:
                draw.Limbs(frame == Frame.FiveLimb);
                break;
        }

        return draw.Circuit(frame, connection);
    }

    private MagneticCircuit Circuit(Frame frame, SupplyConnection connection)
    {
        var frequency = _random.Next(2) == 0 ? 50.0 : 60.0;
        var turns = _random.Next(10, 300);
        var volts = Math.Sqrt(2) * Math.PI * frequency * turns * _area * Within(1.2, 1.8);
        var current = 30.0 / turns;
        var resistance = _with.HasFlag(Ingredients.Resistance) ? Within(1e-4, 1e-2) * volts / current / 100 : 0;
        List<Winding> windings = [];
        if (frame is Frame.TwoLimb or Frame.Shell or Frame.FourLimb)
        {
            // In the core of four limbs the winding stands half on either wound limb, and drives the flux round both.
            Coil[] coils = frame == Frame.FourLimb ? [new Coil("limbS", turns / 2.0), new Coil("limbBack", turns / 2.0)] : [new Coil("limbS", turns)];
            windings.Add(new Winding("S", WindingPhase.Single, coils, resistance));
            return new MagneticCircuit(new Supply(SupplyConnection.Single, volts, frequency), _branches, windings);
        }

        foreach (var phase in (WindingPhase[])[WindingPhase.A, WindingPhase.B, WindingPhase.C])
        {
            windings.Add(new Winding(phase.ToString(), phase, [new Coil("limb" + phase, turns)], resistance));
        }

        if (_with.HasFlag(Ingredients.ClosedDelta))
        {
            windings.Add(new Winding("tertiary", WindingPhase.Closed, [.. "ABC".Select(p => new Coil("limb" + p, turns / 4.0))], resistance / 16));
        }

        return new MagneticCircuit(new Supply(connection, connection == SupplyConnection.Delta ? volts : Math.Sqrt(3) * volts, frequency), _branches, windings);
    }

    private void Limbs(bool returns)
    {
        foreach (var (letter, i) in "ABC".Select((l, i) => (l, i)))
        {
            Branch("limb" + letter, $"b{i}", $"t{i}", 1, Within(0.5, 2));
        }

        Yokes(3);
        if (returns)
        {
            Branch("left", "t0", "b0", Within(0.45, 0.6), Within(1.5, 3));
            Branch("right", "t2", "b2", Within(0.45, 0.6), Within(1.5, 3));
            return;
        }

        // Some tenths to a few of the reactance that a rated current of a hundred times the exciting one would see.
        _branches.Add(new CircuitBranch { Name = "air", From = "t1", To = "b1", Area_m2 = 1, Reluctance_A_per_Wb = Within(2e3, 2e4) / _area });
    }

    /// <summary>Three equal units; the same lengths and gaps, so that only the supply tells them apart.</summary>
    private void Bank()
    {
        var (limb, rest, area, gap) = (Within(0.5, 2), Within(1, 4), Within(0.95, 1.1), Within(1e-5, 5e-5));
        foreach (var letter in "ABC")
        {
            Branch("limb" + letter, "b" + letter, "t" + letter, 1, limb, gap);
            Branch("rest" + letter, "t" + letter, "b" + letter, area, rest, gap);
        }
    }

    private void Yokes(int limbs)
    {
        for (var i = 0; i < limbs - 1; i++)
        {
            Branch($"top{i}", $"t{i}", $"t{i + 1}", Within(0.95, 1.1), Within(0.4, 1.5));
            Branch($"bottom{i}", $"b{i + 1}", $"b{i}", Within(0.95, 1.1), Within(0.4, 1.5));
        }
    }

    private void Branch(string name, string from, string to, double areaRatio, double length, double? gap = null) => _branches.Add(new CircuitBranch
    {
        Name = name,
        From = from,
        To = to,
        Area_m2 = _area * areaRatio,
        Length_m = length,
        Steel = _steel,
        Reluctance_A_per_Wb = (gap ?? Within(1e-5, 1e-4)) / (MagneticConstants.Mu0_H_per_m * _area * areaRatio),
        Mmf = _joint,
    });

    private SheetLaw Steel()
    {
        // H = a·B + b·Bⁿ, H some hundreds of A/m at 1.7 T.
        var n = 9 + (2 * _random.Next(4));
        double a = Within(10, 40), b = Within(60, 400) / Math.Pow(1.7, n);
        double[] flux = [.. Enumerable.Range(1, 130).Select(i => 0.02 * i)];
        return new SheetLaw(
            new MonotoneCurve(flux, Array.ConvertAll(flux, x => (a * x) + (b * Math.Pow(x, n))), 1 / MagneticConstants.Mu0_H_per_m),
            _with.HasFlag(Ingredients.Eddy) ? 2.1e6 * Math.Pow(Within(0.2e-3, 0.35e-3), 2) / 12 : 0,
            _with.HasFlag(Ingredients.Excess) ? Within(0.1, 0.5) : 0,
            excessFloor_T_per_s: 20,
            _with.HasFlag(Ingredients.Hysteresis) ? [new(Within(0.05, 0.2), Within(20, 60)), new(Within(0.4, 0.9), Within(5, 20))] : []);
    }

    private double Within(double low, double high) => low + ((high - low) * _random.NextDouble());
}
