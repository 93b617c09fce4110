using System.ComponentModel;
using System.Diagnostics;

namespace CoreDesign.Sheets.Tests.Pdf;

/// <summary>The outside judge of a PDF's structure: <c>qpdf --check</c> of Debian's package qpdf.</summary>
internal static class Qpdf
{
    public static void Check(byte[] pdf)
    {
        var output = Run(pdf, "--check");
        Assert.Contains("No syntax or stream encoding errors", output, StringComparison.Ordinal);
        Assert.DoesNotContain("WARNING", output, StringComparison.Ordinal);
    }

    /// <summary>The file with its object streams opened, as readable text.</summary>
    public static string Opened(byte[] pdf) => Run(pdf, "--qdf", "--object-streams=disable", "-");

    private static string Run(byte[] pdf, params string[] arguments)
    {
        var path = Path.Combine(Path.GetTempPath(), Path.GetRandomFileName() + ".pdf");
        File.WriteAllBytes(path, pdf);
        try
        {
            var start = new ProcessStartInfo("qpdf") { UseShellExecute = false, RedirectStandardOutput = true, RedirectStandardError = true, StandardOutputEncoding = System.Text.Encoding.Latin1 };
            List<string> all = arguments[^1] == "-" ? [.. arguments[..^1], path, "-"] : [.. arguments, path];
            all.ForEach(start.ArgumentList.Add);
            using var process = Process.Start(start)!;
            var error = process.StandardError.ReadToEndAsync(TestContext.Current.CancellationToken);
            var output = process.StandardOutput.ReadToEnd();
            process.WaitForExit();
            return output + error.Result;
        }
        catch (Win32Exception)
        {
            Assert.Fail("qpdf is missing, so the structure of the PDF can't be checked; install it (apt-get install qpdf) and run again.");
            throw;
        }
        finally
        {
            File.Delete(path);
        }
    }
}
