using CoreDesign.Sheets.Scenes;

namespace CoreDesign.Sheets.Charts;

/// <summary>How a line is told from its neighbours: ink, weight and dash, never ink alone.</summary>
internal sealed record LineLook(Ink Ink, double Width, IReadOnlyList<double>? Dash = null)
{
    public static readonly LineLook First = new(Ink.Ink, 1.5);
    public static readonly LineLook Second = new(Ink.Accent, 2);
    public static readonly LineLook Third = new(Ink.Ink3, 1.5, [5, 3]);
    public static readonly LineLook Fourth = new(Ink.Accent, 1.5, [2, 2.5]);

    public static readonly LineLook Fifth = new(Ink.Ink2, 1, [8, 2, 2, 2]);

    public static LineLook Of(int index) => (index % 5) switch { 0 => First, 1 => Second, 2 => Third, 3 => Fourth, _ => Fifth };
}

/// <summary>One line of a chart. Dots mark the points that were solved or given, where the line between them is drawn through.</summary>
internal sealed record LineSeries(string Name, string Unit, IReadOnlyList<double> X, IReadOnlyList<double> Y, LineLook Look)
{
    public string? Label { get; init; }

    public bool Right { get; init; }

    public IReadOnlyList<XY> Dots { get; init; } = [];
}

/// <summary>Builds a chart: frame and ticks, then bars and lines in data units, then labels where nothing else is.</summary>
internal sealed class ChartBuilder
{
    private const double TickLength = 4;
    private readonly ChartOptions _o;
    private readonly Axis _x;
    private readonly Axis _y;
    private readonly Axis? _right;
    private readonly List<Mark> _marks = [];
    private readonly List<LineSeries> _series = [];
    private readonly List<(LineSeries Series, IReadOnlyList<IReadOnlyList<XY>> Pieces)> _drawn = [];
    private readonly List<Box> _taken = [];

    public ChartBuilder(ChartOptions o, Axis x, Axis y, Axis? right, string caption, string xCaption)
    {
        (_o, _x, _y, _right) = (o.Checked(), x, y, right);
        double left = Math.Max(Widest(y) + 8, (Widest(x) / 2) + 1), end = right is null ? Math.Max(8, (Widest(x) / 2) + 1) : Widest(right) + 9;
        Plot = new Box(left, o.TextSize + 9, o.Width - left - end, o.Height - (3 * o.TextSize) - 19);
        Frame(caption, xCaption);
    }

    public Box Plot { get; }

    public double X(double value) => Plot.X + (_x.Place(value) * Plot.Width);

    public double Y(double value, bool right = false) => Plot.Bottom - (((right ? _right! : _y).Place(value)) * Plot.Height);

    public void Line(LineSeries series)
    {
        _series.Add(series);
        var points = Enumerable.Range(0, series.X.Count).Select(i => new XY(X(series.X[i]), Y(series.Y[i], series.Right))).ToList();
        var pieces = Polyline.Inside(points, Plot.Grown(0.75)).Select(p => Polyline.Thin(p)).ToList();
        _drawn.Add((series, pieces));
        foreach (var piece in pieces)
        {
            _marks.Add(new PathMark(piece, false, Paint.None, series.Look.Ink, series.Look.Width, series.Look.Dash) { Part = "ln" });
        }

        foreach (var dot in series.Dots.Select(d => new XY(X(d.X), Y(d.Y, series.Right))).Where(d => Plot.Grown(0.75).Holds(new(d.X, d.Y, 0, 0))))
        {
            _marks.Add(new CircleMark(dot, 1.8, series.Look.Ink, Paint.None));
        }
    }

    /// <summary>A bar from the axis to a value, in picture units across.</summary>
    public void Bar(double x, double width, double value, Paint fill, string label)
    {
        double top = Math.Clamp(Y(value), Plot.Y, Plot.Bottom), foot = Math.Clamp(Y(Math.Max(0, _y.Low)), Plot.Y, Plot.Bottom);
        _marks.Add(new PathMark(new Box(x, Math.Min(top, foot), width, Math.Max(Math.Abs(foot - top), 0.5)).Corners(), true, fill, Paint.None) { Label = label, Part = "ba" });
    }

