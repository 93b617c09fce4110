using CoreDesign.Estimating.Contracts;

namespace CoreDesign.Web.Features.Design;

/// <summary>What the page asks for: the design, and the two values that are turned into design values before it is solved.</summary>
public sealed record DesignRequest(DesignInput Design, double? YokeHeight_mm, double? WantedFluxDensity_T)
{
    public static DesignRequest From(FormReading reading) =>
        new(reading.Design, Number(reading.Standing[FormPaths.YokeHeight]), Number(reading.Standing[FormPaths.WantedFluxDensity]));

    private static double? Number(string text) => NumberText.TryRead(text, out var value, out _) ? value : null;
}

/// <summary>An edit that is being answered.</summary>
public sealed record Solving(long Serial, DesignText Texts, DesignRequest Request);
