using System.Globalization;
using System.IO.Compression;
using System.Security.Cryptography;
using System.Text;
using System.Text.RegularExpressions;

namespace CoreDesign.Sheets.Pdf;

/// <summary>
/// Makes a saved file the same each time and small: random subset tags and identifiers are replaced by ones that follow from
/// the content, streams are deflated, and the many small objects go into one object stream (ISO 32000-1, 7.5.7 and 7.5.8).
/// </summary>
internal static class PdfFinish
{
    private static readonly Regex SubsetTag = new("/(?<tag>[A-Z]{6})\\+", RegexOptions.NonBacktracking | RegexOptions.ExplicitCapture);
    private static readonly Regex LengthEntry = new("/Length [0-9]+", RegexOptions.NonBacktracking);

    public static byte[] Run(byte[] saved, Xmp metadata)
    {
        var raw = RawPdf.Read(saved);
        var tags = new Dictionary<string, string>();
        var objects = raw.Objects.Select(o => Plain(o, tags)).ToList();
        var hash = Hash(objects);
        var packet = Encoding.UTF8.GetBytes(metadata.Packet(new Guid(hash).ToString()));
        objects = [.. objects.Select(o => IsMetadata(o) ? WithLength(o with { Stream = packet }, "") : Deflated(o))];
        return Write(objects, raw, Convert.ToHexString(hash));
    }

    /// <summary>The object without anything random in it.</summary>
    private static RawObject Plain(RawObject o, Dictionary<string, string> tags) => o switch
    {
        _ when IsMetadata(o) => o with { Stream = [] },
        _ when o.Head.StartsWith("<</Type/Font", StringComparison.Ordinal) => o with { Head = SubsetTag.Replace(o.Head, m => "/" + Tag(m.Groups["tag"].Value, tags) + "+") },
        _ => o,
    };

    private static string Tag(string random, Dictionary<string, string> tags)
    {
        if (!tags.TryGetValue(random, out var tag))
        {
            tag = "CDSHE" + (char)('A' + tags.Count);
            tags.Add(random, tag);
        }

        return tag;
    }

    private static byte[] Hash(IEnumerable<RawObject> objects)
    {
        using var sha = IncrementalHash.CreateHash(HashAlgorithmName.SHA256);
        foreach (var o in objects)
        {
            sha.AppendData(Encoding.Latin1.GetBytes(o.Head));
            sha.AppendData(o.Stream ?? []);
        }

        return sha.GetHashAndReset()[..16];
    }

    private static RawObject Deflated(RawObject o)
    {
        if (o.Stream is null || o.Head.Contains("/Filter", StringComparison.Ordinal))
        {
            return o;
        }

        return WithLength(o with { Stream = Deflate(o.Stream) }, "/Filter/FlateDecode");
    }

    private static RawObject WithLength(RawObject o, string filter) =>
        o with { Head = LengthEntry.Replace(o.Head, string.Create(CultureInfo.InvariantCulture, $"/Length {o.Stream!.Length}{filter}")) };

    private static byte[] Deflate(byte[] data)
    {
        using var packed = new MemoryStream();
        using (var zlib = new ZLibStream(packed, CompressionLevel.Optimal))
        {
            zlib.Write(data);
        }

        return packed.ToArray();
    }

    private static byte[] Write(List<RawObject> objects, RawPdf raw, string id)
    {
        using var file = new MemoryStream();
        file.Write("%PDF-1.7\n%"u8);
        file.Write([0xD3, 0xF4, 0xCC, 0xE1, (byte)'\n']);
        var container = objects.Max(o => o.Number) + 1;
        var places = new SortedDictionary<int, (byte Kind, long Place, int Index)> { [0] = (0, 0, 65535) };
        foreach (var o in objects.Where(o => o.Stream is not null))
        {
            Put(o);
        }

        var small = objects.Where(o => o.Stream is null).ToList();
        for (var i = 0; i < small.Count; i++)
        {
            places[small[i].Number] = (2, container, i);
        }

        Put(Container(container, small));
        places[container + 1] = (1, file.Position, 0);
        var start = file.Position;
        Emit(CrossReferences(container + 1, places, $"/Root {raw.Root}/Info {raw.Info}/ID[<{id}><{id}>]"));
        file.Write(Encoding.ASCII.GetBytes($"startxref\n{start.ToString(CultureInfo.InvariantCulture)}\n%%EOF\n"));
        return file.ToArray();

        void Put(RawObject o)
        {
            places[o.Number] = (1, file.Position, 0);
            Emit(o);
        }

        void Emit(RawObject o)
        {
            file.Write(Encoding.Latin1.GetBytes($"{o.Number.ToString(CultureInfo.InvariantCulture)} 0 obj\n{o.Head}\nstream\n"));
            file.Write(o.Stream);
            file.Write("\nendstream\nendobj\n"u8);
        }
    }

    private static RawObject Container(int number, List<RawObject> small)
    {
        var index = new StringBuilder();
        var bodies = new StringBuilder();
        foreach (var o in small)
        {
            index.Append(CultureInfo.InvariantCulture, $"{o.Number} {bodies.Length} ");
            bodies.Append(o.Head).Append('\n');
        }

        var data = Deflate(Encoding.Latin1.GetBytes(index.Append(bodies).ToString()));
        var first = index.Length - bodies.Length;
        return new RawObject(number, string.Create(CultureInfo.InvariantCulture, $"<</Type/ObjStm/N {small.Count}/First {first}/Length {data.Length}/Filter/FlateDecode>>"), data);
    }

    private static RawObject CrossReferences(int number, SortedDictionary<int, (byte Kind, long Place, int Index)> places, string entries)
    {
        var table = new byte[(number + 1) * 7];
        foreach (var (key, (kind, place, index)) in places)
        {
            var row = table.AsSpan(key * 7, 7);
            row[0] = kind;
            System.Buffers.Binary.BinaryPrimitives.WriteUInt32BigEndian(row[1..], (uint)place);
            System.Buffers.Binary.BinaryPrimitives.WriteUInt16BigEndian(row[5..], (ushort)index);
        }

        var data = Deflate(table);
        return new RawObject(number, string.Create(CultureInfo.InvariantCulture, $"<</Type/XRef/Size {number + 1}/W[1 4 2]{entries}/Length {data.Length}/Filter/FlateDecode>>"), data);
    }

    private static bool IsMetadata(RawObject o) => o.Stream is not null && o.Head.Contains("/Type/Metadata", StringComparison.Ordinal);
}
