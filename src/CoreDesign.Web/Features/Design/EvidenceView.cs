using CoreDesign.Estimating.Contracts;
using CoreDesign.Sheets.Charts;
using Scenes = CoreDesign.Sheets.Charts.MarginCharts;

namespace CoreDesign.Web.Features.Design;

/// <summary>The charts of an answer at one width; made again only when one of them changed.</summary>
public sealed class EvidenceView
{
    private EstimateResult? madeOf;
    private IReadOnlyList<VoltagePointResult>? curveOf;
    private MarginsResult? marginsOf;
    private int madeFor;

    public int Width { get; private set; } = 304;

    /// <summary>Flux, current, loop, harmonics: they come with the estimate.</summary>
    public IReadOnlyList<Chart> Charts { get; private set; } = [];

    /// <summary>Loss and current against voltage, which comes later; the last one stays until then.</summary>
    public Chart? Voltage { get; private set; }

    /// <summary>Peak flux density, volts per hertz, inrush, direct current; they come last, and the last ones stay until then.</summary>
    public IReadOnlyList<Chart> MarginCharts { get; private set; } = [];

    public bool Fit(int width)
    {
        width = Math.Clamp(width, 220, 640);
        if (width == Width)
        {
            return false;
        }

        Width = width;
        return true;
    }

    public void Make(EstimateResult estimate, IReadOnlyList<VoltagePointResult>? curve, MarginsResult? margins)
    {
        var options = new ChartOptions { Width = Width, Height = Math.Round(Math.Clamp(Width * 0.62, 172, 260)) };
        if (!ReferenceEquals(madeOf, estimate) || madeFor != Width)
        {
            Charts =
            [
                EvidenceCharts.FluxOverPeriod(estimate, options),
                EvidenceCharts.CurrentOverPeriod(estimate, options),
                .. estimate.Limbs.Count > 0 ? [EvidenceCharts.Loop(estimate, EvidenceCharts.FirstWoundLimb(estimate), options)] : Array.Empty<Chart>(),
                HarmonicsChart.Of(estimate, options),
            ];
        }

        if (curve is { Count: > 1 } && (!ReferenceEquals(curveOf, curve) || madeFor != Width))
        {
            Voltage = VoltageChart.Of(new Study { Estimate = estimate, VoltageCurve = curve, Levers = [] }, options);
            curveOf = curve;
        }

        if (margins is not null && curve is { Count: > 1 } && (!ReferenceEquals(marginsOf, margins) || madeFor != Width))
        {
            MarginCharts =
            [
                Scenes.PeakFluxDensity(estimate, curve, margins, options),
                .. margins.FluxCurve.Count > 1 ? [VoltageChart.OfVoltsPerHertz(estimate, margins, options)] : Array.Empty<Chart>(),
                .. margins.Inrush.Peak_A is null ? Array.Empty<Chart>() : [Scenes.Inrush(margins.Inrush, options)],
                .. margins.DcBias is { Lines.Count: > 0 } bias ? [Scenes.DcBias(estimate, bias, options)] : Array.Empty<Chart>(),
            ];
            marginsOf = margins;
        }

        madeOf = estimate;
        madeFor = Width;
    }
}
