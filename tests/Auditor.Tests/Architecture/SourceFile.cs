namespace Auditor.Tests.Architecture;

/// <summary>A source file of the program, its comments and texts blanked out where only code counts.</summary>
internal sealed record SourceFile(string Path, string Text)
{
    public static IReadOnlyList<SourceFile> Under(string folder) =>
        [.. Directory.EnumerateFiles(System.IO.Path.Combine(TestFolders.Root, "src", folder), "*.cs", SearchOption.AllDirectories)
            .Where(path => !path.Contains("/obj/", StringComparison.Ordinal) && !path.Contains("/bin/", StringComparison.Ordinal))
            .Order(StringComparer.Ordinal)
            .Select(path => new SourceFile(System.IO.Path.GetRelativePath(System.IO.Path.Combine(TestFolders.Root, "src"), path), File.ReadAllText(path)))];

    /// <summary>Lines without comments and without the insides of simple texts.</summary>
    public IEnumerable<(int Line, string Code)> Code => Text.Split('\n').Select((line, i) => (i + 1, Strip(line)));

    private static string Strip(string line)
    {
        var code = System.Text.RegularExpressions.Regex.Replace(line, "\"(\\\\.|[^\"\\\\])*\"", "\"\"");
        var comment = code.IndexOf("//", StringComparison.Ordinal);
        return comment < 0 ? code : code[..comment];
    }
}
