using CoreDesign.History.Model;
using Microsoft.EntityFrameworkCore;
using Microsoft.EntityFrameworkCore.Storage.ValueConversion;

namespace CoreDesign.History;

/// <summary>The tables of the history. Nothing here is particular to one database.</summary>
public sealed class HistoryContext(DbContextOptions<HistoryContext> options) : DbContext(options)
{
    public DbSet<Design> Designs => Set<Design>();
    public DbSet<Revision> Revisions => Set<Revision>();
    public DbSet<RevisionContent> Contents => Set<RevisionContent>();
    public DbSet<RevisionRemark> Remarks => Set<RevisionRemark>();
    public DbSet<SteelRecord> Steels => Set<SteelRecord>();
    public DbSet<Draft> Drafts => Set<Draft>();

    public override int SaveChanges(bool acceptAllChangesOnSuccess)
    {
        RefuseChangesOfKeptRows();
        return base.SaveChanges(acceptAllChangesOnSuccess);
    }

    public override Task<int> SaveChangesAsync(bool acceptAllChangesOnSuccess, CancellationToken cancellationToken = default)
    {
        RefuseChangesOfKeptRows();
        return base.SaveChangesAsync(acceptAllChangesOnSuccess, cancellationToken);
    }

    protected override void ConfigureConventions(ModelConfigurationBuilder configurationBuilder)
    {
        ArgumentNullException.ThrowIfNull(configurationBuilder);
        configurationBuilder.Properties<DateTime>().HaveConversion<UtcTicks>();
    }

    protected override void OnModelCreating(ModelBuilder modelBuilder)
    {
        ArgumentNullException.ThrowIfNull(modelBuilder);
        modelBuilder.Entity<Design>(design =>
        {
            design.Property(d => d.CurrentRevision).IsConcurrencyToken();
            design.HasMany(d => d.Revisions).WithOne(r => r.Design).HasForeignKey(r => r.DesignId).OnDelete(DeleteBehavior.Restrict);
        });
        modelBuilder.Entity<Revision>(revision =>
        {
            revision.HasIndex(r => new { r.DesignId, r.Number }).IsUnique();
            revision.HasIndex(r => r.CreatedAt);
            revision.HasIndex(r => r.Steel);
            revision.HasOne(r => r.Content).WithOne().HasForeignKey<RevisionContent>(c => c.RevisionId).OnDelete(DeleteBehavior.Restrict);
            revision.HasMany(r => r.Remarks).WithOne(n => n.Revision).HasForeignKey(n => n.RevisionId).OnDelete(DeleteBehavior.Restrict);
            revision.Property(r => r.Title).HasMaxLength(HistoryText.LongestTitle);
            revision.Property(r => r.Note).HasMaxLength(HistoryText.LongestNote);
            revision.Property(r => r.Author).HasMaxLength(HistoryText.LongestAuthor);
        });
        modelBuilder.Entity<RevisionContent>().HasKey(c => c.RevisionId);
        modelBuilder.Entity<RevisionRemark>().Property(n => n.Text).HasMaxLength(HistoryText.LongestNote);
        modelBuilder.Entity<SteelRecord>().HasIndex(s => s.NameKey).IsUnique();
        modelBuilder.Entity<Draft>(draft =>
        {
            draft.HasKey(d => d.Key);
            draft.HasIndex(d => d.UpdatedAt);
        });
    }

    private void RefuseChangesOfKeptRows()
    {
        foreach (var entry in ChangeTracker.Entries<IKept>())
        {
            if (entry.State is EntityState.Modified or EntityState.Deleted)
                throw new InvalidOperationException($"A stored {entry.Metadata.ClrType.Name} never changes and is never deleted; add a new one.");
        }
    }

    // SQLite has no date type: ticks sort and compare as they should in every database.
    private sealed class UtcTicks() : ValueConverter<DateTime, long>(
        time => time.ToUniversalTime().Ticks,
        ticks => new DateTime(ticks, DateTimeKind.Utc));
}
