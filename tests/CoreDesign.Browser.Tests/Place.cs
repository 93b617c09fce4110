using CoreDesign.Browser.Tests.Host;

namespace CoreDesign.Browser.Tests;

/// <summary>A page in one state: its address, and how a person gets it into that state from there.</summary>
/// <param name="Name">Names the screenshots and the test.</param>
/// <param name="Address">Where it is.</param>
public sealed record Place(string Name, string Address)
{
    /// <summary>What a person does after opening the address; ends when the page shows it.</summary>
    public Func<Visitor, Task> Enter { get; init; } = _ => Task.CompletedTask;

    /// <summary>Faults that belong to this state, such as the answer 404 of a page that isn't there.</summary>
    public string? Expected { get; init; }

    /// <summary>Whether nothing may have been saved before; all others find a history with something in it.</summary>
    public bool InEmptyHistory { get; init; }

    public override string ToString() => Name;
}
