using System.Globalization;
using CoreDesign.Estimating.Contracts;

namespace CoreDesign.History;

/// <summary>The rules for texts that people type: how long, and which characters.</summary>
public static class HistoryText
{
    public const int LongestTitle = 200;
    public const int LongestNote = 4000;
    public const int LongestAuthor = 100;

    /// <summary>A title of one line, or the reason why it can't be one.</summary>
    public static FieldError? CheckTitle(string? title, string path = "title") =>
        string.IsNullOrWhiteSpace(title)
            ? new FieldError(path, "The title is empty. Give the design a name, the order's number for instance.")
            : Check(title, path, "title", LongestTitle, severalLines: false);

    /// <summary>A note may be empty and may have several lines.</summary>
    public static FieldError? CheckNote(string? note, string path = "note") =>
        Check(note ?? "", path, "note", LongestNote, severalLines: true);

    /// <summary>A remark is a note that says something.</summary>
    public static FieldError? CheckRemark(string? text, string path = "text") =>
        string.IsNullOrWhiteSpace(text)
            ? new FieldError(path, "The note is empty. Write what should be kept.")
            : CheckNote(text, path);

    internal static string ForSearch(params string[] parts) => string.Join(' ', parts).ToLowerInvariant();

    private static FieldError? Check(string text, string path, string what, int longest, bool severalLines)
    {
        if (text.Length > longest)
            return new FieldError(path, string.Create(CultureInfo.InvariantCulture, $"The {what} has {text.Length} characters; at most {longest} are kept. Shorten it."));
        return PlainText.Is(text, severalLines)
            ? null
            : new FieldError(path, string.Create(CultureInfo.InvariantCulture, $"The {what} holds control or invisible characters. Type it again as plain text, at most {longest} characters."));
    }
}
