using System.Globalization;
using System.Text.RegularExpressions;

namespace CoreDesign.Tests.Shared;

/// <summary>
/// A table of the handbook that a test computes. The test fails where the committed table says something else, and shows the lines as they should be;
/// with COREDESIGN_REWRITE=1 in the environment it writes them into the chapter instead. A figure with decimals may be off by one in its last place, so
/// that rounding alone turns hardly a test red.
/// </summary>
internal static partial class HandbookTable
{
    private const string RewriteVariable = "COREDESIGN_REWRITE";

    /// <param name="chapter">File name in src/CoreDesign.Web/Handbook.</param>
    /// <param name="heading">Heading under which the first table is the one.</param>
    /// <param name="rows">Head and rows, cell by cell.</param>
    public static void Hold(string chapter, string heading, IReadOnlyList<string[]> rows)
    {
        var file = Path.Combine(Root(), "src", "CoreDesign.Web", "Handbook", chapter);
        var lines = File.ReadAllLines(file).ToList();
        var start = lines.FindIndex(l => l.StartsWith('#') && l.TrimStart('#', ' ') == heading);
        Assert.True(start >= 0, $"{chapter} has no heading '{heading}'.");
        start = lines.FindIndex(start, l => l.StartsWith('|'));
        Assert.True(start >= 0, $"{chapter} has no table below '{heading}'.");
        var count = lines.Skip(start).TakeWhile(l => l.StartsWith('|')).Count();
        List<string> wanted = [Line(rows[0]), Line([.. rows[0].Select(_ => "---")]), .. rows.Skip(1).Select(Line)];
        if (Environment.GetEnvironmentVariable(RewriteVariable) == "1")
        {
            lines.RemoveRange(start, count);
            lines.InsertRange(start, wanted);
            File.WriteAllText(file, string.Join('\n', lines) + "\n");
            return;
        }

        var found = lines.GetRange(start, count);
        Assert.True(
            found.Count == wanted.Count && found.Zip(wanted).All(pair => Same(pair.First, pair.Second)),
            $"The table below '{heading}' in {chapter} is no longer what the program computes. Check why; then run this test with {RewriteVariable}=1. It would read:\n{string.Join('\n', wanted)}");
    }

    /// <summary>Three figures that count, never with a power of ten.</summary>
    public static string Figure(double value, int digits = 3)
    {
        var places = value == 0 ? 0 : Math.Max(0, digits - 1 - (int)Math.Floor(Math.Log10(Math.Abs(value))));
        return value.ToString("F" + places.ToString(CultureInfo.InvariantCulture), CultureInfo.InvariantCulture).Replace('-', '−');
    }

    /// <summary>A deviation in per cent, with its sign.</summary>
    public static string Deviation(double ours, double theirs) => Percent((ours / theirs) - 1);

    /// <summary>A share in per cent, with its sign.</summary>
    public static string Percent(double share) => (100 * share).ToString("+0.0;−0.0;0.0", CultureInfo.InvariantCulture) + "\u00a0%";

    private static string Line(string[] cells) => $"| {string.Join(" | ", cells)} |";

    private static bool Same(string found, string wanted)
    {
        MatchCollection a = Number().Matches(found), b = Number().Matches(wanted);
        return Number().Replace(found, "#") == Number().Replace(wanted, "#") && a.Zip(b).All(pair => Near(pair.First.Value, pair.Second.Value));
    }

    private static bool Near(string found, string wanted)
    {
        // A figure that crosses a power of ten loses a place, so the coarser of the two counts.
        var place = Math.Pow(10, -Math.Min(Places(found), Places(wanted)));
        return Math.Abs(Value(found) - Value(wanted)) < 1.5 * place && (found == wanted || (Places(wanted) + Places(found) > 0));
    }

    private static double Value(string text) => double.Parse(text, CultureInfo.InvariantCulture);

    private static int Places(string text) => text.Contains('.', StringComparison.Ordinal) ? text.Length - text.IndexOf('.', StringComparison.Ordinal) - 1 : 0;

    private static string Root()
    {
        var folder = new DirectoryInfo(AppContext.BaseDirectory);
        while (folder is not null && !File.Exists(Path.Combine(folder.FullName, "CoreDesign.sln"))) folder = folder.Parent;
        return folder?.FullName ?? throw new InvalidOperationException($"No CoreDesign.sln above {AppContext.BaseDirectory}; run the tests from the build output inside the source tree.");
    }

    [GeneratedRegex(@"\d+(\.\d+)?", RegexOptions.ExplicitCapture, matchTimeoutMilliseconds: 2000)]
    private static partial Regex Number();
}
