using CoreDesign.Estimating.Contracts;
using CoreDesign.Sheets.Scenes;

namespace CoreDesign.Sheets.Drawings;

/// <summary>
/// Where everything of the front view stands: the scale, the core's place, and for each dimension the row under the core, the
/// column left of it, or its window. The margins depend on which texts fit at the scale and the scale on the margins, so they are found in turn.
/// </summary>
internal sealed class FrontPlan
{
    private const double FirstLine = 24;
    private readonly EstimateResult _r;
    private readonly DrawingOptions _o;
    private readonly DimensionPen _pen;
    private readonly double _callouts;

    /// <param name="callouts">Width of the notes at the right, 0 without any.</param>
    public FrontPlan(EstimateResult r, DrawingOptions o, double callouts)
    {
        (_r, _o, _callouts) = (r, o, callouts);
        _pen = new DimensionPen(o);
        WithDimensions = o.Dimensions && o.HasRoom;
        WithNotes = o.Notes && o.HasRoom;
        Row = CoreRow.Of(r);
        Find();
    }

    public bool WithDimensions { get; }

    public bool WithNotes { get; }

    public CoreRow Row { get; }

    public double Scale { get; private set; }

    public Box Core { get; private set; }

    public List<List<DimensionText>> Rows { get; private set; } = [];

    public List<List<DimensionText>> Columns { get; private set; } = [];

    public DimensionText? InsideHeight { get; private set; }

    /// <summary>Widths across their windows, by the window's number from the left.</summary>
    public List<(int Window, DimensionText Width)> InsideWidths { get; private set; } = [];

    public double CalloutX => Core.Right + 42;

    public double RowY(int row) => Core.Bottom + FirstRow + (row * _pen.Pitch);

    public double ColumnX(int column) => Core.X - FirstLine - (column * _pen.Pitch);

    // Tails of dimensions at the left may reach past the foot of the core; the first row keeps below them.
    private double FirstRow => Columns.Exists(c => c.Exists(d => !_pen.Fits(d, Span(d)))) ? FirstLine + 4 : FirstLine;

    public double X(double mm) => Core.X + (mm * Scale);

    public double Y(double mm) => Core.Y + (mm * Scale);

    public Box Place(Box mm) => new(X(mm.X), Y(mm.Y), mm.Width * Scale, mm.Height * Scale);

    private void Find()
    {
        var g = _r.Geometry;
        double left = 0, right = 0, top = 0, bottom = 0;
        for (var turn = 0; turn < 8; turn++)
        {
            Scale = _o.Scale ?? Math.Max(Math.Min((_o.Width - left - right) / g.OverallWidth_mm, (_o.Height - top - bottom) / g.OverallHeight_mm), 1e-9);
            Assign();
            var (l, ri, t, b) = Margins();
            if (l <= left && ri <= right && t <= top && b <= bottom)
            {
                break;
            }

            // Margins only grow, so this ends: a text that moved out stays out.
            (left, right, top, bottom) = (Math.Max(l, left), Math.Max(ri, right), Math.Max(t, top), Math.Max(b, bottom));
        }

        double w = g.OverallWidth_mm * Scale, h = g.OverallHeight_mm * Scale;
        if (_o.Scale is not null && (w > _o.Width - left - right + 0.01 || h > _o.Height - top - bottom + 0.01))
        {
            throw new ArgumentException($"At the scale {_o.Scale} the core needs {w + left + right:F0} by {h + top + bottom:F0}, but the drawing is {_o.Width:F0} by {_o.Height:F0}; take a smaller scale.");
        }

        Core = new Box(left + ((_o.Width - left - right - w) / 2), top + ((_o.Height - top - bottom - h) / 2), w, h);
    }

