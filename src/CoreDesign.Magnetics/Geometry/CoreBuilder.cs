using CoreDesign.Magnetics.Joints;

namespace CoreDesign.Magnetics.Geometry;

/// <summary>
/// Builds a stacked core from its steps and window. Steps are centred on the limb and yoke axes, so that narrower steps have a larger
/// window; clear window height and width are those of the widest step.
/// </summary>
public static class CoreBuilder
{
    /// <param name="form">Arrangement of limbs.</param>
    /// <param name="steps">From the widest outward, 1 to 60; lengths 10 µm to 100 m. Yoke widths fall or stay where limb widths fall.</param>
    /// <param name="stackingFactor">Share of steel in the stack, above 0, at most 1.</param>
    /// <param name="windowHeight_m">Clear, at the widest step.</param>
    /// <param name="windowWidth_m">Clear, at the widest step; see <see cref="WindowWidth"/> for a given limb pitch.</param>
    /// <param name="joint">Only the cut of the plates follows from it; the parts are the same.</param>
    /// <exception cref="GeometryException">A value out of range, steps out of order, or a yoke of a three-limb core too low for the points of a mitred T joint.</exception>
    public static CoreGeometry Build(CoreForm form, IReadOnlyList<CoreStep> steps, double stackingFactor, double windowHeight_m, double windowWidth_m, JointKind joint) =>
        Build(CoreLayout.Of(form), steps, stackingFactor, windowHeight_m, windowWidth_m, joint);

    /// <inheritdoc cref="Build(CoreForm, IReadOnlyList{CoreStep}, double, double, double, JointKind)"/>
    /// <param name="layout">Arrangement of limbs with the width of the return limbs.</param>
    /// <param name="returnWindowWidth_m">Clear, at the widest step, between a wound and a return limb where wound limbs also stand side by side;
    /// null for half the window width: such a window holds one winding, that between wound limbs two.</param>
    public static CoreGeometry Build(CoreLayout layout, IReadOnlyList<CoreStep> steps, double stackingFactor, double windowHeight_m, double windowWidth_m, JointKind joint, double? returnWindowWidth_m = null)
    {
        ArgumentNullException.ThrowIfNull(layout);
        ArgumentNullException.ThrowIfNull(steps);
        CheckSteps(steps);
        GeometryChecks.StackingFactor(stackingFactor);
        GeometryChecks.Length("windowHeight_m", windowHeight_m, "Give the clear height between the yokes at the widest step.");
        GeometryChecks.Length("windowWidth_m", windowWidth_m, "Give the clear width between the limbs at the widest step.");

        var returnWindow = layout.HasReturnWindows ? returnWindowWidth_m ?? (windowWidth_m / 2) : windowWidth_m;
        GeometryChecks.Length("returnWindowWidth_m", returnWindow, "Give the clear width between a wound and a return limb at the widest step.");
        var frame = new CoreFrame(layout, [.. steps], stackingFactor, windowHeight_m, windowWidth_m, returnWindow);
        var gross = steps.Sum(s => s.Stack_m * s.LimbWidth_m);
        return new CoreGeometry
        {
            Form = layout.Form,
            Steps = frame.Steps,
            StackingFactor = stackingFactor,
            WindowHeight_m = windowHeight_m,
            WindowWidth_m = windowWidth_m,
            ReturnWindowWidth_m = returnWindow,
            LimbPitch_m = LimbPitch(windowWidth_m, steps[0].LimbWidth_m * layout.PitchShare),
            CircleDiameter_m = StepOptimizer.CircleAround(LimbSteps(steps)),
            GrossLimbArea_m2 = gross,
            NetLimbArea_m2 = stackingFactor * gross,
            NetYokeArea_m2 = frame.NetYokeArea,
            StackHeight_m = steps.Sum(s => s.Stack_m),
            OverallWidth_m = frame.OverallWidth,
            OverallHeight_m = windowHeight_m + (2 * steps[0].YokeWidth_m),
            Limbs = [.. layout.Limbs.Select((l, i) => new CoreLimb(l.Letter, frame.Axes[i], l.WidthShare, frame.NetLimbArea(i), l.IsReturn))],
            Parts = CoreParts.Of(frame),
            Plates = joint switch
            {
                JointKind.MitredOverlap or JointKind.StepLap => MitredPlates.Of(frame),
                JointKind.ButtLap => ButtPlates.Of(frame),
                _ => throw GeometryChecks.Refuse("joint", (int)joint, string.Join(", ", Enum.GetNames<JointKind>()), "Choose one of these joints."),
            },
        };
    }

    /// <summary>Distance of neighbouring limb axes: clear window width plus the widest limb plate (the mean of both limbs' where they differ).</summary>
    /// <exception cref="GeometryException">A length out of range.</exception>
    public static double LimbPitch(double windowWidth_m, double widestLimbWidth_m)
    {
        GeometryChecks.Length("windowWidth_m", windowWidth_m, "Give the clear width between the limbs at the widest step.");
        GeometryChecks.Length("widestLimbWidth_m", widestLimbWidth_m, "Give the width of the widest limb plate.");
        return windowWidth_m + widestLimbWidth_m;
    }

    /// <summary>Clear window width at the widest step from the distance of the limb axes.</summary>
    /// <exception cref="GeometryException">A length out of range, or a pitch that leaves no window.</exception>
    public static double WindowWidth(double limbPitch_m, double widestLimbWidth_m)
    {
        GeometryChecks.Length("limbPitch_m", limbPitch_m, "Give the distance of neighbouring limb axes.");
        GeometryChecks.Length("widestLimbWidth_m", widestLimbWidth_m, "Give the width of the widest limb plate.");
        if (limbPitch_m - widestLimbWidth_m < GeometryChecks.LeastLength_m)
        {
            throw GeometryChecks.Refuse(
                "limbPitch_m",
                limbPitch_m,
                FormattableString.Invariant($"above {widestLimbWidth_m:G9} m, the widest limb plate"),
                "Widen the pitch or take a narrower limb, so that a window is left.");
        }

        return limbPitch_m - widestLimbWidth_m;
    }

    private static LimbStep[] LimbSteps(IReadOnlyList<CoreStep> steps) => [.. steps.Select(s => new LimbStep(s.LimbWidth_m, s.Stack_m))];

    private static void CheckSteps(IReadOnlyList<CoreStep> steps)
    {
        GeometryChecks.LimbSteps(LimbSteps(steps), "limbWidth_m");
        for (var k = 0; k < steps.Count; k++)
        {
            var name = $"steps[{k}].yokeWidth_m";
            GeometryChecks.Length(name, steps[k].YokeWidth_m, "Give the width of the yoke plates of this step.");

            // The window is measured at the widest step, so no yoke of another step may reach into it.
            if (k > 0 && steps[k].YokeWidth_m > steps[k - 1].YokeWidth_m)
            {
                throw GeometryChecks.Refuse(
                    name,
                    steps[k].YokeWidth_m,
                    FormattableString.Invariant($"at most {steps[k - 1].YokeWidth_m:G9} m, the yoke width of the step before"),
                    "Let the yoke widths fall or stay as the limb widths fall.");
            }
        }
    }
}
