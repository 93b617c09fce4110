using CoreDesign.Estimating.Contracts;
using CoreDesign.Sheets.Scenes;

namespace CoreDesign.Sheets.Drawings;

/// <summary>Draws the front view after its plan, from the parts up to the notes; what is optional yields to what already stands.</summary>
internal sealed class FrontView
{
    private readonly EstimateResult _r;
    private readonly Reading _reading;
    private readonly DrawingOptions _o;
    private readonly FrontPlan _plan;
    private readonly JointLines _joints;
    private readonly DimensionPen _pen;
    private readonly IReadOnlyList<Zone> _zones;
    private readonly ReadingSpan _span;
    private readonly List<Mark> _marks = [];
    private readonly List<Box> _taken = [];
    private readonly List<Callout> _callouts = [];

    public FrontView(EstimateResult r, Reading reading, DrawingOptions o)
    {
        (_r, _reading, _o) = (r, reading, o);
        _zones = CoreZones.Of(r);
        _span = Readings.Span(r, reading);
        _pen = new DimensionPen(o);
        _plan = new FrontPlan(r, o, CalloutWidth());
        _joints = new JointLines(r, _plan.Scale);
    }

    public IReadOnlyList<Mark> Draw()
    {
        Parts();
        Outline();
        PhaseLetters();
        PartFigures();
        Dimensions();
        if (_plan.WithNotes)
        {
            var bottom = ScaleBar();
            Cut();
            DetailCircle();
            _marks.AddRange(Callouts.Place(_callouts, _plan.CalloutX, 4, bottom, _o, _taken));
        }

        return _marks;
    }

    private void Parts()
    {
        foreach (var zone in _zones)
        {
            Paint fill = Value(zone) is { } v ? Paint.OnRamp(_span.Place(v)) : Ink.Sunk;
            _marks.Add(Lines.Rectangle(_plan.Place(zone.Place_mm), fill, fill, 0.5) with { Label = Says(zone), Part = "pt" });
        }

        foreach (var zone in _zones.Where(z => z.Kind is ZoneKind.Corner or ZoneKind.TZone))
        {
            _marks.AddRange(_joints.Of(zone, _plan.Place(zone.Place_mm)));
        }
    }

    private void Outline()
    {
        var g = _r.Geometry;
        _marks.Add(Lines.Rectangle(_plan.Core, Paint.None, Ink.Ink, 1.4) with { Part = "ol" });
        for (var i = 0; i < _plan.Windows; i++)
        {
            var window = _plan.Place(new((i * g.LimbPitch_mm) + g.LimbWidth_mm, g.YokeHeight_mm, g.LimbPitch_mm - g.LimbWidth_mm, g.WindowHeight_mm));
            _marks.Add(Lines.Rectangle(window, Paint.None, Ink.Ink, 1.4) with { Part = "ol" });
        }
    }

    private void PhaseLetters()
    {
        var size = _o.DimensionSize;
        foreach (var limb in _zones.Where(z => z.Kind == ZoneKind.Limb))
        {
            var x = _plan.Place(limb.Place_mm).Centre.X;
            var text = new TextMark(new(x, _plan.Core.Y - 13), CoreZones.Mark(_r, limb.Limb), size, Anchor.Middle, Ink.Ink, Bold: true) { Part = "ph" };
            if (new Box(0, 0, _o.Width, _o.Height).Holds(TextExtent.Of(text)) && Take(TextExtent.Of(text).Grown(1)))
            {
                _marks.Add(Lines.Line(new(x, _plan.Core.Y - 10), new(x, _plan.Core.Y - 2.5), Ink.Ink3));
                _marks.Add(text);
            }
        }
    }

    private void PartFigures()
    {
        var homeless = new List<Zone>();
        foreach (var zone in _zones)
        {
            if (Value(zone) is not { } v)
            {
                continue;
            }

            var text = ZoneFigures.Fit(zone, _plan.Place(zone.Place_mm), Readings.Figure(v, _reading), Readings.Unit(_reading), _joints.Mitred, _joints.Band, _span.Place(v), _o);
            if (text is not null && Take(TextExtent.Of(text)))
            {
                _marks.Add(text);
            }
            else
            {
                homeless.Add(zone);
            }
        }

        // One of a kind is enough outside: the rightmost of the upper row.
        foreach (var zone in homeless.Where(z => z.Top || z.Kind == ZoneKind.Limb).GroupBy(z => z.Kind).Select(k => k.MaxBy(z => z.Place_mm.X)!))
        {
            var p = _plan.Place(zone.Place_mm);
            var at = zone.Kind == ZoneKind.Corner ? new XY(p.X + (p.Width * 0.7), p.Y + (p.Height * 0.7)) : p.Centre;
            _callouts.Add(new([KindName(zone.Kind), Says(zone)[(KindName(zone.Kind).Length + 1)..]], at, Dot: true));
        }
    }

