using System.Diagnostics;
using System.Text;
using System.Text.RegularExpressions;

namespace CoreDesign.Browser.Tests.Host;

/// <summary>The built service as its own process on a free loopback port, with a data folder of its own, as a user would start it.</summary>
public sealed partial class WebServer : IAsyncDisposable
{
    private static readonly TimeSpan Patience = TimeSpan.FromSeconds(90);
    private readonly StringBuilder log = new();
    private Process? process;

    public string DataFolder { get; } = Directory.CreateTempSubdirectory("coredesign-browser-").FullName;

    /// <summary>"http://127.0.0.1:41234", the same over restarts.</summary>
    public string Address { get; private set; } = "";

    public string Log
    {
        get { lock (log) return log.ToString(); }
    }

    public static async Task<WebServer> StartNewAsync()
    {
        var server = new WebServer();
        await server.StartAsync();
        return server;
    }

    public async Task StartAsync()
    {
        var program = Paths.At("src", "CoreDesign.Web", "bin", Paths.Configuration, "net10.0", "CoreDesign.Web.dll");
        var urls = Address.Length == 0 ? "http://127.0.0.1:0" : Address;
        var start = new ProcessStartInfo("dotnet", ["exec", program, "--urls", urls])
        {
            UseShellExecute = false,
            RedirectStandardOutput = true,
            RedirectStandardError = true,
            WorkingDirectory = DataFolder,
        };
        start.Environment["CoreDesign__Data"] = DataFolder;
        start.Environment.Remove("ASPNETCORE_URLS");
        start.Environment.Remove("ASPNETCORE_ENVIRONMENT");
        start.Environment.Remove("DOTNET_ENVIRONMENT");
        var listening = new TaskCompletionSource<string>(TaskCreationOptions.RunContinuationsAsynchronously);
        process = new Process { StartInfo = start, EnableRaisingEvents = true };
        process.OutputDataReceived += (_, e) => Read(e.Data, listening);
        process.ErrorDataReceived += (_, e) => Read(e.Data, listening);
        process.Exited += (_, _) => listening.TrySetException(new InvalidOperationException($"The service ended at once.\n{Log}"));
        process.Start();
        process.BeginOutputReadLine();
        process.BeginErrorReadLine();
        try
        {
            Address = await listening.Task.WaitAsync(Patience);
        }
        catch (TimeoutException e)
        {
            throw new InvalidOperationException($"The service did not listen within {Patience.TotalSeconds} s.\n{Log}", e);
        }
    }

    /// <summary>Ends the process without a word, as a power cut would.</summary>
    public async Task KillAsync()
    {
        if (process is null) return;
        if (!process.HasExited) process.Kill(entireProcessTree: true);
        await process.WaitForExitAsync();
        process.Dispose();
        process = null;
    }

    public async ValueTask DisposeAsync()
    {
        await KillAsync();
        Directory.Delete(DataFolder, recursive: true);
    }

    private void Read(string? line, TaskCompletionSource<string> listening)
    {
        if (line is null) return;
        lock (log) log.AppendLine(line);
        if (Listening().Match(line) is { Success: true } match) listening.TrySetResult(match.Groups["address"].Value);
    }

    [GeneratedRegex(@"Now listening on: (?<address>http://127\.0\.0\.1:\d+)", RegexOptions.ExplicitCapture, 1000)]
    private static partial Regex Listening();
}
