namespace CoreDesign.Estimating.Steels.Import;

/// <summary>
/// One message about an import file. Line counts from 1 and is null where the message is about the file or a whole table; column is
/// a column or key of the format. <see cref="Message"/> says all of it in one sentence, with the rule and the mend.
/// </summary>
public sealed record ImportProblem(int? Line, string? Column, string? Value, string Message);