    public void Text(TextMark text)
    {
        _taken.Add(TextExtent.Of(text));
        _marks.Add(text);
    }

    /// <summary>Names of all lines with a sample of each, in the upper left or the lower right of the plot, where rising curves leave room.</summary>
    public void Legend(bool upperLeft)
    {
        const double sample = 22;
        double row = _o.TextSize + 3, width = sample + 6 + _series.Select(s => TextExtent.Width(Shortened(s.Name), _o.TextSize)).DefaultIfEmpty(0).Max();
        double x = upperLeft ? Plot.X + 8 : Plot.Right - width - 4, y = upperLeft ? Plot.Y + 4 : Plot.Bottom - (row * _series.Count) - 4;
        _marks.Add(new PathMark(new Box(x - 3, y, width + 6, row * _series.Count).Corners(), true, Ink.Paper, Paint.None));
        foreach (var series in _series)
        {
            var line = y + (row / 2);
            _marks.Add(new PathMark([new(x, line), new(x + sample, line)], false, Paint.None, series.Look.Ink, series.Look.Width, series.Look.Dash));
            Text(new TextMark(new(x + sample + 6, line + (_o.TextSize * 0.36)), Shortened(series.Name), _o.TextSize, Anchor.Start, Ink.Ink));
            y += row;
        }
    }

    // A name may be as long as a person likes; half of the plot is enough for it here, the table has it whole.
    private string Shortened(string name)
    {
        var room = Plot.Width / 2;
        if (TextExtent.Width(name, _o.TextSize) <= room)
        {
            return name;
        }

        var end = name.Length;
        while (end > 1 && (TextExtent.Width(name[..end], _o.TextSize) + (0.8 * _o.TextSize) > room || char.IsHighSurrogate(name[end - 1])))
        {
            end--;
        }

        return name[..end] + "\u2026";
    }

    /// <summary>A dashed upright line at a value of the abscissa; nothing where that lies outside.</summary>
    public void Marker(double value, string label)
    {
        if (_x.Place(value) is >= -1e-9 and <= 1 + 1e-9)
        {
            _marks.Add(new PathMark([new(X(value), Plot.Y), new(X(value), Plot.Bottom)], false, Paint.None, Ink.Ink3, 0.75, [2, 2]) { Label = label, Part = "rd" });
        }
    }

    public Chart Build(string key, string title, string description, string xName, string xUnit, ChartTable table, bool byPoint = false)
    {
        foreach (var (series, pieces) in _drawn.Where(d => d.Series.Label is not null))
        {
            Label(series, [.. pieces.SelectMany(p => p)]);
        }

        var hover = new ChartHover(Plot, _x.Hover, xName, xUnit, byPoint, [.. _series.Select(Hover)]);
        return new Chart(key, new Scene(_o.Width, _o.Height, title, description, _marks), hover, table);
    }

    private HoverSeries Hover(LineSeries s)
    {
        // Some 250 points are one for each picture unit; five digits are more than a read-out prints.
        var stride = Math.Max(1, s.X.Count / 256);
        var picks = Enumerable.Range(0, s.X.Count).Where(i => i % stride == 0 || i == s.X.Count - 1).ToArray();
        return new(s.Name, s.Unit, (s.Right ? _right! : _y).Hover, [.. picks.Select(i => Short(s.X[i]))], [.. picks.Select(i => Short(s.Y[i]))]);
    }

    private static double Short(double value) => value == 0 || !double.IsFinite(value) ? 0 : double.Parse(value.ToString("G5", System.Globalization.CultureInfo.InvariantCulture), System.Globalization.CultureInfo.InvariantCulture);

