using System.Diagnostics;
using CoreDesign.Browser.Tests.Host;

namespace CoreDesign.Browser.Tests.Walks;

/// <summary>The outside judges of a printed sheet: <c>qpdf --check</c> and <c>pdftotext</c>, which the test command installs.</summary>
internal static class Pdf
{
    public static async Task<string> CheckedTextAsync(byte[] pdf)
    {
        Assert.Equal("%PDF-", System.Text.Encoding.Latin1.GetString(pdf.AsSpan(0, 5)));
        var path = Path.Combine(Path.GetTempPath(), Path.GetRandomFileName() + ".pdf");
        await File.WriteAllBytesAsync(path, pdf);
        try
        {
            var check = await RunAsync("qpdf", "--check", path);
            Assert.Contains("No syntax or stream encoding errors", check, StringComparison.Ordinal);
            Assert.DoesNotContain("WARNING", check, StringComparison.Ordinal);
            return await RunAsync("pdftotext", "-layout", path, "-");
        }
        finally
        {
            File.Delete(path);
        }
    }

    private static async Task<string> RunAsync(string program, params string[] arguments)
    {
        var start = new ProcessStartInfo(program, arguments) { UseShellExecute = false, RedirectStandardOutput = true, RedirectStandardError = true };
        using var process = Process.Start(start)!;
        var error = process.StandardError.ReadToEndAsync();
        var output = await process.StandardOutput.ReadToEndAsync();
        await process.WaitForExitAsync();
        return output + await error;
    }
}
