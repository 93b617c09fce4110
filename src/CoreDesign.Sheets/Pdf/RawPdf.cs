using System.Globalization;
using System.Text;

namespace CoreDesign.Sheets.Pdf;

/// <summary>An object of a PDF file: its dictionary or value as text, and its stream where it has one.</summary>
internal sealed record RawObject(int Number, string Head, byte[]? Stream);

/// <summary>A freshly saved, unencrypted PDF file with a plain cross-reference table, taken apart.</summary>
internal sealed record RawPdf(IReadOnlyList<RawObject> Objects, string Root, string Info)
{
    /// <exception cref="InvalidDataException">The file is not of the shape that the pinned PDF library writes.</exception>
    public static RawPdf Read(byte[] bytes)
    {
        // Latin-1 keeps byte and character positions the same.
        var text = Encoding.Latin1.GetString(bytes);
        var start = Number(text, text.LastIndexOf("startxref", StringComparison.Ordinal) + 9);
        var trailer = text[text.LastIndexOf("trailer", StringComparison.Ordinal)..];
        var table = text.AsSpan(start).StartsWith("xref") ? start : throw Broken("no cross-reference table");
        var offsets = text[table..text.LastIndexOf("trailer", StringComparison.Ordinal)]
            .Split('\n', StringSplitOptions.RemoveEmptyEntries | StringSplitOptions.TrimEntries)
            .Skip(2)
            .Select((line, number) => (Number: number, InUse: line.EndsWith('n'), Offset: int.Parse(line.AsSpan(0, 10), CultureInfo.InvariantCulture)))
            .Where(o => o.InUse)
            .OrderBy(o => o.Offset)
            .ToList();
        var ends = offsets.Skip(1).Select(o => o.Offset).Append(table);
        return new RawPdf([.. offsets.Zip(ends, (o, end) => Object(bytes, text, o.Number, o.Offset, end)).OrderBy(o => o.Number)], Reference(trailer, "/Root"), Reference(trailer, "/Info"));
    }

    private static RawObject Object(byte[] bytes, string text, int number, int offset, int next)
    {
        var prefix = $"{number.ToString(CultureInfo.InvariantCulture)} 0 obj";
        if (!text.AsSpan(offset).StartsWith(prefix))
        {
            throw Broken($"object {number} is not where the table says");
        }

        var from = offset + prefix.Length;
        var end = text.LastIndexOf("endobj", next - 1, next - from, StringComparison.Ordinal);
        var stream = text.IndexOf(">>\nstream\n", from, end - from, StringComparison.Ordinal);
        if (stream < 0)
        {
            return new RawObject(number, text[from..end].Trim(), null);
        }

        var head = text[from..(stream + 2)].Trim();
        var length = Number(head, head.LastIndexOf("/Length ", StringComparison.Ordinal) + 8);
        var data = stream + 10;
        return new RawObject(number, head, bytes[data..(data + length)]);
    }

    private static string Reference(string trailer, string key)
    {
        var at = trailer.IndexOf(key, StringComparison.Ordinal);
        return at < 0 ? throw Broken("no " + key) : trailer[(at + key.Length)..(trailer.IndexOf('R', at + key.Length) + 1)].Trim();
    }

    private static int Number(string text, int at)
    {
        while (char.IsWhiteSpace(text[at]))
        {
            at++;
        }

        var end = at;
        while (char.IsAsciiDigit(text[end]))
        {
            end++;
        }

        return int.Parse(text.AsSpan(at, end - at), CultureInfo.InvariantCulture);
    }

    private static InvalidDataException Broken(string what) => new($"The PDF library wrote a file of another shape than its pinned version does: {what}.");
}
