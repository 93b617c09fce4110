namespace CoreDesign.Sheets.Scenes;

public enum Theme
{
    Light,
    Dark,
    Paper,
}

/// <summary>
/// What each colour role is in each theme, and its variable in the page's style sheet. Text roles (Ink, Ink2, Ink3, Accent,
/// Bad) keep at least 4.5 to 1 on Paper, Surface and Sunk of their theme, Edge at least 3 to 1.
/// </summary>
public static class InkColours
{
    private static readonly Dictionary<Ink, (string Name, string Light, string Dark, string Paper)> Table = new()
    {
        [Ink.Ink] = ("ink", "#1a2024", "#e9ebe8", "#14181a"),
        [Ink.Ink2] = ("ink-2", "#485259", "#b4bcbf", "#485259"),
        [Ink.Ink3] = ("ink-3", "#626c72", "#929ca1", "#626c72"),
        [Ink.Hair] = ("hair", "#e0e1dc", "#2b3235", "#e0e1dc"),
        [Ink.Hair2] = ("hair-2", "#c4c8c6", "#444d52", "#c4c8c6"),
        [Ink.Edge] = ("edge", "#868f93", "#717b80", "#868f93"),
        [Ink.Accent] = ("accent", "#0c646e", "#66c4c9", "#0c646e"),
        [Ink.AccentSoft] = ("accent-soft", "#e1efef", "#15363a", "#e1efef"),
        [Ink.Bad] = ("bad", "#a3271b", "#ff9583", "#a3271b"),
        [Ink.Surface] = ("surface", "#ffffff", "#1a1f22", "#ffffff"),
        [Ink.Sunk] = ("sunk", "#f3f3ee", "#101416", "#f3f3ee"),
        [Ink.Paper] = ("paper", "#fbfbf8", "#14181a", "#ffffff"),
        [Ink.Share1] = ("s1", "#1d5f66", "#7fd0d3", "#1d5f66"),
        [Ink.Share2] = ("s2", "#4f8b90", "#4fa0a6", "#4f8b90"),
        [Ink.Share3] = ("s3", "#86b1b3", "#35777d", "#86b1b3"),
        [Ink.Share4] = ("s4", "#b4cfcf", "#2a565b", "#b4cfcf"),
        [Ink.Share5] = ("s5", "#d6e4e2", "#233f43", "#d6e4e2"),
        [Ink.SheetA] = ("sheet-a", "#d3d8d8", "#4b555a", "#d3d8d8"),
        [Ink.SheetB] = ("sheet-b", "#9da8aa", "#7b878c", "#9da8aa"),
        [Ink.Black] = ("black", "#000000", "#000000", "#000000"),
        [Ink.White] = ("white", "#ffffff", "#ffffff", "#ffffff"),
    };

    /// <summary>The colour of a paint; null where nothing is painted.</summary>
    public static Rgb? Of(Paint paint, Theme theme)
    {
        if (paint.Ramp is { } place)
        {
            return ReadingRamp.At(place);
        }

        if (paint.Role == Ink.None)
        {
            return null;
        }

        var row = Table[paint.Role];
        return Rgb.Parse(theme switch { Theme.Light => row.Light, Theme.Dark => row.Dark, _ => row.Paper });
    }

    /// <summary>Name of the role without its dashes in front: <c>ink-2</c> for <c>--ink-2</c>.</summary>
    public static string Name(Ink role) => role == Ink.None ? "none" : Table[role].Name;

    /// <summary>Whether the role is the same in every theme and needs no variable.</summary>
    public static bool IsFixed(Ink role) => role is Ink.Black or Ink.White;
}
