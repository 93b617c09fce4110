namespace CoreDesign.Architecture.Tests;

/// <summary>The source tree that these tests were built from.</summary>
internal static class Repository
{
    private static readonly string[] Unkept = ["bin", "obj", "artifacts", "TestResults", "node_modules", "BenchmarkDotNet.Artifacts"];

    public static string Root { get; } = FindRoot();

    public static string At(params string[] parts) => Path.Combine([Root, .. parts]);

    /// <summary>Paths below a folder, relative to the root, without build output; only those with one of the endings where any is given.</summary>
    public static IEnumerable<string> Files(string folder, params string[] endings) =>
        Directory.EnumerateFiles(At(folder), "*", SearchOption.AllDirectories)
            .Select(file => Path.GetRelativePath(Root, file).Replace('\\', '/'))
            .Where(file => !file.Split('/').Intersect(Unkept, StringComparer.Ordinal).Any())
            .Where(file => endings.Length == 0 || endings.Contains(Path.GetExtension(file), StringComparer.Ordinal));

    private static string FindRoot()
    {
        var folder = new DirectoryInfo(AppContext.BaseDirectory);
        while (folder is not null && !File.Exists(Path.Combine(folder.FullName, "CoreDesign.sln"))) folder = folder.Parent;
        return folder?.FullName ?? throw new InvalidOperationException($"No CoreDesign.sln above {AppContext.BaseDirectory}; run the tests from the build output inside the source tree.");
    }
}
