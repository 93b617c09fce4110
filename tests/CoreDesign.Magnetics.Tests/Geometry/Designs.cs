using CoreDesign.Magnetics.Geometry;
using CoreDesign.Magnetics.Joints;
using CsCheck;

namespace CoreDesign.Magnetics.Tests.Geometry;

/// <summary>Random buildable cores for the laws.</summary>
internal sealed record Design(CoreForm Form, CoreStep[] Steps, double StackingFactor, double WindowHeight_m, double WindowWidth_m, JointKind Joint, double ReturnShare, double ReturnWindowWidth_m)
{
    public CoreGeometry Build(double scale = 1) =>
        CoreBuilder.Build(CoreLayout.Of(Form, ReturnShare), Scaled(scale), StackingFactor, scale * WindowHeight_m, scale * WindowWidth_m, Joint, scale * ReturnWindowWidth_m);

    private CoreStep[] Scaled(double scale) => [.. Steps.Select(s => new CoreStep(scale * s.LimbWidth_m, scale * s.YokeWidth_m, scale * s.Stack_m))];
}

internal static class Designs
{
    /// <summary>A three-limb core's yoke stays above half the limb; half-area yokes, which limbs part, and lower ones are tried on every other form.</summary>
    private static Gen<CoreStep[]> Steps(CoreForm form) =>
        from widest in Gen.Double[0.08, 0.9]
        from factor in form == CoreForm.ThreeLimb ? Gen.Double[0.55, 1.8] : Gen.OneOf(Gen.Const(0.5), Gen.Double[0.2, 1.8])
        from falls in Gen.Select(Gen.Double[0.8, 0.98], Gen.Double[0.9, 1], Gen.Double[0.005, 0.1]).Array[1, 12]
        select Falling(widest, factor, falls);

    /// <summary>Limb widths and yoke widths fall independently, so yokes come out both higher and lower than the limb is wide.</summary>
    public static readonly Gen<Design> Any =
        from form in Gen.Enum<CoreForm>()
        from joint in Gen.Enum<JointKind>()
        from steps in Steps(form)
        from stacking in Gen.Double[0.9, 1]
        from height in Gen.Double[0.05, 3]
        from width in Gen.Double[0.02, 1]
        from share in Gen.OneOf(Gen.Const(0.5), Gen.Double[0.25, 1.4])
        from returnWidth in Gen.Double[0.02, 0.6]
        select new Design(form, steps, stacking, height, width, joint, share, returnWidth);

    private static CoreStep[] Falling(double widest, double factor, (double Limb, double Yoke, double Stack)[] falls)
    {
        var steps = new List<CoreStep>();
        var (w, y) = (widest, widest * factor);
        foreach (var f in falls)
        {
            steps.Add(new(w, y, f.Stack));
            w *= f.Limb;

            // A yoke never falls faster than its limb, so that it stays above half the limb's width.
            y *= Math.Max(f.Limb, f.Yoke);
        }

        return [.. steps];
    }
}