    private void Dimensions()
    {
        if (!_plan.WithDimensions)
        {
            return;
        }

        var limbs = _zones.Where(z => z.Kind == ZoneKind.Limb).Select(z => _plan.Place(z.Place_mm)).ToArray();
        if (_plan.InsideHeight is { } height)
        {
            // Right of the middle, so that line and text together stand in the middle of the window.
            var x = ((limbs[0].Right + limbs[1].X) / 2) + (_o.DimensionSize * 0.4);
            Add(_pen.Vertical(height, limbs[0].Y, limbs[0].Bottom, x, null));
        }

        if (_plan.InsideWidth is { } width)
        {
            var y = limbs[0].Centre.Y + (_o.DimensionSize * 0.4);
            Add(_pen.Horizontal(width, limbs[^2].Right, limbs[^1].X, y, null));
            _taken.Add(new Box(limbs[^2].Right, y - 3, limbs[^1].X - limbs[^2].Right, 6));
        }

        for (var row = 0; row < _plan.Rows.Count; row++)
        {
            foreach (var d in _plan.Rows[row])
            {
                double x1 = _plan.X(d.From_mm), x2 = _plan.X(d.To_mm);
                var (inside, outside) = _plan.RowText(d, row);
                Add(_pen.Horizontal(d, x1, x2, _plan.RowY(row), _plan.Core.Bottom, outside + _plan.Core.X, inside + _plan.Core.X));
            }
        }

        for (var column = 0; column < _plan.Columns.Count; column++)
        {
            foreach (var d in _plan.Columns[column])
            {
                double y1 = _plan.Y(d.From_mm), y2 = _plan.Y(d.To_mm);
                Add(_pen.Vertical(d, y1, y2, _plan.ColumnX(column), _plan.Core.X, _pen.Fits(d, y2 - y1) ? null : _plan.Core.Y - DimensionPen.Tail));
            }
        }
    }

    /// <summary>Where the notes must end, above the bar.</summary>
    private double ScaleBar()
    {
        double x = _plan.CalloutX - 14, y = _plan.Core.Bottom - 8;
        if (FrontNotes.ScaleBar(x, y, _plan.Scale, _o) is not { } bar)
        {
            return _plan.Core.Bottom;
        }

        _marks.Add(bar);
        return y - _o.TextSize - 8;
    }

    private void Cut()
    {
        var limb = _plan.Place(_zones.Last(z => z.Kind == ZoneKind.Limb).Place_mm);
        double y = limb.Y + (0.76 * limb.Height), size = _o.DimensionSize, window = _r.Geometry.WindowWidth_mm * _plan.Scale;
        Box[] needs =
        [
            new Box(limb.X, y - 1, limb.Width, 2).Grown(2),
            new(limb.X - 26, y - size - 8, 24, size + 22),
            new(limb.Right + 2, y - size - 8, 24, size + 22),
        ];
        if (limb.Height * 0.24 >= 16 && limb.Width >= 16 && window >= 34 && needs.All(IsFree))
        {
            _taken.AddRange(needs);
            _marks.Add(FrontNotes.Cut(limb, y, size));
        }
    }

    private void DetailCircle()
    {
        var corner = _plan.Place(_zones.Last(z => z.Kind == ZoneKind.Corner && z.Top).Place_mm);
        var reach = Math.Min(corner.Width, corner.Height);
        var at = _joints.Mitred ? new XY(corner.X + (0.72 * reach), corner.Bottom - (0.72 * reach)) : new XY(corner.X + (0.82 * corner.Width), corner.Bottom);
        var radius = Math.Clamp(0.25 * reach, 5, 15);
        while (radius >= 4 && !IsFree(new Box(at.X - radius, at.Y - radius, 2 * radius, 2 * radius).Grown(2)))
        {
            radius -= 1;
        }

        if (radius < 4)
        {
            return;
        }

        _marks.Add(new CircleMark(at, radius, Paint.None, _o.Pressable ? Ink.Accent : Ink.Black, 1.25) { Part = "zc", Label = "Detail Z, the joint" });
        _callouts.Add(new(JointNote(), new XY(at.X + (radius * 0.95), at.Y - (radius * 0.3)), Dot: false));
    }

    private string[] JointNote() => _r.Joint.EffectiveGapUsed
        ? ["Z", "effective gap", Figures.With(Figures.Plain(_r.Inputs.Joint?.EffectiveGap_mm ?? double.NaN, 4), "mm")]
        : ["Z", "bridging sheets", Figures.With(Figures.Fixed(_r.Joint.BridgingFluxDensity_T, 2), "T") + " across"];

    private double CalloutWidth()
    {
        var widest = _zones.Where(z => Value(z) is not null).Select(z => new Callout([KindName(z.Kind), Says(z)[(KindName(z.Kind).Length + 1)..]], default, true).Width(_o));
        return widest.Append(new Callout(JointNote(), default, false).Width(_o)).Append(TextExtent.Width("5 000\u00A0mm", _o.TextSize) + 44).Max() + 2;
    }

    private void Add(GroupMark dimension)
    {
        _marks.Add(dimension);
        _taken.AddRange(TextExtent.Texts([dimension]).Select(t => TextExtent.Of(t).Grown(1)));
    }

    private bool IsFree(Box box) => !_taken.Exists(t => t.Overlaps(box));

    private bool Take(Box box)
    {
        if (!IsFree(box))
        {
            return false;
        }

        _taken.Add(box);
        return true;
    }

    private double? Value(Zone zone) => zone.Part is null ? null : Readings.Value(_r, zone.Part, _reading);

    private string Says(Zone zone) => Value(zone) is { } v ? $"{KindName(zone.Kind)} {Figures.With(Readings.Figure(v, _reading), Readings.Unit(_reading))}" : KindName(zone.Kind);

    internal static string KindName(ZoneKind kind) => kind switch { ZoneKind.Limb => "Limb", ZoneKind.Yoke => "Yoke", ZoneKind.Corner => "Corner", _ => "T zone" };
}
