using System.Globalization;
using System.Text;
using CoreDesign.Sheets.Scenes;

namespace CoreDesign.Sheets.Charts;

/// <summary>A chart with what belongs to it: the picture, the model of its read-out and its data.</summary>
public sealed record Chart(string Key, Scene Scene, ChartHover Hover, ChartTable Table);

/// <summary>
/// What a read-out needs: the plot's place in the picture, its axes, and the series in data units. Linear axes map evenly from Low to
/// High, logarithmic ones by the logarithm. <paramref name="ByPoint"/>: look for the nearest point of the plane, not of the abscissa.
/// </summary>
public sealed record ChartHover(Box Plot, HoverAxis X, string XName, string XUnit, bool ByPoint, IReadOnlyList<HoverSeries> Series);

public sealed record HoverAxis(double Low, double High, bool Log);

/// <summary>One series; Y maps by its own axis.</summary>
public sealed record HoverSeries(string Name, string Unit, HoverAxis Axis, IReadOnlyList<double> X, IReadOnlyList<double> Y);

/// <summary>A column of a chart's data; columns may differ in length.</summary>
public sealed record ChartColumn(string Head, IReadOnlyList<double> Values);

public sealed record ChartTable(string FileName, IReadOnlyList<ChartColumn> Columns);

/// <summary>Data of a chart as text.</summary>
public static class ChartData
{
    /// <summary>Comma separated values after RFC 4180: decimal point, full precision, units in the heads, empty cells under short columns.</summary>
    public static string Csv(ChartTable table)
    {
        ArgumentNullException.ThrowIfNull(table);
        var text = new StringBuilder();
        text.AppendJoin(',', table.Columns.Select(c => Cell(c.Head))).Append("\r\n");
        var rows = table.Columns.Select(c => c.Values.Count).DefaultIfEmpty(0).Max();
        for (var i = 0; i < rows; i++)
        {
            text.AppendJoin(',', table.Columns.Select(c => i < c.Values.Count ? c.Values[i].ToString("R", CultureInfo.InvariantCulture) : "")).Append("\r\n");
        }

        return text.ToString();
    }

    public static string Csv(Chart chart)
    {
        ArgumentNullException.ThrowIfNull(chart);
        return Csv(chart.Table);
    }

    // A head may hold a name that a person typed; a spreadsheet must not take it for a formula.
    private static string Cell(string head)
    {
        var safe = head.Length > 0 && head[0] is ('=' or '+' or '-' or '@' or '\t' or '\r') ? "'" + head : head;
        return safe.IndexOfAny([',', '"', '\r', '\n']) >= 0 ? "\"" + safe.Replace("\"", "\"\"", StringComparison.Ordinal) + "\"" : safe;
    }
}
