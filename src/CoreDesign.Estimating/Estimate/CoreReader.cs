using System.Globalization;
using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Fields;
using CoreDesign.Estimating.Steels;
using CoreDesign.Magnetics.Geometry;
using CoreDesign.Magnetics.Joints;

namespace CoreDesign.Estimating.Estimate;

/// <summary>Reads yoke, return limbs and window of a design and builds the core.</summary>
internal sealed class CoreReader(DesignResolver resolver)
{
    private const double LowFill = 0.6;

    public (CoreGeometry? Geometry, CoreInput Filled) Read(CoreInput core, CoreForm? form, SteelGrade? steel, JointKind joint)
    {
        var layout = Layout(core, form);
        var stacking = StackingFactor(core, steel);
        var height = resolver.Needed("core.windowHeight_mm", core.WindowHeight_mm);
        var section = new SectionReader(resolver).Read(core);
        var besides = section is null ? double.NaN : section.Steps[0].Width_m * 1000 * (layout?.PitchShare ?? 1);
        var window = WindowWidth(core, section is null ? null : besides);
        var returnWindow = ReturnWindow(core, form, window);
        var defaultYoke = form is { } known ? CoreForms.YokeAreaFactor(known) : DesignDefaults.YokeAreaFactor;
        var steps = section is null ? null : WithYokes(core.Yoke, section, defaultYoke);
        var filled = core with
        {
            StackingFactor = stacking,
            Yoke = core.Yoke ?? new YokeInput { AreaFactor = defaultYoke },
            ReturnLimb = layout?.Limbs.FirstOrDefault(l => l.IsReturn) is { } place ? new ReturnLimbInput { AreaFactor = place.WidthShare } : core.ReturnLimb,
            ReturnWindowWidth_mm = returnWindow,
        };
        if (section is null || steps is null || form is null || layout is null || double.IsNaN(stacking + height + window) || returnWindow is double.NaN)
        {
            return (null, filled);
        }

        if (!YokesFit(steps, form.Value, joint, core))
        {
            return (null, filled);
        }

        if (core.WindowWidth_mm is null)
        {
            resolver.Derive("core.windowWidth_mm");
        }

        if (core.LimbPitch_mm is null)
        {
            resolver.Derive("core.limbPitch_mm");
        }

        filled = filled with { WindowWidth_mm = window, LimbPitch_mm = window + besides };
        try
        {
            var geometry = CoreBuilder.Build(layout, steps, stacking, height / 1000, window / 1000, joint, returnWindow / 1000);
            if (section.FillRatio < LowFill)
            {
                resolver.Warn("core.fill", string.Create(CultureInfo.InvariantCulture, $"The steps fill only {100 * section.FillRatio:0.0} % of their circle."));
            }

            return (geometry, filled);
        }
        catch (GeometryException e)
        {
            resolver.Say(KernelPaths.Of(e.PropertyName, core), KernelPaths.Words(e));
            return (null, filled);
        }
    }

    private CoreLayout? Layout(CoreInput core, CoreForm? form)
    {
        if (form is not { } f)
        {
            return null;
        }

        if (!CoreForms.HasReturnLimbs(f))
        {
            Only("core.returnLimb", core.ReturnLimb, core.Form!, "no return limbs");
            return CoreLayout.Of(f);
        }

        var share = resolver.Optional("core.returnLimb.areaFactor", core.ReturnLimb?.AreaFactor, DesignDefaults.ReturnLimbAreaFactor);
        return double.IsNaN(share) ? null : CoreLayout.Of(f, share);
    }

    /// <summary>Null where the form has no such window; NaN after an error.</summary>
    private double? ReturnWindow(CoreInput core, CoreForm? form, double window)
    {
        if (form is not { } f || !CoreForms.HasReturnWindows(f))
        {
            if (form is not null)
            {
                Only("core.returnWindowWidth_mm", core.ReturnWindowWidth_mm, core.Form!, "no windows beside a return limb other than those of windowWidth_mm");
            }

            return null;
        }

        // A window between wound limbs holds two windings, one beside a return limb holds one.
        return resolver.Optional("core.returnWindowWidth_mm", core.ReturnWindowWidth_mm, window / 2);
    }

    private void Only(string path, object? given, string form, string has)
    {
        if (given is not null)
        {
            resolver.Say(path, $"The core form {form} has {has}. Leave this out, or choose another form.");
        }
    }

