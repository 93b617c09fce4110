using CoreDesign.History.Model;
using Microsoft.EntityFrameworkCore;

namespace CoreDesign.History.Designs;

/// <summary>One page of a list, and how many there are in all.</summary>
public sealed record DesignPage(IReadOnlyList<RevisionInfo> Items, int Total, int Page, int PageSize);

/// <summary>What a list can be narrowed to: how many newest revisions stand in each state, and which steels and joints occur.</summary>
public sealed record DesignChoices(IReadOnlyDictionary<string, int> States, IReadOnlyList<string> Steels, IReadOnlyList<string> Joints, int Total);

/// <summary>Searches, filters and sorts.</summary>
public sealed class DesignList(IDbContextFactory<HistoryContext> contexts)
{
    public async Task<DesignPage> FindAsync(DesignQuery query, CancellationToken cancel = default)
    {
        ArgumentNullException.ThrowIfNull(query);
        await using var db = await contexts.CreateDbContextAsync(cancel);
        var rows = query.EveryRevision ? db.Revisions : Newest(db);
        if (query.State is { } state) rows = rows.Where(r => r.State == state);
        if (query.Steel is { } steel) rows = rows.Where(r => r.Steel == steel);
        if (query.Joint is { } joint) rows = rows.Where(r => r.JointType == joint);
        foreach (var word in query.Words)
        {
            var pattern = "%" + Escaped(word) + "%";
            rows = rows.Where(r => EF.Functions.Like(r.SearchText, pattern, "\\") || r.Remarks.Any(n => EF.Functions.Like(n.SearchText, pattern, "\\")));
        }

        var total = await rows.CountAsync(cancel);
        var items = await DesignSort.Apply(rows, query.Sort)
            .Skip((query.Page - 1) * query.PageSize)
            .Take(query.PageSize)
            .Select(RevisionInfo.FromRow)
            .ToListAsync(cancel);
        return new DesignPage(items, total, query.Page, query.PageSize);
    }

    public async Task<DesignChoices> ChoicesAsync(CancellationToken cancel = default)
    {
        await using var db = await contexts.CreateDbContextAsync(cancel);
        var counts = await Newest(db).GroupBy(r => r.State).Select(g => new { g.Key, Count = g.Count() }).ToDictionaryAsync(g => g.Key, g => g.Count, cancel);
        return new DesignChoices(
            DesignStates.ByName.ToDictionary(s => s.Key, s => counts.GetValueOrDefault(s.Value), StringComparer.Ordinal),
            await Newest(db).Select(r => r.Steel).Distinct().OrderBy(s => s).ToListAsync(cancel),
            await Newest(db).Select(r => r.JointType).Distinct().OrderBy(j => j).ToListAsync(cancel),
            counts.Values.Sum());
    }

    private static IQueryable<Revision> Newest(HistoryContext db) => db.Revisions.Where(r => r.Number == r.Design!.CurrentRevision);

    private static string Escaped(string word) => word
        .Replace("\\", "\\\\", StringComparison.Ordinal)
        .Replace("%", "\\%", StringComparison.Ordinal)
        .Replace("_", "\\_", StringComparison.Ordinal);
}
