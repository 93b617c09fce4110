using CoreDesign.Estimating.Contracts;
using CoreDesign.Magnetics.Geometry;

namespace CoreDesign.Estimating.Estimate;

/// <summary>Where in a design an argument of the kernel comes from.</summary>
internal static class KernelPaths
{
    /// <summary>The kernel speaks of its own arguments in metres; here they get the field's path.</summary>
    public static string Of(string property, CoreInput core)
    {
        var index = property.IndexOf('[', StringComparison.Ordinal) is var at && at >= 0 ? property[at..(property.IndexOf(']', at) + 1)] : "";
        return property switch
        {
            _ when property.Contains("yoke", StringComparison.OrdinalIgnoreCase) => core.Yoke?.StepWidths_mm is null ? "core.yoke.areaFactor" : "core.yoke.stepWidths_mm" + index,
            _ when property.StartsWith("stockWidths", StringComparison.Ordinal) => "core.limb.stockWidths_mm" + index,
            _ when property.StartsWith("diameter", StringComparison.Ordinal) => "core.limb.diameter_mm",
            _ when property.StartsWith("windowHeight", StringComparison.Ordinal) => "core.windowHeight_mm",
            _ when property.StartsWith("returnWindow", StringComparison.Ordinal) => "core.returnWindowWidth_mm",
            _ when property.StartsWith("windowWidth", StringComparison.Ordinal) => "core.windowWidth_mm",
            _ when property.StartsWith("stackingFactor", StringComparison.Ordinal) => "core.stackingFactor",
            _ when property.StartsWith("steps", StringComparison.Ordinal) && core.LimbSteps is not null =>
                "core.limbSteps" + index + (property.Contains("stack", StringComparison.OrdinalIgnoreCase) ? ".stack_mm" : index.Length > 0 ? ".width_mm" : ""),
            _ => core.LimbSteps is null ? "core.limb" : "core.limbSteps",
        };
    }

    /// <summary>Last resort, for what the checks above let through: the kernel's message, which counts in metres.</summary>
    public static string Words(GeometryException e) => "Lengths here in metres: " + e.Message;
}
