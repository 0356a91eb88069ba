using System.Text.Json;

namespace Auditor.Cli.Tests;

public sealed class DemoTests
{
    private const string Html = "tractor-resale-shortfall.html";
    private const string Json = "tractor-resale-shortfall.json";

    [Fact]
    public void The_demo_says_its_answer_and_where_the_files_are()
    {
        using var folder = new TemporaryFolder();
        var run = ProgramRun.In(folder, "demo").Ends(1);

        Assert.Equal("", run.Errors);
        Assert.Equal([Path.Combine("audit-out", Html), Path.Combine("audit-out", Json)], folder.Files());
        Golden.Matches(run.Output.Replace(folder.Root, "FOLDER", StringComparison.Ordinal), "demo.txt");
        Assert.Equal("exclusions_not_supported", Record(folder, Json).GetProperty("outcome").GetString());
    }

    [Fact]
    public void The_same_input_gives_the_same_bytes_at_any_number_of_threads()
    {
        using var folder = new TemporaryFolder();
        ProgramRun.In(folder, "demo", "--threads", "1").Ends(1);
        var (html, json) = (folder.Text(Path.Combine("audit-out", Html)), folder.Text(Path.Combine("audit-out", Json)));
        ProgramRun.In(folder, "demo", "--out", "again", "--threads", "4").Ends(1);

        Assert.Equal(html, folder.Text(Path.Combine("again", Html)));
        Assert.Equal(json, folder.Text(Path.Combine("again", Json)));
        Assert.Contains("\"started\":\"2026-01-01T00:00:00Z\"", json.Replace("\": \"", "\":\"", StringComparison.Ordinal), StringComparison.Ordinal);
    }

    [Fact]
    public void Without_a_fixed_moment_the_record_carries_that_of_the_run()
    {
        using var folder = new TemporaryFolder();
        ProgramRun.Of(ProgramRun.Built, folder.Root, null, "demo", "--formats", "json").Ends(1);

        var started = Record(folder, Json).GetProperty("provenance").GetProperty("started").GetDateTimeOffset();
        Assert.InRange(DateTimeOffset.UtcNow - started, TimeSpan.FromSeconds(-1), TimeSpan.FromMinutes(5));
    }

    private static JsonElement Record(TemporaryFolder folder, string name)
    {
        using var document = JsonDocument.Parse(folder.Text(Path.Combine("audit-out", name)));
        return document.RootElement.Clone();
    }
}
