using PdfSharp.Drawing;
using PdfSharp.Fonts;
using PdfSharp.Pdf;

namespace CoreDesign.Sheets.Pdf;

/// <summary>A cut of the sheet's one family.</summary>
internal enum Cut
{
    Regular,
    Bold,
    Italic,
}

/// <summary>The three embedded faces and their fonts; registered with the PDF library once for the whole process.</summary>
internal static class SheetFonts
{
    private const string Family = "IBM Plex Sans";
    private static readonly FontFace[] Faces = [Load("IBMPlexSans-Regular"), Load("IBMPlexSans-SemiBold"), Load("IBMPlexSans-Italic")];
    private static readonly Lazy<bool> Registered = new(() =>
    {
        GlobalFontSettings.FontResolver = new Resolver();
        return true;
    });

    public static FontFace Face(Cut cut) => Faces[(int)cut];

    public static XFont Font(Cut cut, double size)
    {
        _ = Registered.Value;
        var style = cut switch
        {
            Cut.Bold => XFontStyleEx.Bold,
            Cut.Italic => XFontStyleEx.Italic,
            _ => XFontStyleEx.Regular,
        };
        return new XFont(Family, size, style, new XPdfFontOptions(PdfFontEncoding.Unicode));
    }

    private static FontFace Load(string name)
    {
        using var stream = typeof(SheetFonts).Assembly.GetManifestResourceStream(name)
            ?? throw new InvalidOperationException($"The font {name} is not embedded in this assembly.");
        using var copy = new MemoryStream();
        stream.CopyTo(copy);
        return new FontFace(name, copy.ToArray());
    }

    private sealed class Resolver : IFontResolver
    {
        public FontResolverInfo ResolveTypeface(string familyName, bool isBold, bool isItalic) =>
            new(Face(isBold ? Cut.Bold : isItalic ? Cut.Italic : Cut.Regular).Name);

        public byte[] GetFont(string faceName) => Faces.First(f => f.Name == faceName).Bytes;
    }
}
