namespace CoreDesign.Magnetics.Geometry;

/// <summary>A limb in the row: the letter in its name, and its plate width as a share of the wound limb's of the same step.</summary>
public sealed record LimbPlace(string Letter, double WidthShare = 1);

/// <summary>
/// All that tells one stacked form from another: its limbs from left to right, alike on both sides. Yokes span from each limb to the next, the first and
/// last limb end in corners, the others in T zones. A further form is a further entry here.
/// </summary>
public sealed record CoreLayout(CoreForm Form, IReadOnlyList<LimbPlace> Limbs)
{
    /// <exception cref="GeometryException">A form that has no layout.</exception>
    public static CoreLayout Of(CoreForm form) => form switch
    {
        CoreForm.SinglePhaseTwoLimb => new(form, [new("A"), new("B")]),
        CoreForm.ThreeLimb => new(form, [new("A"), new("B"), new("C")]),
        _ => throw GeometryChecks.Refuse("form", (int)form, string.Join(", ", Enum.GetNames<CoreForm>()), "Choose one of these forms."),
    };

    internal bool IsOuter(int limb) => limb == 0 || limb == Limbs.Count - 1;

    /// <summary>Distances of the limb axes from the first one; the windows are equally wide at the widest step.</summary>
    internal double[] Axes(double windowWidth_m, double widestLimb_m)
    {
        var x = new double[Limbs.Count];
        for (var i = 1; i < x.Length; i++)
        {
            x[i] = x[i - 1] + windowWidth_m + (widestLimb_m * (Limbs[i - 1].WidthShare + Limbs[i].WidthShare) / 2);
        }

        return x;
    }

    internal string TZoneName(int limb) => Limbs.Count == 3 ? "tZone" : "tZone" + Limbs[limb].Letter;
}
