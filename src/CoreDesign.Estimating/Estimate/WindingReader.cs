using System.Globalization;
using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Fields;
using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Cores;
using CoreDesign.Magnetics.Geometry;

namespace CoreDesign.Estimating.Estimate;

/// <summary>A winding as it is fed: connection and rated voltage, turns in circuit (tap counted).</summary>
internal sealed record FedWinding(Supply Supply, double Turns, double Resistance_ohm)
{
    /// <summary>Voltage across the turns.</summary>
    public double PhaseVoltage_V => Supply.Voltage_V / Connections.LineOverPhase(Supply.Connection);
}

/// <summary>Capacitance of one phase and the rated voltage across it.</summary>
internal sealed record WindingCapacitance(double Phase_F, double PhaseVoltage_V);

/// <summary>Reads the windings of a design. NaN and null stand for what an error was said about.</summary>
internal sealed class WindingReader(DesignResolver resolver)
{
    public (FedWinding? Winding, ExcitedWindingInput Filled) Excited(ExcitedWindingInput winding, SupplyConnection? connection, double frequency)
    {
        var voltage = resolver.Needed("excitedWinding.lineVoltage_V", winding.LineVoltage_V);
        var turns = resolver.Needed("excitedWinding.turns", winding.Turns);
        var tap = Tap("excitedWinding.tap_percent", winding.Tap_percent);
        var resistance = resolver.Optional("excitedWinding.resistance_ohm", winding.Resistance_ohm, 0);
        return connection is not { } c || double.IsNaN(voltage + turns + tap + resistance + frequency)
            ? (null, winding)
            : (new FedWinding(new Supply(c, voltage, frequency), InCircuit(turns, tap), resistance), winding with { Connection = Connections.NameOf(c), Resistance_ohm = resistance });
    }

    /// <summary>Turns default to those that give the rated voltage ratio.</summary>
    public (FedWinding? Winding, OtherWindingInput? Filled) Other(OtherWindingInput? other, FedWinding? excited, double? excitedTurns)
    {
        if (other is null)
        {
            return (null, null);
        }

        var connection = Connections.Parse(other.Connection);
        if (connection is null)
        {
            resolver.Say("otherWinding.connection", other.Connection is null
                ? "The other winding's connection is missing. Give single, YN, Y or D."
                : $"Connection '{DesignResolver.Cut(other.Connection)}' is not known. Give single, YN, Y or D.");
        }
        else if (excited is not null && (connection == SupplyConnection.Single) != (excited.Supply.Connection == SupplyConnection.Single))
        {
            resolver.Say("otherWinding.connection", $"Connection '{other.Connection}' does not have the phases of the excited winding, '{Connections.NameOf(excited.Supply.Connection)}'. Give {(connection == SupplyConnection.Single ? "YN, Y or D" : "single")}.");
            return (null, other);
        }

        var voltage = resolver.Needed("otherWinding.lineVoltage_V", other.LineVoltage_V);
        var tap = Tap("otherWinding.tap_percent", other.Tap_percent);
        var typed = other.Turns is { } t ? resolver.Needed("otherWinding.turns", t) : (double?)null;
        if (connection is not { } c || excited is null || excitedTurns is not { } n || double.IsNaN(voltage + tap) || typed is double.NaN)
        {
            return (null, other);
        }

        if (typed is null)
        {
            resolver.Derive("otherWinding.turns");
        }

        var turns = typed ?? (n * (voltage / Connections.LineOverPhase(c)) / excited.PhaseVoltage_V);
        var inCircuit = InCircuit(turns, tap);
        var fed = inCircuit * excited.PhaseVoltage_V / excited.Turns * Connections.LineOverPhase(c);
        return (new FedWinding(new Supply(c, fed, excited.Supply.Frequency_Hz), inCircuit, 0), other with { Turns = turns });
    }

    public (ClosedDelta? Delta, TertiaryInput? Filled) Tertiary(TertiaryInput? tertiary, SupplyConnection? connection, double? excitedTurns)
    {
        if (tertiary is null)
        {
            return (null, null);
        }

        if (connection == SupplyConnection.Single)
        {
            resolver.Say("tertiary", "A closed delta needs three phases. Leave it out.");
            return (null, tertiary);
        }

        if (tertiary.Connection is not (null or "D"))
        {
            resolver.Say("tertiary.connection", $"Tertiary connection '{DesignResolver.Cut(tertiary.Connection)}' is not known. Give D, a closed delta, or leave the tertiary out.");
        }

        var turns = resolver.Optional("tertiary.turns", tertiary.Turns, excitedTurns ?? double.NaN);
        var resistance = resolver.Optional("tertiary.resistance_ohm", tertiary.Resistance_ohm, 0);
        return double.IsNaN(turns + resistance) ? (null, tertiary) : (new ClosedDelta(turns, resistance), new TertiaryInput { Connection = "D", Turns = turns, Resistance_ohm = resistance });
    }

    /// <summary>The voltage defaults to the highest rated one.</summary>
    public (WindingCapacitance? Capacitance, CapacitanceInput? Filled) Capacitance(CapacitanceInput? given, OrderInput order, SupplyConnection? connection)
    {
        if (given is null)
        {
            return (null, null);
        }

        var phase = resolver.Needed("capacitance.phase_nF", given.Phase_nF);
        var highest = order.RatedVoltages_kV is { Count: > 0 } rated ? rated.Max() : (double?)null;
        if (given.LineVoltage_kV is null && highest is null)
        {
            resolver.Say("capacitance.lineVoltage_kV", FieldCatalog.Find("capacitance.lineVoltage_kV").Missing() + " Or give the rated voltages of the order.");
            return (null, given);
        }

        var line = resolver.Optional("capacitance.lineVoltage_kV", given.LineVoltage_kV, highest ?? double.NaN);
        return double.IsNaN(phase + line)
            ? (null, given)
            : (new WindingCapacitance(phase * 1e-9, 1000 * line / (connection == SupplyConnection.Single ? 1 : Math.Sqrt(3))), given with { LineVoltage_kV = line });
    }

    private double Tap(string path, double? given) => given is null ? 0 : resolver.Needed(path, given);

    private static double InCircuit(double turns, double tap_percent) => turns * (1 + (tap_percent / 100));
}
