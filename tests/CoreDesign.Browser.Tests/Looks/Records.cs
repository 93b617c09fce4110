using System.Globalization;
using System.Net.Http.Headers;
using System.Net.Http.Json;
using System.Text.Json.Nodes;
using CoreDesign.Browser.Tests.Host;
using CoreDesign.Browser.Tests.Looks;

[assembly: AssemblyFixture(typeof(Records))]

namespace CoreDesign.Browser.Tests.Looks;

/// <summary>
/// The services that the places are looked at on: one whose history holds known designs, one whose history is empty. Each starts when
/// the first test asks for it. The designs are the demo orders, saved through the API; the steel's figures are invented.
/// </summary>
public sealed class Records : IAsyncDisposable
{
    /// <summary>A design with three revisions, notes and remarks.</summary>
    public const int Revised = 1;

    /// <summary>A design that others save while one has it open.</summary>
    public const int Contested = 2;

    public const string OwnSteel = "Halden coil 4711";

    private readonly Lazy<Task<WebServer>> filled = new(FillAsync);
    private readonly Lazy<Task<WebServer>> empty = new(WebServer.StartNewAsync);

    /// <summary>Two curves and one loss table that fit each other.</summary>
    public static string Certificate(string name) => $"""
        # Invented data for tests; no certificate stands behind them.
        name,{name}
        source,Invented certificate 2026-11
        thickness_mm,0.27
        density_kg_m3,7650
        resistivity_ohm_m,4.8e-7
        saturationPolarization_T,2.03
        stackingFactor,0.95
        kind,frequency_Hz,B_T,value
        magnetization,50,0.5,8.4
        magnetization,50,1.0,14.6
        magnetization,50,1.3,20.5
        magnetization,50,1.5,31.5
        magnetization,50,1.7,78
        magnetization,50,1.8,205
        magnetization,50,1.9,1050
        magnetization,50,2.0,6500
        loss,50,0.5,0.085
        loss,50,1.0,0.315
        loss,50,1.3,0.525
        loss,50,1.5,0.71
        loss,50,1.7,0.98
        loss,50,1.8,1.17
        """.ReplaceLineEndings("\n");

    /// <summary>The same with a thickness in micrometres, a curve that falls and a word for a figure.</summary>
    public static string BrokenCertificate => Certificate("Broken certificate")
        .Replace("thickness_mm,0.27", "thickness_mm,270", StringComparison.Ordinal)
        .Replace("1.5,31.5", "1.5,11.5", StringComparison.Ordinal)
        .Replace("1.7,0.98", "1.7,about one watt in each kilogram", StringComparison.Ordinal);

    public Task<WebServer> ServerAsync(Place place) => place.InEmptyHistory ? empty.Value : filled.Value;

    /// <summary>Somebody else changes the gap and saves.</summary>
    public static async Task SaveElsewhereAsync(string address, int id)
    {
        using var http = new HttpClient { BaseAddress = new Uri(address) };
        var now = (await http.GetFromJsonAsync<JsonObject>($"/api/designs/{id}"))!;
        var design = now["design"]!.DeepClone();
        var revision = (int)now["revision"]!;
        design["joint"]!["gap_mm"] = revision % 2 == 0 ? 0.3 : 0.35;
        await SaveAsync(http, id, revision, new JsonObject { ["design"] = design, ["note"] = "Gap as the shop measured it" });
    }

    public async ValueTask DisposeAsync()
    {
        foreach (var server in new[] { filled, empty }.Where(s => s.IsValueCreated)) await (await server.Value).DisposeAsync();
    }

    private static async Task<WebServer> FillAsync()
    {
        var server = await WebServer.StartNewAsync();
        using var http = new HttpClient { BaseAddress = new Uri(server.Address) };
        var orders = JsonNode.Parse(await File.ReadAllTextAsync(Paths.At("src", "CoreDesign.Estimating", "Data", "demo_orders.json")))!.AsArray()
            .ToDictionary(o => (string)o!["key"]!, o => (Title: (string)o!["title"]!, Design: o!["design"]!));
        foreach (var key in new[] { "station-1000", "town-400", "pole-25", "village-100", "pump-750", "substation-40000" })
        {
            var (title, design) = orders[key];
            using var answer = await http.PostAsJsonAsync("/api/designs", new JsonObject { ["title"] = title, ["design"] = design.DeepClone(), ["note"] = "First draft for the offer" });
            answer.EnsureSuccessStatusCode();
        }

        var revised = orders["station-1000"].Design.DeepClone();
        revised["joint"]!["gap_mm"] = 0.2;
        await SaveAsync(http, Revised, 1, new JsonObject { ["design"] = revised.DeepClone(), ["note"] = "Tighter gap, as the shop measured it on HR-1031" });
        revised["core"]!["limb"]!["diameter_mm"] = 225;
        await SaveAsync(http, Revised, 2, new JsonObject { ["design"] = revised, ["note"] = "5 mm more diameter to bring the loss under the asked-for limit; the customer takes up to 950 kg of core. Window kept, so the windings need no new drawing." });
        using var remark = await http.PostAsJsonAsync($"/api/designs/{Revised}/revisions/3/notes", new JsonObject { ["text"] = "Checked against the slitting list of week 48: all widths are in stock." });
        remark.EnsureSuccessStatusCode();
        using var steel = new StringContent(Certificate(OwnSteel), new MediaTypeHeaderValue("text/csv"));
        using var kept = await http.PostAsync(new Uri("/api/steels/import?commit=true", UriKind.Relative), steel);
        kept.EnsureSuccessStatusCode();
        return server;
    }

    private static async Task SaveAsync(HttpClient http, int id, int startedFrom, JsonObject body)
    {
        using var request = new HttpRequestMessage(HttpMethod.Put, $"/api/designs/{id}") { Content = JsonContent.Create(body) };
        request.Headers.IfMatch.Add(new EntityTagHeaderValue(string.Create(CultureInfo.InvariantCulture, $"\"{startedFrom}\"")));
        using var answer = await http.SendAsync(request);
        answer.EnsureSuccessStatusCode();
    }
}
