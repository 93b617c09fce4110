using CoreDesign.History;
using Microsoft.EntityFrameworkCore;
using Microsoft.EntityFrameworkCore.Design;

namespace CoreDesign.Migrations.Sqlite;

/// <summary>Lets the migration tool build the model; no data are touched.</summary>
public sealed class HistoryContextFactory : IDesignTimeDbContextFactory<HistoryContext>
{
    public HistoryContext CreateDbContext(string[] args)
    {
        var options = new DbContextOptionsBuilder<HistoryContext>();
        HistoryStartup.Configure(options, "design-time.db");
        return new HistoryContext(options.Options);
    }
}
