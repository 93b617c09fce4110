using CoreDesign.Magnetics.Geometry;
using CoreDesign.Magnetics.Joints;
using CsCheck;

namespace CoreDesign.Magnetics.Tests.Geometry;

/// <summary>Random buildable cores for the laws.</summary>
internal sealed record Design(CoreForm Form, CoreStep[] Steps, double StackingFactor, double WindowHeight_m, double WindowWidth_m, JointKind Joint)
{
    public CoreGeometry Build(double scale = 1) => CoreBuilder.Build(Form, Scaled(scale), StackingFactor, scale * WindowHeight_m, scale * WindowWidth_m, Joint);

    private CoreStep[] Scaled(double scale) => [.. Steps.Select(s => new CoreStep(scale * s.LimbWidth_m, scale * s.YokeWidth_m, scale * s.Stack_m))];
}

internal static class Designs
{
    private static readonly Gen<CoreStep[]> Steps =
        from widest in Gen.Double[0.08, 0.9]
        from factor in Gen.Double[0.55, 1.8]
        from falls in Gen.Select(Gen.Double[0.8, 0.98], Gen.Double[0.9, 1], Gen.Double[0.005, 0.1]).Array[1, 12]
        select Falling(widest, factor, falls);

    /// <summary>Limb widths and yoke widths fall independently, so yokes come out both higher and lower than the limb is wide.</summary>
    public static readonly Gen<Design> Any =
        from form in Gen.Enum<CoreForm>()
        from joint in Gen.Enum<JointKind>()
        from steps in Steps
        from stacking in Gen.Double[0.9, 1]
        from height in Gen.Double[0.05, 3]
        from width in Gen.Double[0.02, 1]
        select new Design(form, steps, stacking, height, width, joint);

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
