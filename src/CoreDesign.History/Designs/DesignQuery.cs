using System.Globalization;
using CoreDesign.Estimating.Contracts;
using CoreDesign.History.Model;

namespace CoreDesign.History.Designs;

/// <summary>Which designs a list shows, in which order, and which page of it. Made by <see cref="Read"/>.</summary>
public sealed record DesignQuery
{
    public const int LongestSearch = 200;
    public const int LargestPage = 1_000_000;
    public const int LargestPageSize = 200;
    public const string DefaultSort = "-changed";

    /// <summary>Each word must be found in the revision or in a remark on it.</summary>
    public IReadOnlyList<string> Words { get; init; } = [];
    public DesignState? State { get; init; }
    public string? Steel { get; init; }
    public string? Joint { get; init; }

    /// <summary>A key of <see cref="DesignSort"/>, with a minus in front for the largest first.</summary>
    public string Sort { get; init; } = DefaultSort;
    public int Page { get; init; } = 1;
    public int PageSize { get; init; } = 50;

    /// <summary>Every revision as a line of its own, instead of the newest of each design.</summary>
    public bool EveryRevision { get; init; }

    /// <summary>Reads the query as it stands in the address; every part that can't be taken is named.</summary>
    public static Outcome<DesignQuery> Read(
        string? search, string? state, string? steel, string? joint, string? sort, string? page, string? pageSize, string? revisions = null)
    {
        var errors = new List<FieldError>();
        if (search?.Length > LongestSearch)
            errors.Add(new FieldError("search", $"The search has {search.Length} characters; at most {LongestSearch} are taken. Shorten it."));
        if (search is not null && search.Any(char.IsControl))
            errors.Add(new FieldError("search", "The search holds a control character. Take it out."));

        DesignState? stateFound = null;
        if (!string.IsNullOrEmpty(state))
        {
            if (DesignStates.ByName.TryGetValue(state, out var found)) stateFound = found;
            else errors.Add(new FieldError("state", $"'{Cut(state)}' is not a state. Known: {string.Join(", ", DesignStates.ByName.Keys)}."));
        }

        var order = string.IsNullOrEmpty(sort) ? DefaultSort : sort;
        if (!DesignSort.Keys.Contains(order.TrimStart('-'), StringComparer.Ordinal) || order.StartsWith("--", StringComparison.Ordinal))
            errors.Add(new FieldError("sort", $"'{Cut(order)}' is not a column to sort by. Known: {string.Join(", ", DesignSort.Keys)}; a minus in front puts the largest first."));

        if (revisions is not (null or "" or "newest" or "all"))
            errors.Add(new FieldError("revisions", $"'{Cut(revisions)}' is given; 'newest' or 'all' is needed."));

        var query = new DesignQuery
        {
            Words = [.. (search ?? "").ToLowerInvariant().Split(' ', StringSplitOptions.RemoveEmptyEntries | StringSplitOptions.TrimEntries)],
            State = stateFound,
            Steel = string.IsNullOrEmpty(steel) ? null : steel,
            Joint = string.IsNullOrEmpty(joint) ? null : joint,
            Sort = order,
            Page = Whole("page", page, 1, LargestPage, 1, errors),
            PageSize = Whole("pageSize", pageSize, 1, LargestPageSize, 50, errors),
            EveryRevision = revisions == "all",
        };
        return errors.Count > 0 ? new Outcome<DesignQuery> { Errors = errors } : new Outcome<DesignQuery> { Value = query };
    }

    private static int Whole(string name, string? text, int least, int most, int ifLeftOut, List<FieldError> errors)
    {
        if (string.IsNullOrEmpty(text)) return ifLeftOut;
        if (int.TryParse(text, NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture, out var value) && value >= least && value <= most) return value;
        errors.Add(new FieldError(name, string.Create(CultureInfo.InvariantCulture, $"'{Cut(text)}' is given; a whole number from {least} to {most} is needed.")));
        return ifLeftOut;
    }

    private static string Cut(string text) => text.Length <= 40 ? text : text[..40] + "…";
}