    private double StackingFactor(CoreInput core, SteelGrade? steel)
    {
        if (core.StackingFactor is null && steel?.MinimumStackingFactor is { } least)
        {
            resolver.Derive("core.stackingFactor");
            return least.Value;
        }

        return resolver.Needed("core.stackingFactor", core.StackingFactor);
    }

    private double WindowWidth(CoreInput core, double? besides_mm)
    {
        if (core.WindowWidth_mm is null && core.LimbPitch_mm is null)
        {
            resolver.Say("core.windowWidth_mm", FieldCatalog.Find("core.windowWidth_mm").Missing() + " Or give the limb pitch, limbPitch_mm.");
            return double.NaN;
        }

        var width = core.WindowWidth_mm is { } w ? resolver.Needed("core.windowWidth_mm", w) : double.NaN;
        if (core.LimbPitch_mm is not { } typedPitch)
        {
            return width;
        }

        var pitch = resolver.Needed("core.limbPitch_mm", typedPitch);
        if (besides_mm is not { } besides || double.IsNaN(pitch))
        {
            return double.NaN;
        }

        var left = pitch - besides;
        if (core.WindowWidth_mm is null)
        {
            var least = FieldCatalog.Find("core.windowWidth_mm").Min;
            if (left < least)
            {
                resolver.Say("core.limbPitch_mm", string.Create(CultureInfo.InvariantCulture, $"Limb pitch {pitch} mm leaves a window of {left:0.###} mm; at least {least} mm. Widen the pitch or take a narrower limb."));
                return double.NaN;
            }

            return left;
        }

        if (Math.Abs(left - width) > 0.001)
        {
            resolver.Say("core.limbPitch_mm", string.Create(CultureInfo.InvariantCulture, $"Limb pitch {pitch} mm and window width {width} mm do not agree: the pitch leaves {left:0.###} mm. Give one of the two."));
        }

        return width;
    }

    private IReadOnlyList<CoreStep>? WithYokes(YokeInput? yoke, StepSet section, double defaultFactor)
    {
        if (yoke?.StepWidths_mm is { Count: > 0 } own)
        {
            if (yoke.AreaFactor is not null)
            {
                resolver.Say("core.yoke", "Give areaFactor or stepWidths_mm, not both.");
                return null;
            }

            var before = resolver.Errors.Count;
            if (own.Count != section.Steps.Count)
            {
                resolver.Say("core.yoke.stepWidths_mm", $"{own.Count} yoke widths for {section.Steps.Count} limb steps. Give one for each step.");
                return null;
            }

            for (var i = 0; i < own.Count; i++)
            {
                resolver.Needed(string.Create(CultureInfo.InvariantCulture, $"core.yoke.stepWidths_mm[{i}]"), own[i]);
            }

            return resolver.Errors.Count > before ? null : section.WithYokes([.. own.Select(w => w / 1000)]);
        }

        var factor = resolver.Optional("core.yoke.areaFactor", yoke?.AreaFactor, defaultFactor);
        return double.IsNaN(factor) ? null : section.WithYokes(factor);
    }

    /// <summary>Yoke widths fall or stay with the limb's, and a mitred T joint's points (half the limb's width) end inside the yoke.</summary>
    private bool YokesFit(IReadOnlyList<CoreStep> steps, CoreForm form, JointKind joint, CoreInput core)
    {
        var before = resolver.Errors.Count;
        for (var k = 0; k < steps.Count; k++)
        {
            double yoke = steps[k].YokeWidth_m * 1000, limb = steps[k].LimbWidth_m * 1000;
            var path = core.Yoke?.StepWidths_mm is null ? "core.yoke.areaFactor" : string.Create(CultureInfo.InvariantCulture, $"core.yoke.stepWidths_mm[{k}]");
            if (k > 0 && steps[k].YokeWidth_m > steps[k - 1].YokeWidth_m)
            {
                resolver.Say(path, string.Create(CultureInfo.InvariantCulture, $"Yoke step width {yoke:0.###} mm is above {steps[k - 1].YokeWidth_m * 1000:0.###} mm, the step before. Let the yoke widths fall or stay as the limb widths fall."));
            }
            else if (form == CoreForm.ThreeLimb && joint != JointKind.ButtLap && yoke <= (limb / 2) + 1e-6)
            {
                resolver.Say(path, string.Create(CultureInfo.InvariantCulture, $"A yoke of {yoke:0.###} mm is too low for the points of the middle limb, which reach {limb / 2:0.###} mm into it. Take a yoke above half the limb width, or square joints."));
                return false;
            }
        }

        return resolver.Errors.Count == before;
    }
}
