using BenchmarkDotNet.Attributes;
using CoreDesign.Estimating.Demo;
using CoreDesign.Estimating.Estimate;
using CoreDesign.Estimating.Steels;
using CoreDesign.Sheets.Design;
using CoreDesign.Sheets.Pdf;

namespace CoreDesign.Benchmarks;

/// <summary>The design sheet of a kept revision.</summary>
[MemoryDiagnoser]
public class SheetBenchmarks
{
    private SheetRequest request = default!;

    [GlobalSetup]
    public void KeepStudy()
    {
        var order = DemoOrders.All[^1];
        request = new()
        {
            Study = StudyDesign.Run(order.Design, SteelLibrary.Catalog).Value ?? throw new InvalidOperationException($"{order.Key} has no study."),
            DocumentNumber = "CD-00001",
            Title = order.Title,
            Revision = 1,
            IssuedAt = new DateTimeOffset(2026, 12, 1, 0, 0, 0, TimeSpan.Zero),
            State = "draft",
            Author = "this desk",
            LegalOwner = "Halden Ridge",
            Paper = PaperSize.A4,
            InventedDemo = true,
            Note = "",
        };
    }

    [Benchmark]
    public byte[] DesignSheetA4() => DesignSheet.Render(request);
}
