namespace CoreDesign.Sheets.Scenes;

/// <summary>
/// A drawing or chart as a display list: defined once, painted as SVG on the page and as vectors in the PDF.
/// Coordinates run right and down from the top left; the unit is whatever the painter scales to (px on the page, pt on paper).
/// </summary>
public sealed record Scene(double Width, double Height, string Title, string Description, IReadOnlyList<Mark> Marks);

/// <summary>Colour by role, never by value, so that light, dark and paper each have their own.</summary>
public enum Ink
{
    None,
    Ink,
    Ink2,
    Ink3,
    Hair,
    Hair2,
    Edge,
    Accent,
    Bad,
    Surface,
    Sunk,
    Share1,
    Share2,
    Share3,
    Share4,
    Share5,

    /// <summary>Ground that lies behind lit things.</summary>
    AccentSoft,

    /// <summary>The page behind the drawing, for haloes and knock-outs.</summary>
    Paper,

    /// <summary>The two sides of a drawn joint book.</summary>
    SheetA,
    SheetB,

    /// <summary>Black and white in every theme: figures and joint lines that stand on the ramp, which is the same everywhere.</summary>
    Black,
    White,
}

/// <summary>A paint: a role, or a place 0..1 on the reading ramp (<see cref="Ramp"/> set), dark = nearer the limit.</summary>
public readonly record struct Paint(Ink Role, double? Ramp = null)
{
    public static readonly Paint None = new(Ink.None);

    public static Paint OnRamp(double place) => new(Ink.None, Math.Clamp(place, 0, 1));

    public static implicit operator Paint(Ink role) => new(role);
}

public enum Anchor
{
    Start,
    Middle,
    End,
}

/// <summary>One thing on a scene. <see cref="FieldKey"/> ties a dimension to its input field; <see cref="Label"/> is its text alternative.</summary>
public abstract record Mark
{
    public string? FieldKey { get; init; }
    public string? Label { get; init; }

    /// <summary>What the mark is within its group, as a short class for the page's style sheet: <c>dl</c> dimension line, <c>ex</c> extension line, <c>ar</c> arrow, <c>dt</c> dimension text.</summary>
    public string? Part { get; init; }
}

public readonly record struct XY(double X, double Y);

public sealed record PathMark(IReadOnlyList<XY> Points, bool Closed, Paint Fill, Paint Stroke, double StrokeWidth = 1, IReadOnlyList<double>? Dash = null) : Mark;

public sealed record CircleMark(XY Centre, double Radius, Paint Fill, Paint Stroke, double StrokeWidth = 1, IReadOnlyList<double>? Dash = null) : Mark;

/// <summary>Text on one line; angle in degrees, counter-clockwise reading from the bottom is 90.</summary>
public sealed record TextMark(XY At, string Text, double Size, Anchor Anchor, Paint Fill, bool Bold = false, bool Italic = false, double Angle = 0) : Mark;

/// <summary>Marks that belong together, e.g. a dimension line with its arrows and figure.</summary>
public sealed record GroupMark(IReadOnlyList<Mark> Marks) : Mark
{
    /// <summary>Line along which the group can be pressed; painted 24 px wide and clear on the page, left out on paper.</summary>
    public IReadOnlyList<XY>? Hit { get; init; }
}
