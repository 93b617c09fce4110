namespace CoreDesign.Magnetics.Geometry;

/// <summary>Axes and spans that the parts and the plates share, from checked input; SI units.</summary>
internal sealed class CoreFrame
{
    // Rounding of a typed width must not leave a bridge of nothing above a notch.
    private const double Hair = 1e-9;

    public CoreFrame(CoreLayout layout, IReadOnlyList<CoreStep> steps, double stackingFactor, double windowHeight, double windowWidth, double returnWindowWidth)
    {
        Layout = layout;
        Steps = steps;
        StackingFactor = stackingFactor;
        YokeAxisDistance = windowHeight + steps[0].YokeWidth_m;
        Axes = layout.Axes(windowWidth, returnWindowWidth, steps[0].LimbWidth_m);
        NetYokeArea = stackingFactor * steps.Sum(s => s.Stack_m * s.YokeWidth_m);
    }

    public CoreLayout Layout { get; }

    public IReadOnlyList<CoreStep> Steps { get; }

    public double StackingFactor { get; }

    public double YokeAxisDistance { get; }

    public double[] Axes { get; }

    public double NetYokeArea { get; }

    public double OverallWidth => Axes[^1] + ((LimbWidth(0, Steps[0]) + LimbWidth(Axes.Length - 1, Steps[0])) / 2);

    public double LimbWidth(int limb, CoreStep step) => step.LimbWidth_m * Layout.Limbs[limb].WidthShare;

    /// <summary>Clear height between the yokes of one step.</summary>
    public double ClearHeight(CoreStep step) => YokeAxisDistance - step.YokeWidth_m;

    /// <summary>Clear width of one step between a limb and the next.</summary>
    public double ClearWidth(int limb, CoreStep step) =>
        Axes[limb + 1] - Axes[limb] - ((LimbWidth(limb, step) + LimbWidth(limb + 1, step)) / 2);

    /// <summary>Whether the point of an inner limb reaches through a mitred yoke of this step, which is then made of two plates that meet there.</summary>
    public bool PartsYoke(int limb, CoreStep step) => !Layout.IsOuter(limb) && step.YokeWidth_m <= LimbWidth(limb, step) / 2 * (1 + Hair);

    public double NetStack(CoreStep step) => StackingFactor * step.Stack_m;

    public double NetLimbArea(int limb) => StackingFactor * Steps.Sum(s => s.Stack_m * LimbWidth(limb, s));

    /// <summary>Net steel volume of a face that varies from step to step.</summary>
    public double Volume(Func<CoreStep, double> face) => StackingFactor * Steps.Sum(s => s.Stack_m * face(s));
}
