using CoreDesign.Estimating.Steels.Checks;

namespace CoreDesign.Estimating.Steels.Import;

/// <summary>Rows to a draft: key rows above, tables below, each cell still knowing its line and column.</summary>
internal static class ImportReader
{
    private const string NameKey = "name";
    private const string SourceKey = "source";
    private static readonly string[] Keys = [NameKey, SourceKey, .. FieldRule.All.Select(r => r.Key)];

    public static (SteelDraft Draft, string DecimalMark) Read(IReadOnlyList<ImportRow> rows, char separator, Findings findings)
    {
        var draft = new SteelDraft();
        var start = rows.TakeWhile(r => !ImportRows.IsHeader(r.Cells)).Count();
        var heads = rows.Take(start).ToList();
        var tables = Tables(rows.Skip(start), separator, findings);
        var numbers = new ImportNumbers(heads
            .Where(r => r.Cells.Length > 1 && r.Cells[0] is not (NameKey or SourceKey))
            .Select(r => r.Cells[1])
            .Concat(tables.SelectMany(t => new[] { t.Frequency, t.B, t.Value })));

        var seen = new Dictionary<string, int>(StringComparer.Ordinal);
        foreach (var row in heads)
        {
            KeyRow(row, draft, numbers, seen, separator, findings);
        }

        foreach (var (key, longest) in new[] { (NameKey, NameRules.LongestName), (SourceKey, NameRules.LongestSource) })
        {
            var line = seen.GetValueOrDefault(key);
            NameRules.Check(key == NameKey ? draft.Name : draft.Source, longest, new Spot(line, key, ""), findings);
        }

        foreach (var row in tables)
        {
            TableRow(row, draft, numbers, findings);
        }

        return (draft, numbers.DecimalMark);
    }

    private static void KeyRow(
        ImportRow row, SteelDraft draft, ImportNumbers numbers, Dictionary<string, int> seen, char separator, Findings findings)
    {
        var key = Keys.FirstOrDefault(k => string.Equals(k, row.Cells[0], StringComparison.OrdinalIgnoreCase));
        if (key is null)
        {
            findings.Error(new Spot(row.Line, "first cell", ""), row.Cells[0], $"is no key of the format; nearest: {string.Join(", ", NameDistance.Nearest(row.Cells[0], Keys, 2))}.");
            return;
        }

        var spot = new Spot(row.Line, key, "");
        if (!seen.TryAdd(key, row.Line))
        {
            findings.Error(spot, null, $"occurs twice (line {seen[key]}); keep one of the two rows.");
            return;
        }

        if (row.Cells.Length > 2)
        {
            draft.Unreadable.Add(key);
            var mend = separator == ',' ? "put a text with commas in quotation marks, and write decimal points" : "leave the cells after the value empty";
            findings.Error(spot, null, $"has {row.Cells.Length - 1} values; {mend}.");
            return;
        }

        var value = row.Cells.Length > 1 ? row.Cells[1] : "";
        switch (key)
        {
            case NameKey:
                draft.Name = value;
                break;
            case SourceKey:
                draft.Source = value;
                break;
            default:
                if (numbers.Read(value, spot, findings) is { } entry)
                {
                    draft.Fields[key] = entry;
                }
                else
                {
                    draft.Unreadable.Add(key);
                }

                break;
        }
    }

    private static List<TableCells> Tables(IEnumerable<ImportRow> rows, char separator, Findings findings)
    {
        int[] place = [];
        var width = 0;
        var cells = new List<TableCells>();
        foreach (var row in rows)
        {
            if (ImportRows.IsHeader(row.Cells))
            {
                place = Header(row, findings);
                width = row.Cells.Length;
                continue;
            }

            if (row.Cells.Length > width)
            {
                var mend = separator == ',' ? "; decimal commas need semicolons or tabs between the cells" : "; leave the cells after the last column empty";
                findings.Error(new Spot(row.Line, "The row", ""), null, $"has {row.Cells.Length} cells where the header has {width}{mend}.");
                continue;
            }

            string Cell(int column) => place[column] >= 0 && place[column] < row.Cells.Length ? row.Cells[place[column]] : "";
            cells.Add(new TableCells(row.Line, Cell(0), Cell(1), Cell(2), Cell(3)));
        }

        return cells;
    }

    /// <summary>Where each of the four columns stands in this table, -1 where it is missing.</summary>
    private static int[] Header(ImportRow row, Findings findings)
    {
        var columns = ImportRows.Columns;
        foreach (var other in row.Cells.Where(c => !columns.Contains(c, StringComparer.OrdinalIgnoreCase)))
        {
            findings.Error(new Spot(row.Line, "header", ""), other, $"is no column of the format; the columns are {string.Join(", ", columns)}.");
        }

        var place = Array.ConvertAll(columns, c => Array.FindIndex(row.Cells, h => string.Equals(h, c, StringComparison.OrdinalIgnoreCase)));
        for (var i = 0; i < columns.Length; i++)
        {
            if (place[i] < 0)
            {
                findings.Error(new Spot(row.Line, "header", ""), null, $"lacks the column {columns[i]}.");
            }
            else if (row.Cells.Count(h => string.Equals(h, columns[i], StringComparison.OrdinalIgnoreCase)) > 1)
            {
                findings.Error(new Spot(row.Line, "header", ""), columns[i], "occurs twice; keep one column of that name.");
            }
        }

        return place;
    }

    private static void TableRow(TableCells row, SteelDraft draft, ImportNumbers numbers, Findings findings)
    {
        Spot At(int column) => new(row.Line, ImportRows.Columns[column], "");
        var kind = PointKind.All.FirstOrDefault(k => string.Equals(k.Key, row.Kind, StringComparison.OrdinalIgnoreCase));
        if (kind is null)
        {
            findings.Error(At(0), row.Kind, $"is no kind of table; nearest: {NameDistance.Nearest(row.Kind, PointKind.All.Select(k => k.Key), 1)[0]}. Kinds are {string.Join(", ", PointKind.All.Select(k => k.Key))}.");
            draft.Unreadable.UnionWith(PointKind.All.Select(k => k.Key));
            return;
        }

        var noFrequency = row.Frequency.Length == 0 && kind == PointKind.Magnetization;
        var frequency = noFrequency ? null : numbers.Read(row.Frequency, At(1), findings);
        var b = numbers.Read(row.B, At(2), findings);
        var y = numbers.Read(row.Value, At(3), findings);
        if (b is null || y is null || (frequency is null && !noFrequency))
        {
            draft.Unreadable.Add(kind.Key);
            return;
        }

        var table = kind == PointKind.Magnetization ? draft.Magnetization : kind == PointKind.Loss ? draft.Loss : draft.ExcitingPower;
        table.Add(new DraftPoint(frequency, b, y));
    }

    private sealed record TableCells(int Line, string Kind, string Frequency, string B, string Value);
}
