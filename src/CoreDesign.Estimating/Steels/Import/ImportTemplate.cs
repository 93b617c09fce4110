using System.Globalization;
using System.Text;

namespace CoreDesign.Estimating.Steels.Import;

/// <summary>The import format by example; its figures are invented.</summary>
internal static class ImportTemplate
{
    private static readonly string[] Remarks =
    [
        "# Steel data for import. Rows that start with # are remarks. Figures are invented; replace them by your certificate.",
        "# Above: one key and its value in each row. name; thickness and source are needed. What else is left out gets the usual value.",
        "# Below: one point in each row. Kinds: magnetization (value = peak field strength in A/m); loss (W/kg); excitingPower (VA/kg; optional).",
        "# B_T is the peak flux density of a sine in tesla: not polarization and not gauss. Loss and exciting power may have several frequencies.",
        "# Comma with decimal points or semicolon or tab with either decimal mark; UTF-8.",
    ];

    private static readonly (string Key, object Value)[] Fields =
    [
        ("name", "Example steel coil 0001"),
        ("source", "Certificate number and date"),
        ("thickness_mm", 0.30),
        ("density_kg_m3", 7650.0),
        ("resistivity_ohm_m", 4.8e-7),
        ("saturationPolarization_T", 2.03),
        ("stackingFactor", 0.965),
    ];

    private static readonly (string Kind, int Frequency, (double B, double Value)[] Points)[] Tables =
    [
        ("magnetization", 50,
        [
            (0.2, 4.5), (0.5, 9), (1.0, 15.5), (1.3, 22), (1.5, 33), (1.6, 46), (1.7, 82), (1.8, 215), (1.88, 790), (1.95, 2400), (2.0, 6200),
        ]),
        ("loss", 50, [(0.5, 0.091), (1.0, 0.335), (1.3, 0.56), (1.5, 0.756), (1.6, 0.888), (1.7, 1.05), (1.8, 1.26)]),
        ("loss", 60, [(0.5, 0.121), (1.0, 0.443), (1.3, 0.738), (1.5, 0.995), (1.6, 1.168), (1.7, 1.38), (1.8, 1.657)]),
        ("excitingPower", 50, [(1.0, 0.42), (1.5, 1.02), (1.7, 1.85)]),
    ];

    public static string Text(char separator, char decimalMark)
    {
        var text = new StringBuilder();
        void Row(params object[] cells) => text.AppendJoin(separator, cells.Select(c => c is IFormattable number
            ? number.ToString(null, CultureInfo.InvariantCulture).Replace('.', decimalMark)
            : c.ToString())).Append("\r\n");

        foreach (var remark in Remarks)
        {
            text.Append(remark).Append("\r\n");
        }

        foreach (var (key, value) in Fields)
        {
            Row(key, value);
        }

        Row([.. ImportRows.Columns]);
        foreach (var (kind, frequency, points) in Tables)
        {
            foreach (var (b, value) in points)
            {
                Row(kind, frequency, b, value);
            }
        }

        return text.ToString();
    }
}
