using System.Globalization;
using Sylvan.Data.Csv;

namespace CoreDesign.Estimating.Steels;

/// <summary>Rows of a comma separated table embedded in this assembly under Data.</summary>
internal static class DataTable
{
    public static IReadOnlyList<DataRow> Read(string file)
    {
        var assembly = typeof(DataTable).Assembly;
        var name = assembly.GetManifestResourceNames().Single(n => n.EndsWith("." + file, StringComparison.Ordinal));
        using var stream = assembly.GetManifestResourceStream(name)!;
        using var text = new StreamReader(stream);
        using var csv = CsvDataReader.Create(text, new CsvDataReaderOptions { Delimiter = ',', Comment = '#', HasHeaders = true });
        var columns = Enumerable.Range(0, csv.FieldCount).Select(csv.GetName).ToArray();
        var rows = new List<DataRow>();
        while (csv.Read())
        {
            rows.Add(new DataRow(columns.Select((c, i) => (c, csv.GetString(i))).ToDictionary(StringComparer.Ordinal)));
        }

        return rows;
    }
}

/// <summary>One row, by column name.</summary>
internal sealed record DataRow(IReadOnlyDictionary<string, string> Cells)
{
    public string Text(string column) => Cells[column];

    public double Number(string column) => double.Parse(Cells[column], CultureInfo.InvariantCulture);

    /// <summary>Null where the cell is empty.</summary>
    public double? NumberOrNull(string column) => Cells[column].Length == 0 ? null : Number(column);
}