    // Peak first, then trough, then along the line; the first place that touches no label and no line.
    private void Label(LineSeries series, List<XY> points)
    {
        if (points.Count == 0)
        {
            return;
        }

        // A name wider than a third of the plot would cover what it names.
        var label = series.Label!;
        while (label.Length > 1 && TextExtent.Width(label, _o.TextSize, true) > Plot.Width / 3)
        {
            label = label[..(label.Length / 2)];
        }

        double w = TextExtent.Width(label, _o.TextSize, true), up = 5, down = _o.TextSize + 3;
        var along = Enumerable.Range(1, 15).Select(i => points[i * (points.Count - 1) / 16]).ToArray();
        var places = new[] { (points.MinBy(p => p.Y), -up), (points.MaxBy(p => p.Y), down) }
            .Concat(along.Select(p => (p, -up))).Concat(along.Select(p => (p, down)))
            .Concat(along.Select(p => (p, -up - 6))).Concat(along.Select(p => (p, down + 6)));
        TextMark? fallback = null;
        foreach (var (p, dy) in places)
        {
            var x = Math.Clamp(p.X, Plot.X + (w / 2) + 3, Plot.Right - (w / 2) - 3);
            var text = new TextMark(new(x, p.Y + dy), label, _o.TextSize, Anchor.Middle, series.Look.Ink, Bold: true);
            var box = TextExtent.Of(text).Grown(1);
            if (_taken.Exists(t => t.Overlaps(box)) || box.Y < _o.TextSize + 1 || box.Bottom > Plot.Bottom)
            {
                continue;
            }

            fallback ??= text;
            if (!_drawn.Exists(d => d.Pieces.Any(piece => Enumerable.Range(1, piece.Count - 1).Any(i => box.Meets(piece[i - 1], piece[i])))))
            {
                Text(text);
                return;
            }
        }

        if (fallback is not null)
        {
            Text(fallback);
        }
    }

    private double Widest(Axis axis) => axis.Ticks.Select(t => TextExtent.Width(t.Label, _o.TextSize)).DefaultIfEmpty(0).Max();

    private void Frame(string caption, string xCaption)
    {
        foreach (var (value, label) in _y.Ticks)
        {
            var y = Y(value);
            _marks.Add(new PathMark([new(Plot.X, y), new(Plot.Right, y)], false, Paint.None, value == 0 ? Ink.Hair2 : Ink.Hair) { Part = "gr" });
            Text(new(new(Plot.X - 6, y + (_o.TextSize * 0.36)), label, _o.TextSize, Anchor.End, Ink.Ink2));
        }

        foreach (var (value, label) in _right?.Ticks ?? [])
        {
            Text(new(new(Plot.Right + 7, Y(value, true) + (_o.TextSize * 0.36)), label, _o.TextSize, Anchor.Start, Ink.Ink2));
        }

        if (_x.Log)
        {
            foreach (var (value, _) in _x.Ticks)
            {
                _marks.Add(new PathMark([new(X(value), Plot.Y), new(X(value), Plot.Bottom)], false, Paint.None, Ink.Hair) { Part = "gr" });
            }
        }

        _marks.Add(new PathMark([new(Plot.X, Plot.Bottom), new(Plot.Right, Plot.Bottom)], false, Paint.None, Ink.Edge));
        var end = double.NegativeInfinity;
        foreach (var (value, label) in _x.Ticks)
        {
            var x = X(value);
            _marks.Add(new PathMark([new(x, Plot.Bottom), new(x, Plot.Bottom + TickLength)], false, Paint.None, Ink.Edge));
            var text = new TextMark(new(x, Plot.Bottom + TickLength + _o.TextSize + 1), label, _o.TextSize, Anchor.Middle, Ink.Ink2);
            if (TextExtent.Of(text).X > end + 5)
            {
                Text(text);
                end = TextExtent.Of(text).Right;
            }
        }

        Text(new(new(0, _o.TextSize - 1), caption, _o.TextSize, Anchor.Start, Ink.Ink3));
        Text(new(new(Plot.Right, Plot.Bottom + TickLength + (2 * _o.TextSize) + 3), xCaption, _o.TextSize, Anchor.End, Ink.Ink3));
    }
}
