using System.Globalization;
using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Fields;
using CoreDesign.Estimating.Steels;
using CoreDesign.Magnetics.Geometry;
using CoreDesign.Magnetics.Joints;

namespace CoreDesign.Estimating.Estimate;

/// <summary>Reads limb section, yoke and window of a design and builds the core.</summary>
internal sealed class CoreReader(DesignResolver resolver)
{
    private const double LowFill = 0.6;

    public (CoreGeometry? Geometry, CoreInput Filled) Read(CoreInput core, CoreForm? form, SteelGrade? steel, JointKind joint)
    {
        var stacking = StackingFactor(core, steel);
        var height = resolver.Needed("core.windowHeight_mm", core.WindowHeight_mm);
        var section = Section(core);
        var window = WindowWidth(core, section);
        var steps = section is null ? null : WithYokes(core.Yoke, section);
        var filled = core with { StackingFactor = stacking, Yoke = core.Yoke ?? new YokeInput { AreaFactor = DesignDefaults.YokeAreaFactor } };
        if (section is null || steps is null || form is null || double.IsNaN(stacking + height + window))
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

        filled = filled with { WindowWidth_mm = window, LimbPitch_mm = window + (section.Steps[0].Width_m * 1000) };
        try
        {
            var geometry = CoreBuilder.Build(form.Value, steps, stacking, height / 1000, window / 1000, joint);
            if (section.FillRatio < LowFill)
            {
                resolver.Warn("core.fill", string.Create(CultureInfo.InvariantCulture, $"The steps fill only {100 * section.FillRatio:0.0} % of their circle."));
            }

            return (geometry, filled);
        }
        catch (GeometryException e)
        {
            resolver.Say(PathOf(e.PropertyName, core), Words(e));
            return (null, filled);
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

    private StepSet? Section(CoreInput core)
    {
        try
        {
            if (core.LimbSteps is { Count: > 0 } typed)
            {
                if (core.Limb is not null)
                {
                    resolver.Say("core.limb", "Give limbSteps or limb, not both.");
                    return null;
                }

                return Typed(typed);
            }

            if (core.Limb is not { } limb)
            {
                resolver.Say("core.limb", "The limb section is missing. Give limb with diameter_mm and steps or stockWidths_mm, or limbSteps.");
                return null;
            }

            return FromCircle(limb);
        }
        catch (GeometryException e)
        {
            resolver.Say(PathOf(e.PropertyName, core), Words(e));
            return null;
        }
    }

    private StepSet? Typed(IReadOnlyList<StepInput> typed)
    {
        if (typed.Count > StepSet.MostSteps)
        {
            resolver.Say("core.limbSteps", $"{typed.Count} steps are given; at most {StepSet.MostSteps}. Give one line for each plate width.");
            return null;
        }

        var steps = new List<LimbStep>();
        for (var i = 0; i < typed.Count; i++)
        {
            var path = string.Create(CultureInfo.InvariantCulture, $"core.limbSteps[{i}]");
            steps.Add(new LimbStep(
                resolver.Needed(path + ".width_mm", typed[i].Width_mm) / 1000,
                resolver.Needed(path + ".stack_mm", typed[i].Stack_mm) / 1000));
        }

        var before = resolver.Errors.Count;
        for (var i = 1; i < typed.Count; i++)
        {
            if (typed[i].Width_mm >= typed[i - 1].Width_mm)
            {
                resolver.Say(
                    string.Create(CultureInfo.InvariantCulture, $"core.limbSteps[{i}].width_mm"),
                    string.Create(CultureInfo.InvariantCulture, $"Step width {typed[i].Width_mm} mm is not below {typed[i - 1].Width_mm} mm, the step before. Order the steps from the widest outward; join steps of one width."));
            }
        }

        return resolver.Errors.Count > before || steps.Exists(s => double.IsNaN(s.Width_m + s.Stack_m)) ? null : StepSet.FromSteps(steps);
    }

    private StepSet? FromCircle(LimbInput limb)
    {
        var diameter = resolver.Needed("core.limb.diameter_mm", limb.Diameter_mm);
        if (limb.StockWidths_mm?.Count > StepOptimizer.MostStockWidths)
        {
            resolver.Say("core.limb.stockWidths_mm", $"{limb.StockWidths_mm.Count} widths are given; at most {StepOptimizer.MostStockWidths}. Give the widths that the works slits.");
            return null;
        }

        if (limb.StockWidths_mm is { Count: > 0 } stock)
        {
            var before = resolver.Errors.Count;
            for (var i = 0; i < stock.Count; i++)
            {
                resolver.Needed(string.Create(CultureInfo.InvariantCulture, $"core.limb.stockWidths_mm[{i}]"), stock[i]);
            }

            if (limb.Steps is { } most)
            {
                resolver.Needed("core.limb.steps", most);
            }

            if (resolver.Errors.Count > before || double.IsNaN(diameter))
            {
                return null;
            }

            var fitting = StepOptimizer.Within(diameter / 1000, [.. stock.Select(w => w / 1000)]);
            if (fitting.Count == 0)
            {
                resolver.Say("core.limb.stockWidths_mm", string.Create(CultureInfo.InvariantCulture, $"No stock width is narrower than the circle of {diameter} mm. Add narrower widths, or take a larger circle."));
                return null;
            }

            return StepOptimizer.BestFromStock(diameter / 1000, fitting, limb.Steps);
        }

        var steps = resolver.Needed("core.limb.steps", limb.Steps);
        return double.IsNaN(diameter + steps) ? null : StepOptimizer.Best(diameter / 1000, (int)steps);
    }

    private double WindowWidth(CoreInput core, StepSet? section)
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
        if (section is null || double.IsNaN(pitch))
        {
            return double.NaN;
        }

        var left = pitch - (section.Steps[0].Width_m * 1000);
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

    private IReadOnlyList<CoreStep>? WithYokes(YokeInput? yoke, StepSet section)
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

        var factor = resolver.Optional("core.yoke.areaFactor", yoke?.AreaFactor, DesignDefaults.YokeAreaFactor);
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

    /// <summary>The kernel speaks of its own arguments in metres; here they get the field's path.</summary>
    private static string PathOf(string property, CoreInput core)
    {
        var index = property.IndexOf('[', StringComparison.Ordinal) is var at && at >= 0 ? property[at..(property.IndexOf(']', at) + 1)] : "";
        return property switch
        {
            _ when property.Contains("yoke", StringComparison.OrdinalIgnoreCase) => core.Yoke?.StepWidths_mm is null ? "core.yoke.areaFactor" : "core.yoke.stepWidths_mm" + index,
            _ when property.StartsWith("stockWidths", StringComparison.Ordinal) => "core.limb.stockWidths_mm" + index,
            _ when property.StartsWith("diameter", StringComparison.Ordinal) => "core.limb.diameter_mm",
            _ when property.StartsWith("windowHeight", StringComparison.Ordinal) => "core.windowHeight_mm",
            _ when property.StartsWith("windowWidth", StringComparison.Ordinal) => "core.windowWidth_mm",
            _ when property.StartsWith("stackingFactor", StringComparison.Ordinal) => "core.stackingFactor",
            _ when property.StartsWith("steps", StringComparison.Ordinal) && core.LimbSteps is not null =>
                "core.limbSteps" + index + (property.Contains("stack", StringComparison.OrdinalIgnoreCase) ? ".stack_mm" : index.Length > 0 ? ".width_mm" : ""),
            _ => core.LimbSteps is null ? "core.limb" : "core.limbSteps",
        };
    }

    /// <summary>Last resort, for what the checks above let through: the kernel's message, which counts in metres.</summary>
    private static string Words(GeometryException e) => "Lengths here in metres: " + e.Message;
}
