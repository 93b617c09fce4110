namespace CoreDesign.Web;

/// <summary>
/// Without an address given, the service listens on this machine alone: it has no accounts, so it must not be
/// reachable from others by accident.
/// </summary>
public static class ListenAddress
{
    public const string Default = "http://127.0.0.1:5080";

    public static void ListenOnLoopbackByDefault(this WebApplicationBuilder builder)
    {
        ArgumentNullException.ThrowIfNull(builder);
        var settings = builder.Configuration;
        var given = settings["urls"] ?? settings["http_ports"] ?? settings["https_ports"];
        if (string.IsNullOrWhiteSpace(given) && !settings.GetSection("Kestrel:Endpoints").Exists())
            builder.WebHost.UseUrls(Default);
    }
}
