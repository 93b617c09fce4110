namespace CoreDesign.Estimating.Steels;

/// <summary>Losses of a grade table in W/kg; null where the table guarantees none.</summary>
internal sealed record LossTable(SourcedFigure? At15T50, SourcedFigure? At17T50, SourcedFigure? At15T60, SourcedFigure? At17T60)
{
    /// <summary>
    /// The same table with its holes filled by derived figures: first the other flux density at the same frequency by the ratio
    /// given, then the other frequency at the same flux density.
    /// </summary>
    public LossTable Completed(double ratio15To17)
    {
        var withFluxDensities = new LossTable(
            At15T50 ?? FromOther(At17T50, ratio15To17, "1.7 T"),
            At17T50 ?? FromOther(At15T50, 1 / ratio15To17, "1.5 T"),
            At15T60 ?? FromOther(At17T60, ratio15To17, "1.7 T"),
            At17T60 ?? FromOther(At15T60, 1 / ratio15To17, "1.5 T"));
        const double R = LibraryRows.LossRatio60To50;
        return new LossTable(
            withFluxDensities.At15T50 ?? FromOther(withFluxDensities.At15T60, 1 / R, "60 Hz"),
            withFluxDensities.At17T50 ?? FromOther(withFluxDensities.At17T60, 1 / R, "60 Hz"),
            withFluxDensities.At15T60 ?? FromOther(withFluxDensities.At15T50, R, "50 Hz"),
            withFluxDensities.At17T60 ?? FromOther(withFluxDensities.At17T50, R, "50 Hz"));
    }

    private static SourcedFigure? FromOther(SourcedFigure? other, double factor, string where) => other is null
        ? null
        : new SourcedFigure(other.Value * factor, FormattableString.Invariant($"{factor:0.###} times the loss at {where}"), FigureStanding.Derived);
}
