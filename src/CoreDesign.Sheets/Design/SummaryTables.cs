using CoreDesign.Estimating.Contracts;
using CoreDesign.Sheets.Pdf;
using static CoreDesign.Sheets.Figures;

namespace CoreDesign.Sheets.Design;

/// <summary>What was asked for, what was chosen, what was found: the three columns under the drawing.</summary>
internal static class SummaryTables
{
    public static Block All(EstimateResult e) => new Columns(
        [new Heading("Asked for", false), AskedFor(e)],
        [new Heading("Chosen", false), Chosen(e)],
        [new Heading("Found", false), Found(e)])
    { Bookmark = "Asked for, chosen, found" };

    private static Table AskedFor(EstimateResult e)
    {
        var o = e.Inputs.Order ?? new OrderInput();
        var rows = new Names(e.Derived);
        rows.Add("order.reference", "Reference", o.Reference ?? Nothing);
        rows.Add("order.phases", "Phases", o.Phases is { } p ? Plain(p) : Nothing);
        rows.Add("order.ratedPower_kVA", "Rated power", Value(o.RatedPower_kVA, "kVA"));
        rows.Add("order.ratedVoltages_kV", "Rated voltages", o.RatedVoltages_kV is { Count: > 0 } v ? With(string.Join("/", v.Select(x => Plain(x))), "kV") : Nothing);
        rows.Add("order.highestVoltage_percent", "Highest voltage", Value(o.HighestVoltage_percent, "%"));
        rows.Add("order.frequency_Hz", "Frequency", Value(o.Frequency_Hz, "Hz"));
        rows.Add("order.askedNoLoadLoss_W", "No-load loss", Value(o.AskedNoLoadLoss_W, "W"));
        rows.Add("order.askedNoLoadCurrent_percent", "No-load current", Value(o.AskedNoLoadCurrent_percent, "%"));
        return rows.Table;
    }

    private static Table Chosen(EstimateResult e)
    {
        var i = e.Inputs;
        var winding = i.ExcitedWinding ?? new ExcitedWindingInput();
        var rows = new Names(e.Derived);
        rows.Add("steel.grade", "Steel", $"{e.Steel.Grade}, {With(Plain(e.Steel.Thickness_mm), "mm")}");
        rows.Add("core.stackingFactor", "Stacking factor", Value(i.Core?.StackingFactor, ""));
        rows.Add("core.form", "Core", Words.Core(e.Geometry));
        rows.Add("joint.type", "Joint", Words.Joint(i.Joint));
        if (e.Joint.EffectiveGapUsed)
        {
            rows.Add("joint.effectiveGap_mm", "Effective gap", Value(i.Joint?.EffectiveGap_mm, "mm"));
        }
        else
        {
            rows.Add("joint.gap_mm", "Gap; shift", $"{Value(i.Joint?.Gap_mm, "mm")}; {Value(i.Joint?.Overlap_mm, "mm")}");
        }

        rows.Add("excitedWinding.lineVoltage_V", "Excited winding", $"{winding.Connection}, {Value(winding.LineVoltage_V, "V")}");
        rows.Add("excitedWinding.turns", "Turns", Value(winding.Turns, ""));
        rows.Add("model.buildingFactor", "Building factor", Value(e.Model.BuildingFactor, ""));
        return rows.Table;
    }

    private static Table Found(EstimateResult e)
    {
        var asked = e.Inputs.Order;
        return Table.KeyValues(
            ("No-load loss", With(Significant(e.NoLoadLoss_W, 4), "W"), true, false),
            ("against asked for", Against(e.NoLoadLoss_W, asked?.AskedNoLoadLoss_W, "W"), false, false),
            ("No-load current", $"{With(Significant(e.NoLoadCurrent_percent, 3), "%")}, {With(Significant(e.NoLoadCurrent_A, 3), "A")}", true, false),
            ("against asked for", Against(e.NoLoadCurrent_percent, asked?.AskedNoLoadCurrent_percent, "points"), false, false),
            ("Exciting power", With(Significant(e.ExcitingPower_VA, 4), "VA"), false, false),
            ("Power factor", Fixed(e.PowerFactor, 3), false, false),
            ("Margin at rated", With(Fixed(e.Margin.AtRated_percent, 1), "%"), true, false),
            ("Margin at " + Value(asked?.HighestVoltage_percent, "%"), With(Fixed(e.Margin.AtHighest_percent, 1), "%"), true, false),
            ("Core mass", With(Significant(e.Mass_kg.Total, 4), "kg"), true, false));
    }

    /// <summary>The signed difference to the asked-for figure, and the standing in a word.</summary>
    private static string Against(double found, double? asked, string unit)
    {
        if (asked is not { } limit)
        {
            return "nothing asked for";
        }

        var difference = found - limit;
        var sign = difference > 0 ? "+" : "";
        return $"{sign}{With(Significant(difference, 2), unit)}, {(difference > 0 ? "not met" : "met")}";
    }

    public static string Value(double? value, string unit) => value is { } v ? With(Plain(v), unit) : Nothing;

    /// <summary>Rows of names and values, italic where the value was left open and derived.</summary>
    private sealed class Names(IReadOnlyList<string> derived)
    {
        private readonly List<(string Name, string Value, bool Strong, bool Derived)> _rows = [];

        public Table Table => Table.KeyValues(_rows);

        public void Add(string path, string name, string value) => _rows.Add((name, value, false, derived.Contains(path)));
    }
}
