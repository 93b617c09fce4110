namespace CoreDesign.Web.Components;

/// <summary>One entry of a list: the value that is kept and the words that are shown.</summary>
public sealed record Choice(string Value, string Text);
