using System.Globalization;
using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Fields;
using CoreDesign.Estimating.Margins;
using CoreDesign.Estimating.Steels;
using CoreDesign.Estimating.Steels.Checks;
using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Geometry;
using CoreDesign.Magnetics.Joints;

namespace CoreDesign.Estimating.Estimate;

/// <summary>Checks a design, takes defaults for what is open and converts to SI. Collects every error; nothing is corrected silently.</summary>
internal sealed class DesignResolver(DesignInput input, SteelCatalog steels)
{
    private const int MostVoltages = 6;
    private readonly List<FieldError> _errors = [];
    private readonly List<string> _derived = [];
    private readonly List<NoteResult> _warnings = [];

    public IReadOnlyList<FieldError> Errors => _errors;

    public ResolvedDesign? Resolve()
    {
        var order = input.Order ?? new();
        var winding = input.ExcitedWinding ?? new();
        var core = input.Core ?? new();
        var phases = new PhaseReader(this);
        var form = phases.Form(core.Form);
        var units = phases.Units(core, order, form);
        var woundLimbs = phases.WoundLimbs(core, form);
        var connection = phases.Connection(winding.Connection, form, units);
        phases.Check(order, core, form, units);
        var rated = Needed("order.ratedPower_kVA", order.RatedPower_kVA);
        var frequency = Needed("order.frequency_Hz", order.Frequency_Hz);
        var highest = Optional("order.highestVoltage_percent", order.HighestVoltage_percent, DesignDefaults.HighestVoltage_percent);
        var margins = new MarginsReader(this);
        var lowest = margins.LowestFrequency(order, frequency);
        Limit("order.askedNoLoadLoss_W", order.AskedNoLoadLoss_W);
        Limit("order.askedNoLoadCurrent_percent", order.AskedNoLoadCurrent_percent);
        CheckTexts(order);
        var windings = new WindingReader(this);
        var (excited, filledExcited) = windings.Excited(winding, connection, frequency);
        var (other, filledOther) = windings.Other(input.OtherWinding, excited, winding.Turns);
        var (tertiary, filledTertiary) = windings.Tertiary(input.Tertiary, connection, winding.Turns);
        var (capacitance, filledCapacitance) = windings.Capacitance(input.Capacitance, order, connection);
        var asked = margins.Read(input.Margins, excited?.Resistance_ohm ?? double.NaN);
        var steel = Steel();
        var (joint, effectiveGap, filledJoint) = new JointReader(this).Read(input.Joint);
        var (geometry, filledCore) = new CoreReader(this).Read(core, form, steel, joint?.Kind ?? JointKind.StepLap);
        if (geometry is not null && joint is not null && JointFit.Check(joint, geometry) is { } misfit)
        {
            Say("joint.overlap_mm", misfit);
        }

        var building = Building(form, joint?.Kind);
        var temperature = Optional("model.temperature_C", input.Model?.Temperature_C, DesignDefaults.Temperature_C);
        var zeroSequence = ZeroSequence(form);
        if (_errors.Count > 0 || geometry is null || steel is null || joint is null || excited is null || building is null)
        {
            return null;
        }

        return new ResolvedDesign
        {
            Inputs = new DesignInput
            {
                Order = order with { Phases = excited.Supply.Connection == SupplyConnection.Single ? 1 : 3, HighestVoltage_percent = highest, LowestFrequency_Hz = lowest },
                ExcitedWinding = filledExcited,
                OtherWinding = filledOther,
                Tertiary = filledTertiary,
                Capacitance = filledCapacitance,
                Steel = input.Steel!.Data is null ? new SteelInput { Grade = steel.Name } : input.Steel,
                Core = filledCore with { Units = core.Units is null && units == 1 ? null : units, WoundLimbs = woundLimbs },
                Joint = filledJoint,
                Model = (input.Model ?? new()) with { BuildingFactor = building.Value, Temperature_C = temperature, ZeroSequenceReactance_pu = zeroSequence },
                Margins = margins.WithAirCore(asked, geometry, excited.Turns, woundLimbs ?? 1),
            },
            Derived = _derived,
            Warnings = _warnings,
            Steel = steel,
            Geometry = geometry,
            Joint = joint,
            EffectiveGap_m = effectiveGap,
            Excited = excited,
            Other = other,
            Tertiary = tertiary,
            Capacitance = capacitance,
            Units = units,
            WoundLimbs = woundLimbs ?? 1,
            ZeroSequenceReactance_pu = zeroSequence ?? DesignDefaults.ZeroSequenceReactance_pu,
            RatedPower_VA = rated * 1000,
            HighestVoltage_percent = highest,
            LowestFrequency_Hz = lowest,
            BuildingFactor = building,
            Temperature_C = temperature,
        };
    }

