using CoreDesign.Estimating.Contracts;
using CoreDesign.Sheets.Scenes;

namespace CoreDesign.Sheets.Drawings;

/// <summary>Draws the front view after its plan, from the parts up to the notes; what is optional yields to what already stands.</summary>
internal sealed class FrontView
{
    // Along the joint line of a corner from the window outward; the first is the rule, the others where a figure stands in its way.
    private static readonly double[] DetailPlaces = [0.72, 0.5, 0.35, 0.85];

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
            _marks.AddRange(Callouts.Place(_callouts, _plan.CalloutX, 4 + Units(), bottom, _o, _taken));
        }

        return _marks;
    }

    /// <summary>Says of a bank that there are more of what is drawn; gives the height that it takes from the notes.</summary>
    private double Units()
    {
        if (_r.Geometry.Units == 1)
        {
            return 0;
        }

        _marks.Add(new TextMark(new(_plan.CalloutX, 4 + (_o.TextSize * 0.85)), UnitsNote(), _o.TextSize, Anchor.Start, Ink.Ink, Bold: true) { Part = "un" });
        return _o.TextSize + 7;
    }

    private string UnitsNote() => $"{Figures.Plain(_r.Geometry.Units)} units";

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
        foreach (var window in _plan.Row.Windows)
        {
            _marks.Add(Lines.Rectangle(_plan.Place(new(window.X_mm, g.YokeHeight_mm, window.Width_mm, g.WindowHeight_mm)), Paint.None, Ink.Ink, 1.4) with { Part = "ol" });
        }
    }

    private void PhaseLetters()
    {
        var size = _o.DimensionSize;
        foreach (var limb in _zones.Where(z => z.Kind == ZoneKind.Limb))
        {
            var x = _plan.Place(limb.Place_mm).Centre.X;
            var text = new TextMark(new(x, _plan.Core.Y - 13), _plan.Row.Limbs[limb.Limb].Letter, size, Anchor.Middle, Ink.Ink, Bold: true) { Part = "ph" };
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
        foreach (var zone in homeless.Where(z => z.Top || z.Kind == ZoneKind.Limb).GroupBy(z => z.Name, StringComparer.Ordinal).Select(k => k.MaxBy(z => z.Place_mm.X)!))
        {
            var p = _plan.Place(zone.Place_mm);
            var at = zone.Kind == ZoneKind.Corner ? new XY(p.X + (p.Width * 0.7), p.Y + (p.Height * 0.7)) : p.Centre;
            _callouts.Add(new([zone.Name, Says(zone)[(zone.Name.Length + 1)..]], at, Dot: true));
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
            _taken.Add(new Box(x - 3, limbs[0].Y, 6, limbs[0].Height));
        }

        foreach (var (window, width) in _plan.InsideWidths)
        {
            var y = limbs[0].Centre.Y + (_o.DimensionSize * 0.4);
            var (left, right) = (limbs[window].Right, limbs[window + 1].X);
            Add(_pen.Horizontal(width, left, right, y, null));
            _taken.Add(new Box(left, y - 3, right - left, 6));
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
        var row = _plan.Row;
        var at = row.Roomiest;
        var limb = _plan.Place(_zones.Single(z => z.Kind == ZoneKind.Limb && z.Limb == at).Place_mm);
        double y = limb.Y + (0.76 * limb.Height), size = _o.DimensionSize, reach = 15 + (0.75 * size);
        var window = _plan.Scale * row.RoomBeside_mm(at);
        Box[] needs =
        [
            new Box(limb.X, y - 1, limb.Width, 2).Grown(2),
            new(limb.X - reach - 2, y - size - 8, reach, size + 22),
            new(limb.Right + 2, y - size - 8, reach, size + 22),
        ];
        if (limb.Height * 0.24 >= 16 && limb.Width >= 16 && window >= reach + 5 && needs.All(IsFree))
        {
            _taken.AddRange(needs);
            _marks.Add(FrontNotes.Cut(limb, y, size));
        }
    }

    private void DetailCircle()
    {
        var corner = _plan.Place(_zones.Last(z => z.Kind == ZoneKind.Corner && z.Top).Place_mm);
        var reach = Math.Min(corner.Width, corner.Height);

        var places = DetailPlaces.Select(t => _joints.Mitred
            ? new XY(corner.X + (t * reach), corner.Bottom - (t * reach))
            : new XY(corner.X + ((t + 0.1) * corner.Width), corner.Bottom));
        if (places.Select(at => (At: at, Radius: FreeRadius(at, Math.Clamp(0.25 * reach, 5, 15)))).FirstOrDefault(c => c.Radius >= 4) is not { Radius: > 0 } circle)
        {
            return;
        }

        var (at, radius) = circle;
        _marks.Add(new CircleMark(at, radius, Paint.None, _o.Pressable ? Ink.Accent : Ink.Black, 1.25) { Part = "zc", Label = "Detail Z, the joint" });
        _callouts.Add(new(JointNote(), new XY(at.X + (radius * 0.95), at.Y - (radius * 0.3)), Dot: false));
    }

    private double FreeRadius(XY at, double radius)
    {
        while (radius >= 4 && !IsFree(new Box(at.X - radius, at.Y - radius, 2 * radius, 2 * radius).Grown(2)))
        {
            radius -= 1;
        }

        return radius;
    }

    private string[] JointNote() => _r.Joint.EffectiveGapUsed
        ? ["Z", "effective gap", Figures.With(Figures.Plain(_r.Inputs.Joint?.EffectiveGap_mm ?? double.NaN, 4), "mm")]
        : ["Z", "bridging sheets", Figures.With(Figures.Fixed(_r.Joint.BridgingFluxDensity_T, 2), "T") + " across"];

    private double CalloutWidth()
    {
        var widest = _zones.Where(z => Value(z) is not null).Select(z => new Callout([z.Name, Says(z)[(z.Name.Length + 1)..]], default, true).Width(_o));
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

    private string Says(Zone zone) => Value(zone) is { } v ? $"{zone.Name} {Figures.With(Readings.Figure(v, _reading), Readings.Unit(_reading))}" : zone.Name;
}
