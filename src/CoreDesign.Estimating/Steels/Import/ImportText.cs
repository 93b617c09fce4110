using System.Text;
using CoreDesign.Estimating.Steels.Checks;

namespace CoreDesign.Estimating.Steels.Import;

/// <summary>Bytes to text: UTF-8 with or without mark, UTF-16 with mark, else Latin-1 with a warning. Binary content is refused.</summary>
internal static class ImportText
{
    private static readonly Spot File = new(0, "The file", "");
    private static readonly UTF8Encoding StrictUtf8 = new(encoderShouldEmitUTF8Identifier: false, throwOnInvalidBytes: true);

    public static (string Text, string Encoding)? Decode(ReadOnlySpan<byte> bytes, Findings findings)
    {
        if (bytes.Length > SteelImport.MaxBytes)
        {
            findings.Error(File, null, $"has more than {SteelImport.MaxBytes} bytes; a certificate needs a few hundred lines. Leave other data out.");
            return null;
        }

        if (bytes.StartsWith("PK"u8) || bytes.StartsWith("%PDF"u8))
        {
            findings.Error(File, null, "is a workbook, archive or PDF, not text; save the table as CSV and import that.");
            return null;
        }

        var (text, encoding) = Text(bytes, findings);
        return Refused(text, findings) ? null : (text, encoding);
    }

    /// <summary>True, with an error, for content that is no text.</summary>
    public static bool Refused(string text, Findings findings)
    {
        var line = 1;
        foreach (var c in text)
        {
            line += c == '\n' ? 1 : 0;
            if (char.IsControl(c) && c is not ('\t' or '\r' or '\n'))
            {
                findings.Error(new Spot(line, "The file", ""), null, FormattableString.Invariant(
                    $"holds the control character U+{(int)c:X4}, so it is binary or in an encoding without its mark; save it as CSV, UTF-8."));
                return true;
            }
        }

        if (string.IsNullOrWhiteSpace(text))
        {
            findings.Error(File, null, "is empty; start from the template.");
            return true;
        }

        return false;
    }

    private static (string Text, string Encoding) Text(ReadOnlySpan<byte> bytes, Findings findings)
    {
        if (bytes.StartsWith((ReadOnlySpan<byte>)[0xEF, 0xBB, 0xBF]))
        {
            bytes = bytes[3..];
        }
        else if (bytes.StartsWith((ReadOnlySpan<byte>)[0xFF, 0xFE]))
        {
            return (Encoding.Unicode.GetString(bytes[2..]), "UTF-16");
        }
        else if (bytes.StartsWith((ReadOnlySpan<byte>)[0xFE, 0xFF]))
        {
            return (Encoding.BigEndianUnicode.GetString(bytes[2..]), "UTF-16");
        }

        try
        {
            return (StrictUtf8.GetString(bytes), "UTF-8");
        }
        catch (DecoderFallbackException)
        {
            findings.Warning(File, null, "is not UTF-8 and was read as Latin-1; check the name for odd letters, or save it as CSV, UTF-8.");
            return (Encoding.Latin1.GetString(bytes), "Latin-1");
        }
    }
}
