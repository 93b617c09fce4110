using System.Globalization;
using System.Text;
using CoreDesign.Estimating.Contracts;

namespace CoreDesign.Sheets.Design;

/// <summary>Codes of the contracts in the words of the trade.</summary>
internal static class Words
{
    public static string Form(string form) => form switch
    {
        "singlePhaseTwoLimb" => "two-limb",
        "singlePhaseThreeLimb" => "single-phase three-limb",
        "singlePhaseFourLimb" => "single-phase four-limb",
        "threeLimb" => "three-limb",
        "fiveLimb" => "five-limb",
        _ => Spaced(form),
    };

    /// <summary>The form, and of a bank how many there are.</summary>
    public static string Core(GeometryResult g) => g.Units > 1 ? $"{Form(g.Form)}, {Figures.With(Figures.Plain(g.Units), "units")}" : Form(g.Form);

    public static string Joint(JointInput? joint) => joint?.Type switch
    {
        null => Figures.Nothing,
        "buttLap" => "square butt-lap",
        "mitredOverlap" => "mitred, single overlap",
        "stepLap" => $"step-lap, {joint.Positions} positions",
        _ => Spaced(joint.Type),
    };

    public static string State(string state) => state switch
    {
        "draft" => "Draft, not checked",
        _ => Capital(state),
    };

    public static string Shape(string shape) => shape switch
    {
        "outerLimb" => "outer limb",
        "middleLimb" => "middle limb",
        _ => Spaced(shape),
    };

    /// <summary>limbA becomes Limb A, yokeABTop becomes Yoke AB top, tZones become T zones.</summary>
    public static string Part(string name) => Capital(Spaced(name));

    public static string Capital(string text) =>
        text.Length == 0 || !char.IsLower(text[0]) ? text : char.ToUpper(text[0], CultureInfo.InvariantCulture) + text[1..];

    /// <summary>Camel case to words; letters of phases stay capitals.</summary>
    private static string Spaced(string name)
    {
        var words = new StringBuilder();
        for (var i = 0; i < name.Length; i++)
        {
            var begins = i > 0 && char.IsUpper(name[i]) && (char.IsLower(name[i - 1]) || (i + 1 < name.Length && char.IsLower(name[i + 1])));
            if (begins)
            {
                words.Append(' ');
            }

            var phase = char.IsUpper(name[i]) && (i + 1 == name.Length || char.IsUpper(name[i + 1]) || (i > 0 && char.IsUpper(name[i - 1]) && !begins));
            words.Append(phase ? name[i] : char.ToLower(name[i], CultureInfo.InvariantCulture));
        }

        return words.ToString();
    }
}
