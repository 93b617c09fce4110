namespace CoreDesign.Browser.Tests;

/// <summary>Magnetic circuits to paste; invented.</summary>
internal static class Circuits
{
    /// <summary>A linear ring with a gap, for which the current has a closed form.</summary>
    public const string Ring = """
        {
          "frequency": 50,
          "supply": { "connection": "single", "V": 230 },
          "materials": { "core": { "mu_r": 2000 } },
          "branches": [
            { "name": "core", "from": "p", "to": "q", "area": 0.003, "length": 0.8, "material": "core" },
            { "name": "gap", "from": "q", "to": "p", "area": 0.003, "gap": 0.001 }
          ],
          "windings": [ { "name": "W", "phase": "S", "coils": [ { "branch": "core", "turns": 200 } ] } ]
        }
        """;

    /// <summary>As many branches as are taken, with names as long as are taken.</summary>
    public static string Largest { get; } = $$"""
        { "frequency": 50, "supply": { "connection": "single", "V": 230 }, "materials": { "m": { "B": [1, 1.7, 2], "H": [10, 80, 6000] } },
          "branches": [
        {{string.Join(",\n", Enumerable.Range(0, 200).Select(i => $$"""{"name":"{{Name(i)}}","from":"n{{i}}","to":"n{{(i + 1) % 200}}","area":0.003,"length":0.005,"material":"m"}"""))}} ],
          "windings": [ {"name":"{{new string('W', 100)}}","phase":"S","coils":[{"branch":"{{Name(0)}}","turns":200}]} ] }
        """;

    private static string Name(int i) => (i % 2 == 0 ? $"{i} a name of many words that goes on for as long as the reader of a case will let it" : $"{i}M").PadRight(100, i % 2 == 0 ? 'e' : 'M');
}
