using CoreDesign.Estimating.Demo;
using CoreDesign.Estimating.Estimate;
using CoreDesign.Estimating.Steels;
using CoreDesign.Sheets.Charts;
using CoreDesign.Sheets.Drawings;
using CoreDesign.Sheets.Scenes;
using CoreDesign.Sheets.Svg;

namespace CoreDesign.Sheets.Tests.Drawings;

/// <summary>The demo orders as the estimator solves them: its part names, its waveforms, its derived fields.</summary>
public class RealEstimateTests
{
    [Fact]
    public void Drawings_demoOrders_findEveryPart()
    {
        foreach (var order in DemoOrders.All)
        {
            var r = EstimateDesign.Run(order.Design, new SteelCatalog([])).Value;
            Assert.NotNull(r);
            foreach (var reading in Enum.GetValues<Reading>())
            {
                var scene = CoreDrawing.Front(r, reading, new DrawingOptions { Width = 640, Height = 490 });
                Layout.HoldsApart(scene, $"{order.Key}, {reading}");

                // A part without a result would be filled with the plain ground.
                Assert.DoesNotContain(scene.Marks.OfType<PathMark>().Where(p => p.Part == "pt"), p => p.Fill.Ramp is null);
                Layout.HoldsApart(CoreDrawing.ReadingScale(r, reading), $"{order.Key}, scale of {reading}");
            }

            Layout.HoldsApart(CoreDrawing.Section(r, Reading.FluxDensity, new DrawingOptions { Width = 290, Height = 130 }), order.Key);
            Layout.HoldsApart(CoreDrawing.JointDetail(r, new DrawingOptions { Width = 316, Height = 130 }), order.Key);
            foreach (var chart in new[] { EvidenceCharts.FluxOverPeriod(r, new()), EvidenceCharts.CurrentOverPeriod(r, new()), EvidenceCharts.Loop(r, 0, new()), HarmonicsChart.Of(r, new()), SharesChart.Of(r, new()) })
            {
                Assert.StartsWith("<svg", SvgWriter.Write(chart.Scene, new SvgOptions()), StringComparison.Ordinal);
            }
        }
    }
}
