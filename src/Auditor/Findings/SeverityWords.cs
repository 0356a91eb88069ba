namespace Auditor.Findings;

/// <summary>The words for severities in files, the gravest first.</summary>
public static class SeverityWords
{
    public static IReadOnlyList<(string Word, Severity Value)> Choices { get; } =
        [("high", Severity.High), ("medium", Severity.Medium), ("low", Severity.Low), ("note", Severity.Note)];

    public static IReadOnlyList<string> All { get; } = [.. Choices.Select(choice => choice.Word)];

    public static string InWords(this Severity severity) => Choices.First(choice => choice.Value == severity).Word;
}
