using System.Text.RegularExpressions;
using CoreDesign.Web.Features.Handbook;

namespace CoreDesign.Web.Tests.HandbookPages;

/// <summary>The handbook as it is built into the service: its text, its tables and its examples.</summary>
internal static partial class HandbookText
{
    public static string Of(string chapter)
    {
        var assembly = typeof(HandbookBook).Assembly;
        var name = Assert.Single(assembly.GetManifestResourceNames(), n => n.StartsWith("Handbook/", StringComparison.Ordinal) && n.EndsWith($"-{chapter}.md", StringComparison.Ordinal));
        using var reader = new StreamReader(assembly.GetManifestResourceStream(name)!);
        return reader.ReadToEnd().ReplaceLineEndings("\n");
    }

    /// <summary>Rows below a heading's first table, cell by cell, without the head.</summary>
    public static IReadOnlyList<string[]> Table(string chapter, string heading)
    {
        var lines = Of(chapter).Split('\n');
        var start = Array.FindIndex(lines, l => l.TrimStart('#', ' ') == heading);
        Assert.True(start >= 0, $"The chapter {chapter} has no heading '{heading}'.");
        var rows = lines.Skip(start).SkipWhile(l => !l.StartsWith('|')).TakeWhile(l => l.StartsWith('|')).Skip(2);
        return [.. rows.Select(r => r.Trim('|').Split('|').Select(c => c.Trim().Trim('`')).ToArray())];
    }

    /// <summary>The text of the fenced examples, in their order.</summary>
    public static IReadOnlyList<string> Examples(string chapter) => [.. Fence().Matches(Of(chapter)).Select(m => m.Groups["text"].Value)];

    [GeneratedRegex("^```[a-z]*\n(?<text>.*?)^```$", RegexOptions.Multiline | RegexOptions.Singleline | RegexOptions.ExplicitCapture, matchTimeoutMilliseconds: 2000)]
    private static partial Regex Fence();
}
