using Microsoft.EntityFrameworkCore;

namespace CoreDesign.History.Tests;

public sealed class HistoryStartupTests
{
    [Fact]
    public async Task Second_start_on_the_same_folder_finds_what_the_first_stored()
    {
        using var first = new HistoryFile();
        var saved = await first.Designs.CreateAsync(HistoryFile.Revision("Kept over a restart"), TestContext.Current.CancellationToken);
        first.Stop();

        using var second = new HistoryFile(first.Settings.Folder);
        var found = await second.Designs.FindAsync(saved.Id, TestContext.Current.CancellationToken);

        Assert.Equal("Kept over a restart", found!.Current.Title);
    }

    [Fact]
    public void Model_has_no_change_that_a_migration_lacks()
    {
        using var history = new HistoryFile();
        using var db = history.Open();

        Assert.False(db.Database.HasPendingModelChanges());
        Assert.Empty(db.Database.GetPendingMigrations());
    }

    [Fact]
    public void Database_writes_ahead_and_holds_foreign_keys()
    {
        using var history = new HistoryFile();
        using var db = history.Open();

        Assert.Equal("wal", db.Database.SqlQueryRaw<string>("SELECT journal_mode AS Value FROM pragma_journal_mode").Single());
        Assert.Equal(1, db.Database.SqlQueryRaw<int>("SELECT foreign_keys AS Value FROM pragma_foreign_keys").Single());
    }

    [Fact]
    public void Folder_that_is_a_file_is_refused_with_its_name_and_the_setting()
    {
        var file = Path.GetTempFileName();

        var refused = Assert.Throws<HistoryUnavailableException>(() => new HistoryFile(Path.Combine(file, "below")));

        Assert.Contains(file, refused.Message, StringComparison.Ordinal);
        Assert.Contains("CoreDesign__Data", refused.Message, StringComparison.Ordinal);
        File.Delete(file);
    }

    [Fact]
    public void File_that_is_no_database_is_refused_and_left_as_it_was()
    {
        var folder = Directory.CreateTempSubdirectory("history-").FullName;
        var file = Path.Combine(folder, HistorySettings.FileName);
        var text = string.Concat(Enumerable.Repeat("this is a letter, not a database\n", 100));
        File.WriteAllText(file, text);

        var refused = Assert.Throws<HistoryUnavailableException>(() => new HistoryFile(folder));

        Assert.Contains(file, refused.Message, StringComparison.Ordinal);
        Assert.Equal(text, File.ReadAllText(file));
        Directory.Delete(folder, recursive: true);
    }

    [Fact]
    public void File_of_a_newer_version_is_refused()
    {
        using var history = new HistoryFile();
        using (var db = history.Open())
            db.Database.ExecuteSqlRaw("""INSERT INTO "__EFMigrationsHistory" VALUES ('29990101000000_FromLater', '99.0')""");
        history.Stop();

        var refused = Assert.Throws<HistoryUnavailableException>(() => new HistoryFile(history.Settings.Folder));

        Assert.Contains("FromLater", refused.Message, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Lock_left_by_a_killed_migration_does_not_hold_up_the_next_start()
    {
        using var history = new HistoryFile();
        using (var db = history.Open())
        {
            db.Database.ExecuteSqlRaw("""INSERT INTO "__EFMigrationsLock" VALUES (1, datetime('now', '-1 hour'))""");
            db.Database.ExecuteSqlRaw("""DELETE FROM "__EFMigrationsHistory" """);
            db.Database.ExecuteSqlRaw("""DROP TABLE "Remarks"; DROP TABLE "Contents"; DROP TABLE "Revisions"; DROP TABLE "Designs"; DROP TABLE "Drafts"; DROP TABLE "Steels" """);
        }

        history.Stop();

        var again = Task.Run(() => new HistoryFile(history.Settings.Folder), TestContext.Current.CancellationToken);
        using var opened = await again.WaitAsync(TimeSpan.FromSeconds(30), TestContext.Current.CancellationToken);

        Assert.Empty(opened.Open().Designs);
    }

    [Theory]
    [InlineData(null)]
    [InlineData("  ")]
    public void Without_a_setting_the_folder_is_under_the_users_data_home(string? folder)
    {
        var settings = HistorySettings.From(folder, author: null);

        Assert.Equal("CoreDesign", Path.GetFileName(settings.Folder));
        Assert.True(Path.IsPathRooted(settings.Folder));
        Assert.Equal("this desk", settings.Author);
    }
}
