using System.Globalization;
using Microsoft.AspNetCore.Http.HttpResults;
using Microsoft.Net.Http.Headers;

namespace CoreDesign.Web.Features.Designs;

/// <summary>Reads ids, revision numbers and revision tags out of addresses and headers.</summary>
internal static class DesignAddress
{
    public static string Of(long id) => string.Create(CultureInfo.InvariantCulture, $"/api/designs/{id}");

    public static string Tag(int revision) => string.Create(CultureInfo.InvariantCulture, $"\"{revision}\"");

    /// <summary>Ids and numbers are whole and positive; anything else names nothing that could exist.</summary>
    public static bool TryId(string text, out long id) =>
        long.TryParse(text, NumberStyles.None, CultureInfo.InvariantCulture, out id) && id > 0;

    public static bool TryNumber(string text, out int number) =>
        int.TryParse(text, NumberStyles.None, CultureInfo.InvariantCulture, out number) && number > 0;

    public static ProblemHttpResult NoDesign(string id) => Problems.NotFound($"There is no design '{Cut(id)}'.");

    public static ProblemHttpResult NoRevision(string id, string number) => Problems.NotFound($"There is no revision '{Cut(number)}' of a design '{Cut(id)}'.");

    /// <summary>The revision that a save starts from, from <c>If-Match: "3"</c>; or the problem to answer with.</summary>
    public static ProblemHttpResult? ReadIfMatch(HttpRequest request, out int revision)
    {
        revision = 0;
        var given = request.Headers.IfMatch.ToString();
        if (given.Length == 0)
        {
            return Problems.Plain(
                StatusCodes.Status428PreconditionRequired,
                "The revision that this save starts from is missing.",
                "Send the header If-Match with the number of the revision you started from in quotes, as in If-Match: \"3\".");
        }

        var bare = given.Length > 2 && given.StartsWith('"') && given.EndsWith('"') ? given[1..^1] : given;
        return TryNumber(bare, out revision)
            ? null
            : Problems.Refused(HeaderNames.IfMatch, $"{Cut(given)} is given; one revision number in quotes is needed, as in \"3\".");
    }

    public static string Cut(string text) => text.Length <= 40 ? text : text[..40] + "…";
}
