using CoreDesign.Estimating.Contracts;
using CoreDesign.History.Designs;
using CoreDesign.Sheets.Tests;
using Microsoft.Data.Sqlite;
using Microsoft.EntityFrameworkCore;
using Microsoft.Extensions.DependencyInjection;

namespace CoreDesign.History.Tests;

/// <summary>A history of its own on a fresh SQLite file, gone with the test.</summary>
internal sealed class HistoryFile : IDisposable
{
    private readonly ServiceProvider _services;

    public HistoryFile(string? folder = null)
    {
        Settings = new HistorySettings(folder ?? Directory.CreateTempSubdirectory("history-").FullName, "this desk");
        _services = new ServiceCollection()
            .AddSingleton<TimeProvider>(Clock)
            .AddHistory(_ => Settings)
            .BuildServiceProvider();
        HistoryStartup.Apply(_services);
    }

    public HistorySettings Settings { get; }
    public SetClock Clock { get; } = new();
    public T Get<T>()
        where T : class => _services.GetRequiredService<T>();

    public DesignStore Designs => Get<DesignStore>();
    public HistoryContext Open() => Get<IDbContextFactory<HistoryContext>>().CreateDbContext();

    /// <summary>Stops as a service stops; the file stays.</summary>
    public void Stop()
    {
        _services.Dispose();
        SqliteConnection.ClearAllPools();
    }

    public void Dispose()
    {
        Stop();
        if (Directory.Exists(Settings.Folder)) Directory.Delete(Settings.Folder, recursive: true);
    }

    public static NewRevision Revision(string title = "Station transformer", string note = "", Func<EstimateResult, EstimateResult>? change = null, string author = "this desk")
    {
        var study = StudyFixture.ThreeLimb();
        if (change is not null) study = study with { Estimate = change(study.Estimate) };
        return new NewRevision(title, note, author, study.Estimate.Inputs, study);
    }
}

/// <summary>A clock that tests set by hand; each reading is a second later than the one before.</summary>
internal sealed class SetClock : TimeProvider
{
    public DateTimeOffset Now { get; set; } = new(2026, 3, 1, 8, 0, 0, TimeSpan.Zero);

    public override DateTimeOffset GetUtcNow() => Now = Now.AddSeconds(1);
}
