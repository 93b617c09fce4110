using CoreDesign.Estimating.Steels.Checks;

namespace CoreDesign.Estimating.Steels.Import;

/// <summary>
/// Reads a works' own steel (certificate or Epstein data) from a CSV file and checks it whole; <see cref="Template"/> describes the
/// format by example. Every error is reported at once. Nothing is stored here.
/// </summary>
public static class SteelImport
{
    /// <summary>Largest file taken; a caller should refuse more before reading it.</summary>
    public const int MaxBytes = 2 * 1024 * 1024;

    /// <summary>An example to fill in, comma separated with decimal points. It can be imported as it is.</summary>
    public static string Template { get; } = ImportTemplate.Text(',', '.');

    /// <summary>The same, semicolon separated with decimal commas.</summary>
    public static string TemplateWithDecimalComma { get; } = ImportTemplate.Text(';', ',');

    /// <summary>Reads at most <see cref="MaxBytes"/> and one more byte of the stream.</summary>
    /// <param name="csv">The file.</param>
    /// <param name="fileName">Its name, kept with the source; null if there is none.</param>
    /// <param name="cancellation">Stops the reading.</param>
    public static async Task<SteelImportPreview> ReadAsync(Stream csv, string? fileName, CancellationToken cancellation = default)
    {
        ArgumentNullException.ThrowIfNull(csv);
        var buffer = new byte[MaxBytes + 1];
        var length = 0;
        int read;
        while (length < buffer.Length && (read = await csv.ReadAsync(buffer.AsMemory(length), cancellation)) > 0)
        {
            length += read;
        }

        return Read(buffer.AsSpan(0, length), fileName);
    }

    public static SteelImportPreview Read(ReadOnlySpan<byte> csv, string? fileName)
    {
        var findings = new Findings();
        return ImportText.Decode(csv, findings) is var (text, encoding)
            ? Preview(text, encoding, fileName, findings)
            : Preview(null, "", findings);
    }

    /// <summary>Reads text that is decoded already, as from a text field.</summary>
    public static SteelImportPreview Read(string csvText, string? fileName)
    {
        ArgumentNullException.ThrowIfNull(csvText);
        var findings = new Findings();
        if (csvText.Length > MaxBytes)
        {
            findings.Error(new Spot(0, "The text", ""), null, $"has more than {MaxBytes} characters; a certificate needs a few hundred lines. Leave other data out.");
            return Preview(null, "", findings);
        }

        return ImportText.Refused(csvText, findings) ? Preview(null, "", findings) : Preview(csvText, "text", fileName, findings);
    }

    private static SteelImportPreview Preview(string text, string encoding, string? fileName, Findings findings)
    {
        if (ImportRows.Read(text, findings) is not var (rows, separator))
        {
            return Preview(null, "", findings);
        }

        var (draft, decimalMark) = ImportReader.Read(rows, separator, findings);
        if (SteelLibrary.TryFind(draft.Name, out _))
        {
            findings.Error(new Spot(0, "name", ""), draft.Name, "is the name of a built-in grade; add the coil or certificate number.");
        }
        else if (draft.Name.Length > 0 && (draft.Name.All(c => c == '.') || draft.Name.Equals("import", StringComparison.OrdinalIgnoreCase)))
        {
            // Such a name could not be opened: addresses drop points alone, and "import" is where files go.
            findings.Error(new Spot(0, "name", ""), draft.Name, "can't be the address of a steel; add the coil or certificate number.");
        }

        var file = CleanFileName(fileName);
        draft.Source += file.Length > 0 ? $" (file {file})" : "";
        var door = new SteelDoor("works", SteelStanding.Certificate, "", key => new Spot(0, key, ""));
        var grade = SteelChecker.Check(draft, door, findings);
        var separatorName = separator switch { ',' => "comma", ';' => "semicolon", _ => "tab" };
        return Preview(grade, $"{encoding}, {separatorName} separated, {decimalMark}", findings);
    }

    private static SteelImportPreview Preview(SteelGrade? grade, string readAs, Findings findings) => new()
    {
        Grade = grade,
        Errors = Problems(findings.Errors, findings.ErrorCount, "errors"),
        Warnings = Problems(findings.Warnings, findings.WarningCount, "warnings"),
        ReadAs = readAs,
    };

    private static List<ImportProblem> Problems(IReadOnlyList<Finding> kept, int count, string what)
    {
        var problems = kept.OrderBy(f => f.Spot.Line == 0 ? int.MaxValue : f.Spot.Line).Select(Problem).ToList();
        if (count > kept.Count)
        {
            problems.Add(new ImportProblem(null, null, null, $"And {count - kept.Count} more {what}."));
        }

        return problems;
    }

    private static ImportProblem Problem(Finding finding)
    {
        var (line, column, _) = finding.Spot;
        var where = line > 0 ? $"Line {line}, {column}" : column;
        var value = finding.ShownValue;
        var ofFile = column.StartsWith("The ", StringComparison.Ordinal);
        var message = (ofFile, value) switch
        {
            (true, null) => line > 0 ? $"Line {line}: the {column[4..]} {finding.Rule}" : $"{column} {finding.Rule}",
            (_, null) => $"{where}: {finding.Rule}",
            _ => $"{where}: \"{value}\" {finding.Rule}",
        };
        return new ImportProblem(line > 0 ? line : null, ofFile ? null : column, value, message);
    }

    /// <summary>A file name comes from outside; only its printable last part is kept.</summary>
    private static string CleanFileName(string? fileName)
    {
        var last = (fileName ?? "").Split('/', '\\')[^1];
        return Finding.Shown(last.Trim());
    }
}
