using System.Globalization;
using CoreDesign.Estimating.Contracts;
using CoreDesign.Magnetics;
using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Materials;

namespace CoreDesign.Estimating.Circuits;

/// <summary>Checks a circuit case and turns it into the kernel's circuit; every error is collected with its path.</summary>
internal sealed class CircuitCaseReader(CircuitCase @case)
{
    public const int MaxBranches = 200;
    public const int MaxWindings = 12;
    private const string FormatName = "magnet-network-case/1";
    private readonly List<FieldError> _errors = [];
    private readonly Dictionary<string, SheetLaw?> _laws = new(StringComparer.Ordinal);

    public IReadOnlyList<FieldError> Errors => _errors;

    public MagneticCircuit? Read()
    {
        if (@case.Format is { } format && format != FormatName)
        {
            Say("format", $"'{format}' is not known. Write {FormatName}, or leave it out.");
        }

        var supply = ReadSupply();
        foreach (var (name, material) in @case.Materials ?? new Dictionary<string, CaseMaterial>())
        {
            _laws[name] = ReadMaterial($"materials.{name}", material);
        }

        var branches = ReadBranches();
        var windings = ReadWindings(branches);
        if (@case.Rated_kVA is { } rated)
        {
            Positive("rated_kVA", rated, 1e-3, 1e7);
        }

        return _errors.Count == 0 && supply is not null ? new MagneticCircuit(supply, branches, windings) : null;
    }

    private Supply? ReadSupply()
    {
        var f = Positive("frequency", @case.Frequency, 1, 1000);
        if (@case.Supply is not { } s)
        {
            Say("supply", "The supply is missing. Give connection and V.");
            return null;
        }

        var v = Positive("supply.V", s.V, 1e-3, 2e6);
        SupplyConnection? connection = s.Connection switch
        {
            "single" => SupplyConnection.Single,
            "YN" => SupplyConnection.StarWithNeutral,
            "Y" => SupplyConnection.StarIsolated,
            "D" => SupplyConnection.Delta,
            _ => null,
        };
        if (connection is null)
        {
            Say("supply.connection", $"'{s.Connection}' is not known. Write single, YN, Y or D.");
            return null;
        }

        return new Supply(connection.Value, v, f);
    }

