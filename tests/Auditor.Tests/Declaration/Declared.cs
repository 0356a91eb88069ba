using Auditor.Declaration;

namespace Auditor.Tests.Declaration;

/// <summary>A least declaration, one key a line, in which tests put one key in another way.</summary>
internal static class Declared
{
    public const string File = "lease.yaml";

    private static readonly string[] _least =
    [
        "audit: 1",
        "model: {id: lease}",
        "data: {source: leases.csv}",
        "response: loss",
        "final_model: {terms: [price]}",
    ];

    /// <summary>The least declaration with the line of the same key replaced, or the text added as line 6 and on.</summary>
    public static string With(params string[] texts)
    {
        var lines = _least.ToList();
        foreach (var text in texts)
        {
            var at = lines.FindIndex(line => line.Split(':')[0] == text.Split(':')[0]);
            if (at < 0)
            {
                lines.Add(text);
            }
            else
            {
                lines[at] = text;
            }
        }

        return string.Join('\n', lines) + "\n";
    }

    public static DeclarationReading Read(params string[] texts) => DeclarationReader.Read(With(texts), File);

    /// <summary>The declaration, which must have no problem.</summary>
    public static ModelDeclaration Good(params string[] texts)
    {
        var reading = Read(texts);
        Assert.Equal([], reading.Problems.Select(problem => problem.ToString()));
        return reading.Declaration!;
    }

    /// <summary>Line and message of every problem.</summary>
    public static string[] Problems(params string[] texts)
    {
        var reading = Read(texts);
        Assert.Null(reading.Declaration);
        Assert.All(reading.Problems, problem => Assert.Equal(File, problem.File));
        return [.. reading.Problems.Select(problem => $"{problem.Line}: {problem.Message}")];
    }

    public static Term Term(string yaml) => Good("final_model: {terms: [" + yaml + "]}", "data: {source: leases.csv, time: opened}").FinalModel.Terms[0];
}
