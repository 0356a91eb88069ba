namespace Auditor.SelfTest;

/// <summary>The table of SOURCES.md: where the data of a case come from and who published them.</summary>
internal static class SourceTable
{
    public static IReadOnlyList<string> Of(string markdown, CaseRun run)
    {
        var cells = markdown.Split('\n').Select(line => line.Split('|', StringSplitOptions.TrimEntries)).FirstOrDefault(line => line.Length > 4 && line[1] == run.Case.Name)
            ?? throw new KeyNotFoundException("SOURCES.md does not name " + run.Case.Name);
        return
        [
            "Data: " + cells[2],
            "Published by: " + cells[3],
            .. run.IsCertified ? ["Values certified by NIST, Statistical Reference Datasets"] : Array.Empty<string>(),
            "Values computed with " + run.Case.Values.Text("computed_with"),
            .. run.Case.Exact is { } exact ? ["Values computed with " + exact.Text("arithmetic")] : Array.Empty<string>(),
        ];
    }
}
