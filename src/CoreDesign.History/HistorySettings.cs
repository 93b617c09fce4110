namespace CoreDesign.History;

/// <summary>Where the history lies, and under which name it is written while there are no accounts.</summary>
public sealed record HistorySettings(string Folder, string Author)
{
    public const string DefaultAuthor = "this desk";
    public const string FileName = "coredesign.db";

    public string File => Path.Combine(Folder, FileName);

    /// <param name="folder">The setting <c>CoreDesign:Data</c>; without it, a folder under the user's data home.</param>
    /// <param name="author">The setting <c>CoreDesign:Author</c>; "this desk" without it.</param>
    /// <exception cref="HistoryUnavailableException">No folder is given and the user has no data home.</exception>
    public static HistorySettings From(string? folder, string? author)
    {
        if (string.IsNullOrWhiteSpace(folder))
        {
            var home = Environment.GetFolderPath(Environment.SpecialFolder.LocalApplicationData, Environment.SpecialFolderOption.DoNotVerify);
            if (home.Length == 0)
                throw new HistoryUnavailableException("This user has no data home. Name a folder for the history in the setting CoreDesign__Data.");
            folder = Path.Combine(home, "CoreDesign");
        }

        return new HistorySettings(Path.GetFullPath(folder), string.IsNullOrWhiteSpace(author) ? DefaultAuthor : author.Trim());
    }
}

/// <summary>The history can't be opened. The message is meant for the person who starts the service.</summary>
public sealed class HistoryUnavailableException(string message, Exception? inner = null) : Exception(message, inner);
