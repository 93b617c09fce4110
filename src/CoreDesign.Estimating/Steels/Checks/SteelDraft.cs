namespace CoreDesign.Estimating.Steels.Checks;

/// <summary>Where a value stands: in a file (line from 1, column or key) or in a request (JSON path). Line 0: nowhere in particular.</summary>
internal readonly record struct Spot(int Line, string Column, string Path);

/// <summary>A number as it was read, with the text it was read from.</summary>
internal sealed record Entry(double Value, string Text, Spot Spot);

/// <summary>One point of a table. <see cref="Frequency"/> is null where a peak curve states none.</summary>
internal sealed record DraftPoint(Entry? Frequency, Entry B, Entry Y);

/// <summary>Steel data read from a file or a request, each value still knowing where it stood; not checked yet.</summary>
internal sealed class SteelDraft
{
    public string Name { get; set; } = "";
    public string Source { get; set; } = "";
    public Dictionary<string, Entry> Fields { get; } = new(StringComparer.Ordinal);
    public List<DraftPoint> Magnetization { get; } = [];
    public List<DraftPoint> Loss { get; } = [];
    public List<DraftPoint> ExcitingPower { get; } = [];

    /// <summary>Values that could not be read and so are not in the draft; a missing field is not reported twice.</summary>
    public HashSet<string> Unreadable { get; } = new(StringComparer.Ordinal);
}

/// <summary>The three kinds of table, with what their values are called, their unit and their range.</summary>
internal sealed record PointKind(string Key, string Quantity, string Unit, double Most_B_T, double Most)
{
    public const double Least_B_T = 0.001;
    public const double Least = 1e-6;

    public static PointKind Magnetization { get; } = new("magnetization", "peak field strength", "A/m", 3, 1e6);
    public static PointKind Loss { get; } = new("loss", "loss", "W/kg", 2.2, 200);
    public static PointKind ExcitingPower { get; } = new("excitingPower", "exciting power", "VA/kg", 2.2, 20_000);
    public static IReadOnlyList<PointKind> All { get; } = [Magnetization, Loss, ExcitingPower];
}
