namespace CoreDesign.Estimating.Steels.Import;

/// <summary>What an import file would become; nothing is stored by making it.</summary>
public sealed record SteelImportPreview
{
    public bool Ok => Grade is not null;

    /// <summary>The steel, null as long as there is any error.</summary>
    public SteelGrade? Grade { get; init; }

    /// <summary>Every error, the first fifty in words; a last entry counts the others.</summary>
    public required IReadOnlyList<ImportProblem> Errors { get; init; }
    public required IReadOnlyList<ImportProblem> Warnings { get; init; }

    /// <summary>How the file was read: encoding, separator, decimal mark. Empty where it could not be.</summary>
    public string ReadAs { get; init; } = "";
}