    internal void Say(string path, string message) => _errors.Add(new FieldError(path, message));

    internal void Warn(string key, string text) => _warnings.Add(new NoteResult(key, text));

    internal void Derive(string path) => _derived.Add(path);

    /// <summary>A value that must be there; NaN where it is not or is out of range, with the error said.</summary>
    internal double Needed(string path, double? value)
    {
        var field = FieldCatalog.Find(path);
        if (value is not { } v)
        {
            Say(path, field.Missing());
            return double.NaN;
        }

        if (field.Check(v) is { } message)
        {
            Say(path, message);
            return double.NaN;
        }

        return v;
    }

    /// <summary>A value with a default.</summary>
    internal double Optional(string path, double? value, double @default)
    {
        if (value is null)
        {
            Derive(path);
            return @default;
        }

        return Needed(path, value);
    }

    private void Limit(string path, double? value)
    {
        if (value is not null)
        {
            Needed(path, value);
        }
    }

    private void CheckTexts(OrderInput order)
    {
        if (order.Reference is { Length: > 80 } r)
        {
            Say("order.reference", $"The reference has {r.Length} characters; at most 80. Shorten it.");
        }
        else if (!NameRules.IsPlain(order.Reference ?? ""))
        {
            Say("order.reference", "The reference holds control or invisible characters. Type it again as plain text, at most 80 characters.");
        }

        if (order.RatedVoltages_kV?.Count > MostVoltages)
        {
            Say("order.ratedVoltages_kV", $"{order.RatedVoltages_kV.Count} rated voltages are given; at most {MostVoltages}. Give one for each winding.");
            return;
        }

        for (var i = 0; i < (order.RatedVoltages_kV?.Count ?? 0); i++)
        {
            Needed(string.Create(CultureInfo.InvariantCulture, $"order.ratedVoltages_kV[{i}]"), order.RatedVoltages_kV![i]);
        }
    }

    private SteelGrade? Steel()
    {
        var steel = input.Steel;
        if (steel?.Data is { } data)
        {
            if (steel.Grade is not null)
            {
                Say("steel.grade", "Give a grade or data of your own, not both.");
            }

            var read = SteelFromRequest.Convert(data);
            _errors.AddRange(read.Errors);
            _derived.AddRange(read.Derived);
            _warnings.AddRange(read.Warnings.Select(w => new NoteResult("steel", w.Message)));
            return read.Grade;
        }

        if (string.IsNullOrWhiteSpace(steel?.Grade))
        {
            Say("steel.grade", "The steel grade is missing. Choose one of the library, or give data of your own.");
            return null;
        }

        if (steels.TryFind(steel.Grade, out var grade))
        {
            return grade;
        }

        Say("steel.grade", $"There is no steel '{Cut(steel.Grade)}'. Nearest names: {string.Join(", ", steels.Nearest(Cut(steel.Grade), 3))}.");
        return null;
    }

    /// <summary>Null where the form has no such path.</summary>
    private double? ZeroSequence(CoreForm? form)
    {
        var given = input.Model?.ZeroSequenceReactance_pu;
        if (form is { } f && !CoreForms.HasAirPath(f))
        {
            if (given is not null)
            {
                Say("model.zeroSequenceReactance_pu", $"The zero-sequence path counts for three phases on one core, not for {input.Core!.Form}. Leave it out.");
            }

            return null;
        }

        return Optional("model.zeroSequenceReactance_pu", given, DesignDefaults.ZeroSequenceReactance_pu);
    }

    private BuildingFactorValue? Building(CoreForm? form, JointKind? joint)
    {
        if (input.Model?.BuildingFactor is { } given)
        {
            return BuildingFactors.Given(Needed("model.buildingFactor", given));
        }

        Derive("model.buildingFactor");
        return form is { } f && joint is { } j ? BuildingFactors.Default(f, j) : null;
    }

    internal static string Cut(string text) => text.Length <= 40 ? text : text[..40] + "…";
}
