namespace CoreDesign.Web.Features.Design;

/// <summary>What a person writes when saving.</summary>
public sealed record SaveWords(string Title, string Note, string Author);
