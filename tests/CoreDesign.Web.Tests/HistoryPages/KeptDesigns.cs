using System.Text.Json.Nodes;
using CoreDesign.Estimating.Contracts;
using CoreDesign.Estimating.Demo;
using CoreDesign.Estimating.Estimate;
using CoreDesign.Estimating.Steels;
using CoreDesign.History;
using CoreDesign.History.Designs;
using CoreDesign.History.Drafts;
using CoreDesign.History.Model;
using CoreDesign.History.Steels;
using CoreDesign.Web.Features.Design;
using CoreDesign.Web.Features.Steels;
using Microsoft.Data.Sqlite;
using Microsoft.EntityFrameworkCore;
using Microsoft.Extensions.DependencyInjection;
using Microsoft.Extensions.Logging.Abstractions;

namespace CoreDesign.Web.Tests.HistoryPages;

/// <summary>A history file of its own with designs solved by the real kernel, and ways to alter it behind the program's back.</summary>
internal sealed class KeptDesigns : IDisposable
{
    private static readonly Lazy<EstimateResult> Solved = new(() => EstimateDesign.Run(Order, SteelLibrary.Catalog).Value!);
    private readonly string folder = Directory.CreateTempSubdirectory("coredesign-pages-").FullName;
    private readonly ServiceProvider services;

    public KeptDesigns()
    {
        services = new ServiceCollection().AddHistory(_ => HistorySettings.From(folder, "this desk")).BuildServiceProvider();
        HistoryStartup.Apply(services);
    }

    public static DesignInput Order => DemoOrders.TryFind("village-100")!.Design;

    /// <summary>What today's kernel gives for <see cref="Order"/>.</summary>
    public static EstimateResult Estimate => Solved.Value;

    public static DesignEngine Engine { get; } = new()
    {
        Estimate = (design, cancel) => EstimateDesign.Run(design, SteelLibrary.Catalog, cancel),
        Levers = (_, _, _) => [],
        VoltageCurve = (_, _, _) => [],
        Margins = (_, _) => null,
        Steels = () => SteelLibrary.Catalog,
    };

    public DesignStore Designs => services.GetRequiredService<DesignStore>();

    public DesignList List => services.GetRequiredService<DesignList>();

    /// <summary>A shelf with the works' own steels of this file, as the service starts with.</summary>
    public SteelShelf Shelf()
    {
        var shelf = new SteelShelf(services.GetRequiredService<SteelStore>(), NullLogger<SteelShelf>.Instance);
        shelf.StartAsync(CancellationToken.None).GetAwaiter().GetResult();
        return shelf;
    }

    public HistorySettings Settings => services.GetRequiredService<HistorySettings>();

    /// <summary>Saves the order as revision 1 of a new design.</summary>
    public Task<RevisionInfo> SaveAsync(string title, EstimateResult? estimate = null, DesignInput? input = null) =>
        Designs.CreateAsync(New(title, estimate, input));

    /// <summary>Saves the order as the next revision of a design.</summary>
    public Task SaveNextAsync(RevisionInfo on) => Designs.SaveAsync(on.Id, on.Revision, New(on.Title));

    public async Task<RevisionDetail> FindAsync(RevisionInfo saved) => (await Designs.FindRevisionAsync(saved.Id, saved.Revision))!;

    public DesignSession Session() => new(Engine, Designs, services.GetRequiredService<DraftStore>(), () => { });

    /// <summary>Changes the stored study of a revision in the database file.</summary>
    public void AlterStudy(RevisionInfo revision, Action<JsonNode> change)
    {
        var row = RowOf(revision);
        var study = JsonNode.Parse((string)Ask("SELECT Study FROM Contents WHERE RevisionId = $id", ("$id", row))!)!;
        change(study["estimate"]!);
        Tell("UPDATE Contents SET Study = $study WHERE RevisionId = $id", ("$study", study.ToJsonString()), ("$id", row));
    }

    /// <summary>Changes a column that lists are read from.</summary>
    public void AlterColumn(RevisionInfo revision, string column, double value) =>
        Tell($"UPDATE Revisions SET {column} = $value WHERE Id = $id", ("$value", value), ("$id", RowOf(revision)));

    public async Task SetStateAsync(RevisionInfo revision, DesignState state)
    {
        await using var db = await services.GetRequiredService<IDbContextFactory<HistoryContext>>().CreateDbContextAsync();
        await db.Revisions.Where(r => r.DesignId == revision.Id && r.Number == revision.Revision).ExecuteUpdateAsync(r => r.SetProperty(x => x.State, state));
    }

    public void Dispose()
    {
        services.Dispose();
        SqliteConnection.ClearAllPools();
        Directory.Delete(folder, recursive: true);
    }

    private static NewRevision New(string title, EstimateResult? estimate = null, DesignInput? input = null) =>
        new(title, "", "this desk", input ?? Order, new Study { Estimate = estimate ?? Estimate, VoltageCurve = [], Levers = [] });

    private long RowOf(RevisionInfo revision) =>
        (long)Ask("SELECT Id FROM Revisions WHERE DesignId = $design AND Number = $number", ("$design", revision.Id), ("$number", revision.Revision))!;

    private object? Ask(string sql, params (string Name, object Value)[] values)
    {
        using var connection = Open();
        using var command = Command(connection, sql, values);
        return command.ExecuteScalar();
    }

    private void Tell(string sql, params (string Name, object Value)[] values)
    {
        using var connection = Open();
        using var command = Command(connection, sql, values);
        Assert.Equal(1, command.ExecuteNonQuery());
    }

    private SqliteConnection Open()
    {
        var connection = new SqliteConnection(new SqliteConnectionStringBuilder { DataSource = Settings.File }.ToString());
        connection.Open();
        return connection;
    }

    private static SqliteCommand Command(SqliteConnection connection, string sql, (string Name, object Value)[] values)
    {
        var command = connection.CreateCommand();
        command.CommandText = sql;
        foreach (var (name, value) in values)
        {
            command.Parameters.AddWithValue(name, value);
        }

        return command;
    }
}
