namespace CoreDesign.Sheets.Scenes;

/// <summary>
/// How much room a text takes in IBM Plex Sans, without a painter: advance widths of regular and semi-bold in thousandths
/// of the size, measured once from the font files; characters outside the table count as 0.7 of the size, wider than most.
/// </summary>
public static class TextExtent
{
    /// <summary>Height of capitals with a little air, and depth of the tails, as shares of the size.</summary>
    public const double Ascent = 0.74;
    public const double Descent = 0.22;

    private static readonly int[] Regular =
    [
        236, 284, 419, 713, 598, 927, 694, 242, 335, 335, 450, 600, 272, 399, 272, 383, 600, 600, 600,
        600, 600, 600, 600, 600, 600, 600, 292, 292, 600, 600, 600, 477, 891, 641, 653, 621, 671, 583,
        559, 695, 707, 400, 510, 634, 501, 812, 707, 708, 606, 708, 640, 581, 572, 678, 609, 891, 613,
        593, 580, 317, 383, 317, 600, 565, 600, 534, 580, 503, 580, 549, 324, 528, 568, 250, 250, 527,
        272, 873, 568, 560, 580, 580, 367, 487, 351, 568, 492, 768, 507, 499, 464, 343, 314, 343, 600,
    ];

    private static readonly int[] SemiBold =
    [
        236, 309, 471, 656, 600, 960, 713, 260, 337, 337, 556, 600, 299, 402, 299, 437, 600, 600, 600,
        600, 600, 600, 600, 600, 600, 600, 319, 319, 600, 600, 600, 493, 899, 672, 663, 642, 689, 600,
        577, 712, 719, 423, 545, 678, 521, 817, 719, 712, 641, 712, 664, 611, 580, 689, 638, 949, 655,
        632, 599, 329, 437, 329, 600, 559, 600, 559, 600, 513, 600, 558, 350, 545, 588, 275, 275, 562,
        294, 888, 588, 563, 600, 600, 393, 499, 374, 588, 524, 819, 544, 524, 502, 363, 376, 363, 600,
    ];

    public static double Width(string text, double size, bool bold = false)
    {
        ArgumentNullException.ThrowIfNull(text);
        var sum = 0;
        foreach (var c in text)
        {
            sum += c switch
            {
                >= ' ' and <= '~' => (bold ? SemiBold : Regular)[c - ' '],
                '\u2009' or '\u202F' => 118,
                '\u00A0' => 236,
                '\u2212' or '\u2013' or '\u00D7' or '\u00B1' => 600,
                '\u00B2' or '\u00B3' or '\u00B0' => 470,
                '\u00B7' => 350,
                _ => 720,
            };
        }

        return sum * size / 1000;
    }

    /// <summary>Box of a text mark; turned text reads from the right, so its box stands upright.</summary>
    public static Box Of(TextMark mark)
    {
        ArgumentNullException.ThrowIfNull(mark);
        var width = Width(mark.Text, mark.Size, mark.Bold);
        var before = mark.Anchor switch { Anchor.Start => 0, Anchor.Middle => width / 2, _ => width };
        double up = Ascent * mark.Size, down = Descent * mark.Size;
        return mark.Angle == 90
            ? new Box(mark.At.X - up, mark.At.Y + before - width, up + down, width)
            : new Box(mark.At.X - before, mark.At.Y - up, width, up + down);
    }

    /// <summary>All texts of a scene, groups opened.</summary>
    public static IEnumerable<TextMark> Texts(IEnumerable<Mark> marks)
    {
        ArgumentNullException.ThrowIfNull(marks);
        foreach (var mark in marks)
        {
            if (mark is TextMark text)
            {
                yield return text;
            }
            else if (mark is GroupMark group)
            {
                foreach (var inner in Texts(group.Marks))
                {
                    yield return inner;
                }
            }
        }
    }
}
