using CoreDesign.Estimating.Contracts;

namespace CoreDesign.Estimating.Demo;

/// <summary>An invented order to try the tool on.</summary>
public sealed record DemoOrder
{
    public required string Key { get; init; }
    public required string Title { get; init; }

    /// <summary>Says that it is invented, and what it shows.</summary>
    public required string Note { get; init; }

    /// <summary>What it shows: the note without its first sentence, for a list whose heading says that the orders are invented.</summary>
    public string Shows => Note[(Note.IndexOf(". ", StringComparison.Ordinal) + 2)..];
    public required DesignInput Design { get; init; }
}

/// <summary>
/// The demo orders of the works Halden Ridge, which does not exist. They are offered where the history is empty and
/// become designs only when someone opens one.
/// </summary>
public static class DemoOrders
{
    /// <summary>From the smallest rating to the largest.</summary>
    public static IReadOnlyList<DemoOrder> All { get; } = Load();

    public static DemoOrder? TryFind(string key) => All.FirstOrDefault(o => string.Equals(o.Key, key, StringComparison.Ordinal));

    private static DemoOrder[] Load()
    {
        using var stream = typeof(DemoOrders).Assembly.GetManifestResourceStream("CoreDesign.Estimating.Data.demo_orders.json")
            ?? throw new InvalidOperationException("The demo orders are missing from the assembly.");
        using var bytes = new MemoryStream();
        stream.CopyTo(bytes);
        var read = DesignJson.Read<DemoOrder[]>(bytes.ToArray());
        return read.Value ?? throw new InvalidOperationException($"The demo orders can't be read: {read.Errors[0].Path}: {read.Errors[0].Message}");
    }
}
