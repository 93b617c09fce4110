using CoreDesign.Estimating.Fields;

namespace CoreDesign.Web.Features.Design;

public enum FieldKind
{
    Number,

    /// <summary>Several numbers in one field, with a slash or semicolon between them.</summary>
    NumberList,
    Choice,
    Text,
}

/// <summary>One line of the form. Label, unit and range come from the field catalogue unless the page says otherwise.</summary>
public sealed record FormField(string Path, FieldKind Kind = FieldKind.Number)
{
    private readonly string? label;
    private readonly Field? own;

    /// <summary>True where an open field is derived or has a default, so that a typed value is a pin that can be released.</summary>
    public bool Derivable { get; init; }

    /// <summary>Descriptor of a field that is the page's own.</summary>
    public Field? Own { init => own = value; }

    public Field? Descriptor => own ?? FieldCatalog.TryFind(Kind == FieldKind.NumberList ? Path + "[]" : Path);

    public string Label { get => label ?? Descriptor?.Label ?? Path; init => label = value; }

    public string Unit => Descriptor?.Unit ?? "";

    /// <summary>The hint on the field: which range it takes.</summary>
    public string Hint => Descriptor is { } d ? Kind == FieldKind.NumberList ? $"{d.Range}, with / between" : d.Range : "";

    public IReadOnlyList<FormChoice> Choices { get; init; } = [];

    /// <summary>What an open choice means where that is an answer of its own; null where it is a default or still to be chosen.</summary>
    public string? None { get; init; }

    /// <summary>What the arrow keys add; null where the field has no natural step.</summary>
    public double? Step { get; init; }
}

public sealed record FormChoice(string Value, string Label);

/// <summary>A group of lines under one heading.</summary>
public sealed record FormSection(string Key, string Title, IReadOnlyList<FormField> Fields)
{
    /// <summary>True for lines that few designs need: closed until something is typed in one of them.</summary>
    public bool Folded { get; init; }
}
