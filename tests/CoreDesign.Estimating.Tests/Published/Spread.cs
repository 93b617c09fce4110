using CoreDesign.Tests.Shared;

namespace CoreDesign.Estimating.Tests.Published;

/// <summary>A figure of ours at the assumed design, and the lowest and highest over plausible ones.</summary>
internal sealed record Spread(double At, double Low, double High)
{
    public static Spread Over(double at, IEnumerable<double> others)
    {
        var all = others.Append(at).ToList();
        return new(at, all.Min(), all.Max());
    }

    public string Text(Func<double, string> figure) => figure(Low) == figure(High) ? figure(At) : $"{figure(At)} ({figure(Low)} to {figure(High)})";

    public override string ToString() => Text(x => HandbookTable.Figure(x));
}
