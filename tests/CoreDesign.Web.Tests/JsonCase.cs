using System.Text.Json.Nodes;

namespace CoreDesign.Web.Tests;

/// <summary>Sample bodies, changed at one place by raw text, so that what is no JSON number (NaN, 1e999) can stand there as well.</summary>
internal static class JsonCase
{
    /// <summary>A whole three-limb design; invented.</summary>
    public const string Estimate = """
        { "order": { "reference": "HR-1042", "phases": 3, "ratedPower_kVA": 1000, "frequency_Hz": 50, "highestVoltage_percent": 110, "askedNoLoadLoss_W": 693, "askedNoLoadCurrent_percent": 0.5 },
          "excitedWinding": { "connection": "YN", "lineVoltage_V": 400, "turns": 22, "resistance_ohm": 0 },
          "steel": { "grade": "M105-30P" },
          "core": { "form": "threeLimb", "limbSteps": [ { "width_mm": 210, "stack_mm": 62.0 }, { "width_mm": 180, "stack_mm": 60 }, { "width_mm": 140, "stack_mm": 44 } ],
                    "yoke": { "areaFactor": 1.0 }, "windowHeight_mm": 520, "windowWidth_mm": 190, "stackingFactor": 0.965 },
          "joint": { "type": "stepLap", "positions": 5, "sheetsPerPosition": 1, "gap_mm": 0.3, "overlap_mm": 4.0 },
          "model": { "buildingFactor": 1.0, "temperature_C": 20 } }
        """;

    /// <summary>A linear ring with a gap, for which the current has a closed form.</summary>
    public const string Circuit = """
        { "format": "magnet-network-case/1", "name": "ring", "frequency": 50, "supply": { "connection": "single", "V": 230 },
          "materials": { "core": { "mu_r": 2000 } },
          "branches": [ { "name": "core", "from": "p", "to": "q", "area": 0.003, "length": 0.8, "material": "core" }, { "name": "gap", "from": "q", "to": "p", "area": 0.003, "gap": 0.001 } ],
          "windings": [ { "name": "W", "phase": "S", "coils": [ { "branch": "core", "turns": 200 } ] } ] }
        """;

    /// <summary>The body with the member at the path (<c>core.limbSteps[0].width_mm</c>) replaced, or added, as raw text.</summary>
    public static string With(string body, string path, string raw)
    {
        const string Mark = "@here@";
        var root = JsonNode.Parse(body)!;
        var node = root;
        var steps = path.Replace("[", ".[", StringComparison.Ordinal).Split('.');
        foreach (var step in steps[..^1]) node = Child(node, step);
        if (steps[^1][0] == '[') node.AsArray()[Index(steps[^1])] = Mark;
        else node.AsObject()[steps[^1]] = Mark;
        return root.ToJsonString().Replace($"\"{Mark}\"", raw, StringComparison.Ordinal);
    }

    /// <summary>The paths of all values that are neither object nor list.</summary>
    public static IEnumerable<string> Leaves(JsonNode? node, string path = "") => node switch
    {
        JsonObject o => o.SelectMany(m => Leaves(m.Value, path.Length == 0 ? m.Key : $"{path}.{m.Key}")),
        JsonArray a => a.SelectMany((e, i) => Leaves(e, $"{path}[{i}]")),
        _ => [path],
    };

    private static JsonNode Child(JsonNode node, string step) => (step[0] == '[' ? node.AsArray()[Index(step)] : node[step]) ?? throw new ArgumentException($"The body has no '{step}'.", nameof(step));

    private static int Index(string step) => int.Parse(step.Trim('[', ']'), System.Globalization.CultureInfo.InvariantCulture);
}
