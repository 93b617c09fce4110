using System.Security.Cryptography;
using System.Text;
using CoreDesign.History.Model;
using Microsoft.EntityFrameworkCore;

namespace CoreDesign.History.Steels;

/// <summary>A steel of the works as it was imported. Revision is the beginning of the payload's fingerprint.</summary>
public sealed record ImportedSteel(string Name, string Payload, string Fingerprint, DateTime ImportedAt)
{
    public string Revision => Fingerprint[..12];
}

/// <summary>How an import ended; with <see cref="NameTaken"/> nothing was stored, and <see cref="Steel"/> is what stands under that name.</summary>
public sealed record SteelImport(ImportedSteel Steel, bool NameTaken);

/// <summary>The works' own steels. Each is kept as imported; data of another content need another name.</summary>
public sealed class SteelStore(IDbContextFactory<HistoryContext> contexts, TimeProvider clock)
{
    public const int LongestName = 80;

    /// <summary>Stores a checked steel. The same name with the same content again is no conflict and adds nothing.</summary>
    public async Task<SteelImport> AddAsync(string name, string payload, CancellationToken cancel = default)
    {
        ArgumentException.ThrowIfNullOrWhiteSpace(name);
        ArgumentException.ThrowIfNullOrWhiteSpace(payload);
        if (name.Length > LongestName) throw new ArgumentException($"A steel's name has at most {LongestName} characters.", nameof(name));
        var fingerprint = Convert.ToHexStringLower(SHA256.HashData(Encoding.UTF8.GetBytes(payload)));
        if (await FindAsync(name, cancel) is { } there) return new SteelImport(there, there.Fingerprint != fingerprint);

        var row = new SteelRecord
        {
            Name = name.Trim(),
            NameKey = Key(name),
            Payload = payload,
            Fingerprint = fingerprint,
            ImportedAt = clock.GetUtcNow().UtcDateTime,
        };
        try
        {
            await using var db = await contexts.CreateDbContextAsync(cancel);
            db.Steels.Add(row);
            await db.SaveChangesAsync(cancel);
            return new SteelImport(Of(row), NameTaken: false);
        }
        catch (DbUpdateException) when (!cancel.IsCancellationRequested)
        {
            // Someone imported under this name at the same moment; the unique index let one through.
            if (await FindAsync(name, cancel) is { } first) return new SteelImport(first, first.Fingerprint != fingerprint);
            throw;
        }
    }

    public async Task<ImportedSteel?> FindAsync(string name, CancellationToken cancel = default)
    {
        ArgumentNullException.ThrowIfNull(name);
        var key = Key(name);
        await using var db = await contexts.CreateDbContextAsync(cancel);
        var row = await db.Steels.AsNoTracking().SingleOrDefaultAsync(s => s.NameKey == key, cancel);
        return row is null ? null : Of(row);
    }

    /// <summary>All of them by name.</summary>
    public async Task<IReadOnlyList<ImportedSteel>> AllAsync(CancellationToken cancel = default)
    {
        await using var db = await contexts.CreateDbContextAsync(cancel);
        return [.. (await db.Steels.AsNoTracking().OrderBy(s => s.NameKey).ToListAsync(cancel)).Select(Of)];
    }

    private static string Key(string name) => name.Trim().ToLowerInvariant();

    private static ImportedSteel Of(SteelRecord row) => new(row.Name, row.Payload, row.Fingerprint, row.ImportedAt);
}
