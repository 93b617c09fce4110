using System.Globalization;
using CoreDesign.History.Designs;

namespace CoreDesign.Web.Features.History;

/// <summary>How the history says what is stored in keys.</summary>
public static class HistoryWords
{
    public static string Joint(string type) => type switch
    {
        "buttLap" => "butt-lap",
        "mitredOverlap" => "mitred overlap",
        "stepLap" => "step-lap",
        _ => type,
    };

    /// <summary>Kind and joint positions, "step-lap 5"; a butt-lap joint has no number worth telling.</summary>
    public static string Joint(RevisionInfo row) => row.JointType switch
    {
        "stepLap" => string.Create(CultureInfo.InvariantCulture, $"step-lap {row.JointPositions}"),
        var type => Joint(type),
    };

    public static string Form(string form) => form switch
    {
        "threeLimb" => "three-phase, three limbs",
        "fiveLimb" => "three-phase, five limbs",
        "singlePhaseTwoLimb" => "single-phase, two limbs",
        "singlePhaseThreeLimb" => "single-phase, three limbs",
        "singlePhaseFourLimb" => "single-phase, four limbs",
        _ => form,
    };

    /// <summary>A rating that breaks between its parts, never between a number and its unit.</summary>
    public static string Rating(string rating) => rating.Replace(" k", "\u00a0k", StringComparison.Ordinal).Replace(" M", "\u00a0M", StringComparison.Ordinal);

    public static string Date(DateTime utc) => utc.ToString("yyyy-MM-dd", CultureInfo.InvariantCulture);

    public static string Time(DateTime utc) => utc.ToString("HH:mm", CultureInfo.InvariantCulture);

    /// <summary>Whether a limit was asked for and is exceeded.</summary>
    public static bool Over(double figure, double? asked) => asked is { } limit && figure > limit;
}
