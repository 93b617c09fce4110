namespace CoreDesign.Sheets.Scenes;

/// <summary>An sRGB colour, 8 bits a channel.</summary>
public readonly record struct Rgb(byte R, byte G, byte B)
{
    public string Hex => $"#{R:x2}{G:x2}{B:x2}";

    public static Rgb Parse(string hex)
    {
        ArgumentNullException.ThrowIfNull(hex);
        var value = Convert.ToUInt32(hex.TrimStart('#'), 16);
        return new Rgb((byte)(value >> 16), (byte)(value >> 8), (byte)value);
    }

    /// <summary>Relative luminance as WCAG 2.2 defines it.</summary>
    public double Luminance => (0.2126 * Linear(R)) + (0.7152 * Linear(G)) + (0.0722 * Linear(B));

    /// <summary>Contrast ratio, 1 to 21, as WCAG 2.2 defines it.</summary>
    public double Contrast(Rgb other)
    {
        double a = Luminance, b = other.Luminance;
        return (Math.Max(a, b) + 0.05) / (Math.Min(a, b) + 0.05);
    }

    private static double Linear(byte channel)
    {
        var c = channel / 255.0;
        return c <= 0.04045 ? c / 12.92 : Math.Pow((c + 0.055) / 1.055, 2.4);
    }
}

/// <summary>
/// The colours of a reading: a line through OKLCH along which the lightness falls evenly from 0.945 to 0.44, so that it reads
/// in grey too, and the hue turns from 92° to 10°. The same in every theme and on paper; 1 is dark and means near the limit.
/// </summary>
public static class ReadingRamp
{
    public static Rgb At(double place)
    {
        var t = Math.Clamp(place, 0, 1);
        var lightness = 0.945 - (0.505 * t);
        var chroma = 0.0768 + (0.2235 * t) - (0.1746 * t * t);
        var hue = (92 - (82 * t)) * Math.PI / 180;
        return FromOklab(lightness, chroma * Math.Cos(hue), chroma * Math.Sin(hue));
    }

    /// <summary>Black or white, whichever stands out more on the ramp at this place; at least 4.5 to 1 everywhere.</summary>
    public static Ink FigureOn(double place)
    {
        var ground = At(place);
        return ground.Contrast(new Rgb(0, 0, 0)) >= ground.Contrast(new Rgb(255, 255, 255)) ? Ink.Black : Ink.White;
    }

    // Oklab to linear sRGB: B. Ottosson, "A perceptual color space for image processing", 2020, also CSS Color 4.
    private static Rgb FromOklab(double lightness, double a, double b)
    {
        var l = Cube(lightness + (0.3963377774 * a) + (0.2158037573 * b));
        var m = Cube(lightness - (0.1055613458 * a) - (0.0638541728 * b));
        var s = Cube(lightness - (0.0894841775 * a) - (1.2914855480 * b));
        return new Rgb(
            Channel((4.0767416621 * l) - (3.3077115913 * m) + (0.2309699292 * s)),
            Channel((-1.2684380046 * l) + (2.6097574011 * m) - (0.3413193965 * s)),
            Channel((-0.0041960863 * l) - (0.7034186147 * m) + (1.7076147010 * s)));
    }

    private static double Cube(double x) => x * x * x;

    private static byte Channel(double linear)
    {
        var c = linear <= 0.0031308 ? 12.92 * linear : (1.055 * Math.Pow(linear, 1 / 2.4)) - 0.055;
        return (byte)Math.Round(Math.Clamp(c, 0, 1) * 255);
    }
}
