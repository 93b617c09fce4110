using System.Globalization;
using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Tests.Estimate;
using CoreDesign.Tests.Shared;

namespace CoreDesign.Estimating.Tests.Published;

/// <summary>
/// The whole estimator beside published figures: the first table of the handbook's chapter. Sources stand in the table; "read" means that the text was
/// read. Nothing is tuned: a deviation is told with its reason.
/// </summary>
public class PublishedFiguresTests
{
    private const string Chapter = "12-published.md";
    private static readonly Dictionary<double, (Spread Loss, Spread Current)> Measured = new[] { 20, 31.5 }.ToDictionary(mva => mva, Ratios);

    [Fact]
    public void Handbook_table_of_measured_cores_is_what_the_estimator_gives() =>
        HandbookTable.Hold(Chapter, "Measured cores", [["Figure", "Published", "Ours", "Off by", "Assumed, and why it differs"], .. Joints(), .. ModelCores(), .. Phases(), .. Zones(), .. Harmonics()]);

    [Fact]
    public void Current_ratio_of_step_lap_to_single_overlap_covers_the_measured_ones()
    {
        foreach (var mva in new[] { 20, 31.5 })
        {
            var ours = Measured[mva].Current;
            var (theirs, deviation) = MeasuredUnits.Current(mva);
            Assert.True(ours.Low < theirs + deviation && ours.High > theirs - deviation, $"{mva} MVA: {ours}, measured {theirs}");
        }
    }

    private static IEnumerable<string[]> Joints()
    {
        foreach (var mva in new[] { 20, 31.5 })
        {
            var (loss, current) = Measured[mva];
            var (theirLoss, lossScatter) = MeasuredUnits.Loss(mva);
            var (theirCurrent, currentScatter) = MeasuredUnits.Current(mva);
            var name = mva.ToString(CultureInfo.InvariantCulture) + " MVA, same design";
            yield return
            [
                $"P0, step-lap over single overlap, {name}", Scattered(theirLoss, lossScatter), loss.ToString(), HandbookTable.Deviation(loss.At, theirLoss),
                mva == 20
                    ? "Unknown steel, flux density, gap and positions: M130-30S, 1.6 T, 0.3 mm, 5 assumed. Ours is the ratio of the two default building factors and nothing else; the joint model says nothing on loss"
                    : "As above",
            ];
            yield return
            [
                $"I0, likewise, {name}", Scattered(theirCurrent, currentScatter), current.ToString(), HandbookTable.Deviation(current.At, theirCurrent),
                mva == 20 ? "Range: 1.5 to 1.7 T, gap 0.2 to 0.5 mm, 3 to 7 positions, three grades. Wider gaps, more positions or sheet that turns more easily at the joint would give theirs" : "As above. Larger cores have more steel beside their joints, which moves ours less than theirs moved",
            ];
        }
    }

    private static IEnumerable<string[]> ModelCores()
    {
        foreach (var (grade, thickness, theirs) in new[] { ("M-4", 0.27, 0.976), ("M-5", 0.30, 1.060) })
        {
            var r = Designs.Solve(PublishedDesigns.ModelCore(grade, thickness));
            var ours = r.NoLoadLoss_W / r.Mass_kg.Total;
            yield return
            [
                $"W/kg at 1.5 T, 50 Hz, 100 kVA model core, {thickness.ToString("0.00", CultureInfo.InvariantCulture)} mm", HandbookTable.Figure(theirs), HandbookTable.Figure(ours), HandbookTable.Deviation(ours, theirs),
                $"Grade {grade} at its guaranteed loss, {HandbookTable.Figure(r.Steel.SheetLoss_W_kg)} W/kg (from memory), times {HandbookTable.Figure(r.Model.BuildingFactor)}. Their sheet was not told; sheet is mostly better than its guarantee, and their core then has a factor of {HandbookTable.Figure(theirs / r.Steel.SheetLoss_W_kg)} or more",
            ];
        }
    }

    private static IEnumerable<string[]> Phases()
    {
        foreach (var (connection, name) in new[] { ("YN", "star with neutral, or inside a delta"), ("Y", "isolated star") })
        {
            double Below(JointInput joint, double b)
            {
                var lines = Designs.Solve(PublishedDesigns.Distribution(connection, joint, b)).Lines;
                return 1 - (lines[1].Rms_A / (0.5 * (lines[0].Rms_A + lines[2].Rms_A)));
            }

            var ours = Spread.Over(Below(PublishedDesigns.StepLap(), 1.6), Every(PublishedDesigns.FluxDensities_T, AllJoints(), (b, j) => Below(j, b)));
            yield return
            [
                $"Middle phase below the outer ones, three limbs, {name}", "about 30 %", ours.Text(Whole), "",
                connection == "YN" ? "1000 kVA, step-lap 5 at 1.6 T; range over joints and 1.5 to 1.7 T. Strong joints lift the middle phase" : "The star point moves and evens the phases; which connection the published figure means is not told",
            ];
        }

        var single = LowVoltageTest.MiddleBelowOuter();
        yield return
        [
            "Likewise, each phase alone at low voltage", "30 to 60 %", single.Text(Whole), "",
            $"1000 kVA, the other limbs open, 0.3 T; range 0.1 to 1.0 T and both joints. With one permeability throughout, path lengths alone give {Whole(LowVoltageTest.ByPathLengths())}; the permeability of our sheet falls towards low flux density, and data below 0.3 T are thin. Connections of the published tests are not told",
        ];
    }