    private void Assign()
    {
        (Rows, Columns, InsideHeight, InsideWidths) = ([], [], null, []);
        if (!WithDimensions)
        {
            return;
        }

        var g = _r.Geometry;
        var core = _r.Inputs.Core;
        double h = g.YokeHeight_mm, wh = g.WindowHeight_mm, s = Scale;
        bool Typed(string path, bool given) => FieldState.Typed(_r, path, given);
        var limb = Row.Limbs[Row.FirstWound];
        var main = Row.Windows[Row.MainWindow];
        var (from, to) = (Row.Limbs[Row.MainWindow], Row.Limbs[Row.MainWindow + 1]);
        var stepsTyped = Typed("core.limbSteps", core?.LimbSteps is { Count: > 0 });
        var yokeTyped = Typed("core.yoke.stepWidths_mm", core?.Yoke?.StepWidths_mm is { Count: > 0 });
        var limbWidth = DimensionText.Of("Limb width", limb.Width_mm, limb.X_mm, limb.Right_mm, stepsTyped ? "core.limbSteps" : null, stepsTyped);
        var pitch = DimensionText.Of("Limb pitch", g.LimbPitch_mm, from.Axis_mm, to.Axis_mm, "core.limbPitch_mm", Typed("core.limbPitch_mm", core?.LimbPitch_mm is not null));
        var overallWidth = DimensionText.Of("Overall width", g.OverallWidth_mm, 0, g.OverallWidth_mm, null, false);
        var yokeHeight = DimensionText.Of("Yoke height", h, 0, h, yokeTyped ? "core.yoke.stepWidths_mm" : "core.yoke.areaFactor", yokeTyped);
        var windowHeight = DimensionText.Of("Window height", wh, h, h + wh, "core.windowHeight_mm", Typed("core.windowHeight_mm", core?.WindowHeight_mm is not null));
        var overallHeight = DimensionText.Of("Overall height", g.OverallHeight_mm, 0, g.OverallHeight_mm, null, false);

        // The return limb follows from a factor of the wound limb's width.
        var returnLimb = Row.Limbs[0] is { IsReturn: true } first ? DimensionText.Of("Return limb width", first.Width_mm, first.X_mm, first.Right_mm, "core.returnLimb.areaFactor", false) : null;
        List<(int Window, DimensionText Width)> widths = [(Row.MainWindow, DimensionText.Of("Window width", main.Width_mm, main.X_mm, main.Right_mm, "core.windowWidth_mm", Typed("core.windowWidth_mm", core?.WindowWidth_mm is not null)))];
        if (Row.Windows[^1] is { IsReturn: true } beside)
        {
            widths.Add((Row.Windows.Count - 1, DimensionText.Of("Return window width", beside.Width_mm, beside.X_mm, beside.Right_mm, "core.returnWindowWidth_mm", Typed("core.returnWindowWidth_mm", core?.ReturnWindowWidth_mm is not null))));
        }

        // Widths across their windows, height in another one, so that no dimension line crosses another.
        var high = wh * s >= 5 * _o.DimensionSize;
        InsideWidths = [.. widths.Where(d => high && _pen.Fits(d.Width, ((d.Width.To_mm - d.Width.From_mm) * s) - 8))];
        if (Row.Windows.Count > 1 && Row.Windows[0].Width_mm * s >= 3 * _o.DimensionSize && _pen.Fits(windowHeight, (wh * s) - 8))
        {
            InsideHeight = windowHeight;
        }

        // Of two limbs both centre lines carry the pitch; its extension lines must not run through the text of the limb's width.
        DimensionText[] window = [.. widths.Except(InsideWidths).Select(d => d.Width)];
        DimensionText[] row = Row.Windows.Count == 1 && _pen.Fits(limbWidth, limb.Width_mm * s)
            ? [pitch, limbWidth, .. window, overallWidth]
            : [.. returnLimb is null ? [] : new[] { returnLimb }, limbWidth, .. window, pitch, overallWidth];
        Stack(Rows, row, d => (d.To_mm - d.From_mm) * s);
        Part();
        Stack(Columns, [yokeHeight, .. InsideHeight is null ? new[] { windowHeight } : [], overallHeight], d => (d.To_mm - d.From_mm) * s);
    }

