using CoreDesign.Magnetics.Materials;

namespace CoreDesign.Estimating.Steels;

/// <summary>Turns the embedded grade tables into grades with representative curves.</summary>
internal static class LibraryRows
{
    /// <summary>Loss at 60 Hz over loss at 50 Hz at the same flux density; from memory, 1.31 to 1.33 in the grade tables.</summary>
    internal const double LossRatio60To50 = 1.315;

    /// <summary>Loss at 1.5 T over loss at 1.7 T: from memory for high permeability, mean of the tables' rows for conventional.</summary>
    internal const double LossRatio15To17HighPermeability = 0.72;
    internal const double LossRatio15To17Conventional = 0.645;

    private const double KilogramsPerPound = 0.45359237;
    private const string HandbookSource = "usual handbook figure for about 3 % silicon iron";

    public static IEnumerable<SteelGrade> All() =>
        DataTable.Read("grades_EN10107_IEC60404-8-7.csv").Select(FromEuropeanRow)
            .Concat(DataTable.Read("grades_AISI_ASTM_A876.csv").Select(FromAmericanRow));

    private static SteelGrade FromEuropeanRow(DataRow row)
    {
        SourcedFigure Figure(double value) => new(value, row.Text("source"), row.Text("standing"));
        SourcedFigure? FigureOrNull(string column) => row.NumberOrNull(column) is { } v ? Figure(v) : null;
        return Build(
            new Row
            {
                Name = row.Text("grade"),
                Class = row.Text("class"),
                Generation = row.Text("generation"),
                Note = row.Text("note"),
                Thickness_mm = Figure(row.Number("thickness_mm")),
                Density_kg_per_m3 = Figure(row.Number("density_kg_per_m3")),
                StackingFactor = Figure(row.Number("stackingFactor")),
                Polarization800_T = Figure(row.Number("polarization_800A_per_m_T")),
            },
            new LossTable(
                FigureOrNull("loss_1.5T_50Hz_W_per_kg"),
                FigureOrNull("loss_1.7T_50Hz_W_per_kg"),
                FigureOrNull("loss_1.5T_60Hz_W_per_kg"),
                FigureOrNull("loss_1.7T_60Hz_W_per_kg")));
    }

    private static SteelGrade FromAmericanRow(DataRow row)
    {
        var source = row.Text("source");
        var thickness = row.Number("thickness_mm");
        SourcedFigure? Loss(string column) => row.NumberOrNull(column) is { } v
            ? new SourcedFigure(v / KilogramsPerPound, $"{source}; {row.Text(column)} W/lb", row.Text("standing"))
            : null;
        return Build(
            new Row
            {
                Name = row.Text("grade"),
                Class = "conventional",
                Generation = "AISI",
                Note = $"ASTM A876 designation {row.Text("designation")}; guaranteed at 60 Hz only.",
                Thickness_mm = new SourcedFigure(thickness, source, row.Text("standing")),
                Density_kg_per_m3 = new SourcedFigure(7650, "conventional density of grain-oriented sheet", FigureStanding.Read),
                StackingFactor = StackingFactor(thickness),
                Polarization800_T = new SourcedFigure(
                    1.78,
                    "not in this grade's table; taken as that of the conventional grades of EN 10107",
                    FigureStanding.FromMemoryDoubtful),
            },
            new LossTable(null, null, Loss("loss_1.5T_60Hz_W_per_lb"), Loss("loss_1.7T_60Hz_W_per_lb")));
    }

    private static SourcedFigure StackingFactor(double thickness_mm) => thickness_mm switch
    {
        0.18 => new(0.940, "carried on from 0.23 mm; no table has 0.18 mm", FigureStanding.FromMemoryDoubtful),
        0.23 => new(0.945, "IEC 60404-8-7, EN 10107, by thickness", FigureStanding.FromMemory),
        0.27 => new(0.950, "IEC 60404-8-7, EN 10107, by thickness", FigureStanding.FromMemory),
        0.30 => new(0.955, "IEC 60404-8-7, EN 10107, by thickness", FigureStanding.FromMemory),
        0.35 => new(0.960, "IEC 60404-8-7, EN 10107, by thickness", FigureStanding.FromMemory),
        _ => throw new InvalidDataException($"The grade table has a thickness of {thickness_mm} mm, for which no stacking factor is known."),
    };

    private static SteelGrade Build(Row row, LossTable guaranteed)
    {
        var highPermeability = !string.Equals(row.Class, "conventional", StringComparison.Ordinal);
        var table = guaranteed.Completed(highPermeability ? LossRatio15To17HighPermeability : LossRatio15To17Conventional);
        var saturation = new SourcedFigure(2.03, "about 3 % silicon iron, 20 °C", FigureStanding.Read);
        LossCurve[] loss = [LossShape.Curve(50, table.At15T50!.Value, table.At17T50!.Value), LossShape.Curve(60, table.At15T60!.Value, table.At17T60!.Value)];
        return new SteelGrade
        {
            Name = row.Name,
            Class = row.Class,
            Generation = row.Generation,
            Note = row.Note,
            Thickness_mm = row.Thickness_mm,
            Density_kg_per_m3 = row.Density_kg_per_m3,
            MinimumStackingFactor = row.StackingFactor,
            Resistivity_ohm_m = new SourcedFigure(0.48e-6, HandbookSource, FigureStanding.FromMemory),
            SaturationPolarization_T = saturation,
            Polarization800_T = row.Polarization800_T,
            LossAnchors =
            [
                new(1.5, 50, table.At15T50, guaranteed.At15T50 is not null),
                new(1.7, 50, table.At17T50, guaranteed.At17T50 is not null),
                new(1.5, 60, table.At15T60, guaranteed.At15T60 is not null),
                new(1.7, 60, table.At17T60, guaranteed.At17T60 is not null),
            ],
            Rolling = new SteelCurves
            {
                Magnetization = RepresentativeCurves.PeakCurve(
                    row.Polarization800_T.Value, saturation.Value, row.Density_kg_per_m3.Value, table.At15T50.Value, table.At17T50.Value),
                Loss = loss,
                Source = "shaped through the guaranteed points of the grade",
                Standing = SteelStanding.Representative,
            },
            Transverse = new SteelCurves
            {
                Magnetization = RepresentativeCurves.TransversePeakCurve(saturation.Value),
                Loss = RepresentativeCurves.TransverseLoss(loss),
                Source = "three times the loss along rolling, and one peak curve for all grades, from memory",
                Standing = SteelStanding.Representative,
            },
            Standing = SteelStanding.Representative,
            StandingText = SteelStanding.RepresentativeText,
        };
    }

    private sealed record Row
    {
        public required string Name { get; init; }
        public required string Class { get; init; }
        public required string Generation { get; init; }
        public required string Note { get; init; }
        public required SourcedFigure Thickness_mm { get; init; }
        public required SourcedFigure Density_kg_per_m3 { get; init; }
        public required SourcedFigure StackingFactor { get; init; }
        public required SourcedFigure Polarization800_T { get; init; }
    }
}
