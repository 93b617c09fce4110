using CoreDesign.Estimating.Contracts;
using CoreDesign.Sheets.Pdf;
using static CoreDesign.Sheets.Figures;

namespace CoreDesign.Sheets.Design;

/// <summary>The core design sheet of a stored revision.</summary>
public static class DesignSheet
{
    /// <summary>A tagged PDF; the same request gives the same bytes.</summary>
    public static byte[] Render(SheetRequest request)
    {
        ArgumentNullException.ThrowIfNull(request);
        var e = request.Study.Estimate;
        var first = new FirstPage(e, request.Paper);
        List<Block> blocks = [.. first.Blocks];
        blocks.Add(new Columns(
            [new Heading("Derived geometry"), GeometryTables.Derived(e)],
            [new Heading("Excitation"), GeometryTables.Excitation(e)]));
        blocks.Add(new Heading("Parts"));
        blocks.Add(GeometryTables.Parts(e));
        blocks.Add(new Columns(
            [new Heading("Steps of the limb section"), GeometryTables.Steps(e)],
            [new Heading("Where it comes from"), ResultTables.Shares(e), new Heading("Mass"), GeometryTables.Mass(e)]));
        blocks.AddRange(EvidenceBlocks.All(request.Study));
        blocks.AddRange(MarginBlocks.All(request.Study));
        blocks.Add(new Columns([
            (3, [new Heading("Harmonics of the line current"), ResultTables.Harmonics(e)]),
            (2, [new Heading("No-load current"), ResultTables.Currents(e), new Heading("Energy balance"), ResultTables.Energy(e)])]));
        if (WindingFigures.Of(e).Count > 0)
        {
            blocks.Add(new Heading("Windings"));
            blocks.Add(ResultTables.Windings(e));
        }

        blocks.Add(new Heading(e.Geometry.Units > 1 ? "Plates of one unit" : "Plates"));
        blocks.Add(GeometryTables.Plates(e));
        blocks.AddRange(RestBlocks.All(request));
        var scale = $"1:{Plain(first.FrontScale)} (section 1:{Plain(first.SectionScale)}), dimensions in mm";
        return new SheetDocument(Title(request, scale), request.Paper, blocks).Render();
    }

    private static TitleFields Title(SheetRequest request, string scale)
    {
        var e = request.Study.Estimate;
        var order = e.Inputs.Order;
        var supplement = new List<string>();
        if (order?.RatedPower_kVA is { } power)
        {
            supplement.Add(With(Plain(power), "kVA"));
        }

        if (order?.RatedVoltages_kV is { Count: > 0 } voltages)
        {
            supplement.Add(With(string.Join("/", voltages.Select(v => Plain(v))), "kV"));
        }

        if (order?.Frequency_Hz is { } frequency)
        {
            supplement.Add(With(Plain(frequency), "Hz"));
        }

        supplement.Add($"{Words.Core(e.Geometry)}, circle {With(Plain(e.Geometry.CircleDiameter_mm, 1), "mm")}");
        return new TitleFields
        {
            LegalOwner = request.LegalOwner,
            OwnerNote = request.InventedDemo ? "invented demo data" : "",
            Title = request.Title,
            SupplementaryTitle = string.Join(", ", supplement),
            IdentificationNumber = request.DocumentNumber,
            DocumentType = "Core design sheet",
            DocumentStatus = Words.State(request.State),
            RevisionIndex = Plain(request.Revision),
            Department = "Core design",
            CreatedBy = request.Author,
            IssuedAt = request.IssuedAt,
            Scale = scale,
            FiguresBy = $"CoreDesign, kernel {e.KernelVersion}",
        };
    }
}
