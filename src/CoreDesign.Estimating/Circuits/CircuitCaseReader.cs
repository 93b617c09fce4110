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
    private const int MaxMaterials = 200;
    private const int MaxCoils = 200;
    private const double LeastTurns = 1e-3;
    private const double MostTurns = 1e6;
    private const string FormatName = "magnet-network-case/1";
    private readonly CircuitFindings _findings = new();
    private readonly Dictionary<string, SheetLaw?> _laws = new(StringComparer.Ordinal);

    public IReadOnlyList<FieldError> Errors => _findings.Errors;

    public MagneticCircuit? Read()
    {
        if (@case.Format is { } format && format != FormatName)
        {
            _findings.Say("format", $"{CircuitFindings.Shown(format)} is not known. Write {FormatName}, or leave it out.");
        }

        var supply = ReadSupply();
        if (@case.Materials?.Count > MaxMaterials)
        {
            _findings.Say("materials", $"{@case.Materials.Count} materials; give at most {MaxMaterials}.");
            return null;
        }

        foreach (var (name, material) in @case.Materials ?? new Dictionary<string, CaseMaterial>())
        {
            _findings.Plain("materials", name);
            _laws[name] = CircuitMaterials.Read($"materials.{name}", material, _findings);
        }

        var branches = ReadBranches();
        var windings = ReadWindings(branches);
        CheckPhases(windings);
        if (@case.Rated_kVA is { } rated)
        {
            _findings.Within("rated_kVA", rated, 1e-3, 1e7);
        }

        return Errors.Count == 0 && supply is not null ? new MagneticCircuit(supply, branches, windings) : null;
    }

    private Supply? ReadSupply()
    {
        var f = _findings.Within("frequency", @case.Frequency, 1, 1000);
        if (@case.Supply is not { } s)
        {
            _findings.Say("supply", "The supply is missing. Give connection and V.");
            return null;
        }

        var v = _findings.Within("supply.V", s.V, 1e-3, 2e6);
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
            _findings.Say("supply.connection", $"{CircuitFindings.Shown(s.Connection)} is not known. Write single, YN, Y or D.");
            return null;
        }

        return new Supply(connection.Value, v, f);
    }

    private List<CircuitBranch> ReadBranches()
    {
        var branches = new List<CircuitBranch>();
        var given = @case.Branches ?? [];
        if (given.Count is < 1 or > MaxBranches)
        {
            _findings.Say("branches", $"{given.Count} branches; give 1 to {MaxBranches}.");
            return branches;
        }

        for (var i = 0; i < given.Count; i++)
        {
            var path = $"branches[{i}]";
            if (given[i] is not { } b)
            {
                _findings.Say(path, "The branch is empty.");
                continue;
            }

            var name = _findings.Text($"{path}.name", b.Name);
            if (branches.Exists(x => x.Name == name))
            {
                _findings.Say($"{path}.name", $"Branch name {CircuitFindings.Shown(name)} is used twice. Give each branch a name of its own.");
            }

            var from = _findings.Text($"{path}.from", b.From);
            var to = _findings.Text($"{path}.to", b.To);
            if (from == to)
            {
                _findings.Say(path, $"Branch {CircuitFindings.Shown(name)} runs from {CircuitFindings.Shown(from)} to itself. Give it two different nodes.");
            }

            var area = _findings.Within($"{path}.area", b.Area, 1e-9, 1e3);
            var length = b.Length is { } l ? _findings.Within($"{path}.length", l, 0, 1e3) : 0;
            var reluctance = b.Reluctance is { } r ? _findings.Within($"{path}.reluctance", r, 0, 1e15) : 0;
            if (b.Gap is { } gap)
            {
                var gapArea = b.GapArea is { } ga ? _findings.Within($"{path}.gap_area", ga, 1e-9, 1e3) : area;
                reluctance += _findings.Within($"{path}.gap", gap, 0, 10) / (MagneticConstants.Mu0_H_per_m * gapArea);
            }

            SheetLaw? steel = null;
            if (b.Material is { } material)
            {
                if (!_laws.TryGetValue(material, out steel))
                {
                    _findings.Say($"{path}.material", $"Material {CircuitFindings.Shown(material)} is not among the materials ({string.Join(", ", _laws.Keys.Take(20))}). Name one of them.");
                }
                else if (b.Length is null)
                {
                    _findings.Say($"{path}.length", $"Branch {CircuitFindings.Shown(name)} has a material but no length.");
                }
            }
            else if (b.Length is not null)
            {
                reluctance += length / (MagneticConstants.Mu0_H_per_m * area);
                length = 0;
            }

            if (b.Material is null && b.Length is null && b.Gap is null && b.Reluctance is null)
            {
                _findings.Say(path, $"Branch {CircuitFindings.Shown(name)} has no length, gap or reluctance. Give at least one.");
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
            _findings.Say("windings", $"{given.Count} windings; give 1 to {MaxWindings}.");
            return windings;
        }

        for (var i = 0; i < given.Count; i++)
        {
            var path = $"windings[{i}]";
            if (given[i] is not { } w)
            {
                _findings.Say(path, "The winding is empty.");
                continue;
            }

            var name = _findings.Text($"{path}.name", w.Name);
            if (windings.Exists(x => x.Name == name))
            {
                _findings.Say($"{path}.name", $"Winding name {CircuitFindings.Shown(name)} is used twice. Give each winding a name of its own.");
            }

            WindingPhase? phase = w.Phase switch { "S" => WindingPhase.Single, "A" => WindingPhase.A, "B" => WindingPhase.B, "C" => WindingPhase.C, "closed" => WindingPhase.Closed, _ => null };
            if (phase is null)
            {
                _findings.Say($"{path}.phase", $"{CircuitFindings.Shown(w.Phase)} is not known. Write S, A, B, C or closed.");
            }

            var coils = new List<Coil>();
            if (w.Coils?.Count > MaxCoils)
            {
                _findings.Say($"{path}.coils", $"{w.Coils.Count} coils; give at most {MaxCoils}.");
                continue;
            }

            for (var j = 0; j < (w.Coils?.Count ?? 0); j++)
            {
                var coil = w.Coils![j];
                var branch = _findings.Text($"{path}.coils[{j}].branch", coil?.Branch);
                if (!branches.Exists(b => b.Name == branch))
                {
                    _findings.Say($"{path}.coils[{j}].branch", $"Branch {CircuitFindings.Shown(branch)} does not exist. Name one of the branches.");
                }

                if (coil?.Turns is not { } turns || !(Math.Abs(turns) is >= LeastTurns and <= MostTurns))
                {
                    _findings.Say($"{path}.coils[{j}].turns", string.Create(CultureInfo.InvariantCulture, $"{coil?.Turns?.ToString(CultureInfo.InvariantCulture) ?? "Nothing"} is given; {LeastTurns} to {MostTurns} turns are allowed, with a minus for the other direction."));
                    turns = 1;
                }

                coils.Add(new Coil(branch, turns));
            }

            if (coils.Count == 0)
            {
                _findings.Say($"{path}.coils", $"Winding {CircuitFindings.Shown(name)} has no coil. Give branch and turns.");
            }

            windings.Add(new Winding(name, phase ?? WindingPhase.Closed, coils, w.R is { } r ? _findings.Within($"{path}.R", r, 0, 1e9) : 0));
        }

        return windings;
    }

    /// <summary>Each line of the supply feeds one winding.</summary>
    private void CheckPhases(List<Winding> windings)
    {
        if (windings.Count != @case.Windings?.Count || @case.Supply?.Connection is not ("single" or "YN" or "Y" or "D"))
        {
            return;
        }

        var connection = @case.Supply.Connection;
        string[] wanted = connection == "single" ? ["S"] : ["A", "B", "C"];
        var given = @case.Windings.Select(w => w.Phase).ToList();
        foreach (var phase in wanted.Where(p => given.Count(g => g == p) != 1))
        {
            _findings.Say("windings", $"Connection {connection} needs one winding of phase {phase}; there are {given.Count(g => g == phase)}.");
        }

        for (var i = 0; i < given.Count; i++)
        {
            if (given[i] is "S" or "A" or "B" or "C" && !wanted.Contains(given[i]))
            {
                _findings.Say($"windings[{i}].phase", $"Phase {given[i]} does not fit connection {connection}. Write {string.Join(", ", wanted)} or closed.");
            }
        }
    }
}
