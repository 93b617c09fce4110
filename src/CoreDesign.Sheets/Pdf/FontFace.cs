using System.Buffers.Binary;
using System.Text;

namespace CoreDesign.Sheets.Pdf;

/// <summary>
/// A TrueType face as far as the layout needs it: which characters it can draw and how wide they are (tables head, hhea,
/// hmtx and cmap format 4 of ISO/IEC 14496-22).
/// </summary>
internal sealed class FontFace
{
    /// <summary>Drawn in place of a character that the face lacks: Unicode's own replacement character, which this family has.</summary>
    public const char Missing = '\uFFFD';

    private readonly Dictionary<int, ushort> _glyphs;
    private readonly ushort[] _advances;
    private readonly double _unitsPerEm;

    public FontFace(string name, byte[] bytes)
    {
        Name = name;
        Bytes = bytes;
        var tables = Tables(bytes);
        _unitsPerEm = U16(tables["head"] + 18);
        var metrics = U16(tables["hhea"] + 34);
        _advances = new ushort[metrics];
        for (var i = 0; i < metrics; i++)
        {
            _advances[i] = U16(tables["hmtx"] + (4 * i));
        }

        _glyphs = Glyphs(tables["cmap"]);
    }

    public string Name { get; }

    public byte[] Bytes { get; }

    public bool Has(int codePoint) => _glyphs.ContainsKey(codePoint);

    /// <summary>Advance width of a text in the unit of <paramref name="size"/>; the text must be <see cref="Printable"/>.</summary>
    public double Width(string text, double size)
    {
        var units = 0;
        foreach (var c in text)
        {
            units += Advance(c);
        }

        return units * size / _unitsPerEm;
    }

    /// <summary>How many characters from <paramref name="start"/> on fit into a width, at least one.</summary>
    public int Fitting(string text, int start, double size, double width)
    {
        var room = width * _unitsPerEm / size;
        var end = start;
        while (end < text.Length && (room -= Advance(text[end])) >= 0)
        {
            end++;
        }

        return Math.Max(1, end - start);
    }

    /// <summary>The text on one line with nothing in it that this face can't draw: controls become blanks, joiners go, the rest becomes <see cref="Missing"/>.</summary>
    public string Printable(string text)
    {
        var clean = new StringBuilder(text.Length);
        foreach (var rune in text.EnumerateRunes())
        {
            switch (Rune.GetUnicodeCategory(rune))
            {
                case System.Globalization.UnicodeCategory.Control:
                case System.Globalization.UnicodeCategory.LineSeparator:
                case System.Globalization.UnicodeCategory.ParagraphSeparator:
                    clean.Append(' ');
                    break;
                case System.Globalization.UnicodeCategory.Format:
                case System.Globalization.UnicodeCategory.NonSpacingMark when !Has(rune.Value):
                    break;
                default:
                    clean.Append(rune.IsBmp && Has(rune.Value) ? (char)rune.Value : Missing);
                    break;
            }
        }

        return clean.ToString();
    }

    private int Advance(char c) => _advances[Math.Min(_glyphs.GetValueOrDefault(c), _advances.Length - 1)];

    private static Dictionary<string, int> Tables(byte[] bytes)
    {
        var tables = new Dictionary<string, int>();
        var count = BinaryPrimitives.ReadUInt16BigEndian(bytes.AsSpan(4));
        for (var i = 0; i < count; i++)
        {
            var entry = 12 + (16 * i);
            tables[Encoding.ASCII.GetString(bytes, entry, 4)] = (int)BinaryPrimitives.ReadUInt32BigEndian(bytes.AsSpan(entry + 8));
        }

        return tables;
    }

    private Dictionary<int, ushort> Glyphs(int cmap)
    {
        var glyphs = new Dictionary<int, ushort>();
        var table = Enumerable.Range(0, U16(cmap + 2))
            .Select(i => cmap + (int)BinaryPrimitives.ReadUInt32BigEndian(Bytes.AsSpan(cmap + 8 + (8 * i))))
            .First(offset => U16(offset) == 4);
        var segments = U16(table + 6) / 2;
        int ends = table + 14, starts = ends + (2 * segments) + 2, deltas = starts + (2 * segments), ranges = deltas + (2 * segments);
        for (var s = 0; s < segments; s++)
        {
            int first = U16(starts + (2 * s)), last = U16(ends + (2 * s)), range = U16(ranges + (2 * s));
            for (var c = first; c <= last && c != 0xFFFF; c++)
            {
                var raw = range == 0 ? c : U16(ranges + (2 * s) + range + (2 * (c - first)));
                var glyph = raw == 0 && range != 0 ? 0 : (raw + U16(deltas + (2 * s))) & 0xFFFF;
                if (glyph != 0)
                {
                    glyphs[c] = (ushort)glyph;
                }
            }
        }

        return glyphs;
    }

    private ushort U16(int offset) => BinaryPrimitives.ReadUInt16BigEndian(Bytes.AsSpan(offset));
}
