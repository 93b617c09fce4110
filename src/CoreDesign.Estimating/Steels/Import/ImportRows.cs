using CoreDesign.Estimating.Steels.Checks;
using Sylvan.Data.Csv;

namespace CoreDesign.Estimating.Steels.Import;

/// <summary>A row with its line in the file; cells trimmed, empty ones at the end left out.</summary>
internal sealed record ImportRow(int Line, string[] Cells);

/// <summary>Text to rows. The separator is the one of the table's header row, so that it never has to be guessed from numbers.</summary>
internal static class ImportRows
{
    public static readonly string[] Columns = ["kind", "frequency_Hz", "B_T", "value"];
    private static readonly char[] Separators = [',', ';', '\t'];

    public static (IReadOnlyList<ImportRow> Rows, char Separator)? Read(string text, Findings findings)
    {
        if (Separator(text) is not { } separator)
        {
            findings.Error(new Spot(0, "The file", ""), null, $"has no header row of a table; it needs a row with the columns {string.Join(", ", Columns)}, separated by comma, semicolon or tab.");
            return null;
        }

        var rows = new List<ImportRow>();

        // The reader counts records; a line break within quotes puts the lines ahead of them.
        var lineBreaks = 0;
        try
        {
            var options = new CsvDataReaderOptions { HasHeaders = false, Delimiter = separator, BufferSize = 1 << 16, Comment = '\0' };
            using var reader = new StringReader(text.ReplaceLineEndings("\n"));
            using var csv = CsvDataReader.Create(reader, options);
            while (csv.Read())
            {
                var line = csv.RowNumber + lineBreaks;
                var cells = Enumerable.Range(0, csv.RowFieldCount).Select(csv.GetString).ToArray();
                var breaks = cells.Sum(c => c.Count(ch => ch == '\n'));
                lineBreaks += breaks;
                if (breaks > 0 && !IsComment(cells))
                {
                    findings.Error(new Spot(line, "The row", ""), null, "has a line break within quotation marks; keep each cell on one line, and double a quotation mark that belongs to the text.");
                    continue;
                }

                cells = [.. cells.Select(c => c.Trim())];
                var used = Array.FindLastIndex(cells, c => c.Length > 0) + 1;
                if (used > 0 && !IsComment(cells))
                {
                    rows.Add(new ImportRow(line, cells[..used]));
                }
            }
        }
        catch (FormatException e) when (e is CsvFormatException or CsvInvalidCharacterException)
        {
            findings.Error(new Spot(rows.Count > 0 ? rows[^1].Line + 1 : 1, "The row", ""), null, "or one soon after it cannot be split into cells: a quotation mark is not closed, not doubled, or the row is far too long.");
            return null;
        }

        return (rows, separator);
    }

    private static bool IsComment(string[] cells) => cells.Length > 0 && cells[0].StartsWith('#');

    /// <summary>True for the header row of a table, whatever the order of its columns.</summary>
    public static bool IsHeader(IReadOnlyCollection<string> cells) =>
        cells.Contains(Columns[0], StringComparer.OrdinalIgnoreCase) && cells.Contains(Columns[2], StringComparer.OrdinalIgnoreCase);

    private static char? Separator(string text)
    {
        using var lines = new StringReader(text);
        while (lines.ReadLine() is { } line)
        {
            // Split plainly: the names of the columns hold neither separators nor quotation marks.
            if (line.Contains(Columns[2], StringComparison.OrdinalIgnoreCase)
                && Separators.FirstOrDefault(s => IsHeader([.. line.Split(s).Select(c => c.Trim().Trim('"'))])) is var found and not '\0')
            {
                return found;
            }
        }

        return null;
    }
}
