using CoreDesign.Estimating.Contracts;
using CoreDesign.Sheets.Scenes;

namespace CoreDesign.Sheets.Drawings;

/// <summary>
/// The joint lines of corners and T zones. Mitred: 45° from the window corner outward, one thin line for each position of the book at
/// its true place, the middle one strong. Butt-lap: the joint of the upper sheet drawn, that of the sheet below it dashed.
/// </summary>
internal sealed class JointLines
{
    private static readonly double[] Hidden = [4, 2.5];
    private readonly double[] _offsets;

    public JointLines(EstimateResult r, double scale)
    {
        Mitred = r.Joint.Type != "buttLap";
        var shift = r.Inputs.Joint?.Overlap_mm ?? 0;
        var positions = Math.Clamp(r.Joint.Positions, 1, 40);

        // A shift normal to a 45 degree line is root two as long measured along either axis.
        _offsets = [.. Enumerable.Range(0, positions).Select(i => (i - ((positions - 1) / 2.0)) * shift * Math.Sqrt(2) * scale)];
    }

    public bool Mitred { get; }

    /// <summary>Half width of the band, measured along an axis.</summary>
    public double Band => Mitred ? _offsets[^1] + 1.5 : 0;

    public IEnumerable<Mark> Of(Zone zone, Box p)
    {
        var inner = zone.Top ? p.Bottom : p.Y;
        var up = zone.Top ? -1 : 1;
        if (!Mitred)
        {
            return Square(zone, p, inner);
        }

        var reach = p.Width + p.Height;
        var marks = new List<Mark>();
        foreach (var (offset, strong) in _offsets.Select(o => (o, false)).Append((0, true)))
        {
            if (zone.Kind == ZoneKind.Corner)
            {
                var innerX = zone.InnerRight ? p.Right : p.X;
                var away = zone.InnerRight ? -1 : 1;
                AddClipped(marks, p, new(innerX + offset - (away * reach), inner - (up * reach)), new(innerX + offset + (away * reach), inner + (up * reach)), strong);
            }
            else
            {
                var apex = new XY(p.Centre.X, inner + (up * p.Width / 2) + offset);
                AddClipped(marks, p, new(apex.X - reach, apex.Y - (up * reach)), apex, strong);
                AddClipped(marks, p, apex, new(apex.X + reach, apex.Y - (up * reach)), strong);
            }
        }

        return marks;
    }

    private static void AddClipped(List<Mark> marks, Box p, XY a, XY b, bool strong)
    {
        if (p.Clip(a, b) is { } line)
        {
            marks.Add(Lines.Line(line.From, line.To, Ink.Black, strong ? 1 : 0.4) with { Part = strong ? "jc" : "jp" });
        }
    }

    private static List<Mark> Square(Zone zone, Box p, double inner)
    {
        var marks = new List<Mark> { Lines.Line(new(p.X, inner), new(p.Right, inner), Ink.Black, 1) with { Part = "jc" } };
        if (zone.Kind == ZoneKind.TZone || zone.InnerRight)
        {
            marks.Add(Lines.Line(new(p.Right, p.Y), new(p.Right, p.Bottom), Ink.Black, 0.75, Hidden) with { Part = "jp" });
        }

        if (zone.Kind == ZoneKind.TZone || !zone.InnerRight)
        {
            marks.Add(Lines.Line(new(p.X, p.Y), new(p.X, p.Bottom), Ink.Black, 0.75, Hidden) with { Part = "jp" });
        }

        return marks;
    }
}
