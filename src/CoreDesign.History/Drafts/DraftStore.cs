using System.Text;
using CoreDesign.History.Model;
using Microsoft.EntityFrameworkCore;

namespace CoreDesign.History.Drafts;

/// <summary>The half-filled design pages.</summary>
public sealed class DraftStore(IDbContextFactory<HistoryContext> contexts, TimeProvider clock)
{
    public const int LargestPayload_bytes = 256 * 1024;
    public static readonly TimeSpan KeptFor = TimeSpan.FromDays(90);

    public static bool Fits(string payload) => Encoding.UTF8.GetByteCount(payload) <= LargestPayload_bytes;

    public async Task<Draft?> FindAsync(Guid key, CancellationToken cancel = default)
    {
        await using var db = await contexts.CreateDbContextAsync(cancel);
        return await db.Drafts.AsNoTracking().SingleOrDefaultAsync(d => d.Key == key, cancel);
    }

    /// <summary>Puts the page's state in the place of what was there under this key.</summary>
    /// <exception cref="ArgumentException">The payload is larger than <see cref="LargestPayload_bytes"/>.</exception>
    public async Task<Draft> PutAsync(Guid key, string payload, long? designId = null, int? baseRevision = null, CancellationToken cancel = default)
    {
        ArgumentNullException.ThrowIfNull(payload);
        if (!Fits(payload)) throw new ArgumentException($"A draft may have at most {LargestPayload_bytes / 1024} KiB.", nameof(payload));
        try
        {
            return await PutOnceAsync(key, payload, designId, baseRevision, cancel);
        }
        catch (DbUpdateException) when (!cancel.IsCancellationRequested)
        {
            // The same page in a second tab put the first state of this key at the same moment: now it is there.
            return await PutOnceAsync(key, payload, designId, baseRevision, cancel);
        }
    }

    /// <summary>Once a page is saved as a revision its draft has done its work. Nothing happens when there is none.</summary>
    public async Task RemoveAsync(Guid key, CancellationToken cancel = default)
    {
        await using var db = await contexts.CreateDbContextAsync(cancel);
        await db.Drafts.Where(d => d.Key == key).ExecuteDeleteAsync(cancel);
    }

    private async Task<Draft> PutOnceAsync(Guid key, string payload, long? designId, int? baseRevision, CancellationToken cancel)
    {
        await using var db = await contexts.CreateDbContextAsync(cancel);
        var draft = await db.Drafts.SingleOrDefaultAsync(d => d.Key == key, cancel);
        if (draft is null)
        {
            draft = new Draft { Key = key, Payload = payload, UpdatedAt = clock.GetUtcNow().UtcDateTime };
            db.Drafts.Add(draft);
        }

        draft.Payload = payload;
        draft.DesignId = designId;
        draft.BaseRevision = baseRevision;
        draft.UpdatedAt = clock.GetUtcNow().UtcDateTime;
        await db.SaveChangesAsync(cancel);
        return draft;
    }
}
