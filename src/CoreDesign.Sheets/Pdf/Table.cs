using CoreDesign.Sheets.Scenes;
using PdfSharp.UniversalAccessibility;

namespace CoreDesign.Sheets.Pdf;

/// <summary>A column; the unit stands in its head, never in its rows. Only a column that wraps gives way where the table is too wide.</summary>
internal sealed record Column(string Head, bool Right = true, bool Wraps = false);

/// <summary>A row of cells, as many as there are columns; a sum stands under a rule.</summary>
internal sealed record Row(IReadOnlyList<string> Cells, bool Strong = false, bool Derived = false, bool Sum = false, Ink Swatch = Ink.None)
{
    public Row(params string[] cells)
        : this((IReadOnlyList<string>)cells)
    {
    }

    public Type Type => Strong || Sum ? TypeScale.Strong : Derived ? TypeScale.Derived : TypeScale.Body;
}

/// <summary>A table whose head comes back on each page that it reaches. Without a head it is a list of names and values.</summary>
internal sealed record Table(IReadOnlyList<Column> Columns, IReadOnlyList<Row> Rows) : Block
{
    private const double Padding = 2;
    private const double ColumnGap = 8;

    // Figures further apart than this are hard to follow along a row.
    private const double MostSpare = 40;
    private const double SwatchWidth = 11;
    private const int MostLines = 6;

    /// <summary>Names and values, the name first.</summary>
    public static Table KeyValues(params IReadOnlyList<(string Name, string Value, bool Strong, bool Derived)> rows) =>
        new([new Column("", false, true), new Column("", true, true)], [.. rows.Select(r => new Row([r.Name, r.Value], r.Strong, r.Derived))]);

    public override IEnumerable<Strip> Strips(double width)
    {
        var widths = Widths(width);
        width = Math.Min(width, widths.Sum() + ((widths.Length - 1) * ColumnGap));
        var lefts = widths.Select((_, i) => widths.Take(i).Sum() + (i * ColumnGap)).ToArray();
        var headed = Columns.Any(c => c.Head.Length > 0);
        var group = new StripGroup(PdfBlockLevelElementTag.Table, headed ? Head(width, widths, lefts) : null);
        foreach (var row in Rows)
        {
            yield return RowStrip(row, width, widths, lefts, headed) with { Group = group };
        }
    }

    private Strip Head(double width, double[] widths, double[] lefts)
    {
        var type = TypeScale.Small;
        var cells = Columns.Select((c, i) => TextWrap.Lines(c.Head, type, widths[i], MostLines)).ToArray();
        var most = cells.Max(c => c.Count);
        var height = (most * type.Line()) + 3;
        return new Strip(height, (canvas, x, y) =>
        {
            canvas.Artifact(() => canvas.Line(x, y + height, x + width, y + height, 0.5, Ink.Edge));
            canvas.Block(PdfBlockLevelElementTag.TableRow, () =>
            {
                for (var i = 0; i < cells.Length; i++)
                {
                    // Heads stand on the rule, however many lines their neighbours have.
                    var top = y + ((most - cells[i].Count) * type.Line());
                    var (lines, column) = (cells[i], i);
                    canvas.Cell(true, "Column", () => Lines(canvas, lines, column, type, x + lefts[column], top, widths[column]));
                }
            });
        })
        { KeepWithNext = true };
    }

    private Strip RowStrip(Row row, double width, double[] widths, double[] lefts, bool headed)
    {
        var cells = row.Cells.Select((c, i) => TextWrap.Lines(c, CellType(row, i, headed), widths[i] - (i == 0 && row.Swatch != Ink.None ? SwatchWidth : 0) + 0.01, headed ? MostLines : 2)).ToArray();
        var height = (cells.Max(c => c.Count) * row.Type.Line()) + Padding;
        return new Strip(height, (canvas, x, y) =>
        {
            canvas.Artifact(() =>
            {
                canvas.Line(x, y + height, x + width, y + height, 0.35, Ink.Hair2);
                if (row.Sum)
                {
                    canvas.Line(x, y, x + width, y, 0.6, Ink.Edge);
                }

                if (row.Swatch != Ink.None)
                {
                    canvas.Fill(x, y + 3.2, 5.6, 5.6, row.Swatch);
                    canvas.Rectangle(x, y + 3.2, 5.6, 5.6, 0.4, Ink.Edge);
                }
            });
            canvas.Block(PdfBlockLevelElementTag.TableRow, () =>
            {
                for (var i = 0; i < cells.Length; i++)
                {
                    var column = i;
                    var shift = i == 0 && row.Swatch != Ink.None ? SwatchWidth : 0;
                    canvas.Cell(i == 0, "Row", () => Lines(canvas, cells[column], column, CellType(row, column, headed), x + lefts[column] + shift, y + (Padding / 2), widths[column]));
                }
            });
        });
    }

    private static Type CellType(Row row, int column, bool headed) => column == 0 && !headed ? TypeScale.Label : row.Type;

    private void Lines(SheetCanvas canvas, IReadOnlyList<string> lines, int column, Type type, double x, double y, double width)
    {
        for (var i = 0; i < lines.Count; i++)
        {
            var right = Columns[column].Right;
            canvas.Text(lines[i], right ? x + width : x, y + (i * type.Line()) + type.Baseline(), type, right ? Anchor.End : Anchor.Start);
        }
    }

    /// <summary>Natural widths; spare room is shared out evenly, and wrapping columns give way, the widest most.</summary>
    private double[] Widths(double width)
    {
        var headed = Columns.Any(c => c.Head.Length > 0);
        var natural = Columns.Select((c, i) => Math.Max(
            c.Head.Split('\n').Max(TypeScale.Small.Width),
            Rows.Select(r => CellType(r, i, headed).Width(SheetFonts.Face(CellType(r, i, headed).Cut).Printable(r.Cells[i])) + (i == 0 && r.Swatch != Ink.None ? SwatchWidth : 0)).DefaultIfEmpty().Max())).ToArray();
        var spare = width - natural.Sum() - ((Columns.Count - 1) * ColumnGap);
        if (spare >= 0)
        {
            var each = headed ? Math.Min(spare / Columns.Count, MostSpare) : spare / Columns.Count;
            return [.. natural.Select(n => n + each)];
        }

        var wrapping = Columns.Select((c, i) => c.Wraps ? i : -1).Where(i => i >= 0).ToArray();
        var indexes = wrapping.Length > 0 ? wrapping : Enumerable.Range(0, Columns.Count).ToArray();
        var room = indexes.Sum(i => natural[i]) + spare;
        return Shrink(natural, indexes, Math.Max(room, 12 * indexes.Length));
    }

    /// <summary>Cuts the named widths to a common bound, so that together they take <paramref name="room"/>; narrow ones keep theirs.</summary>
    private static double[] Shrink(double[] natural, int[] indexes, double room)
    {
        var left = room;
        var open = indexes.OrderBy(i => natural[i]).ToList();
        var widths = (double[])natural.Clone();
        for (var k = 0; k < open.Count; k++)
        {
            widths[open[k]] = Math.Min(natural[open[k]], left / (open.Count - k));
            left -= widths[open[k]];
        }

        return widths;
    }
}
