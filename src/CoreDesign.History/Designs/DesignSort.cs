using System.Linq.Expressions;
using CoreDesign.History.Model;

namespace CoreDesign.History.Designs;

/// <summary>The columns by which a list can be sorted.</summary>
public static class DesignSort
{
    private static readonly Dictionary<string, Func<IQueryable<Revision>, bool, IOrderedQueryable<Revision>>> Columns = new(StringComparer.Ordinal)
    {
        ["changed"] = By(r => r.CreatedAt),
        ["id"] = By(r => r.DesignId),
        ["revision"] = By(r => r.Number),
        ["title"] = By(r => r.Title),
        ["reference"] = By(r => r.Reference),
        ["rating"] = By(r => r.RatedPower_kVA),
        ["state"] = By(r => r.State),
        ["form"] = By(r => r.Form),
        ["steel"] = By(r => r.Steel),
        ["joint"] = (rows, down) => down
            ? rows.OrderByDescending(r => r.JointType).ThenByDescending(r => r.JointPositions)
            : rows.OrderBy(r => r.JointType).ThenBy(r => r.JointPositions),
        ["limb"] = By(r => r.LimbPeakFluxDensity_T),
        ["loss"] = By(r => r.NoLoadLoss_W),

        // What was not asked for comes last in both directions; databases differ in where they put it.
        ["askedLoss"] = (rows, down) => down
            ? rows.OrderBy(r => r.AskedNoLoadLoss_W == null).ThenByDescending(r => r.AskedNoLoadLoss_W)
            : rows.OrderBy(r => r.AskedNoLoadLoss_W == null).ThenBy(r => r.AskedNoLoadLoss_W),
        ["current"] = By(r => r.NoLoadCurrent_percent),
        ["mass"] = By(r => r.Mass_kg),
        ["margin"] = By(r => r.MarginAtRated_percent),
        ["author"] = By(r => r.Author),
    };

    public static IReadOnlyCollection<string> Keys => Columns.Keys;

    /// <summary>Equal rows follow by design and revision, newest first, so that pages never share or miss one.</summary>
    internal static IQueryable<Revision> Apply(IQueryable<Revision> rows, string sort)
    {
        var down = sort.StartsWith('-');
        return Columns[down ? sort[1..] : sort](rows, down).ThenByDescending(r => r.DesignId).ThenByDescending(r => r.Number);
    }

    private static Func<IQueryable<Revision>, bool, IOrderedQueryable<Revision>> By<TKey>(Expression<Func<Revision, TKey>> column) =>
        (rows, down) => down ? rows.OrderByDescending(column) : rows.OrderBy(column);
}
