using CoreDesign.Magnetics;
using static System.FormattableString;

namespace CoreDesign.Estimating.Steels.Checks;

/// <summary>What no sheet steel can do, whatever was measured: most findings here are slips of unit or swapped tables.</summary>
internal static class PhysicsRules
{
    /// <summary>Rounding allowed to a flux density given with two or three decimals.</summary>
    private const double Rounding_T = 0.005;

    /// <summary>Polarization B - mu0 H stays below saturation and never falls while the field rises.</summary>
    public static void Polarization(IReadOnlyList<DraftPoint> curve, double saturation_T, Findings findings)
    {
        var before = 0.0;
        foreach (var p in curve)
        {
            var j = p.B.Value - (MagneticConstants.Mu0_H_per_m * p.Y.Value);
            if (j > saturation_T)
            {
                findings.Error(p.B, Invariant(
                    $"is beyond saturation: less µ0·H it leaves a polarization of {j:0.###} T, above the saturation polarization {saturation_T} T. Is H in kA/m, or the saturation polarization of this steel higher?"));
            }
            else if (j < before - Rounding_T)
            {
                findings.Error(p.B, Invariant(
                    $"is too low for its field of {p.Y.Value} A/m: less µ0·H the polarization falls from {before:0.###} to {j:0.###} T. Is this column polarization? Flux density is polarization plus µ0·H."));
            }

            before = Math.Max(before, j);
        }
    }

    /// <summary>Loss above the classical eddy part pi² d² f² B² / (6 rho) per volume (thin sheet, sine; Bertotti, IEEE Trans. Magn. 24, 1988).</summary>
    public static void ClassicalEddy(
        IReadOnlyList<DraftPoint> curve, double frequency, double thickness_mm, double density, double resistivity, Findings findings)
    {
        foreach (var p in curve)
        {
            var classical = Math.Pow(Math.PI * thickness_mm / 1000 * frequency * p.B.Value, 2) / (6 * resistivity * density);
            if (p.Y.Value <= classical)
            {
                findings.Error(p.Y, Invariant(
                    $"is a loss below the classical eddy part of {classical:0.####} W/kg at {p.B.Value} T and {frequency} Hz in sheet of {thickness_mm} mm. Is it W/kg, and are frequency, thickness and resistivity right?"));
            }
        }
    }

    /// <summary>At equal flux density the loss rises with frequency, at least in proportion and at most with its square.</summary>
    public static void Frequencies(double lowHz, IReadOnlyList<DraftPoint> low, double highHz, IReadOnlyList<DraftPoint> high, Findings findings)
    {
        var least = highHz / lowHz;
        var warned = false;
        foreach (var p in high)
        {
            if (ValueAt(low, p.B.Value) is not { } other)
            {
                continue;
            }

            var ratio = p.Y.Value / other;
            if (ratio <= 1)
            {
                findings.Error(p.Y, Invariant(
                    $"is a loss at {highHz} Hz that is not above the one at {lowHz} Hz ({other:0.####} W/kg at {p.B.Value} T). Are the frequencies swapped?"));
            }
            else if (!warned && (ratio < least || ratio > least * least))
            {
                warned = true;
                findings.Warning(p.Y, Invariant(
                    $"is {ratio:0.###} times the loss at {lowHz} Hz ({p.B.Value} T); between hysteresis alone and eddy currents alone lie {least:0.###} and {least * least:0.###}. The split of the loss into its parts will be poor."));
            }
        }
    }

    /// <summary>
    /// The loop of a cycle lies within ±B and ±H, so its area, the loss per volume and cycle, is below 4 B H. A quasi-static peak curve
    /// may break this a little against a 50 Hz loss; by a factor of five only a wrong unit does.
    /// </summary>
    public static void LoopFits(
        IReadOnlyList<DraftPoint> magnetization, IReadOnlyList<DraftPoint> loss, double frequency, double density, Findings findings)
    {
        var warned = false;
        foreach (var p in magnetization)
        {
            if (ValueAt(loss, p.B.Value) is not { } w)
            {
                continue;
            }

            var least = w * density / frequency / (4 * p.B.Value);
            if (p.Y.Value < 0.2 * least)
            {
                findings.Error(p.Y, Invariant(
                    $"is far too low a peak field: the loss at {p.B.Value} T and {frequency} Hz alone needs {least:0.###} A/m. Is H in A/m, peak, and not in kA/m, A/cm or Oe?"));
            }
            else if (p.Y.Value < least && !warned)
            {
                warned = true;
                findings.Warning(p.Y, Invariant(
                    $"is below the {least:0.###} A/m that the loss at {p.B.Value} T and {frequency} Hz alone needs. Is it an rms value, or the curve a static one? The peak curve belongs to the frequency of the loss."));
            }
        }
    }

    /// <summary>Exciting power (volts times amperes) is never below the loss it contains.</summary>
    public static void ExcitingPower(IReadOnlyList<DraftPoint> power, IReadOnlyList<DraftPoint> loss, double frequency, Findings findings)
    {
        foreach (var p in power)
        {
            if (ValueAt(loss, p.B.Value) is { } w && p.Y.Value < w)
            {
                findings.Error(p.Y, Invariant(
                    $"is an exciting power below the loss of {w:0.####} W/kg at {p.B.Value} T and {frequency} Hz, which it contains. Are the two columns swapped?"));
            }
        }
    }

    /// <summary>Value between the points of a rising table, by power law; null outside it.</summary>
    private static double? ValueAt(IReadOnlyList<DraftPoint> curve, double b)
    {
        for (var i = 0; i < curve.Count; i++)
        {
            if (curve[i].B.Value == b)
            {
                return curve[i].Y.Value;
            }

            if (i > 0 && curve[i - 1].B.Value < b && b < curve[i].B.Value)
            {
                var s = Math.Log(b / curve[i - 1].B.Value) / Math.Log(curve[i].B.Value / curve[i - 1].B.Value);
                return Math.Exp(((1 - s) * Math.Log(curve[i - 1].Y.Value)) + (s * Math.Log(curve[i].Y.Value)));
            }
        }

        return null;
    }
}
