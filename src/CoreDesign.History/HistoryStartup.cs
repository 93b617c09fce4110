using CoreDesign.History.Designs;
using CoreDesign.History.Drafts;
using CoreDesign.History.Steels;
using Microsoft.Data.Sqlite;
using Microsoft.EntityFrameworkCore;
using Microsoft.Extensions.DependencyInjection;
using Microsoft.Extensions.DependencyInjection.Extensions;

namespace CoreDesign.History;

/// <summary>Brings the history up on SQLite. All that is particular to this database stands here and in its migrations.</summary>
public static class HistoryStartup
{
    public const string MigrationsAssembly = "CoreDesign.Migrations.Sqlite";

    // Another process may hold the file for a moment, a backup for one.
    private const int BusyTimeout_s = 10;

    public static IServiceCollection AddHistory(this IServiceCollection services, Func<IServiceProvider, HistorySettings> settings)
    {
        services.TryAddSingleton(TimeProvider.System);
        services.AddSingleton(settings);
        services.AddDbContextFactory<HistoryContext>((provider, options) => Configure(options, provider.GetRequiredService<HistorySettings>().File));
        services.AddSingleton<DesignStore>();
        services.AddSingleton<DesignList>();
        services.AddSingleton<DraftStore>();
        services.AddSingleton<SteelStore>();
        return services;
    }

    public static void Configure(DbContextOptionsBuilder options, string file)
    {
        ArgumentNullException.ThrowIfNull(options);
        var connection = new SqliteConnectionStringBuilder { DataSource = file, ForeignKeys = true, DefaultTimeout = BusyTimeout_s };
        options.UseSqlite(connection.ToString(), sqlite => sqlite.MigrationsAssembly(MigrationsAssembly));
    }

    /// <summary>Makes the folder and the file, brings the tables to today's form, and drops drafts that nobody touched for long.</summary>
    /// <exception cref="HistoryUnavailableException">The folder can't be written, or the file is not one that this program can work with.</exception>
    public static void Apply(IServiceProvider services)
    {
        ArgumentNullException.ThrowIfNull(services);
        var settings = services.GetRequiredService<HistorySettings>();
        RequireWritable(settings.Folder);
        using var db = services.GetRequiredService<IDbContextFactory<HistoryContext>>().CreateDbContext();
        try
        {
            RefuseNewerFile(db, settings.File);
            if (db.Database.GetPendingMigrations().Any())
            {
                DropStaleLock(db);
                db.Database.Migrate();
            }

            // Readers don't wait for a writer. The file remembers this mode.
            db.Database.ExecuteSqlRaw("PRAGMA journal_mode=WAL");
        }
        catch (SqliteException e)
        {
            throw new HistoryUnavailableException($"The history {settings.File} can't be opened: {e.Message} Restore the file from a backup, or name another folder in the setting CoreDesign__Data.", e);
        }

        var oldest = services.GetRequiredService<TimeProvider>().GetUtcNow().UtcDateTime - DraftStore.KeptFor;
        db.Drafts.Where(d => d.UpdatedAt < oldest).ExecuteDelete();
    }

    private static void RequireWritable(string folder)
    {
        try
        {
            Directory.CreateDirectory(folder);
            var probe = Path.Combine(folder, $".write-{Guid.NewGuid():N}");
            using (File.Create(probe, 1, FileOptions.DeleteOnClose))
            {
            }
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException or NotSupportedException or ArgumentException)
        {
            throw new HistoryUnavailableException($"The folder {folder} for the history can't be written: {e.Message} Give the service the right to write there, or name another folder in the setting CoreDesign__Data.", e);
        }
    }

    private static void RefuseNewerFile(HistoryContext db, string file)
    {
        var unknown = db.Database.GetAppliedMigrations().Except(db.Database.GetMigrations(), StringComparer.Ordinal).LastOrDefault();
        if (unknown is not null)
            throw new HistoryUnavailableException($"The history {file} was written by a newer version of this program (it has the change {unknown}). Start that version, or name another folder in the setting CoreDesign__Data.");
    }

    // A process killed in the middle of a migration leaves its lock behind, and the next start would wait for it without end.
    private static void DropStaleLock(HistoryContext db)
    {
        var present = db.Database.SqlQueryRaw<int>("""SELECT COUNT(*) AS "Value" FROM sqlite_master WHERE name = '__EFMigrationsLock'""").Single();
        if (present > 0) db.Database.ExecuteSqlRaw("""DELETE FROM "__EFMigrationsLock" WHERE "Timestamp" < datetime('now', '-5 minutes')""");
    }
}
