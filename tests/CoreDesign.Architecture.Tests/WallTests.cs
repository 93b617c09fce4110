using System.Xml.Linq;

namespace CoreDesign.Architecture.Tests;

/// <summary>Dependencies run one way: Web → {Sheets, History} → Estimating → Magnetics.</summary>
public sealed class WallTests
{
    private static readonly string[] OwnProjects =
        ["CoreDesign.Magnetics", "CoreDesign.Estimating", "CoreDesign.History", "CoreDesign.Sheets", "CoreDesign.Web", "CoreDesign.Migrations.Sqlite"];

    /// <summary>What each project may lean on among our own, and which packages it may take in.</summary>
    public static TheoryData<string, string[], string[]> Walls => new()
    {
        { "CoreDesign.Magnetics", [], ["MathNet.Numerics"] },
        { "CoreDesign.Estimating", ["CoreDesign.Magnetics"], ["Sylvan.Data.Csv"] },
        { "CoreDesign.History", ["CoreDesign.Estimating"], ["Microsoft.EntityFrameworkCore.Sqlite"] },
        { "CoreDesign.Sheets", ["CoreDesign.Estimating"], ["PDFsharp"] },
    };

    // What a direct neighbour leans on in its public records may be used too, so the walls of the compiled code are wider by that.
    public static TheoryData<string, string[]> CompiledWalls => new()
    {
        { "CoreDesign.Magnetics", [] },
        { "CoreDesign.Estimating", ["CoreDesign.Magnetics"] },
        { "CoreDesign.History", ["CoreDesign.Magnetics", "CoreDesign.Estimating"] },
        { "CoreDesign.Sheets", ["CoreDesign.Magnetics", "CoreDesign.Estimating"] },
    };

    [Theory]
    [MemberData(nameof(Walls))]
    public void Project_file_names_only_allowed_neighbours_and_packages(string project, string[] neighbours, string[] packages)
    {
        var file = XDocument.Load(Repository.At("src", project, project + ".csproj"));
        var projects = file.Descendants("ProjectReference").Select(r => Path.GetFileNameWithoutExtension(r.Attribute("Include")!.Value));
        Assert.Empty(projects.Except(neighbours, StringComparer.Ordinal));
        Assert.Empty(file.Descendants("PackageReference").Select(r => r.Attribute("Include")!.Value).Except(packages, StringComparer.Ordinal));
        Assert.Empty(file.Descendants("FrameworkReference"));
    }

    [Theory]
    [MemberData(nameof(CompiledWalls))]
    public void Compiled_project_uses_only_allowed_neighbours(string project, string[] neighbours)
    {
        var used = AssemblyFacts.Of(project).Assemblies.Where(name => name.StartsWith("CoreDesign.", StringComparison.Ordinal));
        Assert.Empty(used.Except(neighbours, StringComparer.Ordinal));
    }

    [Fact]
    public void Walls_cover_every_project_under_src()
    {
        var present = Directory.GetDirectories(Repository.At("src")).Select(Path.GetFileName);
        Assert.Empty(present.Except(OwnProjects, StringComparer.Ordinal));
    }

    [Fact]
    public void Kernel_references_the_base_library_and_numerics_alone()
    {
        var foreign = AssemblyFacts.Of("CoreDesign.Magnetics").Assemblies.Where(name =>
            name is not ("netstandard" or "mscorlib" or "MathNet.Numerics") && !name.StartsWith("System.", StringComparison.Ordinal));
        Assert.Empty(foreign);
    }

    [Fact]
    public void Kernel_does_no_input_or_output() =>
        Assert.Empty(Purity.Offences(AssemblyFacts.Of("CoreDesign.Magnetics")));

    [Fact]
    public void Purity_check_finds_files_and_clocks_where_there_are_some()
    {
        // The migrations' neighbour writes files; this test assembly reads them. A check that finds neither would prove nothing.
        Assert.Contains(Purity.Offences(AssemblyFacts.Of("CoreDesign.History")), o => o.StartsWith("System.IO.", StringComparison.Ordinal));
        Assert.Contains(Purity.Offences(AssemblyFacts.Of("CoreDesign.Architecture.Tests")), o => o.StartsWith("System.IO.File", StringComparison.Ordinal));
    }

    [Fact]
    public void Estimating_and_sheets_know_no_web_and_no_database()
    {
        foreach (var project in new[] { "CoreDesign.Estimating", "CoreDesign.Sheets" })
        {
            Assert.DoesNotContain(AssemblyFacts.Of(project).Assemblies, name =>
                name.StartsWith("Microsoft.AspNetCore", StringComparison.Ordinal) || name.StartsWith("Microsoft.EntityFrameworkCore", StringComparison.Ordinal)
                || name.StartsWith("Microsoft.Data.", StringComparison.Ordinal));
        }
    }

    [Fact]
    public void Pages_and_endpoints_reach_the_database_only_through_the_history()
    {
        var web = AssemblyFacts.Of("CoreDesign.Web");
        Assert.DoesNotContain("CoreDesign.History.HistoryContext", web.Types);
        Assert.DoesNotContain(web.Types, type => type.StartsWith("Microsoft.EntityFrameworkCore.", StringComparison.Ordinal));
    }
}
