namespace CoreDesign.Magnetics.Geometry;

/// <summary>A limb in the row: the letter in its name, its plate width as a share of the wound limb's of the same step, and whether it only returns flux.</summary>
public sealed record LimbPlace(string Letter, double WidthShare = 1, bool IsReturn = false);

/// <summary>
/// All that tells one stacked form from another: its limbs from left to right, alike on both sides. Yokes span from each limb to the next, the first and
/// last limb end in corners, the others in T zones. A further form is a further entry here.
/// </summary>
public sealed record CoreLayout(CoreForm Form, IReadOnlyList<LimbPlace> Limbs)
{
    /// <summary>Net area of a return limb over a wound one's where nothing else is given: half the flux goes to either side.</summary>
    public const double ReturnShare = 0.5;

    /// <param name="form">Arrangement of limbs.</param>
    /// <param name="returnShare">Plate width of a return limb over the wound limb's, 0.2 to 1.5; no matter where there is none.</param>
    /// <exception cref="GeometryException">A form that has no layout, or a share out of range.</exception>
    public static CoreLayout Of(CoreForm form, double returnShare = ReturnShare)
    {
        GeometryChecks.Range("returnShare", returnShare, 0.2, 1.5, "times the wound limb", "A return limb beside one wound limb carries half its flux.");
        return form switch
        {
            CoreForm.SinglePhaseTwoLimb => new(form, [new("A"), new("B")]),
            CoreForm.ThreeLimb => new(form, [new("A"), new("B"), new("C")]),
            CoreForm.SinglePhaseThreeLimb => Between(["A"]),
            CoreForm.SinglePhaseFourLimb => Between(["A", "B"]),
            CoreForm.FiveLimb => Between(["A", "B", "C"]),
            _ => throw GeometryChecks.Refuse("form", (int)form, string.Join(", ", Enum.GetNames<CoreForm>()), "Choose one of these forms."),
        };

        CoreLayout Between(IEnumerable<string> wound) =>
            new(form, [new("R", returnShare, true), .. wound.Select(w => new LimbPlace(w)), new("S", returnShare, true)]);
    }

    /// <summary>True where windows between wound limbs and windows beside a return limb both exist, so that each kind has its own width.</summary>
    public bool HasReturnWindows => Limbs.Any(l => l.IsReturn) && Limbs.Count(l => !l.IsReturn) > 1;

    /// <summary>Mean plate width of the limbs on both sides of a main window, over the wound limb's: clear width plus this times the widest plate is the pitch.</summary>
    public double PitchShare => Enumerable.Range(0, Limbs.Count - 1).Where(i => !IsReturnWindow(i)).Select(MeanShare).First();

    internal bool IsOuter(int limb) => limb == 0 || limb == Limbs.Count - 1;

    /// <summary>Whether the window right of a limb lies beside a return limb and has the width of those.</summary>
    internal bool IsReturnWindow(int limb) => HasReturnWindows && (Limbs[limb].IsReturn || Limbs[limb + 1].IsReturn);

    /// <summary>Distances of the limb axes from the first one; clear widths hold at the widest step.</summary>
    internal double[] Axes(double windowWidth_m, double returnWindowWidth_m, double widestLimb_m)
    {
        var x = new double[Limbs.Count];
        for (var i = 1; i < x.Length; i++)
        {
            x[i] = x[i - 1] + (IsReturnWindow(i - 1) ? returnWindowWidth_m : windowWidth_m) + (widestLimb_m * MeanShare(i - 1));
        }

        return x;
    }

    internal string TZoneName(int limb) => Limbs.Count == 3 ? "tZone" : "tZone" + Limbs[limb].Letter;

    private double MeanShare(int limb) => (Limbs[limb].WidthShare + Limbs[limb + 1].WidthShare) / 2;
}