    private static IEnumerable<string[]> Zones()
    {
        double Local(JointInput joint)
        {
            var parts = Designs.Solve(PublishedDesigns.Distribution("YN", joint, 1.7, "M95-27P")).Parts;
            double PerKilogram(string kind) => parts.Where(p => p.Kind == kind).Sum(p => p.Loss_W) / parts.Where(p => p.Kind == kind).Sum(p => p.Count * p.Mass_kg);
            return (PerKilogram("tZone") / PerKilogram("limb")) - 1;
        }

        double Over(JointInput joint)
        {
            var r = Designs.Solve(PublishedDesigns.Distribution("YN", joint, 1.7));
            return r.NoLoadLoss_W / r.Mass_kg.Total / r.Steel.SheetLoss_W_kg;
        }

        var factor = Spread.Over(Over(PublishedDesigns.StepLap()), [Over(PublishedDesigns.Overlap()), Over(new() { Type = "buttLap" })]);
        yield return ["Core W/kg over sheet W/kg, three limbs", "1.08 to 1.35", factor.ToString(), "", "No prediction: the building factor is an input, its defaults were chosen within this range. A paper of 2008"];
        yield return
        [
            "That factor, step-lap over others", "5 to 8 % lower", Whole(1 - (Over(PublishedDesigns.StepLap()) / Over(PublishedDesigns.Overlap()))), "",
            "The same: an input",
        ];
        var local = Spread.Over(Local(PublishedDesigns.StepLap()), [Local(PublishedDesigns.Overlap())]);
        yield return
        [
            "Local loss of the T zone over the limb's, 1.7 T, highly oriented sheet", "about 50 %", local.Text(Whole), "",
            "Step-lap (single overlap). Ours is the share of the building factor that we lay on T zones and corners, and no field computed there; rotation is in it only that way. IEEE Trans. Magn. 2019",
        ];
        yield return
        [
            "Zero-sequence magnetising impedance, three limbs", "40 to 150 %", $"{HandbookTable.Figure(100 * CoreDesign.Estimating.Estimate.DesignDefaults.ZeroSequenceReactance_pu, 2)} %", "",
            "Assumed, not computed: it depends on tank and clamps. It counts with an isolated star alone",
        ];
    }

    private static IEnumerable<string[]> Harmonics()
    {
        double Share(JointInput joint, double b, string grade, int order)
        {
            var h = Designs.Solve(PublishedDesigns.SinglePhase(joint, b, grade)).Lines[0].Harmonics;
            return h.Single(x => x.Order == order).Rms_A / h.Single(x => x.Order == 1).Rms_A;
        }

        foreach (var (order, theirs) in new[] { (3, "30 to 50 %"), (5, "10 to 25 %"), (7, "5 to 10 %") })
        {
            var ours = Spread.Over(
                Share(PublishedDesigns.StepLap(), 1.7, "M105-30P", order),
                from b in new[] { 1.6, 1.65, 1.7 }
                from grade in PublishedDesigns.Grades
                from joint in AllJoints()
                select Share(joint, b, grade, order));
            yield return
            [
                $"Harmonic {order} of the exciting current over the fundamental, single phase or bank", $"{theirs} (from memory)", ours.Text(Whole), "",
                order == 3 ? "Step-lap 5, M105-30P, 1.7 T; range 1.6 to 1.7 T, three grades, both joints" : "As above",
            ];
        }
    }

    /// <summary>Step-lap over single overlap, loss and current, over everything that is not published.</summary>
    private static (Spread Loss, Spread Current) Ratios(double mva)
    {
        (double Loss, double Current) At(string grade, double b, double gap, int positions)
        {
            var several = Designs.Solve(PublishedDesigns.Power(mva, PublishedDesigns.StepLap(positions, gap), grade, b));
            var single = Designs.Solve(PublishedDesigns.Power(mva, PublishedDesigns.Overlap(gap), grade, b));
            return (several.NoLoadLoss_W / single.NoLoadLoss_W, several.NoLoadCurrent_percent / single.NoLoadCurrent_percent);
        }

        var at = At("M130-30S", 1.6, 0.3, 5);
        var all = (
            from grade in PublishedDesigns.Grades
            from b in PublishedDesigns.FluxDensities_T
            from gap in PublishedDesigns.Gaps_mm
            from positions in PublishedDesigns.Positions
            select At(grade, b, gap, positions)).ToList();
        return (Spread.Over(at.Loss, all.Select(x => x.Loss)), Spread.Over(at.Current, all.Select(x => x.Current)));
    }

    private static IEnumerable<JointInput> AllJoints() => [PublishedDesigns.StepLap(), PublishedDesigns.Overlap()];

    private static IEnumerable<double> Every<TA, TB>(IEnumerable<TA> x, IEnumerable<TB> y, Func<TA, TB, double> of) => from a in x from b in y select of(a, b);

    private static string Scattered(double value, double deviation) => string.Create(CultureInfo.InvariantCulture, $"{value:0.000}\u00a0±\u00a0{deviation:0.000}");

    private static string Whole(double share) => (100 * share).ToString("0", CultureInfo.InvariantCulture).Replace('-', '−') + "\u00a0%";
}
