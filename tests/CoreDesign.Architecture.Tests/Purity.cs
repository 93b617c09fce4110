namespace CoreDesign.Architecture.Tests;

/// <summary>Uses that a pure library has no need of: files, network, console, processes, clocks, chance without a seed, settings, logs.</summary>
internal static class Purity
{
    private static readonly string[] Namespaces =
    [
        "System.IO.", "System.Net.", "System.Data.", "System.Threading.Timer", "System.Threading.Thread.", "Microsoft.Extensions.",
    ];

    private static readonly string[] Types =
    [
        "System.Console", "System.Diagnostics.Process", "System.Diagnostics.Stopwatch", "System.Diagnostics.Trace", "System.TimeProvider", "System.AppContext",
    ];

    private static readonly string[] Members =
    [
        "System.DateTime.get_Now", "System.DateTime.get_UtcNow", "System.DateTime.get_Today", "System.DateTimeOffset.get_Now",
        "System.DateTimeOffset.get_UtcNow", "System.Guid.NewGuid", "System.Random.get_Shared",
    ];

    // Written by the compiler into iterators.
    private const string ThreadId = "System.Environment.get_CurrentManagedThreadId";

    public static IReadOnlyList<string> Offences(AssemblyFacts facts) =>
    [
        .. facts.Types.Where(t => Namespaces.Any(n => t.StartsWith(n, StringComparison.Ordinal)) || Types.Contains(t, StringComparer.Ordinal)),
        .. facts.Members.Where(m => Members.Contains(m, StringComparer.Ordinal)
            || (m.StartsWith("System.Environment.", StringComparison.Ordinal) && m != ThreadId)),
    ];
}
