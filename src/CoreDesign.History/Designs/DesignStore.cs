using System.Globalization;
using CoreDesign.Estimating.Contracts;
using CoreDesign.History.Model;
using Microsoft.EntityFrameworkCore;

namespace CoreDesign.History.Designs;

/// <summary>
/// Keeps designs and their revisions. It stores what the use case computed and computes nothing; a save either adds a
/// whole revision or changes nothing.
/// </summary>
public sealed class DesignStore(IDbContextFactory<HistoryContext> contexts, TimeProvider clock)
{
    /// <summary>A new design with its revision 1.</summary>
    public async Task<RevisionInfo> CreateAsync(NewRevision first, CancellationToken cancel = default)
    {
        ArgumentNullException.ThrowIfNull(first);
        await using var db = await contexts.CreateDbContextAsync(cancel);
        return await AddDesignAsync(db, RevisionRow.From(first, number: 1, Now), cancel);
    }

    /// <summary>
    /// The next revision of a design, if <paramref name="expectedRevision"/> is still the newest; else a conflict that carries
    /// what stands there now.
    /// </summary>
    public async Task<SaveResult> SaveAsync(long designId, int expectedRevision, NewRevision next, CancellationToken cancel = default)
    {
        ArgumentNullException.ThrowIfNull(next);
        await using (var db = await contexts.CreateDbContextAsync(cancel))
        {
            var design = await db.Designs.SingleOrDefaultAsync(d => d.Id == designId, cancel);
            if (design is null) return new SaveResult.NoSuchDesign();
            if (design.CurrentRevision == expectedRevision)
            {
                var row = RevisionRow.From(next, expectedRevision + 1, Now);
                design.CurrentRevision = row.Number;
                design.Revisions.Add(row);
                try
                {
                    await db.SaveChangesAsync(cancel);
                    return new SaveResult.Saved(RevisionInfo.Of(row));
                }
                catch (DbUpdateException) when (!cancel.IsCancellationRequested)
                {
                    // Either the concurrency check or the unique index of (design, number) can meet the other save
                    // first, and the databases tell them apart in their own ways. What stands there now decides.
                    if (await CurrentRevisionAsync(designId, cancel) == expectedRevision) throw;
                }
            }
        }

        return new SaveResult.Conflict(await CurrentAsync(designId, cancel));
    }

    /// <summary>A design with all its revisions, or null.</summary>
    public async Task<DesignDetail?> FindAsync(long designId, CancellationToken cancel = default)
    {
        await using var db = await contexts.CreateDbContextAsync(cancel);
        var design = await db.Designs.AsNoTracking().SingleOrDefaultAsync(d => d.Id == designId, cancel);
        if (design is null) return null;
        var revisions = await db.Revisions.Where(r => r.DesignId == designId).OrderByDescending(r => r.Number).Select(RevisionInfo.FromRow).ToListAsync(cancel);
        return new DesignDetail(design.Id, design.CreatedAt, revisions.First(r => r.Revision == design.CurrentRevision), revisions);
    }

    /// <summary>One revision whole, or null.</summary>
    public async Task<RevisionDetail?> FindRevisionAsync(long designId, int number, CancellationToken cancel = default)
    {
        await using var db = await contexts.CreateDbContextAsync(cancel);
        var row = await db.Revisions.AsNoTracking().Include(r => r.Content).Include(r => r.Remarks)
            .SingleOrDefaultAsync(r => r.DesignId == designId && r.Number == number, cancel);
        return row is null
            ? null
            : new RevisionDetail(
                RevisionInfo.Of(row),
                DesignJson.ReadStored<DesignInput>(row.Content!.Input),
                DesignJson.ReadStored<Study>(row.Content.Study),
                [.. row.Remarks.OrderBy(n => n.Id).Select(n => new Remark(n.At, n.Author, n.Text))]);
    }

    /// <summary>
    /// A new design that begins with this revision, figures and kernel version as they were; null when there is no such
    /// revision.
    /// </summary>
    public async Task<RevisionInfo?> CopyAsync(long designId, int number, string author, string? title = null, CancellationToken cancel = default)
    {
        var from = await FindRevisionAsync(designId, number, cancel);
        if (from is null) return null;
        var note = string.Create(CultureInfo.InvariantCulture, $"Copy of design {designId}, revision {number}: {from.Info.Title}");
        var copy = RevisionRow.From(new NewRevision(title ?? from.Info.Title, note, author, from.Input, from.Study), number: 1, Now);
        await using var db = await contexts.CreateDbContextAsync(cancel);

        // The text itself is taken over, so that the copy holds what was stored and not what today's contract reads in it.
        var stored = await db.Contents.AsNoTracking().SingleAsync(c => db.Revisions.Any(r => r.Id == c.RevisionId && r.DesignId == designId && r.Number == number), cancel);
        copy.Content = new RevisionContent { Input = stored.Input, Study = stored.Study };
        return await AddDesignAsync(db, copy, cancel);
    }

    /// <summary>Adds a remark to a revision, which itself stays as it is; null when there is no such revision.</summary>
    public async Task<Remark?> AddRemarkAsync(long designId, int number, string text, string author, CancellationToken cancel = default)
    {
        ArgumentNullException.ThrowIfNull(text);
        await using var db = await contexts.CreateDbContextAsync(cancel);
        var revisionId = await db.Revisions.Where(r => r.DesignId == designId && r.Number == number).Select(r => (long?)r.Id).SingleOrDefaultAsync(cancel);
        if (revisionId is null) return null;
        var row = new RevisionRemark { RevisionId = revisionId.Value, At = Now, Author = author, Text = text, SearchText = HistoryText.ForSearch(text, author) };
        db.Remarks.Add(row);
        await db.SaveChangesAsync(cancel);
        return new Remark(row.At, row.Author, row.Text);
    }

    /// <summary>Number of the newest revision, or null when there is no such design.</summary>
    public async Task<int?> CurrentRevisionAsync(long designId, CancellationToken cancel = default)
    {
        await using var db = await contexts.CreateDbContextAsync(cancel);
        return await db.Designs.Where(d => d.Id == designId).Select(d => (int?)d.CurrentRevision).SingleOrDefaultAsync(cancel);
    }

    private DateTime Now => clock.GetUtcNow().UtcDateTime;

    private async Task<RevisionDetail> CurrentAsync(long designId, CancellationToken cancel)
    {
        var number = await CurrentRevisionAsync(designId, cancel);
        return (await FindRevisionAsync(designId, number!.Value, cancel))!;
    }

    private static async Task<RevisionInfo> AddDesignAsync(HistoryContext db, Revision first, CancellationToken cancel)
    {
        var design = new Design { CreatedAt = first.CreatedAt, CurrentRevision = first.Number };
        design.Revisions.Add(first);
        db.Designs.Add(design);
        await db.SaveChangesAsync(cancel);
        return RevisionInfo.Of(first);
    }
}
