namespace CoreDesign.Estimating.Steels;

/// <summary>A figure with where it comes from and how sure it is (one of <see cref="FigureStanding"/>).</summary>
public sealed record SourcedFigure(double Value, string Source, string Standing);

/// <summary>How sure a figure is, in the words that screens and sheets print.</summary>
public static class FigureStanding
{
    public const string Read = "read";
    public const string FromMemory = "from memory";
    public const string FromMemoryDoubtful = "from memory, doubtful";
    public const string Derived = "derived";
    public const string Works = "works";
}

/// <summary>How sure the curves of a grade are.</summary>
public static class SteelStanding
{
    public const string Representative = "representative";
    public const string Certificate = "certificate";

    /// <summary>Came with a request.</summary>
    public const string Given = "given";

    public const string RepresentativeText =
        "Representative curve, shaped to pass the guaranteed points; replace by your certificate before you quote.";

    public const string GivenText = "Steel data given with the request; the tool holds no certificate for it.";
}
