using System.Globalization;
using System.Security;

namespace CoreDesign.Sheets.Pdf;

/// <summary>The metadata packet of a sheet (XMP, ISO 16684-1); written here because the PDF library doesn't escape markup in titles.</summary>
internal sealed record Xmp(string Title, string Author, string Subject, string Creator, DateTimeOffset IssuedAt)
{
    private const char Mark = '\uFEFF';

    public string Packet(string id)
    {
        var date = IssuedAt.UtcDateTime.ToString("yyyy-MM-ddTHH:mm:ssZ", CultureInfo.InvariantCulture);
        return $"""
            <?xpacket begin="{Mark}" id="W5M0MpCehiHzreSzNTczkc9d"?>
            <x:xmpmeta xmlns:x="adobe:ns:meta/">
            <rdf:RDF xmlns:rdf="http://www.w3.org/1999/02/22-rdf-syntax-ns#">
            <rdf:Description rdf:about="" xmlns:dc="http://purl.org/dc/elements/1.1/" xmlns:xmp="http://ns.adobe.com/xap/1.0/" xmlns:xmpMM="http://ns.adobe.com/xap/1.0/mm/">
            <dc:format>application/pdf</dc:format>
            <dc:title><rdf:Alt><rdf:li xml:lang="x-default">{Escaped(Title)}</rdf:li></rdf:Alt></dc:title>
            <dc:creator><rdf:Seq><rdf:li>{Escaped(Author)}</rdf:li></rdf:Seq></dc:creator>
            <dc:description><rdf:Alt><rdf:li xml:lang="x-default">{Escaped(Subject)}</rdf:li></rdf:Alt></dc:description>
            <xmp:CreatorTool>{Escaped(Creator)}</xmp:CreatorTool>
            <xmp:CreateDate>{date}</xmp:CreateDate>
            <xmp:ModifyDate>{date}</xmp:ModifyDate>
            <xmpMM:DocumentID>uuid:{id}</xmpMM:DocumentID>
            <xmpMM:InstanceID>uuid:{id}</xmpMM:InstanceID>
            </rdf:Description>
            </rdf:RDF>
            </x:xmpmeta>
            <?xpacket end="w"?>
            """.ReplaceLineEndings("\n");
    }

    private static string Escaped(string text) => SecurityElement.Escape(text) ?? "";
}
