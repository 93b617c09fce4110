namespace CoreDesign.History.Model;

/// <summary>A steel that the works imported, as it was then. Newer data of the same steel come under a name of their own.</summary>
public sealed class SteelRecord : IKept
{
    public long Id { get; set; }
    public required string Name { get; set; }

    /// <summary>The name in small letters: two names that differ by case alone would be mistaken for one another.</summary>
    public required string NameKey { get; set; }
    public required string Payload { get; set; }

    /// <summary>SHA-256 of the payload in hexadecimal digits.</summary>
    public required string Fingerprint { get; set; }
    public required DateTime ImportedAt { get; set; }
}
