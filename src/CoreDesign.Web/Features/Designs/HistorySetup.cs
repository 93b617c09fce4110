using CoreDesign.History;
using CoreDesign.Web.Platform;
using Microsoft.AspNetCore.DataProtection;
using Microsoft.AspNetCore.DataProtection.KeyManagement;
using Microsoft.AspNetCore.DataProtection.Repositories;

namespace CoreDesign.Web.Features.Designs;

/// <summary>Ties the history to the service: its folder, its start, and the keys that lie beside it.</summary>
public static class HistorySetup
{
    // The OpenAPI document is written at build time by a program that runs this one up to its start.
    private const string DocumentWriter = "GetDocument.Insider";

    /// <summary>Settings <c>CoreDesign:Data</c> (folder) and <c>CoreDesign:Author</c> (name under which revisions are written).</summary>
    public static void AddHistory(this WebApplicationBuilder builder)
    {
        ArgumentNullException.ThrowIfNull(builder);
        builder.Services.AddHistory(services =>
        {
            var settings = services.GetRequiredService<IConfiguration>();
            return HistorySettings.From(settings["CoreDesign:Data"], settings["CoreDesign:Author"]);
        });

        builder.Services.AddHealthChecks().AddCheck<HistoryCheck>("history", tags: [Pages.ReadyTag]);

        // Keys in the data folder: what a page has signed stays readable over a restart.
        builder.Services.AddDataProtection().SetApplicationName("CoreDesign");
        builder.Services.AddOptions<KeyManagementOptions>().Configure<HistorySettings, ILoggerFactory>((options, settings, logs) =>
            options.XmlRepository = new FileSystemXmlRepository(KeyFolder(settings.Folder), logs));
    }

    /// <summary>Opens the history, or says on the error output why it can't be opened; then the service must not start.</summary>
    public static bool StartHistory(this WebApplication app)
    {
        ArgumentNullException.ThrowIfNull(app);
        if (System.Reflection.Assembly.GetEntryAssembly()?.GetName().Name == DocumentWriter) return true;
        try
        {
            HistoryStartup.Apply(app.Services);
            return true;
        }
        catch (HistoryUnavailableException e)
        {
            Console.Error.WriteLine(e.Message);
            return false;
        }
    }

    private static DirectoryInfo KeyFolder(string dataFolder)
    {
        var path = Path.Combine(dataFolder, "keys");
        return OperatingSystem.IsWindows()
            ? Directory.CreateDirectory(path)
            : Directory.CreateDirectory(path, UnixFileMode.UserRead | UnixFileMode.UserWrite | UnixFileMode.UserExecute);
    }
}
