using CoreDesign.Estimating.Contracts;

namespace CoreDesign.Sheets.Drawings;

/// <summary>Which fields a person typed and which the estimate derived.</summary>
internal static class FieldState
{
    public static bool Typed(EstimateResult r, string path, bool given) =>
        given && !r.Derived.Any(d => string.Equals(d, path, StringComparison.OrdinalIgnoreCase)
            || path.StartsWith(d + ".", StringComparison.OrdinalIgnoreCase)
            || d.StartsWith(path + "[", StringComparison.OrdinalIgnoreCase));
}