    // One row for a chain that doesn't overlap and whose texts fit; whatever must put its text outside has a row to itself.
    private void Stack(List<List<DimensionText>> rows, IEnumerable<DimensionText> all, Func<DimensionText, double> span)
    {
        foreach (var d in all)
        {
            var shares = rows.Count > 0 && _pen.Fits(d, span(d)) && rows[^1].TrueForAll(o => _pen.Fits(o, span(o)) && o.To_mm <= d.From_mm + 1e-9);
            if (shares)
            {
                rows[^1].Add(d);
            }
            else
            {
                rows.Add([d]);
            }
        }
    }

    // A text that extension lines further out drive from its span has a row to itself as well.
    private void Part()
    {
        for (var i = 0; i < Rows.Count; i++)
        {
            if (Rows[i].Count > 1 && Rows[i].Find(d => RowText(d, i).Outside is not null) is { } driven)
            {
                Rows[i].Remove(driven);
                Rows.Insert(i + 1, [driven]);
                i = -1;
            }
        }
    }

    /// <summary>
    /// Place of a row's text from the left edge of the core: its middle where it fits between the arrows, clear of the extension lines of
    /// the rows further out; else where it begins, close by; else beyond the core, where no extension line runs.
    /// </summary>
    public (double? Inside, double? Outside) RowText(DimensionText d, int row)
    {
        double x1 = d.From_mm * Scale, x2 = d.To_mm * Scale, width = _pen.Width(d), core = _r.Geometry.OverallWidth_mm * Scale;
        var lines = Rows.Skip(row + 1).SelectMany(r => r).SelectMany(o => new[] { o.From_mm * Scale, o.To_mm * Scale }).Order().ToArray();
        bool Clear(double from) => lines.All(x => x < from - 2.5 || x > from + width + 2.5);
        if (_pen.Fits(d, x2 - x1))
        {
            double middle = (x1 + x2 - width) / 2, low = x1 + 4, high = x2 - 4 - width;
            var starts = lines.SelectMany(x => new[] { x + 3, x - 3 - width }).Where(s => s >= low && s <= high).Prepend(middle).Where(Clear).ToArray();
            if (starts.Length > 0)
            {
                return (starts.MinBy(s => Math.Abs(s - middle)) + (width / 2), null);
            }
        }

        if (d.From_mm == 0 && x2 < core)
        {
            return (null, -DimensionPen.Tail);
        }

        var near = x2 + DimensionPen.Tail;
        return (null, Clear(near) ? near : Math.Max(core + DimensionPen.Tail, near));
    }

    private double Span(DimensionText d) => (d.To_mm - d.From_mm) * Scale;

    private (double Left, double Right, double Top, double Bottom) Margins()
    {
        if (!WithDimensions && !WithNotes)
        {
            return (3, 3, _o.DimensionSize + 14, 3);
        }

        double outsideLeft = 0, outsideRight = 0;
        foreach (var (d, row) in Rows.SelectMany((r, i) => r.Select(d => (d, i))))
        {
            if (RowText(d, row).Outside is { } at)
            {
                outsideLeft = Math.Max(outsideLeft, at < 0 ? _pen.Width(d) - at : 0);
                outsideRight = Math.Max(outsideRight, at + _pen.Width(d) - (_r.Geometry.OverallWidth_mm * Scale));
            }
        }

        var outsideColumn = Columns.SelectMany(r => r).Where(d => !_pen.Fits(d, Span(d))).Select(d => _pen.Width(d) + DimensionPen.Tail + 8).DefaultIfEmpty(0).Max();
        var left = Columns.Count == 0 ? 8 : FirstLine + ((Columns.Count - 1) * _pen.Pitch) + _pen.Size + DimensionPen.Gap + 6;
        var bottom = Rows.Count == 0 ? 8 : FirstRow + ((Rows.Count - 1) * _pen.Pitch) + 8;
        var right = WithNotes ? Math.Max(_callouts + 42, 30) : 8;
        return (Math.Max(left, outsideLeft + 4), Math.Max(right, outsideRight + 4), Math.Max(_o.DimensionSize + 22, outsideColumn + 6), bottom);
    }
}
