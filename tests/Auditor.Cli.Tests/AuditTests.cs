using System.Text.Json;

namespace Auditor.Cli.Tests;

/// <summary>Audits of data of one's own that end with a report.</summary>
public sealed class AuditTests
{
    private static readonly string Html = Path.Combine("audit-out", "lease-loss.html");
    private static readonly string Json = Path.Combine("audit-out", "lease-loss.json");

    [Fact]
    public void A_clean_file_is_audited_with_the_outputs_beside_the_declaration()
    {
        using var folder = new TemporaryFolder().With("models/lease.yaml", Leases.Declaration).With("models/leases.csv", Leases.Csv());
        var run = ProgramRun.In(folder, "models/lease.yaml").Ends(0);

        Assert.Equal("", run.Errors);
        Assert.Equal(
            [Path.Combine("models", Html), Path.Combine("models", Json), "models/lease.yaml", "models/leases.csv"],
            folder.Files());
        Assert.Contains("Written: " + folder.At(Path.Combine("models", Json)), run.Output, StringComparison.Ordinal);
    }

    [Fact]
    public void An_exclusion_that_the_data_contradict_ends_with_1()
    {
        using var folder = Leases.Folder(data: Leases.Csv(hours: 0.01));
        ProgramRun.In(folder, "lease.yaml").Ends(1);

        using var record = JsonDocument.Parse(folder.Text(Json));
        Assert.Equal("not_supported", record.RootElement.GetProperty("exclusions")[0].GetProperty("verdict").GetString());
    }

    /// <summary>60 rows of pure noise cannot show that an effect is negligible: the gravest finding is medium.</summary>
    [Theory]
    [InlineData("high", 0)]
    [InlineData("medium", 1)]
    [InlineData("low", 1)]
    [InlineData("never", 0)]
    public void Fail_on_decides_which_findings_count(string severity, int status)
    {
        using var folder = Leases.Folder(data: Leases.Csv(rows: 60));
        ProgramRun.In(folder, "lease.yaml", "--fail-on", severity).Ends(status);

        using var record = JsonDocument.Parse(folder.Text(Json));
        var severities = record.RootElement.GetProperty("findings").EnumerateArray().Select(finding => finding.GetProperty("severity").GetString()).ToList();
        Assert.Contains("medium", severities);
        Assert.DoesNotContain("high", severities);
    }

    [Fact]
    public void A_high_finding_does_not_count_when_nothing_is_to_fail()
    {
        using var folder = new TemporaryFolder();
        ProgramRun.In(folder, "demo", "--fail-on", "never").Ends(0);
    }

    [Fact]
    public void Quiet_says_nothing()
    {
        using var folder = Leases.Folder();
        var run = ProgramRun.In(folder, "lease.yaml", "--quiet").Ends(0);

        Assert.Equal(("", ""), (run.Output, run.Errors));
        Assert.True(File.Exists(folder.At(Html)));
    }

    [Fact]
    public void Verbose_says_the_steps_on_standard_error_only()
    {
        using var folder = Leases.Folder();
        var run = ProgramRun.In(folder, "lease.yaml", "--quiet", "--verbose").Ends(0);

        Assert.Equal("", run.Output);
        Assert.Contains("debug Auditing lease-loss on 120 rows", run.Errors, StringComparison.Ordinal);
        string[] steps = ["the file's hash", "Data read", "Terms bound", "Rows chosen", "Models fitted", "Influence", "Residual checks", "pictures", "groups", "Rules", "Outputs"];
        Assert.Equal(steps, steps.OrderBy(step => run.Errors.IndexOf(step, StringComparison.Ordinal)));
        Assert.All(steps, step => Assert.Matches($@"debug +[0-9]+\.[0-9]{{3}} s  .*{step}", run.Errors));
    }

    /// <summary>The figures of the example: 250,000 of 1,000,000 rows' bytes in 2 seconds leave three times as long.</summary>
    [Fact]
    public void Progress_says_rows_a_second_and_time_left()
    {
        Assert.Equal("250,000 rows read, 125,000 a second, 25 %, about 6 s left", RunProgress.Words(new(250_000, 50, 200), 2));
        Assert.Equal("250,000 rows read, 125,000 a second", RunProgress.Words(new(250_000, 0, null), 2));
    }

    [Theory]
    [InlineData("json", new[] { "out/lease-loss.json" })]
    [InlineData("html", new[] { "out/lease-loss.html" })]
    [InlineData("json,html", new[] { "out/lease-loss.html", "out/lease-loss.json" })]
    [InlineData("html,html", new[] { "out/lease-loss.html" })]
    public void Only_the_formats_asked_for_are_written_where_asked(string formats, string[] files)
    {
        using var folder = Leases.Folder();
        ProgramRun.In(folder, "lease.yaml", "--formats", formats, "--out", "out").Ends(0);

        Assert.Equal([.. new[] { "lease.yaml", "leases.csv" }, .. files], folder.Files());
    }

    [Fact]
    public void A_policy_of_the_firm_is_in_force()
    {
        using var folder = Leases.Folder().With("firm.yaml", "significance: 0.01\n");
        ProgramRun.In(folder, "lease.yaml", "--policy", "firm.yaml").Ends(0);

        using var record = JsonDocument.Parse(folder.Text(Json));
        Assert.Equal(0.01, record.RootElement.GetProperty("policy").GetProperty("significance").GetDouble());
    }

    [Fact]
    public void Rules_of_the_firm_replace_the_shipped_ones()
    {
        using var folder = Leases.Folder().With("house/only.yaml", """
            - id: every-group
              about: exclusion
              when: [{fact: rows, above: 0}]
              severity: high
              message: "{rows} rows."
              advice: None.
              source: common practice, no source
            """);
        ProgramRun.In(folder, "lease.yaml", "--rules", "house").Ends(1);

        using var record = JsonDocument.Parse(folder.Text(Json));
        Assert.Equal(["every-group"], record.RootElement.GetProperty("findings").EnumerateArray().Select(finding => finding.GetProperty("rule").GetString()));
    }

    [Fact]
    public void Row_numbers_without_a_column_name_do_no_harm()
    {
        var data = Leases.Csv().Split('\n', StringSplitOptions.RemoveEmptyEntries).Index().Select(line => (line.Index == 0 ? "\"\"" : $"\"{line.Index}\"") + "," + line.Item);
        using var folder = Leases.Folder(data: string.Join('\n', data));
        ProgramRun.In(folder, "lease.yaml").Ends(0);

        using var record = JsonDocument.Parse(folder.Text(Json));
        Assert.Equal(
            ["column 1 (no name)", "note"],
            record.RootElement.GetProperty("rows").GetProperty("columns_nobody_mentions").EnumerateArray().Select(name => name.GetString()));
    }

    [Fact]
    public void The_version_and_the_help_are_answers()
    {
        using var folder = new TemporaryFolder();

        Assert.Matches(@"\A\d+\.\d+\.\d+\s*\z", ProgramRun.In(folder, "--version").Ends(0).Output);
        var help = ProgramRun.In(folder, "--help").Ends(0).Output;
        Assert.All(["--policy", "--fail-on", "--data-root", "demo", "rules", "new"], word => Assert.Contains(word, help, StringComparison.Ordinal));
    }
}
