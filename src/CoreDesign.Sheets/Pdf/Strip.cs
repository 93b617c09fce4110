using PdfSharp.UniversalAccessibility;

namespace CoreDesign.Sheets.Pdf;

/// <summary>
/// The smallest piece of a sheet that never breaks: a row, a line of text, a figure. <paramref name="Paint"/> draws it with its
/// top left at the given point.
/// </summary>
internal sealed record Strip(double Height, Action<SheetCanvas, double, double> Paint)
{
    /// <summary>Space above; dropped at the top of a page.</summary>
    public double Gap { get; init; }

    /// <summary>Never the last of a page.</summary>
    public bool KeepWithNext { get; init; }

    /// <summary>The table or list that the strip is a part of.</summary>
    public StripGroup? Group { get; init; }

    /// <summary>Name under which the strip stands among the bookmarks.</summary>
    public string? Bookmark { get; init; }
}

/// <summary>Strips under one structure tag; <paramref name="Head"/> stands first and again on each page that they reach.</summary>
internal sealed record StripGroup(PdfBlockLevelElementTag Tag, Strip? Head);

/// <summary>A part of a sheet that can say of which strips it consists at a given width.</summary>
internal abstract record Block
{
    public abstract IEnumerable<Strip> Strips(double width);
}

/// <summary>Strips set at their places on one page.</summary>
internal sealed record PlacedStrip(Strip Strip, double X, double Y);