    private SheetLaw? ReadMaterial(string path, CaseMaterial? m)
    {
        if (m is null)
        {
            Say(path, "The material is empty. Give mu_r, or B and H.");
            return null;
        }

        var before = _errors.Count;
        MonotoneCurve? spine = null;
        if (m.MuR is { } mu)
        {
            if (m.B is not null || m.H is not null)
            {
                Say(path, "Give either mu_r or the tables B and H, not both.");
            }

            var slope = 1 / (Positive($"{path}.mu_r", mu, 1, 1e7) * MagneticConstants.Mu0_H_per_m);
            spine = new MonotoneCurve([1], [slope], slope);
        }
        else if (m.B is null || m.H is null || m.B.Count != m.H.Count || m.B.Count == 0 || m.B.Count > 2000)
        {
            Say(path, $"The tables B ({m.B?.Count ?? 0} values) and H ({m.H?.Count ?? 0} values) must have the same length, 1 to 2000; or give mu_r.");
        }
        else
        {
            try
            {
                spine = new MonotoneCurve(m.B, m.H, 1 / MagneticConstants.Mu0_H_per_m);
            }
            catch (ArgumentException e)
            {
                Say(path, $"B and H must rise from above zero. {e.Message.Split(" (Parameter", StringSplitOptions.None)[0]}");
            }
        }

        if ((m.Sigma is null) != (m.D is null))
        {
            Say(path, "The eddy term needs both sigma and d.");
        }

        var sigma = m.Sigma is { } s ? Positive($"{path}.sigma", s, 0, 1e8) : 0;
        var d = m.D is { } t ? Positive($"{path}.d", t, 0, 0.1) : 0;
        var k = m.KExc is { } ke ? Positive($"{path}.k_exc", ke, 0, 1e6) : 0;
        var s0 = Positive($"{path}.s0", m.S0 ?? 1, 1e-9, 1e6);
        var stops = new List<HysteresisStop>();
        for (var i = 0; i < (m.Stops?.Count ?? 0); i++)
        {
            stops.Add(new HysteresisStop(
                Positive($"{path}.stops[{i}].r", m.Stops![i]?.R, 1e-9, 10),
                Positive($"{path}.stops[{i}].w", m.Stops![i]?.W, 0, 1e9)));
        }

        if (stops.Count > 100)
        {
            Say($"{path}.stops", $"{stops.Count} stops are more than 100. Leave out the smallest.");
        }

        return _errors.Count > before || spine is null ? null : new SheetLaw(spine, sigma * d * d / 12, k, s0, stops);
    }

    private List<CircuitBranch> ReadBranches()
    {
        var branches = new List<CircuitBranch>();
        var given = @case.Branches ?? [];
        if (given.Count is < 1 or > MaxBranches)
        {
            Say("branches", $"{given.Count} branches; give 1 to {MaxBranches}.");
            return branches;
        }

        for (var i = 0; i < given.Count; i++)
        {
            var path = $"branches[{i}]";
            if (given[i] is not { } b)
            {
                Say(path, "The branch is empty.");
                continue;
            }

            var name = Text($"{path}.name", b.Name);
            var from = Text($"{path}.from", b.From);
            var to = Text($"{path}.to", b.To);
            if (from == to)
            {
                Say(path, $"Branch '{name}' runs from '{from}' to itself. Give it two different nodes.");
            }

            var area = Positive($"{path}.area", b.Area, 1e-9, 1e3);
            var length = b.Length is { } l ? Positive($"{path}.length", l, 0, 1e3) : 0;
            var reluctance = b.Reluctance is { } r ? Positive($"{path}.reluctance", r, 0, 1e15) : 0;
            if (b.Gap is { } gap)
            {
                var gapArea = b.GapArea is { } ga ? Positive($"{path}.gap_area", ga, 1e-9, 1e3) : area;
                reluctance += Positive($"{path}.gap", gap, 0, 10) / (MagneticConstants.Mu0_H_per_m * gapArea);
            }

            SheetLaw? steel = null;
            if (b.Material is { } material)
            {
                if (!_laws.TryGetValue(material, out steel))
                {
                    Say($"{path}.material", $"Material '{material}' is not among the materials ({string.Join(", ", _laws.Keys.Take(20))}).");
                }
                else if (b.Length is null)
                {
                    Say($"{path}.length", $"Branch '{name}' has a material but no length.");
                }
            }
            else if (b.Length is not null)
            {
                reluctance += length / (MagneticConstants.Mu0_H_per_m * area);
                length = 0;
            }

            if (b.Material is null && b.Length is null && b.Gap is null && b.Reluctance is null)
            {
                Say(path, $"Branch '{name}' has no length, gap or reluctance. Give at least one.");
            }

            branches.Add(new CircuitBranch { Name = name, From = from, To = to, Area_m2 = area, Length_m = length, Steel = steel, Reluctance_A_per_Wb = reluctance });
        }

        return branches;
    }

    private List<Winding> ReadWindings(List<CircuitBranch> branches)
    {
        var windings = new List<Winding>();
        var given = @case.Windings ?? [];
        if (given.Count is < 1 or > MaxWindings)
        {
            Say("windings", $"{given.Count} windings; give 1 to {MaxWindings}.");
            return windings;
        }

        for (var i = 0; i < given.Count; i++)
        {
            var path = $"windings[{i}]";
            if (given[i] is not { } w)
            {
                Say(path, "The winding is empty.");
                continue;
            }

            var name = Text($"{path}.name", w.Name);
            if (windings.Exists(x => x.Name == name))
            {
                Say($"{path}.name", $"Winding name '{name}' is used twice.");
            }

            WindingPhase? phase = w.Phase switch { "S" => WindingPhase.Single, "A" => WindingPhase.A, "B" => WindingPhase.B, "C" => WindingPhase.C, "closed" => WindingPhase.Closed, _ => null };
            if (phase is null)
            {
                Say($"{path}.phase", $"'{w.Phase}' is not known. Write S, A, B, C or closed.");
            }

            var coils = new List<Coil>();
            for (var j = 0; j < (w.Coils?.Count ?? 0); j++)
            {
                var coil = w.Coils![j];
                var branch = Text($"{path}.coils[{j}].branch", coil?.Branch);
                if (!branches.Exists(b => b.Name == branch))
                {
                    Say($"{path}.coils[{j}].branch", $"Branch '{branch}' does not exist.");
                }

                var turns = coil?.Turns ?? double.NaN;
                if (!double.IsFinite(turns) || turns == 0 || Math.Abs(turns) > 1e6)
                {
                    Say($"{path}.coils[{j}].turns", $"Turns {turns.ToString(CultureInfo.InvariantCulture)} must be a number other than 0, at most 1e6 in size.");
                }

                coils.Add(new Coil(branch, turns));
            }

            if (coils.Count == 0)
            {
                Say($"{path}.coils", $"Winding '{name}' has no coil. Give branch and turns.");
            }

            windings.Add(new Winding(name, phase ?? WindingPhase.Closed, coils, w.R is { } r ? Positive($"{path}.R", r, 0, 1e9) : 0));
        }

        return windings;
    }

    private string Text(string path, string? value)
    {
        if (string.IsNullOrWhiteSpace(value) || value.Length > 100)
        {
            Say(path, string.IsNullOrWhiteSpace(value) ? "The name is missing." : $"The name has {value.Length} characters; at most 100.");
            return value ?? "";
        }

        return value;
    }

    private double Positive(string path, double? value, double min, double max)
    {
        if (value is not { } v)
        {
            Say(path, string.Create(CultureInfo.InvariantCulture, $"The value is missing. Give a number from {min} to {max}."));
            return min;
        }

        if (!double.IsFinite(v) || v < min || v > max)
        {
            Say(path, string.Create(CultureInfo.InvariantCulture, $"{v} is outside {min} to {max}. Give a value within the range."));
        }

        return v;
    }

    private void Say(string path, string message) => _errors.Add(new FieldError(path, message));
}
