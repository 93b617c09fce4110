using CoreDesign.Estimating.Contracts;
using CoreDesign.Sheets.Scenes;

namespace CoreDesign.Sheets.Charts;

/// <summary>Where loss and current come from, as two divided bars; shares in the order of the result, the table beside names them.</summary>
public static class SharesChart
{
    private static readonly Ink[] Inks = [Ink.Share1, Ink.Share2, Ink.Share3, Ink.Share4, Ink.Share5];

    /// <summary>Ink of a share by its place, for the swatches of the table.</summary>
    public static Ink InkOf(int place) => Inks[Math.Min(place, Inks.Length - 1)];

    public static Chart Of(EstimateResult r, ChartOptions o)
    {
        ArgumentNullException.ThrowIfNull(r);
        ArgumentNullException.ThrowIfNull(o);
        var marks = new List<Mark>();
        double left = TextExtent.Width("current", o.TextSize) + 12, width = o.Width - left - 1, row = o.TextSize + 6;
        Bar("loss", 0, s => s.Loss_percent, s => $"{s.Label}: {Figures.With(Figures.Significant(s.Loss_W, 3), "W")}, {Figures.With(Figures.Fixed(s.Loss_percent, 0), "%")} of the loss");
        Bar("current", row, s => s.Current_percent, s => $"{s.Label}: {Figures.With(Figures.Fixed(s.Current_percent, 0), "%")} of the current");
        var words = r.Shares.Select(s => $"{s.Label} {Figures.With(Figures.Fixed(s.Loss_percent, 0), "%")} of the loss and {Figures.With(Figures.Fixed(s.Current_percent, 0), "%")} of the current");
        var table = new ChartTable("shares.csv", [new("loss (W)", [.. r.Shares.Select(s => s.Loss_W)]), new("loss (%)", [.. r.Shares.Select(s => s.Loss_percent)]), new("current (%)", [.. r.Shares.Select(s => s.Current_percent)])]);
        var hover = new ChartHover(new Box(left, 0, width, 2 * row), new(0, 100, false), "share", "%", false, []);
        return new Chart("shares", new Scene(o.Width, (2 * row) + 1, "Where it comes from", string.Join("; ", words) + ".", marks), hover, table);

        void Bar(string name, double y, Func<ShareResult, double> share, Func<ShareResult, string> says)
        {
            marks.Add(new TextMark(new(0, y + o.TextSize), name, o.TextSize, Anchor.Start, Ink.Ink2));
            var total = r.Shares.Sum(s => Math.Max(share(s), 0));
            var x = left;
            for (var i = 0; i < r.Shares.Count; i++)
            {
                var w = total > 0 ? Math.Max(share(r.Shares[i]), 0) / total * width : 0;
                if (w > 0)
                {
                    // The gap between neighbours is taken from the share itself, so that the ends stay true.
                    var box = new Box(x, y + (o.TextSize * 0.85) - 6, Math.Max(w - 1, 0.75), 8);
                    marks.Add(new PathMark(box.Corners(), true, InkOf(i), i > 1 ? Ink.Share2 : InkOf(i), 0.75) { Label = says(r.Shares[i]) });
                }

                x += w;
            }
        }
    }
}
