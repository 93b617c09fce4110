namespace CoreDesign.Browser.Tests.Host;

/// <summary>Places in the source tree that the tests were built from.</summary>
internal static class Paths
{
    public static string Root { get; } = FindRoot();

    /// <summary>Debug or Release, as these tests were built; the service was built alike.</summary>
    public static string Configuration { get; } = new DirectoryInfo(AppContext.BaseDirectory).Parent!.Name;

    public static string At(params string[] parts) => Path.Combine([Root, .. parts]);

    /// <summary>A file under artifacts/, which nobody keeps.</summary>
    public static string Artifact(params string[] parts)
    {
        var path = At(["artifacts", .. parts]);
        Directory.CreateDirectory(Path.GetDirectoryName(path)!);
        return path;
    }

    private static string FindRoot()
    {
        var folder = new DirectoryInfo(AppContext.BaseDirectory);
        while (folder is not null && !File.Exists(Path.Combine(folder.FullName, "CoreDesign.sln"))) folder = folder.Parent;
        return folder?.FullName ?? throw new InvalidOperationException($"No CoreDesign.sln above {AppContext.BaseDirectory}.");
    }
}
