using System.Text.Json;

namespace Auditor.Cli.Tests;

public sealed class SelfTestCommandTests : IDisposable
{
    private readonly DirectoryInfo _folder = Directory.CreateTempSubdirectory();

    public void Dispose() => _folder.Delete(recursive: true);

    [Fact]
    public void The_shipped_cases_agree_and_the_evidence_is_written()
    {
        string output = At("evidence");

        Assert.Equal(ExitStatus.Audited, CommandLine.Run(["self-test", "--out", output]));

        Assert.Equal(["self-test.html", "self-test.json"], Directory.GetFiles(output).Select(file => Path.GetFileName(file)).Order(StringComparer.Ordinal));
        using JsonDocument json = Evidence(output);
        Assert.True(json.RootElement.GetProperty("passed").GetBoolean());
    }

    [Fact]
    public void An_expected_value_that_is_not_met_ends_with_3_and_the_evidence_says_which()
    {
        string cases = At("cases");
        Copy(BundledFiles.SelfTestCases, cases);
        string file = Path.Combine(cases, "nist_longley", "case.json");
        string text = File.ReadAllText(file);
        Assert.Contains("\"-3482258.63459582\"", text, StringComparison.Ordinal);
        File.WriteAllText(file, text.Replace("\"-3482258.63459582\"", "\"-3482258.63559582\"", StringComparison.Ordinal));

        Assert.Equal(ExitStatus.Fault, SelfTestCommand.Run(cases, At("out"), DateTimeOffset.UnixEpoch));

        using JsonDocument json = Evidence(At("out"));
        var failed = json.RootElement.GetProperty("cases").EnumerateArray().Where(one => !one.GetProperty("passed").GetBoolean());
        Assert.Equal("nist_longley-largest", Assert.Single(failed).GetProperty("id").GetString());
    }

    [Fact]
    public void Without_its_cases_an_installation_is_at_fault()
    {
        Assert.Equal(ExitStatus.Fault, SelfTestCommand.Run(At("nowhere"), At("out"), DateTimeOffset.UnixEpoch));
        Assert.False(Directory.Exists(At("out")));
    }

    private static JsonDocument Evidence(string folder) => JsonDocument.Parse(File.ReadAllText(Path.Combine(folder, "self-test.json")));

    private string At(string name) => Path.Combine(_folder.FullName, name);

    private static void Copy(string from, string to)
    {
        foreach (string file in Directory.EnumerateFiles(from, "*", SearchOption.AllDirectories))
        {
            string copy = Path.Combine(to, Path.GetRelativePath(from, file));
            Directory.CreateDirectory(Path.GetDirectoryName(copy)!);
            File.Copy(file, copy);
        }
    }
}
