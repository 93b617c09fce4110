using System.Globalization;
using CoreDesign.Estimating.Contracts;
using CoreDesign.History.Designs;

namespace CoreDesign.Web.Features.History;

/// <summary>What the history shows, as it stands in the address: so every view has a URL, and the browser's back works.</summary>
public sealed record HistoryAddress
{
    public const int PageSize = 25;

    public string Search { get; init; } = "";
    public string State { get; init; } = "";
    public string Steel { get; init; } = "";
    public string Joint { get; init; } = "";
    public string Sort { get; init; } = DesignQuery.DefaultSort;
    public int Page { get; init; } = 1;

    public bool IsFiltered => Search.Length > 0 || State.Length > 0 || Steel.Length > 0 || Joint.Length > 0;

    public static HistoryAddress From(string? search, string? state, string? steel, string? joint, string? sort, int? page) => new()
    {
        Search = search ?? "",
        State = state ?? "",
        Steel = steel ?? "",
        Joint = joint ?? "",
        Sort = string.IsNullOrEmpty(sort) ? DesignQuery.DefaultSort : sort,
        Page = page ?? 1,
    };

    /// <summary>The address to go to; what stands at its default is left out.</summary>
    public string Uri
    {
        get
        {
            var parts = new List<string>();
            Add("search", Search.Trim());
            Add("state", State);
            Add("steel", Steel);
            Add("joint", Joint);
            Add("sort", Sort == DesignQuery.DefaultSort ? "" : Sort);
            Add("page", Page == 1 ? "" : Page.ToString(CultureInfo.InvariantCulture));
            return parts.Count == 0 ? "history" : "history?" + string.Join('&', parts);

            void Add(string name, string value)
            {
                if (value.Length > 0) parts.Add($"{name}={System.Uri.EscapeDataString(value)}");
            }
        }
    }

    /// <summary>A change of filter starts at the first page again.</summary>
    public HistoryAddress Narrowed(string? search = null, string? state = null, string? steel = null, string? joint = null) => this with
    {
        Search = search ?? Search,
        State = state ?? State,
        Steel = steel ?? Steel,
        Joint = joint ?? Joint,
        Page = 1,
    };

    /// <summary>Sorts by a column, or turns its direction round. Figures and dates begin with the largest, words with A.</summary>
    public HistoryAddress SortedBy(string column, bool largestFirst)
    {
        var first = (largestFirst ? "-" : "") + column;
        var other = (largestFirst ? "" : "-") + column;
        return this with { Sort = Sort == first ? other : first, Page = 1 };
    }

    /// <summary><c>ascending</c>, <c>descending</c>, or null where this column doesn't sort.</summary>
    public string? SortOf(string column) => Sort == column ? "ascending" : Sort == "-" + column ? "descending" : null;

    public Outcome<DesignQuery> Query() => DesignQuery.Read(
        Search, State, Steel, Joint, Sort, Page.ToString(CultureInfo.InvariantCulture), PageSize.ToString(CultureInfo.InvariantCulture));
}
