using CoreDesign.Estimating.Contracts;

namespace CoreDesign.Estimating.Steels.Checks;

/// <summary>Names and sources are plain text of bounded length; what looks like markup is text as well and is printed as it stands.</summary>
internal static class NameRules
{
    public const int LongestName = 80;
    public const int LongestSource = 200;

    public static void Check(string text, int longest, Spot spot, Findings findings)
    {
        if (text.Length == 0)
        {
            findings.Error(spot, null, $"is missing: give 1 to {longest} characters.");
        }
        else if (text.Length > longest)
        {
            findings.Error(spot, text, $"has {text.Length} characters; shorten it to {longest} at most.");
        }
        else if (!IsPlain(text))
        {
            findings.Error(spot, text, "holds control or invisible characters; type it again as plain text.");
        }
    }

    public static bool IsPlain(string text) => PlainText.Is(text);
}
