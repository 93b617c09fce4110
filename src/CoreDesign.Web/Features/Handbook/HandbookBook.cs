using System.Collections.ObjectModel;
using Markdig;
using Markdig.Extensions.AutoIdentifiers;
using Markdig.Syntax;
using Markdig.Syntax.Inlines;

namespace CoreDesign.Web.Features.Handbook;

/// <summary>A chapter: its name in the address, its title, its text as HTML and the headings within it.</summary>
public sealed record Chapter(string Name, string Title, string Html, IReadOnlyList<ChapterHeading> Headings);

/// <summary>A heading of the second level and the anchor it can be reached by.</summary>
public sealed record ChapterHeading(string Anchor, string Text);

/// <summary>
/// The handbook: the Markdown files of the folder Handbook, built into this assembly. Files are named NN-name.md; the number is
/// the order, the first line the title. Raw HTML in them is shown as text.
/// </summary>
public static class HandbookBook
{
    private static readonly MarkdownPipeline Pipeline = new MarkdownPipelineBuilder()
        .DisableHtml()
        .UsePipeTables()
        .UseAutoIdentifiers(AutoIdentifierOptions.GitHub)
        .Build();

    private static readonly Lazy<ReadOnlyCollection<Chapter>> Read = new(() => [.. Files().Select(Chapter)]);

    public static IReadOnlyList<Chapter> Chapters => Read.Value;

    public static Chapter? Find(string name) => Chapters.FirstOrDefault(c => c.Name == name);

    private static IEnumerable<string> Files() => typeof(HandbookBook).Assembly.GetManifestResourceNames()
        .Where(name => name.StartsWith("Handbook/", StringComparison.Ordinal))
        .Order(StringComparer.Ordinal);

    private static Chapter Chapter(string file)
    {
        using var reader = new StreamReader(typeof(HandbookBook).Assembly.GetManifestResourceStream(file)!);
        var document = Markdown.Parse(reader.ReadToEnd(), Pipeline);
        var headings = document.OfType<HeadingBlock>().ToList();
        return new Chapter(
            Path.GetFileNameWithoutExtension(file)[3..],
            headings.Where(h => h.Level == 1).Select(Text).Single(),
            document.ToHtml(Pipeline),
            [.. headings.Where(h => h.Level == 2).Select(h => new ChapterHeading(Markdig.Renderers.Html.HtmlAttributesExtensions.GetAttributes(h).Id ?? "", Text(h)))]);
    }

    private static string Text(HeadingBlock heading) => string.Concat(heading.Inline!.Descendants().Select(inline => inline switch
    {
        LiteralInline literal => literal.Content.ToString(),
        CodeInline code => code.Content,
        _ => "",
    }));
}
