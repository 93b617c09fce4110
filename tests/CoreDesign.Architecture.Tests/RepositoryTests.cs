namespace CoreDesign.Architecture.Tests;

/// <summary>Rules of the source tree that no compiler holds.</summary>
public sealed class RepositoryTests
{
    private const int LongestFile = 300;
    private const int LongestReadme = 15;

    private static readonly string[] TopLevel =
    [
        "README.md", "DEVELOPERS.md", "CoreDesign.sln", "Directory.Build.props", "Directory.Packages.props", "global.json", "dotnet-tools.json",
        "src", "tests", "wwwroot-assets", "db-migrations", "docker",
    ];

    // Left by builds, tests and editors, and kept out of the repository.
    private static readonly string[] Unkept = ["artifacts", "TestResults", "BenchmarkDotNet.Artifacts"];

    [Fact]
    public void Top_level_holds_only_what_belongs_there()
    {
        var entries = Directory.EnumerateFileSystemEntries(Repository.Root).Select(entry => Path.GetFileName(entry))
            .Where(name => !name.StartsWith('.') && !Unkept.Contains(name, StringComparer.Ordinal));
        Assert.Equal(TopLevel.Order(StringComparer.Ordinal), entries.Order(StringComparer.Ordinal));
    }

    [Fact]
    public void Source_files_are_short()
    {
        var tooLong = Repository.Files("src", ".cs", ".razor", ".css").Select(file => (file, lines: Lines(file)))
            .Where(entry => entry.lines > LongestFile).Select(entry => $"{entry.file}: {entry.lines} lines, at most {LongestFile}; ask whether two ideas live there");
        Assert.Empty(tooLong);
    }

    [Fact]
    public void Every_project_under_src_has_a_short_readme()
    {
        foreach (var project in Directory.GetDirectories(Repository.At("src")).Select(folder => Path.GetFileName(folder)))
        {
            var readme = Repository.At("src", project, "README.md");
            Assert.True(File.Exists(readme), $"src/{project}/README.md is missing: say what belongs there and what does not");
            Assert.InRange(File.ReadLines(readme).Count(), 2, LongestReadme);
        }
    }

    [Theory]
    [InlineData("TO" + "DO")]
    [InlineData("FIX" + "ME")]
    [InlineData("HA" + "CK:")]
    [InlineData("NotImplemented" + "Exception")]
    [InlineData("lorem" + " ipsum")]
    public void Nothing_is_left_half_done(string word)
    {
        var found = new[] { "src", "tests", "wwwroot-assets", "db-migrations", "docker", ".ci" }
            .SelectMany(folder => Repository.Files(folder, ".cs", ".razor", ".css", ".js", ".md", ".yml", ".csproj", ".props", "")).Concat(["README.md", "DEVELOPERS.md"])
            .Where(file => File.ReadAllText(Repository.At(file)).Contains(word, StringComparison.Ordinal));
        Assert.Empty(found);
    }

    [Fact]
    public void Every_data_file_says_where_it_comes_from()
    {
        var silent = Repository.Files("src", ".csv", ".json").Concat(Repository.Files("tests", ".csv", ".json"))
            .Where(file => file.Contains("/Data/", StringComparison.Ordinal) || file.Contains("/Reference/", StringComparison.Ordinal))
            .Where(file => !File.ReadLines(Repository.At(file)).FirstOrDefault("").StartsWith('#'))
            .Where(file => !File.Exists(Repository.At(Path.GetDirectoryName(file)!, "ORIGIN.md")));
        Assert.Empty(silent);
    }

    [Fact]
    public void No_warning_is_switched_off_in_code()
    {
        var found = Repository.Files("src", ".cs", ".razor").Where(file => File.ReadLines(Repository.At(file))
            .Any(line => line.TrimStart().StartsWith("#pragma warning", StringComparison.Ordinal)));
        Assert.Empty(found);
    }

    private static int Lines(string file) => File.ReadLines(Repository.At(file)).Count();
}
