using CoreDesign.Sheets.Scenes;

namespace CoreDesign.Sheets.Svg;

public sealed record SvgOptions
{
    /// <summary>Prefix of the ids in this picture, unlike any other on the same page; letters, digits and dashes.</summary>
    public string Id { get; init; } = "scene";

    /// <summary>Class of the root element beside <c>scene</c>.</summary>
    public string Class { get; init; } = "";

    /// <summary>A file of its own: literal colours of <see cref="Theme"/>, ground and font family inside, no page style sheet needed.</summary>
    public bool Standalone { get; init; }

    public Theme Theme { get; init; } = Theme.Light;

    /// <summary>Leave out when the text around the picture already says it; the picture is then hidden from screen readers.</summary>
    public bool Decorative { get; init; }
}
