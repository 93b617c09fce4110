using System.Globalization;

namespace CoreDesign.Estimating.Tests.Published;

/// <summary>Measured units of one design with two kinds of joint; source in the head of the CSV.</summary>
internal static class MeasuredUnits
{
    private static readonly IReadOnlyList<(double Mva, bool Several, double Loss_kW, double Current_percent)> Rows = Read();

    /// <summary>Ratio of the means, several positions over single overlap, and the standard deviation of the ratio of one unit to one unit.</summary>
    public static (double Ratio, double Deviation) Loss(double mva) => RatioOf(mva, r => r.Loss_kW);

    public static (double Ratio, double Deviation) Current(double mva) => RatioOf(mva, r => r.Current_percent);

    private static (double Ratio, double Deviation) RatioOf(double mva, Func<(double Mva, bool Several, double Loss_kW, double Current_percent), double> of)
    {
        var (several, single) = (Statistics(true), Statistics(false));
        var ratio = several.Mean / single.Mean;
        return (ratio, ratio * Math.Sqrt((several.Scatter * several.Scatter) + (single.Scatter * single.Scatter)));

        (double Mean, double Scatter) Statistics(bool kind)
        {
            var values = Rows.Where(r => r.Mva == mva && r.Several == kind).Select(of).ToList();
            var mean = values.Average();
            return (mean, Math.Sqrt(values.Sum(v => (v - mean) * (v - mean)) / (values.Count - 1)) / mean);
        }
    }

    private static List<(double Mva, bool Several, double Loss_kW, double Current_percent)> Read() =>
    [
        .. File.ReadLines(Path.Combine(AppContext.BaseDirectory, "Published", "Data", "measured_two_joint_kinds.csv"))
            .Where(l => !l.StartsWith('#') && !l.StartsWith("MVA", StringComparison.Ordinal))
            .Select(l => l.Split(','))
            .Select(c => (Number(c[0]), c[2] == "several", Number(c[3]), Number(c[4]))),
    ];

    private static double Number(string text) => double.Parse(text, CultureInfo.InvariantCulture);
}
